import type { ReindexState } from '#shared/api/admin.ts';
import type { Deps } from '../deps.ts';
import { AppError } from '../http/problem.ts';
import { reindex } from '../search/reindex.ts';

interface Reindexing {
  state: ReindexState;
  cancelled: boolean;
}

/** One at a time for each running server; a restart forgets it, and the index in use stays whole. */
const reindexings = new WeakMap<Deps, Reindexing>();

const NONE: ReindexState = { running: false, done: 0, of: 0, last: null };

/** Thrown between two batches, before the new index takes the place of the old one. */
class Cancelled extends Error {}

export function readReindex(deps: Deps): ReindexState {
  return reindexings.get(deps)?.state ?? NONE;
}

/**
 * Begins to make the index anew, in the background: how far it is, `readReindex` says.
 *
 * @throws AppError wrong-status while one is running
 */
export function startReindex(deps: Deps): ReindexState {
  const before = readReindex(deps);
  if (before.running) throw new AppError('wrong-status', 'The index is being made anew already.');
  const reindexing: Reindexing = {
    state: { running: true, done: 0, of: 0, last: before.last },
    cancelled: false,
  };
  reindexings.set(deps, reindexing);
  void run(deps, reindexing);
  return reindexing.state;
}

/** Stops it at the end of the batch it is at; the index in use is left as it was. */
export function cancelReindex(deps: Deps): ReindexState {
  const reindexing = reindexings.get(deps);
  if (!reindexing?.state.running) throw new AppError('wrong-status', 'There is nothing to stop.');
  reindexing.cancelled = true;
  return reindexing.state;
}

async function run(deps: Deps, reindexing: Reindexing): Promise<void> {
  const end = (outcome: 'finished' | 'cancelled' | 'failed'): void => {
    const last = { outcome, at: new Date().toISOString() };
    reindexing.state = { ...reindexing.state, running: false, last };
  };
  try {
    await reindex(deps, (done, of) => {
      reindexing.state = { ...reindexing.state, done, of };
      if (reindexing.cancelled) throw new Cancelled();
    });
    end('finished');
  } catch (error) {
    if (error instanceof Cancelled) {
      end('cancelled');
      return;
    }
    deps.log.error({ err: error, event: 'reindex', result: 'failed' }, 'reindex failed');
    end('failed');
  }
}
