import type { Request } from 'express';
import type { Knex } from 'knex';
import type { Deps } from '../deps.ts';
import { AppError } from '../http/problem.ts';
import {
  type Account,
  findAccountByEmail,
  findAccountById,
  storeHash,
} from './account-repository.ts';
import { hashPassword, isOutdated, isPassword } from './hashing.ts';
import { emailKeyOf } from './normal-forms.ts';
import { clientOf, forgetTries, giveTryBack, takeTry, THROTTLES } from './throttle.ts';

/**
 * Who has this address and this password. An unknown address is refused with the same words and
 * after the same work as a wrong password; tries are counted for both.
 *
 * @throws AppError wrong-credentials, suspended, too-many or busy
 */
export async function verifyCredentials(
  deps: Deps,
  request: Request,
  email: string,
  password: string,
): Promise<Account> {
  const { db, log } = deps;
  const client = clientOf(request.ip);
  const emailKey = emailKeyOf(email);
  const event = { requestId: request.requestId, event: 'sign-in' };
  try {
    await takeTry(db, THROTTLES.signInFromClient, client);
    await takeTry(db, THROTTLES.signInOfAccount, emailKey ?? email);
  } catch (error) {
    if (error instanceof AppError) log.warn({ ...event, result: 'throttled' }, 'sign-in');
    throw error;
  }
  const account = emailKey === null ? null : await findAccountByEmail(db, emailKey);
  if (!(await isPassword(account?.passwordHash ?? null, password)) || !account) {
    log.warn({ ...event, result: 'refused', memberId: account?.id ?? null }, 'sign-in');
    throw new AppError('wrong-credentials');
  }
  await forgetTries(db, THROTTLES.signInOfAccount, account.email);
  await giveTryBack(db, THROTTLES.signInFromClient, client);
  if (account.suspended) {
    log.warn({ ...event, result: 'suspended', memberId: account.id }, 'sign-in');
    throw new AppError('suspended', 'This account is suspended. The admins of the site know why.');
  }
  if (isOutdated(account.passwordHash)) {
    await storeHash(db, account.id, await hashPassword(password));
  }
  log.info({ ...event, result: 'signed-in', memberId: account.id }, 'sign-in');
  return account;
}

/**
 * The account of somebody signed in who has typed the password again. Wrong ones count as wrong
 * sign-ins do.
 *
 * @param pointer where the form has the password, for the answer
 * @throws AppError bad-input at `pointer`, too-many or busy
 */
export async function confirmPassword(
  db: Knex,
  memberId: number,
  password: string,
  pointer: string,
): Promise<Account> {
  const account = await findAccountById(db, memberId);
  if (!account) throw new AppError('sign-in-needed');
  await takeTry(db, THROTTLES.signInOfAccount, account.email);
  if (!(await isPassword(account.passwordHash, password))) {
    throw new AppError('bad-input', {
      detail: 'This is not your password.',
      errors: [{ pointer, detail: 'This is not your password.' }],
    });
  }
  await forgetTries(db, THROTTLES.signInOfAccount, account.email);
  return account;
}
