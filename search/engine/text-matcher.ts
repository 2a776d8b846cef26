import { normaliseWord } from './normalise.ts';
import type { QueryGraph } from './query-graph.ts';
import type { Token, Tokeniser } from './tokenise.ts';
import { typosBetween } from './typo.ts';

/** A stretch of a text that answers the query, in UTF-16 units, and the query unit it answers. */
export type TextMatch = { start: number; end: number; unit: number; firstToken: number };

export type TextMatcher = {
  tokenise: Tokeniser;
  matchesIn: (text: string, tokens: readonly Token[]) => TextMatch[];
};

type WordAnswer = { unit: number; prefixLength: number | null };

/**
 * Makes the function that finds a query in any text, searchable or not: its words, their synonyms
 * and tolerated misspellings, and the typed part of words begun by the last query word.
 */
export function createTextMatcher(
  graph: QueryGraph,
  tokenise: Tokeniser,
  isKnownWord: (word: string) => boolean,
): TextMatcher {
  const whole = new Map<string, number>();
  const sequences = new Map<string | null, { words: (string | null)[]; unit: number }[]>();
  for (const edge of graph.edges) {
    for (const words of edge.sequences) {
      const [start = null] = words;
      const list = sequences.get(start) ?? [];
      list.push({ words, unit: edge.from });
      sequences.set(start, list);
    }
    if (edge.kind === 'prefix') continue;
    for (const word of edge.words) if (!whole.has(word)) whole.set(word, edge.from);
  }
  const typed = graph.units.flatMap((unit, number) =>
    unit.kind === 'word' ? [{ ...unit, number, budget: graph.budgets[number] ?? 0 }] : [],
  );
  const answers = new Map<string, WordAnswer | null>();

  function answerFor(word: string): WordAnswer | null {
    for (const unit of typed) {
      if (unit.word === word) return { unit: unit.number, prefixLength: null };
    }
    const unit = whole.get(word);
    if (unit !== undefined) return { unit, prefixLength: null };
    // Misspellings of indexed words were found with the query; other texts are compared here.
    const compare = !isKnownWord(word);
    for (const { word: query, isPrefix, number, budget } of typed) {
      if (isPrefix && word.startsWith(query)) return { unit: number, prefixLength: query.length };
      if (compare && budget > 0 && typosBetween(query, word, budget, isPrefix) !== undefined) {
        return { unit: number, prefixLength: null };
      }
    }
    return null;
  }

  function sequenceAt(
    tokens: readonly Token[],
    at: number,
  ): { length: number; unit: number } | null {
    const first = tokens[at];
    if (first === undefined) return null;
    for (const { words, unit } of sequences.get(first.word) ?? []) {
      const matches = words.every((word, offset) => {
        const token = tokens[at + offset];
        return (
          token !== undefined &&
          token.position === first.position + offset &&
          (word === null || token.word === word)
        );
      });
      if (matches) return { length: words.length, unit };
    }
    return null;
  }

  function matchesIn(text: string, tokens: readonly Token[]): TextMatch[] {
    const matches: TextMatch[] = [];
    for (let at = 0; at < tokens.length; at += 1) {
      const token = tokens[at];
      if (token === undefined) continue;
      const sequence = sequenceAt(tokens, at);
      if (sequence !== null) {
        const last = tokens[at + sequence.length - 1] ?? token;
        matches.push({ start: token.start, end: last.end, unit: sequence.unit, firstToken: at });
        at += sequence.length - 1;
        continue;
      }
      let answer = answers.get(token.word);
      if (answer === undefined) {
        answer = answerFor(token.word);
        answers.set(token.word, answer);
      }
      if (answer === null) continue;
      const end =
        answer.prefixLength === null
          ? token.end
          : token.start + typedLength(text.slice(token.start, token.end), answer.prefixLength);
      matches.push({ start: token.start, end, unit: answer.unit, firstToken: at });
    }
    return matches;
  }

  return { tokenise, matchesIn };
}

/** How much of a word as written gives `length` letters of its normalised form. */
function typedLength(written: string, length: number): number {
  let used = 0;
  for (const character of written) {
    if (normaliseWord(written.slice(0, used)).length >= length) break;
    used += character.length;
  }
  // Accents written as characters of their own belong to the letter before them.
  while (/^\p{M}/u.test(written.slice(used))) used += 1;
  return used;
}
