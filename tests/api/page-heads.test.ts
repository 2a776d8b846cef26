import { JSDOM } from 'jsdom';
import { describe, expect, vi } from 'vitest';
import { PAGE_PATTERNS } from '#shared/paths.ts';
import { addKiln, publishedNote, startNote } from '../support/notes.ts';
import { cookiesOf, LEAKS, test } from '../support/pages.ts';

// Seconds alone, more where the machine is shared.
vi.setConfig({ testTimeout: 90_000 });

describe('the head of a page', () => {
  const TITLES = [
    '</script><script>alert(1)</script>',
    '</title><img src=x onerror=alert(1)>',
    `"><meta http-equiv=refresh content="0;url=//host">`,
    `' onload='alert(1)`,
    '<!-- -->]]> &amp; &lt;b&gt; \u2028 $& $1 $`',
  ];

  test('holds titles, names and descriptions as text, whatever stands in them', async ({
    api,
    serve,
  }) => {
    const moderator = await api.signedIn('moderator');
    const url = await serve(api.deps);
    const plain = new JSDOM(await (await fetch(`${url}/`)).text()).window.document;
    const known = plain.querySelectorAll('head > *').length;
    const scripts = plain.querySelectorAll('script').length;
    for (const title of TITLES) {
      const author = await api.signedIn({ name: title });
      const kiln = await addKiln(author, { name: title.slice(0, 60) });
      const id = await publishedNote(author, moderator, kiln.id, { title, story: title });
      const notePage = await fetch(`${url}/notes/${String(id)}`);
      expect(notePage.status).toBe(200);
      const { document } = new JSDOM(await notePage.text()).window;
      const meta = (name: string) =>
        document.querySelector(`meta[property="${name}"]`)?.getAttribute('content');
      expect(document.title).toBe(`${title} · Spyhole`.replace(/[\t\n\f\r ]+/g, ' '));
      expect(meta('og:title')).toBe(`${title} · Spyhole`);
      expect(meta('og:url')).toMatch(new RegExp(`^${api.baseUrl}/notes/${String(id)}`));
      const json = document.querySelector('script[type="application/ld+json"]');
      const told = JSON.parse(json?.textContent ?? '') as {
        headline: string;
        author: { name: string };
      };
      expect(told).toMatchObject({ headline: title, author: { name: title } });
      // No element more than the head is made of.
      expect(document.querySelectorAll('script').length).toBe(scripts + 1);
      expect(document.querySelectorAll('img, meta[http-equiv]').length).toBe(0);
      expect(Math.abs(document.querySelectorAll('head > *').length - known)).toBeLessThanOrEqual(2);
      for (const [path, name] of [
        [`/kilns/${String(kiln.id)}`, title.slice(0, 60)],
        [`/members/${String(author.member.id)}`, title],
      ] as const) {
        const page = new JSDOM(await (await fetch(url + path)).text()).window.document;
        expect(page.title, path).toBe(`${name} · Spyhole`.replace(/[\t\n\f\r ]+/g, ' '));
        expect(page.querySelectorAll('script').length, path).toBe(scripts);
        expect(page.querySelectorAll('img, meta[http-equiv]').length, path).toBe(0);
      }
    }
  });

  test('is that of nothing for what a visitor does not find: 404', async ({ api, serve }) => {
    const author = await api.signedIn();
    const kiln = await addKiln(author, { name: 'A secret kiln' });
    const draft = await startNote(author, kiln.id);
    const url = await serve(api.deps);
    const cookies = cookiesOf(author);
    for (const path of [
      `/notes/${String(draft.id)}`,
      `/kilns/${String(kiln.id)}`,
      '/notes/999999999',
      '/notes/99999999999999999999999',
      '/notes/0',
      '/notes/1e3',
      '/members/999999999',
      '/what-helped/__proto__',
      '/what-helped/nothing',
      '/%2e%2e/%2e%2e/etc/passwd',
      '/a%00b',
      '/%E0%A4%A',
      '/notes/%ff',
    ]) {
      const answer = await fetch(url + path, { headers: { Cookie: cookies } });
      const text = await answer.text();
      expect([path, answer.status]).toEqual([path, 404]);
      expect(text).not.toContain('secret kiln');
      expect(text).not.toMatch(LEAKS);
      if (answer.headers.get('content-type')?.startsWith('text/html')) {
        expect(new JSDOM(text).window.document.title).toBe('Nothing here · Spyhole');
      }
    }
    const fixed = PAGE_PATTERNS.filter((pattern) => !pattern.includes(':'));
    for (const pattern of fixed) {
      const answer = await fetch(url + pattern);
      expect([pattern, answer.status]).toEqual([pattern, 200]);
      expect(answer.headers.get('set-cookie')).toBeNull();
    }
    for (const method of ['POST', 'PUT', 'DELETE']) {
      expect((await fetch(`${url}/notes`, { method })).status, method).toBe(404);
    }
  });
});
