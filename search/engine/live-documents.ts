import type { DocumentSet } from './filter-evaluate.ts';
import type { SearchIndex } from './search-index.ts';

/** Marks every document that exists. */
export function liveDocuments(index: SearchIndex): DocumentSet {
  const live = new Uint8Array(index.documents.length);
  for (const number of index.numberOfId.values()) live[number] = 1;
  return live;
}
