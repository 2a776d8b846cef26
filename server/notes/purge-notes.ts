import type { Knex } from 'knex';

/** A removed note can be brought back for so long; then it goes for good. */
const KEPT_DAYS = 30;
const BATCH = 100;

/**
 * Deletes notes removed long ago with their revisions, records and pictures; the files are found
 * without rows and swept. What is published is never removed, so no reader misses anything.
 */
export async function purgeRemovedNotes(db: Knex): Promise<number> {
  return db('notes')
    .whereRaw('removed_at < NOW(3) - INTERVAL ? DAY', [KEPT_DAYS])
    .whereNull('published_revision_id')
    .whereNull('handed_in_revision_id')
    .limit(BATCH)
    .delete();
}
