import { describe, expect, vi } from 'vitest';
import { DESK_QUESTIONS } from '#shared/api/desk.ts';
import { draftSchema } from '#shared/api/notes.ts';
import type { KilnFields } from '#shared/note/kiln-fields.ts';
import { ROUTES } from '../../server/routes.ts';
import { test, type Client } from '../support/api.ts';
import { addKiln, completeFields, ifMatch, kilnFields, startNote } from '../support/notes.ts';

// Hundreds of requests each: seconds alone, more where the machine is shared.
vi.setConfig({ testTimeout: 90_000 });

/**
 * The two that no page of ours asks: reports of browsers, which change nothing, and the one click
 * with which a mail program ends mails (RFC 8058), whose signed address is the whole right
 * (`saved-searches.test.ts`).
 */
const FROM_ANYWHERE = ['/api/csp-reports', '/api/unsubscribe'];
const UNSAFE = ROUTES.filter(
  ({ method, path }) => method !== 'get' && !FROM_ANYWHERE.includes(path),
);
const pathOf = (path: string): string => path.replace(/:\w+/g, '1');
const nameOf = ({ method, path }: { method: string; path: string }): string => `${method} ${path}`;

describe('a change that does not come from our own page', () => {
  test('is refused on every route, however it is dressed up', async ({ api }) => {
    expect(UNSAFE.length).toBeGreaterThan(35);
    const admin = await api.signedIn('admin');
    const token = admin.token ?? '';
    const origin = api.baseUrl;
    const cases: [string, Record<string, string>, string[]][] = [
      ['no origin', { 'X-Spyhole-Token': token }, ['foreign-origin']],
      [
        'a foreign origin',
        { Origin: 'https://evil.example', 'X-Spyhole-Token': token },
        ['foreign-origin'],
      ],
      ['the null origin', { Origin: 'null', 'X-Spyhole-Token': token }, ['foreign-origin']],
      [
        'an origin that begins like ours',
        { Origin: `${origin}.evil.example`, 'X-Spyhole-Token': token },
        ['foreign-origin'],
      ],
      [
        'another port',
        { Origin: 'http://127.0.0.1:1', 'X-Spyhole-Token': token },
        ['foreign-origin'],
      ],
      [
        'a page of the same site only',
        { 'Sec-Fetch-Site': 'same-site', 'X-Spyhole-Token': token },
        ['foreign-origin'],
      ],
      [
        'another site',
        { 'Sec-Fetch-Site': 'cross-site', 'X-Spyhole-Token': token },
        ['foreign-origin'],
      ],
      ['no token', { Origin: origin }, ['token-refused']],
      ['a wrong token', { Origin: origin, 'X-Spyhole-Token': `${token}x` }, ['token-refused']],
      ['an empty token', { Origin: origin, 'X-Spyhole-Token': '' }, ['token-refused']],
    ];
    for (const route of UNSAFE) {
      for (const [what, headers, codes] of cases) {
        // Asking for a token is the one change that has none yet.
        if (route.path === '/api/session/token' && codes.includes('token-refused')) continue;
        const answer = await admin.send(route.method.toUpperCase(), pathOf(route.path), {
          body: {},
          headers,
          foreign: true,
        });
        expect([nameOf(route), what, answer.status]).toEqual([nameOf(route), what, 403]);
        expect(codes).toContain(answer.problem.code);
        expect(answer.headers.get('access-control-allow-origin')).toBeNull();
      }
    }
    // The session is still there: none of it signed anybody out.
    expect((await admin.get('/api/sessions')).status).toBe(200);
  });

  test('is refused on every route when it is a form or plain text, token or not', async ({
    api,
  }) => {
    const admin = await api.signedIn('admin');
    const types = ['text/plain', 'application/x-www-form-urlencoded', 'application/xml', 'x'];
    for (const route of UNSAFE) {
      for (const type of types) {
        const answer = await admin.send(route.method.toUpperCase(), pathOf(route.path), {
          rawBody: '{"a":1}',
          headers: { 'Content-Type': type, 'If-Match': '"v1"' },
        });
        // Rights of uploads are asked before the type.
        const expected = /pictures?$|records$/.test(route.path) ? [404, 415] : [415];
        expect([nameOf(route), type, expected.includes(answer.status)]).toEqual([
          nameOf(route),
          type,
          true,
        ]);
      }
    }
    expect((await admin.get('/api/sessions')).status).toBe(200);
  });

  test('is no change at all as a GET with another method in a header, query or body', async ({
    api,
  }) => {
    const author = await api.signedIn();
    const draft = await startNote(author, null);
    const path = `/api/notes/${String(draft.id)}`;
    for (const name of ['X-HTTP-Method-Override', 'X-HTTP-Method', 'X-Method-Override']) {
      const headers = { [name]: 'DELETE', ...ifMatch(draft.version).headers };
      expect((await author.get(`${path}?_method=DELETE`, { headers })).status).toBe(404);
      const posted = await author.post(
        `${path}?_method=DELETE`,
        { _method: 'DELETE' },
        { headers },
      );
      expect(posted.status).toBe(404);
    }
    expect((await author.get(`${path}/draft`)).status).toBe(200);
    for (const { method, path: route } of UNSAFE) {
      const answer = await author.get(pathOf(route));
      expect([nameOf({ method, path: route }), answer.status < 500]).toEqual([
        nameOf({ method, path: route }),
        true,
      ]);
    }
    expect((await author.get('/api/session')).json).toMatchObject({
      me: { id: author.member.id },
    });
  });
});

describe('a value of the wrong type', () => {
  const WRONG: readonly unknown[] = [
    {},
    { toString: 'x' },
    ['a'],
    true,
    null,
    -1.5e300,
    'a string',
  ];

  /** Each field of `body`, one after the other, with each wrong value. */
  async function tryAll(
    body: Record<string, unknown>,
    send: (body: Record<string, unknown>) => Promise<{ status: number; text: string }>,
  ): Promise<void> {
    for (const field of Object.keys(body)) {
      for (const value of WRONG) {
        const { status, text } = await send({ ...body, [field]: value });
        expect([field, value, status < 500]).toEqual([field, value, true]);
        expect(text).not.toMatch(/SQL|mysql|knex|at \w+ \(|node_modules/i);
      }
    }
  }

  test('in any field of a note, a kiln, a remark, a decision or an account is no error of ours', async ({
    api,
  }) => {
    const author = await api.signedIn();
    const moderator = await api.signedIn('moderator');
    const kiln = await addKiln(author);
    const draft = await startNote(author, kiln.id);
    let { version } = draft;
    const fields = completeFields(kiln.id);
    await tryAll(fields, async (changed) => {
      const path = `/api/notes/${String(draft.id)}/draft`;
      const answer = await author.put(path, { fields: changed }, ifMatch(version));
      if (answer.status === 200) version = answer.as(draftSchema).version;
      return answer;
    });
    for (const group of ['when', 'plan', 'result'] as const) {
      const inner = fields[group] as unknown as Record<string, unknown>;
      await tryAll(inner, async (changed) => {
        const path = `/api/notes/${String(draft.id)}/draft`;
        const body = { fields: { ...fields, [group]: changed } };
        const answer = await author.put(path, body, ifMatch(version));
        if (answer.status === 200) version = answer.as(draftSchema).version;
        return answer;
      });
    }
    const kilnBody = kilnFields() as KilnFields & Record<string, unknown>;
    await tryAll(kilnBody, (changed) =>
      author.put(`/api/kilns/${String(kiln.id)}`, { fields: changed }, ifMatch(999)),
    );
    const desk = `/api/desk/notes/${String(draft.id)}`;
    const bodies: [Client, string, Record<string, unknown>][] = [
      [author, '/api/notes', { kilnId: null, triedNoteId: null }],
      [author, '/api/kilns', { fields: {} }],
      [moderator, `${desk}/remarks`, { pointer: '/title', text: 'x' }],
      [
        moderator,
        `${desk}/decision`,
        { decision: 'publish', revisionId: 1, reason: '', checklist: DESK_QUESTIONS },
      ],
      [moderator, `/api/notes/${String(draft.id)}/take-down`, { reason: 'x' }],
      [api.client(), '/api/password-resets', { email: 'a@example.org' }],
    ];
    for (const [client, path, body] of bodies) {
      if (client.token === null) await client.fetchToken();
      await tryAll(body, (changed) => client.post(path, changed));
    }
    for (const body of [[], 'x', 1, null, true]) {
      expect((await author.post('/api/notes', body)).status, JSON.stringify(body)).toBeLessThan(
        500,
      );
    }
    expect(api.logLines.filter((line) => line.includes('request failed'))).toEqual([]);
  });

  test('days and times that there are not are refused', async ({ api }) => {
    const author = await api.signedIn();
    const draft = await startNote(author, null);
    const when = draft.fields.when;
    for (const wrong of [
      { date: '2026-02-30' },
      { date: '2026-13-01' },
      { date: '0000-00-00' },
      { date: '2026-05-02T10:00:00Z' },
      { date: '' },
      { startTime: '24:00' },
      { startTime: '9:05' },
    ]) {
      const answer = await author.put(
        `/api/notes/${String(draft.id)}/draft`,
        { fields: { ...draft.fields, when: { ...when, ...wrong } } },
        ifMatch(draft.version),
      );
      expect([wrong, answer.status]).toEqual([wrong, 422]);
    }
  });

  test('in a query is refused or ignored: repeated, nested, undecodable', async ({ api }) => {
    const visitor = api.client();
    const refused = [
      'q=a&q=b',
      'q[]=a',
      'q[$ne]=1',
      'a[b]=c',
      'sort=name;drop',
      'page=0',
      'page=x',
    ];
    refused.push('page=1e9', 'page=1&page=2', 'page=', 'limit=100000000', `q=${'x'.repeat(301)}`);
    refused.push(Array.from({ length: 900 }, (_, index) => `q[${String(index)}]=a`).join('&'));
    for (const query of refused) {
      for (const path of ['/api/search', '/api/notes']) {
        const answer = await visitor.get(`${path}?${query}`);
        expect([path, query.slice(0, 40), answer.status]).toEqual([path, query.slice(0, 40), 400]);
      }
    }
    for (const query of [
      'q=%00',
      'q=%ff%fe',
      'q=%c3%28',
      'q=%ed%a0%80',
      'q=%',
      'q=a%0d%0ab',
      'q',
    ]) {
      for (const path of ['/api/search', '/api/suggestions']) {
        const answer = await visitor.get(`${path}?${query}`);
        expect([path, query, answer.status < 500]).toEqual([path, query, true]);
      }
    }
    for (const path of [
      '/api/notes/1?a[b]=c',
      '/api/front?q=a&q=b',
      '/api/notes/%00',
      '/api/kilns/1e3',
      '/api/notes/99999999999999999999',
      '/api/notes/-1',
    ]) {
      expect((await visitor.get(path)).status, path).toBeLessThan(500);
    }
  });

  test('as a key that reaches for the prototype changes nothing', async ({ api }) => {
    const author = await api.signedIn();
    const draft = await startNote(author, null);
    const path = `/api/notes/${String(draft.id)}/draft`;
    const send = (rawBody: string) =>
      author.put(path, undefined, {
        rawBody,
        headers: { 'Content-Type': 'application/json', ...ifMatch(draft.version).headers },
      });
    for (const key of ['__proto__', 'constructor', 'prototype']) {
      const poison = `"${key}":{"role":"admin","prototype":{"role":"admin"}}`;
      const statuses = [
        await send(`{${poison}}`),
        await send(`{"fields":{${poison}}}`),
        await send(`{"fields":{"when":{${poison}}}}`),
        await send(
          `{"fields":{"story":{"type":"doc","content":[{"type":"paragraph",${poison}}]}}}`,
        ),
      ].map(({ status }) => status);
      // Refused, or read as if it were not there.
      for (const status of statuses) expect([200, 412, 422]).toContain(status);
      expect(({} as Record<string, unknown>)['role']).toBeUndefined();
    }
    const read = (await author.get(path)).text;
    expect(read).not.toContain('admin');
  });
});
