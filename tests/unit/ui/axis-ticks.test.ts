import { describe, expect, it } from 'vitest';
import { degreeTicks, minuteTicks } from '../../../src/ui/axis-ticks.ts';

describe('minuteTicks', () => {
  it('are round and have room for their figures', () => {
    expect(minuteTicks(0, 70, 1000)).toEqual([
      0, 5, 10, 15, 20, 25, 30, 35, 40, 45, 50, 55, 60, 65, 70,
    ]);
    expect(minuteTicks(0, 70, 350)).toEqual([0, 15, 30, 45, 60]);
  });

  it('start at the first round minute of a record that does not start at nought', () => {
    expect(minuteTicks(-3, 22, 500)[0]).toBe(0);
    expect(minuteTicks(7, 67, 400)[0]).toBe(10);
  });

  it('are none for a record without length', () => {
    expect(minuteTicks(5, 5, 500)).toEqual([]);
    expect(minuteTicks(0, 10, 0)).toEqual([]);
  });
});

describe('degreeTicks', () => {
  it('are round in either unit', () => {
    expect(degreeTicks(0, 1100, 300)).toEqual([0, 200, 400, 600, 800, 1000]);
    expect(degreeTicks(0, 2000, 300)).toEqual([0, 500, 1000, 1500, 2000]);
  });
});
