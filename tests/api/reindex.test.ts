import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { describe, expect } from 'vitest';
import { outboxStateSchema, reindexStateSchema, type ReindexState } from '#shared/api/admin.ts';
import { startEngine } from '../../search/engine/start-engine.ts';
import { startApi, test, type Api, type Client } from '../support/api.ts';
import { addKiln, publishedNote } from '../support/notes.ts';

const KEY = 'a-key-for-tests-only-0123456789';

/** A search engine of the test's own, gone afterwards. */
async function withEngine(work: (url: string) => Promise<void>): Promise<void> {
  const folder = await mkdtemp(path.join(tmpdir(), 'spyhole-test-engine-'));
  const engine = await startEngine({
    host: '127.0.0.1',
    port: 0,
    masterKey: KEY,
    dataDir: folder,
  });
  try {
    await work(engine.url);
  } finally {
    await engine.close();
    await rm(folder, { recursive: true, force: true });
  }
}

async function publishOne(api: Api): Promise<void> {
  const author = await api.signedIn();
  const kiln = await addKiln(author);
  await publishedNote(author, await api.signedIn('moderator'), kiln.id);
}

async function ended(client: Client): Promise<ReindexState> {
  for (let tries = 0; tries < 200; tries += 1) {
    const state = (await client.get('/api/admin/reindex')).as(reindexStateSchema);
    if (!state.running) return state;
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
  throw new Error('It does not end.');
}

describe('Making the index anew', () => {
  test('fills the index from the database in the background and says how it ended', async ({
    api,
  }) => {
    await publishOne(api);
    await withEngine(async (url) => {
      const searching = await startApi(api.db, { config: { search: { url, key: KEY } } });
      try {
        const admin = await searching.signedIn('admin');
        const before = (await admin.get('/api/admin/outbox')).as(outboxStateSchema);
        expect([before.index.inDatabase, before.index.inIndex]).not.toEqual([1, 1]);

        const started = await admin.post('/api/admin/reindex');
        expect(started.status).toBe(202);
        expect(started.as(reindexStateSchema).running).toBe(true);
        const again = await admin.post('/api/admin/reindex');
        expect(again.problem.code).toBe('wrong-status');

        const end = await ended(admin);
        expect(end).toMatchObject({ done: 1, of: 1, last: { outcome: 'finished' } });
        const after = (await admin.get('/api/admin/outbox')).as(outboxStateSchema);
        expect([after.index.inDatabase, after.index.inIndex]).toEqual([1, 1]);
      } finally {
        await searching.stop();
      }
    });
  });

  test('can be stopped, and then leaves the index that is in use as it was', async ({ api }) => {
    await publishOne(api);
    await withEngine(async (url) => {
      const searching = await startApi(api.db, { config: { search: { url, key: KEY } } });
      try {
        const admin = await searching.signedIn('admin');
        expect((await admin.delete('/api/admin/reindex')).problem.code).toBe('wrong-status');
        await admin.post('/api/admin/reindex');
        expect((await admin.delete('/api/admin/reindex')).status).toBe(200);
        expect((await ended(admin)).last?.outcome).toBe('cancelled');
        const { index } = (await admin.get('/api/admin/outbox')).as(outboxStateSchema);
        expect(index.inIndex).not.toBe(1);
      } finally {
        await searching.stop();
      }
    });
  });

  test('says that it failed when the engine is away, and logs why', async ({ api }) => {
    const admin = await api.signedIn('admin');
    expect((await admin.post('/api/admin/reindex')).status).toBe(202);
    expect((await ended(admin)).last?.outcome).toBe('failed');
    expect(api.logLines.some((line) => line.includes('reindex failed'))).toBe(true);
    expect((await admin.post('/api/admin/reindex')).status).toBe(202);
    await ended(admin);
  });
});
