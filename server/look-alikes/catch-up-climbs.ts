import type { Knex } from 'knex';
import { inTransaction } from '../database/transaction.ts';
import { findRevision } from '../notes/revision-repository.ts';
import { notesWithoutClimb } from './climb-repository.ts';
import { keepClimb } from './keep-climb.ts';

const AT_ONCE = 100;

/**
 * Keeps the climbs of published notes that lack them: those published before climbs were kept, and
 * all of them once climbs are read another way. @returns how many were read
 */
export async function catchUpClimbs(db: Knex, signal?: AbortSignal): Promise<number> {
  let read = 0;
  for (;;) {
    const noteIds = await notesWithoutClimb(db, AT_ONCE);
    if (noteIds.length === 0) return read;
    for (const noteId of noteIds) {
      if (signal?.aborted === true) return read;
      await inTransaction(db, (trx) => keepPublished(trx, noteId));
      read += 1;
    }
  }
}

/** Forgets all climbs and reads them anew. @returns how many were read */
export async function rebuildClimbs(db: Knex): Promise<number> {
  await db('published_climbs').update({ version: 0 });
  return catchUpClimbs(db);
}

/** The note's row is locked, so that it is not taken down or published anew meanwhile. */
async function keepPublished(trx: Knex, noteId: number): Promise<void> {
  const row = await trx('published_firings')
    .where('published_firings.note_id', noteId)
    .forUpdate()
    .first<{ revision_id: number } | undefined>('published_firings.revision_id');
  await keepClimb(trx, noteId, row ? await findRevision(trx, row.revision_id) : null);
}
