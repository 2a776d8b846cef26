import type { StoredIndex } from './engine-state.ts';
import { createSelector } from './attribute-selection.ts';
import type { Engine } from './engine.ts';
import { EngineError } from './errors.ts';
import { compileFilter } from './filter-compile.ts';
import { filterTarget } from './filter-target.ts';
import type { Route, RouteAnswer, RouteRequest } from './http-route.ts';
import { describeJson, isJsonObject, isStringArray, type Json, type JsonObject } from './json.ts';
import { documentsAllowed } from './live-documents.ts';
import { readCount } from './paging.ts';
import { normaliseId } from './primary-key.ts';
import { checkIndexUid, storedIndex } from './routes-indexes.ts';
import { arrivalOrder } from './search-index.ts';
import { compareSortKeys, parseSort, sortKey } from './sort.ts';
import { enqueueTask } from './task-queue.ts';
import { presentEnqueued, type DeletionTarget } from './tasks.ts';

function readDocuments(body: Json | undefined): JsonObject[] {
  if (body === undefined) throw new EngineError('missing_payload', 'A json payload is missing.');
  const list = Array.isArray(body) ? body : [body];
  return list.map((item) => {
    if (isJsonObject(item)) return item;
    throw new EngineError(
      'malformed_payload',
      `The \`json\` payload provided is malformed. A document must be an object, but found ${describeJson(item)}.`,
    );
  });
}

async function addDocuments(
  { engine, params, query, body }: RouteRequest,
  merge: boolean,
): Promise<RouteAnswer> {
  const uid = checkIndexUid(params['indexUid'] ?? '');
  const task = await enqueueTask(
    engine,
    uid,
    {
      type: 'documentAdditionOrUpdate',
      merge,
      primaryKey: query.get('primaryKey'),
      documents: readDocuments(body),
      skipCreation: query.get('skipCreation') === 'true',
    },
    query.get('customMetadata'),
  );
  return { status: 202, body: presentEnqueued(task) };
}

async function deleteDocuments(
  { engine, params, query }: RouteRequest,
  target: DeletionTarget,
): Promise<RouteAnswer> {
  const uid = checkIndexUid(params['indexUid'] ?? '');
  const payload = { type: 'documentDeletion', target } as const;
  const task = await enqueueTask(engine, uid, payload, query.get('customMetadata'));
  return { status: 202, body: presentEnqueued(task) };
}

function readId(value: Json): string {
  const id = normaliseId(value);
  if (id !== undefined) return id;
  throw new EngineError(
    'invalid_document_id',
    `Document identifier \`${JSON.stringify(value).slice(0, 200)}\` is invalid. A document identifier can be of type integer or string, only composed of alphanumeric characters (a-z A-Z 0-9), hyphens (-) and underscores (_), and can not be more than 511 bytes.`,
  );
}

function readDeletionFilter(body: Json | undefined): Json {
  const filter = isJsonObject(body) ? (body['filter'] ?? null) : null;
  if (filter === null) {
    throw new EngineError('missing_document_filter', 'Missing field `filter`');
  }
  const isEmpty =
    (typeof filter === 'string' && filter.trim() === '') ||
    (Array.isArray(filter) && filter.flat().length === 0);
  if (isEmpty) {
    throw new EngineError('invalid_document_filter', 'Sending an empty filter is forbidden.');
  }
  // Only the grammar is checked here; which attributes are filterable may change before it runs.
  compileFilter(filter, {
    code: 'invalid_document_filter',
    indexUid: '',
    filterable: [],
    isFilterable: () => true,
    allowsComparison: () => true,
  });
  return filter;
}

function readNames(value: Json | undefined, name: string): string[] | null {
  if (value === undefined || value === null) return null;
  if (typeof value === 'string') return value === '' ? [] : value.split(',');
  if (isStringArray(value)) return value;
  throw new EngineError(
    `invalid_document_${name}`,
    `Invalid value type at \`.${name}\`: expected an array, but found ${describeJson(value)}`,
  );
}

function readIds(value: Json | undefined): Set<string> | null {
  if (value === undefined || value === null) return null;
  const list: Json[] =
    typeof value === 'string' ? value.split(',') : Array.isArray(value) ? value : [];
  return new Set(list.map(readId));
}

/** Documents of an index in order of arrival, or as asked for. */
function fetchDocuments(engine: Engine, stored: StoredIndex, body: JsonObject): JsonObject {
  const index = engine.searchIndexes.get(stored.uid);
  if (index === undefined) return { results: [], offset: 0, limit: 20, total: 0 };
  const offset = readCount(body['offset'], 'offset', 'invalid_document_offset') ?? 0;
  const limit = readCount(body['limit'], 'limit', 'invalid_document_limit') ?? 20;
  const select = createSelector(readNames(body['fields'], 'fields') ?? ['*']);
  const sort = parseSort(readNames(body['sort'], 'sort') ?? [], index, 'invalid_document_sort');
  const ids = readIds(body['ids']);
  const target = filterTarget(index.settings, stored.uid, 'invalid_document_filter');
  const allowed = documentsAllowed(index, compileFilter(body['filter'], target));
  const numbers = [...arrivalOrder(index)].filter(
    (number) => allowed[number] && (ids === null || ids.has(index.documents[number]?.id ?? '')),
  );
  numbers.sort((a, b) => {
    for (const { attribute, descending } of sort) {
      const column = index.columns.get(attribute);
      const order = compareSortKeys(
        sortKey(column, a, descending),
        sortKey(column, b, descending),
        descending,
      );
      if (order !== 0) return order;
    }
    return 0;
  });
  return {
    results: numbers
      .slice(offset, offset + limit)
      .map((number) => select(index.documents[number]?.source ?? {})),
    offset,
    limit,
    total: numbers.length,
  };
}

const FETCH_FIELDS = ['offset', 'limit', 'fields', 'filter', 'sort', 'ids', 'retrieveVectors'];

function checkFetchFields(body: JsonObject): JsonObject {
  for (const name of Object.keys(body)) {
    if (!FETCH_FIELDS.includes(name)) {
      const known = FETCH_FIELDS.map((each) => `\`${each}\``).join(', ');
      throw new EngineError('bad_request', `Unknown field \`${name}\`: expected one of ${known}`);
    }
  }
  return body;
}

const DOCUMENTS = '/indexes/:indexUid/documents';

export const documentRoutes: readonly Route[] = [
  {
    method: 'GET',
    path: DOCUMENTS,
    action: 'documents.get',
    handle: ({ engine, params, query }) => {
      const stored = storedIndex(engine, params['indexUid']);
      const body = checkFetchFields(Object.fromEntries(query));
      return { status: 200, body: fetchDocuments(engine, stored, body) };
    },
  },
  {
    method: 'POST',
    path: `${DOCUMENTS}/fetch`,
    action: 'documents.get',
    handle: ({ engine, params, body }) => {
      const stored = storedIndex(engine, params['indexUid']);
      const fields = checkFetchFields(isJsonObject(body) ? body : {});
      return { status: 200, body: fetchDocuments(engine, stored, fields) };
    },
  },
  {
    method: 'POST',
    path: DOCUMENTS,
    action: 'documents.add',
    largeBody: true,
    handle: (request) => addDocuments(request, false),
  },
  {
    method: 'PUT',
    path: DOCUMENTS,
    action: 'documents.add',
    largeBody: true,
    handle: (request) => addDocuments(request, true),
  },
  {
    method: 'DELETE',
    path: DOCUMENTS,
    action: 'documents.delete',
    handle: (request) => deleteDocuments(request, { all: true }),
  },
  {
    method: 'POST',
    path: `${DOCUMENTS}/delete-batch`,
    action: 'documents.delete',
    handle: (request) => {
      const { body } = request;
      if (!Array.isArray(body)) {
        throw new EngineError(
          'bad_request',
          `Invalid value type: expected an array, but found ${describeJson(body)}`,
        );
      }
      return deleteDocuments(request, { ids: body.map(readId) });
    },
  },
  {
    method: 'POST',
    path: `${DOCUMENTS}/delete`,
    action: 'documents.delete',
    handle: (request) => deleteDocuments(request, { filter: readDeletionFilter(request.body) }),
  },
  {
    method: 'GET',
    path: `${DOCUMENTS}/:documentId`,
    action: 'documents.get',
    handle: ({ engine, params, query }) => {
      const stored = storedIndex(engine, params['indexUid']);
      const id = readId(params['documentId'] ?? '');
      const document = stored.documents.get(id);
      if (document === undefined) {
        throw new EngineError('document_not_found', `Document \`${id}\` not found.`);
      }
      const fields = readNames(query.get('fields'), 'fields') ?? ['*'];
      return { status: 200, body: createSelector(fields)(document) };
    },
  },
  {
    method: 'DELETE',
    path: `${DOCUMENTS}/:documentId`,
    action: 'documents.delete',
    handle: (request) =>
      deleteDocuments(request, { ids: [readId(request.params['documentId'] ?? '')] }),
  },
];
