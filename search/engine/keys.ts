import { createHash, createHmac } from 'node:crypto';
import { EngineError } from './errors.ts';

export type ApiKey = {
  uid: string;
  name: string | null;
  description: string | null;
  actions: string[];
  indexes: string[];
  /** RFC 3339, or null for a key that does not expire. */
  expiresAt: string | null;
  createdAt: string;
  updatedAt: string;
};

export const ACTIONS = [
  'search',
  'documents.add',
  'documents.get',
  'documents.delete',
  'indexes.create',
  'indexes.get',
  'indexes.update',
  'indexes.delete',
  'indexes.swap',
  'tasks.get',
  'tasks.cancel',
  'tasks.delete',
  'settings.get',
  'settings.update',
  'stats.get',
  'version',
  'keys.get',
  'keys.create',
  'keys.update',
  'keys.delete',
] as const;
export type Action = (typeof ACTIONS)[number];

/** `*`, `documents.*` and the like are allowed in a key; these other names are accepted, unused. */
const OTHER_ACTIONS = [
  'metrics.get',
  'dumps.create',
  'snapshots.create',
  'experimental.get',
  'experimental.update',
  'network.get',
  'network.update',
  'chatCompletions',
  'chats.get',
  'chats.delete',
  'chatsSettings.get',
  'chatsSettings.update',
  'webhooks.get',
  'webhooks.create',
  'webhooks.update',
  'webhooks.delete',
  'indexes.compact',
];

export function isAction(name: string): boolean {
  if (name === '*') return true;
  const all: string[] = [...ACTIONS, ...OTHER_ACTIONS];
  if (name.endsWith('.*')) return all.some((action) => action.startsWith(name.slice(0, -1)));
  return all.includes(name);
}

/** Fixed, so that the two derived keys depend on the master key alone. */
const SEARCH_KEY_UID = '6f0b1c4e-2a57-4d0f-9b36-51c2d8e7a901';
const ADMIN_KEY_UID = 'c3d94b72-8e15-4a6a-b0f4-7e21905fd8a2';

export function defaultKeys(now: string): ApiKey[] {
  const common = { indexes: ['*'], expiresAt: null, createdAt: now, updatedAt: now };
  return [
    {
      ...common,
      uid: SEARCH_KEY_UID,
      name: 'Default Search API Key',
      description: 'Use it to search from the frontend',
      actions: ['search'],
    },
    {
      ...common,
      uid: ADMIN_KEY_UID,
      name: 'Default Admin API Key',
      description: 'Use it for anything that is not a search operation. Caution! Do not expose it',
      actions: ['*'],
    },
  ];
}

/** The secret of a key is never stored: it follows from the master key and the key's uid. */
export function keySecret(masterKey: string, uid: string): string {
  return createHmac('sha256', masterKey).update(uid).digest('hex');
}

/** Digests of secrets already derived, by master key and uid; only as many as there were keys. */
const digests = new Map<string, string>();

function digestOfKey(masterKey: string, uid: string): string {
  const name = `${uid} ${masterKey}`;
  let known = digests.get(name);
  if (known === undefined) {
    known = digest(keySecret(masterKey, uid));
    digests.set(name, known);
  }
  return known;
}

function digest(secret: string): string {
  return createHash('sha256').update(secret).digest('hex');
}

/** What a request may do. `null` indexes stands for all of them. */
export type Access = { master: boolean; key: ApiKey | null };

/**
 * Finds who is asking. Secrets are compared by their digests, so that the time taken says nothing
 * about them.
 */
export function identify(
  authorization: string | undefined,
  masterKey: string | null,
  keys: Iterable<ApiKey>,
): Access {
  if (masterKey === null) return { master: true, key: null };
  if (authorization === undefined) {
    throw new EngineError(
      'missing_authorization_header',
      'The Authorization header is missing. It must use the bearer authorization method.',
    );
  }
  const secret = /^Bearer\s+(.+)$/i.exec(authorization)?.[1];
  if (secret === undefined) throw invalidApiKey();
  const offered = digest(secret);
  if (offered === digest(masterKey)) return { master: true, key: null };
  for (const key of keys) {
    if (digestOfKey(masterKey, key.uid) === offered) {
      if (key.expiresAt !== null && Date.parse(key.expiresAt) <= Date.now()) throw invalidApiKey();
      return { master: false, key };
    }
  }
  throw invalidApiKey();
}

export function invalidApiKey(): EngineError {
  return new EngineError('invalid_api_key', 'The provided API key is invalid.');
}

export function mayDo(access: Access, action: Action): boolean {
  if (access.master) return true;
  return (access.key?.actions ?? []).some((granted) => matchesWildcard(action, granted));
}

export function mayUseIndex(access: Access, uid: string): boolean {
  if (access.master) return true;
  return (access.key?.indexes ?? []).some((granted) => matchesWildcard(uid, granted));
}

function matchesWildcard(name: string, pattern: string): boolean {
  return pattern.endsWith('*') ? name.startsWith(pattern.slice(0, -1)) : name === pattern;
}
