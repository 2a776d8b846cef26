import { KNOWN_WORDS } from './lexicon.ts';
import { SPELLINGS } from './spellings.ts';
import type { Token } from './tokenise.ts';
import { mendWord, splitJoined } from './typos.ts';
import { EMPTY_WORDS, FILLERS } from './word-classes.ts';

const mainSpelling = new Map<string, string>();
for (const [main, others] of Object.entries(SPELLINGS)) {
  for (const other of others) mainSpelling.set(other, main);
}

const SMALL_WORDS: ReadonlySet<string> = new Set([...EMPTY_WORDS, ...FILLERS]);

/** Joining two words ("saw dust") is for words of this many letters together. */
const MIN_JOINED = 7;

function joinable(first: Token, second: Token): boolean {
  const joined = first.text + second.text;
  return (
    joined.length >= MIN_JOINED &&
    KNOWN_WORDS.has(joined) &&
    !SMALL_WORDS.has(first.text) &&
    !SMALL_WORDS.has(joined)
  );
}

/** The word after this one, over a hyphen that joins the two ("under-fired"). */
function nextWord(tokens: readonly Token[], index: number): { token: Token; at: number } | null {
  const hyphen = tokens[index + 1]?.text === '-' && tokens[index + 1]?.glued === true;
  const at = hyphen ? index + 2 : index + 1;
  const token = tokens[at];
  if (token?.kind !== 'word' || (hyphen && !token.glued)) return null;
  return { token, at };
}

/**
 * Gives every word its main spelling, mends misspelt trade words, and joins or parts words that were
 * typed the other way. Places in the typed text are kept.
 */
export function mendTokens(tokens: readonly Token[]): Token[] {
  const mended: Token[] = [];
  for (let index = 0; index < tokens.length; index += 1) {
    const token = tokens[index];
    if (token === undefined) break;
    if (token.text === '@') {
      mended.push({ ...token, kind: 'word', text: 'at' });
      continue;
    }
    if (token.kind !== 'word') {
      mended.push(token);
      continue;
    }
    const name = tokens[index + 1];
    if (token.text.length === 1 && name?.kind === 'number' && name.glued && token.text === 'k') {
      // "K26" is a brick.
      mended.push({ ...token, text: token.text + name.text, to: name.to });
      index += 1;
      continue;
    }
    const next = nextWord(tokens, index);
    if (next !== null) {
      const main = mainSpelling.get(`${token.text} ${next.token.text}`);
      const joined = joinable(token, next.token) ? token.text + next.token.text : undefined;
      const text = main ?? joined;
      if (text !== undefined) {
        mended.push({ ...token, text: mainSpelling.get(text) ?? text, to: next.token.to });
        index = next.at;
        continue;
      }
    }
    const main = mainSpelling.get(token.text);
    const parted = main === undefined ? (mendWord(token.text) ?? splitJoined(token.text)) : main;
    if (parted === null || typeof parted === 'string') {
      const text = parted ?? token.text;
      mended.push({ ...token, text: mainSpelling.get(text) ?? text });
    } else {
      const middle = token.from + parted[0].length;
      mended.push({ ...token, text: mainSpelling.get(parted[0]) ?? parted[0], to: middle });
      mended.push({
        ...token,
        text: mainSpelling.get(parted[1]) ?? parted[1],
        from: middle,
        glued: false,
      });
    }
  }
  return mended;
}
