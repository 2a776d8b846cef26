import { selects } from './attribute-selection.ts';
import { EngineError } from './errors.ts';
import { distributeFacets, facetAttributes } from './facets.ts';
import { compileFilter } from './filter-compile.ts';
import { filterTarget } from './filter-target.ts';
import { createHitFormatter } from './format-hit.ts';
import type { Json, JsonObject } from './json.ts';
import { findDocuments, type Found, type SearchScope } from './find-documents.ts';
import { documentsAllowed } from './live-documents.ts';
import { bucketSort, type Standing } from './ranking-rules.ts';
import { scoreOf, type Score } from './score.ts';
import type { SearchIndex } from './search-index.ts';
import type { SearchRequest } from './search-request.ts';
import { parseSort } from './sort.ts';
import { createTextMatcher } from './text-matcher.ts';
import type { Match } from './matching.ts';

/** Answers one search against one index. Throws an EngineError when the request cannot be met. */
export function search(index: SearchIndex, indexUid: string, request: SearchRequest): JsonObject {
  const startedAt = performance.now();
  const scope = readScope(index, indexUid, request);
  const facetNames =
    request.facets === null ? null : facetAttributes(request.facets, index, indexUid);

  const found = findDocuments(index, request.q ?? '', scope);
  const { maxTotalHits } = index.settings.pagination;
  const paging = readPaging(request, maxTotalHits);
  const distinct = request.distinct ?? index.settings.distinctAttribute;
  const everything = distinct !== null || request.rankingScoreThreshold !== null;
  const needed = everything ? Infinity : paging.end;

  let matches = bucketSort(index, found.matches, found.ranking.steps, needed);
  let total = found.matches.length;
  let counted = found.matches;
  const score = createScorer(index, found);
  const { rankingScoreThreshold } = request;
  if (rankingScoreThreshold !== null) {
    matches = matches.filter((match) => score(match).score >= rankingScoreThreshold);
  }
  if (distinct !== null) matches = firstOfEach(matches, index, distinct);
  if (everything) {
    counted = matches;
    total = matches.length;
  }

  const format = createHitFormatter(request, index.settings.displayedAttributes, () =>
    createTextMatcher(found.graph, index.tokenise, (word) => index.vocabulary.numberOf.has(word)),
  );
  const hits = matches.slice(paging.start, paging.end).map((match): JsonObject => {
    const hit = format(index.documents[match.document]?.source ?? {});
    if (request.showRankingScore) hit['_rankingScore'] = score(match).score;
    if (request.showRankingScoreDetails) hit['_rankingScoreDetails'] = score(match).details;
    return hit;
  });
  const facets =
    facetNames === null
      ? {}
      : distributeFacets(
          index,
          facetNames,
          counted.map((match) => match.document),
        );
  return {
    hits,
    query: request.q ?? '',
    processingTimeMs: Math.floor(performance.now() - startedAt),
    ...paging.answer(Math.min(total, maxTotalHits)),
    ...facets,
  };
}

function createScorer(index: SearchIndex, found: Found): (match: Match) => Score {
  const attributes = index.settings.searchableAttributes;
  const attributeCount = attributes.includes('*') ? 1 : Math.max(1, attributes.length);
  return (match) => {
    const standing: Standing = found.ranking.standingOf(match);
    return scoreOf(standing, found.ranking.steps, found.graph, attributeCount);
  };
}

/** The checked part of a request that says which documents may be found, and where. */
export function readScope(
  index: SearchIndex,
  indexUid: string,
  request: SearchRequest,
): SearchScope {
  const { settings } = index;
  const node = compileFilter(
    request.filter,
    filterTarget(settings, indexUid, 'invalid_search_filter'),
  );
  if (request.sort.length > 0 && !settings.rankingRules.includes('sort')) {
    throw new EngineError(
      'invalid_search_sort',
      `Index \`${indexUid}\`: You must specify where \`sort\` is listed in the rankingRules setting to use the sort parameter at search time.`,
    );
  }
  const { searchableAttributes } = settings;
  const outside = request.attributesToSearchOn?.find(
    (name) => name !== '*' && !selects(searchableAttributes, name),
  );
  if (outside !== undefined) {
    throw new EngineError(
      'invalid_search_attributes_to_search_on',
      `Index \`${indexUid}\`: Attribute \`${outside}\` is not searchable. Available searchable attributes are: \`${searchableAttributes.join(', ')}\`.`,
    );
  }
  return {
    allowed: documentsAllowed(index, node),
    sort: parseSort(request.sort, index, 'invalid_search_sort'),
    attributesToSearchOn: request.attributesToSearchOn,
    strategy: request.matchingStrategy,
  };
}

type Paging = { start: number; end: number; answer: (total: number) => JsonObject };

function readPaging(request: SearchRequest, maxTotalHits: number): Paging {
  const { page, hitsPerPage } = request;
  if (page === null && hitsPerPage === null) {
    const { offset, limit } = request;
    return {
      start: Math.min(offset, maxTotalHits),
      end: Math.min(offset + limit, maxTotalHits),
      answer: (total) => ({ limit, offset, estimatedTotalHits: total }),
    };
  }
  const shownPage = page ?? 1;
  const perPage = hitsPerPage ?? 20;
  const start = Math.min(Math.max(0, shownPage - 1) * perPage, maxTotalHits);
  return {
    start,
    end: shownPage === 0 ? start : Math.min(start + perPage, maxTotalHits),
    answer: (total) => ({
      hitsPerPage: perPage,
      page: shownPage,
      totalPages: perPage === 0 ? 0 : Math.ceil(total / perPage),
      totalHits: total,
    }),
  };
}

/** Keeps the best document of each value; documents without a value are all kept. */
function firstOfEach(matches: readonly Match[], index: SearchIndex, attribute: string): Match[] {
  const column = index.columns.get(attribute);
  const seen = new Set<Json>();
  return matches.filter(({ document }) => {
    const cell = column?.cells[document];
    if (column === undefined || cell === undefined) return true;
    const values: (number | string)[] = [
      ...cell.numbers,
      ...cell.codes.map((code) => column.folded[code] ?? ''),
    ];
    if (values.some((value) => seen.has(value))) return false;
    for (const value of values) seen.add(value);
    return true;
  });
}
