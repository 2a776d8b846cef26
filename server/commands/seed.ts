import { join } from 'node:path';
import { loadDemo } from '../../seeds/development/load-demo.ts';
import { readConfig } from '../config.ts';
import { openDatabase } from '../database/open-database.ts';
import { createLog } from '../log.ts';
import { DATA_FOLDER, withLocalSettings } from '../start/local-settings.ts';
import { makePrivateFolder, writePrivateJson } from '../start/private-files.ts';
import { diskStore } from '../storage/file-store.ts';
import { CommandError, runCommand, say } from './run-command.ts';

/** Loading is one long run of statements; none of them alone is slow. */
const STATEMENT_SECONDS = 60;

/** `npm run seed` fills an empty database with the demo; one with members in it is left alone. */
await runCommand(async () => {
  const config = readConfig(withLocalSettings(process.env));
  const db = openDatabase(config.databaseUrl, { statementSeconds: STATEMENT_SECONDS });
  try {
    if ((await db('members').first('id')) !== undefined) {
      throw new CommandError('This database already has members: the demo is left out.');
    }
    const store = diskStore(config.uploadsFolder);
    const accounts = await loadDemo({ config, db, log: createLog(config), store });
    makePrivateFolder(DATA_FOLDER);
    writePrivateJson(join(DATA_FOLDER, 'demo-accounts.json'), accounts);
    say('The demo is loaded.');
  } finally {
    await db.destroy();
  }
});
