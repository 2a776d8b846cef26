import type { Spread } from '#shared/api/figure-topics.ts';

/** More points than this in one row cannot be told apart on a screen: they are counted in bins. */
export const MOST_POINTS = 400;
export const BINS = 60;

export interface Domain {
  readonly low: number;
  readonly high: number;
}

/** The least and the greatest of some values; null for none. */
export function domainOf(values: readonly number[]): Domain | null {
  if (values.length === 0) return null;
  let low = Infinity;
  let high = -Infinity;
  for (const value of values) {
    low = Math.min(low, value);
    high = Math.max(high, value);
  }
  return { low, high };
}

/** Every value ascending, or, past `MOST_POINTS`, how many lie in each of `BINS` equal parts. */
export function spreadOf(values: readonly number[], domain: Domain): Spread {
  if (values.length <= MOST_POINTS) {
    return { kind: 'points', values: [...values].sort((a, b) => a - b) };
  }
  const counts = Array.from({ length: BINS }, () => 0);
  const width = (domain.high - domain.low) / BINS || 1;
  for (const value of values) {
    const bin = Math.min(BINS - 1, Math.max(0, Math.floor((value - domain.low) / width)));
    counts[bin] = (counts[bin] ?? 0) + 1;
  }
  return { kind: 'bins', low: domain.low, high: domain.low + width * BINS, counts };
}
