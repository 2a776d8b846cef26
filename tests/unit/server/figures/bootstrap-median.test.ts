import { describe, expect, it } from 'vitest';
import { bootstrapMedian } from '../../../../server/figures/bootstrap-median.ts';

const members = (n: number) =>
  Array.from({ length: n }, (_, at) => ({ value: at + 1, memberId: at + 1 }));

describe('The interval of a median', () => {
  it('is not given under eight members, however many firings', () => {
    const seven = [...members(7), ...members(7), ...members(7)];
    expect(bootstrapMedian(seven)).toBeNull();
    expect(bootstrapMedian(members(8))).not.toBeNull();
  });

  it('is near the binomial one where every member fired once', () => {
    // The bootstrap median of 1 … 101 lies below k when at least 51 of 101 draws are below k; for
    // the 2.5 % point that is the order statistic near 51 − 1.96·√101/2 ≈ 41.
    const found = bootstrapMedian(members(101));
    expect(found?.lower).toBeGreaterThan(38);
    expect(found?.lower).toBeLessThan(44);
    expect(found?.upper).toBeGreaterThan(58);
    expect(found?.upper).toBeLessThan(64);
  });

  it('draws members and not their firings: one busy member makes it no narrower', () => {
    const once = members(9);
    const often = once.flatMap((each) => Array.from({ length: 20 }, () => each));
    expect(bootstrapMedian(often)).toEqual(bootstrapMedian(once));
  });

  it('is the same whenever it is asked for, in whatever order the firings come', () => {
    const some = members(12);
    expect(bootstrapMedian([...some].reverse())).toEqual(bootstrapMedian(some));
  });
});
