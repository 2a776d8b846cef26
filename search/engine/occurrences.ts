import type { QueryGraph } from './query-graph.ts';
import { POSITIONS_PER_ATTRIBUTE, type IndexedDocument, type SearchIndex } from './search-index.ts';

/**
 * Where the edges of a query stand in one document, in order of their beginnings. The three lists
 * run in parallel up to `count`; they are used again for the next document.
 */
export type Occurrences = { count: number; edges: number[]; starts: number[]; ends: number[] };

/** Finds the occurrences in a document. The answer holds until the next call. */
export type OccurrenceFinder = (document: IndexedDocument) => Occurrences;

/** Attributes in which a query may match, and those where only exact spelling counts. */
export type AttributeRules = {
  isSearched: (attribute: number) => boolean;
  allowsTypos: (attribute: number) => boolean;
  /** False when every attribute is searched and tolerates typos. */
  restricted: boolean;
  /**
   * The same two rules by rank in the searchable list, by which the lists of candidates are kept;
   * null where the rules name parts of attributes, so that each candidate must be looked at.
   */
  byRank: { isSearched: (rank: number) => boolean; allowsTypos: (rank: number) => boolean } | null;
};

type Sequence = { edge: number; words: (number | null)[] };

/** Codes of words: not asked for, asked for in several ways, and from here on one edge alone. */
const NOT_ASKED = 0;
const SEVERAL = 1;
const FIRST_EDGE = 2;

/**
 * Prepares a scan of document words for the edges of a query. A sequence matches words at
 * consecutive positions of one attribute.
 */
export function createOccurrenceFinder(
  index: SearchIndex,
  graph: QueryGraph,
  attributes: AttributeRules,
): OccurrenceFinder {
  const { vocabulary } = index;
  const codes = new Uint16Array(vocabulary.words.length);
  const singles = new Map<number, number[]>();
  const sequences = new Map<number, Sequence[]>();
  for (const [edge, { words, sequences: alternatives }] of graph.edges.entries()) {
    for (const word of words) {
      const number = vocabulary.numberOf.get(word);
      if (number === undefined) continue;
      const code = codes[number] ?? NOT_ASKED;
      if (code === NOT_ASKED) {
        codes[number] = edge + FIRST_EDGE;
        continue;
      }
      const list = singles.get(number);
      if (list !== undefined) list.push(edge);
      else singles.set(number, code >= FIRST_EDGE ? [code - FIRST_EDGE, edge] : [edge]);
      codes[number] = SEVERAL;
    }
    for (const sequence of alternatives) {
      const numbers = sequence.map((word) =>
        word === null ? null : vocabulary.numberOf.get(word),
      );
      const [first] = numbers;
      if (first == null || numbers.includes(undefined)) continue;
      const code = codes[first] ?? NOT_ASKED;
      if (code >= FIRST_EDGE) singles.set(first, [code - FIRST_EDGE]);
      codes[first] = SEVERAL;
      const list = sequences.get(first) ?? [];
      list.push({ edge, words: numbers.map((number) => number ?? null) });
      sequences.set(first, list);
    }
  }
  const mayStandIn = (edge: number, attribute: number): boolean =>
    attributes.isSearched(attribute) &&
    ((graph.edges[edge]?.typos ?? 0) === 0 || attributes.allowsTypos(attribute));

  const found: Occurrences = { count: 0, edges: [], starts: [], ends: [] };
  const push = (edge: number, start: number, end: number): void => {
    found.edges[found.count] = edge;
    found.starts[found.count] = start;
    found.ends[found.count] = end;
    found.count += 1;
  };

  return ({ words, places }) => {
    found.count = 0;
    for (let at = 0; at < words.length; at += 1) {
      const word = words[at] ?? 0;
      const code = codes[word] ?? NOT_ASKED;
      if (code === NOT_ASKED) continue;
      const start = places[at] ?? 0;
      const attribute = Math.floor(start / POSITIONS_PER_ATTRIBUTE);
      if (code >= FIRST_EDGE) {
        const edge = code - FIRST_EDGE;
        if (!attributes.restricted || mayStandIn(edge, attribute)) push(edge, start, start);
        continue;
      }
      for (const edge of singles.get(word) ?? []) {
        if (!attributes.restricted || mayStandIn(edge, attribute)) push(edge, start, start);
      }
      for (const { edge, words: sequence } of sequences.get(word) ?? []) {
        if (attributes.restricted && !mayStandIn(edge, attribute)) continue;
        if (sequenceAt(words, places, at, sequence)) push(edge, start, start + sequence.length - 1);
      }
    }
    return found;
  };
}

/** Whether a sequence of word numbers stands at entry `at` of a document. */
export function sequenceAt(
  words: Uint32Array,
  places: Uint32Array,
  at: number,
  sequence: readonly (number | null)[],
): boolean {
  const start = places[at] ?? 0;
  let next = at;
  for (const [offset, wanted] of sequence.entries()) {
    if (wanted === null) continue;
    while (next < words.length && (places[next] ?? 0) < start + offset) next += 1;
    if (places[next] !== start + offset || words[next] !== wanted) return false;
  }
  return true;
}
