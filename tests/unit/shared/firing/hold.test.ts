import { describe, expect, it } from 'vitest';
import { read } from './made-up-firing.ts';

describe('the hold', () => {
  it('is told with its minutes, level and difference from the aim', () => {
    const { hold } = read([
      [0, 10],
      [40, 1015],
      [46, 1015],
      [50, 800],
    ]);
    expect(hold?.minutes).toBeCloseTo(6, 0);
    expect(hold?.levelCelsius).toBeCloseTo(1015, 0);
    expect(hold?.offAimCelsius).toBeCloseTo(5, 0);
  });
  it('shorter than 2 min is none, and so is climbing through at 8 °C/min', () => {
    expect(
      read([
        [0, 10],
        [40, 1010],
        [41.5, 1010],
        [44, 800],
      ]).hold,
    ).toBeNull();
    expect(
      read([
        [0, 10],
        [38, 970],
        [50, 1066],
        [52, 900],
      ]).hold,
    ).toBeNull();
  });
  it('lies within ±15 °C of the aim', () => {
    expect(
      read([
        [0, 10],
        [40, 990],
        [50, 990],
      ]).hold,
    ).toBeNull();
    expect(
      read([
        [0, 10],
        [40, 997],
        [50, 997],
      ]).hold?.offAimCelsius,
    ).toBeCloseTo(-13, 0);
  });
  it('allows ends 0.5 °C a minute apart', () => {
    const { hold } = read([
      [0, 10],
      [40, 1005],
      [60, 1013],
      [63, 800],
    ]);
    expect(hold?.minutes).toBeGreaterThan(19);
  });
  it('ends at shut-off, however slowly the kiln cools', () => {
    const { hold } = read(
      [
        [0, 10],
        [40, 1010],
        [45, 1010],
        [55, 1003],
      ],
      { marks: [{ minute: 45, kind: 'shut-off' }] },
    );
    expect(hold?.toMinute).toBeLessThanOrEqual(45.01);
  });
  it('spread is the deviation of the readings about its level', () => {
    const zigzag = Array.from(
      { length: 40 },
      (_, i) => [41 + i / 4, i % 2 === 0 ? 1006 : 1014] as const,
    );
    const { hold } = read([[0, 10], [40, 1010], ...zigzag], { stepMinutes: 0.25 });
    expect(hold?.sdCelsius).toBeCloseTo(4, 0);
  });
});
