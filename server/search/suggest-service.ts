import type { SuggestAnswer } from '#shared/api/search.ts';
import { TROUBLE_SHORT, TROUBLES, type Trouble } from '#shared/vocabulary/troubles.ts';
import { NOTES_INDEX } from '../../search/note-document.ts';
import type { Config } from '../config.ts';
import type { Deps } from '../deps.ts';
import { searchingClient } from './search-client.ts';

const SUGGESTED_TROUBLES = 4;
const SUGGESTED_NOTES = 6;

/** Type-ahead: troubles whose words begin so, and titles from the engine; empty when it is away. */
export async function suggest(deps: Deps, text: string): Promise<SuggestAnswer> {
  const typed = text.trim().toLowerCase();
  if (typed === '') return { suggestions: [] };
  const troubles = (Object.keys(TROUBLES) as Trouble[])
    .filter((id) =>
      `${TROUBLE_SHORT[id]} ${TROUBLES[id]}`
        .toLowerCase()
        .split(/[\s,]+/)
        .some((word) => word.startsWith(typed)),
    )
    .slice(0, SUGGESTED_TROUBLES)
    .map((id) => ({ kind: 'trouble' as const, text: TROUBLE_SHORT[id], noteId: null }));
  const notes = await suggestTitles(deps.config, text, SUGGESTED_NOTES).catch(() => []);
  return { suggestions: [...troubles, ...notes] };
}

/** Notes whose titles hold the words typed so far. */
export async function suggestTitles(
  config: Config,
  q: string,
  limit: number,
): Promise<SuggestAnswer['suggestions']> {
  const client = await searchingClient(config);
  const { results } = await client.multiSearch({
    queries: [
      {
        indexUid: NOTES_INDEX,
        q,
        limit,
        attributesToRetrieve: ['noteId', 'title'],
        attributesToSearchOn: ['title'],
      },
    ],
  });
  return (results[0]?.hits ?? []).map((hit) => ({
    kind: 'note' as const,
    text: String(hit['title']),
    noteId: Number(hit['noteId']),
  }));
}
