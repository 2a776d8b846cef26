import { randomBytes } from 'node:crypto';
import type { Knex } from 'knex';
import { readJson } from '../database/read-json.ts';
import type { OutboxJobs, OutboxTopic } from './outbox.ts';

/** Kept in `last_error` while nothing is known of a job handed to another server. */
const HANDED_OVER = 'Handed over; the answer was not seen.';

export interface ClaimedJob<Topic extends OutboxTopic> {
  readonly id: number;
  readonly payload: OutboxJobs[Topic];
  readonly attempts: number;
  readonly ageSeconds: number;
  readonly wasHandedOver: boolean;
  readonly leaseToken: string;
}

interface JobRow {
  id: number;
  payload: unknown;
  attempts: number;
  ageSeconds: number;
  lastError: string;
}

/**
 * Takes the oldest due jobs of a topic for `leaseSeconds`. Two workers never take the same: rows
 * locked by the other are skipped. Whoever dies with a job lets its lease run out.
 */
export async function claimJobs<Topic extends OutboxTopic>(
  db: Knex,
  topic: Topic,
  limit: number,
  leaseSeconds: number,
): Promise<ClaimedJob<Topic>[]> {
  const leaseToken = randomBytes(16).toString('hex');
  const rows = await db.transaction(
    async (trx) => {
      const due = await trx('outbox')
        .where({ 'outbox.topic': topic })
        .whereNull('outbox.done_at')
        .whereNull('outbox.given_up_at')
        .whereRaw('outbox.available_at <= NOW(3)')
        .whereRaw('(outbox.leased_until IS NULL OR outbox.leased_until <= NOW(3))')
        .orderBy('outbox.available_at')
        .orderBy('outbox.id')
        .limit(limit)
        .forUpdate()
        .skipLocked()
        .select<JobRow[]>(
          'outbox.id',
          'outbox.payload',
          'outbox.attempts',
          'outbox.last_error AS lastError',
          trx.raw('TIMESTAMPDIFF(SECOND, outbox.created_at, NOW(3)) AS ageSeconds'),
        );
      if (due.length > 0) {
        await trx('outbox')
          .whereIn(
            'id',
            due.map((row) => row.id),
          )
          .update({
            leased_until: trx.raw('NOW(3) + INTERVAL ? SECOND', [leaseSeconds]),
            lease_token: leaseToken,
            attempts: trx.raw('attempts + 1'),
          });
      }
      return due;
    },
    // Without gap locks: promising new work never waits for a worker that looks for some.
    { isolationLevel: 'read committed' },
  );
  return rows.map((row) => ({
    id: row.id,
    payload: readJson(row.payload) as OutboxJobs[Topic],
    attempts: row.attempts + 1,
    ageSeconds: row.ageSeconds,
    wasHandedOver: row.lastError === HANDED_OVER,
    leaseToken,
  }));
}

type Lease = Pick<ClaimedJob<OutboxTopic>, 'id' | 'leaseToken'>;

/** All writes are the lease holder's: a worker that was thought dead changes nothing any more. */
const held = (db: Knex, { id, leaseToken }: Lease) =>
  db('outbox').where({ id, lease_token: leaseToken });
const UNLEASED = { leased_until: null, lease_token: null };

/** @returns false when the lease was lost meanwhile */
export async function markHandedOver(db: Knex, lease: Lease): Promise<boolean> {
  return (await held(db, lease).update({ last_error: HANDED_OVER })) > 0;
}

export async function markDone(db: Knex, lease: Lease): Promise<void> {
  await held(db, lease).update({ ...UNLEASED, done_at: db.raw('NOW(3)') });
}

export async function putOff(
  db: Knex,
  lease: Lease,
  seconds: number,
  lastError: string,
): Promise<void> {
  await held(db, lease).update({
    ...UNLEASED,
    available_at: db.raw('NOW(3) + INTERVAL ? SECOND', [seconds]),
    last_error: lastError,
  });
}

export async function markGivenUp(db: Knex, lease: Lease, lastError: string): Promise<void> {
  await held(db, lease).update({
    ...UNLEASED,
    given_up_at: db.raw('NOW(3)'),
    last_error: lastError,
  });
}

/** Gives back what was claimed but not begun. */
export async function releaseJob(db: Knex, lease: Lease): Promise<void> {
  await held(db, lease).update({ ...UNLEASED, attempts: db.raw('attempts - 1') });
}

/** Done jobs are kept a month, to be asked about. */
export async function purgeOutbox(db: Knex): Promise<void> {
  await db('outbox')
    .whereRaw('(done_at < NOW(3) - INTERVAL 30 DAY OR given_up_at < NOW(3) - INTERVAL 90 DAY)')
    .limit(1000)
    .delete();
}
