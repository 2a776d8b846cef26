import type { Knex } from 'knex';
import type { Role } from '#shared/vocabulary/statuses.ts';
import { voidMailTokens } from '../accounts/mail-tokens.ts';
import { endSessionsOf } from '../accounts/session-repository.ts';
import { addToAuditLog } from '../audit/audit-log.ts';
import type { SignedIn } from '../authorization/actor.ts';
import { canOnSite } from '../authorization/rules.ts';
import { inTransaction } from '../database/transaction.ts';
import { AppError } from '../http/problem.ts';

/** Who changes it: an admin, or null for the command line. */
export type Changer = SignedIn | null;

/**
 * Gives a member another role. All their sessions end: the identifiers they had under the old rights
 * never carry the new ones. Nobody changes their own role, and the last admin stays one.
 *
 * @throws AppError not-found, not-allowed, wrong-status or bad-input
 */
export async function changeRole(
  db: Knex,
  by: Changer,
  memberId: number,
  { role, reason }: { role: Role; reason: string },
): Promise<void> {
  requireReason(reason);
  await inTransaction(db, async (trx) => {
    await lockAdmins(trx);
    await requireStillAdmin(trx, by);
    const member = await lockMember(trx, memberId);
    if (by?.id === memberId) {
      throw new AppError('not-allowed', 'Nobody changes their own role: ask another admin.');
    }
    if (member.role === role)
      throw new AppError('wrong-status', 'The member has this role already.');
    if (member.role === 'admin') await requireAnotherAdmin(trx, memberId);
    await trx('members').where({ id: memberId }).update({ role });
    await endSessionsOf(trx, memberId);
    await addToAuditLog(trx, {
      actorId: by?.id ?? null,
      act: 'role-changed',
      targetKind: 'member',
      targetId: memberId,
      before: { role: member.role },
      after: { role },
      reason: reason.trim(),
    });
  });
}

/**
 * Shuts a member out, or lets them in again. Their sessions end with their next request, and links
 * already sent to them stop working. What they have published stays.
 *
 * @throws AppError not-found, not-allowed, wrong-status or bad-input
 */
export async function setSuspended(
  db: Knex,
  by: SignedIn,
  memberId: number,
  { suspended, reason }: { suspended: boolean; reason: string },
): Promise<void> {
  requireReason(reason);
  await inTransaction(db, async (trx) => {
    await lockAdmins(trx);
    await requireStillAdmin(trx, by);
    const member = await lockMember(trx, memberId);
    if (by.id === memberId) throw new AppError('not-allowed', 'Nobody suspends themselves.');
    if (member.suspended === suspended) {
      throw new AppError(
        'wrong-status',
        suspended ? 'The member is suspended already.' : 'The member is not suspended.',
      );
    }
    if (suspended && member.role === 'admin') await requireAnotherAdmin(trx, memberId);
    await trx('members')
      .where({ id: memberId })
      .update({ suspended_at: suspended ? trx.raw('NOW(3)') : null });
    await endSessionsOf(trx, memberId);
    if (suspended) {
      await voidMailTokens(trx, memberId, ['reset', 'verify-email', 'change-email']);
      // Notes they had taken from the desk wait for somebody else.
      await trx('notes')
        .where({ claimed_by: memberId, status: 'on-the-desk' })
        .update({ claimed_until: trx.raw('NOW(3)') });
    }
    await addToAuditLog(trx, {
      actorId: by.id,
      act: suspended ? 'suspended' : 'reinstated',
      targetKind: 'member',
      targetId: memberId,
      before: { suspended: !suspended },
      after: { suspended },
      reason: reason.trim(),
    });
  });
}

function requireReason(reason: string): void {
  if (reason.trim() !== '') return;
  const detail = 'Say why: it is kept with the decision.';
  throw new AppError('bad-input', { detail, errors: [{ pointer: '/reason', detail }] });
}

/** Two admins who demote each other at the same moment come one after the other. */
async function lockAdmins(trx: Knex): Promise<void> {
  await trx('members').where({ role: 'admin' }).orderBy('id').forUpdate().select('id');
}

/** The rights the request came with may be gone by the time the lock is held. */
async function requireStillAdmin(trx: Knex, by: Changer): Promise<void> {
  if (by === null) return;
  const now = await lockMember(trx, by.id);
  if (now.suspended || !canOnSite({ ...by, role: now.role }, 'administer')) {
    throw new AppError('not-allowed');
  }
}

async function lockMember(trx: Knex, id: number): Promise<{ role: Role; suspended: boolean }> {
  const row = await trx('members')
    .where({ id })
    .forUpdate()
    .first<{ role: Role; suspended_at: Date | null } | undefined>('role', 'suspended_at');
  if (!row) throw new AppError('not-found');
  return { role: row.role, suspended: row.suspended_at !== null };
}

async function requireAnotherAdmin(trx: Knex, memberId: number): Promise<void> {
  const other = await trx('members')
    .where({ role: 'admin' })
    .whereNull('suspended_at')
    .whereNot({ id: memberId })
    .first<{ id: number } | undefined>('id');
  if (!other) throw new AppError('not-allowed', 'The site needs at least one admin.');
}
