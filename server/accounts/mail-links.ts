import { randomUUID } from 'node:crypto';
import type { Knex } from 'knex';
import { inTransaction } from '../database/transaction.ts';
import { AppError } from '../http/problem.ts';
import { nudgeOutbox } from '../outbox/nudge.ts';
import { enqueue } from '../outbox/outbox.ts';
import {
  findAccountByEmail,
  findAccountById,
  storeHash,
  storeNewEmail,
  storeVerified,
} from './account-repository.ts';
import { hashPassword } from './hashing.ts';
import { requireGoodPassword } from './join.ts';
import { lockMailToken, markTokenUsed, voidMailTokens } from './mail-tokens.ts';
import { emailKeyOf } from './normal-forms.ts';
import { endSessionsOf } from './session-repository.ts';
import { forgetTries, THROTTLES } from './throttle.ts';

/**
 * What the link "confirm this address" does: for a new account, or for a new address of an old one,
 * whose old address is then told.
 *
 * @throws AppError link-used
 */
export async function confirmAddress(db: Knex, token: string): Promise<void> {
  await inTransaction(db, async (trx) => {
    const { memberId, newEmail } = await lockMailToken(trx, token, [
      'verify-email',
      'change-email',
    ]);
    await markTokenUsed(trx, token);
    if (newEmail === null) {
      await storeVerified(trx, memberId);
      return;
    }
    const account = await findAccountById(trx, memberId);
    if (!account || !(await storeNewEmail(trx, memberId, newEmail))) {
      throw new AppError('link-used', 'This address belongs to an account by now.');
    }
    await voidMailTokens(trx, memberId, ['reset', 'verify-email']);
    await enqueue(trx, 'mail', `email-changed:${String(memberId)}:${randomUUID()}`, {
      kind: 'email-changed',
      memberId,
      oldEmail: account.email,
    });
  });
  nudgeOutbox();
}

/** Another mail with a link to confirm the address; none once it is confirmed. */
export async function sendVerificationAgain(db: Knex, memberId: number): Promise<void> {
  await enqueue(db, 'mail', `verify-email:${String(memberId)}:${randomUUID()}`, {
    kind: 'verify-email',
    memberId,
  });
  nudgeOutbox();
}

/** Sends a reset link if somebody has this address; the asker is told the same either way. */
export async function requestPasswordReset(db: Knex, email: string): Promise<void> {
  const emailKey = emailKeyOf(email);
  const account = emailKey === null ? null : await findAccountByEmail(db, emailKey);
  if (!account) return;
  await enqueue(db, 'mail', `reset-password:${String(account.id)}:${randomUUID()}`, {
    kind: 'reset-password',
    memberId: account.id,
  });
  nudgeOutbox();
}

/**
 * A new password through a mailed link: all sessions end, nobody is signed in by it, the owner is
 * told. Having read the mail also proves the address.
 *
 * @throws AppError link-used, or bad-input when the password is a common one (the link stays good)
 */
export async function usePasswordReset(db: Knex, token: string, password: string): Promise<void> {
  const owner = await inTransaction(db, async (trx) => {
    const { memberId } = await lockMailToken(trx, token, ['reset']);
    return findAccountById(trx, memberId);
  });
  if (!owner) throw new AppError('link-used');
  requireGoodPassword(password, owner, '/password');
  // Hashed outside the transaction: no lock is held while others wait for their hash.
  const passwordHash = await hashPassword(password);
  await inTransaction(db, async (trx) => {
    const { memberId } = await lockMailToken(trx, token, ['reset']);
    await markTokenUsed(trx, token);
    await storeHash(trx, memberId, passwordHash);
    await storeVerified(trx, memberId);
    await endSessionsOf(trx, memberId);
    await enqueue(trx, 'mail', `password-changed:${String(memberId)}:${randomUUID()}`, {
      kind: 'password-changed',
      memberId,
    });
  });
  await forgetTries(db, THROTTLES.signInOfAccount, owner.email);
  nudgeOutbox();
}
