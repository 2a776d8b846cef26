import { describe, expect, it } from 'vitest';
import { formatClock, formatDuration, formatSeconds } from '#shared/units/duration.ts';
import { formatLength, inchToMm, mmToInch } from '#shared/units/length.ts';
import { formatMass, KILOGRAMS_PER_POUND, kgToLb, lbToKg } from '#shared/units/mass.ts';
import { formatNumber, roundTo } from '#shared/units/number.ts';
import { barToPsi, formatPressure, KILOPASCALS_PER_PSI, psiToBar } from '#shared/units/pressure.ts';
import {
  cToF,
  cToK,
  differenceCToF,
  differenceFToC,
  formatDifference,
  formatRate,
  formatTemperature,
  fToC,
  kToC,
  roundTemperature,
} from '#shared/units/temperature.ts';
import { IMPERIAL_UNITS, METRIC_UNITS, NO_BREAK_SPACE as S } from '#shared/units/units.ts';
import { formatChamber, formatVolume, LITRES_PER_US_GALLON } from '#shared/units/volume.ts';
import conversions from '../../../reference/unit-conversions.json';

describe('temperature', () => {
  // Source: tests/reference/unit-conversions.json (SI Brochure, NIST SP 811).
  const pairs = conversions.rows.filter((row) => row.kind === 'temperature');
  it.each(pairs)('$C °C is $F °F and $K K', ({ C, F, K }) => {
    expect(cToF(C!)).toBeCloseTo(F!, 9);
    expect(fToC(F!)).toBeCloseTo(C!, 9);
    expect(kToC(K!)).toBeCloseTo(C!, 9);
    expect(cToK(C!)).toBeCloseTo(K!, 9);
  });

  it('a rate takes no 32: 100 °C an hour is 180 °F an hour', () => {
    const rates = conversions.rows.filter((row) => row.kind === 'rate');
    expect(rates.length).toBe(2);
    for (const rate of rates) {
      expect(differenceCToF(rate.C_per_h!)).toBeCloseTo(rate.F_per_h!, 9);
      expect(differenceFToC(rate.F_per_h!)).toBeCloseTo(rate.C_per_h!, 9);
    }
  });

  it('is shown in whole degrees with its unit, kept together by a no-break space', () => {
    expect(formatTemperature(712, 'C')).toBe(`712${S}°C`);
    expect(formatTemperature(712, 'F')).toBe(`1314${S}°F`);
    expect(formatTemperature(1010, 'F')).toBe(`1850${S}°F`);
    expect(formatTemperature(-3.4, 'C')).toBe(`−3${S}°C`);
    expect(formatTemperature(-0.2, 'C')).toBe(`0${S}°C`);
    expect(formatTemperature(Number.NaN, 'C')).not.toContain('NaN');
    expect(roundTemperature(1009.6, 'C')).toBe(1010);
  });

  it('a difference of 25 °C is shown as 45 °F, and rates keep a decimal below 10', () => {
    expect(formatDifference(25, 'F')).toBe(`45${S}°F`);
    expect(formatRate(2.46, 'C')).toBe(`2.5${S}°C/min`);
    expect(formatRate(21.3, 'C')).toBe(`21${S}°C/min`);
    expect(formatRate(10, 'F')).toBe(`18${S}°F/min`);
  });
});

describe('other units', () => {
  it('the factors are the published ones', () => {
    const factor = (from: string) => conversions.rows.find((row) => row.from === from)!.value!;
    expect(KILOGRAMS_PER_POUND).toBe(factor('lb'));
    expect(LITRES_PER_US_GALLON).toBe(factor('US gallon'));
    expect(KILOPASCALS_PER_PSI).toBe(factor('psi'));
  });

  it('conversions there and back give the same number', () => {
    expect(lbToKg(kgToLb(5.3))).toBeCloseTo(5.3, 12);
    expect(inchToMm(mmToInch(381))).toBeCloseTo(381, 12);
    expect(psiToBar(barToPsi(1.5))).toBeCloseTo(1.5, 12);
  });

  it('are shown in the system the member chose', () => {
    expect(formatMass(5.3, METRIC_UNITS)).toBe(`5.3${S}kg`);
    expect(formatMass(5.3, IMPERIAL_UNITS)).toBe(`11.7${S}lb`);
    expect(formatLength(8, METRIC_UNITS)).toBe(`8${S}mm`);
    expect(formatLength(381, METRIC_UNITS)).toBe(`38.1${S}cm`);
    expect(formatLength(381, IMPERIAL_UNITS)).toBe(`15${S}in`);
    expect(formatVolume(60, METRIC_UNITS)).toBe(`60${S}l`);
    expect(formatVolume(60, IMPERIAL_UNITS)).toBe(`15.9${S}US${S}gal`);
    expect(formatChamber(85, IMPERIAL_UNITS)).toBe(`3${S}cu${S}ft`);
    expect(formatPressure(1.5, METRIC_UNITS)).toBe(`1.5${S}bar`);
    expect(formatPressure(1.5, IMPERIAL_UNITS)).toBe(`21.8${S}psi`);
  });
});

describe('durations and numbers', () => {
  it('are shown in hours and minutes as they are said', () => {
    expect(formatDuration(14)).toBe(`14${S}min`);
    expect(formatDuration(80)).toBe(`1${S}h 20${S}min`);
    expect(formatDuration(120)).toBe(`2${S}h`);
    expect(formatDuration(59.7)).toBe(`1${S}h`);
    expect(formatDuration(2.4)).toBe(`2.5${S}min`);
    expect(formatDuration(0)).toBe(`0${S}min`);
    expect(formatDuration(0.5)).toBe(`30${S}s`);
    expect(formatSeconds(45)).toBe(`45${S}s`);
    expect(formatClock(80)).toBe('1:20');
    expect(formatClock(4.6)).toBe('0:05');
  });

  it('rounding has no minus zero and goes away from zero at a half', () => {
    expect(Object.is(roundTo(-0.2), 0)).toBe(true);
    expect(roundTo(2.5)).toBe(3);
    expect(roundTo(-2.5)).toBe(-3);
    expect(formatNumber(-2.25, 1)).toBe('−2.3');
  });
});
