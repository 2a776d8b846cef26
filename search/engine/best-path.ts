import type { Occurrences } from './occurrences.ts';
import type { QueryGraph } from './query-graph.ts';
import type { BuiltInRule } from './ranking-rule-names.ts';
import { POSITIONS_PER_ATTRIBUTE } from './search-index.ts';

/** The rules that look at where words stand. Each adds up over the words of a query. */
export type PlacedRule = 'typo' | 'proximity' | 'attributeRank' | 'wordPosition' | 'inexact';

export type PathCosts = Record<PlacedRule, number>;

export const NO_COSTS: PathCosts = {
  typo: 0,
  proximity: 0,
  attributeRank: 0,
  wordPosition: 0,
  inexact: 0,
};

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

function sameAttribute(a: number, b: number): boolean {
  return Math.floor(a / POSITIONS_PER_ATTRIBUTE) === Math.floor(b / POSITIONS_PER_ATTRIBUTE);
}

/** How far the word at `start` is from the one that ended at `end`: 1 side by side, at most 8. */
export function proximityCost(end: number, start: number): number {
  if (!sameAttribute(end, start)) return FARTHEST;
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

export type PathRanker = (occurrences: Occurrences, droppedUnits: ReadonlySet<number>) => PathCosts;

/**
 * Ways to have placed all units before one unit: where the last placed one ends, and the packed cost
 * so far, in parallel lists up to `count`. The lists are used again for the next document.
 */
type Arrivals = { count: number; ends: number[]; costs: number[]; cheapest: number };

function arrive(arrivals: Arrivals, end: number, cost: number): void {
  const { ends, costs } = arrivals;
  // Arrivals come almost in order of their ends; late ones are moved to their place.
  let at = arrivals.count;
  for (; at > 0 && (ends[at - 1] ?? 0) > end; at -= 1) {
    ends[at] = ends[at - 1] ?? 0;
    costs[at] = costs[at - 1] ?? 0;
  }
  ends[at] = end;
  costs[at] = cost;
  arrivals.count += 1;
  if (cost < arrivals.cheapest) arrivals.cheapest = cost;
}

/**
 * Makes the function that finds, for one document, the choice of occurrences that is best under the
 * given rules in their order, and answers what that choice costs under each. `rankOf` gives an
 * attribute's place in the searchable list; without `byWord` only the attribute counts as distance.
 *
 * The costs of all rules are packed into one number, the first rule in its highest digits, so that
 * the smallest sum is the best choice under the rules in order.
 */
export function createPathRanker(
  graph: QueryGraph,
  rules: readonly PlacedRule[],
  rankOf: (attribute: number) => number,
  byWord: boolean,
): PathRanker {
  const weights: PathCosts = { ...NO_COSTS };
  let weight = 1;
  for (const rule of [...rules].reverse()) {
    weights[rule] = weight;
    weight *= RANGES[rule];
  }
  const unitCount = graph.units.length;
  const spans = graph.edges.map(({ from, to }) => to - from + 1);
  const fixedCosts = graph.edges.map(
    ({ typos, exact }, edge) =>
      typos * weights.typo +
      ((spans[edge] ?? 1) - 1) * weights.proximity +
      (exact ? 0 : (spans[edge] ?? 1)) * weights.inexact,
  );
  const fromUnits = graph.edges.map(({ from }) => from);
  const seen = new Uint8Array(graph.edges.length);
  const nodes: Arrivals[] = Array.from({ length: unitCount + 1 }, () => ({
    count: 0,
    ends: [],
    costs: [],
    cheapest: Infinity,
  }));
  const farthestCost = FARTHEST * weights.proximity;
  const reach = byWord ? FARTHEST : POSITIONS_PER_ATTRIBUTE;

  const occurrenceCost = (edge: number, start: number): number => {
    const attribute = Math.floor(start / POSITIONS_PER_ATTRIBUTE);
    const rank = Math.min(rankOf(attribute), MAX_ATTRIBUTE_RANK);
    const step = positionStep(start % POSITIONS_PER_ATTRIBUTE);
    const placed = rank * weights.attributeRank + step * weights.wordPosition;
    return (fixedCosts[edge] ?? 0) + (spans[edge] ?? 1) * placed;
  };
  const apartCost = (end: number, start: number): number => {
    if (byWord) return proximityCost(end, start) * weights.proximity;
    return (sameAttribute(end, start) ? 1 : FARTHEST) * weights.proximity;
  };

  /** Places the occurrences of one unit after the cheapest ways to come to each. */
  function placeUnit(unit: number, occurrences: Occurrences, isFirst: boolean): void {
    const { count, edges, starts, ends } = occurrences;
    const before = nodes[unit];
    if (before === undefined || (!isFirst && before.count === 0)) return;
    let near = 0;
    seen.fill(0);
    for (let at = 0; at < count; at += 1) {
      const edge = edges[at] ?? 0;
      if (fromUnits[edge] !== unit) continue;
      const times = seen[edge] ?? 0;
      if (times >= MAX_OCCURRENCES) continue;
      seen[edge] = times + 1;
      const start = starts[at] ?? 0;
      let best = 0;
      if (!isFirst) {
        best = before.cheapest + farthestCost;
        while (near < before.count && (before.ends[near] ?? 0) < start - reach) near += 1;
        for (let other = near; other < before.count; other += 1) {
          const end = before.ends[other] ?? 0;
          if (end > start + reach) break;
          const cost = (before.costs[other] ?? 0) + apartCost(end, start);
          if (cost < best) best = cost;
        }
      }
      const next = nodes[unit + (spans[edge] ?? 1)];
      if (next) arrive(next, ends[at] ?? 0, best + occurrenceCost(edge, start));
    }
  }

  return (occurrences, droppedUnits) => {
    for (const node of nodes) {
      node.count = 0;
      node.cheapest = Infinity;
    }
    let isFirst = true;
    for (let unit = 0; unit < unitCount; unit += 1) {
      if (!droppedUnits.has(unit)) {
        placeUnit(unit, occurrences, isFirst);
        isFirst = false;
        continue;
      }
      const here = nodes[unit];
      const next = nodes[unit + 1];
      if (here === undefined || next === undefined) continue;
      for (let at = 0; at < here.count; at += 1) {
        arrive(next, here.ends[at] ?? 0, here.costs[at] ?? 0);
      }
    }
    const best = nodes[unitCount]?.cheapest ?? Infinity;
    return unpack(best === Infinity ? 0 : best, rules);
  };
}

function unpack(packed: number, rules: readonly PlacedRule[]): PathCosts {
  const costs = { ...NO_COSTS };
  let rest = packed;
  for (const rule of [...rules].reverse()) {
    costs[rule] = rest % RANGES[rule];
    rest = Math.floor(rest / RANGES[rule]);
  }
  return costs;
}
