import { describe, expect, it } from 'vitest';
import { fitExponentialApproach } from '#shared/firing/exponential-approach.ts';
import { gasUse, PROPANE_MEGAJOULES_PER_KG } from '#shared/firing/gas.ts';
import { QUARTZ_FROM, QUARTZ_INVERSION, QUARTZ_TO } from '#shared/firing/constants.ts';
import { probeTolerance } from '#shared/firing/probe-tolerance.ts';
import { combustiblePerLitre } from '#shared/firing/reduction.ts';
import { normalNumber, seededRandom } from '../../../../seeds/simulation/seeded-random.ts';
import { straightLine } from '#shared/firing/straight-line.ts';
import type { Probe } from '#shared/vocabulary/kiln.ts';
import misra from '../../../reference/strd-misra1a.json';
import norris from '../../../reference/strd-norris.json';
import propane from '../../../reference/propane.json';
import silica from '../../../reference/silica-inversions.json';
import tolerance from '../../../reference/thermocouple-tolerance.json';

/** Digits in which two numbers agree. */
const digits = (actual: number, certified: number) =>
  -Math.log10(Math.abs(actual - certified) / Math.abs(certified) + 1e-17);

describe('fits against certified values', () => {
  // Source: NIST Statistical Reference Datasets, Misra1a (tests/reference/strd-misra1a.json).
  it('the exponential approach finds the certified parameters of Misra1a to 8 digits, their deviations to 6', () => {
    const fit = fitExponentialApproach(
      misra.rows.map((row) => row.x),
      misra.rows.map((row) => row.y),
      { start: 0, shortestTimeConstant: 10, longestTimeConstant: 100_000 },
    )!;
    expect(digits(fit.end, misra.certified.b1)).toBeGreaterThan(8);
    expect(digits(1 / fit.timeConstant, misra.certified.b2)).toBeGreaterThan(8);
    expect(
      digits(fit.residualSumOfSquares, misra.certified.residual_sum_of_squares),
    ).toBeGreaterThan(8);
    expect(digits(fit.endSd, misra.certified.b1_sd)).toBeGreaterThan(6);
    expect(digits(fit.rateSd, misra.certified.b2_sd)).toBeGreaterThan(6);
  });

  it('the exponential approach with a free start finds the numbers it was made from', () => {
    const x = Array.from({ length: 30 }, (_, i) => i * 0.5);
    const y = x.map((t) => 730 - 200 * Math.exp(-t / 9));
    const fit = fitExponentialApproach(x, y, { shortestTimeConstant: 1, longestTimeConstant: 90 })!;
    expect(fit.end).toBeCloseTo(730, 6);
    expect(fit.start).toBeCloseTo(530, 6);
    expect(fit.timeConstant).toBeCloseTo(9, 6);
  });

  it('with a free start the deviations are those that many noisy samples show', () => {
    const x = Array.from({ length: 60 }, (_, i) => i * 0.5);
    const fits = Array.from({ length: 400 }, (_, seed) => {
      const random = seededRandom(seed + 1);
      const y = x.map((t) => 730 - 200 * Math.exp(-t / 9) + normalNumber(random));
      return fitExponentialApproach(x, y, { shortestTimeConstant: 1, longestTimeConstant: 90 })!;
    });
    const mean = fits.reduce((sum, fit) => sum + fit.end, 0) / fits.length;
    const spread = Math.sqrt(
      fits.reduce((sum, fit) => sum + (fit.end - mean) ** 2, 0) / fits.length,
    );
    const said = fits.reduce((sum, fit) => sum + fit.endSd, 0) / fits.length;
    expect(said / spread).toBeGreaterThan(0.85);
    expect(said / spread).toBeLessThan(1.15);
  });

  // Source: NIST Statistical Reference Datasets, Norris (tests/reference/strd-norris.json).
  it('the straight line finds the certified values of Norris to 10 digits', () => {
    const line = straightLine(
      norris.rows.map((row) => row.x),
      norris.rows.map((row) => row.y),
    )!;
    expect(digits(line.slope, norris.certified.B1)).toBeGreaterThan(10);
    expect(digits(line.intercept, norris.certified.B0)).toBeGreaterThan(10);
    expect(digits(line.slopeSd, norris.certified.B1_sd)).toBeGreaterThan(10);
    expect(digits(line.residualSd, norris.certified.residual_sd)).toBeGreaterThan(10);
  });
});

describe('published numbers', () => {
  // Source: IEC 60584-2 (tests/reference/thermocouple-tolerance.json).
  const rows = tolerance.rows.filter((row) => row.class === 2);
  it.each(rows)('class 2 type $type at $t_C °C may be off by $tolerance_C °C', (row) => {
    expect(probeTolerance(row.type as Probe, row.t_C)).toBeCloseTo(row.tolerance_C!, 6);
  });
  it('outside its class, and without a probe, a tolerance is unknown', () => {
    expect(rows.length).toBeGreaterThanOrEqual(8);
    expect(probeTolerance('K', 1250)).toBeNull();
    expect(probeTolerance('S', -10)).toBeNull();
    expect(probeTolerance('none', 900)).toBeNull();
    expect(probeTolerance(null, 900)).toBeNull();
  });
  it('two honest class 2 type K probes can differ by 15 °C at 1000 °C', () => {
    expect(2 * probeTolerance('K', 1000)!).toBe(15);
  });

  // Source: Dodd and Murfin 1994 (tests/reference/silica-inversions.json).
  it('quartz inverts at 573 °C, inside the span that is told', () => {
    expect(QUARTZ_INVERSION).toBe(silica.rows[0]!.value);
    expect(QUARTZ_FROM).toBeLessThan(QUARTZ_INVERSION);
    expect(QUARTZ_TO).toBeGreaterThan(QUARTZ_INVERSION);
  });

  // Source: CRC Handbook formation enthalpies (tests/reference/propane.json).
  it('propane gives 46.35 MJ/kg by its lower heating value', () => {
    const row = propane.constants.find((one) => one.name.startsWith('lower heating value'))!;
    expect(PROPANE_MEGAJOULES_PER_KG).toBe(row.per_kg_MJ);
    expect(PROPANE_MEGAJOULES_PER_KG).toBeCloseTo(2043.9 / 44.0956, 2);
  });
  it('gas is told per litre of kiln and per kilogram of ware, where they are known', () => {
    expect(gasUse('propane', 2, 80, 4)).toEqual({
      megajoules: 92.7,
      megajoulesPerLitre: 92.7 / 80,
      megajoulesPerKgOfWare: 92.7 / 4,
    });
    expect(gasUse('propane', 2, null, 0)?.megajoulesPerKgOfWare).toBeNull();
    expect(gasUse('wood', 2)).toBeNull();
    expect(gasUse('natural-gas', 2)).toBeNull();
    expect(gasUse('propane', null)).toBeNull();
    expect(gasUse('propane', 0)?.megajoules).toBe(0);
  });
  it('litres of combustible per litre of container need all litres', () => {
    expect(combustiblePerLitre([{ litres: 10 }, { litres: 5 }], 60)).toBe(0.25);
    expect(combustiblePerLitre([{ litres: 10 }, {}], 60)).toBeNull();
    expect(combustiblePerLitre([{ litres: 10 }], null)).toBeNull();
    expect(combustiblePerLitre([], 60)).toBeNull();
  });
});
