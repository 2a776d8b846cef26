import { FIRE_CHANGING_MARKS } from '../vocabulary/marks.ts';
import {
  FORECAST_FEWEST_MINUTES,
  FORECAST_MEAN_MINUTES,
  FORECAST_MINUTES,
  FORECAST_WIDEST,
  LONGEST_TIME_CONSTANT,
  SHORTEST_TIME_CONSTANT,
} from './constants.ts';
import type { LevellingOff, Mark } from './types.ts';

/** Fewer 30-second means than this leave nothing to judge the fit by. */
const FEWEST_MEANS = 8;
/** The fire of an hour ago says no more of where it levels off now, minutes. */
const LONGEST_WINDOW = 60;
/** Time constants tried, evenly in the logarithm. */
const TRIED = 120;
/** A meter that shows whole degrees: a reading is never trusted further than this, °C. */
const LEAST_SD = 0.5;
/** T∞, T0 and τ. */
const PARAMETERS = 3;
/** Fewer means than this, counted as if they were independent, cannot judge three numbers. */
const FEWEST_EFFECTIVE = 4.5;
/** How closely the ends of the interval are sought, °C. */
const EDGE_STEP = 0.02;
const FURTHEST = 400;

/**
 * Where the fire in the kiln is going: T(t) = T∞ − (T∞ − T0)·exp(−(t − t0)/τ), fitted to 30-s means
 * since the last mark that changes the fire, else over the last 20 min, never over less than 15 min.
 * The 95 % interval of T∞ is the profile of the residual sum of squares, widened for residuals that
 * follow one another (n replaced by n(1 − ρ)/(1 + ρ), ρ their lag-1 correlation). Null when nothing
 * can be said: too short, or an interval 80 °C wide or wider.
 * @param minutes readings in order of time, up to now
 */
export function levellingOff(
  minutes: Float64Array,
  celsius: Float64Array,
  marks: readonly Mark[],
  aimCelsius: number | null,
): LevellingOff | null {
  const now = minutes[minutes.length - 1];
  if (now === undefined) return null;
  const changed = marks
    .filter((mark) => FIRE_CHANGING_MARKS.includes(mark.kind) && mark.minute <= now)
    .reduce((latest, mark) => Math.max(latest, mark.minute), -Infinity);
  const since =
    changed === -Infinity ? now - FORECAST_MINUTES : Math.max(changed, now - LONGEST_WINDOW);
  const means = meansSince(minutes, celsius, since);
  const spanned = (means.x[means.x.length - 1] ?? 0) - (means.x[0] ?? 0);
  if (means.x.length < FEWEST_MEANS) return null;
  if (spanned < FORECAST_FEWEST_MINUTES - FORECAST_MEAN_MINUTES - 1e-6) return null;
  const perMean = Math.max(1, readingsIn(minutes, since) / means.x.length);
  return forecast(means, perMean, aimCelsius, now - since);
}

function readingsIn(minutes: Float64Array, since: number): number {
  const from = minutes.findIndex((minute) => minute >= since - 1e-9);
  return minutes.length - from;
}

interface Means {
  /** Minutes since the beginning of the window. */
  readonly x: number[];
  readonly y: number[];
}

function meansSince(minutes: Float64Array, celsius: Float64Array, since: number): Means {
  const x: number[] = [];
  const y: number[] = [];
  let from = minutes.findIndex((minute) => minute >= since - 1e-9);
  while (from >= 0 && from < minutes.length) {
    const bin = Math.floor(((minutes[from] ?? 0) - since) / FORECAST_MEAN_MINUTES + 1e-9);
    let t = 0;
    let value = 0;
    let n = 0;
    while (
      from < minutes.length &&
      Math.floor(((minutes[from] ?? 0) - since) / FORECAST_MEAN_MINUTES + 1e-9) === bin
    ) {
      t += (minutes[from] ?? 0) - since;
      value += celsius[from] ?? 0;
      n += 1;
      from += 1;
    }
    x.push(t / n);
    y.push(value / n);
  }
  return { x, y };
}

/** Sums over the points of e = exp(−k x) for one k: all that a fit with that k needs. */
interface Tried {
  readonly k: number;
  readonly e: number;
  readonly ee: number;
  readonly ye: number;
}
interface Fit {
  readonly rss: number;
  readonly k: number;
  /** Model: end − fall·exp(−k x). */
  readonly fall: number;
}

function forecast(
  means: Means,
  perMean: number,
  aim: number | null,
  nowX: number,
): LevellingOff | null {
  const n = means.x.length;
  const level = means.y.reduce((sum, value) => sum + value, 0) / n;
  const y = means.y.map((value) => value - level);
  const tried = Array.from({ length: TRIED + 1 }, (_, i) => triedFor(means.x, y, i / TRIED));
  const sumY = y.reduce((sum, value) => sum + value, 0);
  const sumYY = y.reduce((sum, value) => sum + value * value, 0);

  /** Best fit whose end is fixed: one division for each k tried. */
  const fitAt = (end: number): Fit => {
    let best: Fit = { rss: Infinity, k: 1, fall: 0 };
    const spread = n * end * end - 2 * end * sumY + sumYY;
    const left: number[] = [];
    let at = 0;
    for (const [i, { k, e, ee, ye }] of tried.entries()) {
      const along = end * e - ye;
      const rss = spread - (along * along) / ee;
      left.push(rss);
      if (rss >= best.rss) continue;
      at = i;
      best = { rss, k, fall: along / ee };
    }
    return { ...best, rss: lowestBetween(left, at) };
  };
  const roughEnd = bestEnd(tried, n, sumY);
  if (roughEnd === null) return null;
  const end = lowestNear(roughEnd, (value) => fitAt(value).rss);
  const best = fitAt(end);
  const rho = lagOne(means.x.map((x, i) => (y[i] ?? 0) - end + best.fall * Math.exp(-best.k * x)));
  const effective = Math.max(FEWEST_EFFECTIVE, (n * (1 - rho)) / (1 + rho));
  const sd2 = Math.max(best.rss / (n * (1 - PARAMETERS / effective)), LEAST_SD ** 2 / perMean);
  const allowed = best.rss + studentSquared(effective - PARAMETERS) * sd2 * (n / effective);
  const high = edge(end, FURTHEST, (value) => fitAt(value).rss <= allowed);
  const low = edge(end, -FURTHEST, (value) => fitAt(value).rss <= allowed);
  if (high === null || low === null || high - low >= FORECAST_WIDEST) return null;
  const reach = (at: number) => minutesToReach(fitAt(at), at + level, aim, nowX);
  const bounds = [reach(low), reach(high)].sort((a, b) => a - b);
  const [soonest = Infinity, latest = Infinity] = bounds;
  return {
    celsius: end + level,
    lowCelsius: low + level,
    highCelsius: high + level,
    reachesAim:
      Number.isFinite(latest) && latest > 0
        ? { lowMinutes: Math.max(0, soonest), highMinutes: latest }
        : null,
  };
}

function triedFor(x: readonly number[], y: readonly number[], share: number): Tried {
  const k = (1 / LONGEST_TIME_CONSTANT) * (LONGEST_TIME_CONSTANT / SHORTEST_TIME_CONSTANT) ** share;
  let e = 0;
  let ee = 0;
  let ye = 0;
  for (let i = 0; i < x.length; i += 1) {
    const value = Math.exp(-k * (x[i] ?? 0));
    e += value;
    ee += value * value;
    ye += value * (y[i] ?? 0);
  }
  return { k, e, ee, ye };
}

/** The end level of the best fit over all k: plain straight-line regression on e for each. */
function bestEnd(tried: readonly Tried[], n: number, sumY: number): number | null {
  let best: number | null = null;
  let mostExplained = -Infinity;
  for (const { e, ee, ye } of tried) {
    const spread = ee - (e * e) / n;
    if (!(spread > 1e-9)) continue;
    const slope = (ye - (e * sumY) / n) / spread;
    const explained = slope * slope * spread;
    if (explained > mostExplained) {
      mostExplained = explained;
      best = (sumY - slope * e) / n;
    }
  }
  return best;
}

/** The least of a smooth curve known at even steps, by the parabola through its lowest three. */
function lowestBetween(values: readonly number[], at: number): number {
  const middle = values[at] ?? Infinity;
  const before = values[at - 1];
  const after = values[at + 1];
  if (before === undefined || after === undefined) return middle;
  const bend = before - 2 * middle + after;
  return bend > 0 ? Math.max(0, middle - (before - after) ** 2 / (8 * bend)) : middle;
}

/** The end within 30 °C of a rough one that leaves least, by thirds. */
function lowestNear(rough: number, left: (end: number) => number): number {
  let low = rough - 30;
  let high = rough + 30;
  while (high - low > 0.1) {
    const third = (high - low) / 3;
    if (left(low + third) <= left(high - third)) high -= third;
    else low += third;
  }
  return (low + high) / 2;
}

/** Farthest value from `from` that is still allowed, by halving; null when even the farthest is. */
function edge(from: number, reach: number, isAllowed: (value: number) => boolean): number | null {
  let inside = 0;
  let outside = reach;
  if (isAllowed(from + reach)) return null;
  while (Math.abs(outside - inside) > EDGE_STEP) {
    const middle = (inside + outside) / 2;
    if (isAllowed(from + middle)) inside = middle;
    else outside = middle;
  }
  return from + inside;
}

function minutesToReach(fit: Fit, end: number, aim: number | null, nowX: number): number {
  if (aim === null || end <= aim || fit.fall <= 0) return Infinity;
  return Math.log(fit.fall / (end - aim)) / fit.k - nowX;
}

/**
 * Lag-1 correlation of residuals, between 0 and 0.95. From n residuals of a fitted curve it comes out
 * too low by about (1 + 4ρ) ÷ n (Marriott and Pope, Biometrika 41, 390, 1954): put back here.
 */
function lagOne(residuals: readonly number[]): number {
  let sum = 0;
  let power = 0;
  for (let i = 0; i < residuals.length; i += 1) {
    power += (residuals[i] ?? 0) ** 2;
    if (i > 0) sum += (residuals[i] ?? 0) * (residuals[i - 1] ?? 0);
  }
  if (!(power > 0)) return 0;
  const rho = sum / power;
  return Math.min(0.95, Math.max(0, rho + (1 + 4 * rho) / residuals.length));
}

/** Square of Student's 97.5 % quantile, by its expansion about the normal one (from 2 degrees up, within 2 %). */
function studentSquared(degrees: number): number {
  const d = Math.max(2, degrees);
  const z = 1.959964;
  const t =
    z +
    (z ** 3 + z) / (4 * d) +
    (5 * z ** 5 + 16 * z ** 3 + 3 * z) / (96 * d * d) +
    (3 * z ** 7 + 19 * z ** 5 + 17 * z ** 3 - 15 * z) / (384 * d ** 3);
  return t * t;
}
