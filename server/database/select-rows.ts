import type { Knex } from 'knex';

/**
 * Runs a statement written out in SQL and gives its rows. `sql` is always a constant of the program;
 * whatever a person has typed goes in as a bound value (`?`), a fixed name as `??`.
 */
export async function selectRows<T>(
  db: Knex,
  sql: string,
  bindings: readonly (string | number | null | Date)[] = [],
): Promise<T[]> {
  const [rows] = (await db.raw(sql, bindings as Knex.RawBinding[])) as unknown as [T[]];
  return rows;
}
