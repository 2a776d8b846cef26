import type { DocumentSet } from './filter-evaluate.ts';
import type { Edge, QueryGraph } from './query-graph.ts';
import type { AttributeRules, OccurrenceFinder } from './occurrences.ts';
import type { SearchIndex } from './search-index.ts';

export type MatchingStrategy = 'last' | 'all' | 'frequency';

/** One document that satisfies enough of the query. */
export type Match = {
  document: number;
  /** Units dropped from the query for this document. */
  dropped: number;
  /** Fewest typos with which the remaining units are satisfied. */
  typos: number;
  /** Sum of the ranks of the attributes that hold the words: a first guess at its place, low is good. */
  rough: number;
};

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

/** Up to so many allowed documents are read one by one instead of walking the lists of the words. */
const FEW_DOCUMENTS = 64;
const NO_RANK = 255;

/** Which edges each document satisfies, as bits in groups of 31, and the best rank for each unit. */
type Held = { masks: Int32Array[]; ranks: Uint8Array[] };

const EDGES_PER_MASK = 31;

function nothingHeld(graph: QueryGraph, documents: number): Held {
  const groups = Math.ceil(graph.edges.length / EDGES_PER_MASK);
  return {
    masks: Array.from({ length: groups }, () => new Int32Array(documents)),
    ranks: graph.units.map(() => new Uint8Array(documents).fill(NO_RANK)),
  };
}

/** Reads one document for the edges it satisfies. */
function readDocument(
  index: SearchIndex,
  graph: QueryGraph,
  held: Held,
  document: number,
  find: OccurrenceFinder,
): void {
  const indexed = index.documents[document];
  if (indexed === undefined) return;
  for (const mask of held.masks) mask[document] = 0;
  const { count, edges } = find(indexed);
  for (let at = 0; at < count; at += 1) {
    const edge = edges[at] ?? 0;
    const mask = held.masks[Math.floor(edge / EDGES_PER_MASK)];
    if (mask) mask[document] = (mask[document] ?? 0) | (1 << (edge % EDGES_PER_MASK));
    const ranks = held.ranks[graph.edges[edge]?.from ?? 0];
    if (ranks && ranks[document] === NO_RANK) ranks[document] = 0;
  }
}

/** Walks the lists of all words of a query; answers the documents that must be read to be sure. */
function walkLists(
  index: SearchIndex,
  graph: QueryGraph,
  held: Held,
  allowed: DocumentSet,
  { byRank }: AttributeRules,
): Set<number> {
  const uncertain = new Set<number>();
  for (const [number, edge] of graph.edges.entries()) {
    const mask = held.masks[Math.floor(number / EDGES_PER_MASK)];
    const ranks = held.ranks[edge.from];
    if (mask === undefined || ranks === undefined) continue;
    const bit = 1 << (number % EDGES_PER_MASK);
    const isSearched = (rank: number): boolean =>
      byRank === null ||
      (byRank.isSearched(rank) && (edge.typos === 0 || byRank.allowsTypos(rank)));
    const visit = (document: number, rank: number): void => {
      if (!allowed[document]) return;
      mask[document] = (mask[document] ?? 0) | bit;
      if (rank < (ranks[document] ?? 0)) ranks[document] = rank;
    };
    for (const word of edge.words) index.candidates.forEachWith(word, visit, isSearched);
    for (const sequence of edge.sequences) {
      const words = sequence.filter((word) => word !== null);
      for (const document of documentsWithAll(index, words)) {
        if (!allowed[document]) continue;
        mask[document] = (mask[document] ?? 0) | bit;
        uncertain.add(document);
      }
    }
  }
  return uncertain;
}

function isFew(allowed: DocumentSet): boolean {
  let count = 0;
  for (let at = 0; at < allowed.length && count <= FEW_DOCUMENTS; at += 1)
    count += allowed[at] ?? 0;
  return count <= FEW_DOCUMENTS;
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
  const held = nothingHeld(graph, allowed.length);
  const { masks, ranks } = held;
  const few = isFew(allowed);
  const uncertain = few ? null : walkLists(index, graph, held, allowed, attributes);
  const mustRead = attributes.restricted && attributes.byRank === null;

  const known = new Map<string | number, Reach | null>();
  const matches: Match[] = [];
  for (let document = 0; document < allowed.length; document += 1) {
    if (uncertain === null) {
      if (!allowed[document]) continue;
      readDocument(index, graph, held, document, find);
    }
    let any = 0;
    for (const mask of masks) any |= mask[document] ?? 0;
    if (any === 0) continue;
    if (uncertain !== null && (mustRead || uncertain.has(document))) {
      readDocument(index, graph, held, document, find);
    }
    const key =
      masks.length === 1
        ? (masks[0]?.[document] ?? 0)
        : masks.map((mask) => mask[document] ?? 0).join(' ');
    let reach = known.get(key);
    if (reach === undefined) {
      const heldEdges = edges.filter(
        (_, number) =>
          ((masks[Math.floor(number / EDGES_PER_MASK)]?.[document] ?? 0) >>
            (number % EDGES_PER_MASK)) &
          1,
      );
      reach = reachWith(heldEdges, units.length, order);
      known.set(key, reach);
    }
    if (reach === null) continue;
    let rough = 0;
    for (const rank of ranks) {
      const best = rank[document] ?? NO_RANK;
      if (best !== NO_RANK) rough += best;
    }
    matches.push({ document, dropped: reach.dropped, typos: reach.typos, rough });
  }
  return matches;
}

/** Documents that hold all words somewhere; starts from the rarest. */
export function documentsWithAll(index: SearchIndex, words: readonly string[]): Set<number> {
  const byFrequency = [...new Set(words)].sort(
    (a, b) => index.candidates.frequency(a) - index.candidates.frequency(b),
  );
  const [rarest, ...others] = byFrequency;
  let found = new Set<number>();
  if (rarest !== undefined) index.candidates.forEachWith(rarest, (number) => found.add(number));
  for (const word of others) {
    if (found.size === 0) break;
    const before = found;
    const next = new Set<number>();
    index.candidates.forEachWith(word, (document) => {
      if (before.has(document)) next.add(document);
    });
    found = next;
  }
  return found;
}
