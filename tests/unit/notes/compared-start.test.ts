import { describe, expect, it } from 'vitest';
import { canAlignAtLit, climbMinute, shiftMinutes } from '../../../src/notes/compared-start.ts';

/** Stands at 15 °C until the fire burns, then climbs 25 °C/min; a reading every half minute. */
const record = (climbsFrom: number, litAt: number | null) => ({
  points: Array.from({ length: 120 }, (_, index): readonly [number, number] => {
    const minute = index / 2;
    return [minute, minute < climbsFrom ? 15 : 15 + 25 * (minute - climbsFrom)];
  }),
  marks: litAt === null ? [] : [{ minute: litAt, label: 'lit', kind: 'lit' as const }],
});

describe('shiftMinutes', () => {
  it('lays one lighting on the other where both were marked', () => {
    expect(shiftMinutes(record(10, 8), record(20, 15), 'lit')).toBe(-7);
  });

  it('lays one climb on the other, whatever was marked', () => {
    expect(shiftMinutes(record(10, 8), record(20, 15), 'climb')).toBeCloseTo(-10, 0);
  });

  it('takes the climb where one lighting was not marked', () => {
    const [own, other] = [record(10, 8), record(20, null)];
    expect(canAlignAtLit(own, other)).toBe(false);
    expect(shiftMinutes(own, other, 'lit')).toBe(shiftMinutes(own, other, 'climb'));
  });

  it('shifts nothing where a record is too short to begin', () => {
    expect(climbMinute({ points: [] })).toBeNull();
    expect(shiftMinutes(record(10, null), { points: [], marks: [] }, 'climb')).toBe(0);
  });
});
