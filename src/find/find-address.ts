import {
  FIND_FACETS,
  FIND_RANGES,
  FIND_SORTS,
  MAX_QUESTION,
  type FindFacet,
  type FindRange,
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
  readonly ranges: Readonly<Partial<Record<FindRange, RangeEnds>>>;
}

/** In stored units, both ends included; null leaves an end open. Never both null. */
export interface RangeEnds {
  readonly min: number | null;
  readonly max: number | null;
}

const MOST_OF_A_RANGE = 99_999;
const RANGE = /^(\d{1,5}(?:\.\d{1,2})?)?\.\.(\d{1,5}(?:\.\d{1,2})?)?$/;

function readRange(text: string | null): RangeEnds | null {
  const [, min, max] = RANGE.exec(text ?? '') ?? [];
  const ends = { min: min ? Number(min) : null, max: max ? Number(max) : null };
  return ends.min === null && ends.max === null ? null : ends;
}

const writeEnd = (end: number | null): string =>
  end === null ? '' : String(Math.round(Math.min(MOST_OF_A_RANGE, Math.max(0, end)) * 100) / 100);

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
  const ranges: Partial<Record<FindRange, RangeEnds>> = {};
  for (const range of FIND_RANGES) {
    const ends = readRange(params.get(range));
    if (ends) ranges[range] = ends;
  }
  return {
    q: (params.get('q') ?? '').slice(0, MAX_QUESTION).trim(),
    off: listOf(params.get('off')),
    sort: isSort(sort) ? sort : 'best',
    page: page >= 1 && page <= MOST_PAGES ? page : 1,
    facets,
    ranges,
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
  for (const range of FIND_RANGES) {
    const ends = address.ranges[range];
    if (ends) params.set(range, `${writeEnd(ends.min)}..${writeEnd(ends.max)}`);
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

/** Sets a range, or takes it away where both ends are open; ends the wrong way round are turned. */
export function withRange(address: FindAddress, range: FindRange, ends: RangeEnds): FindAddress {
  const { [range]: _before, ...others } = address.ranges;
  const { min, max } = ends;
  if (min === null && max === null) return { ...address, ranges: others, page: 1 };
  const isTurned = min !== null && max !== null && min > max;
  const ordered = isTurned ? { min: max, max: min } : ends;
  return { ...address, ranges: { ...others, [range]: ordered }, page: 1 };
}

/** Without ticks and ranges. */
export function withoutFacets(address: FindAddress): FindAddress {
  return { ...address, facets: {}, ranges: {}, page: 1 };
}

/** How many filters are ticked or set. */
export function tickedCount({ facets, ranges }: FindAddress): number {
  const ticks = Object.values(facets).reduce((sum, values) => sum + values.length, 0);
  return ticks + Object.keys(ranges).length;
}
