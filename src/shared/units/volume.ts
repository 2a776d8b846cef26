import { formatNumber } from './number.ts';
import { NO_BREAK_SPACE } from './units.ts';
import type { Units } from './units.ts';

/** Litres in a US gallon, exact (NIST SP 811, Appendix B). */
export const LITRES_PER_US_GALLON = 3.785411784;

/** Litres in a cubic foot, exact: 0.3048 m cubed. */
export const LITRES_PER_CUBIC_FOOT = 28.316846592;

export function litresToGallons(litres: number): number {
  return litres / LITRES_PER_US_GALLON;
}
export function gallonsToLitres(gallons: number): number {
  return gallons * LITRES_PER_US_GALLON;
}
export function litresToCubicFeet(litres: number): number {
  return litres / LITRES_PER_CUBIC_FOOT;
}

/** "85 l" or "22.5 US gal": containers and combustibles. */
export function formatVolume(litres: number, units: Units): string {
  if (units.system === 'imperial') {
    return `${formatNumber(litresToGallons(litres), 1)}${NO_BREAK_SPACE}US${NO_BREAK_SPACE}gal`;
  }
  return `${formatNumber(litres, Math.abs(litres) < 10 ? 1 : 0)}${NO_BREAK_SPACE}l`;
}

/** "85 l" or "3 cu ft": kiln chambers, which imperial makers give in cubic feet. */
export function formatChamber(litres: number, units: Units): string {
  return units.system === 'imperial'
    ? `${formatNumber(litresToCubicFeet(litres), 1)}${NO_BREAK_SPACE}cu${NO_BREAK_SPACE}ft`
    : formatVolume(litres, units);
}
