/** y = end + (start − end)·exp(−x ÷ τ), fitted by least squares. */
export interface ExponentialApproach {
  readonly start: number;
  readonly end: number;
  readonly timeConstant: number;
  readonly residualSumOfSquares: number;
  readonly count: number;
  /** Standard deviations of `end` and of the rate 1 ÷ τ, from the curvature at the least squares. */
  readonly endSd: number;
  readonly rateSd: number;
}
export interface ApproachOptions {
  readonly shortestTimeConstant: number;
  readonly longestTimeConstant: number;
  /** Fixes the value at x = 0, where it is known. */
  readonly start?: number;
}

const TRIED = 80;

/**
 * Fits the approach by searching the rate k = 1 ÷ τ alone: for a given k the other parameters follow
 * from linear least squares. A logarithmic scan finds the valley, a golden section its floor, and
 * Gauss-Newton steps the last digits. `null` for fewer points than parameters plus one.
 */
export function fitExponentialApproach(
  x: readonly number[],
  y: readonly number[],
  options: ApproachOptions,
): ExponentialApproach | null {
  const isFixed = options.start !== undefined;
  if (x.length < (isFixed ? 3 : 4)) return null;
  const low = Math.log(1 / options.longestTimeConstant);
  const high = Math.log(1 / options.shortestTimeConstant);
  const rssAt = (logK: number) => linearPart(x, y, Math.exp(logK), options.start).rss;
  let best = low;
  let bestRss = Infinity;
  for (let i = 0; i <= TRIED; i += 1) {
    const logK = low + ((high - low) * i) / TRIED;
    const rss = rssAt(logK);
    if (rss < bestRss) {
      best = logK;
      bestRss = rss;
    }
  }
  const width = (high - low) / TRIED;
  const floor = goldenSection(rssAt, Math.max(low, best - width), Math.min(high, best + width));
  const k = polished(x, y, Math.exp(floor), options.start);
  const isInside = k >= Math.exp(low) && k <= Math.exp(high);
  const finalK = isInside ? k : Math.exp(floor);
  const { start, rise, rss } = linearPart(x, y, finalK, options.start);
  return {
    start,
    end: start + rise,
    timeConstant: 1 / finalK,
    residualSumOfSquares: rss,
    count: x.length,
    ...deviations(x, rise, finalK, rss, isFixed),
  };
}

/**
 * Residual variance × the inverse of JᵀJ, written out: with the start fixed its columns are those of
 * `end` and k; with a free start that column is projected out of both first.
 */
function deviations(
  x: readonly number[],
  rise: number,
  k: number,
  rss: number,
  isFixed: boolean,
): { endSd: number; rateSd: number } {
  const ofEnd = x.map((value) => -Math.expm1(-k * value));
  const ofRate = x.map((value) => rise * value * Math.exp(-k * value));
  const ofStart = isFixed ? null : x.map((value) => Math.exp(-k * value));
  const [a, b] =
    ofStart === null ? [ofEnd, ofRate] : [ofEnd, ofRate].map((one) => without(one, ofStart));
  const aa = product(a, a);
  const ab = product(a, b);
  const bb = product(b, b);
  const variance = rss / (x.length - (isFixed ? 2 : 3));
  const size = aa * bb - ab * ab;
  return {
    endSd: Math.sqrt((variance * bb) / size),
    rateSd: Math.sqrt((variance * aa) / size),
  };
}

function product(a: readonly number[] = [], b: readonly number[] = []): number {
  return a.reduce((sum, value, i) => sum + value * (b[i] ?? 0), 0);
}

/** What is left of a column when it is made square to another. */
function without(column: readonly number[], other: readonly number[]): number[] {
  const share = product(column, other) / product(other, other);
  return column.map((value, i) => value - share * (other[i] ?? 0));
}

interface LinearPart {
  readonly start: number;
  readonly rise: number;
  readonly rss: number;
}

/** Best start and rise of y = start + rise·(1 − exp(−k x)) for this k. */
function linearPart(
  x: readonly number[],
  y: readonly number[],
  k: number,
  fixedStart: number | undefined,
): LinearPart {
  const n = x.length;
  let sf = 0;
  let sy = 0;
  for (let i = 0; i < n; i += 1) {
    sf += -Math.expm1(-k * (x[i] ?? 0));
    sy += y[i] ?? 0;
  }
  const meanF = fixedStart === undefined ? sf / n : 0;
  const meanY = fixedStart ?? sy / n;
  let sff = 0;
  let sfy = 0;
  for (let i = 0; i < n; i += 1) {
    const f = -Math.expm1(-k * (x[i] ?? 0)) - meanF;
    sff += f * f;
    sfy += f * ((y[i] ?? 0) - meanY);
  }
  const rise = sff > 0 ? sfy / sff : 0;
  const start = meanY - rise * meanF;
  let rss = 0;
  for (let i = 0; i < n; i += 1) {
    rss += ((y[i] ?? 0) - start + rise * Math.expm1(-k * (x[i] ?? 0))) ** 2;
  }
  return { start, rise, rss };
}

const GOLDEN = (Math.sqrt(5) - 1) / 2;

function goldenSection(f: (x: number) => number, from: number, to: number): number {
  let a = from;
  let b = to;
  let c = b - GOLDEN * (b - a);
  let d = a + GOLDEN * (b - a);
  let fc = f(c);
  let fd = f(d);
  for (let i = 0; i < 48; i += 1) {
    if (fc < fd) {
      b = d;
      d = c;
      fd = fc;
      c = b - GOLDEN * (b - a);
      fc = f(c);
    } else {
      a = c;
      c = d;
      fc = fd;
      d = a + GOLDEN * (b - a);
      fd = f(d);
    }
  }
  return (a + b) / 2;
}

/** Gauss-Newton steps on k, with the linear parameters projected out of the tangent. */
function polished(
  x: readonly number[],
  y: readonly number[],
  from: number,
  fixedStart: number | undefined,
): number {
  let k = from;
  for (let step = 0; step < 8; step += 1) {
    const { start, rise } = linearPart(x, y, k, fixedStart);
    const f = x.map((value) => -Math.expm1(-k * value));
    const tangent = x.map((value) => rise * value * Math.exp(-k * value));
    const project = (values: number[]): number[] => projectOut(values, f, fixedStart === undefined);
    const free = project(tangent);
    let top = 0;
    let bottom = 0;
    for (let i = 0; i < x.length; i += 1) {
      top += (free[i] ?? 0) * ((y[i] ?? 0) - start - rise * (f[i] ?? 0));
      bottom += (free[i] ?? 0) ** 2;
    }
    if (!(bottom > 0)) return k;
    const next = k + top / bottom;
    if (!(next > 0) || Math.abs(next - k) < 1e-15 * k) return next > 0 ? next : k;
    k = next;
  }
  return k;
}

function projectOut(values: number[], f: number[], withMean: boolean): number[] {
  const n = values.length;
  const meanV = withMean ? values.reduce((sum, value) => sum + value, 0) / n : 0;
  const meanF = withMean ? f.reduce((sum, value) => sum + value, 0) / n : 0;
  let vf = 0;
  let ff = 0;
  for (let i = 0; i < n; i += 1) {
    const df = (f[i] ?? 0) - meanF;
    vf += ((values[i] ?? 0) - meanV) * df;
    ff += df * df;
  }
  const share = ff > 0 ? vf / ff : 0;
  return values.map((value, i) => value - meanV - share * ((f[i] ?? 0) - meanF));
}
