import { NOTE_INDEX_SETTINGS } from '../../search/index-settings.ts';
import { NOTES_INDEX, NOTES_REBUILD_INDEX, type NoteDocument } from '../../search/note-document.ts';
import type { Deps } from '../deps.ts';
import { currentDocuments, finished, indexNote } from './index-note.ts';
import { writingClient } from './search-client.ts';

const BATCH = 500;
/** Batches that the engine works on while the next is read. */
const BATCHES_WAITING = 2;

/**
 * Rebuilds the index from the database without a gap: fills a second one, swaps the two, and then
 * does again what changed meanwhile.
 *
 * @returns how many notes are in the index now
 */
export async function reindex(
  deps: Deps,
  onProgress: (done: number, of: number) => void = () => undefined,
): Promise<number> {
  const client = writingClient(deps.config);
  const [clock] = await deps.db.select<{ now: Date }[]>(deps.db.raw('CURRENT_TIMESTAMP(3) AS now'));
  const startedAt = clock?.now ?? new Date();
  // A rebuild that was cut short may have left its index behind.
  await client.deleteIndexIfExists(NOTES_REBUILD_INDEX);
  await finished(client.createIndex(NOTES_REBUILD_INDEX, { primaryKey: 'id' }));
  await finished(client.index(NOTES_REBUILD_INDEX).updateSettings(NOTE_INDEX_SETTINGS));
  const ids = await deps
    .db('published_firings')
    .orderBy('published_firings.note_id')
    .pluck<number[]>('published_firings.note_id');
  const rebuilt = client.index<NoteDocument>(NOTES_REBUILD_INDEX);
  const waiting: { task: Promise<void>; done: number }[] = [];
  const settleOldest = async (): Promise<void> => {
    const oldest = waiting.shift();
    if (!oldest) return;
    await oldest.task;
    onProgress(oldest.done, ids.length);
  };
  for (let from = 0; from < ids.length; from += BATCH) {
    const documents = await currentDocuments(deps, ids.slice(from, from + BATCH));
    if (waiting.length >= BATCHES_WAITING) await settleOldest();
    const task = finished(rebuilt.addDocuments([...documents.values()], { primaryKey: 'id' }));
    // A refusal is thrown where it is waited for; until then it is nobody's.
    task.catch(() => undefined);
    waiting.push({ task, done: Math.min(from + BATCH, ids.length) });
  }
  while (waiting.length > 0) await settleOldest();
  const existing = await client.getIndexes({ limit: 1000 });
  if (!existing.results.some((index) => index.uid === NOTES_INDEX)) {
    await finished(client.createIndex(NOTES_INDEX, { primaryKey: 'id' }));
  }
  await finished(
    client.swapIndexes([{ indexes: [NOTES_INDEX, NOTES_REBUILD_INDEX], rename: false }]),
  );
  await finished(client.deleteIndex(NOTES_REBUILD_INDEX));
  const changed = await deps
    .db('outbox')
    .where('outbox.topic', 'index-note')
    .where('outbox.created_at', '>=', startedAt)
    .distinct<{ note_id: number }[]>(
      deps.db.raw("CAST(JSON_VALUE(outbox.payload, '$.noteId') AS UNSIGNED) AS note_id"),
    );
  for (const { note_id: noteId } of changed) await indexNote(deps, noteId);
  return ids.length;
}

/** How many notes the index holds; null when the engine cannot be asked. */
export async function countInIndex(deps: Deps): Promise<number | null> {
  try {
    return (await writingClient(deps.config).index(NOTES_INDEX).getStats()).numberOfDocuments;
  } catch {
    return null;
  }
}

/** Once at start: an index that does not hold as many notes as are published is made anew. */
export async function catchUpIndex(deps: Deps): Promise<void> {
  const [inIndex, row] = await Promise.all([
    countInIndex(deps),
    deps.db('published_firings').count<{ n: number }>({ n: '*' }).first(),
  ]);
  if (inIndex === Number(row?.n ?? 0)) return;
  await reindex(deps);
}
