import type { Knex } from 'knex';
import type { SignedIn } from '../authorization/actor.ts';
import { inTransaction } from '../database/transaction.ts';
import { AppError } from '../http/problem.ts';
import { lockedClaim } from './desk-service.ts';
import { deleteUnsentRemark, insertRemark, setMended } from './remark-repository.ts';

/** Pins a remark to a field of the revision on the desk; only who holds the claim may. */
export async function addRemark(
  db: Knex,
  actor: SignedIn,
  noteId: number,
  remark: { pointer: string; text: string },
): Promise<void> {
  await inTransaction(db, async (trx) => {
    const note = await lockedClaim(trx, actor, noteId);
    await insertRemark(trx, {
      noteId,
      revisionId: note.handedInRevisionId,
      moderatorId: actor.id,
      ...remark,
    });
  });
}

/** Takes back a remark that has not been sent. */
export async function removeRemark(
  db: Knex,
  actor: SignedIn,
  noteId: number,
  remarkId: number,
): Promise<void> {
  await inTransaction(db, async (trx) => {
    await lockedClaim(trx, actor, noteId);
    if (!(await deleteUnsentRemark(trx, noteId, remarkId))) throw new AppError('not-found');
  });
}

/** The author ticks a remark off, or on again. */
export async function markMended(
  db: Knex,
  noteId: number,
  remarkId: number,
  mended: boolean,
): Promise<void> {
  if (!(await setMended(db, noteId, remarkId, mended))) throw new AppError('not-found');
}
