import type { DrawnBecause, Fuel, Probe } from '../vocabulary/kiln.ts';
import type { Confidence } from './confidence.ts';
import type { MarkKind } from '../vocabulary/marks.ts';

/** One reading: minutes since the record's own zero, degrees Celsius. */
export interface Reading {
  readonly minute: number;
  readonly celsius: number;
}

/** What was done when. `percent` is the flue cover of a flue mark. */
export interface Mark {
  readonly minute: number;
  readonly kind: MarkKind;
  readonly percent?: number | null;
}

/** Everything the reader needs to know of one firing. Absent parts mean fewer findings, no guess. */
export interface FiringInput {
  readonly readings: readonly Reading[];
  /** A second probe, if there was one. */
  readonly secondProbe?: readonly Reading[] | null;
  readonly marks?: readonly Mark[];
  readonly targetCelsius?: number | null;
  readonly fuel?: Fuel | null;
  readonly startClass?: 'cold' | 'hot' | null;
  readonly drawnBecause?: DrawnBecause | null;
  readonly probe?: Probe | null;
  /** The author's answer to a level stretch, by its start: moves it between pause and stall. */
  readonly answers?: readonly LevelAnswer[];
}
export interface LevelAnswer {
  /** Start of the stretch the answer is about; matched to the nearest stretch within 3 min. */
  readonly fromMinute: number;
  readonly answer: 'meant' | 'stuck';
}

export type LevelKind = 'approach' | 'hold' | 'just-short' | 'warm-up' | 'pause' | 'stall';
export interface LevelStretch {
  readonly kind: LevelKind;
  readonly fromMinute: number;
  readonly toMinute: number;
  readonly minutes: number;
  /** Median over the stretch. */
  readonly levelCelsius: number;
  /** What came after it, said of a stall. */
  readonly then: 'climbed' | 'fell' | 'shut-off' | null;
  readonly confidence: Confidence;
}
export interface Sag {
  readonly fromMinute: number;
  readonly toMinute: number;
  readonly topCelsius: number;
  readonly bottomCelsius: number;
  readonly dropCelsius: number;
  readonly then: 'regained' | 'held' | 'drawn';
  readonly confidence: Confidence;
}
export interface Hold {
  readonly fromMinute: number;
  readonly toMinute: number;
  readonly minutes: number;
  readonly levelCelsius: number;
  /** Level minus aim; null when there is no aim. */
  readonly offAimCelsius: number | null;
  readonly sdCelsius: number;
  readonly confidence: Confidence;
}
export interface QuartzCrossing {
  readonly fromMinute: number;
  readonly toMinute: number;
  readonly minutes: number;
  readonly ratePerMinute: number;
  readonly confidence: Confidence;
}
export type ClimbShape = 'steady' | 'racing-then-creeping' | 'stepped';
export interface LevellingOff {
  readonly celsius: number;
  readonly lowCelsius: number;
  readonly highCelsius: number;
  /** Minutes from the last reading to the aim, when both ends of the interval reach it. */
  readonly reachesAim: { readonly lowMinutes: number; readonly highMinutes: number } | null;
}
/** From the end of the firing to the first piece drawn. */
export interface CoolingToDraw {
  readonly minutes: number;
  readonly dropCelsius: number;
}
export interface ProbeSpread {
  readonly fromMinute: number;
  readonly toMinute: number;
  readonly largestCelsius: number;
}

/** What the reader read off a record. Every temperature °C, every time a minute of the record. */
export interface FiringReading {
  readonly count: number;
  readonly spanMinutes: number;
  /** Minute of the last usable reading. */
  readonly lastMinute: number;
  readonly start: { readonly minute: number; readonly inferred: boolean };
  readonly shutOff: { readonly minute: number; readonly inferred: boolean };
  readonly aimCelsius: number | null;
  readonly peak: { readonly celsius: number; readonly minute: number };
  readonly reachedMinute: number | null;
  readonly timeToTemperatureMinutes: number | null;
  readonly paceCelsiusPerMinute: number | null;
  readonly climb: {
    readonly averagePerMinute: number | null;
    readonly steepestPerMinute: number | null;
    readonly shape: ClimbShape | null;
  };
  /** Minutes taken for each hundred degrees climbed the first time. */
  readonly hundreds: readonly { readonly fromCelsius: number; readonly minutes: number }[];
  readonly quartzCrossings: readonly QuartzCrossing[];
  /** Mean °C/min from 400 to 700 °C. */
  readonly rate400To700: number | null;
  readonly levels: readonly LevelStretch[];
  readonly sags: readonly Sag[];
  readonly hold: Hold | null;
  readonly overshootCelsius: number | null;
  readonly slowClimbMinutes: number | null;
  readonly unevenHeat: ProbeSpread | null;
  readonly levellingOff: LevellingOff | null;
  readonly minutesAboveAimLess50: number | null;
  /** Rapid swings: the residual scatter about the curve, °C, when it is more than a probe's. */
  readonly waveringCelsius: number | null;
  readonly probeToleranceCelsius: number | null;
  readonly coolingToDraw: CoolingToDraw | null;
  /** Level of the curve at the end of the firing. */
  readonly celsiusAtShutOff: number;
  /** Steepest °C/min between 450 and 700 °C on the way up; null when the climb misses that span. */
  readonly steepest450To700: number | null;
  /** Fastest change over any 30 s, °C/min, of the readings left after wild ones are set aside. */
  readonly fastestPerMinute: number;
  /** Longest time without a reading between start and end of the firing. */
  readonly longestGapMinutes: number;
  /** Readings outside −40 to 1400 °C, or wild against both neighbours: not used. */
  readonly setAsideCount: number;
  /** What had to be assumed, in plain words. */
  readonly assumed: readonly string[];
}
