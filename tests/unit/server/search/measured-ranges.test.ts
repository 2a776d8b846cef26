import { describe, expect, it } from 'vitest';
import {
  bothTexts,
  chosenRanges,
  histogramsOf,
  rangesText,
} from '../../../../server/search/measured-ranges.ts';

const NOTES = [
  {
    stallC: [702, 903],
    peakC: 910,
    minutesToPeak: 40,
    holdMinutes: null,
    crossingRatePerMin: 12.5,
  },
  { stallC: [], peakC: 1000, minutesToPeak: 30, holdMinutes: 4, crossingRatePerMin: null },
  { stallC: [760], peakC: 765, minutesToPeak: 55, holdMinutes: null, crossingRatePerMin: null },
];

describe('a range', () => {
  it('filters with both ends in one, with one end, or with none', () => {
    const ranges = chosenRanges({ stall: '690..740', peak: '..1000', hold: '2.5..' });
    expect(ranges).toEqual({
      stall: { min: 690, max: 740 },
      peak: { min: null, max: 1000 },
      hold: { min: 2.5, max: null },
    });
    expect(rangesText(ranges)).toBe('stallC 690 TO 740 AND peakC <= 1000 AND holdMinutes >= 2.5');
    expect(rangesText({})).toBe('');
    expect(bothTexts('', 'peakC <= 1000')).toBe('peakC <= 1000');
  });
});

describe('a histogram', () => {
  it('counts every value once, in bars of a round width', () => {
    const [stall] = histogramsOf(NOTES, {});
    expect(stall).toMatchObject({ range: 'stall', from: 700, step: 20 });
    expect(stall?.counts).toHaveLength(11);
    expect(stall?.counts.reduce((a, b) => a + b)).toBe(3);
    expect([stall?.counts[0], stall?.counts[3], stall?.counts[10]]).toEqual([1, 1, 1]);
  });

  it('is narrowed by the ranges of the other measures and not by its own', () => {
    const of = (range: string, ranges: Parameters<typeof histogramsOf>[1]) =>
      histogramsOf(NOTES, ranges)
        .find((one) => one.range === range)
        ?.counts.reduce((a, b) => a + b);
    expect(of('peak', { peak: { min: 900, max: null } })).toBe(3);
    expect(of('peak', { stall: { min: 700, max: 710 } })).toBe(1);
    expect(of('hold', { stall: { min: 700, max: 710 } })).toBeUndefined();
  });
});
