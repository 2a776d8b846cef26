import { START_MINUTES, START_RATE } from './constants.ts';
import type { Curve } from './curve.ts';
import type { Mark } from './types.ts';

export interface Moment {
  readonly minute: number;
  readonly inferred: boolean;
}

/**
 * Start of the firing: the lit mark; else the first time the rate is at least 3 °C/min for 2 min;
 * else the first reading. A lit mark after the last reading is not this record's.
 */
export function startOf(
  narrow: Curve,
  fine: Curve,
  fineError: number,
  marks: readonly Mark[],
): Moment {
  const first = narrow.minutes[0] ?? 0;
  const last = narrow.minutes[narrow.minutes.length - 1] ?? first;
  const lit = marks
    .filter((mark) => mark.kind === 'lit' && mark.minute < last)
    .reduce<number | null>((least, mark) => Math.min(least ?? mark.minute, mark.minute), null);
  if (lit !== null) return { minute: lit, inferred: false };

  const needed = Math.round(START_MINUTES / narrow.stepMinutes);
  let run = 0;
  for (let i = 0; i < narrow.rates.length; i += 1) {
    run = (narrow.rates[i] ?? 0) >= START_RATE ? run + 1 : 0;
    if (run > needed)
      return { minute: corner(narrow, fine, fineError, i - needed), inferred: true };
  }
  return { minute: first, inferred: true };
}

/** A wide window sees the climb before it begins: go on to where the level has really left. */
function corner(narrow: Curve, fine: Curve, fineError: number, at: number): number {
  if (at === 0 || narrow.halfMinutes <= 0.5) return narrow.minutes[at] ?? 0;
  const level = fine.celsius[at] ?? 0;
  const furthest = at + Math.round(narrow.halfMinutes / narrow.stepMinutes);
  let i = at;
  while (i < furthest && (fine.celsius[i + 1] ?? Infinity) < level + Math.max(2, 3 * fineError)) {
    i += 1;
  }
  return narrow.minutes[i] ?? 0;
}
