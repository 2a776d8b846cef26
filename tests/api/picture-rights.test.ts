import { once } from 'node:events';
import { connect } from 'node:net';
import { describe, expect, vi } from 'vitest';
import type { Picture } from '#shared/api/pictures.ts';
import type { Story } from '#shared/note/story.ts';
import { test, type Api, type Client } from '../support/api.ts';
import { addKiln, completeFields, decideOn, handIn, startNote } from '../support/notes.ts';
import { keptPicture, plainPicture, storedFiles, uploadPicture } from '../support/pictures.ts';

// Seconds alone, more where the machine is shared.
vi.setConfig({ testTimeout: 90_000 });

const storyWith = (...pictures: Picture[]): Story => ({
  type: 'doc',
  content: [
    { type: 'paragraph', content: [{ type: 'text', text: 'It came out like this.' }] },
    ...pictures.map(({ name }) => ({
      type: 'picture' as const,
      attrs: { name, alt: 'A bowl', caption: '' },
    })),
  ],
});

const filesOf = (picture: Picture): string[] =>
  [...picture.widths.map((width) => `${String(width)}.webp`), 'preview.jpg'].map(
    (file) => `/media/pictures/${picture.name}/${file}`,
  );

/** The statuses of every size, asked for plainly, conditionally and in part. */
async function statuses(client: Client, picture: Picture): Promise<number[]> {
  const seen = new Set<number>();
  for (const url of filesOf(picture)) {
    const plain = await client.get(url);
    seen.add(plain.status);
    const tag = plain.headers.get('etag') ?? `"${picture.name.slice(0, 16)}-x"`;
    for (const headers of [
      { 'If-None-Match': tag },
      { 'If-None-Match': `"other", W/${tag}` },
      { 'If-None-Match': '*' },
      { Range: 'bytes=0-9' },
    ]) {
      const asked = await client.get(url, { headers });
      seen.add(asked.status);
      if (plain.status === 404) expect(asked.text).not.toContain('RIFF');
    }
  }
  return [...seen].sort();
}

const SEEN = [200, 304];
const HIDDEN = [404];

describe('a picture', () => {
  test('follows its note: before, on the desk, published, revised and taken down', async ({
    api,
  }) => {
    const owner = await api.signedIn();
    const moderator = await api.signedIn('moderator');
    const who = { owner, moderator, other: await api.signedIn(), visitor: api.client() };
    const kiln = await addKiln(owner);
    const draft = await startNote(owner, kiln.id);
    const image = await plainPicture(500, 300).jpeg().toBuffer();
    const [placed, spare] = [
      await keptPicture(owner, draft.id, image),
      await keptPicture(owner, draft.id, image),
    ];
    expect(placed.widths).toEqual([480, 500]);
    const table = async (picture: Picture) => ({
      owner: await statuses(who.owner, picture),
      moderator: await statuses(who.moderator, picture),
      other: await statuses(who.other, picture),
      visitor: await statuses(who.visitor, picture),
    });
    const own = { owner: SEEN, moderator: HIDDEN, other: HIDDEN, visitor: HIDDEN };
    const all = { owner: SEEN, moderator: SEEN, other: SEEN, visitor: SEEN };
    expect(await table(placed)).toEqual(own);

    const fields = completeFields(kiln.id, { overrides: { story: storyWith(placed) } });
    await handIn(owner, draft, fields);
    expect(await table(placed)).toEqual({ ...own, moderator: SEEN });
    expect(await table(spare)).toEqual(own);

    await decideOn(moderator, draft.id, 'publish');
    expect(await table(placed)).toEqual(all);
    expect(await table(spare)).toEqual(own);
    const served = await who.visitor.get(filesOf(placed)[0] ?? '');
    expect(served.headers.get('cache-control')).toMatch(/^public, max-age=\d+/);
    expect(served.headers.get('content-type')).toBe('image/webp');
    expect(served.headers.get('content-security-policy')).toBe("default-src 'none'; sandbox");
    expect(served.headers.get('x-content-type-options')).toBe('nosniff');
    const hidden = await owner.get(filesOf(spare)[0] ?? '');
    expect(hidden.headers.get('cache-control')).toMatch(/^private/);

    // Revised: the new picture waits with its revision, the old one stays up.
    await owner.post(`/api/notes/${String(draft.id)}/revise`);
    const again = await owner.get(`/api/notes/${String(draft.id)}/draft`);
    const { version } = again.json as { version: number };
    await handIn(owner, { ...draft, version }, { ...fields, story: storyWith(spare) });
    expect(await table(placed)).toEqual(all);
    expect(await table(spare)).toEqual({ ...own, moderator: SEEN });
    await decideOn(moderator, draft.id, 'publish');
    expect(await table(placed)).toEqual(own);
    expect(await table(spare)).toEqual(all);

    const down = await moderator.post(`/api/notes/${String(draft.id)}/take-down`, {
      reason: 'Asked for by its author.',
    });
    expect(down.status).toBe(200);
    expect(await table(spare)).toEqual(own);
  });

  test('of a kiln is seen where the kiln is, and altered by its keeper only', async ({ api }) => {
    const keeper = await api.signedIn();
    const other = await api.signedIn();
    const kiln = await addKiln(keeper);
    const form = () => {
      const made = new FormData();
      made.set('file', new Blob([new Uint8Array(image)]), 'kiln.png');
      return made;
    };
    const image = await plainPicture(500, 300).png().toBuffer();
    const path = `/api/kilns/${String(kiln.id)}/picture`;
    expect((await other.post(path, undefined, { rawBody: form() })).status).toBe(404);
    const answer = await keeper.post(path, undefined, { rawBody: form() });
    expect(answer.status, answer.text).toBe(201);
    const picture = answer.json as Picture;
    expect(await statuses(keeper, picture)).toEqual(SEEN);
    expect(await statuses(other, picture)).toEqual(HIDDEN);
    expect(await statuses(api.client(), picture)).toEqual(HIDDEN);
  });

  test('names that are none are nothing, never a path', async ({ api }) => {
    const visitor = api.client();
    const name = '0'.repeat(32);
    for (const path of [
      `/media/pictures/${name}/480.webp`,
      `/media/pictures/${name}/..%2f..%2f480.webp`,
      `/media/pictures/..%2f..%2fetc/480.webp`,
      `/media/pictures/${name}/480.webp%00.html`,
      `/media/pictures/${name}/preview.jpg.part`,
      `/media/pictures/${name}`,
      '/media/pictures/%/480.webp',
      '/media/',
    ]) {
      const answer = await visitor.get(path);
      expect([path, answer.status]).toEqual([path, 404]);
      expect(answer.headers.get('content-type')).toContain('application/problem+json');
    }
  });
});

describe('broken multipart', () => {
  /** One broken request; ends when the server has answered or hung up. */
  async function broken(api: Api, client: Client, path: string, kind: number): Promise<string> {
    const cookies = [...client.cookies].map(([name, value]) => `${name}=${value}`).join('; ');
    const type = [
      'multipart/form-data',
      'multipart/form-data; boundary=x',
      'multipart/form-data; boundary=',
      `multipart/form-data; boundary=${'x'.repeat(300)}`,
      'multipart/form-data; boundary=x; boundary=y',
    ][kind % 5];
    const part = (name: string) => `--x\r\nContent-Disposition: form-data; ${name}\r\n\r\n`;
    const body =
      [
        `${part('name="file"; filename="a.jpg"')}\xff\xd8\xff cut short`,
        `${part('name="file"')}no file at all\r\n--x--\r\n`,
        `${part('name="1"')}a\r\n${part('name="a[b][c]"')}b\r\n${part('name="__proto__[x]"')}c\r\n--x--\r\n`,
        `--x\r\n${'X-Many: 1\r\n'.repeat(3000)}\r\n\r\n--x--`,
        `${part('name="file"; filename="a.jpg"')}`.repeat(30),
        '\r\n\r\n\r\n',
        `--x\r\nContent-Disposition: form-data; name="file"; filename*=UTF-8''%ff%fe\r\n\r\nx\r\n--x--\r\n`,
      ][kind % 7] ?? '';
    const socket = connect(Number(new URL(api.baseUrl).port), '127.0.0.1');
    socket.on('error', () => undefined);
    let answer = '';
    socket.on('data', (bytes: Buffer) => (answer += bytes.toString('latin1')));
    await once(socket, 'connect');
    const promised = kind % 2 === 0 ? body.length : body.length + 5000;
    socket.write(
      `POST ${path} HTTP/1.1\r\nHost: 127.0.0.1\r\nOrigin: ${api.baseUrl}\r\nCookie: ${cookies}\r\nX-Spyhole-Token: ${client.token ?? ''}\r\nContent-Type: ${type ?? ''}\r\nContent-Length: ${String(promised)}\r\nConnection: close\r\n\r\n`,
    );
    socket.end(Buffer.from(body, 'latin1'));
    if (!socket.destroyed) await once(socket, 'close');
    return answer;
  }

  test('50 times leaves the process alive, no file behind and no connection open', async ({
    api,
  }) => {
    const owner = await api.signedIn();
    const draft = await startNote(owner, null);
    const path = `/api/notes/${String(draft.id)}/pictures`;
    const sockets = () =>
      process.getActiveResourcesInfo().filter((name) => name === 'TCPSocketWrap').length;
    const before = sockets();
    for (let kind = 0; kind < 50; kind += 1) {
      const answer = await broken(api, owner, path, kind);
      if (answer !== '') expect(answer, String(kind)).toMatch(/^HTTP\/1\.1 4\d\d /);
    }
    expect(({} as Record<string, unknown>)['x']).toBeUndefined();
    expect(await storedFiles(api)).toEqual([]);
    expect(sockets()).toBeLessThanOrEqual(before + 1);
    expect((await api.client().get('/health/ready')).status).toBe(200);
    const image = await plainPicture().jpeg().toBuffer();
    expect((await uploadPicture(owner, draft.id, image)).status).toBe(201);
    expect(api.logLines.filter((line) => line.includes('request failed'))).toEqual([]);
  });
});
