import { readdir } from 'node:fs/promises';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import type { Knex } from 'knex';
import { openDatabase } from './open-database.ts';
import { selectRows } from './select-rows.ts';

/** Where the migrations are. */
export const MIGRATIONS_FOLDER = join(import.meta.dirname, '../../migrations');

/** `20260301T1000_create_notes.ts`: the minute it was written, then what it does. */
const MIGRATION_NAME = /^\d{8}T\d{4}_[a-z0-9_]+\.ts$/;

/** Held by one connection while migrations run: it ends with its process, however that ends. */
const RUNNER_LOCK = 'spyhole_migrations';
const RUNNER_LOCK_SECONDS = 60;

/** "It is already so": what the database says to a change that had been made before. */
const ALREADY_SO = new Set([
  1050, // the table exists
  1051, // the table to drop does not
  1060, // the column exists
  1061, // the index exists
  1091, // the column or index to drop does not exist
  1359, // the trigger exists
  1360, // the trigger to drop does not
  1826, // the foreign key exists
]);

/**
 * The one runner of migrations, used by the start command, `npm run migrate` and the tests.
 *
 * Two runners wait for each other on a lock that the database itself frees when its holder dies.
 * Whoever holds it knows that a lock left in Knex's own table is stale, and clears it.
 *
 * @returns the names of the migrations that were run or undone now
 */
export async function migrate(
  url: string,
  options: { direction?: 'latest' | 'down all'; folder?: string } = {},
): Promise<string[]> {
  const db = openDatabase(url, { poolMax: 4, statementSeconds: 0 });
  try {
    return await withRunnerLock(db, async () => {
      const config = { migrationSource: new MigrationFiles(options.folder ?? MIGRATIONS_FOLDER) };
      await clearStaleLock(db);
      if (options.direction === 'down all') {
        const [, undone] = (await db.migrate.rollback(config, true)) as [number, string[]];
        return undone;
      }
      await setCollation(db);
      const [, run] = (await db.migrate.latest(config)) as [number, string[]];
      return run;
    });
  } finally {
    await db.destroy();
  }
}

async function withRunnerLock<T>(db: Knex, work: () => Promise<T>): Promise<T> {
  // An open transaction keeps one connection, and with it the lock, to ourselves.
  const holder = await db.transaction();
  try {
    const rows = await selectRows<{ got: number | null }>(holder, 'SELECT GET_LOCK(?, ?) AS got', [
      RUNNER_LOCK,
      RUNNER_LOCK_SECONDS,
    ]);
    if (rows[0]?.got !== 1) throw new Error('Another process is still migrating this database.');
    return await work();
  } finally {
    await holder.raw('SELECT RELEASE_LOCK(?)', [RUNNER_LOCK]).catch(() => undefined);
    await holder.rollback().catch(() => undefined);
  }
}

async function clearStaleLock(db: Knex): Promise<void> {
  if (!(await db.schema.hasTable('knex_migrations_lock'))) return;
  await db('knex_migrations_lock').where({ is_locked: 1 }).update({ is_locked: 0 });
}

/** A database made by somebody else may have another default; tables inherit it. */
async function setCollation(db: Knex): Promise<void> {
  const rows = await selectRows<{ name: string; collation: string }>(
    db,
    'SELECT DATABASE() AS name, @@collation_database AS collation',
  );
  const current = rows[0];
  if (current === undefined || current.collation === 'utf8mb4_unicode_ci') return;
  await db.raw('ALTER DATABASE ?? CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci', [
    current.name,
  ]);
}

/** What a migration's file exports; Knex reads `config`, but its types do not say so. */
type MigrationModule = Partial<Knex.Migration> & { config?: { transaction?: boolean } };

function isAlreadySo(error: unknown): boolean {
  const { errno = 0, message = '' } = error as { errno?: number; message?: string };
  // A foreign key that exists comes as "cannot create the table" with the storage engine's own number.
  return ALREADY_SO.has(errno) || (errno === 1005 && message.includes('errno: 121 '));
}

/** Reads the folder of migrations; anything else in it than migrations and schema.sql is a mistake. */
class MigrationFiles implements Knex.MigrationSource<string> {
  readonly #folder: string;
  #isFirst = true;

  constructor(folder: string) {
    this.#folder = folder;
  }

  async getMigrations(): Promise<string[]> {
    const names = (await readdir(this.#folder)).filter((name) => name !== 'schema.sql').sort();
    const strange = names.filter((name) => !MIGRATION_NAME.test(name));
    if (strange.length > 0) {
      throw new Error(`Not named like a migration (YYYYMMDDTHHMM_name.ts): ${strange.join(', ')}`);
    }
    return names;
  }

  getMigrationName(name: string): string {
    return name;
  }

  async getMigration(name: string): Promise<Knex.Migration> {
    const url = pathToFileURL(join(this.#folder, name)).href;
    const migration = (await import(/* @vite-ignore */ url)) as MigrationModule;
    const { up, down, config } = migration;
    if (up === undefined || down === undefined || config?.transaction !== false) {
      throw new Error(`${name} must export up, down and config = { transaction: false }`);
    }
    return {
      up: (knex: Knex) => this.#resume(knex, up),
      down: (knex: Knex) => this.#resume(knex, down),
      config,
    } as Knex.Migration;
  }

  /**
   * A run that is killed between the change and the note that it was made leaves the first migration
   * of the next run done already. Each one is a single statement, so it was done whole or not at all.
   */
  async #resume(knex: Knex, change: (knex: Knex) => PromiseLike<void>): Promise<void> {
    const isFirst = this.#isFirst;
    this.#isFirst = false;
    try {
      await change(knex);
    } catch (error) {
      if (!isFirst || !isAlreadySo(error)) throw error;
    }
  }
}
