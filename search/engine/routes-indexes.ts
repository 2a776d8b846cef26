import type { StoredIndex } from './engine-state.ts';
import type { Engine } from './engine.ts';
import { EngineError, indexNotFound } from './errors.ts';
import type { Route } from './http-route.ts';
import { describeJson, isJsonObject, isStringArray, type Json, type JsonObject } from './json.ts';
import { invalidApiKey, mayUseIndex } from './keys.ts';
import { pageOf, readPage } from './paging.ts';
import { enqueueTask } from './task-queue.ts';
import { presentEnqueued, type Swap } from './tasks.ts';

const INDEX_UID = /^[a-zA-Z0-9_-]{1,400}$/;

export function checkIndexUid(uid: string): string {
  if (INDEX_UID.test(uid)) return uid;
  throw new EngineError(
    'invalid_index_uid',
    `\`${uid}\` is not a valid index uid. Index uid can be an integer or a string containing only alphanumeric characters, hyphens (-) and underscores (_), and can not be more than 512 bytes.`,
  );
}

export function storedIndex(engine: Engine, uid: string | undefined): StoredIndex {
  const index = engine.state.indexes.get(checkIndexUid(uid ?? ''));
  if (index === undefined) throw indexNotFound(uid ?? '');
  return index;
}

function presentIndex({ uid, createdAt, updatedAt, primaryKey }: StoredIndex): JsonObject {
  return { uid, createdAt, updatedAt, primaryKey };
}

export function indexStats(engine: Engine, uid: string): JsonObject {
  const stored = storedIndex(engine, uid);
  const searched = engine.searchIndexes.get(uid);
  const isIndexing = [...engine.state.payloads.keys()].some((task) => {
    const { status, indexUid } = engine.state.tasks.get(task) ?? {};
    return status === 'processing' && indexUid === uid;
  });
  const fields = [...(searched?.fieldCounts ?? [])].sort(([a], [b]) => (a < b ? -1 : 1));
  const numberOfDocuments = stored.documents.size;
  const rawDocumentDbSize = numberOfDocuments === 0 ? 0 : (searched?.sourceBytes ?? 0);
  return {
    numberOfDocuments,
    rawDocumentDbSize,
    avgDocumentSize:
      numberOfDocuments === 0 ? 0 : Math.floor(rawDocumentDbSize / numberOfDocuments),
    isIndexing,
    numberOfEmbeddings: 0,
    numberOfEmbeddedDocuments: 0,
    fieldDistribution: Object.fromEntries(fields),
  };
}

function bodyObject(body: Json | undefined, known: readonly string[]): JsonObject {
  if (body === undefined) throw new EngineError('missing_payload', 'A json payload is missing.');
  if (!isJsonObject(body)) {
    throw new EngineError(
      'bad_request',
      `Invalid value type: expected an object, but found ${describeJson(body)}`,
    );
  }
  for (const key of Object.keys(body)) {
    if (!known.includes(key)) {
      const names = known.map((name) => `\`${name}\``).join(', ');
      throw new EngineError('bad_request', `Unknown field \`${key}\`: expected one of ${names}`);
    }
  }
  return body;
}

function optionalText(body: JsonObject, name: string, code: string): string | null {
  const value = body[name] ?? null;
  if (value !== null && typeof value !== 'string') {
    throw new EngineError(
      code,
      `Invalid value type at \`.${name}\`: expected a string, but found ${describeJson(value)}`,
    );
  }
  return value;
}

/** Reads the pairs of a swap, and refuses any index that is named twice. */
function readSwaps(body: Json | undefined): Swap[] {
  if (!Array.isArray(body)) {
    throw new EngineError(
      'bad_request',
      `Invalid value type: expected an array, but found ${describeJson(body)}`,
    );
  }
  const named = new Set<string>();
  return body.map((entry) => {
    const { indexes, rename = false } = bodyObject(entry, ['indexes', 'rename']);
    if (indexes === undefined) {
      throw new EngineError('missing_swap_indexes', 'Missing field `indexes`');
    }
    if (!isStringArray(indexes) || indexes.length !== 2 || typeof rename !== 'boolean') {
      throw new EngineError(
        'invalid_swap_indexes',
        'Two indexes must be given for each swap. The list `indexes` should contain 2 indexes.',
      );
    }
    const [first = '', second = ''] = indexes.map(checkIndexUid);
    for (const uid of [first, second]) {
      if (named.has(uid)) {
        throw new EngineError(
          'invalid_swap_duplicate_index_found',
          `Indexes must be declared only once during a swap. \`${uid}\` was specified several times.`,
        );
      }
      named.add(uid);
    }
    return { indexes: [first, second], rename };
  });
}

export const indexRoutes: readonly Route[] = [
  {
    method: 'GET',
    path: '/indexes',
    action: 'indexes.get',
    handle: ({ engine, access, query }) => {
      const visible = [...engine.state.indexes.values()]
        .filter((index) => mayUseIndex(access, index.uid))
        .sort((a, b) => (a.uid < b.uid ? -1 : 1));
      return { status: 200, body: pageOf(visible, readPage(query, 'index'), presentIndex) };
    },
  },
  {
    method: 'POST',
    path: '/indexes',
    action: 'indexes.create',
    handle: async ({ engine, access, body }) => {
      const fields = bodyObject(body, ['uid', 'primaryKey']);
      const uid = optionalText(fields, 'uid', 'invalid_index_uid');
      if (uid === null) throw new EngineError('missing_index_uid', 'Missing field `uid`');
      checkIndexUid(uid);
      if (!mayUseIndex(access, uid)) throw invalidApiKey();
      const primaryKey = optionalText(fields, 'primaryKey', 'invalid_index_primary_key');
      const task = await enqueueTask(engine, uid, { type: 'indexCreation', primaryKey });
      return { status: 202, body: presentEnqueued(task) };
    },
  },
  {
    method: 'GET',
    path: '/indexes/:indexUid',
    action: 'indexes.get',
    handle: ({ engine, params }) => ({
      status: 200,
      body: presentIndex(storedIndex(engine, params['indexUid'])),
    }),
  },
  {
    method: 'PATCH',
    path: '/indexes/:indexUid',
    action: 'indexes.update',
    handle: async ({ engine, access, params, body }) => {
      const uid = checkIndexUid(params['indexUid'] ?? '');
      const fields = bodyObject(body, ['uid', 'primaryKey']);
      const primaryKey = optionalText(fields, 'primaryKey', 'invalid_index_primary_key');
      const newUid = optionalText(fields, 'uid', 'invalid_index_uid');
      if (newUid !== null) {
        checkIndexUid(newUid);
        if (!mayUseIndex(access, newUid)) throw invalidApiKey();
      }
      const task = await enqueueTask(engine, uid, { type: 'indexUpdate', primaryKey, newUid });
      return { status: 202, body: presentEnqueued(task) };
    },
  },
  {
    method: 'DELETE',
    path: '/indexes/:indexUid',
    action: 'indexes.delete',
    handle: async ({ engine, params }) => {
      const uid = checkIndexUid(params['indexUid'] ?? '');
      const task = await enqueueTask(engine, uid, { type: 'indexDeletion' });
      return { status: 202, body: presentEnqueued(task) };
    },
  },
  {
    method: 'GET',
    path: '/indexes/:indexUid/stats',
    action: 'stats.get',
    handle: ({ engine, params }) => ({
      status: 200,
      body: indexStats(engine, params['indexUid'] ?? ''),
    }),
  },
  {
    method: 'POST',
    path: '/swap-indexes',
    action: 'indexes.swap',
    handle: async ({ engine, access, body }) => {
      const swaps = readSwaps(body);
      if (swaps.some(({ indexes }) => !indexes.every((uid) => mayUseIndex(access, uid)))) {
        throw invalidApiKey();
      }
      const task = await enqueueTask(engine, null, { type: 'indexSwap', swaps });
      return { status: 202, body: presentEnqueued(task) };
    },
  },
];
