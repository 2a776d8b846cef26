import type { Column } from './columns.ts';
import { EngineError } from './errors.ts';
import { filterablePatterns, isFilterable } from './filter-target.ts';
import type { JsonObject } from './json.ts';
import type { FacetValues, SearchIndex } from './search-index.ts';
import type { FacetOrder, Settings } from './settings.ts';

export type FacetCount = { value: string; count: number };

/** Attributes that a request's facet list stands for; `*` is every filterable one that occurs. */
export function facetAttributes(
  names: readonly string[],
  index: SearchIndex,
  indexUid: string,
): string[] {
  const { settings } = index;
  const unknown = names.filter((name) => name !== '*' && !isFilterable(name, settings));
  if (unknown.length > 0) {
    const patterns = filterablePatterns(settings);
    const known =
      patterns.length === 0
        ? 'This index does not have configured filterable attributes.'
        : `Available facets attributes patterns are \`${patterns.join(', ')}\`.`;
    throw new EngineError(
      'invalid_search_facets',
      `Index \`${indexUid}\`: Invalid facet distribution: Attribute \`${unknown.join(', ')}\` is not filterable. ${known}`,
    );
  }
  if (!names.includes('*')) return [...new Set(names)];
  const all = [...index.columns.keys()].filter((name) => isFilterable(name, settings));
  return [...new Set([...names.filter((name) => name !== '*'), ...all])].sort();
}

export function facetOrder(attribute: string, settings: Settings): FacetOrder {
  const { sortFacetValuesBy } = settings.faceting;
  return sortFacetValuesBy[attribute] ?? sortFacetValuesBy['*'] ?? 'alpha';
}

/** Text values of a column among some documents, with how many documents hold each. */
export function countTexts(column: Column, documents: Iterable<number>): FacetCount[] {
  const counts = new Uint32Array(column.labels.length);
  for (const document of documents) {
    const cell = column.cells[document];
    if (cell === undefined) continue;
    for (const code of cell.codes) counts[code] = (counts[code] ?? 0) + 1;
  }
  const found: FacetCount[] = [];
  for (const [code, count] of counts.entries()) {
    if (count > 0) found.push({ value: column.labels[code] ?? '', count });
  }
  return found.sort((a, b) => compareText(a.value, b.value));
}

function compareText(a: string, b: string): number {
  return a < b ? -1 : a > b ? 1 : 0;
}

/** Puts counted values in the wanted order and keeps the first `most`. */
export function orderedCounts(
  counts: readonly FacetCount[],
  order: FacetOrder,
  most: number,
): FacetCount[] {
  // The sort is stable, so values of equal count stay in alphabetical order.
  const ordered = order === 'count' ? [...counts].sort((a, b) => b.count - a.count) : counts;
  return ordered.slice(0, most);
}

function countValues(column: Column, documents: readonly number[]): FacetValues {
  const numbers = new Map<number, number>();
  for (const document of documents) {
    const cell = column.cells[document];
    if (cell === undefined) continue;
    for (const number of cell.numbers) numbers.set(number, (numbers.get(number) ?? 0) + 1);
  }
  const ascending = [...numbers].sort(([a], [b]) => a - b);
  return {
    counts: [
      ...ascending.map(([value, count]) => ({ value: String(value), count })),
      ...countTexts(column, documents),
    ],
    lowest: ascending[0]?.[0],
    highest: ascending.at(-1)?.[0],
  };
}

/** Counts over all documents are asked for with every visit, so they are kept until the next write. */
function valuesOf(
  index: SearchIndex,
  attribute: string,
  column: Column,
  documents: readonly number[],
): FacetValues {
  if (documents.length !== index.numberOfId.size) return countValues(column, documents);
  let known = index.derived.counts.get(attribute);
  if (known === undefined) {
    known = countValues(column, documents);
    index.derived.counts.set(attribute, known);
  }
  return known;
}

/** `facetDistribution` and `facetStats` over all given documents. */
export function distributeFacets(
  index: SearchIndex,
  attributes: readonly string[],
  documents: readonly number[],
): { facetDistribution: JsonObject; facetStats: JsonObject } {
  const distribution: [string, JsonObject][] = [];
  const stats: [string, JsonObject][] = [];
  for (const attribute of attributes) {
    const column = index.columns.get(attribute);
    if (column === undefined) {
      distribution.push([attribute, {}]);
      continue;
    }
    const { counts, lowest, highest } = valuesOf(index, attribute, column, documents);
    if (lowest !== undefined && highest !== undefined) {
      stats.push([attribute, { min: lowest, max: highest }]);
    }
    const kept = orderedCounts(
      counts,
      facetOrder(attribute, index.settings),
      index.settings.faceting.maxValuesPerFacet,
    );
    distribution.push([
      attribute,
      Object.fromEntries(kept.map(({ value, count }) => [value, count])),
    ]);
  }
  return {
    facetDistribution: Object.fromEntries(distribution),
    facetStats: Object.fromEntries(stats),
  };
}
