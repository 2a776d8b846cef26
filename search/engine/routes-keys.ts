import { randomUUID } from 'node:crypto';
import type { Engine } from './engine.ts';
import { EngineError } from './errors.ts';
import type { Route } from './http-route.ts';
import { describeJson, isJsonObject, isStringArray, type Json, type JsonObject } from './json.ts';
import { isAction, keySecret, type ApiKey } from './keys.ts';
import { pageOf, readPage } from './paging.ts';

const UUID = /^[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12}$/i;
const INDEX_PATTERN = /^(\*|[a-zA-Z0-9_-]+\*?)$/;
const DATE = /^\d{4}-\d{2}-\d{2}([T ]\d{2}:\d{2}:\d{2}(\.\d+)?(Z|[+-]\d{2}:\d{2})?)?$/;

function presentKey(engine: Engine, key: ApiKey): JsonObject {
  return {
    name: key.name,
    description: key.description,
    key: keySecret(engine.masterKey ?? '', key.uid),
    uid: key.uid,
    actions: key.actions,
    indexes: key.indexes,
    expiresAt: key.expiresAt,
    createdAt: key.createdAt,
    updatedAt: key.updatedAt,
  };
}

function findKey(engine: Engine, uidOrKey: string): ApiKey {
  for (const key of engine.state.keys.values()) {
    if (key.uid === uidOrKey || keySecret(engine.masterKey ?? '', key.uid) === uidOrKey) return key;
  }
  throw new EngineError('api_key_not_found', `API key \`${uidOrKey}\` not found.`);
}

function bodyObject(body: Json | undefined): JsonObject {
  if (body === undefined) throw new EngineError('missing_payload', 'A json payload is missing.');
  if (!isJsonObject(body)) {
    throw new EngineError(
      'bad_request',
      `Invalid value type: expected an object, but found ${describeJson(body)}`,
    );
  }
  return body;
}

function optionalText(value: Json | undefined, name: string): string | null {
  if (value === undefined || value === null) return null;
  if (typeof value === 'string') return value;
  throw new EngineError(
    `invalid_api_key_${name}`,
    `Invalid value type at \`.${name}\`: expected a string, but found ${describeJson(value)}`,
  );
}

function readList(
  body: JsonObject,
  name: 'actions' | 'indexes',
  isValid: (item: string) => boolean,
): string[] {
  const value = body[name];
  if (value === undefined) {
    throw new EngineError(`missing_api_key_${name}`, `Missing field \`${name}\``);
  }
  if (!isStringArray(value) || !value.every(isValid)) {
    throw new EngineError(
      `invalid_api_key_${name}`,
      `Invalid value at \`.${name}\`: \`${JSON.stringify(value).slice(0, 200)}\` is not a list of valid ${name}.`,
    );
  }
  return value;
}

function readExpiry(body: JsonObject): string | null {
  const value = body['expiresAt'];
  if (value === undefined) {
    throw new EngineError('missing_api_key_expires_at', 'Missing field `expiresAt`');
  }
  if (value === null) return null;
  const time = typeof value === 'string' && DATE.test(value) ? Date.parse(value) : NaN;
  if (!(time > Date.now())) {
    throw new EngineError(
      'invalid_api_key_expires_at',
      `Invalid value at \`.expiresAt\`: \`${JSON.stringify(value).slice(0, 100)}\` is not a valid date. It should follow the RFC 3339 format and lie in the future.`,
    );
  }
  return new Date(time).toISOString();
}

function readNewKey(body: Json | undefined, taken: ReadonlyMap<string, ApiKey>): ApiKey {
  const fields = bodyObject(body);
  const known = ['uid', 'name', 'description', 'actions', 'indexes', 'expiresAt'];
  const unknown = Object.keys(fields).find((name) => !known.includes(name));
  if (unknown !== undefined) {
    throw new EngineError('bad_request', `Unknown field \`${unknown}\``);
  }
  const uid = optionalText(fields['uid'], 'uid') ?? randomUUID();
  if (!UUID.test(uid)) {
    throw new EngineError(
      'invalid_api_key_uid',
      `Invalid value at \`.uid\`: \`${uid}\` is not a valid UUID.`,
    );
  }
  if (taken.has(uid)) {
    throw new EngineError(
      'api_key_already_exists',
      `\`uid\` field value \`${uid}\` is already an existing API key.`,
    );
  }
  const now = new Date().toISOString();
  return {
    uid,
    name: optionalText(fields['name'], 'name'),
    description: optionalText(fields['description'], 'description'),
    actions: readList(fields, 'actions', isAction),
    indexes: readList(fields, 'indexes', (item) => INDEX_PATTERN.test(item)),
    expiresAt: readExpiry(fields),
    createdAt: now,
    updatedAt: now,
  };
}

async function saveKey(engine: Engine, key: ApiKey): Promise<void> {
  engine.state.keys.set(key.uid, key);
  await engine.storage.append({ kind: 'key', key });
}

export const keyRoutes: readonly Route[] = [
  {
    method: 'GET',
    path: '/keys',
    action: 'keys.get',
    handle: ({ engine, query }) => {
      const newestFirst = [...engine.state.keys.values()].reverse();
      const body = pageOf(newestFirst, readPage(query, 'api_key'), (key) =>
        presentKey(engine, key),
      );
      return { status: 200, body };
    },
  },
  {
    method: 'POST',
    path: '/keys',
    action: 'keys.create',
    handle: async ({ engine, body }) => {
      const key = readNewKey(body, engine.state.keys);
      await saveKey(engine, key);
      return { status: 201, body: presentKey(engine, key) };
    },
  },
  {
    method: 'GET',
    path: '/keys/:uidOrKey',
    action: 'keys.get',
    handle: ({ engine, params }) => ({
      status: 200,
      body: presentKey(engine, findKey(engine, params['uidOrKey'] ?? '')),
    }),
  },
  {
    method: 'PATCH',
    path: '/keys/:uidOrKey',
    action: 'keys.update',
    handle: async ({ engine, params, body }) => {
      const key = findKey(engine, params['uidOrKey'] ?? '');
      const fields = bodyObject(body);
      for (const name of Object.keys(fields)) {
        if (name === 'name' || name === 'description') continue;
        throw new EngineError(
          `immutable_api_key_${name.replace(/[A-Z]/g, (letter) => `_${letter.toLowerCase()}`)}`,
          `Immutable field \`${name}\`: expected one of \`description\`, \`name\``,
        );
      }
      const changed: ApiKey = {
        ...key,
        ...('name' in fields ? { name: optionalText(fields['name'], 'name') } : {}),
        ...('description' in fields
          ? { description: optionalText(fields['description'], 'description') }
          : {}),
        updatedAt: new Date().toISOString(),
      };
      await saveKey(engine, changed);
      return { status: 200, body: presentKey(engine, changed) };
    },
  },
  {
    method: 'DELETE',
    path: '/keys/:uidOrKey',
    action: 'keys.delete',
    handle: async ({ engine, params }) => {
      const key = findKey(engine, params['uidOrKey'] ?? '');
      engine.state.keys.delete(key.uid);
      await engine.storage.append({ kind: 'key-removed', uid: key.uid });
      return { status: 204 };
    },
  },
];
