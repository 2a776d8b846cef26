import { evaluateFilter, type DocumentSet } from './filter-evaluate.ts';
import type { FilterNode } from './filter-parser.ts';
import type { SearchIndex } from './search-index.ts';

/** Marks every document that exists. The answer is kept: it must not be written to. */
export function liveDocuments(index: SearchIndex): DocumentSet {
  if (index.derived.live === undefined) {
    const live = new Uint8Array(index.documents.length);
    for (const number of index.numberOfId.values()) live[number] = 1;
    index.derived.live = live;
  }
  return index.derived.live;
}

/** Marks the documents that a filter lets through. The answer must not be written to. */
export function documentsAllowed(index: SearchIndex, filter: FilterNode | null): DocumentSet {
  const live = liveDocuments(index);
  if (filter === null) return live;
  return evaluateFilter(filter, (name) => index.columns.get(name), live, index.derived.conditions);
}
