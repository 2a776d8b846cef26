import { setTimeout as sleep } from 'node:timers/promises';
import type { Knex } from 'knex';
import { describe, expect } from 'vitest';
import {
  GiveUp,
  type Handler,
  type Handlers,
  type Job,
  waitSeconds,
} from '../../server/outbox/job.ts';
import { claimJobs, markDone, purgeOutbox } from '../../server/outbox/job-repository.ts';
import { nudgeOutbox } from '../../server/outbox/nudge.ts';
import { enqueue } from '../../server/outbox/outbox.ts';
import { startOutboxWorker, workOnce } from '../../server/outbox/worker.ts';
import { memoryLog, test } from '../support/api.ts';

interface JobRow {
  id: number;
  attempts: number;
  available_at: Date;
  leased_until: Date | null;
  done_at: Date | null;
  given_up_at: Date | null;
  last_error: string;
}

function indexHandler(
  handle: (job: Job<'index-note'>) => Promise<void> | void,
  traits: Partial<Handler<'index-note'>> = {},
): Handler<'index-note'> {
  return {
    handle: async (job) => handle(job),
    atOnce: 16,
    groupOf: ({ noteId }) => String(noteId),
    firstWaitSeconds: 1,
    longestWaitSeconds: 30,
    giveUpAfterSeconds: null,
    ...traits,
  };
}

/** All topics, with nothing to do for those a test is not about. */
function handlers(indexNote: Handler<'index-note'>): Handlers {
  const idle = { ...indexNote, handle: () => Promise.resolve(), groupOf: () => '' };
  return { mail: idle, 'read-record': idle, 'index-note': indexNote };
}

const promise = (db: Knex, noteId: number, key: string): Promise<void> =>
  enqueue(db, 'index-note', key, { noteId });
const rows = (db: Knex): Promise<JobRow[]> => db<JobRow>('outbox').orderBy('id').select();

async function until(holds: () => boolean | Promise<boolean>): Promise<void> {
  const deadline = Date.now() + 25_000;
  while (!(await holds())) {
    if (Date.now() > deadline) throw new Error('It did not come to that.');
    await sleep(20);
  }
}

describe('a job', () => {
  test('exists only when the transaction that promised it commits', async ({ committedDb: db }) => {
    const doomed = db.transaction(async (trx) => {
      await promise(trx, 1, 'note:1:rev:1:published');
      throw new Error('undone');
    });
    await expect(doomed).rejects.toThrow('undone');
    expect(await rows(db)).toEqual([]);
  });

  test('is done once, even when it was promised twice', async ({ committedDb: db }) => {
    const seen: number[] = [];
    await promise(db, 1, 'note:1:rev:1:published');
    await promise(db, 1, 'note:1:rev:1:published');
    await promise(db, 1, 'note:1:rev:2:published');
    const handler = indexHandler(({ payload }) => void seen.push(payload.noteId));
    const { log } = memoryLog();
    while ((await workOnce({ db, log }, 'index-note', handler)) > 0);
    expect(seen).toEqual([1, 1]);
    expect((await rows(db)).map(({ done_at }) => done_at !== null)).toEqual([true, true]);
  });

  test('that fails is tried again later, and does not stop the others', async ({
    committedDb: db,
  }) => {
    const { log, logLines } = memoryLog();
    for (let noteId = 1; noteId <= 30; noteId += 1)
      await promise(db, noteId, `note:${String(noteId)}`);
    const handler = indexHandler(({ payload }) => {
      if (payload.noteId === 7) throw new Error('poison\nfrom <who@example.org>');
    });
    while ((await workOnce({ db, log }, 'index-note', handler)) > 0);
    const all = await rows(db);
    expect(all.filter(({ done_at }) => done_at !== null)).toHaveLength(29);
    const poison = all.find(({ done_at }) => done_at === null);
    expect(poison).toMatchObject({
      attempts: 1,
      given_up_at: null,
      leased_until: null,
      last_error: 'poison from <(an address)>',
    });
    expect(logLines.join('')).not.toContain('who@example.org');
    // Due again after its wait, and then done.
    await db('outbox').update({ available_at: db.raw('NOW(3)') });
    await workOnce(
      { db, log },
      'index-note',
      indexHandler(() => undefined),
    );
    expect((await rows(db)).every(({ done_at }) => done_at !== null)).toBe(true);
  });

  test('is given up when it says so or is too old, but never where the topic has no end', async ({
    committedDb: db,
  }) => {
    const { log } = memoryLog();
    const failing = (error: Error, traits: Partial<Handler<'index-note'>>) =>
      workOnce(
        { db, log },
        'index-note',
        indexHandler(() => {
          throw error;
        }, traits),
      );
    await promise(db, 1, 'no use');
    await failing(new GiveUp('no use'), {});
    await promise(db, 2, 'old');
    await db('outbox')
      .where({ dedupe_key: 'old' })
      .update({
        created_at: db.raw('NOW(3) - INTERVAL 25 HOUR'),
      });
    await failing(new Error('away'), { giveUpAfterSeconds: null });
    expect((await rows(db))[1]).toMatchObject({ given_up_at: null });
    await db('outbox').update({ available_at: db.raw('NOW(3)') });
    await failing(new Error('away'), { giveUpAfterSeconds: 24 * 3600 });
    const all = await rows(db);
    expect(all.map(({ given_up_at }) => given_up_at !== null)).toEqual([true, true]);
    await db('outbox').update({ available_at: db.raw('NOW(3)') });
    expect(await failing(new Error('never asked'), {})).toBe(0);
  });

  test('of one note is done after the one before it, those of other notes meanwhile', async ({
    committedDb: db,
  }) => {
    const { log } = memoryLog();
    for (const [noteId, key] of [
      [1, 'a'],
      [2, 'b'],
      [1, 'c'],
    ] as const) {
      await promise(db, noteId, key);
    }
    const events: string[] = [];
    const handler = indexHandler(async ({ id, payload }) => {
      events.push(`begin ${String(payload.noteId)}`);
      await sleep(payload.noteId === 1 ? 60 : 5);
      events.push(`end ${String(payload.noteId)}`);
      expect(id).toBeGreaterThan(0);
    });
    await workOnce({ db, log }, 'index-note', handler);
    expect(events).toEqual(['begin 1', 'begin 2', 'end 2', 'end 1', 'begin 1', 'end 1']);
  });
});

describe('a claim', () => {
  test('is never shared by two workers', async ({ committedDb: db }) => {
    for (let noteId = 1; noteId <= 40; noteId += 1)
      await promise(db, noteId, `note:${String(noteId)}`);
    const claims = await Promise.all(
      Array.from({ length: 8 }, () => claimJobs(db, 'index-note', 10, 60)),
    );
    const ids = claims.flat().map(({ id }) => id);
    expect(new Set(ids).size).toBe(ids.length);
    expect(ids.length).toBeGreaterThanOrEqual(10);
  });

  test('of a worker that died runs out, and the job is done by another', async ({
    committedDb: db,
  }) => {
    const { log } = memoryLog();
    await promise(db, 1, 'note:1');
    const [dead] = await claimJobs(db, 'index-note', 10, 60);
    if (!dead) throw new Error('Nothing was claimed.');
    const seen: number[] = [];
    const handler = indexHandler(({ payload, attempts }) => {
      expect(attempts).toBe(2);
      seen.push(payload.noteId);
    });
    expect(await workOnce({ db, log }, 'index-note', handler)).toBe(0);
    await db('outbox').update({ leased_until: db.raw('NOW(3) - INTERVAL 1 SECOND') });
    const [second] = await claimJobs(db, 'index-note', 10, 60);
    // Back from the dead, the first one changes nothing.
    await markDone(db, dead);
    expect((await rows(db))[0]?.done_at).toBeNull();
    expect(second?.attempts).toBe(2);
    await db('outbox').update({ leased_until: db.raw('NOW(3) - INTERVAL 1 SECOND'), attempts: 1 });
    expect(await workOnce({ db, log }, 'index-note', handler)).toBe(1);
    expect(seen).toEqual([1]);
  });
});

describe('the worker', () => {
  test.for([
    ['at once when nudged', 60_000],
    ['by itself when not', 50],
  ] as const)('begins %s', async ([how, pollMilliseconds], { committedDb: db }) => {
    const seen: number[] = [];
    const worker = startOutboxWorker(
      { db, log: memoryLog().log },
      handlers(indexHandler(({ payload }) => void seen.push(payload.noteId))),
      { pollMilliseconds },
    );
    try {
      for (let noteId = 1; noteId <= 5; noteId += 1) {
        await sleep(noteId * 20);
        await promise(db, noteId, `note:${String(noteId)}`);
        if (how === 'at once when nudged') nudgeOutbox();
      }
      await until(() => seen.length === 5);
    } finally {
      await worker.stop();
    }
  });

  test('stops at a border: what was begun is finished, the rest is given back untouched', async ({
    committedDb: db,
  }) => {
    for (const key of ['a', 'b', 'c']) await promise(db, 1, key);
    let begun = 0;
    const worker = startOutboxWorker(
      { db, log: memoryLog().log },
      handlers(
        indexHandler(async () => {
          begun += 1;
          await sleep(150);
        }),
      ),
    );
    await until(() => begun === 1);
    await worker.stop();
    expect(begun).toBe(1);
    const all = await rows(db);
    expect(all.map(({ done_at }) => done_at !== null)).toEqual([true, false, false]);
    for (const row of all.slice(1)) expect(row).toMatchObject({ attempts: 0, leased_until: null });
    const nobody = startOutboxWorker(
      { db, log: memoryLog().log },
      handlers(indexHandler(() => undefined)),
    );
    await until(async () => (await rows(db)).every(({ done_at }) => done_at !== null));
    await nobody.stop();
  });
});

test('waits double up to the longest, a fifth more or less', () => {
  const handler = { firstWaitSeconds: 1, longestWaitSeconds: 30 };
  const waits = [1, 2, 3, 4, 5, 6, 50].map((attempts) => waitSeconds(handler, attempts, 0.5));
  expect(waits.slice(0, 5)).toEqual([1, 2, 4, 8, 16]);
  expect(waitSeconds(handler, 50, 1)).toBeLessThanOrEqual(30);
  expect(waitSeconds(handler, 1, 0)).toBeCloseTo(0.8);
  expect(waitSeconds(handler, 1, 1)).toBeCloseTo(1.2);
});

test('done jobs are kept for thirty days', async ({ committedDb: db }) => {
  for (const [key, days] of [
    ['old', 31],
    ['young', 29],
  ] as const) {
    await promise(db, 1, key);
    await db('outbox')
      .where({ dedupe_key: key })
      .update({ done_at: db.raw('NOW(3) - INTERVAL ? DAY', [days]) });
  }
  await promise(db, 1, 'open');
  await purgeOutbox(db);
  expect(await db('outbox').orderBy('id').pluck<string[]>('dedupe_key')).toEqual(['young', 'open']);
});
