import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { typoBudget, typosBetween } from '../../../../search/engine/typo.ts';
import {
  createVocabulary,
  wordNumber,
  wordsNear,
  wordsWithPrefix,
} from '../../../../search/engine/vocabulary.ts';

const settings = {
  enabled: true,
  minWordSizeForTypos: { oneTypo: 5, twoTypos: 9 },
  disableOnWords: ['kelvin'],
  disableOnAttributes: [],
  disableOnNumbers: true,
};

describe('typoBudget', () => {
  it('allows 0 typos up to 4 letters, 1 from 5 and 2 from 9', () => {
    expect(
      ['pots', 'stall', 'lowering', 'temperate'].map((word) => typoBudget(word, settings)),
    ).toEqual([0, 1, 1, 2]);
  });

  it('allows none in numbers and listed words where they are switched off', () => {
    expect(typoBudget('13000', settings)).toBe(0);
    expect(typoBudget('13000', { ...settings, disableOnNumbers: false })).toBe(1);
    expect(typoBudget('kelvin', settings)).toBe(0);
    expect(typoBudget('temperate', { ...settings, enabled: false })).toBe(0);
  });
});

describe('typosBetween', () => {
  it('counts insert, delete, substitute and a swap of neighbours as one', () => {
    for (const word of ['stalls', 'stal', 'stalk', 'satll']) {
      expect(typosBetween('stall', word, 2, false)).toBe(1);
    }
  });

  it('counts a typo on the first letter as two', () => {
    expect(typosBetween('burner', 'turner', 1, false)).toBeUndefined();
    expect(typosBetween('thermocouple', 'dhermocouple', 2, false)).toBe(2);
  });

  it('compares with the nearest beginning when the word may go on', () => {
    expect(typosBetween('thremo', 'thermocouple', 1, true)).toBe(1);
    expect(typosBetween('thremo', 'thermocouple', 1, false)).toBeUndefined();
  });
});

describe('wordsNear', () => {
  const word = fc.string({ unit: fc.constantFrom('a', 'b', 'c'), minLength: 1, maxLength: 7 });

  it('finds by its walk exactly the words that a comparison one by one finds', () => {
    fc.assert(
      fc.property(
        fc.uniqueArray(word, { maxLength: 40 }),
        fc.uniqueArray(word, { maxLength: 10 }),
        word,
        fc.constantFrom(1, 2),
        fc.boolean(),
        (first, later, query, budget, asPrefix) => {
          const vocabulary = createVocabulary();
          for (const each of first) wordNumber(vocabulary, each);
          wordsWithPrefix(vocabulary, '');
          for (const each of later) wordNumber(vocabulary, each);
          const expected = [...new Set([...first, ...later])]
            .map((each) => ({ word: each, typos: typosBetween(query, each, budget, asPrefix) }))
            .filter(({ typos }) => typos !== undefined && typos > 0)
            .sort((a, b) => (a.word < b.word ? -1 : 1));
          expect(wordsNear(vocabulary, query, budget, asPrefix)).toEqual(expected);
        },
      ),
      { numRuns: 400 },
    );
  });
});
