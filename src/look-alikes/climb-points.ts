import type { HeatPoint } from '#shared/heat/heat-stops.ts';

/** A climb as it is compared, a value a minute, as points for drawing. */
export function climbPoints(celsius: readonly number[]): HeatPoint[] {
  return celsius.map((value, minute): HeatPoint => [minute, value]);
}
