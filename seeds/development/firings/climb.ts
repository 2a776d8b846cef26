import type { Mark, Reading } from '#shared/firing/types.ts';
import type { MarkKind } from '#shared/vocabulary/marks.ts';
import { simulateFiring, type FireEvent } from '../../simulation/simulate-firing.ts';
import type { SimulatedFiring, SimulatedRecord } from '../../simulation/simulate-firing.ts';

/** The course of a firing in a potter's terms; the heat balance is worked out from it. */
export interface Climb {
  /** Minutes from lighting to the target: the burner is sized so that the kiln takes them. */
  readonly reach?: number;
  /** °C/min at the very start, where `reach` is not given. */
  readonly rate?: number;
  /** Where the fire as set would level off for good, °C; well above the target when all is right. */
  readonly level?: number;
  /** What was done about it, and where it would level off from then on. */
  readonly then?: { readonly at: number; readonly mark: MarkKind; readonly level: number };
  /** Wind: once at `from` °C the temperature falls by about so much over so many minutes. */
  readonly gusts?: readonly {
    readonly from: number;
    readonly minutes: number;
    readonly fall: number;
  }[];
  readonly soaks?: SimulatedFiring['soaks'];
  /** The fastest climb allowed, °C/min: a gentle start. */
  readonly gentle?: number;
  readonly overshoot?: number;
  readonly hold?: number;
  readonly giveUp?: number;
  readonly startCelsius?: number;
  /** Marks that only tell: a cone down, a gust noted, rain. */
  readonly marks?: readonly (readonly [minute: number, kind: MarkKind])[];
  /** Every so many minutes by hand, or a logger every so many seconds. */
  readonly by: 'hand-2' | 'hand-3' | 'hand-5' | 'logger-10' | 'logger-20' | 'logger-30';
  /** A second probe, so much cooler at the top of the climb. */
  readonly secondProbeCooler?: number;
}

const KILOJOULES_PER_LITRE_KELVIN = 0.4;
/** Bright enough to reach any target without levelling off on the way. */
const WELL_ABOVE = 420;
/** A kiln that stops short is there soon and stays there. */
const SHORT_OF_MASS = 1.35;
/** Losses ease while the kiln falls, so the wind has to take more than the fall. */
const FALL_SHARE = 1.55;
/** Deviation of a reading, °C: a steady dial read by eye, a bare probe in the draught. */
const HAND_NOISE = 1.1;
const LOGGER_NOISE = 1.6;

/** Shape of the losses: proportional to (T − air), half as much again at 1000 °C. */
const lossShape = (celsius: number, air: number): number => (celsius - air) * (1 + celsius / 2000);

export interface ClimbContext {
  readonly seed: number;
  readonly litres: number;
  readonly airCelsius: number;
  readonly targetCelsius: number;
}

/** The firing without its sampling: burner, losses, wind and what was done. */
function fireOf(climb: Climb, rate: number, context: ClimbContext): SimulatedFiring {
  const { seed, litres, airCelsius, targetCelsius } = context;
  const level = climb.level ?? targetCelsius + WELL_ABOVE;
  const burnerKw = (rate * litres * KILOJOULES_PER_LITRE_KELVIN) / 60;
  const lossFactor = (burnerKw * 1000) / (litres * lossShape(level, airCelsius));
  const events: FireEvent[] = [];
  if (climb.then) {
    const { at, mark, level: next } = climb.then;
    const lossShare = lossShape(level, airCelsius) / lossShape(next, airCelsius);
    events.push({ minute: at, mark, lossShare });
  }
  for (const [minute, mark] of climb.marks ?? []) events.push({ minute, mark });
  const firing: SimulatedFiring = {
    seed,
    burnerKw,
    volumeLitres: litres,
    lossFactor,
    airCelsius,
    startCelsius: climb.startCelsius ?? airCelsius,
    targetCelsius,
    holdMinutes: climb.hold ?? 0,
    coolMinutes: climb.by.startsWith('hand') ? 4 : 3,
    events,
    ...(climb.soaks ? { soaks: climb.soaks } : {}),
    ...(climb.gentle === undefined ? {} : { fastestPerMinute: climb.gentle }),
    ...(climb.overshoot === undefined ? {} : { overshootCelsius: climb.overshoot }),
    ...(climb.giveUp === undefined ? {} : { giveUpMinute: climb.giveUp }),
  };
  for (const { from, minutes, fall } of climb.gusts ?? []) {
    const minute = minutesTo(simulateFiring({ ...firing, stepSeconds: 10 }), from);
    const fallingKw = (FALL_SHARE * fall * litres * KILOJOULES_PER_LITRE_KELVIN) / (minutes * 60);
    const lossKw = (lossFactor * litres * lossShape(from, airCelsius)) / 1000;
    const lossShare = (burnerKw + fallingKw) / lossKw;
    if (Number.isFinite(minute))
      events.push({ minute, mark: 'gust', gust: { minutes, lossShare } });
  }
  return firing;
}

const minutesTo = (record: SimulatedRecord, celsius: number): number =>
  record.truth.find((reading) => reading.celsius >= celsius)?.minute ?? Infinity;

/** Where `reach` is given the burner is found by halving. */
function firingOf(climb: Climb, context: ClimbContext): SimulatedFiring {
  const wanted = climb.reach;
  if (wanted === undefined) return fireOf(climb, (climb.rate ?? 42) * SHORT_OF_MASS, context);
  let [low, high] = [8, 240];
  for (let turn = 0; turn < 18; turn += 1) {
    const rate = Math.sqrt(low * high);
    const trial = { ...fireOf(climb, rate, context), giveUpMinute: wanted + 5, stepSeconds: 10 };
    if (minutesTo(simulateFiring(trial), context.targetCelsius - 5) > wanted) low = rate;
    else high = rate;
  }
  return fireOf(climb, high, context);
}

/** Near the top a potter with a pencil looks every minute: those readings go in between. */
function withTheTop(record: SimulatedRecord, firing: SimulatedFiring): Reading[] {
  const close = simulateFiring({
    ...firing,
    seed: firing.seed + 3,
    stepSeconds: 60,
    noiseCelsius: HAND_NOISE,
  });
  const from = minutesTo(close, firing.targetCelsius - 12);
  const extra = close.readings.filter(
    ({ minute }) =>
      minute >= from &&
      minute <= close.shutOffMinute &&
      record.readings.every((reading) => Math.abs(reading.minute - minute) > 0.4),
  );
  return [...record.readings, ...extra].sort((a, b) => a.minute - b.minute);
}

export interface FiredRecord {
  readonly readings: readonly Reading[];
  readonly marks: readonly Mark[];
  readonly shutOffMinute: number;
  readonly peakCelsius: number;
  /** Minute at which the target less 5 °C was first there; null if it never was. */
  readonly reachedMinute: number | null;
}

/** Fires the kiln on paper and reads it as the author did: with a logger, or with a pencil. */
export function fire(climb: Climb, context: ClimbContext): FiredRecord {
  const firing = firingOf(climb, context);
  const fine = simulateFiring({ ...firing, stepSeconds: 5 });
  const reached = minutesTo(fine, context.targetCelsius - 5);
  const [who, step] = climb.by.split('-');
  const record = simulateFiring(
    who === 'hand'
      ? { ...firing, handNotedMinutes: Number(step), noiseCelsius: HAND_NOISE }
      : { ...firing, stepSeconds: Number(step), noiseCelsius: LOGGER_NOISE },
  );
  return {
    readings: who === 'hand' ? withTheTop(record, firing) : record.readings,
    marks: record.marks,
    shutOffMinute: record.shutOffMinute,
    peakCelsius: Math.max(...fine.truth.map(({ celsius }) => celsius)),
    reachedMinute: Number.isFinite(reached) ? reached : null,
  };
}
