import { promisify } from 'node:util';
import type { SessionData } from 'express-session';
import { describe, expect } from 'vitest';
import { sessionAnswerSchema, sessionListSchema } from '#shared/api/accounts.ts';
import { hashPassword } from '../../server/accounts/hashing.ts';
import { DatabaseSessionStore } from '../../server/accounts/session-store.ts';
import { tidyUp } from '../../server/housekeeping.ts';
import { type Api, type Client, startApi, test, withoutId } from '../support/api.ts';
import { aMember, PASSWORD } from '../support/builders.ts';

async function signIn(api: Api, email: string, password = PASSWORD) {
  const client = api.client();
  await client.fetchToken();
  const answer = await client.post('/api/session', { email, password });
  if (answer.status === 200) client.token = answer.as(sessionAnswerSchema).token;
  return { client, answer };
}

const whoIs = async (client: Client): Promise<number | null> =>
  (await client.get('/api/session')).as(sessionAnswerSchema).me?.id ?? null;

const onlyCookie = (client: Client): string => [...client.cookies.values()][0] ?? '';

describe('GET /api/session', () => {
  test('gives a visitor no cookie and asks the database nothing', async ({ api }) => {
    const statements: string[] = [];
    api.db.on('query', ({ sql }: { sql: string }) => statements.push(sql));
    const answer = await api.client().get('/api/session');
    expect(answer.headers.getSetCookie()).toEqual([]);
    expect(answer.as(sessionAnswerSchema)).toEqual({
      me: null,
      token: null,
      abilities: { write: false, handIn: false, moderate: false, administer: false },
    });
    expect(statements).toEqual([]);
  });

  test('tells a member about themselves, without hash, and is not to be stored', async ({
    api,
  }) => {
    const client = await api.signedIn({ role: 'moderator', emailVerified: false });
    const answer = await client.get('/api/session');
    const session = answer.as(sessionAnswerSchema);
    expect(session.me).toMatchObject({ id: client.member.id, email: client.member.email });
    expect(session.abilities).toEqual({
      write: true,
      handIn: false,
      moderate: true,
      administer: false,
    });
    expect(answer.headers.get('Cache-Control')).toBe('no-store');
    expect(answer.text).not.toContain('argon2');
  });

  test('takes no identifier that the server did not sign', async ({ api }) => {
    const client = await api.signedIn();
    client.cookies.set('spyhole', onlyCookie(client).replace(/.{3}$/, 'abc'));
    expect(await whoIs(client)).toBeNull();
  });
});

describe('POST /api/session', () => {
  test('signs in with the right password, however the address is capitalised', async ({ api }) => {
    const member = await aMember(api.db);
    const { client, answer } = await signIn(api, member.email.toUpperCase());
    expect(answer.status).toBe(200);
    expect(await whoIs(client)).toBe(member.id);
  });

  test('answers the same for an unknown address, a look-alike and a wrong password', async ({
    api,
  }) => {
    const member = await aMember(api.db);
    const wrong = await signIn(api, member.email, 'not the password at all');
    const unknown = await signIn(api, 'nobody@example.org', 'not the password at all');
    const lookAlike = await signIn(api, member.email.replace('e', 'е'));
    for (const { answer } of [wrong, unknown, lookAlike]) {
      const problem = withoutId(answer.problem);
      expect(problem).toEqual({
        type: `${api.baseUrl}/problems/wrong-credentials`,
        code: 'wrong-credentials',
        title: 'The address or the password is wrong',
        status: 401,
        detail: 'The address or the password is wrong',
      });
      expect(answer.headers.getSetCookie()).toEqual([]);
    }
  });

  test('takes a new identifier and a new token; the old ones are dead', async ({ api }) => {
    const member = await aMember(api.db);
    const client = api.client();
    await client.fetchToken();
    const before = { cookie: onlyCookie(client), token: client.token };
    const answer = await client.post('/api/session', { email: member.email, password: PASSWORD });
    client.token = answer.as(sessionAnswerSchema).token;
    expect(onlyCookie(client)).not.toBe(before.cookie);
    expect(client.token).not.toBe(before.token);
    const old = api.client();
    old.cookies.set('spyhole', before.cookie);
    expect(await whoIs(old)).toBeNull();
    expect((await old.get('/api/session')).as(sessionAnswerSchema).token).toBeNull();
  });

  test('is refused without a token, with a wrong one, and from another origin', async ({ api }) => {
    const member = await aMember(api.db);
    const body = { email: member.email, password: PASSWORD };
    const client = api.client();
    expect((await client.post('/api/session', body)).problem.code).toBe('token-refused');
    await client.fetchToken();
    client.token = 'x'.repeat(32);
    expect((await client.post('/api/session', body)).problem.code).toBe('token-refused');
    await client.fetchToken();
    for (const origin of ['https://elsewhere.example', 'null', `${api.baseUrl}.evil.example`]) {
      const answer = await client.post('/api/session', body, { headers: { Origin: origin } });
      expect(answer.problem.code).toBe('foreign-origin');
    }
  });

  test('keeps a suspended member out, who has to know the password to be told why', async ({
    api,
  }) => {
    const member = await aMember(api.db, { suspended: true });
    expect((await signIn(api, member.email)).answer.problem.code).toBe('suspended');
    const wrong = await signIn(api, member.email, 'not the password at all');
    expect(wrong.answer.problem.code).toBe('wrong-credentials');
  });

  test('throttles one account after ten wrong passwords, not its neighbour, and lets the right one in after the wait', async ({
    api,
  }) => {
    const [member, other] = [await aMember(api.db), await aMember(api.db)];
    const client = api.client();
    await client.fetchToken();
    const attempt = (email: string, password: string, headers = {}) =>
      client.post('/api/session', { email, password }, { headers });
    for (let index = 0; index < 10; index += 1) {
      expect((await attempt(member.email, `wrong password ${String(index)}`)).status).toBe(401);
    }
    const refused = await attempt(member.email, PASSWORD);
    expect(refused.status).toBe(429);
    const retryAfter = Number(refused.headers.get('Retry-After'));
    expect(retryAfter).toBeGreaterThan(800);
    expect(retryAfter).toBeLessThanOrEqual(900);
    expect(refused.problem.retryAfter).toBe(retryAfter);
    // Addresses a client makes up change nothing.
    const forged = await attempt(member.email, PASSWORD, { 'X-Forwarded-For': '203.0.113.9' });
    expect(forged.status).toBe(429);
    expect((await signIn(api, other.email)).answer.status).toBe(200);
    await api.db('throttles').update({ window_ends_at: api.db.raw('NOW(3) - INTERVAL 1 SECOND') });
    expect((await signIn(api, member.email)).answer.status).toBe(200);
  });

  test('throttles a client after 25 wrong tries at different accounts', async ({ api }) => {
    const client = api.client();
    await client.fetchToken();
    const statuses: number[] = [];
    for (let index = 0; index < 26; index += 1) {
      const body = { email: `somebody-${String(index)}@example.org`, password: 'a guess' };
      statuses.push((await client.post('/api/session', body)).status);
    }
    expect(statuses.slice(0, 25).every((status) => status === 401)).toBe(true);
    expect(statuses[25]).toBe(429);
  });

  test('hashes the password anew when it was hashed with weaker parameters', async ({ api }) => {
    const member = await aMember(api.db);
    const hashOf = async (): Promise<string> => {
      const row = await api
        .db('members')
        .where({ id: member.id })
        .first<{ password_hash: string }>();
      return row.password_hash;
    };
    expect(await hashOf()).toContain('m=1024,');
    expect((await signIn(api, member.email)).answer.status).toBe(200);
    expect(await hashOf()).toContain('m=19456,');
    expect((await signIn(api, member.email)).answer.status).toBe(200);
  });

  test('refuses a password of 200 kB before hashing it', async ({ api }) => {
    const member = await aMember(api.db);
    const { answer } = await signIn(api, member.email, 'x'.repeat(200_000));
    expect(answer.status).toBe(422);
  });

  test('writes down who came in and who was refused, and no secret', async ({ api }) => {
    const member = await aMember(api.db);
    await signIn(api, member.email, 'canary-wrong-password');
    const { client } = await signIn(api, member.email);
    const events = api.logLines
      .map((line) => JSON.parse(line) as { event?: string; result?: string; memberId?: number })
      .filter(({ event }) => event === 'sign-in');
    expect(events.map(({ result, memberId }) => ({ result, memberId }))).toEqual([
      { result: 'refused', memberId: member.id },
      { result: 'signed-in', memberId: member.id },
    ]);
    const log = api.logLines.join('');
    for (const secret of [
      PASSWORD,
      'canary-wrong-password',
      member.email,
      client.token ?? '-',
      onlyCookie(client),
    ]) {
      expect(log).not.toContain(secret);
    }
  });
});

describe('the cookie', () => {
  test('is a __Host- one, Secure, HttpOnly and Lax where the site is HTTPS', async ({ db }) => {
    const api = await startApi(db, {
      config: { publicUrl: 'https://notebook.example', isHttps: true, trustProxy: 1 },
    });
    try {
      const member = await aMember(db);
      const headers = { 'X-Forwarded-Proto': 'https' };
      const client = api.client();
      const first = await client.post('/api/session/token', undefined, { headers });
      client.token = (first.json as { token: string }).token;
      const answer = await client.post(
        '/api/session',
        { email: member.email, password: PASSWORD },
        { headers },
      );
      for (const [line] of [first.headers.getSetCookie(), answer.headers.getSetCookie()]) {
        expect(line).toMatch(/^__Host-spyhole=s%3A[A-Za-z0-9_-]{32,}/);
        const attributes = (line ?? '').split('; ').slice(1);
        expect(attributes).toEqual(
          expect.arrayContaining(['Path=/', 'HttpOnly', 'Secure', 'SameSite=Lax']),
        );
        expect(attributes.some((attribute) => attribute.startsWith('Domain'))).toBe(false);
      }
      expect(answer.text).not.toContain(onlyCookie(client));
      // The same request over plain HTTP signs nobody in and says why.
      const plain = await api.client().post('/api/session/token');
      expect(plain.status).toBe(403);
      expect(plain.problem.detail).toContain('plain HTTP');
      expect(plain.headers.getSetCookie()).toEqual([]);
    } finally {
      await api.stop();
    }
  });

  test('is not given out in production when the site is plain HTTP', async ({ db }) => {
    const api = await startApi(db, {
      config: { environment: 'production', publicUrl: 'http://notebook.example' },
    });
    try {
      const answer = await api.client().post('/api/session/token');
      expect(answer.status).toBe(403);
      expect(answer.problem.detail).toContain('PUBLIC_URL must start with https');
      expect(answer.headers.getSetCookie()).toEqual([]);
    } finally {
      await api.stop();
    }
  });

  test('signed with the secret before the present one is still accepted', async ({ db }) => {
    const old = await startApi(db);
    const client = await old.signedIn();
    await old.stop();
    const api = await startApi(db, {
      config: {
        sessionSecrets: ['a-new-secret-0123456789abcdefghijkl', ...old.deps.config.sessionSecrets],
      },
    });
    try {
      const later = api.client();
      later.cookies.set('spyhole', onlyCookie(client));
      expect(await whoIs(later)).toBe(client.member.id);
    } finally {
      await api.stop();
    }
  });
});

describe('the end of a session', () => {
  test('comes on the server when its member signs out', async ({ api }) => {
    const client = await api.signedIn();
    const cookie = onlyCookie(client);
    const answer = await client.delete('/api/session');
    expect(answer.as(sessionAnswerSchema)).toMatchObject({ me: null, token: null });
    expect(client.cookies.size).toBe(0);
    client.cookies.set('spyhole', cookie);
    expect((await client.get('/api/sessions')).status).toBe(401);
  });

  test('comes for one of them, or for all, when the member says so', async ({ api }) => {
    const first = await api.signedIn();
    const { id } = first.member;
    const [second, third] = [await api.signedIn(id), await api.signedIn(id)];
    const stranger = await api.signedIn();
    const list = (await first.get('/api/sessions')).as(sessionListSchema).sessions;
    expect(list).toHaveLength(3);
    expect(list.filter(({ current }) => current)).toHaveLength(1);
    const others = (await second.get('/api/sessions')).as(sessionListSchema).sessions;
    const handle = others.find(({ current }) => current)?.id ?? '';
    expect((await stranger.delete(`/api/sessions/${handle}`)).status).toBe(404);
    expect((await first.delete(`/api/sessions/${handle}`)).status).toBe(200);
    expect(await whoIs(second)).toBeNull();
    expect(await whoIs(third)).toBe(id);
    expect((await third.delete('/api/sessions')).status).toBe(200);
    expect(await whoIs(first)).toBeNull();
    expect(await whoIs(stranger)).toBe(stranger.member.id);
  });

  test.for([
    ['member', 14, 30],
    ['moderator', 2 / 24, 0.5],
    ['admin', 2 / 24, 0.5],
  ] as const)(
    'is set for a %s: %d days idle, %d in all',
    async ([role, idle, absolute], { api }) => {
      const member = await aMember(api.db, { role });
      const { client } = await signIn(api, member.email);
      const row = await api
        .db('sessions')
        .where({ member_id: member.id })
        .first<{ idle: number; absolute: number }>(
          api.db.raw('TIMESTAMPDIFF(SECOND, started_at, expires_at) / 86400 AS idle'),
          api.db.raw('TIMESTAMPDIFF(SECOND, started_at, ends_at) / 86400 AS absolute'),
        );
      expect(row.idle).toBeCloseTo(idle, 2);
      expect(row.absolute).toBeCloseTo(absolute, 2);
      for (const column of ['expires_at', 'ends_at']) {
        const kept = await api.db('sessions').where({ member_id: member.id }).first<object>();
        await api
          .db('sessions')
          .where({ member_id: member.id })
          .update({ [column]: api.db.raw('NOW(3) - INTERVAL 1 SECOND') });
        expect(await whoIs(client)).toBeNull();
        const { expires_at, ends_at } = kept as { expires_at: Date; ends_at: Date };
        await api.db('sessions').where({ member_id: member.id }).update({ expires_at, ends_at });
        expect(await whoIs(client)).toBe(member.id);
      }
    },
  );

  test('moves on with use, at most every five minutes, never past the last one', async ({
    api,
  }) => {
    const client = await api.signedIn();
    const sessions = () => api.db('sessions').where({ member_id: client.member.id });
    const read = () => sessions().first<{ expires_at: Date; ends_at: Date; seen_at: Date }>();
    const before = await read();
    await client.get('/api/session');
    expect(await read()).toEqual(before);
    await sessions().update({ seen_at: api.db.raw('NOW(3) - INTERVAL 6 MINUTE') });
    await client.get('/api/session');
    const after = await read();
    expect(after.seen_at.getTime()).toBeGreaterThanOrEqual(before.seen_at.getTime());
    expect(after.expires_at).toEqual(after.ends_at);
  });

  test('cannot be undone by a request that was still under way', async ({ api }) => {
    const client = await api.signedIn();
    const store = new DatabaseSessionStore(api.db);
    const id = onlyCookie(client).replace(/^s%3A/, '').split('.')[0] ?? '';
    const read = promisify(store.get.bind(store)) as (id: string) => Promise<SessionData | null>;
    const write = promisify(store.set.bind(store));
    const session = await read(id);
    if (!session) throw new Error('The session is not there.');
    await api.db('sessions').delete();
    await write(id, { ...session, confirmedAt: Date.now() });
    expect(await api.db('sessions')).toEqual([]);
  });

  test('comes with the next request when a member is suspended', async ({ api }) => {
    const client = await api.signedIn();
    await api
      .db('members')
      .where({ id: client.member.id })
      .update({ suspended_at: api.db.raw('NOW(3)') });
    expect((await client.get('/api/sessions')).status).toBe(401);
    expect(await api.db('sessions').where({ member_id: client.member.id })).toEqual([]);
  });
});

test('a password of any signs and length from 15 to 256 signs in, read to its last character', async ({
  api,
}) => {
  const member = await aMember(api.db);
  for (const password of ['🔥🏺🌋🪨💨🌙⭐🍂🐝🦊🐢🌻🍋🎈🪵', `${'ember '.repeat(42)}last`]) {
    await api
      .db('members')
      .where({ id: member.id })
      .update({ password_hash: await hashPassword(password) });
    expect((await signIn(api, member.email, password)).answer.status).toBe(200);
    const changed = `${[...password].slice(0, -1).join('')}x`;
    expect((await signIn(api, member.email, changed)).answer.status).toBe(401);
  }
});

test('when sessions cannot be read, nobody counts as signed in and the answer is 503', async ({
  api,
}) => {
  const client = await api.signedIn();
  const broken = await startApi(
    Object.assign(() => {
      throw Object.assign(new Error('gone'), { code: 'ECONNREFUSED' });
    }) as never,
  );
  try {
    const other = broken.client();
    other.cookies.set('spyhole', onlyCookie(client));
    const answer = await other.get('/api/session');
    expect(answer.status).toBe(503);
    expect(answer.problem.code).toBe('away');
  } finally {
    await broken.stop();
  }
});

test('what has ended is tidied away, and nothing else', async ({ api }) => {
  const { db } = api;
  const member = await aMember(db);
  const hours = (count: number) => db.raw('NOW(3) + INTERVAL ? HOUR', [count]);
  for (const [key, expires, ends] of [
    ['idle', -1, 5],
    ['over', 1, -1],
    ['open', 1, 5],
  ] as const) {
    await db('sessions').insert({
      id_hash: key,
      member_id: member.id,
      data: '{}',
      expires_at: hours(expires),
      ends_at: hours(ends),
    });
    await db('throttles').insert({
      key_hash: key,
      count: 1,
      window_ends_at: hours(key === 'open' ? -23 : -25),
    });
    await db('idempotency_keys').insert({
      member_id: member.id,
      idempotency_key: key,
      route: 'post /x',
      body_hash: '',
      created_at: hours(key === 'open' ? -23 : -25),
    });
  }
  await tidyUp(db);
  expect(await db('sessions').pluck<string[]>('id_hash')).toEqual(['open']);
  expect(await db('throttles').pluck<string[]>('key_hash')).toEqual(['open']);
  expect(await db('idempotency_keys').pluck<string[]>('idempotency_key')).toEqual(['open']);
});
