import type { MultiSearchQuery } from 'meilisearch';
import { filterText } from '../../search/filters.ts';
import { NOTES_INDEX, type NoteDocument } from '../../search/note-document.ts';
import type { FindQuery } from '#shared/api/search.ts';
import { readQuestion } from '#shared/question/read-question.ts';
import { tiersFor } from '#shared/question/search-request.ts';
import { withoutParts } from '#shared/question/without-parts.ts';
import type { Units } from '#shared/units/units.ts';
import type { Config } from '../config.ts';
import { chosenFacets, facetFilter } from './engine-search.ts';
import { bothTexts, chosenRanges, rangesText } from './measured-ranges.ts';
import { searchingClient } from './search-client.ts';

/** A search, and the notes among which it is asked. */
export interface AskedAmong {
  readonly query: FindQuery;
  readonly noteIds: readonly number[];
}

function queryFor({ query, noteIds }: AskedAmong, units: Units): MultiSearchQuery {
  const whole = readQuestion(query.q, { preferredUnit: units.temperature });
  const off = (query.off ?? '').split(',').filter((key) => key !== '');
  const { close, sameTrouble, byWords } = tiersFor(withoutParts(whole, off));
  const request = close ?? sameTrouble;
  const narrowed = bothTexts(
    filterText(facetFilter(chosenFacets(query))),
    rangesText(chosenRanges(query)),
  );
  const among = filterText({ kind: 'in', field: 'noteId', values: noteIds.map(String) });
  return {
    indexUid: NOTES_INDEX,
    q: request ? '' : (byWords?.texts[0] ?? ''),
    filter: bothTexts(bothTexts(filterText(request?.filter ?? null), narrowed), among),
    matchingStrategy: 'all',
    limit: noteIds.length,
    attributesToRetrieve: ['noteId'],
  };
}

/**
 * Which of the notes fit each search closely: those that the find page shows as close, and of a
 * question that is words alone those that have all of them.
 *
 * @throws when the engine is away
 */
export async function closeFinds(
  config: Config,
  searches: readonly AskedAmong[],
  units: Units,
): Promise<number[][]> {
  if (searches.length === 0) return [];
  const client = await searchingClient(config);
  const { results } = await client.multiSearch<
    { queries: MultiSearchQuery[] },
    Pick<NoteDocument, 'noteId'>
  >({ queries: searches.map((search) => queryFor(search, units)) });
  return searches.map((_search, index) => (results[index]?.hits ?? []).map(({ noteId }) => noteId));
}
