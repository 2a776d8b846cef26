import { findAccountByEmail } from '../accounts/account-repository.ts';
import { emailKeyOf } from '../accounts/normal-forms.ts';
import { changeRole } from '../admin/member-rights.ts';
import { readDatabaseUrl } from '../config.ts';
import { openDatabase } from '../database/open-database.ts';
import { withLocalSettings } from '../start/local-settings.ts';
import { CommandError, runCommand, say } from './run-command.ts';

/** `npm run make-admin -- EMAIL`: there is no account to begin with, so the first admin is made here. */
await runCommand(async () => {
  const [given, ...others] = process.argv.slice(2);
  if (given === undefined || others.length > 0) {
    throw new CommandError('Say whom: npm run make-admin -- EMAIL');
  }
  const emailKey = emailKeyOf(given.trim());
  if (emailKey === null) throw new CommandError(`${given} does not look like an e-mail address.`);
  const db = openDatabase(readDatabaseUrl(withLocalSettings(process.env)), { poolMax: 2 });
  try {
    const account = await findAccountByEmail(db, emailKey);
    if (!account) {
      throw new CommandError(`Nobody has joined with ${emailKey}. Join on the site first.`);
    }
    if (account.suspended) throw new CommandError(`${account.name} is suspended.`);
    if (account.role === 'admin') {
      say(`${account.name} is an admin already.`);
      return;
    }
    await changeRole(db, null, account.id, { role: 'admin', reason: 'Made on the command line.' });
    say(`${account.name} is an admin now, and has to sign in again.`);
  } finally {
    await db.destroy();
  }
});
