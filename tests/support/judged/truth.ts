import { STEP_MINUTES } from './kiln.ts';
import type { Course } from './kiln.ts';

/**
 * The definitions of a firing applied word for word to a noise-free course, plainly and slowly. It
 * shares no code with the reader it judges, not even its constants.
 */
export interface Truth {
  readonly startMinute: number;
  readonly reachedMinute: number | null;
  readonly pace: number | null;
  readonly levels: readonly TrueLevel[];
  readonly sags: readonly {
    readonly from: number;
    readonly to: number;
    readonly drop: number;
    readonly doubtful: boolean;
  }[];
  readonly hold: { readonly minutes: number; readonly level: number } | null;
  readonly crossings: readonly { readonly minutes: number }[];
}
export interface TrueLevel {
  readonly kind: 'approach' | 'hold' | 'just-short' | 'warm-up' | 'pause' | 'stall';
  readonly from: number;
  readonly to: number;
  readonly level: number;
  /** So near a limit of the definition that finding it and not finding it are both right. */
  readonly doubtful: boolean;
}

/** Minutes over which a rate is taken of a course without noise: an eighth of a minute. */
const RATE_STEPS = 8;

/**
 * @param aim °C
 * @param smoothMinutes half width of the straight line for courses that swing (gusts, stoking); 0 for none
 */
export function truthOf(course: Course, aim: number, smoothMinutes: number): Truth {
  const end = Math.round(course.shutOffMinute / STEP_MINUTES);
  const from = Math.round(course.litMinute / STEP_MINUTES);
  const y = course.celsius;
  const level = smoothMinutes > 0 ? smooth(y, smoothMinutes > 3 ? smoothMinutes / 2 : 0.5, end) : y;
  const rate = new Float64Array(end + 1);
  const lines = smoothMinutes > 0 ? slopes(y, smoothMinutes, end) : null;
  for (let i = from; i <= end; i += 1) {
    const a = Math.max(from, i - RATE_STEPS);
    const b = Math.min(end, i + RATE_STEPS);
    rate[i] = lines === null ? (y[b]! - y[a]!) / ((b - a) * STEP_MINUTES) : lines[i]!;
  }
  const firing = { y: level, rate, from, end, aim };
  const raw = { ...firing, y };
  const pace = paceOf(raw);
  const reached = first(y, from, end, aim - 5);
  return {
    startMinute: course.litMinute,
    reachedMinute: reached === null ? null : reached * STEP_MINUTES,
    pace,
    levels: levelsOf(firing, pace, 1, 1).map((one) => ({ ...one, doubtful: false })),
    sags: sagsOf(firing, course),
    hold: holdOf(firing),
    crossings: crossingsOf(raw),
  };
}

/** Stretches found when the limits are taken wider: what is only there then is doubtful. */
export function doubtfulLevels(course: Course, aim: number, smoothMinutes: number): TrueLevel[] {
  const end = Math.round(course.shutOffMinute / STEP_MINUTES);
  const from = Math.round(course.litMinute / STEP_MINUTES);
  const y = course.celsius;
  const level = smoothMinutes > 0 ? smooth(y, smoothMinutes > 3 ? smoothMinutes / 2 : 0.5, end) : y;
  const lines = slopes(y, smoothMinutes > 0 ? smoothMinutes : 0.25, end);
  const firing = { y: level, rate: lines, from, end, aim };
  const pace = paceOf({ ...firing, y });
  const strict = levelsOf(firing, pace, 0.75, 1.3);
  return levelsOf(firing, pace, 1.25, 0.8)
    .filter((wide) => !strict.some((sure) => sure.from < wide.to && sure.to > wide.from))
    .map((one) => ({ ...one, doubtful: true }));
}

interface Firing {
  readonly y: Float64Array;
  readonly rate: Float64Array;
  readonly from: number;
  readonly end: number;
  readonly aim: number;
}

function first(y: Float64Array, from: number, end: number, celsius: number): number | null {
  for (let i = from; i <= end; i += 1) if (y[i]! >= celsius) return i;
  return null;
}

function paceOf({ y, from, end }: Firing): number | null {
  let peak = -Infinity;
  for (let i = from; i <= end; i += 1) peak = Math.max(peak, y[i]!);
  const paces: number[] = [];
  let low = Math.max(150, y[from]!);
  for (; low + 25 <= peak - 25; low += 25) {
    const a = first(y, from, end, low);
    const b = first(y, from, end, low + 25);
    if (a !== null && b !== null && b > a) paces.push(25 / ((b - a) * STEP_MINUTES));
  }
  return paces.length === 0 ? null : medianOf(paces);
}

function medianOf(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const middle = Math.floor(sorted.length / 2);
  return sorted.length % 2 === 1 ? sorted[middle]! : (sorted[middle - 1]! + sorted[middle]!) / 2;
}

function levelsOf(
  firing: Firing,
  pace: number | null,
  rateShare: number,
  lengthShare: number,
): Omit<TrueLevel, 'doubtful'>[] {
  const { y, rate, from, end, aim } = firing;
  const limit = rateShare * Math.min(2, pace === null ? 2 : pace / 4);
  const shortest = lengthShare * Math.max(5, pace === null ? 0 : 20 / pace);
  const runs: { from: number; to: number }[] = [];
  for (let i = from; i <= end; i += 1) {
    if (Math.abs(rate[i]!) > limit) continue;
    let to = i;
    while (to < end && Math.abs(rate[to + 1]!) <= limit) to += 1;
    const last = runs[runs.length - 1];
    const isOne =
      last !== undefined && (i - last.to) * STEP_MINUTES < 2 && Math.abs(y[i]! - y[last.to]!) < 10;
    if (isOne) last.to = to;
    else runs.push({ from: i, to });
    i = to;
  }
  return runs
    .filter((run) => (run.to - run.from) * STEP_MINUTES >= shortest)
    .filter((run) => y[run.to]! > y[run.from]! - 15)
    .map((run) => {
      const level = medianOf(Array.from(y.subarray(run.from, run.to + 1)));
      const endLevel = y[run.to]!;
      const reachedAfter = first(y, run.to, end, aim - 5);
      const later = (celsius: number) => first(y, run.to, end, celsius) !== null;
      let kind: TrueLevel['kind'];
      if (
        endLevel >= aim - 5 ||
        (reachedAfter !== null && reachedAfter <= run.to + 2 / STEP_MINUTES)
      ) {
        kind = level >= aim - 15 ? 'hold' : 'approach';
      } else if (endLevel >= aim - 15 && reachedAfter === null) kind = 'just-short';
      else if (level < 350) kind = 'warm-up';
      else if (level < 600 && later(level + 50)) kind = 'pause';
      else kind = 'stall';
      return { kind, from: run.from * STEP_MINUTES, to: run.to * STEP_MINUTES, level };
    });
}

function sagsOf({ y, from, end, aim }: Firing, course: Course): Truth['sags'][number][] {
  const found: Truth['sags'][number][] = [];
  let top = from;
  while (top < end) {
    while (top < end && y[top + 1]! >= y[top]!) top += 1;
    let bottom = top;
    for (let i = top; i <= end && y[i]! <= y[top]!; i += 1) {
      if (y[i]! < y[bottom]!) bottom = i;
      if (y[i]! > y[bottom]! + 8) break;
    }
    if (bottom === top) {
      top += 1;
      continue;
    }
    const drop = y[top]! - y[bottom]!;
    const minutes = (bottom - top) * STEP_MINUTES;
    const at = top * STEP_MINUTES;
    const explained = course.outs.some((out) => at >= out.from - 0.5 && at <= out.to);
    const fits = (share: number) =>
      drop >= 15 * share &&
      minutes >= 3 * share &&
      drop / minutes <= 10 / share &&
      y[top]! >= 350 * share;
    if (!explained && y[top]! < aim - 15 && fits(0.8)) {
      found.push({
        from: at,
        to: bottom * STEP_MINUTES,
        drop,
        doubtful: !fits(1.2) || y[top]! > aim - 20,
      });
    }
    top = bottom;
  }
  return found;
}

function holdOf({ y, from, end, aim }: Firing): Truth['hold'] {
  const near = first(y, from, end, aim - 15);
  if (near === null) return null;
  const stride = Math.max(6, Math.round((end - near) / 250));
  const at: number[] = [];
  for (let i = near; i <= end; i += stride) at.push(i);
  let best: Truth['hold'] = null;
  for (let a = 0; a < at.length; a += 1) {
    for (let b = at.length - 1; b > a; b -= 1) {
      const minutes = (at[b]! - at[a]!) * STEP_MINUTES;
      if (minutes < 2 || minutes <= (best?.minutes ?? 0)) break;
      const values = at.slice(a, b + 1).map((i) => y[i]!);
      if (Math.abs(y[at[b]!]! - y[at[a]!]!) > Math.max(3, 0.5 * minutes)) continue;
      const level = medianOf(values);
      if (Math.abs(level - aim) > 15) continue;
      if (values.some((value) => Math.abs(value - level) > 10)) continue;
      best = { minutes, level };
    }
  }
  return best;
}

function crossingsOf({ y, from, end }: Firing): { minutes: number }[] {
  const found: { minutes: number }[] = [];
  let begun: number | null = null;
  for (let i = from + 1; i <= end; i += 1) {
    if (y[i - 1]! < 550 && y[i]! >= 550) begun = i;
    if (begun !== null && y[i]! >= 600) {
      found.push({ minutes: (i - begun) * STEP_MINUTES });
      begun = null;
    }
  }
  return found;
}

/** Straight-line slope over ±half minutes about every step, by running sums. */
function slopes(y: Float64Array, halfMinutes: number, end: number): Float64Array {
  return lines(y, halfMinutes, end).slopes;
}
function smooth(y: Float64Array, halfMinutes: number, end: number): Float64Array {
  return lines(y, halfMinutes, end).values;
}
function lines(
  y: Float64Array,
  halfMinutes: number,
  end: number,
): { slopes: Float64Array; values: Float64Array } {
  const half = Math.max(1, Math.round(halfMinutes / STEP_MINUTES));
  const slopesOut = new Float64Array(end + 1);
  const values = new Float64Array(end + 1);
  const sum = new Float64Array(end + 2);
  const moment = new Float64Array(end + 2);
  for (let i = 0; i <= end; i += 1) {
    sum[i + 1] = sum[i]! + y[i]!;
    moment[i + 1] = moment[i]! + i * y[i]!;
  }
  for (let i = 0; i <= end; i += 1) {
    const a = Math.max(0, i - half);
    const b = Math.min(end, i + half);
    const n = b - a + 1;
    const mean = (a + b) / 2;
    const sy = sum[b + 1]! - sum[a]!;
    const sxy = moment[b + 1]! - moment[a]! - mean * sy;
    const sxx = (n * (n * n - 1)) / 12;
    const slope = sxx > 0 ? sxy / sxx : 0;
    slopesOut[i] = slope / STEP_MINUTES;
    values[i] = sy / n + slope * (i - mean);
  }
  return { slopes: slopesOut, values };
}
