import { courseOf } from '#shared/firing/course.ts';
import type { HeatPoint } from '#shared/heat/heat-stops.ts';
import type { DrawnMark } from '../drawn-mark.ts';

interface Columns {
  readonly minutes: Float64Array;
  readonly celsius: Float64Array;
}

/**
 * The course of a record as the findings read it, cut at lighting and at shutting off as they cut
 * it, so that the line shows what the sentences are about; the readings themselves before the fire
 * was lit, and where there are too few to read anything.
 */
export function smoothLine(
  points: readonly HeatPoint[],
  marks: readonly DrawnMark[],
): readonly HeatPoint[] {
  const readings = points.map(([minute, celsius]) => ({ minute, celsius }));
  const known = marks.flatMap(({ minute, kind }) => (kind ? [{ minute, kind }] : []));
  const course = courseOf({ readings, marks: known });
  if (!course) return points;
  const { record, fine, after, from } = course;
  const before = {
    minutes: record.minutes.subarray(0, from),
    celsius: record.celsius.subarray(0, from),
  };
  return [before, fine, after].flatMap((part) => (part ? pointsOf(part) : []));
}

function pointsOf({ minutes, celsius }: Columns): HeatPoint[] {
  return Array.from(minutes, (minute, index): HeatPoint => [minute, celsius[index] ?? 0]);
}
