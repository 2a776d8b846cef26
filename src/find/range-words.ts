import type { FindRange } from '#shared/api/search.ts';
import { formatNumber } from '#shared/units/number.ts';
import {
  differenceCToF,
  differenceFToC,
  fromCelsius,
  toCelsius,
} from '#shared/units/temperature.ts';
import type { Units } from '#shared/units/units.ts';
import type { RangeEnds } from './find-address.ts';

/** The headings of the measures one may narrow by. */
export const RANGE_LABELS: Readonly<Record<FindRange, string>> = {
  stall: 'Level of a stall',
  peak: 'Peak',
  climb: 'Time to temperature',
  hold: 'Hold',
  crossing: 'Rate through 573 °C',
};

/** How a measure is shown to this reader, and what is typed brought back to stored units. */
export interface RangeUnit {
  readonly unit: string;
  readonly toShown: (stored: number) => number;
  readonly toStored: (shown: number) => number;
}

const same = (value: number): number => value;

export function rangeUnit(range: FindRange, { temperature }: Units): RangeUnit {
  if (range === 'climb' || range === 'hold') return { unit: 'min', toShown: same, toStored: same };
  const isRate = range === 'crossing';
  const unit = `°${temperature}${isRate ? '/min' : ''}`;
  if (temperature === 'C') return { unit, toShown: same, toStored: same };
  if (isRate) {
    return { unit, toShown: differenceCToF, toStored: differenceFToC };
  }
  return {
    unit,
    toShown: (stored) => fromCelsius(stored, 'F'),
    toStored: (shown) => toCelsius(shown, 'F'),
  };
}

/** "690 to 740 °C", "1000 °C or more", in the reader's units. */
export function rangeWords(range: FindRange, { min, max }: RangeEnds, units: Units): string {
  const { unit, toShown } = rangeUnit(range, units);
  const said = (value: number): string => formatNumber(Math.round(toShown(value) * 10) / 10);
  if (min !== null && max !== null) return `${said(min)} to ${said(max)}\u00a0${unit}`;
  if (min !== null) return `${said(min)}\u00a0${unit} or more`;
  return max === null ? 'any' : `up to ${said(max)}\u00a0${unit}`;
}
