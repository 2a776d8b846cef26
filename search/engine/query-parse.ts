import type { Tokeniser } from './tokenise.ts';

/** One searched thing of a query. A gap in a phrase (`null`) stands for a stop word. */
export type QueryUnit =
  { kind: 'word'; word: string; isPrefix: boolean } | { kind: 'phrase'; words: (string | null)[] };

export type ParsedQuery = {
  units: QueryUnit[];
  /** Words and phrases that a hit must not hold. */
  excluded: string[][];
};

/** Further words of a query are ignored. */
export const MAX_QUERY_UNITS = 10;
/** UTF-16 units read of a query; ten words fit many times over. */
const MAX_QUERY_LENGTH = 4_000;

type Piece = { text: string; quoted: boolean; excluded: boolean };

/** Cuts the text at quotes and leading minus signs. A quote that never closes runs to the end. */
function cutPieces(text: string): Piece[] {
  const pieces: Piece[] = [];
  let plain = '';
  const endPlain = (): void => {
    if (plain !== '') pieces.push({ text: plain, quoted: false, excluded: false });
    plain = '';
  };
  let at = 0;
  while (at < text.length) {
    const character = text[at] ?? '';
    const startsWord = at === 0 || /\s/.test(text[at - 1] ?? '');
    const excluded = character === '-' && startsWord && /\S/.test(text[at + 1] ?? '');
    const quoteAt = excluded ? at + 1 : at;
    if (text[quoteAt] === '"') {
      endPlain();
      const close = text.indexOf('"', quoteAt + 1);
      const end = close < 0 ? text.length : close;
      pieces.push({ text: text.slice(quoteAt + 1, end), quoted: true, excluded });
      at = end + 1;
    } else if (excluded) {
      endPlain();
      const rest = /^[^\s"]+/.exec(text.slice(at + 1))?.[0] ?? '';
      pieces.push({ text: rest, quoted: true, excluded: true });
      at += 1 + rest.length;
    } else {
      plain += character;
      at += 1;
    }
  }
  endPlain();
  return pieces;
}

/** Reads the text of a query into words, phrases and exclusions. */
export function parseQuery(
  query: string,
  tokenise: Tokeniser,
  stopWords: ReadonlySet<string>,
): ParsedQuery {
  const text = query.slice(0, MAX_QUERY_LENGTH);
  const units: QueryUnit[] = [];
  const excluded: string[][] = [];
  const pieces = cutPieces(text);
  for (const [pieceNumber, piece] of pieces.entries()) {
    const tokens = tokenise(piece.text);
    if (piece.excluded) {
      const words = tokens.map((token) => token.word).filter((word) => !stopWords.has(word));
      if (words.length > 0) excluded.push(words);
    } else if (piece.quoted) {
      const words = tokens.map(({ word }) => (stopWords.has(word) ? null : word));
      while (words.at(-1) === null) words.pop();
      while (words[0] === null) words.shift();
      if (words.length > 0) units.push({ kind: 'phrase', words });
    } else {
      for (const [tokenNumber, token] of tokens.entries()) {
        if (stopWords.has(token.word)) continue;
        const isLast = pieceNumber === pieces.length - 1 && tokenNumber === tokens.length - 1;
        const isPrefix = isLast && token.end === piece.text.length;
        units.push({ kind: 'word', word: token.word, isPrefix });
      }
    }
  }
  const kept = units.slice(0, MAX_QUERY_UNITS);
  return { units: kept, excluded };
}
