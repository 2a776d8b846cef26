import { isWithin } from './flatten.ts';
import type { DocumentSet } from './filter-evaluate.ts';
import {
  documentsWithAll,
  droppingOrder,
  findMatches,
  type Match,
  type MatchingStrategy,
} from './matching.ts';
import { createOccurrenceFinder, sequenceAt, type AttributeRules } from './occurrences.ts';
import { buildQueryGraph, type QueryGraph } from './query-graph.ts';
import { parseQuery } from './query-parse.ts';
import { createRanking, type Ranking } from './ranking-rules.ts';
import { arrivalOrder, type SearchIndex } from './search-index.ts';
import type { SortBy } from './sort.ts';

export type SearchScope = {
  allowed: DocumentSet;
  sort: SortBy[];
  attributesToSearchOn: string[] | null;
  strategy: MatchingStrategy;
};

/** All documents that satisfy a query within its scope, and how to rank them. */
export type Found = { graph: QueryGraph; matches: Match[]; ranking: Ranking };

export function findDocuments(index: SearchIndex, query: string, scope: SearchScope): Found {
  const { units, excluded } = parseQuery(query, index.tokenise, index.stopWords);
  const allowed = without(index, scope.allowed, excluded);
  const graph = buildQueryGraph(index, units);
  const attributes = attributeRules(index, scope.attributesToSearchOn);
  const find = createOccurrenceFinder(index, graph, attributes);
  const order = droppingOrder(index, graph, scope.strategy);
  const ranking = createRanking(index, graph, order, attributes, find, scope.sort);
  if (units.length === 0) {
    const matches: Match[] = [];
    for (const document of arrivalOrder(index)) {
      if (allowed[document]) matches.push({ document, dropped: 0, typos: 0, rough: 0 });
    }
    const fieldSteps = ranking.steps.filter((step) => step.sortBy !== null);
    return { graph, matches, ranking: { ...ranking, steps: fieldSteps } };
  }
  const matches = findMatches(index, graph, order, allowed, attributes, find);
  return { graph, matches, ranking };
}

function attributeRules(index: SearchIndex, searchOn: string[] | null): AttributeRules {
  const { searchableAttributes, typoTolerance } = index.settings;
  const { disableOnAttributes } = typoTolerance;
  const only = searchOn === null || searchOn.includes('*') ? null : searchOn;
  const within = (attribute: number, names: readonly string[]): boolean => {
    const name = index.attributeNames[attribute] ?? '';
    return names.some((each) => isWithin(name, each));
  };
  // Ranks tell all only where every rule names whole entries of the list, none inside another.
  const ranked =
    [...(only ?? []), ...disableOnAttributes].every((name) =>
      searchableAttributes.includes(name),
    ) &&
    searchableAttributes.every((one) =>
      searchableAttributes.every((other) => one === other || !isWithin(one, other)),
    );
  const named = (rank: number, names: readonly string[]): boolean =>
    names.includes(searchableAttributes[rank] ?? '');
  return {
    isSearched: (attribute) => only === null || within(attribute, only),
    allowsTypos: (attribute) => !within(attribute, disableOnAttributes),
    restricted: only !== null || disableOnAttributes.length > 0,
    byRank: ranked
      ? {
          isSearched: (rank) => only === null || named(rank, only),
          allowsTypos: (rank) => !named(rank, disableOnAttributes),
        }
      : null,
  };
}

/** Takes out documents that hold an excluded word, or an excluded phrase word for word. */
function without(
  index: SearchIndex,
  allowed: DocumentSet,
  excluded: readonly (readonly string[])[],
): DocumentSet {
  if (excluded.length === 0) return allowed;
  const result = allowed.slice();
  for (const words of excluded) {
    const numbers = words.map((word) => index.vocabulary.numberOf.get(word) ?? -1);
    for (const number of documentsWithAll(index, words)) {
      const document = index.documents[number];
      if (document === undefined) continue;
      const held =
        words.length === 1 ||
        document.words.some(
          (word, at) =>
            word === numbers[0] && sequenceAt(document.words, document.places, at, numbers),
        );
      if (held) result[number] = 0;
    }
  }
  return result;
}
