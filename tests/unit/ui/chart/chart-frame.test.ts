import { describe, expect, it } from 'vitest';
import { chartFrame, degreesFor } from '../../../../src/ui/chart/chart-frame.ts';

const CLIMB = [
  [0, 20],
  [60, 990],
] as const;
const frameOf = (unit: 'C' | 'F' = 'C') =>
  chartFrame({
    window: { from: 0, to: 60 },
    degrees: degreesFor([CLIMB], 1005, unit, null),
    unit,
    width: 800,
    lanes: 1,
  });

describe('chartFrame', () => {
  it('holds the curve, the target and the ends of the minutes', () => {
    const frame = frameOf();
    expect(frame.highDegrees).toBe(1100);
    expect(frame.yOf(1005)).toBeGreaterThan(frame.plot.top);
    expect(frame.yOf(0)).toBe(frame.plot.bottom);
    expect(frame.xOf(0)).toBe(frame.plot.left);
    expect(frame.xOf(60)).toBe(frame.plot.right);
  });

  it('is ruled in round °F for those who read °F', () => {
    const frame = frameOf('F');
    expect(frame.highDegrees).toBe(2000);
    expect(frame.lowDegrees).toBe(0);
  });

  it('spreads a part of the minutes over the whole plot', () => {
    const frame = chartFrame({
      window: { from: 20, to: 30 },
      degrees: { low: 0, high: 1000 },
      unit: 'C',
      width: 800,
      lanes: 0,
    });
    expect(frame.xOf(20)).toBe(frame.plot.left);
    expect(frame.xOf(30)).toBe(frame.plot.right);
  });
});

describe('degreesFor', () => {
  it('reaches from nought to above the highest of all lines, and below it for frost', () => {
    const frosty = [
      [-5, -12],
      [90, 1120],
    ] as const;
    expect(degreesFor([CLIMB, frosty, null], null, 'C', null)).toEqual({ low: -100, high: 1200 });
    expect(degreesFor([], null, 'C', null)).toEqual({ low: 0, high: 200 });
  });

  it('fits a part to what is in sight, in round figures', () => {
    const part = [
      [30, 640],
      [40, 850],
    ] as const;
    expect(degreesFor([part], 1005, 'C', { from: 30, to: 40 })).toEqual({ low: 600, high: 900 });
  });

  it('leaves out readings beyond the edges, to which the line runs on', () => {
    const sparse = [
      [0, 20],
      [50, 520],
      [100, 1020],
    ] as const;
    expect(degreesFor([sparse], null, 'C', { from: 45, to: 55 })).toEqual({ low: 460, high: 580 });
  });

  it('never fills the plot with the unrest of a probe', () => {
    const level = [
      [30, 706],
      [40, 709],
    ] as const;
    const { low, high } = degreesFor([level], null, 'C', { from: 30, to: 40 });
    expect(high - low).toBeGreaterThanOrEqual(80);
    expect(low).toBeLessThan(706);
    expect(high).toBeGreaterThan(709);
  });

  it('brings a target just beyond a part into sight, and leaves a far one out', () => {
    const hold = [
      [60, 995],
      [65, 999],
    ] as const;
    expect(degreesFor([hold], 1020, 'C', { from: 60, to: 65 }).high).toBeGreaterThan(1020);
    expect(degreesFor([hold], 1150, 'C', { from: 60, to: 65 }).high).toBeLessThan(1100);
  });
});
