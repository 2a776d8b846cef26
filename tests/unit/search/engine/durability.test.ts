import { spawn, type ChildProcess } from 'node:child_process';
import { appendFile, mkdtemp, readdir, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Meilisearch } from 'meilisearch';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { openStorage } from '../../../../search/engine/storage.ts';
import { startEngine, type RunningEngine } from '../../../../search/engine/start-engine.ts';

const MASTER_KEY = 'a-master-key-for-tests-only';
let folder: string;
let children: ChildProcess[];

beforeEach(async () => {
  folder = await mkdtemp(join(tmpdir(), 'engine-durability-'));
  children = [];
});

afterEach(async () => {
  for (const child of children) if (child.exitCode === null) child.kill('SIGKILL');
  await rm(folder, { recursive: true, force: true });
});

function start(): Promise<RunningEngine> {
  return startEngine({ host: '127.0.0.1', port: 0, masterKey: MASTER_KEY, dataDir: folder });
}

function connect(url: string): Meilisearch {
  return new Meilisearch({ host: url, apiKey: MASTER_KEY });
}

/** Runs the program itself, and answers once it says where it listens. */
async function launch(): Promise<{ url: string; child: ChildProcess }> {
  const child = spawn(process.execPath, ['--import', 'tsx', 'search/engine/main.ts'], {
    env: { ...process.env, ENGINE_MASTER_KEY: MASTER_KEY, ENGINE_DATA: folder, ENGINE_PORT: '0' },
    stdio: ['ignore', 'pipe', 'inherit'],
  });
  children.push(child);
  const line = await new Promise<string>((resolve, reject) => {
    let text = '';
    child.stdout.on('data', (chunk: Buffer) => {
      text += chunk.toString();
      if (text.includes('\n')) resolve(text);
    });
    child.once('exit', () => {
      reject(new Error('The engine ended before it listened.'));
    });
  });
  const { listening } = JSON.parse(line) as { listening: string };
  return { url: listening, child };
}

function exitOf(child: ChildProcess): Promise<number | null> {
  return new Promise((resolve) => child.once('exit', (code) => resolve(code)));
}

describe('restarting', () => {
  it('serves the same documents, settings, tasks and keys without being told them again', async () => {
    const first = await start();
    const client = connect(first.url);
    const index = client.index('notes');
    await index
      .updateSettings({ filterableAttributes: ['kind'], synonyms: { pot: ['bowl'] } })
      .waitTask();
    await index
      .addDocuments([
        { id: 1, text: 'a bowl', kind: 'x' },
        { id: 2, text: 'a tile', kind: 'y' },
        { id: 3, text: 'a jar', kind: 'y' },
      ])
      .waitTask();
    await index.deleteDocuments({ filter: 'kind = y AND id != 9' }).waitTask();
    await index.deleteDocuments({ filter: 'kind = y' }).waitTask();
    await client
      .index('other')
      .addDocuments([{ id: 1, text: 'other' }])
      .waitTask();
    await client.swapIndexes([{ indexes: ['notes', 'other'], rename: false }]).waitTask();
    const before = await client.tasks.getTasks({ limit: 100 });
    const keysBefore = (await client.getKeys()).results.map((key) => key.key);
    await first.close();

    const second = await start();
    const again = connect(second.url);
    const answer = await again.index('other').search('pot', { filter: 'kind = x' });
    expect(answer.hits).toEqual([{ id: 1, text: 'a bowl', kind: 'x' }]);
    expect((await again.index('other').getStats()).numberOfDocuments).toBe(1);
    expect((await again.index('notes').search('')).hits).toEqual([{ id: 1, text: 'other' }]);
    expect(await again.tasks.getTasks({ limit: 100 })).toEqual(before);
    expect((await again.getKeys()).results.map((key) => key.key)).toEqual(keysBefore);
    const next = await again.index('notes').addDocuments([{ id: 2, text: 'new' }]);
    expect(next.taskUid).toBe((before.results[0]?.uid ?? NaN) + 1);
    await second.close();
  });

  it('drops a torn last line of the log and keeps what came before', async () => {
    const first = await start();
    await connect(first.url)
      .index('notes')
      .addDocuments([{ id: 1 }])
      .waitTask();
    await first.close();
    const [log = ''] = (await readdir(folder)).filter((name) => name.startsWith('log-'));
    const sound = await readFile(join(folder, log), 'utf8');
    await appendFile(join(folder, log), '{"kind":"task","task":{"uid":1,"ind');

    const second = await start();
    const client = connect(second.url);
    expect((await client.index('notes').getStats()).numberOfDocuments).toBe(1);
    expect(await readFile(join(folder, log), 'utf8')).toBe(sound);
    await client
      .index('notes')
      .addDocuments([{ id: 2 }])
      .waitTask();
    await second.close();

    const third = await start();
    expect((await connect(third.url).index('notes').getStats()).numberOfDocuments).toBe(2);
    await third.close();
  });

  it('sets aside files that are not what was written, and begins with an empty index', async () => {
    const write = async (ids: number[]): Promise<void> => {
      const engine = await start();
      const documents = ids.map((id) => ({ id, text: 'a bowl' }));
      await connect(engine.url).index('notes').addDocuments(documents).waitTask();
      await engine.close();
    };
    const damages: [name: string, damage: (text: string) => string][] = [
      // Still JSON, but another word: only the checksum tells.
      ['log-0.jsonl', (text) => text.replace('a bowl', 'a dish')],
      ['log-0.jsonl', (text) => text.replace(/^[^\n]*\n/, '')],
      ['snapshot.jsonl', (text) => text.replace('a bowl', 'a dish')],
      // The end is missing, whole lines of it.
      ['snapshot.jsonl', (text) => text.split('\n').slice(0, -2).join('\n')],
    ];
    for (const [name, damage] of damages) {
      await rm(folder, { recursive: true, force: true });
      await write([1, 2]);
      if (name === 'snapshot.jsonl') {
        const { state, storage } = await openStorage(folder, 1);
        await storage.compactIfLarge(state);
        await storage.close();
      }
      const path = join(folder, name);
      const sound = await readFile(path, 'utf8');
      await writeFile(path, damage(sound));

      const engine = await start();
      const client = connect(engine.url);
      expect([name, (await client.getIndexes()).results]).toEqual([name, []]);
      expect(await readFile(join(folder, 'damaged', name), 'utf8')).toBe(damage(sound));
      await client
        .index('notes')
        .addDocuments([{ id: 5 }])
        .waitTask();
      await engine.close();
      const again = await start();
      expect((await connect(again.url).index('notes').getStats()).numberOfDocuments).toBe(1);
      await again.close();
    }
  });

  it('gives the same state from a snapshot and the log after it as from the log alone', async () => {
    const first = await start();
    const index = connect(first.url).index('notes');
    await index.updateSettings({ stopWords: ['the'] }).waitTask();
    await index
      .addDocuments([
        { id: 2, text: 'two' },
        { id: 1, text: 'one' },
      ])
      .waitTask();
    await first.close();

    const opened = await openStorage(folder, 1);
    await opened.storage.compactIfLarge(opened.state);
    await opened.storage.close();
    expect((await readdir(folder)).sort()).toEqual(['log-1.jsonl', 'snapshot.jsonl']);

    const second = await start();
    const client = connect(second.url);
    await client
      .index('notes')
      .addDocuments([{ id: 3, text: 'three' }])
      .waitTask();
    await second.close();
    const third = await start();
    const again = connect(third.url).index<{ id: number }>('notes');
    expect((await again.search('')).hits.map((hit) => hit.id)).toEqual([2, 1, 3]);
    expect(await again.getStopWords()).toEqual(['the']);
    await third.close();
  });
});

describe('the program', () => {
  it('runs every acknowledged write after being killed without warning', async () => {
    const { url, child } = await launch();
    const client = connect(url);
    await client
      .index('notes')
      .addDocuments([{ id: 0 }])
      .waitTask();
    const texts = Array.from({ length: 400 }, (_, at) => ({
      id: at + 1,
      text: `word${at} `.repeat(60),
    }));
    const acknowledged = await Promise.all([
      client.index('notes').addDocuments(texts),
      client.index('notes').addDocuments([{ id: 1000 }]),
      client.index('notes').addDocuments([{ id: 1001 }]),
    ]);
    child.kill('SIGKILL');
    await exitOf(child);

    const after = await launch();
    const again = connect(after.url);
    for (const { taskUid } of acknowledged) {
      expect((await again.tasks.waitForTask(taskUid)).status).toBe('succeeded');
    }
    expect((await again.index('notes').getStats()).numberOfDocuments).toBe(403);
    expect(
      (await again.index<{ id: number }>('notes').search('"word399"')).hits.map((hit) => hit.id),
    ).toEqual([400]);
    after.child.kill('SIGTERM');
    expect(await exitOf(after.child)).toBe(0);
  }, 60_000);
});
