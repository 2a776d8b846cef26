import { askedSchema, type Asked, type SavedSearch } from '#shared/api/saved-searches.ts';
import { readFindAddress, writeFindAddress, type FindAddress } from '../find/find-address.ts';

/** What is asked by an address of the find page, without its order and page. */
export function askedOf(address: FindAddress): Asked {
  const query = writeFindAddress({ ...address, sort: 'best', page: 1 });
  return askedSchema.parse(Object.fromEntries(new URLSearchParams(query)));
}

/** The way back, always said in the same order. */
export function addressOf(asked: Asked): FindAddress {
  const params = new URLSearchParams();
  for (const [key, value] of Object.entries(asked)) if (value) params.set(key, value);
  return readFindAddress(params);
}

/** The saved search that asks just this, if there is one. */
export function sameSearch(
  searches: readonly SavedSearch[],
  address: FindAddress,
): SavedSearch | undefined {
  const query = writeFindAddress({ ...address, sort: 'best', page: 1 });
  return searches.find(({ search }) => writeFindAddress(addressOf(search)) === query);
}
