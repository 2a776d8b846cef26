import { describe, expect, it } from 'vitest';
import { moveRow, removeRow } from '../../../src/ui/row-changes.ts';

describe('changes to a list of rows', () => {
  it('moves a row one place, and not past the ends', () => {
    expect(moveRow(['a', 'b', 'c'], 1, -1)).toEqual(['b', 'a', 'c']);
    expect(moveRow(['a', 'b', 'c'], 1, 1)).toEqual(['a', 'c', 'b']);
    expect(moveRow(['a', 'b'], 0, -1)).toEqual(['a', 'b']);
    expect(moveRow(['a', 'b'], 1, 1)).toEqual(['a', 'b']);
  });

  it('removes the row at an index and no other', () => {
    expect(removeRow(['a', 'b', 'a'], 0)).toEqual(['b', 'a']);
  });
});
