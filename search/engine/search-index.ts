import { CandidateIndex } from './candidates.ts';
import { clearCell, createColumn, setCell, type Column } from './columns.ts';
import { flattenDocument, isWithin, matchesPattern, type FieldContent } from './flatten.ts';
import type { JsonObject } from './json.ts';
import { normaliseWord } from './normalise.ts';
import type { QueryGraph } from './query-graph.ts';
import { parseRankingRule, type RankingRule } from './ranking-rule-names.ts';
import type { Settings } from './settings.ts';
import { createTokeniser, HARD_DISTANCE, type Tokeniser } from './tokenise.ts';
import { createVocabulary, wordNumber, type Vocabulary } from './vocabulary.ts';

/** Positions within one attribute; later words of an endless text are not indexed. */
export const POSITIONS_PER_ATTRIBUTE = 65_536;

/**
 * One document as it is searched. `words` and `places` run in parallel: the word's number and where
 * it stands, `attribute * POSITIONS_PER_ATTRIBUTE + position`.
 */
export type IndexedDocument = {
  id: string;
  source: JsonObject;
  words: Uint32Array;
  places: Uint32Array;
  /** Rank of first arrival; kept when the document is replaced. */
  order: number;
};

/** All that searching needs, derived from the documents and settings of one index. */
export type SearchIndex = {
  settings: Settings;
  rankingRules: RankingRule[];
  tokenise: Tokeniser;
  stopWords: Set<string>;
  vocabulary: Vocabulary;
  candidates: CandidateIndex;
  /** Dotted names of the attributes that hold text, by attribute number. */
  attributeNames: string[];
  attributeNumbers: Map<string, number>;
  /** Place of each attribute in the searchable list; undefined where it is not searchable. */
  attributeRanks: (number | undefined)[];
  documents: (IndexedDocument | undefined)[];
  numberOfId: Map<string, number>;
  columns: Map<string, Column>;
  columnPatterns: string[];
  /** Whether a dotted name needs a column; remembers the answers. */
  hasColumn: Map<string, boolean>;
  fieldCounts: Map<string, number>;
  /** Characters of all documents as JSON, which is close to their size in bytes. */
  sourceBytes: number;
  nextOrder: number;
  /** What was worked out from the documents as they are; emptied by every write. */
  derived: Derived;
};

export type Derived = {
  /** Document numbers in order of arrival. */
  arrival: Uint32Array | undefined;
  /** One byte for each document number: 1 where the document exists. */
  live: Uint8Array | undefined;
  /** Documents that satisfy a condition of a filter, by its text. */
  conditions: Map<string, Uint8Array>;
  /** Ways to satisfy a query, by its words. */
  graphs: Map<string, QueryGraph>;
  /** Values of an attribute counted over all documents. */
  counts: Map<string, FacetValues>;
};

/** Values counted for one attribute, in order of the values, and the extremes of its numbers. */
export type FacetValues = {
  counts: { value: string; count: number }[];
  lowest: number | undefined;
  highest: number | undefined;
};

export const nothingDerived = (): Derived => ({
  arrival: undefined,
  live: undefined,
  conditions: new Map(),
  graphs: new Map(),
  counts: new Map(),
});

export function createSearchIndex(settings: Settings): SearchIndex {
  return {
    settings,
    rankingRules: settings.rankingRules.map(parseRankingRule).filter((rule) => rule !== undefined),
    tokenise: createTokeniser(settings),
    stopWords: new Set(settings.stopWords.map(normaliseWord)),
    vocabulary: createVocabulary(),
    candidates: new CandidateIndex(Math.max(1, settings.searchableAttributes.length)),
    attributeNames: [],
    attributeNumbers: new Map(),
    attributeRanks: [],
    documents: [],
    numberOfId: new Map(),
    columns: new Map(),
    columnPatterns: columnPatterns(settings),
    hasColumn: new Map(),
    fieldCounts: new Map(),
    sourceBytes: 0,
    nextOrder: 0,
    derived: nothingDerived(),
  };
}

/** Names that filters, facets, sorting and distinct may use, and so need a column. */
function columnPatterns(settings: Settings): string[] {
  const custom = settings.rankingRules.flatMap((rule) => {
    const parsed = parseRankingRule(rule);
    return parsed?.kind === 'field' ? [parsed.attribute] : [];
  });
  return [
    ...settings.filterableAttributes.flatMap((entry) =>
      typeof entry === 'string' ? [entry] : entry.attributePatterns,
    ),
    ...settings.sortableAttributes,
    ...custom,
    ...(settings.distinctAttribute === null ? [] : [settings.distinctAttribute]),
  ];
}

/** Rank of an attribute in the searchable list: the smallest of the entries it belongs to. */
export function searchableRank(name: string, searchable: readonly string[]): number | undefined {
  if (searchable.includes('*')) return 0;
  const rank = searchable.findIndex((entry) => isWithin(name, entry));
  return rank < 0 ? undefined : rank;
}

function attributeNumber(index: SearchIndex, name: string): number {
  const known = index.attributeNumbers.get(name);
  if (known !== undefined) return known;
  const number = index.attributeNames.length;
  index.attributeNames.push(name);
  index.attributeNumbers.set(name, number);
  index.attributeRanks.push(searchableRank(name, index.settings.searchableAttributes));
  return number;
}

/** A document read and cut into words, ready to be stored in one step. */
export type PreparedDocument = {
  id: string;
  source: JsonObject;
  fields: Map<string, FieldContent>;
  words: Uint32Array;
  places: Uint32Array;
  /** Distinct words, by the rank of the searchable attribute. */
  distinctWords: string[][];
};

export function prepareDocument(
  index: SearchIndex,
  id: string,
  source: JsonObject,
): PreparedDocument {
  const fields = flattenDocument(source);
  const words: number[] = [];
  const places: number[] = [];
  const distinct: Set<string>[] = [];
  for (const [name, content] of fields) {
    if (content.values.length === 0) continue;
    const attribute = attributeNumber(index, name);
    const rank = index.attributeRanks[attribute];
    if (rank === undefined) continue;
    const held = (distinct[rank] ??= new Set());
    let base = 0;
    for (const value of content.values) {
      let last = -1;
      for (const token of index.tokenise(String(value))) {
        const position = base + token.position;
        if (position >= POSITIONS_PER_ATTRIBUTE) break;
        last = position;
        if (index.stopWords.has(token.word)) continue;
        words.push(wordNumber(index.vocabulary, token.word));
        places.push(attribute * POSITIONS_PER_ATTRIBUTE + position);
        held.add(token.word);
      }
      if (last >= 0) base = last + HARD_DISTANCE;
    }
  }
  return {
    id,
    source,
    fields,
    words: Uint32Array.from(words),
    places: Uint32Array.from(places),
    distinctWords: Array.from(distinct, (held) => [...(held ?? [])]),
  };
}

function countFields(index: SearchIndex, source: JsonObject, step: 1 | -1): void {
  index.sourceBytes += step * JSON.stringify(source).length;
  for (const name of Object.keys(source)) {
    const count = (index.fieldCounts.get(name) ?? 0) + step;
    if (count === 0) index.fieldCounts.delete(name);
    else index.fieldCounts.set(name, count);
  }
}

function needsColumn(index: SearchIndex, name: string): boolean {
  let needed = index.hasColumn.get(name);
  if (needed === undefined) {
    needed = index.columnPatterns.some((pattern) => matchesPattern(name, pattern));
    index.hasColumn.set(name, needed);
  }
  return needed;
}

export function storeDocument(index: SearchIndex, prepared: PreparedDocument): void {
  const order = removeDocument(index, prepared.id) ?? index.nextOrder++;
  const { id, source, words, places } = prepared;
  const number = index.candidates.addWords(id, prepared.distinctWords);
  index.documents[number] = { id, source, words, places, order };
  index.numberOfId.set(id, number);
  for (const [name, content] of prepared.fields) {
    if (!needsColumn(index, name)) continue;
    let column = index.columns.get(name);
    if (column === undefined) {
      column = createColumn();
      index.columns.set(name, column);
    }
    setCell(column, number, content);
  }
  countFields(index, source, 1);
  index.derived = nothingDerived();
}

/** Answers the order the document had, or undefined when there was none. */
export function removeDocument(index: SearchIndex, id: string): number | undefined {
  const number = index.numberOfId.get(id);
  const document = number === undefined ? undefined : index.documents[number];
  if (number === undefined || document === undefined) return undefined;
  index.candidates.removeWords(id);
  index.documents[number] = undefined;
  index.numberOfId.delete(id);
  for (const column of index.columns.values()) clearCell(column, number);
  countFields(index, document.source, -1);
  index.derived = nothingDerived();
  return document.order;
}

/** Numbers of all documents, in order of arrival. */
export function arrivalOrder(index: SearchIndex): Uint32Array {
  if (index.derived.arrival === undefined) {
    const numbers = Uint32Array.from(index.numberOfId.values());
    index.derived.arrival = numbers.sort(
      (a, b) => (index.documents[a]?.order ?? 0) - (index.documents[b]?.order ?? 0),
    );
  }
  return index.derived.arrival;
}
