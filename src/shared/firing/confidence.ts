import type { Course } from './course.ts';
import { indexAtOrAfter } from './course.ts';
import { CLOSE_READINGS, FAR_READINGS, MUCH_SCATTER } from './constants.ts';

/** How well the readings show a stretch: by how close they stand in it, and how much they scatter. */
export const CONFIDENCES = ['high', 'fair', 'low'] as const;
export type Confidence = (typeof CONFIDENCES)[number];

/**
 * High where the longest time between readings about the stretch is no more than a sixth of it, low
 * where it is over half of it; one step lower where single readings scatter by half of what the
 * stretch is about.
 * @param sizeCelsius the fall of a sag, the band of a level
 */
export function confidenceOf(
  course: Course,
  fromMinute: number,
  toMinute: number,
  sizeCelsius: number,
): Confidence {
  const { minutes } = course.record;
  const first = Math.max(0, indexAtOrAfter(minutes, fromMinute) - 1);
  let gap = 0;
  for (let i = first + 1; i < minutes.length && (minutes[i - 1] ?? Infinity) < toMinute; i += 1) {
    gap = Math.max(gap, (minutes[i] ?? 0) - (minutes[i - 1] ?? 0));
  }
  const share = gap / Math.max(toMinute - fromMinute, 1e-9);
  const steps =
    (share <= CLOSE_READINGS ? 0 : share <= FAR_READINGS ? 1 : 2) +
    (course.scatter.noiseCelsius > MUCH_SCATTER * sizeCelsius ? 1 : 0);
  return CONFIDENCES[Math.min(2, steps)] ?? 'low';
}
