import type { Occurrence } from './matching.ts';
import type { QueryGraph } from './query-graph.ts';
import type { BuiltInRule } from './ranking-rule-names.ts';
import { POSITIONS_PER_ATTRIBUTE } from './search-index.ts';

/** The rules that look at where words stand. Each adds up over the words of a query. */
export type PlacedRule = 'typo' | 'proximity' | 'attributeRank' | 'wordPosition' | 'inexact';

export type PathCosts = Record<PlacedRule, number>;

/** Size of each rule's share in the packed cost; ten words never exceed it. Product below 2^53. */
const RANGES: Record<PlacedRule, number> = {
  typo: 1 << 5,
  proximity: 1 << 7,
  attributeRank: 1 << 12,
  wordPosition: 1 << 20,
  inexact: 1 << 5,
};
const MAX_ATTRIBUTE_RANK = 400;

/** Words further apart, in different order of attributes, or split over attributes cost this much. */
export const FARTHEST = 8;
/** Occurrences of one edge looked at in one document; enough to find the nearest in real texts. */
const MAX_OCCURRENCES = 64;

/** Positions fall into steps that widen with distance, so that later rules get their say. */
export function positionStep(position: number): number {
  if (position < 16) return position;
  for (const bound of [24, 32, 64, 128, 256, 512, 1024, 2048, 4096, 8192, 16_384]) {
    if (position < bound) return bound;
  }
  return 32_768;
}

/** How far the word at `start` is from the one that ended at `end`: 1 side by side, at most 8. */
export function proximityCost(end: number, start: number): number {
  const sameAttribute =
    Math.floor(end / POSITIONS_PER_ATTRIBUTE) === Math.floor(start / POSITIONS_PER_ATTRIBUTE);
  if (!sameAttribute) return FARTHEST;
  const distance = start > end ? start - end : end - start + 1;
  return Math.min(Math.max(distance, 1), FARTHEST);
}

/** The placed rules in the order in which an index ranks by them. */
export function placedRules(rules: readonly BuiltInRule[]): PlacedRule[] {
  const placed: PlacedRule[] = [];
  for (const rule of rules) {
    if (rule === 'attribute') placed.push('attributeRank', 'wordPosition');
    else if (rule === 'exactness') placed.push('inexact');
    else if (rule !== 'words' && rule !== 'sort') placed.push(rule);
  }
  return placed;
}

type State = { end: number; cost: number };

export type PathRanker = (
  occurrences: readonly Occurrence[],
  droppedUnits: ReadonlySet<number>,
) => PathCosts;

/**
 * Makes the function that finds, for one document, the choice of occurrences that is best under the
 * given rules in their order, and answers what that choice costs under each. `rankOf` gives an
 * attribute's place in the searchable list.
 */
export function createPathRanker(
  graph: QueryGraph,
  rules: readonly PlacedRule[],
  rankOf: (attribute: number) => number,
  byWord: boolean,
): PathRanker {
  const unit: Partial<Record<PlacedRule, number>> = {};
  let weight = 1;
  for (const rule of [...rules].reverse()) {
    unit[rule] = weight;
    weight *= RANGES[rule];
  }
  const weightOf = (rule: PlacedRule): number => unit[rule] ?? 0;
  const unitCount = graph.units.length;

  const occurrenceCost = (occurrence: Occurrence): number => {
    const edge = graph.edges[occurrence.edge];
    if (edge === undefined) return 0;
    const span = edge.to - edge.from + 1;
    const attribute = Math.floor(occurrence.start / POSITIONS_PER_ATTRIBUTE);
    const position = occurrence.start % POSITIONS_PER_ATTRIBUTE;
    return (
      edge.typos * weightOf('typo') +
      (span - 1) * weightOf('proximity') +
      span * Math.min(rankOf(attribute), MAX_ATTRIBUTE_RANK) * weightOf('attributeRank') +
      span * positionStep(position) * weightOf('wordPosition') +
      (edge.exact ? 0 : span) * weightOf('inexact')
    );
  };

  const between = (end: number, start: number): number => {
    if (byWord) return proximityCost(end, start);
    return proximityCost(end, start) === FARTHEST &&
      Math.floor(end / POSITIONS_PER_ATTRIBUTE) !== Math.floor(start / POSITIONS_PER_ATTRIBUTE)
      ? FARTHEST
      : 1;
  };

  return (occurrences, droppedUnits) => {
    const leaving: Occurrence[][] = Array.from({ length: unitCount }, () => []);
    const counts = new Map<number, number>();
    for (const occurrence of occurrences) {
      const from = graph.edges[occurrence.edge]?.from ?? 0;
      const seen = counts.get(occurrence.edge) ?? 0;
      if (seen >= MAX_OCCURRENCES) continue;
      counts.set(occurrence.edge, seen + 1);
      leaving[from]?.push(occurrence);
    }
    const states: State[][] = Array.from({ length: unitCount + 1 }, () => []);
    states[0]?.push({ end: -1, cost: 0 });
    for (let at = 0; at < unitCount; at += 1) {
      const here = cheapestByEnd(states[at] ?? []);
      if (droppedUnits.has(at)) {
        states[at + 1]?.push(...here);
        continue;
      }
      for (const occurrence of leaving[at] ?? []) {
        let best = Infinity;
        for (const state of here) {
          const apart =
            state.end < 0 ? 0 : between(state.end, occurrence.start) * weightOf('proximity');
          if (state.cost + apart < best) best = state.cost + apart;
        }
        if (best === Infinity) continue;
        const to = graph.edges[occurrence.edge]?.to ?? at;
        states[to + 1]?.push({ end: occurrence.end, cost: best + occurrenceCost(occurrence) });
      }
    }
    const best = Math.min(...(states[unitCount] ?? []).map((state) => state.cost));
    return unpack(best === Infinity ? 0 : best, rules);
  };
}

function cheapestByEnd(states: readonly State[]): State[] {
  if (states.length < 2) return [...states];
  const best = new Map<number, State>();
  for (const state of states) {
    const known = best.get(state.end);
    if (known === undefined || state.cost < known.cost) best.set(state.end, state);
  }
  return [...best.values()];
}

function unpack(packed: number, rules: readonly PlacedRule[]): PathCosts {
  const costs: PathCosts = { typo: 0, proximity: 0, attributeRank: 0, wordPosition: 0, inexact: 0 };
  let rest = packed;
  for (const rule of [...rules].reverse()) {
    costs[rule] = rest % RANGES[rule];
    rest = Math.floor(rest / RANGES[rule]);
  }
  return costs;
}
