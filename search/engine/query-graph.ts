import type { QueryUnit } from './query-parse.ts';
import type { SearchIndex } from './search-index.ts';
import { normaliseWord } from './normalise.ts';
import { typoBudget } from './typo.ts';
import { wordsNear, wordsWithPrefix } from './vocabulary.ts';

/**
 * One way to satisfy the units `from` to `to` of a query. `words` are alternatives of one word each;
 * `sequences` must stand side by side (null: any one word). An edge has one or the other.
 */
export type Edge = {
  from: number;
  to: number;
  typos: number;
  /** The word itself, not a prefix, synonym or misspelling. */
  exact: boolean;
  kind: 'exact' | 'prefix' | 'typo' | 'synonym' | 'split' | 'joined' | 'phrase';
  words: string[];
  sequences: (string | null)[][];
};

export type QueryGraph = {
  units: QueryUnit[];
  edges: Edge[];
  /** Typos that could be spent on each unit: the scale of the typo score. */
  budgets: number[];
};

const MAX_SYNONYMS_PER_TERM = 50;
const MAX_SYNONYM_WORDS = 100;
/** Query words that may be written together, or looked up together as a synonym. */
const MAX_JOINED = 3;
/** Places tried to cut a word in two, the most frequent halves first. */
const MAX_SPLITS = 3;

type SynonymTable = Map<string, string[][]>;
const tables = new WeakMap<object, SynonymTable>();

/** Synonyms with keys and values cut into normalised words; made once per settings object. */
function synonymTable(index: SearchIndex): SynonymTable {
  const { synonyms } = index.settings;
  const known = tables.get(synonyms);
  if (known !== undefined) return known;
  const words = (text: string): string[] =>
    index
      .tokenise(text)
      .map((token) => token.word)
      .filter((word) => !index.stopWords.has(word));
  const table: SynonymTable = new Map();
  for (const [key, values] of Object.entries(synonyms)) {
    const normalisedKey = words(key).join(' ');
    if (normalisedKey === '') continue;
    const list = table.get(normalisedKey) ?? [];
    let total = list.reduce((sum, each) => sum + each.length, 0);
    for (const value of values) {
      const expansion = words(value);
      if (expansion.length === 0 || list.length >= MAX_SYNONYMS_PER_TERM) continue;
      if (total + expansion.length > MAX_SYNONYM_WORDS) continue;
      total += expansion.length;
      list.push(expansion);
    }
    table.set(normalisedKey, list);
  }
  tables.set(synonyms, table);
  return table;
}

function typoSettings(index: SearchIndex): SearchIndex['settings']['typoTolerance'] {
  const settings = index.settings.typoTolerance;
  if (settings.disableOnWords.length === 0) return settings;
  return { ...settings, disableOnWords: settings.disableOnWords.map(normaliseWord) };
}

/** Queries whose graphs are kept until the next write: the last ones asked. */
const MOST_KNOWN_GRAPHS = 50;

/** All ways in which documents of this index may satisfy the units of a query. */
export function buildQueryGraph(index: SearchIndex, units: QueryUnit[]): QueryGraph {
  const { graphs } = index.derived;
  const key = JSON.stringify(units);
  let graph = graphs.get(key);
  if (graph === undefined) {
    graph = graphOf(index, units);
    const oldest = graphs.keys().next().value;
    if (graphs.size >= MOST_KNOWN_GRAPHS && oldest !== undefined) graphs.delete(oldest);
    graphs.set(key, graph);
  }
  return graph;
}

function graphOf(index: SearchIndex, units: QueryUnit[]): QueryGraph {
  const edges: Edge[] = [];
  const settings = typoSettings(index);
  const prefixes = index.settings.prefixSearch !== 'disabled';
  const { vocabulary } = index;

  const add = (edge: Omit<Edge, 'words' | 'sequences'> & Partial<Edge>): void => {
    const words = edge.words ?? [];
    const sequences = edge.sequences ?? [];
    if (words.length + sequences.length > 0) edges.push({ ...edge, words, sequences });
  };
  const known = (words: string[]): string[] =>
    words.filter((word) => vocabulary.numberOf.has(word));

  const budgets = units.map((unit) => (unit.kind === 'word' ? typoBudget(unit.word, settings) : 0));

  for (const [at, unit] of units.entries()) {
    const here = { from: at, to: at };
    if (unit.kind === 'phrase') {
      const [only] = unit.words;
      if (unit.words.length === 1 && only != null) {
        add({ ...here, typos: 0, exact: true, kind: 'exact', words: known([only]) });
      } else {
        add({ ...here, typos: 0, exact: true, kind: 'phrase', sequences: [unit.words] });
      }
      continue;
    }
    const { word } = unit;
    const asPrefix = unit.isPrefix && prefixes;
    add({ ...here, typos: 0, exact: true, kind: 'exact', words: known([word]) });
    if (asPrefix) {
      const longer = wordsWithPrefix(vocabulary, word).filter((each) => each !== word);
      add({ ...here, typos: 0, exact: false, kind: 'prefix', words: longer });
    }
    const near = wordsNear(vocabulary, word, budgets[at] ?? 0, asPrefix).filter(
      (each) => !asPrefix || !each.word.startsWith(word),
    );
    for (const typos of [1, 2]) {
      const words = near.filter((each) => each.typos === typos).map((each) => each.word);
      add({ ...here, typos, exact: false, kind: 'typo', words });
    }
    if (settings.enabled) {
      const sequences = splitsOf(index, word);
      add({ ...here, typos: 1, exact: false, kind: 'split', sequences });
    }
  }
  addSpans(index, units, settings.enabled, prefixes, add);
  return { units, edges, budgets };
}

/** Synonyms of one to three words, and two or three words written as one. */
function addSpans(
  index: SearchIndex,
  units: readonly QueryUnit[],
  mayJoin: boolean,
  prefixes: boolean,
  add: (edge: Omit<Edge, 'words' | 'sequences'> & Partial<Edge>) => void,
): void {
  const table = synonymTable(index);
  const { vocabulary } = index;
  for (let from = 0; from < units.length; from += 1) {
    const span: string[] = [];
    for (let to = from; to < units.length && to < from + MAX_JOINED; to += 1) {
      const unit = units[to];
      if (unit?.kind !== 'word') break;
      span.push(unit.word);
      const expansions = table.get(span.join(' ')) ?? [];
      const single = expansions.filter((each) => each.length === 1).flat();
      const several = expansions.filter((each) => each.length > 1);
      const shared = { from, to, typos: 0, exact: false, kind: 'synonym' } as const;
      add({ ...shared, words: single.filter((word) => vocabulary.numberOf.has(word)) });
      add({ ...shared, sequences: several });
      if (span.length === 1 || !mayJoin) continue;
      const joined = span.join('');
      const words =
        unit.isPrefix && prefixes
          ? wordsWithPrefix(vocabulary, joined)
          : vocabulary.numberOf.has(joined)
            ? [joined]
            : [];
      add({ from, to, typos: span.length - 1, exact: false, kind: 'joined', words });
    }
  }
}

/** Cuts of a word into two known words, those with the most frequent halves first. */
function splitsOf(index: SearchIndex, word: string): [string, string][] {
  const splits: { pair: [string, string]; frequency: number }[] = [];
  for (let at = 1; at < word.length; at += 1) {
    const pair: [string, string] = [word.slice(0, at), word.slice(at)];
    if (!pair.every((half) => index.vocabulary.numberOf.has(half))) continue;
    const frequency = Math.min(...pair.map((half) => index.candidates.frequency(half)));
    if (frequency > 0) splits.push({ pair, frequency });
  }
  splits.sort((a, b) => b.frequency - a.frequency);
  return splits.slice(0, MAX_SPLITS).map(({ pair }) => pair);
}
