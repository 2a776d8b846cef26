import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Meilisearch, MeilisearchApiError, type Index, type MultiSearchParams } from 'meilisearch';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { startEngine, type RunningEngine } from '../../../../search/engine/start-engine.ts';

const MASTER_KEY = 'a-master-key-for-tests-only';

let folder: string;
let engine: RunningEngine;
let client: Meilisearch;

type Sheet = {
  id: number;
  title: string;
  body?: string;
  trouble?: string[];
  peakC?: number;
  place?: { name: string };
};

const SHEETS: Sheet[] = [
  {
    id: 1,
    title: 'Stalled at 680 with a wet blanket',
    body: 'The kiln stalls and the burner roars.',
    trouble: ['stall', 'Damp'],
    peakC: 680,
    place: { name: 'yard' },
  },
  {
    id: 2,
    title: 'Copper matt tea bowl',
    body: 'Fired quickly, then into sawdust.',
    trouble: ['dull'],
    peakC: 960,
  },
  { id: 3, title: 'Café sale', body: 'No kiln here. Bowls of tea, though.', trouble: [] },
  {
    id: 4,
    title: 'Saw dust and smoke',
    body: 'Sawdust smoulders; copper turned dull.',
    peakC: 900,
  },
];

async function codeOf(promise: Promise<unknown>): Promise<string | undefined> {
  try {
    await promise;
  } catch (error) {
    if (error instanceof MeilisearchApiError) return error.cause?.code;
    throw error;
  }
  return undefined;
}

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'engine-protocol-'));
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

async function filledIndex(uid: string): Promise<Index<Sheet>> {
  const index = client.index<Sheet>(uid);
  await index
    .updateSettings({
      searchableAttributes: ['title', 'body', 'place'],
      filterableAttributes: ['trouble', 'peakC', 'place'],
      sortableAttributes: ['peakC', 'title'],
    })
    .waitTask();
  await index.addDocuments(SHEETS).waitTask();
  return index;
}

describe('keys', () => {
  it('answers 401 without a key and 403 with an unknown one', async () => {
    const bare = await fetch(`${engine.url}/indexes`);
    expect(bare.status).toBe(401);
    expect(await bare.json()).toEqual({
      message: expect.any(String) as string,
      code: 'missing_authorization_header',
      type: 'auth',
      link: expect.stringContaining('missing_authorization_header') as string,
    });
    const stranger = new Meilisearch({ host: engine.url, apiKey: 'wrong' });
    expect(await codeOf(stranger.getIndexes())).toBe('invalid_api_key');
  });

  it('lists two derived keys, and the search key may search but not write', async () => {
    const { results } = await client.getKeys();
    const search = results.find((key) => key.name === 'Default Search API Key');
    const admin = results.find((key) => key.name === 'Default Admin API Key');
    expect(search?.actions).toEqual(['search']);
    expect(admin?.actions).toEqual(['*']);
    await filledIndex('keyed');
    const reader = new Meilisearch({ host: engine.url, apiKey: search?.key ?? '' });
    expect((await reader.index('keyed').search('copper')).hits).toHaveLength(2);
    expect(await codeOf(reader.index('keyed').addDocuments([{ wrong: true }]))).toBe(
      'invalid_api_key',
    );
  });

  it('checks the key before it reads the request', async () => {
    const answer = await fetch(`${engine.url}/indexes/x/documents`, {
      method: 'POST',
      headers: { Authorization: 'Bearer wrong', 'Content-Type': 'application/json' },
      body: '{ not json',
    });
    expect(answer.status).toBe(403);
  });

  it('keeps a restricted key to its actions and its indexes', async () => {
    await filledIndex('open_a');
    await filledIndex('closed_a');
    const key = await client.createKey({
      name: 'open only',
      actions: ['search', 'documents.*'],
      indexes: ['open_*'],
      expiresAt: null,
    });
    const limited = new Meilisearch({ host: engine.url, apiKey: key.key });
    expect((await limited.index('open_a').search('kiln')).hits.length).toBeGreaterThan(0);
    expect(await codeOf(limited.index('closed_a').search('kiln'))).toBe('invalid_api_key');
    expect(await codeOf(limited.index('open_a').updateSettings({}))).toBe('invalid_api_key');
    expect(
      await codeOf(
        limited.multiSearch({ queries: [{ indexUid: 'open_a' }, { indexUid: 'closed_a' }] }),
      ),
    ).toBe('invalid_api_key');
    await client.deleteKey(key.uid);
    expect(await codeOf(limited.index('open_a').search('kiln'))).toBe('invalid_api_key');
  });

  it('refuses a key whose time is over', async () => {
    const key = await client.createKey({
      actions: ['search'],
      indexes: ['*'],
      expiresAt: new Date(Date.now() + 60),
    });
    await new Promise((resolve) => setTimeout(resolve, 80));
    const late = new Meilisearch({ host: engine.url, apiKey: key.key });
    expect(await codeOf(late.index('keyed').search(''))).toBe('invalid_api_key');
  });
});

describe('tasks and indexes', () => {
  it('answers a write with an enqueued task and shows its effect once the task has succeeded', async () => {
    const enqueued = await client.createIndex('plain', { primaryKey: 'id' });
    expect(enqueued).toMatchObject({
      indexUid: 'plain',
      status: 'enqueued',
      type: 'indexCreation',
    });
    const task = await client.tasks.waitForTask(enqueued);
    expect(task).toMatchObject({ status: 'succeeded', error: null, details: { primaryKey: 'id' } });
    expect(task.duration).toMatch(/^PT[\d.]+S$/);
    expect((await client.getIndex('plain')).primaryKey).toBe('id');
  });

  it('reports faults of the data as failed tasks, not as answers', async () => {
    const again = await client.createIndex('plain').waitTask();
    expect(again.error?.code).toBe('index_already_exists');
    const missing = await client.deleteIndex('nowhere').waitTask();
    expect(missing.error?.code).toBe('index_not_found');
    const bad = await client
      .index('plain')
      .addDocuments([{ id: 1 }, { id: 'a b' }])
      .waitTask();
    expect(bad).toMatchObject({
      status: 'failed',
      details: { receivedDocuments: 2, indexedDocuments: 0 },
      error: { code: 'invalid_document_id', type: 'invalid_request' },
    });
    expect((await client.index('plain').getStats()).numberOfDocuments).toBe(0);
  });

  it('infers the primary key, and fails where none or several fit', async () => {
    const one = await client
      .index('infer_1')
      .addDocuments([{ noteId: 'a', text: 'x' }])
      .waitTask();
    expect(one.status).toBe('succeeded');
    expect((await client.getIndex('infer_1')).primaryKey).toBe('noteId');
    const none = await client
      .index('infer_2')
      .addDocuments([{ text: 'x' }])
      .waitTask();
    expect(none.error?.code).toBe('index_primary_key_no_candidate_found');
    const two = await client
      .index('infer_3')
      .addDocuments([{ id: 1, otherId: 2 }])
      .waitTask();
    expect(two.error?.code).toBe('index_primary_key_multiple_candidates_found');
  });

  it('lists tasks newest first, by page and by filter', async () => {
    const page = await client.tasks.getTasks({ limit: 2 });
    expect(page.results).toHaveLength(2);
    expect(page.results[0]?.uid).toBeGreaterThan(page.results[1]?.uid ?? Infinity);
    expect(page.next).toBe((page.results[1]?.uid ?? 0) - 1);
    const failed = await client.tasks.getTasks({ statuses: ['failed'], indexUids: ['infer_2'] });
    expect(failed.results.map((task) => task.indexUid)).toEqual(['infer_2']);
    expect(await codeOf(client.tasks.getTask(999_999))).toBe('task_not_found');
    const answer = await fetch(`${engine.url}/tasks?statuses=asleep`, {
      headers: { Authorization: `Bearer ${MASTER_KEY}` },
    });
    expect(await answer.json()).toMatchObject({ code: 'invalid_task_statuses' });
  });

  it('swaps the documents and settings of two indexes at once, or not at all', async () => {
    await client
      .index('left')
      .addDocuments([{ id: 1, side: 'left' }])
      .waitTask();
    await client
      .index('right')
      .addDocuments([{ id: 1, side: 'right' }])
      .waitTask();
    await client.swapIndexes([{ indexes: ['left', 'right'], rename: false }]).waitTask();
    expect((await client.index('left').search('')).hits).toEqual([{ id: 1, side: 'right' }]);
    const failed = await client
      .swapIndexes([
        { indexes: ['left', 'right'], rename: false },
        { indexes: ['plain', 'nowhere'], rename: false },
      ])
      .waitTask();
    expect(failed.error?.code).toBe('index_not_found');
    expect((await client.index('left').search('')).hits).toEqual([{ id: 1, side: 'right' }]);
    expect(await codeOf(client.swapIndexes([{ indexes: ['left', 'left'], rename: false }]))).toBe(
      'invalid_swap_duplicate_index_found',
    );
  });

  it('answers an unknown route with 404 and an empty body', async () => {
    const answer = await fetch(`${engine.url}/nothing/here`);
    expect(answer.status).toBe(404);
    expect(await answer.text()).toBe('');
  });

  it('is healthy without a key and tells a 1.x version with one', async () => {
    const bare = new Meilisearch({ host: engine.url });
    expect(await bare.health()).toEqual({ status: 'available' });
    expect((await client.getVersion()).pkgVersion).toMatch(/^1\./);
  });
});

describe('documents', () => {
  it('replaces with POST and merges top-level fields with PUT', async () => {
    const index = client.index('merge');
    await index.addDocuments([{ id: 1, a: 1, b: { c: 1, d: 2 } }]).waitTask();
    await index.updateDocuments([{ id: 1, b: { c: 3 } }]).waitTask();
    expect(await index.getDocument(1)).toEqual({ id: 1, a: 1, b: { c: 3 } });
    await index.addDocuments([{ id: '1', e: true }]).waitTask();
    expect(await index.getDocument('1')).toEqual({ id: '1', e: true });
  });

  it('fetches by filter, sort, fields and ids', async () => {
    const index = await filledIndex('fetch');
    const page = await index.getDocuments({
      filter: 'peakC > 600',
      sort: ['peakC:desc'],
      fields: ['id'],
      limit: 2,
    });
    expect(page).toEqual({ results: [{ id: 2 }, { id: 4 }], offset: 0, limit: 2, total: 3 });
    const some = await index.getDocuments({ ids: [3, 77, 1] });
    expect(some.results.map((sheet) => sheet.id)).toEqual([1, 3]);
    expect(await codeOf(index.getDocument(77))).toBe('document_not_found');
  });

  it('deletes one, a batch, by filter and all', async () => {
    const index = await filledIndex('deletion');
    expect((await index.deleteDocument(1).waitTask()).details).toMatchObject({
      deletedDocuments: 1,
    });
    expect((await index.deleteDocuments([1, 2]).waitTask()).details).toMatchObject({
      providedIds: 2,
      deletedDocuments: 1,
    });
    const filtered = await index.deleteDocuments({ filter: 'peakC = 900' }).waitTask();
    expect(filtered.details).toMatchObject({
      deletedDocuments: 1,
      originalFilter: '"peakC = 900"',
    });
    expect((await index.search('smoke')).hits).toEqual([]);
    expect((await index.search('')).hits.map((hit) => hit.id)).toEqual([3]);
    await index.deleteAllDocuments().waitTask();
    expect((await index.getStats()).numberOfDocuments).toBe(0);
    expect(await codeOf(index.deleteDocuments({ filter: '' }))).toBe('invalid_document_filter');
  });
});

describe('settings', () => {
  it('lists every default, merges patches and restores with null', async () => {
    const index = client.index('tuned');
    await index
      .updateSettings({ stopWords: ['the', 'a'], typoTolerance: { disableOnNumbers: true } })
      .waitTask();
    await index.updateTypoTolerance({ minWordSizeForTypos: { oneTypo: 6 } }).waitTask();
    const settings = await index.getSettings();
    expect(settings.stopWords).toEqual(['a', 'the']);
    expect(settings.typoTolerance).toEqual({
      enabled: true,
      minWordSizeForTypos: { oneTypo: 6, twoTypos: 9 },
      disableOnWords: [],
      disableOnAttributes: [],
      disableOnNumbers: true,
    });
    expect(settings.pagination).toEqual({ maxTotalHits: 1000 });
    await index.updateSettings({ stopWords: null }).waitTask();
    expect(await index.getStopWords()).toEqual([]);
    await index.resetTypoTolerance().waitTask();
    expect((await index.getTypoTolerance())?.disableOnNumbers).toBe(false);
  });

  it('refuses a wrong shape at once, by the name of the setting', async () => {
    const index = client.index('tuned');
    expect(await codeOf(index.updateRankingRules(['words', 'luck']))).toBe(
      'invalid_settings_ranking_rules',
    );
    expect(await codeOf(index.updateRankingRules(['attribute', 'attributeRank']))).toBe(
      'invalid_settings_ranking_rules',
    );
    expect(await codeOf(index.updatePagination({ maxTotalHits: -1 }))).toBe(
      'invalid_settings_pagination',
    );
  });
});

describe('searching', () => {
  let index: Index<Sheet>;
  const ids = async (query: string, options = {}): Promise<number[]> =>
    (await index.search(query, options)).hits.map((hit) => hit.id);

  beforeAll(async () => {
    index = await filledIndex('sheets');
  });
  beforeEach(async () => {
    await index.resetSynonyms().waitTask();
  });

  it('finds words whatever their accents, with typos by length, and by prefix on the last word', async () => {
    expect(await ids('cafe')).toEqual([3]);
    expect(await ids('coper')).toEqual([2, 4]);
    expect(await ids('kilm')).toEqual([]);
    expect(await ids('blan')).toEqual([1]);
    expect(await ids('blan ')).toEqual([]);
  });

  it('finds words written apart or together', async () => {
    expect(await ids('saw dust')).toEqual([4, 2]);
    expect(await ids('teabowl')).toEqual([2]);
  });

  it('keeps to phrases and leaves out excluded words', async () => {
    expect(await ids('"tea bowl"')).toEqual([2]);
    expect(await ids('copper -smoke')).toEqual([2]);
    expect(await ids('kiln -"no kiln"')).toEqual([1]);
  });

  it('drops words from the end unless told to need all', async () => {
    expect(await ids('copper smoke')).toEqual([4, 2]);
    expect(await ids('copper smoke', { matchingStrategy: 'all' })).toEqual([4]);
    expect(await ids('smoke copper', { matchingStrategy: 'last' })).toEqual([4]);
    expect(await ids('copper smoke', { matchingStrategy: 'frequency' })).toEqual([4]);
  });

  it('follows synonyms one way, also of several words', async () => {
    await index.updateSynonyms({ chawan: ['tea bowl'], 'no heat': ['stalled'] }).waitTask();
    expect(await ids('chawan')).toEqual([2]);
    expect(await ids('no heat', { matchingStrategy: 'all' })).toEqual([1]);
    expect(await ids('tea bowl', { matchingStrategy: 'all' })).toEqual([2, 3]);
  });

  it('filters by lists, ranges, presence and beginnings', async () => {
    expect(await ids('', { filter: 'trouble = damp' })).toEqual([1]);
    expect(await ids('', { filter: 'peakC 680 TO 900' })).toEqual([1, 4]);
    expect(
      await ids('', { filter: [['trouble = stall', 'trouble = dull'], 'peakC < 700'] }),
    ).toEqual([1]);
    expect(await ids('', { filter: 'trouble != stall' })).toEqual([2, 3, 4]);
    expect(await ids('', { filter: 'peakC NOT EXISTS' })).toEqual([3]);
    expect(await ids('', { filter: 'trouble IS EMPTY' })).toEqual([3]);
    expect(await ids('', { filter: 'trouble IN [dull, "stall"] AND NOT peakC > 700' })).toEqual([
      1,
    ]);
    expect(await ids('', { filter: 'trouble STARTS WITH du' })).toEqual([2]);
    expect(await ids('', { filter: 'place.name = yard' })).toEqual([1]);
  });

  it('names the place of a fault in a filter', async () => {
    const wrong = index.search('', { filter: 'colour = red' });
    await expect(wrong).rejects.toThrow(/`colour` is not filterable.*\n1:7 colour = red$/s);
    expect(await codeOf(index.search('', { filter: 'peakC >' }))).toBe('invalid_search_filter');
    expect(await codeOf(index.search('', { filter: '('.repeat(50_000) }))).toBe(
      'invalid_search_filter',
    );
    expect(await codeOf(index.search('', { filter: 'NOT '.repeat(20_000) + 'peakC = 1' }))).toBe(
      'invalid_search_filter',
    );
  });

  it('sorts by number with missing values last in both directions', async () => {
    expect(await ids('', { sort: ['peakC:asc'] })).toEqual([1, 4, 2, 3]);
    expect(await ids('', { sort: ['peakC:desc'] })).toEqual([2, 4, 1, 3]);
    expect(await codeOf(index.search('', { sort: ['body:asc'] }))).toBe('invalid_search_sort');
  });

  it('counts facets over all matches, not the page', async () => {
    const answer = await index.search('', { facets: ['trouble', 'peakC'], limit: 1 });
    expect(answer.facetDistribution).toEqual({
      trouble: { Damp: 1, dull: 1, stall: 1 },
      peakC: { 680: 1, 900: 1, 960: 1 },
    });
    expect(answer.facetStats).toEqual({ peakC: { min: 680, max: 960 } });
    const found = await index.searchForFacetValues({ facetName: 'trouble', facetQuery: 'du' });
    expect(found.facetHits).toEqual([{ value: 'dull', count: 1 }]);
  });

  it('pages by offset or by page number', async () => {
    expect(await index.search('', { offset: 1, limit: 2 })).toMatchObject({
      offset: 1,
      limit: 2,
      estimatedTotalHits: 4,
    });
    const paged = await index.search('', { page: 2, hitsPerPage: 3 });
    expect(paged).toMatchObject({ page: 2, hitsPerPage: 3, totalPages: 2, totalHits: 4 });
    expect(paged.hits).toHaveLength(1);
    expect(await codeOf(index.search('', { limit: 1e20 }))).toBe('invalid_search_limit');
    expect((await index.search('', { limit: Number.MAX_SAFE_INTEGER })).hits).toHaveLength(4);
  });

  it('highlights, crops and tells positions in bytes', async () => {
    const answer = await index.search('sawd', {
      attributesToRetrieve: ['id'],
      attributesToHighlight: ['body'],
      attributesToCrop: ['body:3'],
      showMatchesPosition: true,
      filter: 'peakC = 960',
    });
    expect(answer.hits[0]).toMatchObject({
      id: 2,
      _formatted: { id: '2', body: '…then into <em>sawd</em>ust.' },
      _matchesPosition: { body: [{ start: 25, length: 4 }] },
    });
  });

  it('scores between 0 and 1 in the order of the hits', async () => {
    const { hits } = await index.search('copper dull', {
      showRankingScore: true,
      showRankingScoreDetails: true,
    });
    const scores = hits.map((hit) => hit._rankingScore ?? NaN);
    expect(scores).toEqual([...scores].sort((a, b) => b - a));
    expect(Math.max(...scores)).toBeLessThanOrEqual(1);
    expect(hits[0]?._rankingScoreDetails).toMatchObject({
      words: { order: 0, matchingWords: 2, maxMatchingWords: 2, score: 1 },
    });
    const strict = await index.search('copper dull', { rankingScoreThreshold: 0.9 });
    expect(strict.estimatedTotalHits).toBeLessThan(2);
  });

  it('answers several searches at once, in their order, and the same by GET as by POST', async () => {
    const { results } = await client.multiSearch<MultiSearchParams, Sheet>({
      queries: [
        { indexUid: 'sheets', q: 'copper' },
        { indexUid: 'sheets', filter: 'peakC = 680' },
      ],
    });
    expect(results.map((result) => result.hits.map((hit) => hit.id))).toEqual([[2, 4], [1]]);
    expect((await index.searchGet('copper', { filter: 'peakC = 900' })).hits).toHaveLength(1);
    expect(await client.multiSearch({ queries: [] })).toEqual({ results: [] });
  });

  it('refuses malformed bodies with 4xx and goes on', async () => {
    const send = (body: string): Promise<Response> =>
      fetch(`${engine.url}/indexes/sheets/search`, {
        method: 'POST',
        headers: { Authorization: `Bearer ${MASTER_KEY}`, 'Content-Type': 'application/json' },
        body,
      });
    const codes = await Promise.all(
      ['{', '[1]', '{"q":5}', '{"unknown":1}', '{"filter":[[["a"]]]}', '{"page":-1}'].map(
        async (body) => {
          const answer = await send(body);
          expect(answer.status).toBe(400);
          return ((await answer.json()) as { code: string }).code;
        },
      ),
    );
    expect(codes).toEqual([
      'malformed_payload',
      'bad_request',
      'invalid_search_q',
      'bad_request',
      'invalid_search_filter',
      'invalid_search_page',
    ]);
    expect(await ids('copper')).toEqual([2, 4]);
  });

  it('refuses documents nested without end, and still runs the writes that follow', async () => {
    const answer = await fetch(`${engine.url}/indexes/deep/documents`, {
      method: 'POST',
      headers: { Authorization: `Bearer ${MASTER_KEY}`, 'Content-Type': 'application/json' },
      body: `[{"id":1,"a":${'['.repeat(100_000)}${']'.repeat(100_000)}}]`,
    });
    expect(answer.status).toBe(400);
    expect(await answer.json()).toMatchObject({ code: 'malformed_payload' });
    const next = await client
      .index('deep')
      .addDocuments([{ id: 1 }])
      .waitTask();
    expect(next.status).toBe('succeeded');
  });

  it('answers strange addresses like unknown routes', async () => {
    for (const path of ['//', '/%zz', '/indexes/a/b/c/d']) {
      expect((await fetch(engine.url + path)).status).toBe(404);
    }
  });
});
