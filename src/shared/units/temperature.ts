import { formatNumber, roundTo } from './number.ts';
import { NO_BREAK_SPACE } from './units.ts';

export type TemperatureUnit = 'C' | 'F';

/** Ice point in kelvin (SI Brochure, 9th ed.): K = °C + 273.15. */
const ICE_POINT_KELVIN = 273.15;

/** °F = 1.8 °C + 32 (NIST SP 811, Appendix B). */
export function cToF(celsius: number): number {
  return celsius * 1.8 + 32;
}

/** °C from °F; 1850 °F is 1010 °C. */
export function fToC(fahrenheit: number): number {
  return (fahrenheit - 32) / 1.8;
}

/** °C from kelvin. */
export function kToC(kelvin: number): number {
  return kelvin - ICE_POINT_KELVIN;
}

/** kelvin from °C. */
export function cToK(celsius: number): number {
  return celsius + ICE_POINT_KELVIN;
}

/** A difference or a rate in F degrees: no 32, because both ends carry it. */
export function differenceCToF(celsiusDifference: number): number {
  return celsiusDifference * 1.8;
}

/** A difference or a rate in C degrees. */
export function differenceFToC(fahrenheitDifference: number): number {
  return fahrenheitDifference / 1.8;
}

/** A temperature in the member's unit, unrounded. */
export function fromCelsius(celsius: number, unit: TemperatureUnit): number {
  return unit === 'F' ? cToF(celsius) : celsius;
}

/** °C from what a member typed in their own unit. */
export function toCelsius(value: number, unit: TemperatureUnit): number {
  return unit === 'F' ? fToC(value) : value;
}

/** A temperature rounded to whole degrees of the unit: what a pyrometer shows. */
export function roundTemperature(celsius: number, unit: TemperatureUnit): number {
  return roundTo(fromCelsius(celsius, unit));
}

/** "712 °C" or "1314 °F": whole degrees. */
export function formatTemperature(celsius: number, unit: TemperatureUnit): string {
  return `${formatNumber(fromCelsius(celsius, unit))}${NO_BREAK_SPACE}°${unit}`;
}

/** "25 °C" as a difference: 45 °F, not 77. */
export function formatDifference(celsiusDifference: number, unit: TemperatureUnit): string {
  const value = unit === 'F' ? differenceCToF(celsiusDifference) : celsiusDifference;
  return `${formatNumber(value)}${NO_BREAK_SPACE}°${unit}`;
}

/** "12 °C/min": one decimal below 10, so that 2.5 and 3 differ. */
export function formatRate(celsiusPerMinute: number, unit: TemperatureUnit): string {
  const value = unit === 'F' ? differenceCToF(celsiusPerMinute) : celsiusPerMinute;
  return `${formatNumber(value, Math.abs(value) < 10 ? 1 : 0)}${NO_BREAK_SPACE}°${unit}/min`;
}
