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
export function startOf(curve: Curve, marks: readonly Mark[]): Moment {
  const first = curve.minutes[0] ?? 0;
  const last = curve.minutes[curve.minutes.length - 1] ?? first;
  const lit = marks
    .filter((mark) => mark.kind === 'lit' && mark.minute < last)
    .reduce<number | null>((least, mark) => Math.min(least ?? mark.minute, mark.minute), null);
  if (lit !== null) return { minute: lit, inferred: false };

  const needed = Math.round(START_MINUTES / curve.stepMinutes);
  let run = 0;
  for (let i = 0; i < curve.rates.length; i += 1) {
    run = (curve.rates[i] ?? 0) >= START_RATE ? run + 1 : 0;
    if (run > needed) return { minute: curve.minutes[i - needed] ?? first, inferred: true };
  }
  return { minute: first, inferred: true };
}
