import type { Knex } from 'knex';
import type { OutboxState } from '#shared/api/admin.ts';
import type { Deps } from '../deps.ts';
import { AppError } from '../http/problem.ts';
import { nudgeOutbox } from '../outbox/nudge.ts';
import { countInIndex } from '../search/reindex.ts';

const FAILED_SHOWN = 100;

interface FailedRow {
  id: number;
  topic: string;
  key: string;
  attempts: number;
  lastError: string;
  nextTryAt: Date;
}

/**
 * The promised work that is still to be done, what has failed at least once, and whether the index
 * has caught up with the database.
 */
export async function readOutboxState(deps: Deps): Promise<OutboxState> {
  const { db } = deps;
  const [open, failed, published, behind, inIndex] = await Promise.all([
    db('outbox')
      .whereNull('done_at')
      .whereNull('given_up_at')
      .first<{ waiting: number; oldest: number | null }>(
        db.raw('COUNT(*) AS waiting'),
        db.raw('TIMESTAMPDIFF(SECOND, MIN(created_at), NOW(3)) AS oldest'),
      ),
    db('outbox')
      .whereNull('outbox.done_at')
      .where((failing) => {
        void failing.where('outbox.attempts', '>', 0).orWhereNotNull('outbox.given_up_at');
      })
      .whereNot('outbox.last_error', '')
      .orderBy('outbox.id')
      .limit(FAILED_SHOWN)
      .select<FailedRow[]>(
        'outbox.id',
        'outbox.topic',
        'outbox.dedupe_key AS key',
        'outbox.attempts',
        'outbox.last_error AS lastError',
        'outbox.available_at AS nextTryAt',
      ),
    db('published_firings').count({ total: '*' }).first<{ total: number }>(),
    db('outbox')
      .where({ topic: 'index-note' })
      .whereNull('done_at')
      .countDistinct({ total: db.raw("JSON_VALUE(payload, '$.noteId')") })
      .first<{ total: number }>(),
    countInIndex(deps),
  ]);
  return {
    waiting: Number(open?.waiting ?? 0),
    oldestWaitingSeconds: open?.oldest ?? null,
    failed: failed.map((row) => ({ ...row, nextTryAt: row.nextTryAt.toISOString() })),
    index: {
      available: inIndex !== null,
      inDatabase: Number(published?.total ?? 0),
      inIndex,
      behind: inIndex === null ? null : Number(behind?.total ?? 0),
    },
  };
}

/**
 * Has a job that waits or was given up tried again at once. What is being done just now is left
 * alone.
 *
 * @throws AppError not-found or wrong-status
 */
export async function retryJob(db: Knex, id: number): Promise<void> {
  const changed = await db('outbox')
    .where({ id })
    .whereNull('done_at')
    .whereRaw('(leased_until IS NULL OR leased_until <= NOW(3))')
    .update({ available_at: db.raw('NOW(3)'), given_up_at: null, attempts: 0 });
  if (changed === 0) {
    const exists = await db('outbox').where({ id }).first<{ id: number } | undefined>('id');
    throw exists
      ? new AppError('wrong-status', 'This job is done, or being done just now.')
      : new AppError('not-found');
  }
  nudgeOutbox();
}
