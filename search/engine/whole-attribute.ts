import type { QueryGraph } from './query-graph.ts';
import { POSITIONS_PER_ATTRIBUTE, type IndexedDocument, type SearchIndex } from './search-index.ts';

/** 0: an attribute is the query, word for word. 1: one begins with it. 2: neither. */
export type WholeMatch = 0 | 1 | 2;

export type WholeMatchFinder = (document: IndexedDocument) => WholeMatch;

/** Prepares the test whether an attribute of a document is, or begins with, exactly the query. */
export function createWholeMatchFinder(
  index: SearchIndex,
  graph: QueryGraph,
  isSearched: (attribute: number) => boolean,
): WholeMatchFinder {
  const typed = graph.units.flatMap((unit) => (unit.kind === 'word' ? [unit.word] : unit.words));
  const wanted: (number | null)[] = [];
  for (const word of typed) {
    const number = word === null ? null : index.vocabulary.numberOf.get(word);
    if (number === undefined) return () => 2;
    wanted.push(number);
  }
  const [first] = wanted;
  if (first == null) return () => 2;

  return ({ words, places }) => {
    let best: WholeMatch = 2;
    for (let at = 0; at < words.length; at += 1) {
      if (words[at] !== first) continue;
      const start = places[at] ?? 0;
      if (start % POSITIONS_PER_ATTRIBUTE !== 0) continue;
      const attribute = Math.floor(start / POSITIONS_PER_ATTRIBUTE);
      if (!isSearched(attribute)) continue;
      let next = at;
      const matches = wanted.every((word, offset) => {
        if (word === null) return true;
        while (next < words.length && (places[next] ?? 0) < start + offset) next += 1;
        return places[next] === start + offset && words[next] === word;
      });
      if (!matches) continue;
      const following = places[next + 1];
      const isWhole =
        following === undefined || Math.floor(following / POSITIONS_PER_ATTRIBUTE) !== attribute;
      if (isWhole) return 0;
      best = 1;
    }
    return best;
  };
}
