import type { Knex } from 'knex';
import { inject, test as base } from 'vitest';
import { openDatabase } from '../../server/database/open-database.ts';
import { listTables, listTablesWithDeleteTriggers } from '../../server/database/schema-picture.ts';
import { selectRows } from '../../server/database/select-rows.ts';

/** A connection that must see its own session settings again for each statement. */
const ONE_CONNECTION = { poolMax: 1 };

let workerUrl: Promise<string> | undefined;

/**
 * The URL of this worker's own database, made from the migrated one the first time it is asked for.
 * Workers never share one, so tests in different files cannot disturb each other.
 */
export function workerDatabaseUrl(): Promise<string> {
  workerUrl ??= makeWorkerDatabase();
  return workerUrl;
}

async function makeWorkerDatabase(): Promise<string> {
  const { templateUrl, templateName, schema, filledTables } = inject('testDatabase');
  const name = `${templateName}_test_${process.env['VITEST_POOL_ID'] ?? '0'}`;
  const url = new URL(templateUrl);
  url.pathname = `/${name}`;
  const server = openDatabase(templateUrl, ONE_CONNECTION);
  try {
    // Each test file is a fresh world; the last file of this worker may have left rows behind.
    await server.raw('DROP DATABASE IF EXISTS ??', [name]);
    await server.raw('CREATE DATABASE ??', [name]);
    await server.raw('USE ??', [name]);
    await server.raw('SET foreign_key_checks = 0');
    for (const statement of schema) await server.raw(escapePlaceholders(statement));
    await fill(server, templateName, filledTables);
  } finally {
    await server.destroy();
  }
  return url.href;
}

/** Knex reads a question mark as the place of a value. */
function escapePlaceholders(sql: string): string {
  return sql.replaceAll('?', '\\?');
}

async function fill(db: Knex, templateName: string, tables: string[]): Promise<void> {
  for (const table of tables) {
    await db.raw('INSERT INTO ?? SELECT * FROM ??.??', [table, templateName, table]);
  }
}

/** Empties every table and puts the rows of the migrations back. */
async function clean(url: string): Promise<void> {
  const { templateName, filledTables } = inject('testDatabase');
  const db = openDatabase(url, ONE_CONNECTION);
  try {
    const guarded = await listTablesWithDeleteTriggers(db);
    await db.raw('SET foreign_key_checks = 0');
    for (const table of await listTables(db)) {
      const rows = await selectRows(db, 'SELECT 1 FROM ?? LIMIT 1', [table]);
      if (rows.length === 0) continue;
      // A trigger may refuse to delete (the staff log); emptying the table does not ask it.
      await db.raw(guarded.includes(table) ? 'TRUNCATE TABLE ??' : 'DELETE FROM ??', [table]);
    }
    await fill(db, templateName, filledTables);
  } finally {
    await db.destroy();
  }
}

export interface DatabaseFixtures {
  /** This worker's pool. Prefer `db`. */
  pool: Knex;
  /** An open transaction, rolled back at the end: use this unless the test needs committed rows. */
  db: Knex.Transaction;
  /** A pool on a database that is empty now and emptied again afterwards: for two connections at once. */
  committedDb: Knex;
}

export const test = base.extend<DatabaseFixtures>({
  pool: async ({ task: _task }, use) => {
    const pool = openDatabase(await workerDatabaseUrl(), { poolMax: 10 });
    await use(pool);
    await pool.destroy();
  },
  db: async ({ pool }, use) => {
    const transaction = await pool.transaction();
    await use(transaction);
    if (!transaction.isCompleted()) await transaction.rollback();
  },
  committedDb: async ({ pool }, use) => {
    const url = await workerDatabaseUrl();
    await clean(url);
    await use(pool);
    await clean(url);
  },
});
