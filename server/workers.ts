import { setTimeout as sleep } from 'node:timers/promises';
import type { Deps } from './deps.ts';
import { catchUpFigures } from './figures/catch-up-figures.ts';
import { startHousekeeping } from './housekeeping.ts';
import { catchUpClimbs } from './look-alikes/catch-up-climbs.ts';
import { createHandlers } from './outbox/handlers.ts';
import { startOutboxWorker } from './outbox/worker.ts';
import { readRecord } from './records/read-record.ts';
import { indexNote } from './search/index-note.ts';
import { mendIndex } from './search/mend-index.ts';
import { catchUpIndex } from './search/reindex.ts';

const TRY_AGAIN_MILLISECONDS = 5000;
const A_DAY_MILLISECONDS = 24 * 60 * 60_000;

export interface Workers {
  /** Ends after the job under way. */
  stop: () => Promise<void>;
}

/** Starts what works beside the requests: the outbox, and the look at whether the index is whole. */
export function startWorkers(deps: Deps): Workers {
  const outbox = startOutboxWorker(deps, createHandlers(deps, { indexNote, readRecord }));
  const housekeeping = startHousekeeping(deps);
  const stopping = new AbortController();
  const catchingUp = Promise.all([
    catchUp(deps, stopping.signal),
    keepMissing(deps, stopping.signal, 'climbs', catchUpClimbs),
    keepMissing(deps, stopping.signal, 'figures', catchUpFigures),
  ]);
  return {
    async stop() {
      stopping.abort();
      await Promise.all([outbox.stop(), housekeeping.stop(), catchingUp]);
    },
  };
}

/** Once at the start whether the index is whole, then once a day whether it is right. */
async function catchUp(deps: Deps, signal: AbortSignal): Promise<void> {
  let isCaughtUp = false;
  while (!signal.aborted) {
    try {
      await (isCaughtUp ? mendIndex(deps) : catchUpIndex(deps));
      isCaughtUp = true;
      await sleep(A_DAY_MILLISECONDS, undefined, { signal }).catch(() => undefined);
    } catch (error) {
      deps.log.warn({ err: error }, 'the index is not caught up yet');
      await sleep(TRY_AGAIN_MILLISECONDS, undefined, { signal }).catch(() => undefined);
    }
  }
}

/** Once at the start: what is kept of notes published before it was kept, or kept another way. */
async function keepMissing(
  deps: Deps,
  signal: AbortSignal,
  what: string,
  catchUpAll: (db: Deps['db'], signal: AbortSignal) => Promise<number>,
): Promise<void> {
  while (!signal.aborted) {
    try {
      await catchUpAll(deps.db, signal);
      return;
    } catch (error) {
      deps.log.warn({ err: error, what }, 'what is kept of notes is not caught up yet');
      await sleep(TRY_AGAIN_MILLISECONDS, undefined, { signal }).catch(() => undefined);
    }
  }
}
