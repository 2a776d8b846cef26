import { formatNumber } from '#shared/units/number.ts';
import type { MinuteWindow } from './minute-window.ts';

/** "28 to 48 min"; tenths where few minutes are meant. */
export function windowWords({ from, to }: MinuteWindow): string {
  const decimals = to - from < 15 ? 1 : 0;
  return `${formatNumber(from, decimals)} to ${formatNumber(to, decimals)}\u00a0min`;
}
