import { mkdtempSync, readFileSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Knex } from 'knex';
import { describe, expect, inject, test as base } from 'vitest';
import { MIGRATIONS_FOLDER, migrate } from '../../server/database/migrate.ts';
import { openDatabase } from '../../server/database/open-database.ts';
import { listTables, printSchema, readSchema } from '../../server/database/schema-picture.ts';
import { selectRows } from '../../server/database/select-rows.ts';

interface EmptyDatabase {
  url: string;
  db: Knex;
}

/** A database with nothing in it, for one test. */
const test = base.extend<{ empty: EmptyDatabase }>({
  empty: async ({ task }, use) => {
    const { templateUrl, templateName } = inject('testDatabase');
    const name = `${templateName}_migrations_${task.id.replaceAll(/\W/g, '_')}`.slice(0, 64);
    const server = openDatabase(templateUrl, { poolMax: 1 });
    await server.raw('CREATE DATABASE ??', [name]);
    const url = new URL(templateUrl);
    url.pathname = `/${name}`;
    const db = openDatabase(url.href, { poolMax: 2, statementSeconds: 0 });
    await use({ url: url.href, db });
    await db.destroy();
    await server.raw('DROP DATABASE ??', [name]);
    await server.destroy();
  },
});

const NAMES = readdirSync(MIGRATIONS_FOLDER)
  .filter((name) => name.endsWith('.ts'))
  .sort();

async function load(name: string): Promise<{ up: (db: Knex) => Promise<void> }> {
  return (await import(join(MIGRATIONS_FOLDER, name))) as { up: (db: Knex) => Promise<void> };
}

describe('the migrations', () => {
  test('go up, all the way down, and up again to the same schema', async ({ empty }) => {
    const { url, db } = empty;
    expect(await migrate(url)).toEqual(NAMES);
    const schema = await readSchema(db);
    expect(await migrate(url, { direction: 'down all' })).toHaveLength(NAMES.length);
    expect(await listTables(db)).toEqual([]);
    await migrate(url);
    expect(await readSchema(db)).toEqual(schema);
  });

  test('make the schema that schema.sql shows', () => {
    const shown = readFileSync(join(MIGRATIONS_FOLDER, 'schema.sql'), 'utf8');
    // To renew it: npm run migrate -- --write-schema
    expect(shown).toBe(printSchema(inject('testDatabase').schema));
  });

  test('give every table a primary key, and every key and check a name', async ({ empty }) => {
    await migrate(empty.url);
    const bare = await selectRows<{ name: string }>(
      empty.db,
      `SELECT t.table_name AS name FROM information_schema.tables t
       LEFT JOIN information_schema.statistics s ON s.table_schema = t.table_schema
         AND s.table_name = t.table_name AND s.index_name = 'PRIMARY'
       WHERE t.table_schema = DATABASE() AND t.table_type = 'BASE TABLE' AND s.index_name IS NULL`,
    );
    expect(bare).toEqual([]);
    const unnamed = (await readSchema(empty.db)).filter((sql) =>
      /CONSTRAINT `(\w+_ibfk_\d+|CONSTRAINT_\d+)`/.test(sql),
    );
    expect(unnamed).toEqual([]);
  });

  test('each change the database by one statement, so that none can be cut off half-way', async ({
    empty,
  }) => {
    const statements: string[] = [];
    empty.db.on('query', (query: { sql: string }) => statements.push(query.sql));
    for (const name of NAMES) {
      const before = statements.length;
      await (await load(name)).up(empty.db);
      const own = statements.slice(before);
      const changes = own.filter((sql) => /^\s*(create|alter|drop|rename)\b/i.test(sql));
      expect(changes.length, name).toBeLessThanOrEqual(1);
      if (changes.length === 1) expect(own, name).toHaveLength(1);
    }
  });

  test('go on after a run that was killed before it noted what it had done', async ({ empty }) => {
    const { url, db } = empty;
    for (const name of NAMES) {
      // The change is made, and the process dies before it is recorded.
      await (await load(name)).up(db);
      await migrateOnly(url, name);
    }
    expect(await readSchema(db)).toEqual(inject('testDatabase').schema);
    expect(await migrate(url)).toEqual([]);
  });

  test('go on when a killed run has left its lock behind', async ({ empty }) => {
    await migrate(empty.url);
    await empty.db('knex_migrations_lock').update({ is_locked: 1 });
    expect(await migrate(empty.url)).toEqual([]);
  });

  test('run once when two processes start together', async ({ empty }) => {
    const runs = await Promise.all([migrate(empty.url), migrate(empty.url)]);
    expect(runs.map((run) => run.length).sort((a, b) => a - b)).toEqual([0, NAMES.length]);
  });
});

describe('migrate', () => {
  test('refuses a file in the folder that is not named like a migration', async ({ empty }) => {
    const folder = mkdtempSync(join(tmpdir(), 'spyhole-migrations-'));
    writeFileSync(join(folder, 'create_pots.ts'), '');
    await expect(migrate(empty.url, { folder })).rejects.toThrow('create_pots.ts');
    rmSync(folder, { recursive: true });
  });

  test('stops at a migration that fails, and says so', async ({ empty }) => {
    const folder = mkdtempSync(join(tmpdir(), 'spyhole-migrations-'));
    const write = (name: string, sql: string): void =>
      writeFileSync(
        join(folder, name),
        `export const config = { transaction: false };
         export const up = (knex) => knex.raw(${JSON.stringify(sql)});
         export const down = () => Promise.resolve();`,
      );
    write('20300101T0000_create_pots.ts', 'CREATE TABLE pots (id int PRIMARY KEY)');
    write('20300101T0001_create_pots_again.ts', 'CREATE TABLE pots (id int PRIMARY KEY)');
    await expect(migrate(empty.url, { folder })).rejects.toMatchObject({ errno: 1050 });
    expect(await empty.db('knex_migrations').pluck('name')).toEqual([
      '20300101T0000_create_pots.ts',
    ]);
    rmSync(folder, { recursive: true });
  });
});

/** Lets the runner see the migrations up to `last` only. */
async function migrateOnly(url: string, last: string): Promise<void> {
  const folder = mkdtempSync(join(tmpdir(), 'spyhole-migrations-'));
  for (const name of NAMES.filter((candidate) => candidate <= last)) {
    const target = JSON.stringify(join(MIGRATIONS_FOLDER, name));
    writeFileSync(join(folder, name), `export * from ${target};\n`);
  }
  await migrate(url, { folder });
  rmSync(folder, { recursive: true });
}
