import { writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { parseArgs } from 'node:util';
import { readDatabaseUrl } from '../config.ts';
import { MIGRATIONS_FOLDER, migrate } from '../database/migrate.ts';
import { openDatabase } from '../database/open-database.ts';
import { printSchema, readSchema } from '../database/schema-picture.ts';
import { withLocalSettings } from '../start/local-settings.ts';
import { withThrowawayDatabase } from '../start/throwaway-database.ts';
import { runCommand, say } from './run-command.ts';

/**
 * `npm run migrate` brings the database up to date. `-- --write-schema` instead rewrites
 * migrations/schema.sql from a throwaway database, so that it never shows somebody's experiments.
 */
await runCommand(async () => {
  const { values } = parseArgs({
    options: { 'write-schema': { type: 'boolean', default: false } },
  });
  if (values['write-schema']) {
    await withThrowawayDatabase(writeSchema);
    return;
  }
  const run = await migrate(readDatabaseUrl(withLocalSettings(process.env)));
  for (const name of run) say(name);
  say(run.length === 0 ? 'The database is up to date.' : `${run.length} migrations were run.`);
});

async function writeSchema(url: string): Promise<void> {
  await migrate(url);
  const db = openDatabase(url, { poolMax: 1 });
  try {
    await writeFile(join(MIGRATIONS_FOLDER, 'schema.sql'), printSchema(await readSchema(db)));
  } finally {
    await db.destroy();
  }
  say('migrations/schema.sql is written.');
}
