import type { StoredIndex } from './engine-state.ts';
import type { JsonObject } from './json.ts';
import {
  createSearchIndex,
  prepareDocument,
  removeDocument,
  storeDocument,
  type PreparedDocument,
  type SearchIndex,
} from './search-index.ts';

/** Milliseconds of work after which requests get their turn. */
const SLICE_MS = 8;

function nextTurn(): Promise<void> {
  return new Promise((resolve) => setImmediate(resolve));
}

/** Runs `work` on each item, letting requests through now and then. */
async function inSlices<T>(items: Iterable<T>, work: (item: T) => void): Promise<void> {
  let sliceEnd = performance.now() + SLICE_MS;
  for (const item of items) {
    work(item);
    if (performance.now() > sliceEnd) {
      await nextTurn();
      sliceEnd = performance.now() + SLICE_MS;
    }
  }
}

/** Derives a fresh search index from the stored documents; searches go on against the old one. */
export async function buildSearchIndex(stored: StoredIndex): Promise<SearchIndex> {
  const index = createSearchIndex(stored.settings);
  await inSlices(stored.documents, ([id, document]) => {
    storeDocument(index, prepareDocument(index, id, document));
  });
  return index;
}

/** Documents stored at once at the most; a larger batch shows in several steps, before it is done. */
const STORE_AT_ONCE = 2_000;

/** Brings written and removed documents into an index. */
export async function updateSearchIndex(
  index: SearchIndex,
  stored: readonly [string, JsonObject][],
  removed: readonly string[],
): Promise<void> {
  const prepared: PreparedDocument[] = [];
  const storeAll = (): void => {
    for (const document of prepared.splice(0)) storeDocument(index, document);
  };
  await inSlices(stored, ([id, document]) => {
    prepared.push(prepareDocument(index, id, document));
    if (prepared.length >= STORE_AT_ONCE) storeAll();
  });
  storeAll();
  for (const id of removed) removeDocument(index, id);
}
