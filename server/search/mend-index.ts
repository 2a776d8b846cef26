import { isDeepStrictEqual } from 'node:util';
import { NOTES_INDEX, type NoteDocument } from '../../search/note-document.ts';
import type { Deps } from '../deps.ts';
import { currentDocuments, indexNote } from './index-note.ts';
import { writingClient } from './search-client.ts';

const BATCH = 200;

async function documentsIn(deps: Deps, offset: number): Promise<NoteDocument[]> {
  const index = writingClient(deps.config).index<NoteDocument>(NOTES_INDEX);
  const { results } = await index.getDocuments<NoteDocument>({ offset, limit: BATCH });
  return results;
}

/**
 * Compares every document of the index with the database as it is now and mends what differs: notes
 * that are missing, that should be gone, or that are told as they were before. Done once a day, for
 * whatever the jobs of the outbox have missed.
 *
 * @returns how many notes were mended
 */
export async function mendIndex(deps: Deps): Promise<number> {
  const wrong = new Set<number>();
  const seen = new Set<number>();
  for (let offset = 0; ; offset += BATCH) {
    const documents = await documentsIn(deps, offset);
    const current = await currentDocuments(
      deps,
      documents.map(({ noteId }) => noteId),
    );
    for (const document of documents) {
      seen.add(document.noteId);
      const now = current.get(document.noteId);
      if (!isDeepStrictEqual({ ...document }, now)) wrong.add(document.noteId);
    }
    if (documents.length < BATCH) break;
  }
  const published = await deps
    .db('published_firings')
    .orderBy('published_firings.note_id')
    .pluck<number[]>('published_firings.note_id');
  for (const noteId of published) if (!seen.has(noteId)) wrong.add(noteId);
  for (const noteId of wrong) await indexNote(deps, noteId);
  if (wrong.size > 0) deps.log.warn({ event: 'index', mended: wrong.size }, 'index mended');
  return wrong.size;
}
