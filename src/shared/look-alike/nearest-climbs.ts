import type { ClimbSignature } from './climb-signature.ts';
import { STRETCH_MINUTES, STRETCHES, type ClimbStore } from './climb-store.ts';
import { BAND_MINUTES, MOST_MINUTES } from './constants.ts';
import { distanceOf } from './signature-distance.ts';
import { drawOut, missingCost, warpedCost } from './warped-cost.ts';

export interface NearClimb {
  readonly noteId: number;
  /** See `signatureDistance`. */
  readonly apartCelsius: number;
}

export interface NearestOptions {
  /** How many at most. */
  readonly count: number;
  /** Only climbs at most this far apart, °C. */
  readonly withinCelsius?: number;
  /** Notes that are not to be told of, e.g. the one that is asked for. */
  readonly without?: ReadonlySet<number>;
}

/** After so many climbs measured or looked at, the search can be laid aside for other work. */
const MEASURED_AT_ONCE = 128;
const LOOKED_AT_AT_ONCE = 4096;
/** Rough distances are put in order by whole degrees, up to this one. */
const ROUGH_DEGREES = 2048;
/** Rounding of the means kept as 32-bit numbers, °C: well over it. */
const MEAN_ROUNDING = 0.001;

/**
 * The climbs of the store nearest to one, nearest first, notes as near as each other by number:
 * exactly those that measuring every one would give.
 *
 * First a rough look at all of them: by how much the means of five minutes lie outside the band
 * around the query (never more than the distance, as squared distance from an interval is convex:
 * the bound of Keogh and Ratanamahatana 2005 over means). In the order of that, the same bound
 * minute by minute, then the warped distance itself, each left as soon as it cannot be among the
 * nearest; the search ends at the first rough distance beyond them.
 */
export function nearestClimbs(
  store: ClimbStore,
  query: ClimbSignature,
  options: NearestOptions,
): NearClimb[] {
  const search = searchClimbs(store, query, options);
  let step = search.next();
  while (step.done !== true) step = search.next();
  return step.value;
}

/** The same in small pieces, so that a server can answer others in between. */
export function* searchClimbs(
  store: ClimbStore,
  query: ClimbSignature,
  { count, withinCelsius = Infinity, without }: NearestOptions,
): Generator<undefined, NearClimb[], undefined> {
  if (count <= 0 || query.length === 0) return [];
  const prepared = prepare(query);
  const rough = new Float64Array(store.size);
  for (let from = 0; from < store.size; from += LOOKED_AT_AT_ONCE) {
    lookRoughly(store, prepared, rough, from, Math.min(store.size, from + LOOKED_AT_AT_ONCE));
    yield;
  }
  const { order, edges } = inOrder(rough, withinCelsius);
  yield;
  const near: NearClimb[] = [];
  const rest = new Float64Array(MOST_MINUTES);
  let limit = withinCelsius;
  let measured = 0;
  for (let degree = 0; degree < ROUGH_DEGREES; degree += 1) {
    if (degree > limit) break;
    for (let at = edges[degree] ?? 0; at < (edges[degree + 1] ?? 0); at += 1) {
      const place = order[at] ?? 0;
      if ((rough[place] ?? 0) > limit) continue;
      const noteId = store.noteIds[place] ?? 0;
      if (without?.has(noteId) === true) continue;
      const apartCelsius = measure(store, place, prepared, limit, rest);
      measured += 1;
      if (apartCelsius <= limit) {
        insert(near, { noteId, apartCelsius }, count);
        if (near.length === count) limit = near[count - 1]?.apartCelsius ?? limit;
      }
      if (measured % MEASURED_AT_ONCE === 0) yield;
    }
  }
  return near;
}

interface Prepared {
  readonly minutes: number;
  readonly celsius: Int16Array;
  /** The lowest and the highest of the query within the band about each minute. */
  readonly low: Int16Array;
  readonly high: Int16Array;
  readonly meanLow: Float64Array;
  readonly meanHigh: Float64Array;
}

function prepare(query: ClimbSignature): Prepared {
  const celsius = new Int16Array(MOST_MINUTES);
  drawOut(celsius, 0, query);
  const low = new Int16Array(MOST_MINUTES);
  const high = new Int16Array(MOST_MINUTES);
  for (let minute = 0; minute < MOST_MINUTES; minute += 1) {
    const band = celsius.subarray(Math.max(0, minute - BAND_MINUTES), minute + BAND_MINUTES + 1);
    low[minute] = Math.min(...band);
    high[minute] = Math.max(...band);
  }
  const meansOf = (values: Int16Array) =>
    Float64Array.from({ length: STRETCHES }, (_value, stretch) => {
      const from = stretch * STRETCH_MINUTES;
      return (
        values.subarray(from, from + STRETCH_MINUTES).reduce((a, b) => a + b, 0) / STRETCH_MINUTES
      );
    });
  const minutes = Math.min(query.length, MOST_MINUTES);
  return {
    minutes,
    celsius,
    low,
    high,
    meanLow: meansOf(low).map((mean) => mean - MEAN_ROUNDING),
    meanHigh: meansOf(high).map((mean) => mean + MEAN_ROUNDING),
  };
}

/** A lower bound of each distance, °C, from the means of whole stretches. */
function lookRoughly(
  { lengths, means }: ClimbStore,
  { minutes, meanLow, meanHigh }: Prepared,
  rough: Float64Array,
  from: number,
  to: number,
): void {
  for (let place = from; place < to; place += 1) {
    const length = lengths[place] ?? 0;
    const longer = length > minutes ? length : minutes;
    const whole = Math.floor(longer / STRETCH_MINUTES);
    const base = place * STRETCHES;
    let sum = 0;
    for (let stretch = 0; stretch < whole; stretch += 1) {
      const mean = means[base + stretch] ?? 0;
      const over = mean - (meanHigh[stretch] ?? 0);
      const under = (meanLow[stretch] ?? 0) - mean;
      if (over > 0) sum += over * over;
      else if (under > 0) sum += under * under;
    }
    rough[place] = distanceOf(sum * STRETCH_MINUTES + missingCost(minutes, length), longer);
  }
}

/** Places not beyond a limit in the order of whole rough degrees, and where each degree begins. */
function inOrder(rough: Float64Array, limit: number): { order: Uint32Array; edges: Uint32Array } {
  const edges = new Uint32Array(ROUGH_DEGREES + 1);
  const degrees = new Uint16Array(rough.length);
  for (let place = 0; place < rough.length; place += 1) {
    const value = rough[place] ?? 0;
    // Counted from 1; 0 stands for what is beyond the limit.
    const degree =
      value > limit ? 0 : value < ROUGH_DEGREES ? Math.floor(value) + 1 : ROUGH_DEGREES;
    degrees[place] = degree;
    if (degree > 0) edges[degree] = (edges[degree] ?? 0) + 1;
  }
  for (let degree = 0; degree < ROUGH_DEGREES; degree += 1) {
    edges[degree + 1] = (edges[degree + 1] ?? 0) + (edges[degree] ?? 0);
  }
  const next = edges.slice();
  const order = new Uint32Array(edges[ROUGH_DEGREES] ?? 0);
  for (let place = 0; place < rough.length; place += 1) {
    const degree = degrees[place] ?? 0;
    if (degree === 0) continue;
    const at = next[degree - 1] ?? 0;
    order[at] = place;
    next[degree - 1] = at + 1;
  }
  return { order, edges };
}

/** The distance, or Infinity as soon as it is sure to be beyond the limit. */
function measure(
  store: ClimbStore,
  place: number,
  { minutes, celsius, low, high }: Prepared,
  limitCelsius: number,
  rest: Float64Array,
): number {
  const length = store.lengths[place] ?? 0;
  const longer = Math.max(minutes, length);
  const missing = missingCost(minutes, length);
  const base = place * MOST_MINUTES;
  // A hair wider, for the rounding of root and square: what is as near as the last one counts.
  const limit = limitCelsius ** 2 * 2 * longer * (1 + 1e-12) - missing;
  let sum = 0;
  for (let minute = longer - 1; minute >= 0; minute -= 1) {
    rest[minute] = sum;
    const value = store.celsius[base + minute] ?? 0;
    const outside = Math.max(value - (high[minute] ?? 0), (low[minute] ?? 0) - value);
    if (outside > 0) sum += outside * outside;
    if (sum > limit) return Infinity;
  }
  const cost = warpedCost(celsius, store.celsius, base, longer, limit, rest);
  return distanceOf(cost + missing, longer);
}

/** Puts one in its place among the nearest. */
function insert(near: NearClimb[], one: NearClimb, count: number): void {
  let at = near.length;
  while (at > 0) {
    const other = near[at - 1];
    if (other === undefined || isNearer(other, one)) break;
    at -= 1;
  }
  if (at >= count) return;
  near.splice(at, 0, one);
  if (near.length > count) near.pop();
}

const isNearer = (one: NearClimb, other: NearClimb): boolean =>
  one.apartCelsius < other.apartCelsius ||
  (one.apartCelsius === other.apartCelsius && one.noteId < other.noteId);
