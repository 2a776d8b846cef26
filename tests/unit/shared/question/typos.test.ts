import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { editDistance, mendWord, splitJoined } from '#shared/question/typos.ts';

describe('mendWord', () => {
  test.each([
    ['stalld', 'stalled'],
    ['craked', 'cracked'],
    ['crakle', 'crackle'],
    ['gazle', 'glaze'],
    ['temprature', 'temperature'],
    ['tempereture', 'temperature'],
    ['thermocupple', 'thermocouple'],
    ['platau', 'plateau'],
    ['burnr', 'burner'],
    ['celcius', 'celsius'],
    ['farenheit', 'fahrenheit'],
  ])('mends "%s" to "%s"', (typed, meant) => {
    expect(mendWord(typed)).toBe(meant);
  });

  test.each(['small', 'still', 'start', 'crack', 'crackle', 'battle', 'regular', 'frame', 'house'])(
    'leaves "%s" as it is: it is a word',
    (word) => {
      expect(mendWord(word)).toBeNull();
    },
  );

  test.each(['wnd', 'bwl', 'ies', 'tlaze', 'xstalled'])(
    'leaves "%s": too short, or its first letter differs',
    (word) => {
      expect(mendWord(word)).toBeNull();
    },
  );
});

describe('editDistance', () => {
  test('counts insertions, deletions, changes and swapped neighbours as one each', () => {
    expect(editDistance('stall', 'stall', 2)).toBe(0);
    expect(editDistance('stal', 'stall', 2)).toBe(1);
    expect(editDistance('stalll', 'stall', 2)).toBe(1);
    expect(editDistance('stoll', 'stall', 2)).toBe(1);
    expect(editDistance('satll', 'stall', 2)).toBe(1);
    expect(editDistance('crawl', 'stall', 2)).toBe(3);
  });

  test('is the same both ways, and never below the difference in length', () => {
    const word = fc.string({ unit: fc.constantFrom('a', 'b', 'c'), maxLength: 8 });
    fc.assert(
      fc.property(word, word, (one, other) => {
        const there = editDistance(one, other, 8);
        expect(there).toBe(editDistance(other, one, 8));
        expect(there).toBeGreaterThanOrEqual(Math.abs(one.length - other.length));
      }),
    );
  });
});

describe('splitJoined', () => {
  test('parts two words run together when both are known', () => {
    expect(splitJoined('flatplate')).toEqual(['flat', 'plate']);
    expect(splitJoined('whitecrackle')).toEqual(['white', 'crackle']);
  });
  test('leaves words that merely look joined', () => {
    expect(splitJoined('something')).toBeNull();
    expect(splitJoined('newspaper')).toBeNull();
  });
});
