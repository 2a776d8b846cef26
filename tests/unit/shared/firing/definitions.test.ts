import { describe, expect, it } from 'vitest';
import { measuredTroubles } from '#shared/firing/findings.ts';
import { readFiring } from '#shared/firing/read-firing.ts';
import type { FiringReading } from '#shared/firing/types.ts';
import { seededRandom } from '../../../../seeds/simulation/seeded-random.ts';
import { JUDGED_KIND_IDS } from '../../../support/judged/judge.ts';
import { fire, STEP_MINUTES } from '../../../support/judged/kiln.ts';
import type { JudgedKind, JudgedPlan } from '../../../support/judged/kinds.ts';
import { JUDGED_KINDS } from '../../../support/judged/kinds.ts';
import type { Truth } from '../../../support/judged/truth.ts';
import { doubtfulLevels, truthOf } from '../../../support/judged/truth.ts';

const SEEDS = [1, 2, 3, 4, 5];

interface Read {
  readonly plan: JudgedPlan;
  readonly truth: Truth;
  readonly doubtful: ReturnType<typeof doubtfulLevels>;
  readonly reading: FiringReading;
  /** Whether any reading stands where the aim counts as reached. */
  readonly wasSeen: boolean;
}

/** A firing of a kind read every 10 s without noise, with its marks, beside its truth. */
function readAndTruth(kind: JudgedKind, seed: number): Read {
  const random = seededRandom(seed * 101 + 3);
  const plan = JUDGED_KINDS[kind](random);
  const course = fire(plan.kiln, plan.plan, random);
  const readings = [];
  for (let i = 0; i < course.celsius.length; i += 10) {
    readings.push({ minute: i * STEP_MINUTES, celsius: course.celsius[i]! });
  }
  const reading = readFiring({
    readings,
    marks: [
      { minute: course.litMinute, kind: 'lit' },
      { minute: course.shutOffMinute, kind: 'shut-off' },
    ],
    targetCelsius: plan.targetCelsius,
    fuel: plan.fuel,
    startClass: plan.kiln.startCelsius < 100 ? 'cold' : 'hot',
    drawnBecause: plan.drawnBecause ?? 'temperature',
  })!;
  const peak = course.celsius.reduce((most, value) => Math.max(most, value), -Infinity);
  const aim =
    plan.drawnBecause === 'melt' ? Math.min(plan.targetCelsius, peak) : plan.targetCelsius;
  const smooth = plan.smoothMinutes ?? 0;
  return {
    plan,
    truth: truthOf(course, aim, smooth),
    doubtful: doubtfulLevels(course, aim, smooth),
    reading,
    wasSeen: readings.some((one) => one.celsius >= aim - 5),
  };
}

const overlap = (a: { from: number; to: number }, b: { fromMinute: number; toMinute: number }) =>
  a.from < b.toMinute && a.to > b.fromMinute;

describe.each(JUDGED_KIND_IDS)('a firing of the kind “%s” is read by the definitions', (kind) => {
  it.each(SEEDS)('number %i', (seed) => {
    const { truth, doubtful, reading, wasSeen } = readAndTruth(kind, seed);
    for (const level of truth.levels) {
      const found = reading.levels.find((one) => overlap(level, one));
      if (
        level.to - level.from < 6.5 ||
        doubtful.some((one) => overlap(one, { fromMinute: level.from, toMinute: level.to }))
      )
        continue;
      expect(found, `${level.kind} from ${level.from} to ${level.to}`).toBeDefined();
      expect(found!.kind).toBe(level.kind);
      expect(Math.abs(found!.levelCelsius - level.level)).toBeLessThan(3);
    }
    for (const one of reading.levels) {
      const isTrue = [...truth.levels, ...doubtful].some((level) => overlap(level, one));
      expect(isTrue, `${one.kind} from ${one.fromMinute} to ${one.toMinute} is not there`).toBe(
        true,
      );
    }
    expect(reading.sags.length).toBe(
      truth.sags.filter((sag) => !sag.doubtful || reading.sags.some((one) => overlap(sag, one)))
        .length,
    );
    // Shut off as it touches the aim, a fast kiln may be there between two readings only.
    if (truth.reachedMinute === null || !wasSeen) expect(reading.reachedMinute).toBeNull();
    else expect(Math.abs(reading.reachedMinute! - truth.reachedMinute)).toBeLessThan(0.25);
    if (truth.pace !== null) {
      expect(reading.paceCelsiusPerMinute! / truth.pace).toBeGreaterThan(0.93);
      expect(reading.paceCelsiusPerMinute! / truth.pace).toBeLessThan(1.07);
    }
    const crossings = reading.quartzCrossings.map((one) => one.minutes);
    expect(crossings).toHaveLength(truth.crossings.length);
    for (const [i, { minutes }] of truth.crossings.entries()) {
      expect(Math.abs(crossings[i]! - minutes)).toBeLessThan(Math.max(0.15, 0.06 * minutes));
    }
    if (kind !== 'wood' && kind !== 'gusty') {
      expect(Math.abs((reading.hold?.minutes ?? 0) - (truth.hold?.minutes ?? 0))).toBeLessThan(0.8);
    }
  });
});

describe('kinds of firing without a trouble', () => {
  const calm: JudgedKind[] = [
    'plain',
    'hot',
    'fast',
    'gentle',
    'drying-soak',
    'paused',
    'electric',
    'wood',
    'gusty',
    'two loads',
    'lid peek',
    'horsehair',
    'drawn by eye',
  ];
  it.each(calm)('%s: none is found', (kind) => {
    for (const seed of SEEDS) {
      const troubles = measuredTroubles(readAndTruth(kind, seed).reading);
      expect(
        troubles.filter((one) => one !== 'slow-climb'),
        `number ${seed}`,
      ).toEqual([]);
    }
  });
});
