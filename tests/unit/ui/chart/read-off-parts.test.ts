import { describe, expect, it } from 'vitest';
import { nearestMark, readOffParts } from '../../../../src/ui/chart/read-off-parts.ts';

const MARKS = [
  { minute: 10, label: 'gas up' },
  { minute: 12, label: 'flue closed 40\u00a0%' },
];
const sources = {
  points: [
    [0, 20],
    [40, 820],
  ] as const,
  secondProbe: [
    [0, 20],
    [20, 380],
  ] as const,
  overlay: {
    points: [
      [-5, 15],
      [35, 995],
    ] as const,
    label: 'earlier firing',
  },
  marks: MARKS,
  unit: 'C' as const,
  window: { from: 0, to: 40 },
};

describe('readOffParts', () => {
  it('tells minute, temperature, second probe, the record compared with and the nearest mark', () => {
    expect(readOffParts(sources, 10)).toEqual([
      '10\u00a0min, 220\u00a0°C',
      '200\u00a0°C, second probe',
      '383\u00a0°C, earlier firing',
      '10\u00a0min: gas up',
    ]);
  });

  it('leaves out what is not there at that minute', () => {
    expect(readOffParts(sources, 30)).toEqual([
      '30\u00a0min, 620\u00a0°C',
      '873\u00a0°C, earlier firing',
    ]);
    expect(readOffParts({ ...sources, overlay: null, secondProbe: null }, -3)).toEqual([
      '−3\u00a0min',
    ]);
  });

  it('reads in the reader’s unit, and to the second when looked at closely', () => {
    const close = { ...sources, unit: 'F' as const, window: { from: 8, to: 12 } };
    expect(readOffParts(close, 9.25)[0]).toBe('9.25\u00a0min, 401\u00a0°F');
  });
});

describe('nearestMark', () => {
  it('is the nearest within reach, the earlier of two as near, or none', () => {
    expect(nearestMark(MARKS, 11.2, 2)?.label).toBe('flue closed 40\u00a0%');
    expect(nearestMark(MARKS, 11, 2)?.label).toBe('gas up');
    expect(nearestMark(MARKS, 20, 2)).toBeNull();
  });
});
