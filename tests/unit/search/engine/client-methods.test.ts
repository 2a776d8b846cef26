import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Meilisearch, MeilisearchApiError } from 'meilisearch';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startEngine, type RunningEngine } from '../../../../search/engine/start-engine.ts';

/** Every method of the official client that the application uses, and those beside them. */
const MASTER_KEY = 'a-master-key-for-tests-only';

let folder: string;
let engine: RunningEngine;
let client: Meilisearch;

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'engine-client-'));
  engine = await startEngine({
    host: '127.0.0.1',
    port: 0,
    masterKey: MASTER_KEY,
    dataDir: folder,
  });
  client = new Meilisearch({ host: engine.url, apiKey: MASTER_KEY });
});

afterAll(async () => {
  await engine.close();
  await rm(folder, { recursive: true, force: true });
});

async function refusalOf(promise: Promise<unknown>): Promise<[number, string | undefined]> {
  try {
    await promise;
  } catch (error) {
    if (error instanceof MeilisearchApiError) return [error.response.status, error.cause?.code];
    throw error;
  }
  throw new Error('It was not refused.');
}

const send = (path: string, init: RequestInit = {}): Promise<Response> =>
  fetch(engine.url + path, {
    ...init,
    headers: { Authorization: `Bearer ${MASTER_KEY}`, 'Content-Type': 'application/json' },
  });

describe('indexes', () => {
  it('are made, listed by page, changed, renamed and deleted', async () => {
    for (const uid of ['a_one', 'a_two', 'a_three']) await client.createIndex(uid).waitTask();
    const page = await client.getRawIndexes({ limit: 2, offset: 1 });
    expect([page.limit, page.offset, page.results.length]).toEqual([2, 1, 2]);
    expect(page.total).toBe((await client.getIndexes({ limit: 100 })).results.length);
    expect(Object.keys(page.results[0] ?? {}).sort()).toEqual([
      'createdAt',
      'primaryKey',
      'uid',
      'updatedAt',
    ]);
    await client.updateIndex('a_one', { primaryKey: 'sku' }).waitTask();
    expect((await client.getRawIndex('a_one')).primaryKey).toBe('sku');
    expect(await client.index('a_one').fetchPrimaryKey()).toBe('sku');
    await client.updateIndex('a_one', { uid: 'a_renamed' }).waitTask();
    expect((await client.index('a_renamed').getRawInfo()).uid).toBe('a_renamed');
    expect(await refusalOf(client.getIndex('a_one'))).toEqual([404, 'index_not_found']);
    expect(await client.deleteIndexIfExists('a_two')).toBe(true);
    const gone = await client.deleteIndex('a_renamed').waitTask();
    expect(gone.details).toEqual({ deletedDocuments: 0 });
  });

  it('refuse a bad name at once, and tell in the task what is wrong with the data', async () => {
    expect(await refusalOf(client.createIndex('not a name'))).toEqual([400, 'invalid_index_uid']);
    await client.createIndex('b').waitTask();
    const twice = await client.createIndex('b').waitTask();
    expect([twice.status, twice.error?.code]).toEqual(['failed', 'index_already_exists']);
    expect(Object.keys(twice.error ?? {}).sort()).toEqual(['code', 'link', 'message', 'type']);
    const missing = await client.deleteIndex('b_missing').waitTask();
    expect(missing.error?.code).toBe('index_not_found');
    await client
      .index('b')
      .addDocuments([{ id: 1 }])
      .waitTask();
    const changed = await client.updateIndex('b', { primaryKey: 'other' }).waitTask();
    expect(changed.error?.code).toBe('index_primary_key_already_exists');
  });

  it('swap with a new name where that is asked for', async () => {
    await client
      .index('c_old')
      .addDocuments([{ id: 1, text: 'kept' }])
      .waitTask();
    await client.swapIndexes([{ indexes: ['c_old', 'c_fresh'], rename: true }]).waitTask();
    expect((await client.index('c_fresh').search('kept')).hits).toHaveLength(1);
    expect(await refusalOf(client.getIndex('c_old'))).toEqual([404, 'index_not_found']);
    const short = await send('/swap-indexes', { method: 'POST', body: '[{"indexes":["b"]}]' });
    expect(await short.json()).toMatchObject({ code: 'invalid_swap_indexes' });
  });
});

describe('tasks', () => {
  it('are enqueued with exactly five facts and never done inside their own request', async () => {
    const enqueued = await client.index('t').addDocuments([{ id: 1 }]);
    expect(Object.keys(enqueued).sort()).toEqual([
      'enqueuedAt',
      'indexUid',
      'status',
      'taskUid',
      'type',
    ]);
    await expect(
      client
        .index('t')
        .addDocuments([{ id: 2 }])
        .waitTask({ timeout: 1, interval: 1 }),
    ).rejects.toThrow(/timeout/);
    const task = await client.tasks.waitForTask(enqueued.taskUid);
    expect(Object.keys(task).sort()).toEqual([
      'batchUid',
      'canceledBy',
      'details',
      'duration',
      'enqueuedAt',
      'error',
      'finishedAt',
      'indexUid',
      'startedAt',
      'status',
      'type',
      'uid',
    ]);
    expect(task.details).toEqual({ receivedDocuments: 1, indexedDocuments: 1 });
  });

  it('store nothing when one document is bad', async () => {
    const bad = await client
      .index('t_bad')
      .addDocuments([{ id: 1 }, { id: 'not an id!' }])
      .waitTask();
    expect([bad.status, bad.error?.code, bad.details]).toEqual([
      'failed',
      'invalid_document_id',
      { receivedDocuments: 2, indexedDocuments: 0 },
    ]);
    expect(await refusalOf(client.index('t_bad').getStats())).toEqual([404, 'index_not_found']);
    const keyless = await client
      .index('t')
      .addDocuments([{ name: 'x' }])
      .waitTask();
    expect(keyless.error?.code).toBe('missing_document_id');
  });

  it('are cancelled, deleted and filtered by what they are', async () => {
    const first = await client
      .index('t')
      .addDocuments(
        Array.from({ length: 3000 }, (_, id) => ({ id, text: `one two three ${String(id)}` })),
      );
    const waiting = await client.index('t').addDocuments([{ id: 9999 }]);
    const cancelled = await client.tasks.cancelTasks({ uids: [waiting.taskUid] }).waitTask();
    expect(cancelled).toMatchObject({
      type: 'taskCancelation',
      indexUid: null,
      details: { matchedTasks: 1, originalFilter: `?uids=${String(waiting.taskUid)}` },
    });
    await client.tasks.waitForTask(first.taskUid);
    const { canceledBy, status } = await client.tasks.getTask(waiting.taskUid);
    expect([status, canceledBy]).toEqual(['canceled', cancelled.uid]);
    const listed = await client.tasks.getTasks({ canceledBy: [cancelled.uid] });
    expect(listed.results.map(({ uid }) => uid)).toEqual([waiting.taskUid]);
    const deleted = await client.tasks.deleteTasks({ uids: [waiting.taskUid] }).waitTask();
    expect(deleted.details).toMatchObject({ matchedTasks: 1, deletedTasks: 1 });
    expect(await refusalOf(client.tasks.getTask(waiting.taskUid))).toEqual([404, 'task_not_found']);
    const future = await client.tasks.getTasks({
      afterEnqueuedAt: new Date(Date.now() + 60_000).toISOString(),
    });
    expect(future).toMatchObject({ results: [], total: 0, from: null, next: null });
    const oldest = await client.tasks.getTasks({ reverse: true, limit: 1 });
    expect(oldest.results[0]?.uid).toBe(0);
    for (const [query, code] of [
      ['types=luck', 'invalid_task_types'],
      ['uids=x', 'invalid_task_uids'],
      ['canceledBy=x', 'invalid_task_canceled_by'],
      ['beforeEnqueuedAt=x', 'invalid_task_before_enqueued_at'],
      ['limit=x', 'invalid_task_limit'],
      ['from=x', 'invalid_task_from'],
    ]) {
      const answer = await send(`/tasks?${query ?? ''}`);
      expect([answer.status, ((await answer.json()) as { code: string }).code]).toEqual([
        400,
        code,
      ]);
    }
    const all = await send('/tasks', { method: 'DELETE' });
    expect(await all.json()).toMatchObject({ code: 'missing_task_filters' });
  });
});

describe('documents', () => {
  it('arrive in batches, as lines, and merged', async () => {
    const index = client.index<{ id: number; a?: number; b?: number }>('d');
    const rows = Array.from({ length: 5 }, (_, id) => ({ id, a: id }));
    for (const task of index.addDocumentsInBatches(rows, 2)) await task.waitTask();
    const merged = rows.map(({ id }) => ({ id, b: 1 }));
    for (const task of index.updateDocumentsInBatches(merged, 3)) await task.waitTask();
    expect(await index.getDocument(4)).toEqual({ id: 4, a: 4, b: 1 });
    await index
      .addDocumentsFromString('{"id":10}\n{"id":11,"a":3}\n', 'application/x-ndjson')
      .waitTask();
    await index.updateDocumentsFromString('[{"id":11,"b":4}]', 'application/json').waitTask();
    expect(await index.getDocument(11, { fields: ['a', 'b'] })).toEqual({ a: 3, b: 4 });
    const skipped = await index.updateDocuments([{ id: 77, b: 1 }], { skipCreation: true });
    await client.tasks.waitForTask(skipped.taskUid);
    expect(await refusalOf(index.getDocument(77))).toEqual([404, 'document_not_found']);
    expect((await index.getStats()).fieldDistribution).toEqual({ a: 6, b: 6, id: 7 });
    const again = await index.deleteDocument(77).waitTask();
    expect([again.status, again.details]).toMatchObject(['succeeded', { deletedDocuments: 0 }]);
    expect(await refusalOf(index.getDocuments({ filter: 'a > 1' }))).toEqual([
      400,
      'invalid_document_filter',
    ]);
    expect(await refusalOf(index.getDocuments({ sort: ['a:asc'] }))).toEqual([
      400,
      'invalid_document_sort',
    ]);
  });

  it('lose the pairing inside a list of objects, and keep null out of the words', async () => {
    const index = client.index<{ id: number; stalls: unknown[]; note: string | null }>('d_nested');
    await index.updateFilterableAttributes(['stalls.c', 'stalls.minutes', 'note']).waitTask();
    await index
      .addDocuments([
        {
          id: 1,
          stalls: [
            { c: 700, minutes: 5 },
            { c: 715, minutes: 40 },
          ],
          note: null,
        },
        { id: 2, stalls: [], note: '' },
      ])
      .waitTask();
    const ids = async (filter: string): Promise<number[]> =>
      (await index.search('', { filter })).hits.map((hit) => hit.id);
    expect(await ids('stalls.c = 700 AND stalls.minutes > 30')).toEqual([1]);
    expect(await ids('note IS NULL')).toEqual([1]);
    expect(await ids('note IS EMPTY')).toEqual([2]);
    expect(await ids('note EXISTS')).toEqual([1, 2]);
    expect((await index.search('null')).hits).toEqual([]);
  });
});

describe('settings', () => {
  const VALUES: [name: string, value: unknown, fallback: unknown][] = [
    ['Synonyms', { pot: ['bowl'] }, {}],
    ['StopWords', ['a', 'the'], []],
    ['RankingRules', ['words', 'typo'], null],
    ['DistinctAttribute', 'kind', null],
    ['FilterableAttributes', ['kind', 'peak'], []],
    ['SortableAttributes', ['peak'], []],
    ['SearchableAttributes', ['title', 'body'], ['*']],
    ['DisplayedAttributes', ['title'], ['*']],
    ['Pagination', { maxTotalHits: 50 }, { maxTotalHits: 1000 }],
    ['SeparatorTokens', ['&sep'], []],
    ['NonSeparatorTokens', ['#'], []],
    ['Dictionary', ['J. R.'], []],
    ['ProximityPrecision', 'byAttribute', 'byWord'],
    ['SearchCutoffMs', 150, null],
    ['FacetSearch', false, true],
    ['PrefixSearch', 'disabled', 'indexingTime'],
  ];

  it.each(VALUES)('%s is told, kept and restored', async (name, value, fallback) => {
    const index = client.index('s') as unknown as Record<
      string,
      (value?: unknown) => Promise<unknown> & { waitTask: () => Promise<{ status: string }> }
    >;
    await client.createIndex('s').waitTask();
    const before = await index[`get${name}`]?.();
    if (fallback !== null || name !== 'RankingRules') expect(before).toEqual(fallback);
    expect((await index[`update${name}`]?.(value).waitTask())?.status).toBe('succeeded');
    expect(await index[`get${name}`]?.()).toEqual(value);
    expect((await index[`reset${name}`]?.().waitTask())?.status).toBe('succeeded');
    expect(await index[`get${name}`]?.()).toEqual(before);
  });

  it('are merged where they are objects, and listed whole', async () => {
    const index = client.index('s_all');
    await index.updateFaceting({ sortFacetValuesBy: { kind: 'count' } }).waitTask();
    expect(await index.getFaceting()).toEqual({
      maxValuesPerFacet: 100,
      sortFacetValuesBy: { '*': 'alpha', kind: 'count' },
    });
    await index.resetFaceting().waitTask();
    expect(await index.getSettings()).toEqual({
      displayedAttributes: ['*'],
      searchableAttributes: ['*'],
      filterableAttributes: [],
      sortableAttributes: [],
      rankingRules: [
        'words',
        'typo',
        'proximity',
        'attributeRank',
        'sort',
        'wordPosition',
        'exactness',
      ],
      stopWords: [],
      synonyms: {},
      distinctAttribute: null,
      typoTolerance: {
        enabled: true,
        minWordSizeForTypos: { oneTypo: 5, twoTypos: 9 },
        disableOnWords: [],
        disableOnAttributes: [],
        disableOnNumbers: false,
      },
      faceting: { maxValuesPerFacet: 100, sortFacetValuesBy: { '*': 'alpha' } },
      pagination: { maxTotalHits: 1000 },
      separatorTokens: [],
      nonSeparatorTokens: [],
      dictionary: [],
      searchCutoffMs: null,
      embedders: {},
      localizedAttributes: null,
      proximityPrecision: 'byWord',
      facetSearch: true,
      prefixSearch: 'indexingTime',
    });
    await index.updateSettings({ stopWords: ['x'] }).waitTask();
    await index.resetSettings().waitTask();
    expect(await index.getStopWords()).toEqual([]);
  });
});

describe('keys and the server', () => {
  it('make, list, change and delete keys', async () => {
    const made = await client.createKey({
      uid: '0e2a4c4f-6a5a-4a60-9b3f-3a8f6f0b7d11',
      name: 'reader',
      actions: ['search'],
      indexes: ['notes'],
      expiresAt: null,
    });
    expect(await client.getKey(made.uid)).toEqual(made);
    expect(await client.getKey(made.key)).toEqual(made);
    const changed = await client.updateKey(made.uid, { description: 'reads' });
    expect([changed.description, changed.name]).toEqual(['reads', 'reader']);
    const page = await client.getKeys({ limit: 1, offset: 1 });
    expect([page.limit, page.offset, page.results.length]).toEqual([1, 1, 1]);
    const refused = await send(`/keys/${made.uid}`, { method: 'PATCH', body: '{"actions":["*"]}' });
    expect(await refused.json()).toMatchObject({ code: 'immutable_api_key_actions' });
    const wrong = { actions: ['luck'], indexes: ['*'], expiresAt: null } as never;
    expect(await refusalOf(client.createKey(wrong))).toEqual([400, 'invalid_api_key_actions']);
    await client.deleteKey(made.uid);
    expect(await refusalOf(client.getKey(made.uid))).toEqual([404, 'api_key_not_found']);
  });

  it('tell health, version and statistics', async () => {
    expect(await client.isHealthy()).toBe(true);
    expect(Object.keys(await client.getVersion()).sort()).toEqual([
      'commitDate',
      'commitSha',
      'pkgVersion',
    ]);
    const stats = await client.getStats();
    expect(Object.keys(stats).sort()).toEqual([
      'databaseSize',
      'indexes',
      'lastUpdate',
      'usedDatabaseSize',
    ]);
    expect(Object.keys(stats.indexes['d'] ?? {}).sort()).toEqual([
      'avgDocumentSize',
      'fieldDistribution',
      'isIndexing',
      'numberOfDocuments',
      'numberOfEmbeddedDocuments',
      'numberOfEmbeddings',
      'rawDocumentDbSize',
    ]);
  });
});
