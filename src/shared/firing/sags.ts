import { COOLING_MARKS } from '../vocabulary/marks.ts';
import {
  JUST_SHORT,
  SAG_DROP,
  SAG_EXPLAINED_MINUTES,
  SAG_FROM,
  SAG_MINUTES,
  SAG_RATE,
} from './constants.ts';
import { confidenceOf } from './confidence.ts';
import type { Course } from './course.ts';
import { firstAtOrAbove } from './curve.ts';
import type { Sag } from './types.ts';

/** A rise of this much from the bottom ends a fall, °C. */
const TURNED_BY = 8;
/** Drawn rather than held when the firing ends so soon after the bottom, minutes. */
const DRAWN_WITHIN = 3;
/** A fall begins and ends within so much of its top and bottom, °C. */
const MOST_NEAR = 2;
/** Regained when the curve comes back within this of the top, °C. */
const REGAINED_WITHIN = 5;
/** Steps of the curve and corners rounded by it may cost so much of a fall's length, minutes. */
const MINUTES_SLACK = 0.25;

/**
 * Falls of at least 15 °C lasting at least 3 min at no more than 10 °C/min, from a top of at least
 * 350 °C and below aim − 15, before shut-off, not begun within 2 min after gas down, flue opened,
 * lid lifted or loaded (or shut off and lit again).
 */
export function sagsOf(course: Course, aim: number): Sag[] {
  const { minutes, celsius } = course.steady;
  const sags: Sag[] = [];
  for (const { top, bottom } of falls(celsius)) {
    const topCelsius = celsius[top] ?? 0;
    const bottomCelsius = celsius[bottom] ?? 0;
    if (topCelsius < SAG_FROM || topCelsius >= aim - JUST_SHORT) continue;
    const near = Math.min(MOST_NEAR, Math.max(0.1, course.fineError / 2));
    let from = bottom;
    while (from > top && (celsius[from] ?? 0) < topCelsius - near) from -= 1;
    let to = from;
    while (to < bottom && (celsius[to] ?? 0) > bottomCelsius + near) to += 1;
    const fromMinute = minutes[from] ?? 0;
    const toMinute = minutes[to] ?? 0;
    const dropCelsius = topCelsius - bottomCelsius;
    const lasted = toMinute - fromMinute;
    if (lasted < SAG_MINUTES - MINUTES_SLACK || dropCelsius > SAG_RATE * (lasted + MINUTES_SLACK)) {
      continue;
    }
    if (isExplained(course, fromMinute)) continue;
    const regained = firstAtOrAbove(course.steady, topCelsius - REGAINED_WITHIN, toMinute) !== null;
    const isLast = course.shutOff.minute - toMinute < DRAWN_WITHIN;
    sags.push({
      fromMinute,
      toMinute,
      topCelsius,
      bottomCelsius,
      dropCelsius,
      then: regained ? 'regained' : isLast ? 'drawn' : 'held',
      confidence: confidenceOf(course, fromMinute, toMinute, dropCelsius),
    });
  }
  return sags;
}

function isExplained(course: Course, fromMinute: number): boolean {
  return course.marks.some(
    (mark) =>
      (COOLING_MARKS.includes(mark.kind) || mark.kind === 'shut-off') &&
      fromMinute >= mark.minute - SAG_EXPLAINED_MINUTES / 4 &&
      fromMinute <= mark.minute + SAG_EXPLAINED_MINUTES + MINUTES_SLACK,
  );
}

/** Tops and the bottoms after them, at least SAG_DROP apart. */
function falls(celsius: Float64Array): { top: number; bottom: number }[] {
  const found: { top: number; bottom: number }[] = [];
  let top = 0;
  let bottom = 0;
  for (let i = 0; i <= celsius.length; i += 1) {
    const value = celsius[i] ?? Infinity;
    const isFall = (celsius[top] ?? 0) - (celsius[bottom] ?? 0) >= SAG_DROP - 0.01;
    if (isFall && value >= (celsius[bottom] ?? 0) + TURNED_BY) {
      found.push({ top, bottom });
      top = i;
      bottom = i;
    } else if (value >= (celsius[top] ?? 0)) {
      top = i;
      bottom = i;
    } else if (value < (celsius[bottom] ?? 0)) {
      bottom = i;
    }
  }
  return found;
}
