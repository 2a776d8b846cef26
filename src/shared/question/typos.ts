import { KNOWN_WORDS } from './lexicon.ts';
import { MENDABLE_WORDS, MIN_MENDABLE_LETTERS } from './mendable-words.ts';
import { PLAIN_WORDS } from './plain-words.ts';

/** A typed word may lack one letter of the shortest known word that is mended to. */
const MIN_TYPED_LETTERS = MIN_MENDABLE_LETTERS - 1;
const TWO_EDITS_FROM = 9;
const MAX_TYPED_LETTERS = 24;

const byFirstLetter = new Map<string, string[]>();
for (const word of MENDABLE_WORDS) {
  const list = byFirstLetter.get(word[0] ?? '') ?? [];
  list.push(word);
  byFirstLetter.set(word[0] ?? '', list);
}

/**
 * Edits between two words up to a limit: insert, delete, change, swap neighbours (each one). More
 * than the limit is reported as limit + 1.
 */
export function editDistance(from: string, to: string, limit: number): number {
  if (Math.abs(from.length - to.length) > limit) return limit + 1;
  let twoBack: number[] = [];
  let back = Array.from({ length: to.length + 1 }, (_, column) => column);
  for (let row = 1; row <= from.length; row += 1) {
    const current = [row];
    let best = row;
    for (let column = 1; column <= to.length; column += 1) {
      const same = from[row - 1] === to[column - 1];
      let cost = Math.min(
        (back[column] ?? 0) + 1,
        (current[column - 1] ?? 0) + 1,
        (back[column - 1] ?? 0) + (same ? 0 : 1),
      );
      const swapped = from[row - 1] === to[column - 2] && from[row - 2] === to[column - 1];
      if (row > 1 && column > 1 && swapped) cost = Math.min(cost, (twoBack[column - 2] ?? 0) + 1);
      current.push(cost);
      best = Math.min(best, cost);
    }
    if (best > limit) return limit + 1;
    twoBack = back;
    back = current;
  }
  return Math.min(back[to.length] ?? limit + 1, limit + 1);
}

/** One letter typed in the wrong place ("gazle"): the same letters, one of them moved. */
function oneLetterMoved(from: string, to: string): boolean {
  if (from.length !== to.length) return false;
  let start = 0;
  while (start < from.length && from[start] === to[start]) start += 1;
  let end = from.length - 1;
  while (end > start && from[end] === to[end]) end -= 1;
  const inner = from.slice(start, end + 1);
  const wanted = to.slice(start, end + 1);
  return inner.slice(1) + inner[0] === wanted || inner.at(-1) + inner.slice(0, -1) === wanted;
}

/**
 * The trade word a misspelling stands for, or null. The first letter is kept; an exact known word
 * is never touched. Between equally near words the longer wins, for letters are left out more often
 * than put in.
 */
export function mendWord(word: string): string | null {
  if (word.length < MIN_TYPED_LETTERS || word.length > MAX_TYPED_LETTERS) return null;
  if (KNOWN_WORDS.has(word) || PLAIN_WORDS.has(word)) return null;
  let found: string | null = null;
  let foundEdits = Infinity;
  for (const candidate of byFirstLetter.get(word[0] ?? '') ?? []) {
    const limit = candidate.length >= TWO_EDITS_FROM ? 2 : 1;
    const edits = oneLetterMoved(word, candidate) ? 1 : editDistance(word, candidate, limit);
    if (edits > limit) continue;
    const better =
      edits < foundEdits || (edits === foundEdits && candidate.length > (found?.length ?? 0));
    if (better) [found, foundEdits] = [candidate, edits];
  }
  return found;
}

const mendable: ReadonlySet<string> = new Set(MENDABLE_WORDS);

/** "flatplate" as "flat" and "plate": both halves known, one of them a trade word. */
export function splitJoined(word: string): [string, string] | null {
  if (word.length < 7 || word.length > MAX_TYPED_LETTERS) return null;
  if (KNOWN_WORDS.has(word) || PLAIN_WORDS.has(word)) return null;
  for (let at = 3; at <= word.length - 3; at += 1) {
    const [head, tail] = [word.slice(0, at), word.slice(at)];
    if (!KNOWN_WORDS.has(head) || !KNOWN_WORDS.has(tail)) continue;
    if (mendable.has(head) || mendable.has(tail)) return [head, tail];
  }
  return null;
}
