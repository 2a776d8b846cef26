import type { CleanReadings } from './clean-readings.ts';
import type { Corners } from './straight-stretches.ts';

/** The course of a firing at even steps. */
export interface Curve {
  readonly minutes: Float64Array;
  readonly celsius: Float64Array;
  /** °C/min. */
  readonly rates: Float64Array;
  readonly stepMinutes: number;
  /** Half width of the window its rates were taken over; 0 where they are those of the moment. */
  readonly halfMinutes: number;
}

/** An eighth of a minute, and coarser for records over eight hours, so that work stays bounded. */
const STEP_MINUTES = 1 / 8;
const MOST_STEPS = 4000;
/** Fewer readings in a window give no better line than the readings themselves. */
const FEWEST_IN_WINDOW = 3;

/** The step of a record's curves. */
export function stepFor(spanMinutes: number): number {
  return Math.max(STEP_MINUTES, spanMinutes / MOST_STEPS);
}

/** The course along its corners, from one minute to another. */
export function curveAlong(
  corners: Corners,
  fromMinute: number,
  toMinute: number,
  stepMinutes: number,
): Curve {
  const t = corners.minutes;
  const y = corners.celsius;
  const span = Math.max(0, toMinute - fromMinute);
  const steps = Math.max(1, Math.ceil(span / stepMinutes - 1e-9) + 1);
  const minutes = new Float64Array(steps);
  const celsius = new Float64Array(steps);
  const rates = new Float64Array(steps);
  let c = 0;
  for (let i = 0; i < steps; i += 1) {
    const at = Math.min(fromMinute + i * stepMinutes, fromMinute + span);
    while (c < t.length - 2 && (t[c + 1] ?? Infinity) <= at) c += 1;
    const t0 = t[c] ?? 0;
    const y0 = y[c] ?? 0;
    const run = (t[c + 1] ?? t0) - t0;
    const rate = run > 0 ? ((y[c + 1] ?? y0) - y0) / run : 0;
    minutes[i] = at;
    celsius[i] = y0 + rate * (at - t0);
    rates[i] = rate;
  }
  return { minutes, celsius, rates, stepMinutes, halfMinutes: 0 };
}

/**
 * Local straight-line regression about every step: value and rate over ± half minutes, or, where a
 * window holds fewer than three readings, along the straight line between the two around it.
 */
export function curveOf(
  record: Pick<CleanReadings, 'minutes' | 'celsius'>,
  halfMinutes: number,
  stepMinutes: number,
  from = 0,
  to = record.minutes.length,
): Curve {
  const t = record.minutes;
  const y = record.celsius;
  const first = t[from] ?? 0;
  const span = (t[to - 1] ?? first) - first;
  const steps = Math.max(1, Math.ceil(span / stepMinutes - 1e-9) + 1);
  const minutes = new Float64Array(steps);
  const celsius = new Float64Array(steps);
  const rates = new Float64Array(steps);
  const window = slidingWindow(t, y, from);
  let segment = from;
  for (let i = 0; i < steps; i += 1) {
    const at = Math.min(first + i * stepMinutes, first + span);
    minutes[i] = at;
    window.moveTo(at, halfMinutes, to);
    while (segment < to - 2 && (t[segment + 1] ?? 0) <= at) segment += 1;
    const line = window.lineAt(at);
    if (halfMinutes > 0 && line !== null) {
      celsius[i] = line.value;
      rates[i] = line.rate;
      continue;
    }
    const t0 = t[segment] ?? 0;
    const y0 = y[segment] ?? 0;
    const run = (t[segment + 1] ?? t0) - t0;
    const rate = to - from > 1 && run > 0 ? ((y[segment + 1] ?? y0) - y0) / run : 0;
    celsius[i] = y0 + rate * (at - t0);
    rates[i] = rate;
  }
  return { minutes, celsius, rates, stepMinutes, halfMinutes };
}

interface WindowLine {
  readonly value: number;
  readonly rate: number;
}
interface SlidingWindow {
  readonly moveTo: (at: number, half: number, to: number) => void;
  /** The regression line at a moment; null with fewer than three readings in the window. */
  readonly lineAt: (at: number) => WindowLine | null;
}

/**
 * Running sums of a sliding window, kept about an origin that follows the window, so that they lose
 * no digits. Every reading enters and leaves once: linear in readings and steps.
 */
function slidingWindow(t: Float64Array, y: Float64Array, from: number): SlidingWindow {
  let low = from;
  let high = from;
  let origin = t[from] ?? 0;
  let level = y[from] ?? 0;
  let n = 0;
  let st = 0;
  let sy = 0;
  let stt = 0;
  let sty = 0;
  const add = (i: number, sign: 1 | -1): void => {
    const dt = (t[i] ?? 0) - origin;
    const dy = (y[i] ?? 0) - level;
    n += sign;
    st += sign * dt;
    sy += sign * dy;
    stt += sign * dt * dt;
    sty += sign * dt * dy;
  };
  const moveOrigin = (at: number): void => {
    origin = at;
    level = y[low] ?? level;
    n = 0;
    st = 0;
    sy = 0;
    stt = 0;
    sty = 0;
    for (let i = low; i < high; i += 1) add(i, 1);
  };
  return {
    moveTo(at, half, to) {
      const edge = 1e-9;
      while (high < to && (t[high] ?? 0) <= at + half + edge) {
        add(high, 1);
        high += 1;
      }
      while (low < high && (t[low] ?? 0) < at - half - edge) {
        add(low, -1);
        low += 1;
      }
      if (Math.abs(at - origin) > 2 * half) moveOrigin(at);
    },
    lineAt(at) {
      if (n < FEWEST_IN_WINDOW) return null;
      const meanT = st / n;
      const meanY = sy / n;
      const spread = stt - st * meanT;
      if (!(spread > 1e-12)) return null;
      const rate = (sty - st * meanY) / spread;
      const value = level + meanY + rate * (at - origin - meanT);
      return Number.isFinite(value) ? { value, rate } : null;
    },
  };
}

/** Index of the last step at or before a minute. */
export function stepAt(curve: Curve, minute: number): number {
  const first = curve.minutes[0] ?? 0;
  const index = Math.floor((minute - first) / curve.stepMinutes + 1e-9);
  return Math.max(0, Math.min(curve.minutes.length - 1, index));
}

/** Value of the curve at a minute, linear between steps, the ends beyond them. */
export function valueAt(curve: Curve, minute: number): number {
  const i = stepAt(curve, minute);
  const low = curve.celsius[i] ?? 0;
  const next = curve.celsius[i + 1];
  if (next === undefined) return low;
  const t0 = curve.minutes[i] ?? 0;
  const share = (minute - t0) / ((curve.minutes[i + 1] ?? t0) - t0);
  return low + Math.min(1, Math.max(0, share)) * (next - low);
}

/**
 * First minute at or after `fromMinute` at which the curve stands at or above a level, linear
 * between steps; null if never.
 */
export function firstAtOrAbove(curve: Curve, level: number, fromMinute = -Infinity): number | null {
  const start = Math.max(0, fromMinute === -Infinity ? 0 : stepAt(curve, fromMinute));
  for (let i = start; i < curve.minutes.length; i += 1) {
    const at = curve.minutes[i] ?? 0;
    const value = curve.celsius[i] ?? 0;
    if (at < fromMinute || value < level) continue;
    const before = curve.celsius[i - 1];
    if (before === undefined || before >= level) return Math.max(at, fromMinute);
    const t0 = curve.minutes[i - 1] ?? at;
    const crossing = t0 + ((level - before) / (value - before)) * (at - t0);
    return Math.max(crossing, fromMinute);
  }
  return null;
}
