import { setTimeout as sleep } from 'node:timers/promises';
import type { Knex } from 'knex';
import { isContention } from './constraint-errors.ts';

const TRIES = 3;
const FIRST_PAUSE_MILLISECONDS = 30;

/** The same rows were wanted by too many at once; trying again a little later is likely to work. */
export class DatabaseBusyError extends Error {
  constructor(cause: unknown) {
    super('The database is busy.', { cause });
    this.name = 'DatabaseBusyError';
  }
}

/**
 * Runs `work` in one transaction. Called inside a transaction it only sets a savepoint, so use cases
 * can be combined. Deadlocks and lock waits are tried again *whole*, three times at most, which only
 * the outermost call can do: MariaDB has rolled back everything by then. `work` may therefore run more
 * than once and must touch nothing but the database.
 *
 * @throws DatabaseBusyError when the third try failed as well
 */
export async function inTransaction<T>(
  db: Knex,
  work: (transaction: Knex.Transaction) => Promise<T>,
): Promise<T> {
  if (db.isTransaction === true) return db.transaction(work);
  for (let attempt = 1; ; attempt += 1) {
    try {
      return await db.transaction(work);
    } catch (error) {
      if (!isContention(error)) throw error;
      if (attempt === TRIES) throw new DatabaseBusyError(error);
      await sleep(FIRST_PAUSE_MILLISECONDS * 2 ** (attempt - 1) * (1 + Math.random()));
    }
  }
}
