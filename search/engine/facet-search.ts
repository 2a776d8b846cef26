import { EngineError } from './errors.ts';
import { countTexts, facetOrder, orderedCounts } from './facets.ts';
import { allowsFacetSearch, filterablePatterns, isFilterable } from './filter-target.ts';
import { findDocuments } from './find-documents.ts';
import { describeJson, type JsonObject } from './json.ts';
import { readScope } from './search.ts';
import type { SearchIndex } from './search-index.ts';
import { readSearchRequest } from './search-request.ts';
import { typoBudget, typosBetween } from './typo.ts';

const MAX_FACET_HITS = 100;
const SEARCH_FIELDS = [
  'q',
  'filter',
  'matchingStrategy',
  'attributesToSearchOn',
  'rankingScoreThreshold',
];

/** Finds values of one attribute by the beginning of a word, counted over the matching documents. */
export function facetSearch(index: SearchIndex, indexUid: string, body: JsonObject): JsonObject {
  const startedAt = performance.now();
  const { settings } = index;
  if (!settings.facetSearch) {
    throw new EngineError(
      'facet_search_disabled',
      `The facet search is disabled for the index \`${indexUid}\`.`,
    );
  }
  const { facetName, facetQuery = null, ...rest } = body;
  if (facetName === undefined || facetName === null) {
    throw new EngineError('missing_facet_search_facet_name', 'Missing field `facetName`');
  }
  if (typeof facetName !== 'string') {
    throw new EngineError(
      'invalid_facet_search_facet_name',
      `Invalid value type at \`.facetName\`: expected a string, but found ${describeJson(facetName)}`,
    );
  }
  if (facetQuery !== null && typeof facetQuery !== 'string') {
    throw new EngineError(
      'invalid_facet_search_facet_query',
      `Invalid value type at \`.facetQuery\`: expected a string, but found ${describeJson(facetQuery)}`,
    );
  }
  if (!isFilterable(facetName, settings) || !allowsFacetSearch(facetName, settings)) {
    const patterns = filterablePatterns(settings);
    throw new EngineError(
      'invalid_facet_search_facet_name',
      `Attribute \`${facetName}\` is not facet-searchable. ${
        patterns.length === 0
          ? 'This index does not have configured facet-searchable attributes.'
          : `Available facet-searchable attributes patterns are: \`${patterns.join(', ')}\`.`
      }`,
    );
  }
  const request = readSearchRequest(
    Object.fromEntries(Object.entries(rest).filter(([name]) => isKnown(name))),
  );
  const unknown = Object.keys(rest).find((name) => !isKnown(name));
  if (unknown !== undefined) {
    throw new EngineError('bad_request', `Unknown field \`${unknown}\``);
  }
  const found = findDocuments(index, request.q ?? '', readScope(index, indexUid, request));
  const column = index.columns.get(facetName);
  const counts =
    column === undefined
      ? []
      : countTexts(
          column,
          found.matches.map((match) => match.document),
        );
  const holds = facetTest(index, facetQuery ?? '');
  return {
    facetHits: orderedCounts(
      counts.filter(({ value }) => holds(value)),
      facetOrder(facetName, settings),
      MAX_FACET_HITS,
    ),
    facetQuery,
    processingTimeMs: Math.floor(performance.now() - startedAt),
  };
}

function isKnown(name: string): boolean {
  return SEARCH_FIELDS.includes(name) || name === 'exhaustiveFacetCount' || name === 'locales';
}

/** Only the first word of the facet query counts; it may begin any word of a value. */
function facetTest(index: SearchIndex, facetQuery: string): (value: string) => boolean {
  const word = index.tokenise(facetQuery)[0]?.word;
  if (word === undefined) return () => true;
  const budget = typoBudget(word, index.settings.typoTolerance);
  return (value) =>
    index
      .tokenise(value)
      .some(
        (token) =>
          token.word.startsWith(word) || typosBetween(word, token.word, budget, true) !== undefined,
      );
}
