import { formatNumber } from './number.ts';
import { NO_BREAK_SPACE } from './units.ts';
import type { Units } from './units.ts';

/** Kilograms in a pound, exact (NIST SP 811, Appendix B). */
export const KILOGRAMS_PER_POUND = 0.45359237;

export function kgToLb(kilograms: number): number {
  return kilograms / KILOGRAMS_PER_POUND;
}
export function lbToKg(pounds: number): number {
  return pounds * KILOGRAMS_PER_POUND;
}

/** "5.3 kg" or "11.7 lb". */
export function formatMass(kilograms: number, units: Units): string {
  return units.system === 'imperial'
    ? `${formatNumber(kgToLb(kilograms), 1)}${NO_BREAK_SPACE}lb`
    : `${formatNumber(kilograms, kilograms < 1 ? 2 : 1)}${NO_BREAK_SPACE}kg`;
}
