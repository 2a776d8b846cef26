import { setTimeout as sleep } from 'node:timers/promises';
import type { Knex } from 'knex';
import { purgeAccounts } from './accounts/purge-accounts.ts';
import type { Deps } from './deps.ts';
import { purgeRemovedNotes } from './notes/purge-notes.ts';
import { purgeOutbox } from './outbox/job-repository.ts';
import { watchSearches } from './saved-searches/watch-searches.ts';
import { sweepUploads } from './storage/sweep-uploads.ts';

const EVERY_MILLISECONDS = 10 * 60_000;

/** Answers are kept for a day, to be given again to whoever repeats a create. */
export async function purgeIdempotencyKeys(db: Knex): Promise<void> {
  await db('idempotency_keys')
    .whereRaw('created_at < NOW(3) - INTERVAL 24 HOUR')
    .limit(1000)
    .delete();
}

/** Removes what has had its time: ended sessions, old links, finished jobs, notes long removed. */
export async function tidyUp(db: Knex): Promise<void> {
  await purgeAccounts(db);
  await purgeOutbox(db);
  await purgeIdempotencyKeys(db);
  await purgeRemovedNotes(db);
}

/** Tidies up every ten minutes until it is stopped. */
export function startHousekeeping(deps: Pick<Deps, 'db' | 'log' | 'store' | 'config'>): {
  stop: () => Promise<void>;
} {
  const stopping = new AbortController();
  const work = (async () => {
    while (!stopping.signal.aborted) {
      try {
        await tidyUp(deps.db);
        await sweepUploads(deps);
      } catch (error) {
        deps.log.error({ event: 'housekeeping', err: error }, 'could not tidy up');
      }
      try {
        await watchSearches(deps);
      } catch (error) {
        // The engine is away, most likely: nothing is marked as looked at, so nothing is missed.
        deps.log.warn({ event: 'saved-searches', err: error }, 'could not look for news');
      }
      await sleep(EVERY_MILLISECONDS, undefined, { signal: stopping.signal }).catch(
        () => undefined,
      );
    }
  })();
  return {
    stop: async () => {
      stopping.abort();
      await work;
    },
  };
}
