import { createHash } from 'node:crypto';
import type { Knex } from 'knex';

export interface OpenSession {
  readonly idHash: string;
  readonly browser: string;
  readonly startedAt: Date;
  readonly seenAt: Date;
}

/** A member's sessions that have not ended, the one used last first. */
export async function openSessionsOf(db: Knex, memberId: number): Promise<OpenSession[]> {
  return db('sessions')
    .where('sessions.member_id', memberId)
    .whereRaw('sessions.expires_at > NOW(3) AND sessions.ends_at > NOW(3)')
    .orderBy('sessions.seen_at', 'desc')
    .limit(100)
    .select<OpenSession[]>(
      'sessions.id_hash AS idHash',
      'sessions.browser',
      'sessions.started_at AS startedAt',
      'sessions.seen_at AS seenAt',
    );
}

/** A handle for the member's own list; it opens nothing. */
export function handleOf(idHash: string): string {
  return createHash('sha256').update(`handle\n${idHash}`).digest('hex').slice(0, 24);
}

/** Ends a member's sessions: all of them, or all but one, or only one. */
export async function endSessionsOf(
  trx: Knex,
  memberId: number,
  which: { except?: string; only?: string } = {},
): Promise<void> {
  const ending = trx('sessions').where({ member_id: memberId });
  if (which.except !== undefined) void ending.whereNot({ id_hash: which.except });
  if (which.only !== undefined) void ending.where({ id_hash: which.only });
  await ending.delete();
}
