import type { Json, JsonObject } from './json.ts';
import type { TypoSettings } from './typo.ts';

export type FilterableAttribute =
  | string
  | {
      attributePatterns: string[];
      features: { facetSearch: boolean; filter: { equality: boolean; comparison: boolean } };
    };

export type FacetOrder = 'alpha' | 'count';

/** Everything an index can be told, with no key left out. */
export type Settings = {
  displayedAttributes: string[];
  searchableAttributes: string[];
  filterableAttributes: FilterableAttribute[];
  sortableAttributes: string[];
  rankingRules: string[];
  stopWords: string[];
  nonSeparatorTokens: string[];
  separatorTokens: string[];
  dictionary: string[];
  synonyms: Record<string, string[]>;
  distinctAttribute: string | null;
  proximityPrecision: 'byWord' | 'byAttribute';
  typoTolerance: TypoSettings;
  faceting: { maxValuesPerFacet: number; sortFacetValuesBy: Record<string, FacetOrder> };
  pagination: { maxTotalHits: number };
  embedders: JsonObject;
  searchCutoffMs: number | null;
  localizedAttributes: Json;
  facetSearch: boolean;
  prefixSearch: 'indexingTime' | 'disabled';
};

export type SettingName = keyof Settings;

export function defaultSettings(): Settings {
  return {
    displayedAttributes: ['*'],
    searchableAttributes: ['*'],
    filterableAttributes: [],
    sortableAttributes: [],
    rankingRules: [
      'words',
      'typo',
      'proximity',
      'attributeRank',
      'sort',
      'wordPosition',
      'exactness',
    ],
    stopWords: [],
    nonSeparatorTokens: [],
    separatorTokens: [],
    dictionary: [],
    synonyms: {},
    distinctAttribute: null,
    proximityPrecision: 'byWord',
    typoTolerance: {
      enabled: true,
      minWordSizeForTypos: { oneTypo: 5, twoTypos: 9 },
      disableOnWords: [],
      disableOnAttributes: [],
      disableOnNumbers: false,
    },
    faceting: { maxValuesPerFacet: 100, sortFacetValuesBy: { '*': 'alpha' } },
    pagination: { maxTotalHits: 1000 },
    embedders: {},
    searchCutoffMs: null,
    localizedAttributes: null,
    facetSearch: true,
    prefixSearch: 'indexingTime',
  };
}

/** Path segment of each setting's own route. */
export const SETTING_ROUTES: Record<string, SettingName> = {
  'displayed-attributes': 'displayedAttributes',
  'searchable-attributes': 'searchableAttributes',
  'filterable-attributes': 'filterableAttributes',
  'sortable-attributes': 'sortableAttributes',
  'ranking-rules': 'rankingRules',
  'stop-words': 'stopWords',
  'non-separator-tokens': 'nonSeparatorTokens',
  'separator-tokens': 'separatorTokens',
  dictionary: 'dictionary',
  synonyms: 'synonyms',
  'distinct-attribute': 'distinctAttribute',
  'proximity-precision': 'proximityPrecision',
  'typo-tolerance': 'typoTolerance',
  faceting: 'faceting',
  pagination: 'pagination',
  embedders: 'embedders',
  'search-cutoff-ms': 'searchCutoffMs',
  'localized-attributes': 'localizedAttributes',
  'facet-search': 'facetSearch',
  'prefix-search': 'prefixSearch',
};

/** Settings whose change means that documents must be read again. */
const REINDEXING: readonly SettingName[] = [
  'searchableAttributes',
  'filterableAttributes',
  'sortableAttributes',
  'rankingRules',
  'stopWords',
  'nonSeparatorTokens',
  'separatorTokens',
  'dictionary',
  'distinctAttribute',
];

export function needsReindex(before: Settings, after: Settings): boolean {
  return REINDEXING.some((name) => JSON.stringify(before[name]) !== JSON.stringify(after[name]));
}
