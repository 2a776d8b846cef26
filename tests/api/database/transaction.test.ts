import type { Knex } from 'knex';
import { describe, expect } from 'vitest';
import {
  isContention,
  isDuplicate,
  isUnreachable,
} from '../../../server/database/constraint-errors.ts';
import { DatabaseBusyError, inTransaction } from '../../../server/database/transaction.ts';
import { readJson } from '../../../server/database/read-json.ts';
import { selectRows } from '../../../server/database/select-rows.ts';
import { test } from '../../support/database.ts';

const SCRATCH = 'scratch_kilns';

async function makeScratchTable(pool: Knex): Promise<void> {
  await pool.raw(`DROP TABLE IF EXISTS ${SCRATCH}`);
  await pool.raw(
    `CREATE TABLE ${SCRATCH} (
      id bigint NOT NULL AUTO_INCREMENT, name varchar(20) NOT NULL, size decimal(8,2) NOT NULL DEFAULT 0,
      facts json, lit_at datetime(3), PRIMARY KEY (id), UNIQUE KEY scratch_kilns_name (name)) ENGINE=InnoDB`,
  );
  await pool(SCRATCH).insert([{ name: 'one' }, { name: 'two' }]);
}

async function sizes(pool: Knex): Promise<number[]> {
  const rows = await pool(SCRATCH).select('size').orderBy('id');
  return rows.map((row: { size: number }) => row.size);
}

describe('inTransaction', () => {
  test('rolls everything back when the work fails', async ({ pool }) => {
    await makeScratchTable(pool);
    const work = inTransaction(pool, async (transaction) => {
      await transaction(SCRATCH).update({ size: 9 });
      throw new Error('the kiln went out');
    });
    await expect(work).rejects.toThrow('the kiln went out');
    expect(await sizes(pool)).toEqual([0, 0]);
  });

  test('inside a transaction undoes only its own part', async ({ pool }) => {
    await makeScratchTable(pool);
    await inTransaction(pool, async (outer) => {
      await outer(SCRATCH).where({ name: 'one' }).update({ size: 1 });
      await inTransaction(outer, async (inner) => {
        await inner(SCRATCH).where({ name: 'two' }).update({ size: 2 });
        throw new Error('inner');
      }).catch(() => undefined);
    });
    expect(await sizes(pool)).toEqual([1, 0]);
  });

  test('tries a deadlocked transaction again until both have done their work', async ({ pool }) => {
    await makeScratchTable(pool);
    let runs = 0;
    let waiting = 0;
    const add = (first: string, second: string): Promise<void> =>
      inTransaction(pool, async (transaction) => {
        runs += 1;
        await transaction(SCRATCH).where({ name: first }).increment('size', 1);
        waiting += 1;
        // Both hold one row before either asks for the other's.
        while (waiting < 2) await new Promise((resolve) => setTimeout(resolve, 5));
        await transaction(SCRATCH).where({ name: second }).increment('size', 1);
      });
    await Promise.all([add('one', 'two'), add('two', 'one')]);
    expect(runs).toBe(3);
    expect(await sizes(pool)).toEqual([2, 2]);
  });

  test('gives up as busy after three tries, keeping the cause', async ({ pool }) => {
    let runs = 0;
    const cause = Object.assign(new Error('Deadlock found'), { errno: 1213 });
    const outcome = await inTransaction(pool, () => {
      runs += 1;
      return Promise.reject(cause);
    }).catch((error: unknown) => error);
    expect(runs).toBe(3);
    expect(outcome).toBeInstanceOf(DatabaseBusyError);
    expect((outcome as Error).cause).toBe(cause);
    expect(isContention(cause)).toBe(true);
  });
});

describe('openDatabase', () => {
  test('reads ids and decimals as numbers, times as UTC dates and JSON as values', async ({
    pool,
  }) => {
    await makeScratchTable(pool);
    const litAt = new Date('2026-03-28T23:30:00.125Z');
    await pool(SCRATCH).insert({
      name: 'three',
      size: 12.25,
      facts: JSON.stringify({ peakCelsius: 998 }),
      lit_at: litAt,
    });
    const row = (await pool(SCRATCH).where({ name: 'three' }).first()) as Record<string, unknown>;
    expect(typeof row['id']).toBe('number');
    expect(row['size']).toBe(12.25);
    expect(row['lit_at']).toEqual(litAt);
    expect(readJson(row['facts'])).toEqual({ peakCelsius: 998 });
    const [stored] = await selectRows<{ text: string }>(
      pool,
      `SELECT CAST(lit_at AS char) AS text FROM ${SCRATCH} WHERE name = 'three'`,
    );
    expect(stored?.text).toBe('2026-03-28 23:30:00.125');
  });

  test('refuses a value that does not fit instead of cutting it', async ({ pool }) => {
    await makeScratchTable(pool);
    const insert = pool(SCRATCH).insert({ name: 'a name of more than twenty letters' });
    await expect(insert).rejects.toMatchObject({ code: 'ER_DATA_TOO_LONG' });
  });

  test('keeps what a person typed out of the words of an error', async ({ pool }) => {
    await makeScratchTable(pool);
    const canary = 'a canary of more than twenty letters';
    const error = await pool(SCRATCH)
      .insert({ name: canary })
      .catch((refusal: unknown) => refusal);
    expect(error).toBeInstanceOf(Error);
    expect(`${String(error)} ${JSON.stringify(error)}`).not.toContain('canary');
  });

  test('ends a statement that takes too long', async ({ pool }) => {
    const endless = pool.transaction(async (transaction) => {
      await transaction.raw('SET SESSION max_statement_time = 0.2');
      await transaction.raw('SELECT COUNT(*) FROM seq_1_to_100000 a, seq_1_to_100000 b');
    });
    const error = await endless.catch((refusal: unknown) => refusal);
    expect(error).toMatchObject({ errno: 1969 });
    expect(isUnreachable(error)).toBe(true);
  });
});

describe('isDuplicate', () => {
  test('knows the index by name, whatever the refused text says', async ({ pool }) => {
    await makeScratchTable(pool);
    await pool(SCRATCH).insert({ name: "for key 'PRIMARY'" });
    const error = await pool(SCRATCH)
      .insert({ name: "for key 'PRIMARY'" })
      .catch((refusal: unknown) => refusal);
    expect(isDuplicate(error, 'scratch_kilns_name')).toBe(true);
    expect(isDuplicate(error, 'PRIMARY')).toBe(false);
  });
});
