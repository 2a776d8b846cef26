import { createHmac, randomBytes, randomUUID } from 'node:crypto';
import { once } from 'node:events';
import { mkdtemp, rm } from 'node:fs/promises';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import path from 'node:path';
import type { Knex } from 'knex';
import { pino, type Logger } from 'pino';
import type { z } from 'zod';
import { problemSchema, type Problem } from '#shared/api/problem.ts';
import type { Role } from '#shared/vocabulary/statuses.ts';
import { sessionCookieName } from '../../server/accounts/session-cookie.ts';
import { sessionHash } from '../../server/accounts/session-store.ts';
import { createApp } from '../../server/app.ts';
import type { Config } from '../../server/config.ts';
import type { Deps } from '../../server/deps.ts';
import { diskStore } from '../../server/storage/file-store.ts';
import { aMember, type BuiltMember, type MemberTraits } from './builders.ts';
import { test as databaseTest } from './database.ts';
import { testConfig } from './test-config.ts';

export { testConfig };

/**
 * The real application on a free port, and clients that talk to it over HTTP as a browser does: own
 * origin, cookies, the token. `api` works on the test's transaction; `committedApi` on committed
 * rows, for tests with several connections at once.
 */
export interface Api {
  readonly db: Knex;
  readonly deps: Deps;
  readonly baseUrl: string;
  /** Every line logged so far, as JSON text. */
  readonly logLines: string[];
  /** A browser that has never been here. */
  client: () => Client;
  /**
   * A browser signed in as a member: one that exists, or a new one with this role or these traits.
   * Puts the session row in directly; the password counts as just typed.
   */
  signedIn: (who?: number | Role | Partial<MemberTraits>) => Promise<SignedInClient>;
}

export interface SendOptions {
  /** Sent as JSON. */
  body?: unknown;
  headers?: Record<string, string>;
  /** Sent as it is, e.g. a FormData or text; set its type in `headers`. */
  rawBody?: NonNullable<RequestInit['body']>;
  /** Leave the own Origin and the token out. */
  foreign?: boolean;
  signal?: AbortSignal;
}
export interface ApiAnswer {
  readonly status: number;
  readonly headers: Headers;
  readonly text: string;
  /** The parsed JSON; throws when the answer is none. */
  readonly json: unknown;
  /** The body read with its schema: fails the test when the answer does not fit the contract. */
  as: <Schema extends z.ZodType>(schema: Schema) => z.output<Schema>;
  /** The body of a refusal. */
  readonly problem: Problem;
}
export interface Client {
  /** Name → value; kept and sent back like a browser's. */
  readonly cookies: Map<string, string>;
  token: string | null;
  send: (method: string, url: string, options?: SendOptions) => Promise<ApiAnswer>;
  get: (url: string, options?: SendOptions) => Promise<ApiAnswer>;
  post: (url: string, body?: unknown, options?: SendOptions) => Promise<ApiAnswer>;
  put: (url: string, body?: unknown, options?: SendOptions) => Promise<ApiAnswer>;
  delete: (url: string, options?: SendOptions) => Promise<ApiAnswer>;
  /** Asks for a token, as a page does before its first change. */
  fetchToken: () => Promise<void>;
}
export interface SignedInClient extends Client {
  readonly member: BuiltMember;
}

/** A refusal without the request's id, to be compared with another. */
export function withoutId(problem: Problem): Omit<Problem, 'instance'> {
  const copy = { ...problem };
  delete copy.instance;
  return copy;
}

export interface ApiOptions {
  /** Settings other than the test's own. */
  config?: Partial<Config>;
  deps?: Partial<Deps>;
}

/** A log that is kept in memory, to be asked about. */
export function memoryLog(): { log: Logger; logLines: string[] } {
  const logLines: string[] = [];
  return {
    log: pino({ level: 'debug', base: null }, { write: (line) => logLines.push(line) }),
    logLines,
  };
}

/** Starts the application on `db`. The caller stops it. */
export async function startApi(
  db: Knex,
  options: ApiOptions = {},
): Promise<Api & { stop: () => Promise<void> }> {
  const uploads = await mkdtemp(path.join(tmpdir(), 'spyhole-test-uploads-'));
  const { log, logLines } = memoryLog();
  const server = createServer();
  server.listen(0, '127.0.0.1');
  await once(server, 'listening');
  const baseUrl = `http://127.0.0.1:${String((server.address() as AddressInfo).port)}`;
  const config = testConfig({ publicUrl: baseUrl, uploadsFolder: uploads, ...options.config });
  const deps: Deps = { config, db, log, store: diskStore(uploads), ...options.deps };
  server.on('request', createApp(deps));
  const client = (): Client => makeClient(baseUrl, config.publicUrl);
  return {
    db,
    deps,
    baseUrl,
    logLines,
    client,
    signedIn: async (who = 'member') => {
      const member = await memberFor(db, who);
      const signed = client();
      await plantSession(deps, member, signed);
      return Object.assign(signed, { member });
    },
    stop: async () => {
      server.closeAllConnections();
      server.close();
      await once(server, 'close');
      await rm(uploads, { recursive: true, force: true });
    },
  };
}

async function memberFor(
  db: Knex,
  who: number | Role | Partial<MemberTraits>,
): Promise<BuiltMember> {
  if (typeof who === 'string') return aMember(db, { role: who });
  if (typeof who === 'object') return aMember(db, who);
  const member = await db('members')
    .where({ id: who })
    .first<BuiltMember | undefined>('id', 'name', 'email', 'role');
  if (!member) throw new Error(`There is no member ${String(who)}.`);
  return member;
}

async function plantSession(deps: Deps, member: BuiltMember, client: Client): Promise<void> {
  const id = randomBytes(24).toString('base64url');
  client.token = randomBytes(24).toString('base64url');
  await deps.db('sessions').insert({
    id_hash: sessionHash(id),
    member_id: member.id,
    data: JSON.stringify({ token: client.token, role: member.role, confirmedAt: Date.now() }),
    expires_at: deps.db.raw('NOW(3) + INTERVAL 1 HOUR'),
    ends_at: deps.db.raw('NOW(3) + INTERVAL 2 HOUR'),
  });
  const signature = createHmac('sha256', deps.config.sessionSecrets[0]).update(id).digest('base64');
  client.cookies.set(
    sessionCookieName(deps.config),
    encodeURIComponent(`s:${id}.${signature.replace(/=+$/, '')}`),
  );
}

function makeClient(baseUrl: string, publicUrl: string): Client {
  const cookies = new Map<string, string>();
  const client: Client = {
    cookies,
    token: null,
    send: async (method, url, options = {}) => {
      const headers = new Headers();
      if (cookies.size > 0) {
        headers.set('Cookie', [...cookies].map(([name, value]) => `${name}=${value}`).join('; '));
      }
      if (method !== 'GET' && options.foreign !== true) {
        headers.set('Origin', new URL(publicUrl).origin);
        if (client.token !== null) headers.set('X-Spyhole-Token', client.token);
        if (method === 'POST') headers.set('Idempotency-Key', randomUUID());
      }
      if (options.body !== undefined) headers.set('Content-Type', 'application/json');
      for (const [name, value] of Object.entries(options.headers ?? {})) headers.set(name, value);
      const body =
        options.rawBody ?? (options.body === undefined ? null : JSON.stringify(options.body));
      const response = await fetch(baseUrl + url, {
        method,
        headers,
        body,
        redirect: 'manual',
        ...(options.signal ? { signal: options.signal } : {}),
      });
      keepCookies(cookies, response.headers.getSetCookie());
      const text = await response.text();
      const answer: ApiAnswer = {
        status: response.status,
        headers: response.headers,
        text,
        get json() {
          return JSON.parse(text) as unknown;
        },
        as: (schema) => {
          const result = schema.safeParse(JSON.parse(text));
          if (result.success) return result.data;
          const got = `${method} ${url} was answered ${String(response.status)}`;
          throw new Error(`${got}: ${text.slice(0, 1000)}`, { cause: result.error });
        },
        get problem() {
          return problemSchema.parse(JSON.parse(text));
        },
      };
      return answer;
    },
    get: (url, options) => client.send('GET', url, options),
    post: (url, body, options) => client.send('POST', url, { body, ...options }),
    put: (url, body, options) => client.send('PUT', url, { body, ...options }),
    delete: (url, options) => client.send('DELETE', url, options),
    fetchToken: async () => {
      const answer = await client.post('/api/session/token');
      client.token = (answer.json as { token: string }).token;
    },
  };
  return client;
}

/** Keeps what Set-Cookie gives; an expiry in the past takes it away. */
function keepCookies(cookies: Map<string, string>, setCookies: readonly string[]): void {
  for (const line of setCookies) {
    const [pair = '', ...attributes] = line.split(';');
    const name = pair.slice(0, pair.indexOf('='));
    const expires = attributes.find((attribute) => /^\s*expires=/i.test(attribute));
    const isPast = expires !== undefined && Date.parse(expires.split('=')[1] ?? '') < Date.now();
    if (isPast) cookies.delete(name);
    else cookies.set(name, pair.slice(pair.indexOf('=') + 1));
  }
}

export const test = databaseTest.extend<{ api: Api; committedApi: Api }>({
  api: async ({ db }, use) => {
    const api = await startApi(db);
    await use(api);
    await api.stop();
  },
  committedApi: async ({ committedDb }, use) => {
    const api = await startApi(committedDb);
    await use(api);
    await api.stop();
  },
});
