import { formatNumber } from './number.ts';
import { NO_BREAK_SPACE } from './units.ts';
import type { Units } from './units.ts';

/** Millimetres in an inch, exact (NIST SP 811, Appendix B). */
export const MILLIMETRES_PER_INCH = 25.4;

export function mmToInch(millimetres: number): number {
  return millimetres / MILLIMETRES_PER_INCH;
}
export function inchToMm(inches: number): number {
  return inches * MILLIMETRES_PER_INCH;
}

/** "8 mm", "38 cm", "1.2 m" or "15 in": metric changes unit with the size, as people say it. */
export function formatLength(millimetres: number, units: Units): string {
  if (units.system === 'imperial') {
    const inches = mmToInch(millimetres);
    return `${formatNumber(inches, Math.abs(inches) < 10 ? 2 : 1)}${NO_BREAK_SPACE}in`;
  }
  const size = Math.abs(millimetres);
  if (size < 100) return `${formatNumber(millimetres)}${NO_BREAK_SPACE}mm`;
  if (size < 1000) return `${formatNumber(millimetres / 10, 1)}${NO_BREAK_SPACE}cm`;
  return `${formatNumber(millimetres / 1000, 2)}${NO_BREAK_SPACE}m`;
}
