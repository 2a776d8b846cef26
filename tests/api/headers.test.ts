import { describe, expect } from 'vitest';
import { startNote } from '../support/notes.ts';
import { cookiesOf, LEAKS, test } from '../support/pages.ts';
import { keptPicture, plainPicture } from '../support/pictures.ts';

/** What a content security policy allows, directive by directive. */
function policyOf(headers: Headers): Map<string, string[]> {
  const text = headers.get('content-security-policy') ?? '';
  return new Map(
    text
      .split(';')
      .map((part) => part.trim().split(/\s+/))
      .map(([name = '', ...values]) => [name, values]),
  );
}

describe('every answer', () => {
  test('carries the policy and the other headers: page, file, API, media, 404 and 500', async ({
    api,
    serve,
  }) => {
    const author = await api.signedIn();
    const draft = await startNote(author, null);
    const picture = await keptPicture(author, draft.id, await plainPicture().png().toBuffer());
    const url = await serve(api.deps);
    const broken = await serve({
      ...api.deps,
      store: {
        ...api.deps.store,
        read: () => {
          throw new Error('SECRET at /home/someone: SELECT password_hash');
        },
      },
    });
    const media = `/media/pictures/${picture.name}/64.webp`;
    const cookies = cookiesOf(author);
    const cases: [string, number, RegExp | null][] = [
      [`${url}/`, 200, /^text\/html; charset=utf-8$/],
      [`${url}/no/such/page`, 404, /^text\/html; charset=utf-8$/],
      [`${url}/.git/config`, 404, /^text\/html; charset=utf-8$/],
      [`${url}/.env`, 404, /^text\/html; charset=utf-8$/],
      [`${url}/assets/a-1b2c.js`, 200, /^text\/javascript; charset=utf-8$/],
      [`${url}/assets/a-1b2c.js.map`, 404, /html|problem/],
      [`${url}/assets/`, 404, /html|problem/],
      [`${url}/robots.txt`, 200, /^text\/plain; charset=utf-8$/],
      [`${url}/health/live`, 200, /^application\/json; charset=utf-8$/],
      [`${url}/api/front`, 200, /^application\/json; charset=utf-8$/],
      [`${url}/api/nothing`, 404, /^application\/problem\+json/],
      [`${url}/api/notes?x=1`, 400, /^application\/problem\+json/],
      [`${url}/api/sessions`, 200, /^application\/json/],
      [`${url}${media}`, 200, /^image\/webp$/],
      [`${url}/media/pictures/x/y`, 404, /^application\/problem\+json/],
      [`${broken}${media}`, 500, /^application\/problem\+json/],
    ];
    for (const [address, status, type] of cases) {
      const answer = await fetch(address, { headers: { Cookie: cookies }, redirect: 'manual' });
      const { headers } = answer;
      const text = await answer.text();
      expect([address, answer.status]).toEqual([address, status]);
      if (type) expect(headers.get('content-type'), address).toMatch(type);
      const policy = policyOf(headers);
      const isFile = policy.has('sandbox');
      expect(isFile, address).toBe(status === 200 && address.includes('/media/'));
      if (isFile) {
        expect(policy.get('default-src')).toEqual(["'none'"]);
      } else {
        expect(policy.get('default-src'), address).toEqual(["'self'"]);
        for (const name of ['script-src', 'style-src', 'connect-src', 'font-src', 'form-action']) {
          expect(policy.get(name), `${address} ${name}`).toEqual(["'self'"]);
        }
        for (const name of ['object-src', 'base-uri', 'frame-ancestors']) {
          expect(policy.get(name), `${address} ${name}`).toEqual(["'none'"]);
        }
        expect(policy.get('img-src'), address).not.toContain('*');
        expect(policy.get('report-uri'), address).toEqual(['/api/csp-reports']);
        expect(headers.get('content-security-policy')).not.toMatch(/unsafe|https?:|\*/);
      }
      const fixed: Record<string, string | null> = {
        'x-content-type-options': 'nosniff',
        'referrer-policy': 'strict-origin-when-cross-origin',
        'cross-origin-opener-policy': 'same-origin',
        'cross-origin-resource-policy': 'same-origin',
        'x-frame-options': 'DENY',
        'x-powered-by': null,
        server: null,
        'access-control-allow-origin': null,
        // Plain HTTP here: a browser would ignore it.
        'strict-transport-security': null,
      };
      for (const [name, value] of Object.entries(fixed)) {
        expect([address, name, headers.get(name)]).toEqual([address, name, value]);
      }
      expect(headers.get('permissions-policy'), address).toContain('camera=()');
      expect(headers.get('x-request-id'), address).toMatch(/^[0-9a-f-]{36}$/);
      if (status >= 400) {
        expect(text, address).not.toMatch(LEAKS);
        if (address.includes('/api/')) expect(headers.get('cache-control')).toBe('no-store');
      }
      // Pages and files are the same for everybody; what depends on the asker is kept by nobody.
      if (address === `${url}/api/sessions`) expect(headers.get('cache-control')).toBe('no-store');
      if (address === `${url}/assets/a-1b2c.js`) {
        expect(headers.get('cache-control')).toBe('public, max-age=31536000, immutable');
      }
    }
    const secure = await serve({
      ...api.deps,
      config: { ...api.deps.config, publicUrl: 'https://notes.example.org' },
    });
    for (const where of ['/', '/api/front', '/nothing/here']) {
      const { headers } = await fetch(secure + where);
      expect(headers.get('strict-transport-security'), where).toBe(
        'max-age=31536000; includeSubDomains',
      );
    }
  });

  test('to a foreign origin says nothing of sharing', async ({ api, serve }) => {
    const url = await serve(api.deps);
    for (const origin of ['https://evil.example', 'null', `${url}.evil.example`, url]) {
      for (const method of ['GET', 'OPTIONS']) {
        const answer = await fetch(`${url}/api/front`, {
          method,
          headers: { Origin: origin, 'Access-Control-Request-Method': 'PUT' },
        });
        const names = [...answer.headers.keys()].filter((name) =>
          name.startsWith('access-control'),
        );
        expect([origin, method, names]).toEqual([origin, method, []]);
      }
    }
  });
});

describe('a problem', () => {
  test('has its type, its status and an id that the log has with the detail', async ({
    api,
    serve,
  }) => {
    const author = await api.signedIn();
    const draft = await startNote(author, null);
    const picture = await keptPicture(author, draft.id, await plainPicture().png().toBuffer());
    const cookies = cookiesOf(author);
    const url = await serve({
      ...api.deps,
      store: { ...api.deps.store, read: () => Promise.reject(new Error('the SECRET detail')) },
    });
    const answer = await fetch(`${url}/media/pictures/${picture.name}/64.webp`, {
      headers: { Cookie: cookies },
    });
    const problem = (await answer.json()) as Record<string, unknown>;
    expect(problem).toMatchObject({
      type: `${api.baseUrl}/problems/internal`,
      code: 'internal',
      status: 500,
      instance: answer.headers.get('x-request-id'),
    });
    const logged = api.logLines.find((line) => line.includes('the SECRET detail'));
    expect(logged).toContain(String(problem['instance']));
    const path = `/api/notes/${String(draft.id)}/draft`;
    const forced: [number, Promise<{ status: number; headers: Headers; text: string }>][] = [
      [400, api.client().get('/api/search?q=a&q=b')],
      [404, api.client().get('/api/notes/1e9')],
      [412, author.put(path, { fields: draft.fields }, { headers: { 'If-Match': '"v99"' } })],
      [413, author.put(path, { fields: 'x'.repeat(300_000) })],
      [
        415,
        author.post('/api/notes', undefined, { rawBody: 'x', headers: { 'Content-Type': 'a/b' } }),
      ],
      [422, author.put(path, { fields: 1 })],
      [428, author.put(path, { fields: draft.fields })],
    ];
    for (const [status, asked] of forced) {
      const { status: got, headers, text } = await asked;
      const body = JSON.parse(text) as { type: string; status: number; title: string };
      expect([status, body.status]).toEqual([got, status]);
      expect(body.type).toMatch(/^http:\/\/127\.0\.0\.1:\d+\/problems\/[a-z-]+$/);
      expect(body.title).not.toBe('');
      expect(headers.get('content-type')).toContain('application/problem+json');
      expect(text).not.toMatch(LEAKS);
    }
  });
});
