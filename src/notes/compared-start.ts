import { courseOf } from '#shared/firing/course.ts';
import type { HeatPoint } from '#shared/heat/heat-stops.ts';
import type { DrawnMark } from '../ui/drawn-mark.ts';

/** Two records lie over each other from where both were lit, or from where both began to climb. */
export type Alignment = 'lit' | 'climb';

export interface TimedRecord {
  readonly points: readonly HeatPoint[];
  readonly marks: readonly DrawnMark[];
}

/** The minute at which the fire was lit, where it was marked. */
export function litMinute({ marks }: Pick<TimedRecord, 'marks'>): number | null {
  const lit = marks.filter(({ kind }) => kind === 'lit').map(({ minute }) => minute);
  return lit.length === 0 ? null : Math.min(...lit);
}

/** The minute at which the record begins to climb, whatever was marked. */
export function climbMinute({ points }: Pick<TimedRecord, 'points'>): number | null {
  const course = courseOf({
    readings: points.map(([minute, celsius]) => ({ minute, celsius })),
  });
  return course?.start.minute ?? points[0]?.[0] ?? null;
}

/** Both were marked, so that they can be laid over each other from there. */
export const canAlignAtLit = (one: TimedRecord, other: TimedRecord): boolean =>
  litMinute(one) !== null && litMinute(other) !== null;

/** What has to be added to the minutes of the other record, so that both start together. */
export function shiftMinutes(own: TimedRecord, other: TimedRecord, alignment: Alignment): number {
  const at = alignment === 'lit' && canAlignAtLit(own, other) ? litMinute : climbMinute;
  const [mine, theirs] = [at(own), at(other)];
  return mine === null || theirs === null ? 0 : mine - theirs;
}
