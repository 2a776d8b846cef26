import type { MultiSearchQuery } from 'meilisearch';
import type { FoundNote } from '#shared/question/why.ts';
import { filterText } from '../../search/filters.ts';
import { NOTES_INDEX, type NoteDocument } from '../../search/note-document.ts';
import type { Config } from '../config.ts';
import type { EngineHit } from './engine-search.ts';
import { HIT_BEGINS, HIT_ENDS } from './passage.ts';
import { searchingClient } from './search-client.ts';

const PASSAGE_WORDS = 28;

/** What the sentence "why found" is made from. */
const FIELDS_TO_TELL_WHY = [
  'noteId',
  'troubles',
  'forms',
  'causes',
  'stallC',
  'sagC',
  'peakC',
  'outcome',
] as const satisfies (keyof FoundNote | 'noteId')[];
type Told = Pick<NoteDocument, (typeof FIELDS_TO_TELL_WHY)[number] | 'story'>;

export interface ShownHit {
  readonly found: FoundNote;
  /** A stretch of the story with the hits between marks; undefined where no words were asked for. */
  readonly marked: string | undefined;
}

/** The notes of one page that the same words have found. */
function queryFor(hits: readonly EngineHit[]): MultiSearchQuery {
  const { q = '', strategy = 'last' } = hits[0] ?? {};
  const values = hits.map((hit) => String(hit.document.noteId));
  return {
    indexUid: NOTES_INDEX,
    q,
    filter: filterText({ kind: 'in', field: 'noteId', values }),
    matchingStrategy: strategy,
    limit: values.length,
    attributesToRetrieve: [...FIELDS_TO_TELL_WHY],
    ...(q === ''
      ? {}
      : {
          attributesToHighlight: ['story'],
          attributesToCrop: [`story:${String(PASSAGE_WORDS)}`],
          highlightPreTag: HIT_BEGINS,
          highlightPostTag: HIT_ENDS,
        }),
  };
}

/**
 * What is shown of the few hits of one page: marking passages is the dearest part of a search, so
 * it is done for these alone. @returns by note id
 */
export async function readShownHits(
  config: Config,
  hits: readonly EngineHit[],
): Promise<Map<number, ShownHit>> {
  if (hits.length === 0) return new Map();
  const client = await searchingClient(config);
  const groups = new Map<string, EngineHit[]>();
  for (const hit of hits) {
    const key = `${hit.strategy} ${hit.q}`;
    const group = groups.get(key);
    if (group) group.push(hit);
    else groups.set(key, [hit]);
  }
  const { results } = await client.multiSearch<{ queries: MultiSearchQuery[] }, Told>({
    queries: [...groups.values()].map(queryFor),
  });
  return new Map(
    results.flatMap((result) =>
      result.hits.map(({ _formatted, ...found }): [number, ShownHit] => {
        const story = _formatted?.story;
        return [found.noteId, { found, marked: typeof story === 'string' ? story : undefined }];
      }),
    ),
  );
}
