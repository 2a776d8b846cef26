import { join } from 'node:path';
import { parseArgs } from 'node:util';
import type { Knex } from 'knex';
import { loadManyNotes } from '../../seeds/many/load-many.ts';
import { loadDemo } from '../../seeds/development/load-demo.ts';
import { readConfig, type Config } from '../config.ts';
import { openDatabase } from '../database/open-database.ts';
import { createLog } from '../log.ts';
import { DATA_FOLDER, withLocalSettings } from '../start/local-settings.ts';
import { makePrivateFolder, writePrivateJson } from '../start/private-files.ts';
import { reindex } from '../search/reindex.ts';
import { diskStore } from '../storage/file-store.ts';
import { CommandError, runCommand, say } from './run-command.ts';

/** Loading is one long run of statements; none of them alone is slow. */
const STATEMENT_SECONDS = 60;

const MOST_NOTES = 1_000_000;
const BAR_WIDTH = 30;

/** A bar on one line of the terminal, drawn anew as the work goes on. */
function showProgress(what: string): (done: number, of: number) => void {
  return (done, of) => {
    const filled = Math.round((done / Math.max(1, of)) * BAR_WIDTH);
    const bar = '█'.repeat(filled) + '·'.repeat(BAR_WIDTH - filled);
    process.stdout.write(`\r${what} ${bar} ${String(done)} of ${String(of)}`);
    if (done >= of) process.stdout.write('\n');
  };
}

async function seedDemo(config: Config, db: Knex): Promise<void> {
  if ((await db('members').first('id')) !== undefined) {
    throw new CommandError('This database already has members: the demo is left out.');
  }
  const store = diskStore(config.uploadsFolder);
  const accounts = await loadDemo({ config, db, log: createLog(config), store });
  makePrivateFolder(DATA_FOLDER);
  writePrivateJson(join(DATA_FOLDER, 'demo-accounts.json'), accounts);
  say('The demo is loaded.');
}

async function seedManyNotes(config: Config, db: Knex, count: number): Promise<void> {
  await loadManyNotes(db, count, showProgress('Notes'));
  const store = diskStore(config.uploadsFolder);
  await reindex({ config, db, log: createLog(config), store }, showProgress('Index'));
  say(`${String(count)} made-up notes are published and can be found.`);
}

/**
 * `npm run seed` fills an empty database with the demo; one with members in it is left alone.
 * `npm run seed -- --notes 10000` adds so many made-up notes to any, for trying how it bears many.
 */
await runCommand(async () => {
  const { values } = parseArgs({ options: { notes: { type: 'string' } } });
  const count = values.notes === undefined ? null : Number(values.notes);
  if (count !== null && !(Number.isInteger(count) && count >= 1 && count <= MOST_NOTES)) {
    throw new CommandError(`Say how many notes, from 1 to ${String(MOST_NOTES)}: --notes 10000`);
  }
  const config = readConfig(withLocalSettings(process.env));
  const db = openDatabase(config.databaseUrl, { statementSeconds: STATEMENT_SECONDS });
  try {
    await (count === null ? seedDemo(config, db) : seedManyNotes(config, db, count));
  } finally {
    await db.destroy();
  }
});
