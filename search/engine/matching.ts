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
  /** Numbers of the edges this document satisfies. */
  edges: number[];
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
      index.candidates.forEachWith(word, (document) => {
        if (allowed[document]) mask[document] = (mask[document] ?? 0) | bit;
      });
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
      const { count, edges: held } = find(indexed);
      for (let at = 0; at < count; at += 1) {
        const edge = held[at] ?? 0;
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
