import { describe, expect, it } from 'vitest';
import { celsiusAt } from '#shared/heat/heat-stops.ts';
import { smoothLine } from '../../../../src/ui/chart/smooth-line.ts';

type Point = readonly [number, number];
/** Climbs 25 °C/min from minute 5 to 41 and falls 40 °C/min after, with a probe's noise. */
const course = (minute: number): number =>
  minute < 5 ? 15 : minute <= 41 ? 15 + 25 * (minute - 5) : 915 - 40 * (minute - 41);
/** Between 0 and 1, the same every time, without a period. */
const unrest = (index: number): number =>
  Math.abs(Math.sin(index * index * 12.9898) * 43_758.5453) % 1;
const noisy = Array.from({ length: 1200 }, (_, index): Point => {
  const minute = index / 24;
  return [minute, course(minute) + 16 * (unrest(index) - 0.5)];
});

describe('smoothLine', () => {
  it('follows the course within less than the noise', () => {
    const line = smoothLine(noisy, []);
    const off = [8, 15, 22, 30, 38].map((minute) =>
      Math.abs((celsiusAt(line, minute) ?? 0) - course(minute)),
    );
    expect(Math.max(...off)).toBeLessThan(3);
  });

  it('rounds no corner where the fire was shut off', () => {
    const line = smoothLine(noisy, [
      { minute: 5, label: 'lit', kind: 'lit' },
      { minute: 41, label: 'shut off', kind: 'shut-off' },
    ]);
    expect(Math.abs((celsiusAt(line, 41) ?? 0) - 915)).toBeLessThan(5);
  });

  it('begins and ends with the record and runs on in time', () => {
    const line = smoothLine(noisy, [{ minute: 5, label: 'lit', kind: 'lit' }]);
    expect(line[0]?.[0]).toBe(0);
    expect(line.at(-1)?.[0]).toBeCloseTo(1199 / 24, 6);
    expect(line.every(([minute], index) => minute >= (line[index - 1]?.[0] ?? 0))).toBe(true);
  });

  it('is the line through the readings where there are too few to smooth', () => {
    const few: Point[] = [
      [0, 20],
      [30, 700],
    ];
    expect(smoothLine(few, [])).toBe(few);
  });
});
