import { describe, expect, it } from 'vitest';
import {
  effectiveProportion,
  effectiveSize,
  newcombe,
  wilson,
} from '../../../../server/figures/intervals.ts';
import { normalQuantile } from '../../../../server/figures/normal-quantile.ts';
import published from '../../../reference/proportion-intervals.json' with { type: 'json' };

const FOUR_DECIMALS = 4;
const SIX_DECIMALS = 6;

describe('the quantile of the normal distribution', () => {
  // Values: standard tables of the normal distribution (0.975 and 0.995 as printed in full in the
  // statistical literature, e.g. the z of the reference file's note on units; the rest from memory).
  it.each([
    [0.975, 1.959963984540054],
    [0.995, 2.5758293035489],
    [0.95, 1.6448536269514722],
    [0.999, 3.090232306167813],
    [0.0001, -3.719016485455709],
    [0.5, 0],
  ])('at %f is %f', (p, z) => {
    expect(normalQuantile(p)).toBeCloseTo(z, 11);
  });

  it('throws on what is no probability', () => {
    expect(() => normalQuantile(0)).toThrow(RangeError);
    expect(() => normalQuantile(1)).toThrow(RangeError);
    expect(() => normalQuantile(Number.NaN)).toThrow(RangeError);
  });
});

describe('Wilson’s interval', () => {
  // Newcombe, Statistics in Medicine 17 (1998) 857-872, Table I, method 3.
  const rows = published.rows.flatMap((row) =>
    row.r !== undefined && row.n !== undefined ? [{ ...row, r: row.r, n: row.n }] : [],
  );
  it('has published rows to be checked against', () => {
    expect(rows.length).toBe(2);
  });
  it.each(rows)('equals the published one for $r of $n', (row) => {
    const interval = wilson(row.r, row.n);
    expect(interval?.lower.toFixed(FOUR_DECIMALS)).toBe(row.published_lower.toFixed(FOUR_DECIMALS));
    expect(interval?.upper.toFixed(FOUR_DECIMALS)).toBe(row.published_upper.toFixed(FOUR_DECIMALS));
    expect(interval?.lower).toBeCloseTo(row.lower_6dp, SIX_DECIMALS - 1);
    expect(interval?.upper).toBeCloseTo(row.upper_6dp, SIX_DECIMALS - 1);
  });

  it('is not known of no firings, and widens with its level', () => {
    expect(wilson(0, 0)).toBeNull();
    const usual = wilson(7, 10);
    const strict = wilson(7, 10, 0.99);
    expect(strict?.lower).toBeLessThan(usual?.lower ?? 0);
    expect(strict?.upper).toBeGreaterThan(usual?.upper ?? 1);
  });
});

describe('Newcombe’s interval for a difference', () => {
  // Newcombe, Statistics in Medicine 17 (1998) 873-890, Table II, method 10.
  const rows = published.rows.flatMap((row) =>
    row.r1 !== undefined && row.n1 !== undefined && row.r2 !== undefined && row.n2 !== undefined
      ? [{ ...row, r1: row.r1, n1: row.n1, r2: row.r2, n2: row.n2 }]
      : [],
  );
  it('has published rows to be checked against', () => {
    expect(rows.length).toBe(4);
  });
  it.each(rows)('equals the published one for $r1/$n1 against $r2/$n2', (row) => {
    const interval = newcombe({ successes: row.r1, n: row.n1 }, { successes: row.r2, n: row.n2 });
    expect(interval?.lower.toFixed(FOUR_DECIMALS)).toBe(row.published_lower.toFixed(FOUR_DECIMALS));
    expect(interval?.upper.toFixed(FOUR_DECIMALS)).toBe(row.published_upper.toFixed(FOUR_DECIMALS));
    expect(interval?.difference).toBeCloseTo(row.difference_4dp ?? 0, FOUR_DECIMALS);
  });

  it('is not known against no firings', () => {
    expect(newcombe({ successes: 1, n: 2 }, { successes: 0, n: 0 })).toBeNull();
  });
});

describe('the effective number of firings', () => {
  it('is the number itself when every member counts once', () => {
    expect(effectiveSize([1, 1, 1, 1, 1])).toBe(5);
    const busyNobody = effectiveProportion(3, [1, 2, 3, 4, 5]);
    expect(busyNobody.n).toBe(5);
    expect(busyNobody.successes).toBeCloseTo(3, 12);
  });

  // By hand: members with 6, 2, 1 and 1 of 10 firings: k = (36 + 4 + 1 + 1) / 10 = 4.2;
  // n_eff = 10 / (1 + 0.2 · 3.2) = 10 / 1.64 = 6.0976.
  it('falls when one member has many', () => {
    expect(effectiveSize([6, 2, 1, 1])).toBeCloseTo(6.0976, 4);
    const share = effectiveProportion(5, [1, 1, 1, 1, 1, 1, 2, 2, 3, 4]);
    expect(share.n).toBeCloseTo(6.0976, 4);
    expect(share.successes).toBeCloseTo(3.0488, 4);
  });

  // By hand: one member, 20 firings: k = 20, n_eff = 20 / 4.8 = 4.1667.
  it('makes twenty firings of one member hardly more than four', () => {
    expect(effectiveSize([20])).toBeCloseTo(4.1667, 4);
    expect(effectiveSize([])).toBe(0);
  });
});
