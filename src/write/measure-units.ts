import { inchToMm, mmToInch } from '#shared/units/length.ts';
import { kgToLb, lbToKg } from '#shared/units/mass.ts';
import { barToPsi, psiToBar } from '#shared/units/pressure.ts';
import { fromCelsius, toCelsius } from '#shared/units/temperature.ts';
import { gallonsToLitres, litresToGallons } from '#shared/units/volume.ts';
import type { Units } from '#shared/units/units.ts';

/** How a stored unit is shown and typed. */
export interface ShownUnit {
  readonly unit: string;
  readonly decimals: number;
  readonly toShown: (stored: number) => number;
  readonly toStored: (shown: number) => number;
}

const same = (value: number): number => value;
const asStored = (unit: string, decimals: number): ShownUnit => ({
  unit,
  decimals,
  toShown: same,
  toStored: same,
});

/** The unit a member types a measure in; °, %, minutes, seconds and kW are the same for all. */
export function shownUnit(stored: string, units: Units): ShownUnit {
  const imperial = units.system === 'imperial';
  if (stored === '°C') {
    const unit = units.temperature;
    return {
      unit: `°${unit}`,
      decimals: 1,
      toShown: (value) => fromCelsius(value, unit),
      toStored: (value) => toCelsius(value, unit),
    };
  }
  if (stored === 'mm' && imperial) {
    return { unit: 'in', decimals: 2, toShown: mmToInch, toStored: inchToMm };
  }
  if (stored === 'kg' && imperial) {
    return { unit: 'lb', decimals: 1, toShown: kgToLb, toStored: lbToKg };
  }
  if (stored === 'bar' && imperial) {
    return { unit: 'psi', decimals: 1, toShown: barToPsi, toStored: psiToBar };
  }
  if (stored === 'l' && imperial) {
    return { unit: 'gal', decimals: 1, toShown: litresToGallons, toStored: gallonsToLitres };
  }
  return asStored(stored, 2);
}
