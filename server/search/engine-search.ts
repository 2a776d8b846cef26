import type { MultiSearchQuery } from 'meilisearch';
import { bothFilters, filterText } from '../../search/filters.ts';
import { NOTES_INDEX, type NoteDocument } from '../../search/note-document.ts';
import type { FindFacet, FindQuery, Histogram } from '#shared/api/search.ts';
import { FIND_FACETS } from '#shared/api/search.ts';
import type { OrderableHit } from '#shared/question/order-hits.ts';
import type { QuestionReading } from '#shared/question/reading-types.ts';
import {
  tiersFor,
  type Filter,
  type Tier,
  type TierRequest,
} from '#shared/question/search-request.ts';
import type { Config } from '../config.ts';
import {
  bothTexts,
  histogramsOf,
  MEASURED_FIELDS,
  MOST_MEASURED,
  rangesText,
  type ChosenRanges,
  type Measured,
} from './measured-ranges.ts';
import { searchingClient } from './search-client.ts';

/** Hits asked for per query: pages are made from the joined list. */
const MOST_PER_QUERY = 200;

/** What putting hits in order needs to know; what is shown of a page's few is asked for after. */
const FIELDS_TO_ORDER_BY = [
  'noteId',
  'outcome',
  'stallC',
  'sagC',
  'peakC',
  'firedOn',
  'publishedAt',
] as const satisfies (keyof NoteDocument)[];
type Ordered = Pick<NoteDocument, (typeof FIELDS_TO_ORDER_BY)[number]>;

export interface EngineHit extends OrderableHit {
  readonly tier: Tier;
  readonly document: Ordered;
  /** The words it was found by; empty where the filter alone found it. */
  readonly q: string;
  readonly strategy: TierRequest['strategy'];
}
export interface EngineAnswer {
  readonly hits: EngineHit[];
  readonly facets: Record<string, { value: string; count: number }[]>;
  readonly histograms: Histogram[];
}

export type ChosenFacets = Partial<Record<FindFacet, string[]>>;

/** What the reader has ticked beside the question. */
export function chosenFacets(query: FindQuery): ChosenFacets {
  const chosen: ChosenFacets = {};
  for (const facet of FIND_FACETS) {
    const values = (query[facet] ?? '').split(',').filter((value) => value !== '');
    if (values.length > 0) chosen[facet] = values.slice(0, 20);
  }
  return chosen;
}

export function facetFilter(chosen: ChosenFacets, without?: FindFacet): Filter | null {
  const of = FIND_FACETS.flatMap((facet): Filter[] => {
    const values = chosen[facet];
    return values && facet !== without ? [{ kind: 'in', field: facet, values }] : [];
  });
  return of.length === 0 ? null : { kind: 'all', of };
}

/** Where the temperature asked about stands in a note, for nearness. */
function levelsFor(reading: QuestionReading, document: Ordered): number[] {
  const levels = [
    ...(reading.trouble.includes('stall') ? document.stallC : []),
    ...(reading.trouble.includes('sag') ? document.sagC : []),
  ];
  if (levels.length > 0) return levels;
  return document.peakC === null ? [] : [document.peakC];
}

interface Asked extends Pick<EngineHit, 'tier' | 'q' | 'strategy'> {
  readonly foundBy: number;
  readonly query: MultiSearchQuery;
}

function queriesOf(request: TierRequest | null, narrowed: string): Asked[] {
  if (!request) return [];
  const { tier, strategy } = request;
  const { first } = request;
  const filters = [...(first ? [bothFilters(request.filter, first)] : []), request.filter];
  const steps = filters.flatMap((filter) => request.texts.map((q) => ({ filter, q })));
  return steps.map(({ filter, q }, foundBy) => ({
    tier,
    q,
    strategy,
    foundBy,
    query: {
      indexUid: NOTES_INDEX,
      q,
      filter: bothTexts(filterText(filter), narrowed),
      matchingStrategy: strategy,
      limit: MOST_PER_QUERY,
      attributesToRetrieve: [...FIELDS_TO_ORDER_BY],
    },
  }));
}

/** The tiers of a question; without one, everything published, newest first. */
function tierRequests(reading: QuestionReading): TierRequest[] {
  const { close, sameTrouble, byWords } = tiersFor(reading);
  const asked = [close, sameTrouble, byWords].filter((request) => request !== null);
  return asked.length > 0
    ? asked
    : [{ tier: 'by-words', filter: null, texts: [''], strategy: 'last' }];
}

/**
 * Asks the engine everything in one request: the tiers of the question with their words, and the
 * counts of the facets, each without its own ticks so that its other values can be seen.
 */
export async function searchEngine(
  config: Config,
  reading: QuestionReading,
  chosen: ChosenFacets,
  ranges: ChosenRanges,
): Promise<EngineAnswer> {
  const client = await searchingClient(config);
  const inRanges = rangesText(ranges);
  const requests = tierRequests(reading);
  const narrowed = bothTexts(filterText(facetFilter(chosen)), inRanges);
  const asked = requests.flatMap((request) => queriesOf(request, narrowed));
  // Counts are over everything with the trouble asked about, else over what the widest tier finds.
  const counted = requests.find((request) => request.tier === 'same-trouble') ?? requests.at(-1);
  const countedOver = (narrowedBy: string) => ({
    indexUid: NOTES_INDEX,
    q: counted?.filter ? '' : (counted?.texts[0] ?? ''),
    filter: bothTexts(filterText(counted?.filter ?? null), narrowedBy),
    matchingStrategy: counted?.strategy ?? 'last',
  });
  const countQuery = (facets: readonly FindFacet[], without?: FindFacet): MultiSearchQuery => ({
    ...countedOver(bothTexts(filterText(facetFilter(chosen, without)), inRanges)),
    limit: 0,
    facets: [...facets],
  });
  // Without the ranges: each measure is then counted within the ranges of the others.
  const measureQuery: MultiSearchQuery = {
    ...countedOver(filterText(facetFilter(chosen))),
    limit: MOST_MEASURED,
    attributesToRetrieve: [...MEASURED_FIELDS],
  };
  const unticked = FIND_FACETS.filter((facet) => !chosen[facet]);
  const counts = [
    { facets: unticked, query: countQuery(unticked) },
    ...FIND_FACETS.filter((facet) => chosen[facet]).map((facet) => ({
      facets: [facet],
      query: countQuery([facet], facet),
    })),
  ];
  const { results } = await client.multiSearch<{ queries: MultiSearchQuery[] }, Ordered & Measured>(
    {
      queries: [
        ...asked.map((each) => each.query),
        ...counts.map((each) => each.query),
        measureQuery,
      ],
    },
  );
  const hits = asked.flatMap(({ tier, foundBy, q, strategy }, index) =>
    (results[index]?.hits ?? []).map((document): EngineHit => ({
      tier,
      foundBy,
      q,
      strategy,
      document,
      outcome: document.outcome,
      levelsC: levelsFor(reading, document),
      firedOn: document.firedOn,
    })),
  );
  const facets: EngineAnswer['facets'] = {};
  counts.forEach((count, index) => {
    const distribution = results[asked.length + index]?.facetDistribution ?? {};
    for (const facet of count.facets) {
      facets[facet] = Object.entries(distribution[facet] ?? {})
        .map(([value, n]) => ({ value, count: n }))
        .sort((a, b) => b.count - a.count || a.value.localeCompare(b.value));
    }
  });
  const measured = results[asked.length + counts.length]?.hits ?? [];
  return { hits, facets, histograms: histogramsOf(measured, ranges) };
}

/** How many notes each question would find closely: for "loosen this". */
export async function countClose(
  config: Config,
  readings: readonly QuestionReading[],
): Promise<number[]> {
  if (readings.length === 0) return [];
  const client = await searchingClient(config);
  const { results } = await client.multiSearch<{ queries: MultiSearchQuery[] }, NoteDocument>({
    queries: readings.map((reading): MultiSearchQuery => {
      const { close, byWords } = tiersFor(reading);
      const request = close ?? byWords;
      return {
        indexUid: NOTES_INDEX,
        q: close ? '' : (byWords?.texts[0] ?? ''),
        filter: filterText(request?.filter ?? null),
        limit: 0,
      };
    }),
  });
  return results.map((result) => result.estimatedTotalHits ?? 0);
}
