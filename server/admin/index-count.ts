import type { Deps } from '../deps.ts';

/** How many notes the search index holds; null when it cannot be asked. */
export async function countInIndex(_deps: Deps): Promise<number | null> {
  return Promise.resolve(null);
}
