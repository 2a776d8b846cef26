/**
 * Sample quantile of definition 7 of Hyndman and Fan (The American Statistician 50, 1996, 361-365):
 * h = (n − 1)p + 1, linear between the two neighbours. `null` for no values.
 * @param values in any order, finite
 * @param p from 0 to 1
 */
export function quantile(values: readonly number[], p: number): number | null {
  return quantileOfSorted(
    [...values].sort((a, b) => a - b),
    p,
  );
}

/** The same of values already in ascending order, without a copy. */
export function quantileOfSorted(sorted: ArrayLike<number>, p: number): number | null {
  const n = sorted.length;
  if (n === 0) return null;
  const h = (n - 1) * Math.min(1, Math.max(0, p));
  const below = Math.floor(h);
  const low = sorted[below] ?? 0;
  const high = sorted[Math.min(below + 1, n - 1)] ?? low;
  return low + (h - below) * (high - low);
}

/** The median; `null` for no values. */
export function median(values: readonly number[]): number | null {
  return quantile(values, 0.5);
}
