import type { FiringInput, Mark, Reading } from '#shared/firing/types.ts';
import { normalNumber, seededRandom } from '../../../seeds/simulation/seeded-random.ts';
import type { Course } from './kiln.ts';
import { fire, STEP_MINUTES } from './kiln.ts';
import type { JudgedKind, JudgedPlan } from './kinds.ts';
import { JUDGED_KINDS } from './kinds.ts';

/** How a course was written down. */
export interface Sampling {
  readonly name: string;
  /** Minutes between readings. */
  readonly stepMinutes: number;
  /** Share of the step by which a reading may come early or late. */
  readonly jitter: number;
  readonly noiseCelsius: number;
  /** Share of readings that are wild; some of them last for a few. */
  readonly wildShare: number;
  /** Share of readings missing. */
  readonly missingShare: number;
  readonly isHandNoted: boolean;
  readonly hasMarks: boolean;
}
export interface JudgedRecord {
  readonly kind: JudgedKind;
  readonly seed: number;
  readonly plan: JudgedPlan;
  readonly course: Course;
  readonly sampling: Sampling;
  readonly input: FiringInput;
}

/** One judged record: everything about it follows from its kind and seed. */
export function judgedRecord(kind: JudgedKind, seed: number): JudgedRecord {
  const random = seededRandom(seed * 7919 + 17);
  const plan = JUDGED_KINDS[kind](random);
  const course = fire(plan.kiln, plan.plan, random);
  const sampling = samplingFor(random, course);
  const readings = written(course, sampling, random);
  const marks: Mark[] = sampling.hasMarks
    ? [
        { minute: course.litMinute, kind: 'lit' },
        ...(course.shutOffMinute < (course.celsius.length - 1) * STEP_MINUTES
          ? [{ minute: course.shutOffMinute, kind: 'shut-off' as const }]
          : []),
      ]
    : [];
  return {
    kind,
    seed,
    plan,
    course,
    sampling,
    input: {
      readings,
      marks,
      targetCelsius: plan.targetCelsius,
      fuel: plan.fuel,
      startClass: plan.kiln.startCelsius < 100 ? 'cold' : 'hot',
      drawnBecause: plan.drawnBecause ?? 'temperature',
      probe: 'K',
    },
  };
}

const STEPS_SECONDS = [1, 2, 5, 10, 15, 30, 60, 120, 180];

function samplingFor(random: () => number, course: Course): Sampling {
  const isLong = course.celsius.length * STEP_MINUTES > 240;
  const isHandNoted = random() < 0.25;
  const seconds = STEPS_SECONDS[Math.floor(random() * STEPS_SECONDS.length)] ?? 10;
  const noiseCelsius = isHandNoted ? 1 + random() * 2 : 1 + 5 * random() ** 1.5;
  return {
    name: isHandNoted ? 'hand' : seconds <= 15 ? 'dense' : seconds <= 60 ? 'middle' : 'sparse',
    stepMinutes: isHandNoted ? (isLong ? 10 : 2 + 2 * random()) : seconds / 60,
    jitter: isHandNoted ? 0.4 : random() < 0.5 ? 0 : 0.2,
    noiseCelsius,
    wildShare: isHandNoted ? 0 : random() < 0.5 ? 0 : 0.004,
    missingShare: random() < 0.6 ? 0 : 0.03,
    isHandNoted,
    hasMarks: isHandNoted || random() < 0.5,
  };
}

const WILD_VALUES = [1372, 0, -200, 1600, -40];

function written(course: Course, sampling: Sampling, random: () => number): Reading[] {
  const readings: Reading[] = [];
  const last = (course.celsius.length - 1) * STEP_MINUTES;
  const read = (minute: number): void => {
    const truth = course.celsius[Math.round(minute / STEP_MINUTES)];
    if (truth === undefined) return;
    const shown = truth + sampling.noiseCelsius * normalNumber(random);
    readings.push({
      minute: Math.round(minute * 600) / 600,
      celsius: sampling.isHandNoted ? Math.round(shown) : Math.round(shown * 10) / 10,
    });
  };
  let wildLeft = 0;
  let wildValue = 0;
  for (let i = 0; i * sampling.stepMinutes <= last; i += 1) {
    const minute = Math.max(0, (i + sampling.jitter * (random() - 0.5)) * sampling.stepMinutes);
    if (i > 0 && random() < sampling.missingShare) continue;
    read(minute);
    if (wildLeft > 0 || random() < sampling.wildShare) {
      if (wildLeft === 0) {
        wildLeft = sampling.stepMinutes < 0.2 && random() < 0.3 ? 1 + Math.floor(random() * 12) : 1;
        wildValue = WILD_VALUES[Math.floor(random() * WILD_VALUES.length)] ?? 0;
        if (random() < 0.4) {
          wildValue =
            (readings[readings.length - 1]?.celsius ?? 0) +
            (random() < 0.5 ? -1 : 1) * (60 + 150 * random());
        }
      }
      wildLeft -= 1;
      const written = readings[readings.length - 1];
      if (written !== undefined) readings[readings.length - 1] = { ...written, celsius: wildValue };
    }
  }
  if (sampling.isHandNoted) {
    readings.splice(
      0,
      readings.length,
      ...readings.filter((one) => Math.abs(one.minute - course.shutOffMinute) > 0.5),
    );
    read(course.shutOffMinute);
    readings.sort((a, b) => a.minute - b.minute);
  }
  return readings;
}
