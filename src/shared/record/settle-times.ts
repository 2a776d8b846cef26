import type { TimeFormat } from './parse-time.ts';
import { isClock, isTimestamp } from './parse-time.ts';

export interface SettledTimes {
  /** Minutes in the order of the file, or turned round where it began with the latest. */
  readonly minutes: Float64Array;
  readonly isReversed: boolean;
  readonly assumed: readonly string[];
}

const DAY = 1440;
const HALF_DAY = 720;
const HOUR = 60;
/** A clock set by an hour comes within so many steps, or minutes, of where it would have been. */
const NEAR_STEPS = 3;
const NEAR_MINUTES = 2;
/** Of the steps between rows, so many lead back: the file begins with its latest reading. */
const REVERSED_SHARE = 0.9;

/**
 * Makes the times of a file one line of minutes: on past midnight and past twelve o'clock, over an hour
 * by which the clock was set, over a counter that began again. Each is said with its line. What else
 * runs back is left as it is, and said too.
 * @param times as they stand in the file @param lines where they stand
 */
export function settleTimes(
  times: Float64Array,
  lines: ArrayLike<number>,
  format: TimeFormat,
): SettledTimes {
  const count = times.length;
  const isReversed = runsBackwards(times);
  const minutes = isReversed ? times.slice().reverse() : times.slice();
  const lineOf = (i: number): number => lines[isReversed ? count - 1 - i : i] ?? 0;
  const step = usualStep(minutes);
  const near = Math.max(NEAR_MINUTES, NEAR_STEPS * step);
  const first = minutes[0] ?? 0;
  const isOfDay = isClock(format);
  const isLocal = isOfDay || isTimestamp(format);
  const said = new Map<string, number[]>();
  const say = (what: keyof typeof WORDS, i: number): void => {
    const known = said.get(what) ?? [];
    if (known.length === 0) said.set(what, known);
    known.push(lineOf(i));
  };
  let shift = 0;
  let repeats = 0;
  for (let i = 1; i < count; i += 1) {
    const before = minutes[i - 1] ?? 0;
    const raw = minutes[i] ?? 0;
    const rawBefore = before - shift;
    const back = rawBefore - raw;
    if (back > 0) {
      const isAtBeginning = raw - first <= 2 * step && raw >= first - step && back > 5 * step;
      const isCounter = !isLocal || (isOfDay && Math.abs(first) <= 2 * step);
      if (isCounter && isAtBeginning && !(isOfDay && rawBefore > DAY - near && rawBefore < DAY)) {
        shift = before + step - raw;
        say('restarted', i);
      } else if (isOfDay && back > HALF_DAY) {
        shift += DAY * Math.ceil((back - HALF_DAY) / DAY);
        say('midnight', i);
      } else if (
        isOfDay &&
        rawBefore >= HALF_DAY &&
        rawBefore < HALF_DAY + HOUR &&
        raw >= HOUR &&
        raw < 2 * HOUR
      ) {
        shift += HALF_DAY;
        say('twelve', i);
      } else if (isLocal && HOUR - back >= 0 && HOUR - back <= near) {
        shift += HOUR;
        say('setBack', i);
      } else say('back', i);
    } else if (isLocal && isSummerLeap(rawBefore, raw, step)) {
      shift -= HOUR;
      say('setAhead', i);
    }
    minutes[i] = raw + shift;
    if (minutes[i] === before) repeats += 1;
  }
  const assumed = isReversed
    ? ['The file begins with its latest reading; it is turned round.']
    : [];
  for (const [what, where] of said) assumed.push(WORDS[what as keyof typeof WORDS](where));
  if (repeats > 0) {
    assumed.push(`${repeats} of ${count} readings have the same time as the one before.`);
  }
  return { minutes, isReversed, assumed };
}

function at(lines: readonly number[]): string {
  const first = lines[0] ?? 0;
  return lines.length === 1
    ? `at line ${String(first)}`
    : `at line ${String(first)} and ${lines.length - 1} more`;
}

/** What is said of each thing that times do. */
const WORDS = {
  midnight: (lines: readonly number[]) =>
    `The clock begins again during the record ${at(lines)}: it went on past midnight.`,
  twelve: (lines: readonly number[]) =>
    `The clock shows twelve hours without am or pm; it is read as going on past twelve ${at(lines)}.`,
  setBack: (lines: readonly number[]) =>
    `The clock is set back by an hour ${at(lines)}; the times behind it are read as an hour later, so that the record goes on.`,
  setAhead: (lines: readonly number[]) =>
    `The clock is set ahead by an hour ${at(lines)}, as when summer time begins; the hour is taken out.`,
  restarted: (lines: readonly number[]) =>
    `The time begins again ${at(lines)}: the logger was started anew. What follows is put behind what was before, as if without a pause.`,
  back: (lines: readonly number[]) => `The time runs backwards ${at(lines)}.`,
} as const;

function runsBackwards(times: Float64Array): boolean {
  let back = 0;
  let ahead = 0;
  for (let i = 1; i < times.length; i += 1) {
    const step = (times[i] ?? 0) - (times[i - 1] ?? 0);
    if (step < 0) back += 1;
    else if (step > 0) ahead += 1;
  }
  return back >= 2 && back >= REVERSED_SHARE * (back + ahead);
}

/** The middle of the steps ahead, of a thousand at most. */
function usualStep(minutes: Float64Array): number {
  const steps: number[] = [];
  const every = Math.max(1, Math.floor(minutes.length / 1000));
  for (let i = 1; i < minutes.length; i += every) {
    const step = (minutes[i] ?? 0) - (minutes[i - 1] ?? 0);
    if (step > 0) steps.push(step);
  }
  steps.sort((a, b) => a - b);
  return steps[Math.floor(steps.length / 2)] ?? 0;
}

/** From just before one, two or three at night an hour and a step ahead, in a record of small steps. */
function isSummerLeap(before: number, now: number, step: number): boolean {
  const leap = now - before;
  if (!(step > 0 && step <= 5 && leap >= HOUR && leap <= HOUR + 2 * step)) return false;
  const ofDay = ((before % DAY) + DAY) % DAY;
  const toHour = HOUR - (ofDay % HOUR);
  const hour = Math.floor((ofDay + toHour) / HOUR);
  return toHour <= step + 1e-6 && hour >= 1 && hour <= 3;
}
