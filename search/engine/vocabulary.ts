import { EditRows } from './typo.ts';

/** Every word of an index with a small number of its own, and walks over them in byte order. */
export type Vocabulary = {
  words: string[];
  numberOf: Map<string, number>;
  sorted: string[];
  /** Letters that each sorted word shares with the one before it. */
  shared: number[];
  unsorted: string[];
};

export function createVocabulary(): Vocabulary {
  return { words: [], numberOf: new Map(), sorted: [], shared: [], unsorted: [] };
}

export function wordNumber(vocabulary: Vocabulary, word: string): number {
  const known = vocabulary.numberOf.get(word);
  if (known !== undefined) return known;
  const number = vocabulary.words.length;
  vocabulary.words.push(word);
  vocabulary.numberOf.set(word, number);
  vocabulary.unsorted.push(word);
  return number;
}

function compareCodeUnits(a: string, b: string): number {
  return a < b ? -1 : a > b ? 1 : 0;
}

function sharedLetters(a: string, b: string): number {
  const most = Math.min(a.length, b.length);
  let count = 0;
  while (count < most && a.charCodeAt(count) === b.charCodeAt(count)) count += 1;
  return count;
}

/** Merges words added since the last walk; linear in the vocabulary. */
function settle(vocabulary: Vocabulary): void {
  if (vocabulary.unsorted.length === 0) return;
  const fresh = vocabulary.unsorted.sort(compareCodeUnits);
  const old = vocabulary.sorted;
  const merged: string[] = [];
  let fromOld = 0;
  for (const word of fresh) {
    for (;;) {
      const next = old[fromOld];
      if (next === undefined || next > word) break;
      merged.push(next);
      fromOld += 1;
    }
    merged.push(word);
  }
  for (; fromOld < old.length; fromOld += 1) merged.push(old[fromOld] ?? '');
  vocabulary.sorted = merged;
  vocabulary.shared = merged.map((word, at) => sharedLetters(merged[at - 1] ?? '', word));
  vocabulary.unsorted = [];
}

/** Index of the first sorted word that is not before `word`. */
function lowerBound(sorted: readonly string[], word: string): number {
  let low = 0;
  let high = sorted.length;
  while (low < high) {
    const middle = (low + high) >>> 1;
    if ((sorted[middle] ?? '') < word) low = middle + 1;
    else high = middle;
  }
  return low;
}

/** All words that begin with `prefix`, the prefix itself included. */
export function wordsWithPrefix(vocabulary: Vocabulary, prefix: string): string[] {
  settle(vocabulary);
  const found: string[] = [];
  for (let at = lowerBound(vocabulary.sorted, prefix); ; at += 1) {
    const word = vocabulary.sorted[at];
    if (word === undefined || !word.startsWith(prefix)) return found;
    found.push(word);
  }
}

export type NearWord = { word: string; typos: number };

/**
 * All words within `budget` typos of `query` (see typosBetween for what counts), except those at
 * distance 0. With `asPrefix`, words that begin with something that near. One walk over the sorted
 * words, re-using the edit table for shared beginnings and jumping over hopeless ones.
 */
export function wordsNear(
  vocabulary: Vocabulary,
  query: string,
  budget: number,
  asPrefix: boolean,
): NearWord[] {
  if (budget === 0 || query === '') return [];
  settle(vocabulary);
  const { sorted, shared } = vocabulary;
  const firstLetter = query.charCodeAt(0);
  const rows = new EditRows(query);
  /** Best prefix distance up to each depth; depth 0 is unreachable. */
  const bestAt: number[] = [Infinity];
  const found: NearWord[] = [];
  let filled = 0;
  /** Words that share at least this many letters with the last one cannot match. */
  let hopelessDepth = Infinity;

  // One typo cannot be spent on the first letter, so only one stretch of the list matters.
  let at = budget === 1 ? lowerBound(sorted, query.charAt(0)) : 0;
  let keep = 0;
  for (; at < sorted.length; at += 1) {
    const word = sorted[at] ?? '';
    keep = Math.min(filled, shared[at] ?? 0);
    if (filled === 0) keep = 0;
    if ((shared[at] ?? 0) >= hopelessDepth) continue;
    if (budget === 1 && word.charCodeAt(0) !== firstLetter) break;
    hopelessDepth = Infinity;
    const allowed = budget - (word.charCodeAt(0) === firstLetter ? 0 : 1);
    let depth = keep;
    while (depth < word.length) {
      depth += 1;
      const smallest = rows.push(depth, word.charCodeAt(depth - 1));
      bestAt[depth] = Math.min(bestAt[depth - 1] ?? Infinity, rows.distance(depth));
      if (smallest > allowed) {
        hopelessDepth = depth;
        break;
      }
    }
    filled = depth;
    const whole = depth === word.length ? rows.distance(depth) : Infinity;
    const distance = asPrefix ? (bestAt[depth] ?? Infinity) : whole;
    if (asPrefix && hopelessDepth !== Infinity && distance <= allowed) {
      // A beginning already matched: what follows it does not matter.
      hopelessDepth = Infinity;
    }
    if (distance > allowed) continue;
    const typos = distance + budget - allowed;
    if (typos > 0) found.push({ word, typos });
  }
  return found;
}
