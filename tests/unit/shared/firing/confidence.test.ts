import { describe, expect, it } from 'vitest';
import { findingsOf, findingText } from '#shared/firing/findings.ts';
import { METRIC_UNITS } from '#shared/units/units.ts';
import { read } from './made-up-firing.ts';

/** Climbs to 712 °C, stays there 16 min, climbs on. */
const STALLED = [
  [0, 15],
  [31, 712],
  [47, 712],
  [62, 1010],
  [66, 1010],
] as const;
const stallOf = (stepMinutes: number) =>
  findingsOf(read(STALLED, { stepMinutes })).find((one) => one.code === 'stall');

describe('confidence', () => {
  it('is high where readings stand close, and nothing more is said', () => {
    const stall = stallOf(0.5)!;
    expect(stall.confidence).toBe('high');
    expect(findingText(stall, METRIC_UNITS)).not.toContain('to be sure');
  });
  it('is less where they stand far apart, and the sentence says so at last', () => {
    expect(stallOf(4)?.confidence).toBe('fair');
    const hold = findingsOf(read(STALLED, { stepMinutes: 2 })).find((one) => one.code === 'hold')!;
    expect(hold.confidence).toBe('fair');
    const crossing = findingsOf(read(STALLED, { stepMinutes: 4 })).find(
      (one) => one.code === 'quartz-crossing',
    )!;
    expect(crossing.confidence).toBe('low');
    expect(findingText(crossing, METRIC_UNITS)).toMatch(/to be sure of it\.$/);
  });
});
