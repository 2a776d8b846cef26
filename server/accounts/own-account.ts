import { randomUUID } from 'node:crypto';
import type { Knex } from 'knex';
import type { z } from 'zod';
import type {
  changeEmailBodySchema,
  changePasswordBodySchema,
  Me,
  profileBodySchema,
} from '#shared/api/accounts.ts';
import type { MemberSettings } from '#shared/api/settings.ts';
import type { SignedIn } from '../authorization/actor.ts';
import { inTransaction } from '../database/transaction.ts';
import { AppError } from '../http/problem.ts';
import { nudgeOutbox } from '../outbox/nudge.ts';
import { enqueue } from '../outbox/outbox.ts';
import {
  findAccountById,
  presentMe,
  storeHash,
  storeProfile,
  storeSettings,
} from './account-repository.ts';
import { hashPassword } from './hashing.ts';
import { fault, nameForms, requireGoodPassword } from './join.ts';
import { voidMailTokens } from './mail-tokens.ts';
import { emailKeyOf } from './normal-forms.ts';
import { endSessionsOf } from './session-repository.ts';
import { confirmPassword } from './verify-credentials.ts';

/**
 * A new password, given the present one. Reset links already sent stop working, the owner is told by
 * mail, and the other sessions end if the member wants that.
 *
 * @param currentHash the session that stays, until it is given a new identifier
 * @throws AppError bad-input, too-many or busy
 */
export async function changePassword(
  db: Knex,
  actor: SignedIn,
  { current, next, endOtherSessions }: z.output<typeof changePasswordBodySchema>,
  currentHash: string,
): Promise<void> {
  const account = await confirmPassword(db, actor.id, current, '/current');
  requireGoodPassword(next, account, '/next');
  const passwordHash = await hashPassword(next);
  await inTransaction(db, async (trx) => {
    await storeHash(trx, account.id, passwordHash);
    await voidMailTokens(trx, account.id, ['reset']);
    if (endOtherSessions) await endSessionsOf(trx, account.id, { except: currentHash });
    await enqueue(trx, 'mail', `password-changed:${String(account.id)}:${randomUUID()}`, {
      kind: 'password-changed',
      memberId: account.id,
    });
  });
  nudgeOutbox();
}

/**
 * Asks the new address for its consent; until it is given nothing changes. Whether somebody else has
 * that address is not told.
 *
 * @throws AppError bad-input, too-many or busy
 */
export async function changeEmail(
  db: Knex,
  actor: SignedIn,
  { current, email }: z.output<typeof changeEmailBodySchema>,
): Promise<void> {
  const account = await confirmPassword(db, actor.id, current, '/current');
  const newEmail = emailKeyOf(email);
  if (newEmail === null) throw fault('/email', 'This does not look like an e-mail address.');
  if (newEmail === account.email) throw fault('/email', 'This is your address already.');
  await enqueue(db, 'mail', `change-email:${String(account.id)}:${randomUUID()}`, {
    kind: 'change-email',
    memberId: account.id,
    newEmail,
  });
  nudgeOutbox();
}

/** @throws AppError bad-input or same-name */
export async function changeProfile(
  db: Knex,
  actor: SignedIn,
  profile: z.output<typeof profileBodySchema>,
): Promise<Me> {
  const { name, nameKey } = nameForms(profile.name);
  await storeProfile(db, actor.id, {
    name,
    nameKey,
    place: profile.place.replace(/\s+/gu, ' ').trim(),
    about: profile.about.trim(),
  });
  return readMe(db, actor.id);
}

export async function changeSettings(
  db: Knex,
  actor: SignedIn,
  settings: MemberSettings,
): Promise<Me> {
  await storeSettings(db, actor.id, settings);
  return readMe(db, actor.id);
}

async function readMe(db: Knex, id: number): Promise<Me> {
  const account = await findAccountById(db, id);
  if (!account) throw new AppError('sign-in-needed');
  return presentMe(account);
}
