import type { CleanReadings } from './clean-readings.ts';
import { cleanReadings } from './clean-readings.ts';
import {
  FARTHEST_MINUTE,
  FEWEST_READINGS,
  FINE_HALF_MINUTES,
  WIDE_HALF_MINUTES,
} from './constants.ts';
import type { Curve } from './curve.ts';
import { curveOf, errorOf, halfWidthFor, stepFor } from './curve.ts';
import type { Scatter } from './scatter.ts';
import { scatterOf } from './scatter.ts';
import { shutOffOf } from './shut-off.ts';
import type { Moment } from './start.ts';
import { startOf } from './start.ts';
import { swingPeriod } from './swing.ts';
import type { FiringInput, Mark } from './types.ts';

/**
 * A record made ready to be read: its curves cut at the start and the end of the firing, so that no
 * window mixes burning with cooling. All three curves of the firing share their steps.
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
  /** Rates as told apart from noise over ±2.5 min. */
  readonly wide: Curve;
  /** Rates over the narrowest window that this record's noise allows. */
  readonly narrow: Curve;
  /** Levels. */
  readonly fine: Curve;
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

  const levelHalf = levelHalfFor(scatter);
  const rateHalf = halfWidthFor('rate', WIDE_HALF_MINUTES, scatter);
  const wholeFine = curveOf(record, levelHalf, step);
  const levelError = errorOf('level', levelHalf, scatter.noiseCelsius, scatter.readingsPerMinute);
  const start = startOf(curveOf(record, rateHalf, step), wholeFine, levelError, marks);
  const shutOff = shutOffOf(wholeFine, levelError, record.minutes, start.minute, marks);

  let from = indexAtOrAfter(record.minutes, start.minute - 1e-9);
  let to = indexAtOrAfter(record.minutes, shutOff.minute + 1e-9);
  if (to - from < 2) {
    from = 0;
    to = n;
  }
  const cut = (half: number) => curveOf(record, half, step, from, to);
  const swingMinutes = swingPeriod(cut(Math.max(levelHalf, FINE_HALF_MINUTES)));
  const fineHalf = swingMinutes === null ? levelHalf : Math.max(levelHalf, swingMinutes / 2);
  return {
    record,
    scatter,
    marks,
    start,
    shutOff,
    from,
    to,
    wide: cut(Math.max(WIDE_HALF_MINUTES, swingMinutes ?? 0)),
    narrow: cut(Math.max(rateHalf, swingMinutes ?? 0)),
    fine: cut(fineHalf),
    fineError: errorOf('level', fineHalf, scatter.noiseCelsius, scatter.readingsPerMinute),
    after: n - to >= 1 && to < n ? curveOf(record, levelHalf, step, Math.max(0, to - 1), n) : null,
    swingMinutes,
  };
}

/** None where single readings are good enough; half a minute; wider only for few noisy readings. */
function levelHalfFor(scatter: Scatter): number {
  const half = halfWidthFor('level', WIDE_HALF_MINUTES, scatter);
  return half === 0 ? 0 : Math.max(FINE_HALF_MINUTES, half);
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
