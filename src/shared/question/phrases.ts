import type { Item } from './items.ts';
import type { Meaning } from './vocabulary-entry.ts';
import { VOCABULARY } from './vocabulary.ts';
import { FILLERS, HEAT_LEADS, WORD_CLASSES } from './word-classes.ts';

/** A phrase of the vocabulary found in a question. */
export interface Match {
  readonly means: readonly Meaning[];
  readonly weak: boolean;
  /** Indices of the items it takes for itself. */
  readonly taken: readonly number[];
  /** Items it needs but leaves to others. */
  readonly seen: readonly number[];
  readonly score: number;
}

type Element =
  | {
      readonly kind: 'word';
      readonly words: ReadonlySet<string>;
      takes: boolean;
      optional: boolean;
    }
  | { readonly kind: 'gap' }
  | {
      readonly kind: 'temperature' | 'minutes' | 'step' | 'difference' | 'cone';
      takes: boolean;
      optional: boolean;
    };
interface Phrase {
  readonly means: readonly Meaning[];
  readonly weak: boolean;
  readonly elements: readonly Element[];
}

const MAX_FILLERS = 2;
const MAX_LEADS = 4;
const MAX_GAP = 4;
/** A temperature in its place says more than a word, a gap less than none. */
const TEMPERATURE_SCORE = 1.5;
const GAP_SCORE = -1;

const classes = new Map<string, readonly string[]>(
  Object.entries(WORD_CLASSES).map(([name, words]) => [name, words.split(' ')]),
);

/** Ware and cylinders are needed by a phrase, and still say what piece or change is meant. */
const SHARED_CLASSES: readonly string[] = ['@ware', '@sticky', '@tank'];

function parseElement(source: string): Element {
  if (source === '..') return { kind: 'gap' };
  const optional = source.endsWith('?');
  const bare = source.replace(/[()?]/g, '');
  const shared = SHARED_CLASSES.some((name) => bare.includes(name));
  const takes = !source.startsWith('(') && !shared;
  if (bare === '#') return { kind: 'temperature', takes: false, optional };
  if (bare === '#min') return { kind: 'minutes', takes: false, optional };
  if (bare === '#step') return { kind: 'step', takes: false, optional };
  if (bare === '#cone') return { kind: 'cone', takes: false, optional };
  if (bare === '#diff') return { kind: 'difference', takes: false, optional };
  const words = bare
    .split('|')
    .flatMap((word) => (word.startsWith('@') ? (classes.get(word.slice(1)) ?? []) : [word]));
  return { kind: 'word', words: new Set(words), takes, optional };
}

/** Phrases by a word or kind they can begin with, so that each item tries only its own. */
const phrasesByStart = new Map<string, Phrase[]>();
for (const entry of VOCABULARY) {
  for (const source of entry.says) {
    const elements = source.split(' ').map(parseElement);
    const phrase = { means: entry.means, weak: entry.weak === true, elements };
    const starts = new Set<string>();
    for (const element of elements) {
      if (element.kind === 'word') for (const word of element.words) starts.add(word);
      else if (element.kind !== 'gap') starts.add(`#${element.kind}`);
      if (element.kind === 'gap' || !element.optional) break;
    }
    for (const start of starts) {
      phrasesByStart.set(start, [...(phrasesByStart.get(start) ?? []), phrase]);
    }
  }
}

interface Trail {
  readonly taken: readonly number[];
  readonly seen: readonly number[];
  readonly score: number;
}

function fits(element: Element, item: Item): boolean {
  if (element.kind === 'gap' || item.kind === 'stop') return false;
  if (element.kind === 'word') {
    return item.kind === 'word'
      ? element.words.has(item.text) || element.words.has(item.lemma)
      : item.quantity.type === 'bare' && element.words.has(item.text);
  }
  if (item.kind !== 'quantity') return false;
  return item.quantity.type === element.kind;
}

function step(
  items: readonly Item[],
  phrase: Phrase,
  at: number,
  index: number,
  trail: Trail,
): Trail | null {
  const element = phrase.elements[at];
  if (element === undefined) return trail;
  if (element.kind === 'gap') {
    const open = { ...trail, score: trail.score + GAP_SCORE };
    for (let skipped = 0; skipped <= MAX_GAP; skipped += 1) {
      const item = items[index + skipped];
      if (item === undefined || (item.kind === 'stop' && skipped > 0)) break;
      const found = stepAt(items, phrase, at + 1, index + skipped, open);
      if (found !== null) return found;
      if (item.kind === 'stop') break;
    }
    return null;
  }
  const leads = element.kind === 'word' ? FILLERS : HEAT_LEADS;
  const most = at === 0 ? 0 : element.kind === 'word' ? MAX_FILLERS : MAX_LEADS;
  for (let skipped = 0; skipped <= most; skipped += 1) {
    const found = stepAt(items, phrase, at, index + skipped, trail);
    if (found !== null) return found;
    const item = items[index + skipped];
    if (item?.kind !== 'word') break;
    if (!leads.has(item.text) && !FILLERS.has(item.text)) break;
  }
  return element.optional ? step(items, phrase, at + 1, index, trail) : null;
}

/** The element exactly at an item, and the rest of the phrase after it. */
function stepAt(
  items: readonly Item[],
  phrase: Phrase,
  at: number,
  index: number,
  trail: Trail,
): Trail | null {
  const element = phrase.elements[at];
  if (element === undefined) return trail;
  const item = items[index];
  if (item === undefined || element.kind === 'gap' || !fits(element, item)) return null;
  const worth = element.kind === 'temperature' ? TEMPERATURE_SCORE : 1;
  const next = element.takes
    ? { ...trail, taken: [...trail.taken, index], score: trail.score + worth }
    : { ...trail, seen: [...trail.seen, index], score: trail.score + worth };
  return step(items, phrase, at + 1, index + 1, next);
}

function startKeys(item: Item): string[] {
  if (item.kind === 'stop') return [];
  if (item.kind === 'word') return item.text === item.lemma ? [item.text] : [item.text, item.lemma];
  return [`#${item.quantity.type}`, item.text];
}

/**
 * The phrases a question holds. Phrases overlap in the vocabulary ("crawl", "crawl up"), and the
 * longest takes its words; the work at each item is bounded by the vocabulary, not by the text.
 */
export function findPhrases(items: readonly Item[]): Match[] {
  const found: Match[] = [];
  items.forEach((item, index) => {
    for (const key of startKeys(item)) {
      for (const phrase of phrasesByStart.get(key) ?? []) {
        const trail = step(items, phrase, 0, index, { taken: [], seen: [], score: 0 });
        if (trail === null || trail.taken.length + trail.seen.length === 0) continue;
        found.push({ means: phrase.means, weak: phrase.weak, ...trail });
      }
    }
  });
  const order = found.map((match, index) => ({ match, index }));
  order.sort(
    (a, b) =>
      b.match.score - a.match.score || firstItem(a.match) - firstItem(b.match) || a.index - b.index,
  );
  const owner = new Set<number>();
  const kept: Match[] = [];
  for (const { match } of order) {
    if (match.taken.some((index) => owner.has(index))) continue;
    if (match.taken.length === 0 && kept.some((other) => other.means === match.means)) continue;
    match.taken.forEach((index) => owner.add(index));
    kept.push(match);
  }
  return kept.sort((a, b) => firstItem(a) - firstItem(b));
}

/** The first item a phrase stands on. */
export function firstItem(match: Match): number {
  return Math.min(...match.taken, ...match.seen);
}
export function lastItem(match: Match): number {
  return Math.max(...match.taken, ...match.seen);
}
