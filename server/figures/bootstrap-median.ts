import { quantile } from '#shared/statistics/quantile.ts';
import type { Interval } from './intervals.ts';

/** From so many members on a median gets an interval: fewer resample to next to nothing new. */
export const FEWEST_MEMBERS_TO_RESAMPLE = 8;
const RESAMPLES = 1000;
const SEED = 0x5eed;

/** Mulberry32: small, and the same on every machine, so that equal firings give equal figures. */
function seeded(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296;
  };
}

/** The median (type 7) of ascending values, each taken as often as its member was drawn. */
function weightedMedian(
  sorted: readonly { readonly value: number; readonly member: number }[],
  drawn: Uint16Array,
  total: number,
): number {
  const h = (total - 1) / 2;
  const below = Math.floor(h);
  const above = Math.ceil(h);
  let seen = 0;
  let low = Number.NaN;
  for (const { value, member } of sorted) {
    seen += drawn[member] ?? 0;
    if (Number.isNaN(low) && seen > below) low = value;
    if (seen > above) return (low + value) / 2;
  }
  return low;
}

/**
 * The 95 % interval of a median by the percentile bootstrap (Efron, Annals of Statistics 7, 1979,
 * 1-26), members drawn and not their firings: one potter's firings are alike.
 * @returns null under eight members
 */
export function bootstrapMedian(
  values: readonly { readonly value: number; readonly memberId: number }[],
): Interval | null {
  const places = new Map<number, number>();
  const sizes: number[] = [];
  // In order of id, so that the order of the rows does not matter.
  for (const memberId of [...new Set(values.map((each) => each.memberId))].sort((a, b) => a - b)) {
    places.set(memberId, places.size);
    sizes.push(0);
  }
  const members = places.size;
  if (members < FEWEST_MEMBERS_TO_RESAMPLE) return null;
  const sorted = values
    .map(({ value, memberId }) => ({ value, member: places.get(memberId) ?? 0 }))
    .sort((a, b) => a.value - b.value);
  for (const { member } of sorted) sizes[member] = (sizes[member] ?? 0) + 1;
  const random = seeded(SEED);
  const medians: number[] = [];
  const drawn = new Uint16Array(members);
  for (let resample = 0; resample < RESAMPLES; resample += 1) {
    drawn.fill(0);
    let total = 0;
    for (let draw = 0; draw < members; draw += 1) {
      const member = Math.floor(random() * members);
      drawn[member] = (drawn[member] ?? 0) + 1;
      total += sizes[member] ?? 0;
    }
    medians.push(weightedMedian(sorted, drawn, total));
  }
  const lower = quantile(medians, 0.025);
  const upper = quantile(medians, 0.975);
  return lower === null || upper === null ? null : { lower, upper };
}
