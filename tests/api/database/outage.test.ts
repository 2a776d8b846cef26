import type { Knex } from 'knex';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { isUnreachable } from '../../../server/database/constraint-errors.ts';
import { findUnsafeSettings } from '../../../server/database/check-settings.ts';
import { openDatabase } from '../../../server/database/open-database.ts';
import { selectRows } from '../../../server/database/select-rows.ts';
import {
  startThrowawayDatabase,
  type ThrowawayDatabase,
} from '../../../server/start/throwaway-database.ts';

let database: ThrowawayDatabase;
let db: Knex;
let pid: number;

beforeAll(async () => {
  database = await startThrowawayDatabase();
  db = openDatabase(database.url, { poolMax: 2, statementSeconds: 1 });
  pid = database.pid;
});

afterAll(async () => {
  await db.destroy();
  await database.stop();
});

async function outcomeOf(sql: string): Promise<{ error: unknown; milliseconds: number }> {
  const startedAt = performance.now();
  const error = await selectRows(db, sql).then(
    () => null,
    (refusal: unknown) => refusal,
  );
  return { error, milliseconds: performance.now() - startedAt };
}

describe('a database that stands still', () => {
  it('gives errors within the limits, to all who ask, and is used again when it goes on', async () => {
    expect((await outcomeOf('SELECT 1')).error).toBeNull();
    process.kill(pid, 'SIGSTOP');
    // Two hold the connections of the pool until their time is up; the rest get none.
    const outcomes = await Promise.all(Array.from({ length: 6 }, () => outcomeOf('SELECT 1')));
    process.kill(pid, 'SIGCONT');
    for (const { error, milliseconds } of outcomes) {
      expect(isUnreachable(error), String(error)).toBe(true);
      expect(milliseconds).toBeLessThan(6_000);
    }
    const startedAt = performance.now();
    while ((await outcomeOf('SELECT 1')).error !== null) {
      expect(performance.now() - startedAt).toBeLessThan(5_000);
    }
    // No late answer of the standstill is taken for this one's.
    expect(await selectRows(db, 'SELECT 42 AS answer')).toEqual([{ answer: 42 }]);
  });
});

describe('findUnsafeSettings', () => {
  it('refuses a server that may lose a commit', async () => {
    expect(await findUnsafeSettings(db)).toEqual(['innodb_flush_log_at_trx_commit must be 1']);
  });
});

describe('a database that is killed', () => {
  it('gives errors within 2 seconds and never hangs', async () => {
    const waiting = outcomeOf('SELECT SLEEP(0.9)');
    await new Promise((resolve) => setTimeout(resolve, 200));
    process.kill(pid, 'SIGKILL');
    const outcomes = [await waiting, await outcomeOf('SELECT 1'), await outcomeOf('SELECT 1')];
    for (const { error, milliseconds } of outcomes) {
      expect(isUnreachable(error), String(error)).toBe(true);
      expect(milliseconds).toBeLessThan(2_500);
    }
  });
});
