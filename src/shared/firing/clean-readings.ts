import {
  FARTHEST_MINUTE,
  HIGHEST_CELSIUS,
  LOWEST_CELSIUS,
  COURSE_RATE,
  SAME_MOMENT,
  STUCK_MINUTES,
  WILD_CELSIUS,
  WILD_MINUTES,
  WILD_RATE,
} from './constants.ts';
import { neighbourNoise } from './scatter.ts';
import { straightLine } from './straight-line.ts';
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
  const kept = rareOnly(minutes.subarray(0, count), celsius.subarray(0, count));
  return {
    minutes: kept.minutes,
    celsius: kept.celsius,
    outsideCount,
    wildCount: count - kept.minutes.length,
    repeatedCount,
    wasUnordered,
  };
}

/** Wild readings are rare: where more than this share were, it is the record's own scatter. */
const RARE = 0.03;
const TRIES = 4;

function rareOnly(minutes: Float64Array, celsius: Float64Array): Columns {
  let least = Math.max(WILD_CELSIUS, 6 * neighbourNoise(minutes, celsius));
  let kept = withoutWild({ minutes, celsius, least });
  for (let tried = 1; tried < TRIES; tried += 1) {
    if (minutes.length - kept.minutes.length <= RARE * minutes.length) break;
    least *= 2;
    kept = withoutWild({ minutes, celsius, least });
  }
  return kept;
}

interface Columns {
  readonly minutes: Float64Array;
  readonly celsius: Float64Array;
}

/**
 * Sets aside what a probe shows that is pulled out, torn off or touched: runs that jump away from the
 * course faster than a kiln can, and jump back to it as fast, and a first or last run that jumps so
 * and then stays put.
 */
function withoutWild(record: Jumpy): Columns {
  const { minutes, celsius } = record;
  const n = minutes.length;
  const keptMinutes = new Float64Array(n);
  const keptCelsius = new Float64Array(n);
  let count = 0;
  for (let i = wildHead(record); i < n;) {
    const isAlone = count >= 2 && isOutOfLine(record, i, keptMinutes, keptCelsius, count);
    const run = isAlone ? 1 : count === 0 ? 0 : wildRun(record, i, keptMinutes, keptCelsius, count);
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

interface Jumpy extends Columns {
  /** A change smaller than this is scatter, °C. */
  readonly least: number;
}

/** Length of the wild run that begins at i, after the last kept reading; 0 for none. */
function wildRun(
  { minutes, celsius, least }: Jumpy,
  i: number,
  keptMinutes: Float64Array,
  keptCelsius: Float64Array,
  count: number,
): number {
  const before = keptCelsius[count - 1] ?? 0;
  const beforeMinute = keptMinutes[count - 1] ?? 0;
  const jump = (celsius[i] ?? 0) - before;
  const firstStep = (minutes[i] ?? 0) - beforeMinute;
  if (Math.abs(jump) < least || Math.abs(jump) < WILD_RATE * firstStep) return 0;
  for (let to = i + 1; to < minutes.length; to += 1) {
    const lastWild = celsius[to - 1] ?? 0;
    const after = celsius[to] ?? 0;
    const away = (minutes[to] ?? 0) - beforeMinute;
    const isStuck = lastWild === celsius[i];
    if (away > (isStuck ? STUCK_MINUTES : WILD_MINUTES) + 2 * firstStep) return 0;
    const strays = Math.abs(after - before);
    if (strays > Math.min(Math.abs(jump) / 2, least + COURSE_RATE * away)) continue;
    const step = (minutes[to] ?? 0) - (minutes[to - 1] ?? 0);
    const back = Math.abs(after - lastWild);
    return back >= least && back >= WILD_RATE * step ? to - i : 0;
  }
  return isOpenCircuit(celsius, i) ? minutes.length - i : 0;
}

/** Neighbours further apart than this say nothing of the reading between them, minutes. */
const NEAR_MINUTES = 5;
/** How far off the line of its neighbours a reading must be, as a multiple of what they are off. */
const OUT_OF_LINE = 4;

/** A single reading far off the line on which the two before and the two after it lie. */
function isOutOfLine(
  { minutes, celsius, least }: Jumpy,
  i: number,
  keptMinutes: Float64Array,
  keptCelsius: Float64Array,
  count: number,
): boolean {
  const before = keptCelsius[count - 1] ?? 0;
  const own = celsius[i] ?? 0;
  const after = celsius[i + 1] ?? own;
  if (Math.min(Math.abs(own - before), Math.abs(own - after)) < least / 2) return false;
  if (i + 2 >= minutes.length) return false;
  const t = [
    keptMinutes[count - 2] ?? 0,
    keptMinutes[count - 1] ?? 0,
    minutes[i + 1] ?? 0,
    minutes[i + 2] ?? 0,
  ];
  const y = [keptCelsius[count - 2] ?? 0, before, after, celsius[i + 2] ?? 0];
  if ((t[3] ?? 0) - (t[0] ?? 0) > 4 * NEAR_MINUTES) return false;
  const line = straightLine(t, y);
  if (line === null) return false;
  const on = (minute: number) => line.intercept + line.slope * minute;
  const worst = t.reduce(
    (most, minute, k) => Math.max(most, Math.abs((y[k] ?? 0) - on(minute))),
    0,
  );
  return Math.abs(own - on(minutes[i] ?? 0)) > Math.max(1.6 * least, OUT_OF_LINE * worst);
}

/** To the record's end nothing but one value: no kiln cools or burns like that. */
function isOpenCircuit(celsius: Float64Array, from: number): boolean {
  if (celsius.length - from < 2) return (celsius[from] ?? 0) > (celsius[from - 1] ?? 0);
  return celsius.subarray(from).every((value) => value === celsius[from]);
}

/** How many readings stand at the beginning, at one value, before the probe is heard at all. */
function wildHead({ minutes, celsius, least }: Jumpy): number {
  let to = 1;
  while (to < celsius.length && celsius[to] === celsius[0]) to += 1;
  if (to >= celsius.length / 2) return 0;
  const jump = Math.abs((celsius[to] ?? 0) - (celsius[0] ?? 0));
  const step = (minutes[to] ?? 0) - (minutes[to - 1] ?? 0);
  return jump >= least && jump >= WILD_RATE * step ? to : 0;
}
