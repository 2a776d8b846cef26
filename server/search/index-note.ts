import { setImmediate as nextTurn } from 'node:timers/promises';
import type { EnqueuedTaskPromise, Meilisearch } from 'meilisearch';
import type { CountedFacts } from '#shared/note/counted-facts.ts';
import { emptyNoteFields, type NoteFields } from '#shared/note/note-fields.ts';
import { NOTE_INDEX_SETTINGS } from '../../search/index-settings.ts';
import { NOTES_INDEX, type NoteDocument } from '../../search/note-document.ts';
import type { Deps } from '../deps.ts';
import { readJson } from '../database/read-json.ts';
import { publishedRows } from '../notes/published-repository.ts';
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

interface RawTold {
  note_id: number;
  facts: unknown;
  fields: unknown;
}

/** Work on a single thread after which others get their turn. */
const SLICE_MILLISECONDS = 10;

/**
 * The documents of the notes that are published, by id. The facts are those of the projection, which
 * hold what counts: without what an author disputes.
 */
export async function currentDocuments(
  { db }: Pick<Deps, 'db'>,
  noteIds: readonly number[],
): Promise<Map<number, NoteDocument>> {
  if (noteIds.length === 0) return new Map();
  const [rows, told] = await Promise.all([
    publishedRows(db, noteIds),
    db('published_firings')
      .join('note_revisions', 'note_revisions.id', 'published_firings.revision_id')
      .whereIn('published_firings.note_id', [...noteIds])
      .select<RawTold[]>(
        'published_firings.note_id',
        'published_firings.facts',
        'note_revisions.fields',
      ),
  ]);
  const toldById = new Map(told.map((each) => [each.note_id, each]));
  const documents = new Map<number, NoteDocument>();
  let sliceEnd = performance.now() + SLICE_MILLISECONDS;
  for (const row of rows) {
    const raw = toldById.get(row.id);
    if (!raw) continue;
    const fields = { ...emptyNoteFields(), ...(readJson(raw.fields) as NoteFields) };
    const facts = readJson(raw.facts) as CountedFacts;
    documents.set(row.id, noteDocumentOf(row, { fields, facts }));
    if (performance.now() > sliceEnd) {
      await nextTurn();
      sliceEnd = performance.now() + SLICE_MILLISECONDS;
    }
  }
  return documents;
}

/** The note's document for the index; null when it is not published (any more). */
export async function currentDocument(deps: Deps, noteId: number): Promise<NoteDocument | null> {
  return (await currentDocuments(deps, [noteId])).get(noteId) ?? null;
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
