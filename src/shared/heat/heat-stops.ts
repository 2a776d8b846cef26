import { heatColour } from './heat-colour.ts';

/** A point of a record as drawn: minutes, degrees Celsius. */
export type HeatPoint = readonly [minute: number, celsius: number];

/** A stop of a gradient along the minutes. */
export interface HeatStop {
  readonly minute: number;
  readonly colour: string;
}

/** Largest step between two stops, °C: a gradient blends in sRGB, the scale does not. */
const LARGEST_STEP_CELSIUS = 25;

/**
 * Keeps the points a drawing needs (Douglas and Peucker's method, measured in °C at the same
 * minute) and drops the rest. The first and last point always stay.
 */
export function simplifyPoints(
  points: readonly HeatPoint[],
  toleranceCelsius: number,
): readonly HeatPoint[] {
  if (points.length <= 2) return points;
  const keep = new Array<boolean>(points.length).fill(false);
  keep[0] = true;
  keep[points.length - 1] = true;
  const spans: [number, number][] = [[0, points.length - 1]];
  for (let span = spans.pop(); span; span = spans.pop()) {
    const [from, to] = span;
    const start = points[from];
    const end = points[to];
    if (!start || !end) continue;
    const minutes = end[0] - start[0];
    let worst = toleranceCelsius;
    let worstIndex = -1;
    for (let index = from + 1; index < to; index += 1) {
      const point = points[index];
      if (!point) continue;
      const share = minutes === 0 ? 0 : (point[0] - start[0]) / minutes;
      const off = Math.abs(point[1] - (start[1] + (end[1] - start[1]) * share));
      if (off > worst) {
        worst = off;
        worstIndex = index;
      }
    }
    if (worstIndex < 0) continue;
    keep[worstIndex] = true;
    spans.push([from, worstIndex], [worstIndex, to]);
  }
  return points.filter((_, index) => keep[index]);
}

/**
 * The stops of a climb's gradient: the record simplified to `toleranceCelsius`, with stops added
 * so that no two neighbours lie further apart than the scale bends.
 */
export function heatStops(points: readonly HeatPoint[], toleranceCelsius = 4): readonly HeatStop[] {
  const kept = simplifyPoints(points, toleranceCelsius);
  const stops: HeatStop[] = [];
  kept.forEach((point, index) => {
    const before = kept[index - 1];
    if (before) {
      const steps = Math.ceil(Math.abs(point[1] - before[1]) / LARGEST_STEP_CELSIUS);
      for (let step = 1; step < steps; step += 1) {
        const share = step / steps;
        stops.push({
          minute: before[0] + (point[0] - before[0]) * share,
          colour: heatColour(before[1] + (point[1] - before[1]) * share),
        });
      }
    }
    stops.push({ minute: point[0], colour: heatColour(point[1]) });
  });
  return stops;
}

/** Temperature at a minute, linear between readings; null outside the record or without one. */
export function celsiusAt(points: readonly HeatPoint[], minute: number): number | null {
  const first = points[0];
  const last = points[points.length - 1];
  if (!first || !last || minute < first[0] || minute > last[0]) return null;
  let low = 0;
  let high = points.length - 1;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if ((points[middle] as HeatPoint)[0] <= minute) low = middle;
    else high = middle;
  }
  const before = points[low] as HeatPoint;
  const after = points[high] as HeatPoint;
  if (after[0] === before[0]) return after[1];
  return before[1] + ((after[1] - before[1]) * (minute - before[0])) / (after[0] - before[0]);
}

/** The first minute at which the record is at or above a temperature; null if it never is. */
export function firstMinuteAt(points: readonly HeatPoint[], celsius: number): number | null {
  for (let index = 0; index < points.length; index += 1) {
    const point = points[index] as HeatPoint;
    if (point[1] < celsius) continue;
    const before = points[index - 1];
    if (!before || before[1] >= celsius) return point[0];
    return before[0] + ((point[0] - before[0]) * (celsius - before[1])) / (point[1] - before[1]);
  }
  return null;
}
