import {
  createPathRanker,
  NO_COSTS,
  placedRules,
  type PathCosts,
  type PlacedRule,
} from './best-path.ts';
import type { Match } from './matching.ts';
import type { AttributeRules, OccurrenceFinder } from './occurrences.ts';
import type { QueryGraph } from './query-graph.ts';
import type { BuiltInRule, RankingRule } from './ranking-rule-names.ts';
import type { SearchIndex } from './search-index.ts';
import { compareSortKeys, sortKey, type SortBy, type SortKey } from './sort.ts';
import { createWholeMatchFinder, type WholeMatch } from './whole-attribute.ts';

/** Everything the rules found out about one document. */
export type Standing = { match: Match; costs: PathCosts; wholeMatch: WholeMatch };

/** One step of the ordering: the key of a document and how keys compare. */
export type RankingStep = {
  rule: BuiltInRule | 'field';
  sortBy: SortBy | null;
  keyOf: (match: Match) => SortKey;
  descending: boolean;
  /** Whether the key is found by reading the document's words, which takes its time. */
  readsText: boolean;
};

export type Ranking = { steps: RankingStep[]; standingOf: (match: Match) => Standing };

/**
 * The rules as they act: `words` comes before every rule that looks at words even where it is left
 * out or named later, and `sort` stands for what the request sorts by.
 */
export function effectiveRules(rules: readonly RankingRule[]): RankingRule[] {
  const others = rules.filter((rule) => rule.kind !== 'words');
  const named = rules.findIndex((rule) => rule.kind === 'words');
  const firstAtWords = others.findIndex((rule) => rule.kind !== 'sort' && rule.kind !== 'field');
  const places = [named, firstAtWords].filter((place) => place >= 0);
  if (places.length === 0) return others;
  const at = Math.min(...places);
  return [...others.slice(0, at), { kind: 'words' }, ...others.slice(at)];
}

/** Prepares the ordering of one query's matches. */
export function createRanking(
  index: SearchIndex,
  graph: QueryGraph,
  order: readonly number[],
  attributes: AttributeRules,
  find: OccurrenceFinder,
  sort: readonly SortBy[],
): Ranking {
  const rules = effectiveRules(index.rankingRules);
  const builtIn = rules.flatMap((rule) => (rule.kind === 'field' ? [] : [rule.kind]));
  const placed = placedRules(builtIn);
  const ranker = createPathRanker(
    graph,
    placed,
    (attribute) => index.attributeRanks[attribute] ?? 0,
    index.settings.proximityPrecision === 'byWord',
  );
  const wholeMatch = createWholeMatchFinder(index, graph, attributes.isSearched);
  const droppedSets = Array.from(
    { length: order.length + 1 },
    (_, count) => new Set(order.slice(0, count)),
  );
  const noneDropped = new Set<number>();
  const costsKnown = new Map<number, PathCosts>();
  const wholeKnown = new Map<number, WholeMatch>();

  const costsOf = (match: Match): PathCosts => {
    let costs = costsKnown.get(match.document);
    if (costs === undefined) {
      const document = index.documents[match.document];
      const dropped = droppedSets[match.dropped] ?? noneDropped;
      costs = document === undefined ? NO_COSTS : ranker(find(document), dropped);
      costsKnown.set(match.document, costs);
    }
    return costs;
  };
  const wholeOf = (match: Match): WholeMatch => {
    let whole = wholeKnown.get(match.document);
    if (whole === undefined) {
      const document = index.documents[match.document];
      whole = document === undefined || match.dropped > 0 ? 2 : wholeMatch(document);
      wholeKnown.set(match.document, whole);
    }
    return whole;
  };
  const placedKey =
    (rule: PlacedRule) =>
    (match: Match): number =>
      costsOf(match)[rule];

  const steps: RankingStep[] = [];
  const add = (rule: RankingStep['rule'], keyOf: RankingStep['keyOf'], readsText = true): void => {
    steps.push({ rule, sortBy: null, keyOf, descending: false, readsText });
  };
  const addField = (rule: RankingStep['rule'], sortBy: SortBy): void => {
    const column = index.columns.get(sortBy.attribute);
    const { descending } = sortBy;
    steps.push({
      rule,
      sortBy,
      descending,
      readsText: false,
      keyOf: (match) => sortKey(column, match.document, descending),
    });
  };

  for (const rule of rules) {
    switch (rule.kind) {
      case 'field':
        addField('field', rule);
        break;
      case 'sort':
        for (const sortBy of sort) addField('sort', sortBy);
        break;
      case 'words':
        add('words', (match) => match.dropped, false);
        break;
      case 'typo':
        // While no placed rule came before, the fewest typos are known without reading the text.
        if (placed[0] === 'typo') add('typo', (match) => match.typos, false);
        else add('typo', placedKey('typo'));
        break;
      case 'proximity':
        if (graph.units.length > 1) add('proximity', placedKey('proximity'));
        break;
      case 'attribute':
        add('attribute', placedKey('attributeRank'));
        add('attribute', placedKey('wordPosition'));
        break;
      case 'attributeRank':
      case 'wordPosition':
        add(rule.kind, placedKey(rule.kind));
        break;
      case 'exactness':
        add('exactness', wholeOf);
        add('exactness', placedKey('inexact'));
        break;
    }
  }
  return {
    steps,
    standingOf: (match) => ({ match, costs: costsOf(match), wholeMatch: wholeOf(match) }),
  };
}

/**
 * Of more matches than this that are alike so far, only the best of a rough order are read for the
 * rules that look at words; the others follow in the rough order.
 */
const MOST_READ = 1_000;

/**
 * Orders the matches by the steps, each breaking only the ties of those before it, until the first
 * `needed` are settled; what lies beyond is left out. Ties of all steps keep the order of arrival.
 */
export function bucketSort(
  index: SearchIndex,
  matches: readonly Match[],
  steps: readonly RankingStep[],
  needed: number,
): Match[] {
  const sorted: Match[] = [];
  const arrival = ({ document }: Match): number => index.documents[document]?.order ?? 0;

  function settle(bucket: Match[], depth: number): void {
    const step = steps[depth];
    if (step === undefined || bucket.length === 1) {
      if (bucket.length > 1) bucket.sort((a, b) => arrival(a) - arrival(b));
      for (const match of bucket) sorted.push(match);
      return;
    }
    const most = Math.max(MOST_READ, needed);
    if (step.readsText && bucket.length > most) {
      const { best, others } = roughlyBest(bucket, most);
      settle(best, depth);
      for (const match of others) sorted.push(match);
      return;
    }
    const buckets = new Map<SortKey, Match[]>();
    for (const match of bucket) {
      const key = step.keyOf(match);
      const list = buckets.get(key);
      if (list === undefined) buckets.set(key, [match]);
      else list.push(match);
    }
    const keys = [...buckets.keys()].sort((a, b) => compareSortKeys(a, b, step.descending));
    for (const key of keys) {
      if (sorted.length >= needed) return;
      settle(buckets.get(key) ?? [], depth + 1);
    }
  }

  if (needed > 0) settle([...matches], 0);
  return sorted.length > needed ? sorted.slice(0, needed) : sorted;
}

/** The `most` matches of the lowest rough order, and the others, lowest first. */
function roughlyBest(bucket: readonly Match[], most: number): { best: Match[]; others: Match[] } {
  const byRough: Match[][] = [];
  for (const match of bucket) (byRough[match.rough] ??= []).push(match);
  const ordered = Object.values(byRough).flat();
  return { best: ordered.slice(0, most), others: ordered.slice(most) };
}
