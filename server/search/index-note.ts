import type { EnqueuedTaskPromise, Meilisearch } from 'meilisearch';
import { NOTE_INDEX_SETTINGS } from '../../search/index-settings.ts';
import { NOTES_INDEX, type NoteDocument } from '../../search/note-document.ts';
import type { Deps } from '../deps.ts';
import { countedRevision } from '../disputes/counted-revision.ts';
import { publishedRows } from '../notes/published-repository.ts';
import { findRevision } from '../notes/revision-repository.ts';
import { noteDocumentOf } from './note-document-of.ts';
import { writingClient } from './search-client.ts';

const TASK_MILLISECONDS = 30_000;

/** Waits for the engine to have done it: an accepted request is only queued. */
export async function finished(task: EnqueuedTaskPromise): Promise<void> {
  const done = await task.waitTask({ timeout: TASK_MILLISECONDS, interval: 20 });
  if (done.status !== 'succeeded') {
    throw new Error(`The engine refused a task: ${done.error?.message ?? done.status}`);
  }
}

/** The note's document for the index; null when it is not published (any more). */
export async function currentDocument(deps: Deps, noteId: number): Promise<NoteDocument | null> {
  const [row] = await publishedRows(deps.db, [noteId]);
  if (!row) return null;
  const projected = await deps
    .db('published_firings')
    .where('published_firings.note_id', noteId)
    .first<{ revision_id: number } | undefined>('published_firings.revision_id');
  const revision = projected ? await findRevision(deps.db, projected.revision_id) : null;
  return revision ? noteDocumentOf(row, await countedRevision(deps.db, revision)) : null;
}

/** Settings are sent once in the life of this process; the engine skips what it already has. */
const prepared = new WeakSet<Meilisearch>();

export async function prepareIndex(client: Meilisearch): Promise<void> {
  if (prepared.has(client)) return;
  await finished(client.index(NOTES_INDEX).updateSettings(NOTE_INDEX_SETTINGS));
  prepared.add(client);
}

/**
 * The outbox job `index-note`: brings one note's document up to date with the database as it is now,
 * or removes it. Running twice or late is harmless, for nothing of the job but the id is used.
 */
export async function indexNote(deps: Deps, noteId: number): Promise<void> {
  const client = writingClient(deps.config);
  await prepareIndex(client);
  const document = await currentDocument(deps, noteId);
  const index = client.index<NoteDocument>(NOTES_INDEX);
  await finished(
    document === null
      ? index.deleteDocument(String(noteId))
      : index.addDocuments([document], { primaryKey: 'id' }),
  );
}
