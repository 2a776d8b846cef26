import { describe, expect, it } from 'vitest';
import { placesOf } from '../../../src/desk/passage-ranges.ts';

describe('where a passage stands', () => {
  it('is found across line ends and doubled spaces', () => {
    const text = 'We fired in\n  the garage. Later we fired in the garage again.';
    const found = placesOf(text, ['fired in the garage']);
    expect(found.map(({ from, to }) => text.slice(from, to))).toEqual([
      'fired in\n  the garage',
      'fired in the garage',
    ]);
  });

  it('is taken as words, never as a pattern', () => {
    expect(placesOf('gas (on) then.* lit', ['gas (on) then.*'])).toEqual([{ from: 0, to: 15 }]);
    expect(placesOf('gas on then lit', ['gas (on)'])).toEqual([]);
  });

  it('is nowhere when the passage is blank', () => {
    expect(placesOf('some words', ['', '   '])).toEqual([]);
  });
});
