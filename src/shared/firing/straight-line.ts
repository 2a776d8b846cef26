export interface StraightLine {
  readonly intercept: number;
  readonly slope: number;
  readonly interceptSd: number;
  readonly slopeSd: number;
  readonly residualSd: number;
  readonly rSquared: number;
}

/** Least squares y = intercept + slope·x of at least three points, about the means; null without spread. */
export function straightLine(x: readonly number[], y: readonly number[]): StraightLine | null {
  const n = x.length;
  if (n < 3) return null;
  const meanX = x.reduce((sum, value) => sum + value, 0) / n;
  const meanY = y.reduce((sum, value) => sum + value, 0) / n;
  let sxx = 0;
  let sxy = 0;
  let syy = 0;
  for (let i = 0; i < n; i += 1) {
    const dx = (x[i] ?? 0) - meanX;
    const dy = (y[i] ?? 0) - meanY;
    sxx += dx * dx;
    sxy += dx * dy;
    syy += dy * dy;
  }
  if (!(sxx > 0)) return null;
  const slope = sxy / sxx;
  let rss = 0;
  for (let i = 0; i < n; i += 1) {
    rss += ((y[i] ?? 0) - meanY - slope * ((x[i] ?? 0) - meanX)) ** 2;
  }
  const residualSd = Math.sqrt(rss / (n - 2));
  return {
    intercept: meanY - slope * meanX,
    slope,
    interceptSd: residualSd * Math.sqrt(1 / n + (meanX * meanX) / sxx),
    slopeSd: residualSd / Math.sqrt(sxx),
    residualSd,
    rSquared: syy > 0 ? 1 - rss / syy : 1,
  };
}
