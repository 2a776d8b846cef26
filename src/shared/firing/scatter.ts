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

const BIN_MINUTES = 0.25;
/** The display's last digit, tried from the coarsest, °C. */
const DIGITS = [5, 1, 0.5, 0.1];
const FINEST_SCATTER = 0.005;

/** Measures the scatter of readings in order of time. Linear but for the medians. */
export function scatterOf(minutes: Float64Array, celsius: Float64Array): Scatter {
  const steps = new Float64Array(Math.max(0, minutes.length - 1));
  for (let i = 0; i < steps.length; i += 1) steps[i] = (minutes[i + 1] ?? 0) - (minutes[i] ?? 0);
  steps.sort();
  const step = quantileOfSorted(steps, 0.5) ?? 1;
  const binned = meansOf(minutes, celsius);
  return {
    noiseCelsius: Math.max(neighbourNoise(minutes, celsius), roundingScatter(celsius)),
    binNoiseCelsius: neighbourNoise(binned.minutes, binned.celsius),
    readingsPerMinute: step > 0 ? 1 / step : 1,
  };
}

/**
 * 1.4826 × the median distance of a reading from the line between its neighbours, divided by √1.5,
 * which that distance has more than one reading (exact for white noise at even steps). A corner of
 * the course moves the median little.
 */
export function neighbourNoise(minutes: Float64Array, celsius: Float64Array): number {
  const n = minutes.length;
  if (n < 5) return 0;
  const distances = new Float64Array(n - 2);
  for (let i = 1; i < n - 1; i += 1) {
    const before = minutes[i - 1] ?? 0;
    const low = celsius[i - 1] ?? 0;
    const share = ((minutes[i] ?? 0) - before) / ((minutes[i + 1] ?? 0) - before);
    distances[i - 1] = Math.abs((celsius[i] ?? 0) - (low + share * ((celsius[i + 1] ?? 0) - low)));
  }
  distances.sort();
  return (1.4826 * (quantileOfSorted(distances, 0.5) ?? 0)) / Math.sqrt(1.5);
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
