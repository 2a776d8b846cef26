import type { Engine } from './engine.ts';
import { EngineError, indexNotFound } from './errors.ts';
import { facetSearch } from './facet-search.ts';
import type { Route } from './http-route.ts';
import { describeJson, isJsonObject, type Json, type JsonObject } from './json.ts';
import { invalidApiKey, mayUseIndex } from './keys.ts';
import { checkIndexUid } from './routes-indexes.ts';
import { search } from './search.ts';
import type { SearchIndex } from './search-index.ts';
import { readSearchRequest, searchBodyFromQuery } from './search-request.ts';

const MAX_QUERIES = 100;

function searchedIndex(engine: Engine, uid: string): SearchIndex {
  const index = engine.searchIndexes.get(checkIndexUid(uid));
  if (index === undefined) throw indexNotFound(uid);
  return index;
}

function bodyOf(body: Json | undefined): JsonObject {
  if (body === undefined) return {};
  if (isJsonObject(body)) return body;
  throw new EngineError(
    'bad_request',
    `Invalid value type: expected an object, but found ${describeJson(body)}`,
  );
}

/** Errors of one query name its place in the list. */
function inside<T>(at: number, run: () => T): T {
  try {
    return run();
  } catch (error) {
    if (error instanceof EngineError) {
      throw new EngineError(error.code, `Inside \`.queries[${at}]\`: ${error.message}`);
    }
    throw error;
  }
}

export const searchRoutes: readonly Route[] = [
  {
    method: 'POST',
    path: '/indexes/:indexUid/search',
    action: 'search',
    handle: ({ engine, params, body }) => {
      const uid = params['indexUid'] ?? '';
      const request = readSearchRequest(bodyOf(body));
      return { status: 200, body: search(searchedIndex(engine, uid), uid, request) };
    },
  },
  {
    method: 'GET',
    path: '/indexes/:indexUid/search',
    action: 'search',
    handle: ({ engine, params, query }) => {
      const uid = params['indexUid'] ?? '';
      const request = readSearchRequest(searchBodyFromQuery(query));
      return { status: 200, body: search(searchedIndex(engine, uid), uid, request) };
    },
  },
  {
    method: 'POST',
    path: '/indexes/:indexUid/facet-search',
    action: 'search',
    handle: ({ engine, params, body }) => {
      const uid = params['indexUid'] ?? '';
      return { status: 200, body: facetSearch(searchedIndex(engine, uid), uid, bodyOf(body)) };
    },
  },
  {
    method: 'POST',
    path: '/multi-search',
    action: 'search',
    handle: ({ engine, access, body }) => {
      const { queries, federation = null } = bodyOf(body);
      if (federation !== null) {
        throw new EngineError(
          'invalid_multi_search_federation',
          'Federated searches are not supported by this engine.',
        );
      }
      if (queries === undefined) {
        throw new EngineError('missing_multi_search_queries', 'Missing field `queries`');
      }
      if (!Array.isArray(queries) || queries.length > MAX_QUERIES) {
        throw new EngineError(
          'invalid_multi_search_queries',
          `Invalid value at \`.queries\`: expected an array of at most ${MAX_QUERIES} queries.`,
        );
      }
      const asked = queries.map((query, at) =>
        inside(at, () => {
          const fields = bodyOf(query);
          const uid = fields['indexUid'];
          if (uid === undefined) {
            throw new EngineError('missing_index_uid', 'Missing field `indexUid`');
          }
          if (typeof uid !== 'string') {
            throw new EngineError(
              'invalid_index_uid',
              `Invalid value type at \`.indexUid\`: expected a string, but found ${describeJson(uid)}`,
            );
          }
          if (!mayUseIndex(access, uid)) throw invalidApiKey();
          return { uid, fields };
        }),
      );
      const results = asked.map(({ uid, fields }, at) =>
        inside(at, () => {
          const request = readSearchRequest(fields, ['indexUid']);
          return { indexUid: uid, ...search(searchedIndex(engine, uid), uid, request) };
        }),
      );
      return { status: 200, body: { results } };
    },
  },
];
