import type { Knex } from 'knex';
import type { Done } from '#shared/api/accounts.ts';
import { findAccountById, storeSettings } from '../accounts/account-repository.ts';
import type { Config } from '../config.ts';
import { inTransaction } from '../database/transaction.ts';
import { AppError } from '../http/problem.ts';
import { lockMember } from './saved-search-repository.ts';
import { memberOfUnsubscribeToken } from './unsubscribe-token.ts';

/**
 * Ends all mails about a member's saved searches; the searches stay. Twice does no harm, and of an
 * account that is gone nothing is told.
 *
 * @throws AppError link-used when the token is not ours
 */
export async function unsubscribe(
  db: Knex,
  config: Pick<Config, 'sessionSecrets'>,
  token: string,
): Promise<Done> {
  const memberId = memberOfUnsubscribeToken(config, token);
  if (memberId === null) {
    throw new AppError('link-used', 'Open the link in the mail itself, or use your settings.');
  }
  await inTransaction(db, async (trx) => {
    await lockMember(trx, memberId);
    const account = await findAccountById(trx, memberId);
    if (!account?.settings.mails.savedSearches) return;
    await storeSettings(trx, memberId, {
      ...account.settings,
      mails: { ...account.settings.mails, savedSearches: false },
    });
  });
  return { message: 'No more mails about saved searches will come.' };
}
