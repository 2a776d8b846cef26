import type { ClimbSignature } from './climb-signature.ts';
import { MOST_MINUTES } from './constants.ts';
import { drawOut, missingCost, warpedCost } from './warped-cost.ts';

/**
 * How far apart two climbs are, °C: the root mean square difference per matched step under banded
 * dynamic time warping. The shorter one is taken to stay at its last level, and every minute it
 * lacks costs besides. 0 for a signature and itself; the same both ways.
 *
 * @param bestSoFar °C; the answer is Infinity as soon as it is sure to be more than this
 */
export function signatureDistance(
  one: ClimbSignature,
  other: ClimbSignature,
  bestSoFar = Infinity,
): number {
  const minutes = Math.max(one.length, other.length);
  if (minutes === 0) return 0;
  const drawnOne = new Int16Array(MOST_MINUTES);
  const drawnOther = new Int16Array(MOST_MINUTES);
  drawOut(drawnOne, 0, one);
  drawOut(drawnOther, 0, other);
  const missing = missingCost(one.length, other.length);
  // A hair wider: what is as far as the best is still to be told exactly.
  const limit = bestSoFar ** 2 * 2 * minutes * (1 + 1e-12) - missing;
  const cost = warpedCost(drawnOne, drawnOther, 0, minutes, limit, null);
  const distance = distanceOf(cost + missing, minutes);
  return distance > bestSoFar ? Infinity : distance;
}

/** °C from the sum along a path that weighs 2 × `minutes`. */
export function distanceOf(cost: number, minutes: number): number {
  return Math.sqrt(cost / (2 * minutes));
}
