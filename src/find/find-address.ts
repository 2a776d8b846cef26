import {
  FIND_FACETS,
  FIND_SORTS,
  MAX_QUESTION,
  type FindFacet,
  type FindSort,
} from '#shared/api/search.ts';

/** The most pages of results that can be asked for. */
const MOST_PAGES = 50;

/** Everything a search is: it stands in the address of the page, so that Back and links work. */
export interface FindAddress {
  readonly q: string;
  /** Keys of the read-as parts that are switched off. */
  readonly off: readonly string[];
  readonly sort: FindSort;
  readonly page: number;
  readonly facets: Readonly<Partial<Record<FindFacet, readonly string[]>>>;
}

const listOf = (text: string | null): string[] => [
  ...new Set((text ?? '').split(',').filter((value) => value !== '')),
];
const isSort = (text: string | null): text is FindSort =>
  text !== null && Object.hasOwn(FIND_SORTS, text);

/** Reads the address of the page; what makes no sense is as if it were not there. */
export function readFindAddress(params: URLSearchParams): FindAddress {
  const sort = params.get('sort');
  const page = Math.floor(Number(params.get('page') ?? 1));
  const facets: Partial<Record<FindFacet, string[]>> = {};
  for (const facet of FIND_FACETS) {
    const values = listOf(params.get(facet));
    if (values.length > 0) facets[facet] = values;
  }
  return {
    q: (params.get('q') ?? '').slice(0, MAX_QUESTION).trim(),
    off: listOf(params.get('off')),
    sort: isSort(sort) ? sort : 'best',
    page: page >= 1 && page <= MOST_PAGES ? page : 1,
    facets,
  };
}

/** The address as a query, always in the same order, without what is as usual. */
export function writeFindAddress(address: FindAddress): string {
  const params = new URLSearchParams();
  if (address.q) params.set('q', address.q);
  if (address.off.length > 0) params.set('off', address.off.join(','));
  for (const facet of FIND_FACETS) {
    const values = address.facets[facet] ?? [];
    if (values.length > 0) params.set(facet, values.join(','));
  }
  if (address.sort !== 'best') params.set('sort', address.sort);
  if (address.page > 1) params.set('page', String(address.page));
  return params.toString();
}

/** What the server is asked: an empty question asks for the newest notes. */
export function searchOf(address: FindAddress): string {
  return writeFindAddress(address.q === '' ? { ...address, off: [], sort: 'newest' } : address);
}

const toggled = (values: readonly string[], value: string): string[] =>
  values.includes(value) ? values.filter((one) => one !== value) : [...values, value];

/** Switches a part of the question off, or takes it in again; the results start anew. */
export function withPartToggled(address: FindAddress, key: string): FindAddress {
  return { ...address, off: toggled(address.off, key), page: 1 };
}

/** Ticks a filter, or takes the tick away; the results start anew. */
export function withFacetToggled(
  address: FindAddress,
  facet: FindFacet,
  value: string,
): FindAddress {
  const values = toggled(address.facets[facet] ?? [], value);
  return { ...address, facets: { ...address.facets, [facet]: values }, page: 1 };
}

export function withoutFacets(address: FindAddress): FindAddress {
  return { ...address, facets: {}, page: 1 };
}

/** How many filters are ticked. */
export function tickedCount({ facets }: FindAddress): number {
  return Object.values(facets).reduce((sum, values) => sum + values.length, 0);
}
