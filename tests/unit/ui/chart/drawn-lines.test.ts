import { describe, expect, it } from 'vitest';
import {
  drawnLines,
  readingsIn,
  shiftedPoints,
  wholeWindow,
} from '../../../../src/ui/chart/drawn-lines.ts';

type Point = readonly [number, number];
const COARSE: readonly Point[] = [
  [0, 20],
  [50, 600],
  [100, 900],
];
const FINE: readonly Point[] = Array.from({ length: 41 }, (_, index): Point => [30 + index, 500]);
const sources = {
  points: COARSE,
  smooth: COARSE,
  secondProbe: null,
  smoothSecond: null,
  overlay: null,
  detail: { part: { from: 30, to: 70 }, points: FINE, secondProbe: null },
};

describe('drawnLines', () => {
  it('draws the fetched part where it holds what is shown, else what came with the whole', () => {
    expect(readingsIn(sources, { from: 40, to: 60 }).points).toBe(FINE);
    expect(readingsIn(sources, { from: 20, to: 60 }).points).toBe(COARSE);
  });

  it('draws at most four readings a column of pixels, however many there are', () => {
    const points = Array.from({ length: 50_000 }, (_, index): Point => [
      index / 60,
      700 + 5 * Math.sin(index),
    ]);
    const all = { ...sources, points, smooth: points, secondProbe: points, overlay: points };
    const lines = drawnLines({ ...all, detail: null }, { from: 0, to: 833 }, 300);
    for (const line of [lines.readings, lines.smooth, lines.second, lines.overlay]) {
      expect(line?.length).toBeLessThanOrEqual(1202);
      expect(line?.length).toBeGreaterThan(600);
    }
  });
});

describe('shiftedPoints', () => {
  it('lays another record on the minutes of the one shown', () => {
    expect(shiftedPoints({ points: COARSE, label: 'before', shiftMinutes: -7 })[1]).toEqual([
      43, 600,
    ]);
    expect(shiftedPoints({ points: COARSE, label: 'before' })).toBe(COARSE);
  });
});

describe('wholeWindow', () => {
  it('reaches from the first to the last minute of any line', () => {
    expect(
      wholeWindow([
        COARSE,
        null,
        [
          [-4, 10],
          [120, 30],
        ],
        [],
      ]),
    ).toEqual({ from: -4, to: 120 });
    expect(wholeWindow([[], null])).toEqual({ from: 0, to: 0 });
  });
});
