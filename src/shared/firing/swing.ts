import type { Curve } from './curve.ts';
import { curveOf, valueAt } from './curve.ts';

const STEP = 0.5;
/** Swings shorter are noise to the curve; longer are the course itself. Minutes. */
const SHORTEST_PERIOD = 4;
const LONGEST_PERIOD = 20;
const DETREND_HALF = 10;
const FEWEST_PERIODS = 4;
const LEAST_SCATTER = 4;
const LEAST_LIKENESS = 0.5;
/** A swinging course falls again and again; a stepped climb does not. */
const LEAST_FALLING_SHARE = 0.2;

/**
 * The period, minutes, of a record that swings regularly, as stoking with wood makes it: the first
 * peak of the autocorrelation of what is left after the slow course is taken off. `null` for none.
 */
export function swingPeriod(curve: Curve): number | null {
  const first = curve.minutes[0] ?? 0;
  const last = curve.minutes[curve.minutes.length - 1] ?? first;
  const count = Math.floor((last - first) / STEP);
  if (count * STEP < FEWEST_PERIODS * SHORTEST_PERIOD + 2 * DETREND_HALF) return null;
  const minutes = Float64Array.from({ length: count }, (_, i) => first + i * STEP);
  const celsius = minutes.map((minute) => valueAt(curve, minute));
  const slow = curveOf({ minutes, celsius }, DETREND_HALF, STEP);
  const margin = DETREND_HALF / STEP;
  const rest = celsius.map((value, i) => value - (slow.celsius[i] ?? value)).slice(margin, -margin);
  let falling = 0;
  for (let i = margin; i < count - margin; i += 1) {
    if ((celsius[i + 1] ?? 0) < (celsius[i] ?? 0) - STEP) falling += 1;
  }
  const power = correlation(rest, 0);
  if (!(Math.sqrt(power) >= LEAST_SCATTER) || falling < LEAST_FALLING_SHARE * rest.length) {
    return null;
  }
  const longest = Math.min(LONGEST_PERIOD / STEP, Math.floor(rest.length / FEWEST_PERIODS));
  let wasNegative = false;
  let best: number | null = null;
  let bestLikeness = LEAST_LIKENESS;
  for (let lag = 2; lag <= longest; lag += 1) {
    const likeness = correlation(rest, lag) / power;
    if (likeness < 0) {
      if (best !== null) break;
      wasNegative = true;
    }
    if (wasNegative && lag * STEP >= SHORTEST_PERIOD && likeness > bestLikeness) {
      best = lag * STEP;
      bestLikeness = likeness;
    }
  }
  return best;
}

function correlation(values: Float64Array, lag: number): number {
  let sum = 0;
  for (let i = lag; i < values.length; i += 1) sum += (values[i] ?? 0) * (values[i - lag] ?? 0);
  return sum / Math.max(1, values.length - lag);
}
