import type { DocumentSet } from './filter-evaluate.ts';
import type { Edge, QueryGraph } from './query-graph.ts';
import { POSITIONS_PER_ATTRIBUTE, type IndexedDocument, type SearchIndex } from './search-index.ts';

export type MatchingStrategy = 'last' | 'all' | 'frequency';

/** One document that satisfies enough of the query. */
export type Match = {
  document: number;
  /** Units dropped from the query for this document. */
  dropped: number;
  /** Fewest typos with which the remaining units are satisfied. */
  typos: number;
  /** Numbers of the edges this document satisfies. */
  edges: number[];
};

export type Occurrence = { edge: number; start: number; end: number };

/** Finds where the edges of one query occur in a document. */
export type OccurrenceFinder = (document: IndexedDocument) => Occurrence[];

/** Attributes in which a query may match, and those where only exact spelling counts. */
export type AttributeRules = {
  isSearched: (attribute: number) => boolean;
  allowsTypos: (attribute: number) => boolean;
  restricted: boolean;
};

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
  const interesting = new Uint8Array(vocabulary.words.length);
  const singles = new Map<number, number[]>();
  const starts = new Map<number, { edge: number; words: (number | null)[] }[]>();
  const note = (word: string): number | undefined => {
    const number = vocabulary.numberOf.get(word);
    if (number !== undefined) interesting[number] = 1;
    return number;
  };
  for (const [edge, { words, sequences }] of graph.edges.entries()) {
    for (const word of words) {
      const number = note(word);
      if (number === undefined) continue;
      const list = singles.get(number);
      if (list === undefined) singles.set(number, [edge]);
      else list.push(edge);
    }
    for (const sequence of sequences) {
      const numbers = sequence.map((word) =>
        word === null ? null : vocabulary.numberOf.get(word),
      );
      const [first] = numbers;
      if (first == null || numbers.includes(undefined)) continue;
      interesting[first] = 1;
      const list = starts.get(first) ?? [];
      list.push({ edge, words: numbers.map((number) => number ?? null) });
      starts.set(first, list);
    }
  }
  const edgeAllowsAttribute = (edge: number, attribute: number): boolean =>
    attributes.isSearched(attribute) &&
    ((graph.edges[edge]?.typos ?? 0) === 0 || attributes.allowsTypos(attribute));

  return ({ words, places }) => {
    const found: Occurrence[] = [];
    for (let at = 0; at < words.length; at += 1) {
      const word = words[at] ?? 0;
      if (!interesting[word]) continue;
      const start = places[at] ?? 0;
      const attribute = Math.floor(start / POSITIONS_PER_ATTRIBUTE);
      for (const edge of singles.get(word) ?? []) {
        if (attributes.restricted && !edgeAllowsAttribute(edge, attribute)) continue;
        found.push({ edge, start, end: start });
      }
      for (const { edge, words: sequence } of starts.get(word) ?? []) {
        if (attributes.restricted && !edgeAllowsAttribute(edge, attribute)) continue;
        if (sequenceAt(words, places, at, sequence)) {
          found.push({ edge, start, end: start + sequence.length - 1 });
        }
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

/** Order in which units may be dropped. Phrases are never dropped, nor is the last one left. */
export function droppingOrder(
  index: SearchIndex,
  graph: QueryGraph,
  strategy: MatchingStrategy,
): number[] {
  const { units } = graph;
  const droppable = units.flatMap((unit, at) => (unit.kind === 'word' ? [at] : []));
  if (strategy === 'all') return [];
  if (strategy === 'last') return droppable.filter((at) => at > 0).reverse();
  const frequency = units.map((unit) =>
    unit.kind === 'word' ? index.candidates.frequency(unit.word) : 0,
  );
  droppable.sort((a, b) => (frequency[b] ?? 0) - (frequency[a] ?? 0) || b - a);
  return droppable.length === units.length ? droppable.slice(0, -1) : droppable;
}

type Reach = { dropped: number; typos: number };

/** Fewest dropped units, then fewest typos, with which a set of edges covers the whole query. */
function reachWith(
  edges: readonly Edge[],
  unitCount: number,
  order: readonly number[],
): Reach | null {
  for (let dropped = 0; dropped <= order.length; dropped += 1) {
    const skipped = new Set(order.slice(0, dropped));
    const best = new Array<number>(unitCount + 1).fill(Infinity);
    best[0] = 0;
    for (let at = 0; at < unitCount; at += 1) {
      const here = best[at] ?? Infinity;
      if (here === Infinity) continue;
      if (skipped.has(at)) {
        best[at + 1] = Math.min(best[at + 1] ?? Infinity, here);
        continue;
      }
      for (const edge of edges) {
        if (edge.from !== at) continue;
        best[edge.to + 1] = Math.min(best[edge.to + 1] ?? Infinity, here + edge.typos);
      }
    }
    const typos = best[unitCount] ?? Infinity;
    if (typos < Infinity) return { dropped, typos };
  }
  return null;
}

/** All documents of `allowed` that satisfy the query, in document order. */
export function findMatches(
  index: SearchIndex,
  graph: QueryGraph,
  order: readonly number[],
  allowed: DocumentSet,
  attributes: AttributeRules,
  find: OccurrenceFinder,
): Match[] {
  const { edges, units } = graph;
  const groups = Math.ceil(edges.length / 31);
  const masks = Array.from({ length: groups }, () => new Int32Array(allowed.length));
  const uncertain = new Set<number>();

  for (const [number, edge] of edges.entries()) {
    const mask = masks[Math.floor(number / 31)];
    if (mask === undefined) continue;
    const bit = 1 << (number % 31);
    for (const word of edge.words) {
      for (const document of index.candidates.numbersWith(word)) {
        if (allowed[document]) mask[document] = (mask[document] ?? 0) | bit;
      }
    }
    for (const sequence of edge.sequences) {
      const words = sequence.filter((word) => word !== null);
      for (const document of documentsWithAll(index, words)) {
        if (!allowed[document]) continue;
        mask[document] = (mask[document] ?? 0) | bit;
        uncertain.add(document);
      }
    }
  }

  const known = new Map<string | number, { reach: Reach | null; edges: number[] }>();
  const matches: Match[] = [];
  for (let document = 0; document < allowed.length; document += 1) {
    let any = 0;
    for (const mask of masks) any |= mask[document] ?? 0;
    if (any === 0) continue;
    if (attributes.restricted || uncertain.has(document)) {
      const indexed = index.documents[document];
      if (indexed === undefined) continue;
      for (const mask of masks) mask[document] = 0;
      for (const { edge } of find(indexed)) {
        const mask = masks[Math.floor(edge / 31)];
        if (mask) mask[document] = (mask[document] ?? 0) | (1 << (edge % 31));
      }
    }
    const key =
      groups === 1
        ? (masks[0]?.[document] ?? 0)
        : masks.map((mask) => mask[document] ?? 0).join(' ');
    let outcome = known.get(key);
    if (outcome === undefined) {
      const held = edges.flatMap((_, number) =>
        ((masks[Math.floor(number / 31)]?.[document] ?? 0) >> (number % 31)) & 1 ? [number] : [],
      );
      const heldEdges = held.flatMap((number) => edges[number] ?? []);
      outcome = { reach: reachWith(heldEdges, units.length, order), edges: held };
      known.set(key, outcome);
    }
    if (outcome.reach !== null) {
      const { dropped, typos } = outcome.reach;
      matches.push({ document, dropped, typos, edges: outcome.edges });
    }
  }
  return matches;
}

/** Documents that hold all words somewhere; starts from the rarest. */
export function documentsWithAll(index: SearchIndex, words: readonly string[]): Set<number> {
  const byFrequency = [...new Set(words)].sort(
    (a, b) => index.candidates.frequency(a) - index.candidates.frequency(b),
  );
  const [rarest, ...others] = byFrequency;
  let found = new Set(rarest === undefined ? [] : index.candidates.numbersWith(rarest));
  for (const word of others) {
    if (found.size === 0) break;
    const next = new Set<number>();
    for (const document of index.candidates.numbersWith(word)) {
      if (found.has(document)) next.add(document);
    }
    found = next;
  }
  return found;
}
