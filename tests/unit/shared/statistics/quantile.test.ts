import { describe, expect, it } from 'vitest';
import { median, quantile } from '#shared/statistics/quantile.ts';
import reference from '../../../reference/quantiles.json';

describe('quantile', () => {
  // Source: Hyndman and Fan 1996, definition 7 (tests/reference/quantiles.json).
  it.each(reference.rows)('of $data gives the type 7 quartiles', (row) => {
    expect(quantile(row.data, 0.25)).toBeCloseTo(row.q1, 9);
    expect(median(row.data)).toBeCloseTo(row.median, 9);
    expect(quantile(row.data, 0.75)).toBeCloseTo(row.q3, 9);
    if (row.p !== undefined) expect(quantile(row.data, row.p)).toBeCloseTo(row.q_type7, 9);
  });

  it('of nothing is null', () => {
    expect(median([])).toBeNull();
  });
});
