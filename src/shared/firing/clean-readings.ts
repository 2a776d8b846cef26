import {
  FARTHEST_MINUTE,
  HIGHEST_CELSIUS,
  LOWEST_CELSIUS,
  SAME_MOMENT,
  WILD_CELSIUS,
  WILD_MINUTES,
  WILD_RATE,
} from './constants.ts';
import { neighbourNoise } from './scatter.ts';
import type { Reading } from './types.ts';

/** Readings in order of time, one a moment, wild ones set aside; two columns of equal length. */
export interface CleanReadings {
  readonly minutes: Float64Array;
  readonly celsius: Float64Array;
  readonly outsideCount: number;
  readonly wildCount: number;
  readonly repeatedCount: number;
  readonly wasUnordered: boolean;
}

/** More readings in a row than this are no single wild reading but another story. */
const LONGEST_WILD_RUN = 5;

/** Puts a record in order. Linear but for the sorting; nothing is invented. */
export function cleanReadings(readings: readonly Reading[]): CleanReadings {
  const inside: Reading[] = [];
  let outsideCount = 0;
  let wasUnordered = false;
  let last = -Infinity;
  for (const reading of readings) {
    const usable =
      Math.abs(reading.minute) <= FARTHEST_MINUTE &&
      reading.celsius >= LOWEST_CELSIUS &&
      reading.celsius <= HIGHEST_CELSIUS;
    if (!usable) {
      outsideCount += 1;
      continue;
    }
    if (reading.minute < last) wasUnordered = true;
    last = reading.minute;
    inside.push(reading);
  }
  if (wasUnordered) inside.sort((a, b) => a.minute - b.minute);

  const minutes = new Float64Array(inside.length);
  const celsius = new Float64Array(inside.length);
  let count = 0;
  for (let from = 0; from < inside.length;) {
    const minute = inside[from]?.minute ?? 0;
    let to = from;
    let sum = 0;
    while (to < inside.length && (inside[to]?.minute ?? Infinity) - minute < SAME_MOMENT) {
      sum += inside[to]?.celsius ?? 0;
      to += 1;
    }
    minutes[count] = minute;
    celsius[count] = sum / (to - from);
    count += 1;
    from = to;
  }
  const repeatedCount = inside.length - count;
  const kept = withoutWild(minutes.subarray(0, count), celsius.subarray(0, count));
  return {
    minutes: kept.minutes,
    celsius: kept.celsius,
    outsideCount,
    wildCount: count - kept.minutes.length,
    repeatedCount,
    wasUnordered,
  };
}

/**
 * Drops short runs that jump away from the course and back faster than a kiln can: in and out at
 * over WILD_RATE, in opposite directions, with the course going on where it was.
 */
function withoutWild(
  minutes: Float64Array,
  celsius: Float64Array,
): { minutes: Float64Array; celsius: Float64Array } {
  const n = minutes.length;
  const least = Math.max(WILD_CELSIUS, 6 * neighbourNoise(minutes, celsius));
  const keptMinutes = new Float64Array(n);
  const keptCelsius = new Float64Array(n);
  let count = 0;
  for (let i = 0; i < n;) {
    const run =
      count === 0 ? 0 : wildRun(minutes, celsius, i, least, keptMinutes, keptCelsius, count);
    if (run > 0) {
      i += run;
      continue;
    }
    keptMinutes[count] = minutes[i] ?? 0;
    keptCelsius[count] = celsius[i] ?? 0;
    count += 1;
    i += 1;
  }
  return { minutes: keptMinutes.slice(0, count), celsius: keptCelsius.slice(0, count) };
}

/** Length of the wild run that begins at i, after the last kept reading; 0 for none. */
function wildRun(
  minutes: Float64Array,
  celsius: Float64Array,
  i: number,
  least: number,
  keptMinutes: Float64Array,
  keptCelsius: Float64Array,
  count: number,
): number {
  const before = keptCelsius[count - 1] ?? 0;
  const beforeMinute = keptMinutes[count - 1] ?? 0;
  const jump = (celsius[i] ?? 0) - before;
  const minute = minutes[i] ?? 0;
  if (Math.abs(jump) < least || Math.abs(jump) < WILD_RATE * (minute - beforeMinute)) return 0;
  const up = jump > 0;
  for (let length = 1; length <= LONGEST_WILD_RUN && i + length < minutes.length; length += 1) {
    const lastWild = celsius[i + length - 1] ?? 0;
    if (Math.abs(lastWild - before) < least || lastWild > before !== up) return 0;
    const after = celsius[i + length] ?? 0;
    const afterMinute = minutes[i + length] ?? 0;
    if (afterMinute - beforeMinute > WILD_MINUTES + 2 * (minute - beforeMinute)) return 0;
    const back = after - lastWild;
    const step = afterMinute - (minutes[i + length - 1] ?? 0);
    const returns = back > 0 !== up && Math.abs(back) >= WILD_RATE * step;
    if (returns && Math.abs(after - before) <= Math.min(Math.abs(jump), Math.abs(back)) / 2) {
      return length;
    }
  }
  return 0;
}
