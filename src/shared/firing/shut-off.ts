import { COOLED_BY, JUST_SHORT, STEEP_MINUTES, STEEP_RATE } from './constants.ts';
import type { Curve } from './curve.ts';
import { stepAt } from './curve.ts';
import type { Moment } from './start.ts';
import type { Mark } from './types.ts';

/** A climb of this much after a fall says that the firing went on, °C. */
const CLIMBED_AGAIN = 100;
/** The curve must stay this far below where it fell from, °C. */
const STAYS_BELOW = 15;
const SLOW_FALL_RATE = 2;

interface ShutOffClues {
  readonly fineError: number;
  readonly readingMinutes: Float64Array;
  readonly startMinute: number;
  readonly targetCelsius: number | null;
  readonly marks: readonly Mark[];
}

/**
 * End of the firing: the last shut-off mark not followed by lighting again; else the last reading
 * before a lasting steep fall after the peak; else the last reading.
 */
export function shutOffOf(
  fine: Curve,
  { fineError, readingMinutes, startMinute, targetCelsius, marks }: ShutOffClues,
): Moment {
  const last = fine.minutes[fine.minutes.length - 1] ?? 0;
  const off = latest(marks, ['shut-off']);
  const relit = latest(marks, ['lit', 'relit']);
  if (off !== null && off > startMinute && (relit === null || relit < off)) {
    return { minute: off, inferred: false };
  }
  const from = off !== null && relit !== null && relit >= off ? relit : startMinute;
  const knee = kneeOf(
    fine,
    Math.max(from, fine.minutes[0] ?? 0),
    Math.min(3, Math.max(0.25, 3 * fineError)),
    targetCelsius,
  );
  return { minute: knee === null ? last : readingBefore(readingMinutes, knee), inferred: true };
}

function latest(marks: readonly Mark[], kinds: readonly Mark['kind'][]): number | null {
  return marks
    .filter((mark) => kinds.includes(mark.kind))
    .reduce<number | null>((most, mark) => Math.max(most ?? mark.minute, mark.minute), null);
}

function readingBefore(minutes: Float64Array, minute: number): number {
  let low = 0;
  let high = minutes.length - 1;
  while (low < high) {
    const middle = (low + high + 1) >> 1;
    if ((minutes[middle] ?? 0) <= minute + 0.2) low = middle;
    else high = middle - 1;
  }
  return minutes[low] ?? minute;
}

/** Where the lasting fall after the peak begins; null where the record has none. */
function kneeOf(
  fine: Curve,
  fromMinute: number,
  near: number,
  targetCelsius: number | null,
): number | null {
  const v = fine.celsius;
  const n = v.length;
  const peak = highest(v, stepAt(fine, fromMinute), n);
  const span = Math.max(1, Math.round(STEEP_MINUTES / fine.stepMinutes));
  const highestAfter = new Float64Array(n + 1).fill(-Infinity);
  for (let i = n - 1; i >= 0; i -= 1) {
    highestAfter[i] = Math.max(v[i] ?? -Infinity, highestAfter[i + 1] ?? -Infinity);
  }
  const climbsAgain = lastClimb(v, peak, n);
  for (let i = Math.max(peak, climbsAgain); i < n - 1; i += 1) {
    const to = Math.min(n - 1, i + span);
    const minutes = (to - i) * fine.stepMinutes;
    if (minutes < 1) break;
    const drop = (v[i] ?? 0) - (v[to] ?? 0);
    if (drop < Math.max(STAYS_BELOW, STEEP_RATE * minutes)) continue;
    const knee = kneeBetween(fine, i, to, near);
    if ((highestAfter[to] ?? 0) <= (v[knee] ?? 0) - STAYS_BELOW) return fine.minutes[knee] ?? null;
  }
  return slowFall(fine, Math.max(peak, climbsAgain), near, targetCelsius);
}

/**
 * Where a span bends from level into its fall: the step farthest above a line that falls half as fast
 * as the span does, so that a hold that itself sinks a little is not cut at its top. Never before the
 * last step near the top.
 */
function kneeBetween(fine: Curve, from: number, to: number, near: number): number {
  const v = fine.celsius;
  const top = highest(v, from, to + 1);
  const slope = ((v[top] ?? 0) - (v[to] ?? 0)) / Math.max(1, to - top) / 2;
  let knee = top;
  for (let i = top; i <= to; i += 1) {
    if ((v[i] ?? 0) + slope * i > (v[knee] ?? 0) + slope * knee) knee = i;
  }
  return Math.max(knee, lastNearTop(v, from, to, near));
}

/** The last step near the highest of a span: where a level ends and the fall begins. */
function lastNearTop(v: Float64Array, from: number, to: number, near: number): number {
  const top = v[highest(v, from, to + 1)] ?? 0;
  let knee = from;
  for (let i = from; i <= to; i += 1) if ((v[i] ?? 0) >= top - near) knee = i;
  return knee;
}

/**
 * A kiln that cools slowly to the record's end without ever turning was shut off at its peak; below
 * its target it may only sag, until it has lost COOLED_BY.
 */
function slowFall(
  fine: Curve,
  from: number,
  near: number,
  targetCelsius: number | null,
): number | null {
  const v = fine.celsius;
  const n = v.length;
  const top = highest(v, from, n);
  const knee = lastNearTop(v, top, n - 1, near);
  const drop = (v[knee] ?? 0) - (v[n - 1] ?? 0);
  const minutes = (n - 1 - knee) * fine.stepMinutes;
  const isDone = targetCelsius !== null && (v[knee] ?? 0) >= targetCelsius - JUST_SHORT;
  return drop >= (isDone ? STAYS_BELOW : COOLED_BY) && drop >= SLOW_FALL_RATE * minutes
    ? (fine.minutes[knee] ?? null)
    : null;
}

/** Index at which the last climb of CLIMBED_AGAIN after the peak ends; the peak if there is none. */
function lastClimb(v: Float64Array, peak: number, n: number): number {
  let low = v[peak] ?? 0;
  let end = peak;
  for (let i = peak; i < n; i += 1) {
    const value = v[i] ?? 0;
    if (value < low) low = value;
    if (value >= low + CLIMBED_AGAIN) {
      end = highest(v, i, n);
      low = v[end] ?? 0;
      i = end;
    }
  }
  return end;
}

function highest(v: Float64Array, from: number, to: number): number {
  let best = from;
  for (let i = from; i < to; i += 1) if ((v[i] ?? 0) > (v[best] ?? 0)) best = i;
  return best;
}
