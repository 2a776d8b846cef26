import { formatNumber } from './number.ts';
import { NO_BREAK_SPACE } from './units.ts';
import type { Units } from './units.ts';

/** Kilopascals in a pound per square inch (NIST SP 811, Appendix B). */
export const KILOPASCALS_PER_PSI = 6.894757293168;

/** Kilopascals in a bar, exact. */
export const KILOPASCALS_PER_BAR = 100;

export function barToPsi(bar: number): number {
  return (bar * KILOPASCALS_PER_BAR) / KILOPASCALS_PER_PSI;
}
export function psiToBar(psi: number): number {
  return (psi * KILOPASCALS_PER_PSI) / KILOPASCALS_PER_BAR;
}

/** "1.5 bar" or "21.8 psi", both as the regulator's gauge shows them. */
export function formatPressure(bar: number, units: Units): string {
  return units.system === 'imperial'
    ? `${formatNumber(barToPsi(bar), 1)}${NO_BREAK_SPACE}psi`
    : `${formatNumber(bar, 2)}${NO_BREAK_SPACE}bar`;
}
