import { describe, expect, it } from 'vitest';
import { MAX_TYPED_ROWS } from '#shared/note/plan.ts';
import {
  clockStart,
  completeReadings,
  countedFrom,
  isInOrder,
  setCell,
  sortedByMinute,
  withReadings,
} from '../../../../src/write/record/typed-rows.ts';

const row = (minute: number | null, celsius: number | null) => ({ minute, celsius });

describe('typed rows', () => {
  it('come into being by being typed in, and not by clearing what is not there', () => {
    expect(setCell([], 0, 'minute', 5)).toEqual([row(5, null)]);
    expect(setCell([row(1, 2)], 1, 'celsius', null)).toEqual([row(1, 2)]);
    expect(setCell([row(1, 2)], 0, 'celsius', null)).toEqual([row(1, null)]);
  });

  it('are never more than a draft may hold', () => {
    const full = Array.from({ length: MAX_TYPED_ROWS }, (_, at) => row(at, at));
    expect(setCell(full, MAX_TYPED_ROWS, 'minute', 1)).toHaveLength(MAX_TYPED_ROWS);
  });

  it('take pasted readings in where the cursor is, over a blank row and before the others', () => {
    const readings = [
      { minute: 1, celsius: 10 },
      { minute: 2, celsius: 20 },
    ];
    expect(withReadings([row(0, 0), row(null, null), row(9, 9)], 1, readings)).toEqual([
      row(0, 0),
      row(1, 10),
      row(2, 20),
      row(9, 9),
    ]);
    expect(withReadings([row(5, 5)], 0, readings)).toEqual([row(1, 10), row(2, 20), row(5, 5)]);
  });

  it('are sorted by minute, a row without one staying behind the row it was written under', () => {
    const rows = [row(10, 1), row(null, 2), row(5, 3)];
    expect(isInOrder(rows)).toBe(false);
    expect(sortedByMinute(rows)).toEqual([row(5, 3), row(10, 1), row(null, 2)]);
    expect(isInOrder(sortedByMinute(rows))).toBe(true);
    expect(isInOrder([row(1, 1), row(null, 2), row(1, 3)])).toBe(true);
  });

  it('that begin hours late were read off a clock and can be counted from their first', () => {
    const rows = [row(872, 20), row(877.5, 100), row(null, 300)];
    expect(clockStart(rows)).toBe(872);
    expect(countedFrom(rows, 872)).toEqual([row(0, 20), row(5.5, 100), row(null, 300)]);
    expect(clockStart([row(12, 20)])).toBeNull();
  });

  it('give a reading only where both cells are filled; nought is filled', () => {
    expect(completeReadings([row(0, 0), row(1, null), row(null, 3)])).toEqual([
      { minute: 0, celsius: 0 },
    ]);
  });
});
