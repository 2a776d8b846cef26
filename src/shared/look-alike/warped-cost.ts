import { BAND_MINUTES, MISSING_MINUTE_CELSIUS, MOST_MINUTES } from './constants.ts';

const CELLS = 2 * BAND_MINUTES + 1;
// Worked on in turns; nothing of one call is read by the next.
let before = new Float64Array(CELLS + 1);
let now = new Float64Array(CELLS + 1);

/** Signatures stand one after the other, each drawn out to `MOST_MINUTES` by its last level. */
export type DrawnOut = Int16Array;

/** Puts a signature, drawn out by its last level, into its place. */
export function drawOut(into: DrawnOut, place: number, signature: Int16Array): void {
  const base = place * MOST_MINUTES;
  const last = signature[signature.length - 1] ?? 0;
  into.fill(last, base, base + MOST_MINUTES);
  into.set(signature.subarray(0, MOST_MINUTES), base);
}

/** What the minutes that only one of the two has cost together, °C² weighed as path steps are. */
export function missingCost(oneMinutes: number, otherMinutes: number): number {
  return 2 * Math.abs(oneMinutes - otherMinutes) * MISSING_MINUTE_CELSIUS ** 2;
}

/**
 * The least sum of squared differences along a path through both climbs that never strays more
 * than `BAND_MINUTES` from equal minutes; a step in both counts twice, in one of them once, so that
 * all paths weigh 2 × `minutes` and the two may change places (the symmetric form of Sakoe and
 * Chiba 1978). Whole numbers throughout, so it is exact.
 *
 * @param query drawn out, of one signature
 * @param rest per minute, the least that all later minutes of the other one must still cost
 * @returns Infinity as soon as it cannot come in at or under `limit`
 */
export function warpedCost(
  query: DrawnOut,
  others: DrawnOut,
  base: number,
  minutes: number,
  limit: number,
  rest: Float64Array | null,
): number {
  before.fill(Infinity);
  for (let row = 0; row < minutes; row += 1) {
    const celsius = others[base + row] ?? 0;
    const from = row < BAND_MINUTES ? BAND_MINUTES - row : 0;
    const overhang = row + BAND_MINUTES - (minutes - 1);
    const to = overhang > 0 ? CELLS - overhang : CELLS;
    let left = Infinity;
    let least = Infinity;
    now.fill(Infinity);
    for (let cell = from; cell < to; cell += 1) {
      const apart = celsius - (query[row + cell - BAND_MINUTES] ?? 0);
      const cost = apart * apart;
      let sum = Math.min((before[cell + 1] ?? Infinity) + cost, left + cost);
      sum = Math.min(sum, (before[cell] ?? Infinity) + 2 * cost);
      if (row === 0 && cell === BAND_MINUTES) sum = 2 * cost;
      now[cell] = sum;
      left = sum;
      if (sum < least) least = sum;
    }
    if (least + (rest?.[row] ?? 0) > limit) return Infinity;
    const swap = before;
    before = now;
    now = swap;
  }
  return before[BAND_MINUTES] ?? Infinity;
}
