import type { Account } from '../accounts/account-repository.ts';

/** Whether a member is written to about saved searches at all. */
export function wantsNews(
  account: Pick<Account, 'settings' | 'emailVerified' | 'suspended'>,
): boolean {
  return account.settings.mails.savedSearches && account.emailVerified && !account.suspended;
}
