import { describe, expect, it } from 'vitest';
import { createTokeniser } from '../../../../search/engine/tokenise.ts';

const plain = { separatorTokens: [], nonSeparatorTokens: [], dictionary: [] };
const tokenise = createTokeniser(plain);
const words = (text: string): string[] => tokenise(text).map((token) => token.word);

describe('createTokeniser', () => {
  it('lowers case and strips accents, whether composed or not', () => {
    expect(words('Café CAFÉ cafe\u0301 Øre Straße')).toEqual([
      'cafe',
      'cafe',
      'cafe',
      'ore',
      'strasse',
    ]);
  });

  it('puts words one apart at soft separators and eight apart at hard ones', () => {
    const positions = tokenise('tea-bowl: wet. Dry, (hot)').map(({ word, position }) => [
      word,
      position,
    ]);
    expect(positions).toEqual([
      ['tea', 0],
      ['bowl', 1],
      ['wet', 2],
      ['dry', 10],
      ['hot', 18],
    ]);
  });

  it('tells where each word stands in the text as written', () => {
    const text = '«Été» à 700 °C';
    expect(tokenise(text).map(({ start, end }) => text.slice(start, end))).toEqual([
      'Été',
      'à',
      '700',
      'C',
    ]);
  });

  it('follows added separators, joining characters and dictionary entries', () => {
    const special = createTokeniser({
      separatorTokens: ['xx'],
      nonSeparatorTokens: ['#'],
      dictionary: ['J. R.'],
    });
    expect(special('J. R. axxb c#').map((token) => token.word)).toEqual(['j. r.', 'a', 'b', 'c#']);
  });

  it('leaves out words longer than any word', () => {
    expect(words(`short ${'x'.repeat(300)} end`)).toEqual(['short', 'end']);
  });
});
