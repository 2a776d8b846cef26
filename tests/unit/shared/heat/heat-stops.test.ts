import { describe, expect, it } from 'vitest';
import { heatColour } from '#shared/heat/heat-colour.ts';
import { celsiusAt, firstMinuteAt, heatStops, simplifyPoints } from '#shared/heat/heat-stops.ts';
import type { HeatPoint } from '#shared/heat/heat-stops.ts';
import { stripScaleMinutes } from '#shared/heat/strip-scale.ts';

const climb: readonly HeatPoint[] = [
  [0, 20],
  [10, 300],
  [20, 708],
  [37, 708],
  [40, 690],
  [50, 1005],
];

describe('simplifyPoints', () => {
  it('drops points on a straight line and keeps the ends', () => {
    const line = Array.from({ length: 101 }, (_, minute): HeatPoint => [minute, 20 + minute * 8]);
    expect(simplifyPoints(line, 1)).toEqual([
      [0, 20],
      [100, 820],
    ]);
  });

  it('keeps a dip larger than the tolerance', () => {
    expect(simplifyPoints(climb, 4)).toContainEqual([40, 690]);
    expect(
      simplifyPoints(
        [
          [0, 700],
          [5, 697],
          [10, 700],
        ],
        4,
      ),
    ).toHaveLength(2);
  });
});

describe('heatStops', () => {
  it('never leaves more than 25 °C between neighbours of a steep climb', () => {
    const stops = heatStops([
      [0, 500],
      [1, 1000],
    ]);
    expect(stops).toHaveLength(21);
    expect(stops[10]?.colour).toBe(heatColour(750));
    expect(stops[10]?.minute).toBeCloseTo(0.5, 9);
  });

  it('gives a level stretch one colour at both ends', () => {
    const stops = heatStops(climb);
    const at = (minute: number) => stops.find((stop) => stop.minute === minute)?.colour;
    expect(at(20)).toBe(heatColour(708));
    expect(at(37)).toBe(heatColour(708));
  });

  it('copes with no reading and with one', () => {
    expect(heatStops([])).toEqual([]);
    expect(heatStops([[3, 700]])).toEqual([{ minute: 3, colour: heatColour(700) }]);
  });
});

describe('celsiusAt and firstMinuteAt', () => {
  it('read between readings', () => {
    expect(celsiusAt(climb, 15)).toBe(504);
    expect(celsiusAt(climb, 50)).toBe(1005);
    expect(firstMinuteAt(climb, 504)).toBe(15);
  });

  it('say nothing outside the record', () => {
    expect(celsiusAt(climb, 51)).toBeNull();
    expect(celsiusAt([], 0)).toBeNull();
    expect(firstMinuteAt(climb, 1006)).toBeNull();
  });

  it('give the first reading when the record starts above the temperature', () => {
    expect(
      firstMinuteAt(
        [
          [2, 600],
          [3, 650],
        ],
        573,
      ),
    ).toBe(2);
  });
});

describe('stripScaleMinutes', () => {
  it('is the 90th percentile of the lengths, rounded up', () => {
    // Type 7 quantile of 10, 20 … 110 at 0.9 is 100.
    const lengths = Array.from({ length: 11 }, (_, index) => (index + 1) * 10);
    expect(stripScaleMinutes(lengths)).toBe(100);
  });

  it('is never under an hour and ignores lengths that are none', () => {
    expect(stripScaleMinutes([])).toBe(60);
    expect(stripScaleMinutes([12, Number.NaN, -3])).toBe(60);
  });
});
