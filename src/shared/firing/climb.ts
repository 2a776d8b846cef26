import { indexAtOrAfter } from './course.ts';
import type { Course } from './course.ts';
import { strideFor } from './scatter.ts';
import { firstAtOrAbove, stepAt, valueAt } from './curve.ts';
import { quantile } from '../statistics/quantile.ts';
import { WAVERING_CELSIUS } from './constants.ts';
import type { ClimbShape, FiringReading, LevelStretch } from './types.ts';

/** The lower half climbed at least so many times as fast as the upper: racing, then creeping. */
const RACING = 2;
const THIRTY_SECONDS = 0.5;

/** Average and steepest rate from the start to the top, and the shape of the climb. */
export function climbOf(
  course: Course,
  topMinute: number,
  levels: readonly LevelStretch[],
): FiringReading['climb'] {
  const { fine, wide } = course;
  const first = fine.minutes[0] ?? 0;
  const bottom = fine.celsius[0] ?? 0;
  const top = valueAt(fine, topMinute);
  if (topMinute - first < 1 || top - bottom < 50) {
    return { averagePerMinute: null, steepestPerMinute: null, shape: null };
  }
  let steepest = 0;
  for (let i = 0; i < wide.rates.length && (wide.minutes[i] ?? 0) <= topMinute; i += 1) {
    steepest = Math.max(steepest, wide.rates[i] ?? 0);
  }
  const from = course.start.inferred ? first : Math.min(first, course.start.minute);
  return {
    averagePerMinute: (top - bottom) / (topMinute - from),
    steepestPerMinute: steepest,
    shape: shapeOf(course, topMinute, levels),
  };
}

function shapeOf(course: Course, topMinute: number, levels: readonly LevelStretch[]): ClimbShape {
  const { fine } = course;
  const isStepped = levels.some(
    (level) =>
      firstAtOrAbove(fine, level.levelCelsius + 50, level.toMinute) !== null &&
      level.toMinute < topMinute,
  );
  if (isStepped) return 'stepped';
  const first = fine.minutes[0] ?? 0;
  const bottom = fine.celsius[0] ?? 0;
  const middle = firstAtOrAbove(fine, (bottom + valueAt(fine, topMinute)) / 2) ?? topMinute;
  return topMinute - middle >= RACING * (middle - first) ? 'racing-then-creeping' : 'steady';
}

/** Steepest rate between two levels on the way up, °C/min; null when the firing climbs through neither. */
export function steepestBetween(
  course: Course,
  low: number,
  high: number,
  topMinute: number,
): number | null {
  const { fine, wide } = course;
  let steepest: number | null = null;
  for (let i = 0; i < fine.minutes.length && (fine.minutes[i] ?? 0) <= topMinute; i += 1) {
    const value = fine.celsius[i] ?? 0;
    if (value < low || value > high) continue;
    steepest = Math.max(steepest ?? 0, wide.rates[i] ?? 0);
  }
  return steepest;
}

/** Where the rate turns by more than this within the window, distance from the line is curvature, °C/min. */
const STRAIGHT_ENOUGH = 4;

/**
 * Rapid swings during the firing: 1.4826 × the median distance of readings from the ±2.5 min
 * curve where that runs straight, °C. Null when it is no more than a steady probe shows, or there are too few readings.
 */
export function waveringOf(course: Course): number | null {
  const { minutes, celsius } = course.record;
  const distances: number[] = [];
  const { wide } = course;
  const half = Math.round(wide.halfMinutes / wide.stepMinutes);
  const stride = strideFor(course.to - course.from);
  for (let i = course.from; i < course.to; i += stride) {
    const step = stepAt(wide, minutes[i] ?? 0);
    const turn = Math.abs((wide.rates[step + half] ?? Infinity) - (wide.rates[step - half] ?? 0));
    if (turn > STRAIGHT_ENOUGH) continue;
    distances.push(Math.abs((celsius[i] ?? 0) - valueAt(wide, minutes[i] ?? 0)));
  }
  const scatter = 1.4826 * (quantile(distances, 0.5) ?? 0);
  return distances.length >= 20 && scatter > WAVERING_CELSIUS ? scatter : null;
}

/** Fastest change over at least 30 s anywhere in the record, °C/min. */
export function fastestChange(course: Course): number {
  const { minutes, celsius } = course.record;
  let fastest = 0;
  let later = 0;
  for (let i = 0; i < minutes.length; i += 1) {
    while (
      later < minutes.length &&
      (minutes[later] ?? 0) - (minutes[i] ?? 0) < THIRTY_SECONDS - 1e-9
    ) {
      later += 1;
    }
    if (later >= minutes.length) break;
    const time = (minutes[later] ?? 0) - (minutes[i] ?? 0);
    fastest = Math.max(fastest, Math.abs((celsius[later] ?? 0) - (celsius[i] ?? 0)) / time);
  }
  return fastest;
}

/** Longest time without a reading between start and end of the firing, minutes. */
export function longestGap(course: Course): number {
  const { minutes } = course.record;
  let gap = 0;
  const to = Math.min(minutes.length - 1, indexAtOrAfter(minutes, course.shutOff.minute));
  for (let i = course.from + 1; i <= to; i += 1) {
    gap = Math.max(gap, (minutes[i] ?? 0) - (minutes[i - 1] ?? 0));
  }
  return gap;
}
