import type { Knex } from 'knex';

/** Rows removed at once: short locks, however much has gathered. */
const BATCH = 1000;

/**
 * Removes what has ended: sessions, links in mails, counts of tries. Counts are kept a day longer,
 * for waits that grow.
 */
export async function purgeAccounts(db: Knex): Promise<void> {
  await db('sessions').whereRaw('expires_at < NOW(3) OR ends_at < NOW(3)').limit(BATCH).delete();
  await db('mail_tokens').whereRaw('expires_at < NOW(3) - INTERVAL 7 DAY').limit(BATCH).delete();
  await db('throttles').whereRaw('window_ends_at < NOW(3) - INTERVAL 1 DAY').limit(BATCH).delete();
}
