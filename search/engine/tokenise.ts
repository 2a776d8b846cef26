import { normaliseWord } from './normalise.ts';

/** One word of a text: `start` and `end` are offsets in UTF-16 units of the original text. */
export type Token = { word: string; start: number; end: number; position: number };

export type Tokeniser = (text: string) => Token[];

export type TokeniserOptions = {
  separatorTokens: readonly string[];
  nonSeparatorTokens: readonly string[];
  dictionary: readonly string[];
};

/** Words on both sides of a hard separator count as this far apart; so do elements of a list. */
export const HARD_DISTANCE = 8;

/** Longer words carry no meaning (encoded data, mostly) and are not indexed. Unit: UTF-16 units. */
const MAX_WORD_LENGTH = 250;

const HARD_SEPARATORS = new Set('.;,!?()[]{}|');
const WORD_CHARACTER = /[\p{L}\p{N}\p{M}]/u;

const enum Kind {
  Word,
  Soft,
  Hard,
}

const kindByCode = new Map<number, Kind>();
const asciiKinds = Uint8Array.from({ length: 128 }, (_, code) =>
  readKind(String.fromCharCode(code)),
);

function kindOf(text: string, codePoint: number): Kind {
  const known = kindByCode.get(codePoint);
  if (known !== undefined) return known;
  const kind = readKind(text);
  kindByCode.set(codePoint, kind);
  return kind;
}

function readKind(text: string): Kind {
  if (WORD_CHARACTER.test(text)) return Kind.Word;
  return HARD_SEPARATORS.has(text) ? Kind.Hard : Kind.Soft;
}

/** Longest first, so that `..` wins over `.`. */
function byLength(tokens: readonly string[]): string[] {
  return tokens.filter((token) => token !== '').sort((a, b) => b.length - a.length);
}

function matchAt(text: string, at: number, tokens: readonly string[]): string | undefined {
  return tokens.find((token) => text.startsWith(token, at));
}

/**
 * Makes the function that cuts a text into normalised words with their positions. Positions grow by
 * 1 after a soft separator and by HARD_DISTANCE after a hard one.
 */
export function createTokeniser(options: TokeniserOptions): Tokeniser {
  const separators = byLength(options.separatorTokens);
  const nonSeparators = byLength(options.nonSeparatorTokens);
  const dictionary = byLength(options.dictionary.map((entry) => entry.toLowerCase()));
  const plain = separators.length + nonSeparators.length + dictionary.length === 0;

  /** Kind and length of what stands at an offset. */
  function step(text: string, at: number): { kind: Kind; length: number } {
    if (!plain) {
      const separator = matchAt(text, at, separators);
      if (separator !== undefined) return { kind: Kind.Soft, length: separator.length };
      const joined = matchAt(text, at, nonSeparators);
      if (joined !== undefined) return { kind: Kind.Word, length: joined.length };
    }
    const codePoint = text.codePointAt(at) ?? 0;
    const length = codePoint > 0xffff ? 2 : 1;
    return { kind: kindOf(text.slice(at, at + length), codePoint), length };
  }

  function dictionaryEntryAt(text: string, lower: string, at: number): string | undefined {
    const entry = matchAt(lower, at, dictionary);
    if (entry === undefined) return undefined;
    const end = at + entry.length;
    const endsWord = end >= text.length || step(text, end).kind !== Kind.Word;
    return endsWord || !/[\p{L}\p{N}]$/u.test(entry) ? entry : undefined;
  }

  return (text) => {
    const tokens: Token[] = [];
    const lower = dictionary.length > 0 ? text.toLowerCase() : '';
    let position = 0;
    let gap = 0;
    let wordStart = -1;
    let at = 0;

    const push = (start: number, end: number, word: string): void => {
      if (word === '') return;
      if (tokens.length > 0) position += gap === 0 ? 1 : gap;
      gap = 0;
      if (word.length <= MAX_WORD_LENGTH) tokens.push({ word, start, end, position });
    };
    const endWord = (end: number): void => {
      if (wordStart >= 0) push(wordStart, end, normaliseWord(text.slice(wordStart, end)));
      wordStart = -1;
    };

    while (at < text.length) {
      if (wordStart < 0 && dictionary.length > 0) {
        const entry = dictionaryEntryAt(text, lower, at);
        if (entry !== undefined) {
          push(at, at + entry.length, normaliseWord(entry));
          at += entry.length;
          continue;
        }
      }
      const code = text.charCodeAt(at);
      let kind: Kind;
      let length = 1;
      if (plain && code < 128) kind = asciiKinds[code] ?? Kind.Soft;
      else ({ kind, length } = step(text, at));
      if (kind === Kind.Word) {
        if (wordStart < 0) wordStart = at;
      } else {
        endWord(at);
        gap = Math.max(gap, kind === Kind.Hard ? HARD_DISTANCE : 1);
      }
      at += length;
    }
    endWord(text.length);
    return tokens;
  };
}
