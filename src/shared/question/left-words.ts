import type { Item } from './items.ts';
import { EMPTY_WORDS, FILLERS, QUESTION_WORDS } from './word-classes.ts';

const EMPTY: ReadonlySet<string> = new Set([...EMPTY_WORDS, ...QUESTION_WORDS, ...FILLERS]);
/** In every note: they tell none from another. */
const EVERYWHERE: ReadonlySet<string> = new Set(
  (
    'kiln raku firing firings fire fired temperature temp temps heat degrees pot pots piece pieces ' +
    'ware glaze glazes glazed reach climb come go peak make take look turn use across'
  ).split(' '),
);

export interface LeftWords {
  readonly words: string;
  readonly allWords: string;
}

function joined(words: readonly string[]): string {
  return [...new Set(words)].join(' ');
}

/**
 * What is searched as text: the words nothing was read from, and the whole question less units,
 * numbers and empty words. Spelling is mended in both. Words that stand in every note are left out
 * unless nothing else is left of the whole question.
 */
export function leftWords(items: readonly Item[], used: ReadonlySet<number>): LeftWords {
  const carrying = items.flatMap((item, index) =>
    item.kind === 'word' && item.text.length > 1 && !EMPTY.has(item.text)
      ? [
          {
            text: item.text,
            index,
            common: EVERYWHERE.has(item.text) || EVERYWHERE.has(item.lemma),
          },
        ]
      : [],
  );
  const telling = carrying.filter(({ common }) => !common);
  const whole = telling.length > 0 ? telling : carrying;
  return {
    words: joined(telling.filter(({ index }) => !used.has(index)).map(({ text }) => text)),
    allWords: joined(whole.map(({ text }) => text)),
  };
}
