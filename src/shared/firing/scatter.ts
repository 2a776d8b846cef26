import { quantileOfSorted } from '../statistics/quantile.ts';

/** How much a record's readings scatter, and how close together they stand. */
export interface Scatter {
  /** Of a single reading about the course, °C. */
  readonly noiseCelsius: number;
  /** Of 15-second means about the course, °C: larger than noise alone where the reading wanders. */
  readonly binNoiseCelsius: number;
  /** By the median step. */
  readonly readingsPerMinute: number;
}

/** Means over a quarter of a minute show wander that neighbouring readings share. */
export const WANDER_BINS_PER_MINUTE = 4;
const BIN_MINUTES = 1 / WANDER_BINS_PER_MINUTE;
/** The display's last digit, tried from the coarsest, °C. */
const DIGITS = [5, 1, 0.5, 0.1];
const FINEST_SCATTER = 0.005;
/** Differences larger than this between far readings are the course, not scatter (our definition). */
const MOST_NOISE = 8;

/** Measures the scatter of readings in order of time. Linear but for the medians. */
export function scatterOf(minutes: Float64Array, celsius: Float64Array): Scatter {
  const stride = strideFor(minutes.length);
  const steps = new Float64Array(Math.floor(Math.max(0, minutes.length - 1) / stride));
  for (let i = 0; i < steps.length; i += 1) {
    steps[i] = (minutes[i * stride + 1] ?? 0) - (minutes[i * stride] ?? 0);
  }
  steps.sort();
  const step = quantileOfSorted(steps, 0.5) ?? 1;
  const binned = meansOf(minutes, celsius);
  return {
    noiseCelsius: Math.max(
      Math.min(MOST_NOISE, neighbourNoise(minutes, celsius)),
      roundingScatter(celsius),
    ),
    binNoiseCelsius: Math.min(MOST_NOISE, neighbourNoise(binned.minutes, binned.celsius)),
    readingsPerMinute: step > 0 ? 1 / step : 1,
  };
}

/** Fewer readings than this are mostly corners and bends: their scatter cannot be told from the course. */
const FEWEST_FOR_NOISE = 15;

/** In a record of fewer readings than this many a difference spans a corner: their lower quarter does not. */
const MANY = 100;
const LOW_SHARE = 0.25;
/** Quarter and half of |z| lie below these, z of the normal distribution. */
const LOW_QUANTILE = 0.3186;
const MEDIAN_QUANTILE = 0.6745;

/**
 * Scatter of single readings by third differences of four neighbours, which no straight line and no
 * even bend of the course has: from the median of their sizes, each over the deviation that white noise
 * of 1 °C would give it. A corner of the course moves the median little.
 */
export function neighbourNoise(minutes: Float64Array, celsius: Float64Array): number {
  const n = minutes.length;
  if (n < FEWEST_FOR_NOISE) return 0;
  const stride = strideFor(n);
  const sizes = new Float64Array(Math.floor((n - 4) / stride) + 1);
  for (let at = 0; at < sizes.length; at += 1) {
    const i = at * stride;
    let difference = 0;
    let power = 0;
    for (let j = i; j < i + 4; j += 1) {
      let weight = 1;
      for (let k = i; k < i + 4; k += 1) {
        if (k !== j) weight /= (minutes[j] ?? 0) - (minutes[k] ?? 0);
      }
      difference += weight * ((celsius[j] ?? 0) - (celsius[i] ?? 0));
      power += weight * weight;
    }
    const size = Math.abs(difference) / Math.sqrt(power);
    sizes[at] = Number.isFinite(size) ? size : 0;
  }
  sizes.sort();
  const share = n < MANY ? LOW_SHARE : 0.5;
  return (quantileOfSorted(sizes, share) ?? 0) / (n < MANY ? LOW_QUANTILE : MEDIAN_QUANTILE);
}

/** A median of this many is as good as one of them all. */
const ENOUGH = 4000;

/** Every how many of so many readings are looked at for a median. */
export function strideFor(count: number): number {
  return Math.max(1, Math.floor(count / ENOUGH));
}

/** A display that shows whole degrees scatters by 1 ÷ √12 °C even where neighbours agree. */
function roundingScatter(celsius: Float64Array): number {
  for (const digit of DIGITS) {
    const isRounded = celsius.every((value) => {
      const steps = value / digit;
      return Math.abs(steps - Math.round(steps)) < 1e-6;
    });
    if (isRounded) return digit / Math.sqrt(12);
  }
  return FINEST_SCATTER;
}

/** Means of readings that fall into the same quarter of a minute. */
function meansOf(
  minutes: Float64Array,
  celsius: Float64Array,
): { minutes: Float64Array; celsius: Float64Array } {
  const outMinutes = new Float64Array(minutes.length);
  const outCelsius = new Float64Array(minutes.length);
  const first = minutes[0] ?? 0;
  let count = 0;
  for (let from = 0; from < minutes.length;) {
    const bin = Math.floor(((minutes[from] ?? 0) - first) / BIN_MINUTES);
    let to = from;
    let t = 0;
    let y = 0;
    while (to < minutes.length && Math.floor(((minutes[to] ?? 0) - first) / BIN_MINUTES) === bin) {
      t += minutes[to] ?? 0;
      y += celsius[to] ?? 0;
      to += 1;
    }
    outMinutes[count] = t / (to - from);
    outCelsius[count] = y / (to - from);
    count += 1;
    from = to;
  }
  return { minutes: outMinutes.slice(0, count), celsius: outCelsius.slice(0, count) };
}
