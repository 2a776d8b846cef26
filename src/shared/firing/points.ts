import type { CleanReadings } from './clean-readings.ts';
import type { Scatter } from './scatter.ts';
import { WANDER_BINS_PER_MINUTE } from './scatter.ts';
import type { Points } from './straight-stretches.ts';

/** A record of no more readings than this is taken as it is. */
const ENOUGH_POINTS = 600;
/** Means are taken over no less than this, and over no more than this part of the record. */
const LEAST_MINUTES = 1 / 12;
const MOST_POINTS = 1200;

/**
 * The readings a course is drawn through: as they are, or, of a long record, means over five seconds
 * or more, each with the standard error that the record's own scatter gives it.
 */
export function pointsOf(
  record: Pick<CleanReadings, 'minutes' | 'celsius'>,
  scatter: Scatter,
): Points {
  const { minutes, celsius } = record;
  const n = minutes.length;
  const first = minutes[0] ?? 0;
  const span = (minutes[n - 1] ?? first) - first;
  const width = n <= ENOUGH_POINTS ? 0 : Math.max(LEAST_MINUTES, span / MOST_POINTS);
  const noise = scatter.noiseCelsius ** 2;
  const inWanderBin = Math.max(1, scatter.readingsPerMinute / WANDER_BINS_PER_MINUTE);
  const wander = Math.max(0, scatter.binNoiseCelsius ** 2 - noise / inWanderBin);
  const outMinutes = new Float64Array(n);
  const outCelsius = new Float64Array(n);
  const errors = new Float64Array(n);
  let count = 0;
  for (let from = 0; from < n;) {
    const bin = binOf(minutes, from, first, width);
    let to = from;
    let t = 0;
    let y = 0;
    while (to < n && (to === from || (width > 0 && binOf(minutes, to, first, width) === bin))) {
      t += minutes[to] ?? 0;
      y += celsius[to] ?? 0;
      to += 1;
    }
    const inBin = to - from;
    outMinutes[count] = t / inBin;
    outCelsius[count] = y / inBin;
    errors[count] = Math.sqrt(noise / inBin + (width > 0 ? wander : 0));
    count += 1;
    from = to;
  }
  return {
    minutes: outMinutes.slice(0, count),
    celsius: outCelsius.slice(0, count),
    errors: errors.slice(0, count),
  };
}

function binOf(minutes: Float64Array, i: number, first: number, width: number): number {
  return Math.floor(((minutes[i] ?? 0) - first) / width);
}
