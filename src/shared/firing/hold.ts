import {
  HOLD_BAND,
  HOLD_ENDS,
  HOLD_ENDS_PER_MINUTE,
  HOLD_MINUTES,
  HOLD_OFF_AIM,
} from './constants.ts';
import { confidenceOf } from './confidence.ts';
import type { Course } from './course.ts';
import { indexAtOrAfter } from './course.ts';
import { firstAtOrAbove } from './curve.ts';
import type { Hold } from './types.ts';

/** Finest step of the running median, °C. */
const BIN = 0.1;
/** Farther from the aim no value can belong to a hold. */
const REACH = HOLD_BAND + HOLD_OFF_AIM;
/** The ends of a line through n readings lie apart by √(8 ÷ n) of their scatter by chance: half of that is let pass. */
const ENDS_VARIANCE = 2;
/** A search over more moments than this is no more exact. */
const MOST_MOMENTS = 600;

/**
 * The hold: after first coming within 15 °C of the aim and before shut-off, the longest stretch of
 * at least 2 min within ±10 °C of its own median, that within ±15 °C of the aim, its ends apart by
 * no more than max(3 °C, 0.5 °C × its minutes).
 * @param hasAim false when `aim` is only the peak standing in for an unknown target
 */
export function holdOf(course: Course, aim: number, hasAim: boolean): Hold | null {
  const { steady: fine } = course;
  const near = firstAtOrAbove(fine, aim - HOLD_OFF_AIM);
  if (near === null) return null;
  const first = fine.minutes.findIndex((minute) => minute >= near - 1e-9);
  const stride = Math.max(1, Math.ceil((fine.minutes.length - first) / MOST_MOMENTS));
  const minutes: number[] = [];
  const celsius: number[] = [];
  for (let i = first; i < fine.minutes.length; i += stride) {
    minutes.push(fine.minutes[i] ?? 0);
    celsius.push(fine.celsius[i] ?? 0);
  }
  const { noiseCelsius, readingsPerMinute } = course.scatter;
  const best = longest(
    minutes,
    celsius,
    aim,
    (length) => noiseCelsius * Math.sqrt(ENDS_VARIANCE / (1 + length * readingsPerMinute)),
  );
  if (best === null) return null;
  const fromMinute = minutes[best.from] ?? 0;
  const toMinute = minutes[best.to] ?? 0;
  return {
    fromMinute,
    toMinute,
    minutes: toMinute - fromMinute,
    levelCelsius: best.median,
    offAimCelsius: hasAim ? best.median - aim : null,
    sdCelsius: spreadOf(course, fromMinute, toMinute, best.median),
    confidence: confidenceOf(course, fromMinute, toMinute, HOLD_BAND),
  };
}

interface Stretch {
  readonly from: number;
  readonly to: number;
  readonly median: number;
}

function longest(
  minutes: readonly number[],
  celsius: readonly number[],
  aim: number,
  slack: (length: number) => number,
): Stretch | null {
  const n = minutes.length;
  let best: Stretch | null = null;
  let bestMinutes = HOLD_MINUTES - 1e-6;
  for (let from = 0; from < n; from += 1) {
    const t0 = minutes[from] ?? 0;
    if ((minutes[n - 1] ?? 0) - t0 <= bestMinutes) break;
    const y0 = celsius[from] ?? 0;
    const middle = runningMedian(aim - REACH);
    let low = y0;
    let high = y0;
    for (let to = from; to < n; to += 1) {
      const y = celsius[to] ?? 0;
      low = Math.min(low, y);
      high = Math.max(high, y);
      if (Math.abs(y - aim) > REACH || high - low > 2 * HOLD_BAND) break;
      const median = middle(y);
      const length = (minutes[to] ?? 0) - t0;
      const isHold =
        length > bestMinutes &&
        Math.abs(median - aim) <= HOLD_OFF_AIM &&
        high - median <= HOLD_BAND &&
        median - low <= HOLD_BAND &&
        Math.abs(y - y0) <= Math.max(HOLD_ENDS, HOLD_ENDS_PER_MINUTE * length) + slack(length);
      if (isHold) {
        best = { from, to, median };
        bestMinutes = length;
      }
    }
  }
  return best;
}

/** Median of what was given so far, to a tenth of a degree, from counts: each step costs little. */
function runningMedian(lowest: number): (value: number) => number {
  const counts = new Uint32Array(Math.ceil((2 * REACH) / BIN) + 2);
  let total = 0;
  let bin = 0;
  let below = 0;
  return (value) => {
    const added = Math.min(counts.length - 1, Math.max(0, Math.round((value - lowest) / BIN)));
    counts[added] = (counts[added] ?? 0) + 1;
    total += 1;
    if (total === 1) bin = added;
    else if (added < bin) below += 1;
    const half = total / 2;
    while (below > half && bin > 0) {
      bin -= 1;
      below -= counts[bin] ?? 0;
    }
    while (below + (counts[bin] ?? 0) < half) {
      below += counts[bin] ?? 0;
      bin += 1;
    }
    return lowest + bin * BIN;
  };
}

/** Standard deviation of the readings about the hold's level, °C. */
function spreadOf(course: Course, from: number, to: number, level: number): number {
  const { minutes, celsius } = course.record;
  let n = 0;
  let sum = 0;
  for (let i = indexAtOrAfter(minutes, from - 1e-9); i < course.to; i += 1) {
    if ((minutes[i] ?? 0) > to + 1e-9) break;
    sum += ((celsius[i] ?? 0) - level) ** 2;
    n += 1;
  }
  return n > 1 ? Math.sqrt(sum / (n - 1)) : 0;
}
