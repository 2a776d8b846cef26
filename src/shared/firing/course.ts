import type { CleanReadings } from './clean-readings.ts';
import { cleanReadings } from './clean-readings.ts';
import { FARTHEST_MINUTE, FEWEST_READINGS, WIDE_HALF_MINUTES } from './constants.ts';
import type { Curve } from './curve.ts';
import { curveAlong, curveOf, stepFor } from './curve.ts';
import { pointsOf } from './points.ts';
import type { Scatter } from './scatter.ts';
import { scatterOf } from './scatter.ts';
import { shutOffOf } from './shut-off.ts';
import type { Moment } from './start.ts';
import { startOf } from './start.ts';
import { cornersOf } from './straight-stretches.ts';
import { swingPeriod } from './swing.ts';
import type { FiringInput, Mark } from './types.ts';

/**
 * A record made ready to be read: its curves cut at the start and the end of the firing, so that no
 * window mixes burning with cooling. Both curves of the firing share their steps.
 */
export interface Course {
  readonly record: CleanReadings;
  readonly scatter: Scatter;
  readonly marks: readonly Mark[];
  readonly start: Moment;
  readonly shutOff: Moment;
  /** Readings of the firing: record indices from (included) to (excluded). */
  readonly from: number;
  readonly to: number;
  /** Levels, and the rates of the moment. */
  readonly fine: Curve;
  /** `fine` with regular swings taken out: what levels, sags and holds are read from. */
  readonly steady: Curve;
  /** Rates over ±2.5 min of `fine`, or over the period of a record that swings. */
  readonly wide: Curve;
  /** Standard error of `fine`, °C. */
  readonly fineError: number;
  /** Levels after the end of the firing. */
  readonly after: Curve | null;
  readonly swingMinutes: number | null;
}

/** Prepares a record; null when fewer than three usable readings are left. */
export function courseOf(input: FiringInput): Course | null {
  const record = cleanReadings(input.readings);
  const n = record.minutes.length;
  if (n < FEWEST_READINGS) return null;
  const marks = (input.marks ?? []).filter((mark) => Math.abs(mark.minute) <= FARTHEST_MINUTE);
  const span = (record.minutes[n - 1] ?? 0) - (record.minutes[0] ?? 0);
  const step = stepFor(span);
  const scatter = scatterOf(record.minutes, record.celsius);

  const corners = cornersOf(pointsOf(record, scatter));
  const first = record.minutes[0] ?? 0;
  const whole = curveAlong(corners, first, first + span, step);
  const fineError = errorOfLevel(scatter);
  const start = startOf(whole, marks);
  const shutOff = shutOffOf(whole, {
    fineError,
    readingMinutes: record.minutes,
    startMinute: start.minute,
    targetCelsius: input.targetCelsius ?? null,
    marks,
  });

  let from = indexAtOrAfter(record.minutes, start.minute - 1e-9);
  let to = indexAtOrAfter(record.minutes, shutOff.minute + 1e-9);
  if (to - from < 2) {
    from = 0;
    to = n;
  }
  const between = (a: number, b: number) =>
    curveAlong(corners, record.minutes[a] ?? 0, record.minutes[b] ?? 0, step);
  const fine = between(from, to - 1);
  const swingMinutes = swingOf(fine, input);
  const wideHalf = Math.max(WIDE_HALF_MINUTES, swingMinutes ?? 0);
  return {
    record,
    scatter,
    marks,
    start,
    shutOff,
    from,
    to,
    fine,
    steady: swingMinutes === null ? fine : curveOf(fine, swingMinutes / 2, step),
    wide: curveOf(fine, wideHalf, step),
    fineError,
    after: to < n ? between(to - 1, n - 1) : null,
    swingMinutes,
  };
}

/** Stoking swings like this where the record does not show it better, minutes (common practice, no source). */
const STOKING_SWING = 8;

/** The period of a record that swings regularly; a kiln fired with wood always does. */
function swingOf(fine: Curve, input: FiringInput): number | null {
  return swingPeriod(fine) ?? (input.fuel === 'wood' ? STOKING_SWING : null);
}

/** Standard error of the mean of a minute's readings, °C; of one where there are fewer. */
function errorOfLevel({ noiseCelsius, readingsPerMinute }: Scatter): number {
  return noiseCelsius / Math.sqrt(readingsPerMinute + 1);
}

/** Index of the first value at or after a minute. */
export function indexAtOrAfter(minutes: Float64Array, minute: number): number {
  let low = 0;
  let high = minutes.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((minutes[middle] ?? 0) < minute) low = middle + 1;
    else high = middle;
  }
  return low;
}
