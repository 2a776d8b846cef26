import { gzipSync, deflateSync } from 'node:zlib';
import { describe, expect, vi } from 'vitest';
import { pictureSchema } from '#shared/api/pictures.ts';
import { test } from '../support/api.ts';
import { startNote } from '../support/notes.ts';
import {
  keptPicture as kept,
  plainPicture,
  pngClaiming,
  storedFiles as stored,
  uploadPicture,
} from '../support/pictures.ts';
import { slowUpload } from '../support/slow-upload.ts';

// Seconds alone, more where the machine is shared.
vi.setConfig({ testTimeout: 90_000 });

const bytes = (text: string) => new Uint8Array(Buffer.from(text));
const SVG =
  '<svg xmlns="http://www.w3.org/2000/svg" width="9" height="9"><script>alert(1)</script></svg>';

describe('what is taken for a picture', () => {
  test('is decided by its content: all but JPEG, PNG and WebP is refused, however it is called', async ({
    api,
  }) => {
    const author = await api.signedIn();
    const draft = await startNote(author, null);
    const refused: [string, Uint8Array][] = [
      ['GIF', await plainPicture().gif().toBuffer()],
      ['TIFF', await plainPicture().tiff().toBuffer()],
      ['AVIF', await plainPicture().avif({ effort: 0 }).toBuffer()],
      ['PDF', bytes('%PDF-1.4\n1 0 obj<</Type/Catalog>>endobj\ntrailer<</Root 1 0 R>>')],
      ['HTML', bytes('<!doctype html><script>alert(1)</script>')],
      ['HTML behind the first bytes of a PNG', bytes('\x89PNG<script>alert(1)</script>')],
      ['GIF with a script', bytes('GIF89a/*<svg/onload=alert(1)>*/=1;')],
      ['nothing', bytes(' ')],
      ['SVG', bytes(SVG)],
      ['SVG with a declaration', bytes(`\ufeff<?xml version="1.0"?>\n${SVG}`)],
      ['SVG behind a comment', bytes(`   <!-- ${'x'.repeat(2000)} -->${SVG}`)],
      ['SVG in UTF-16', new Uint8Array(Buffer.from(`\ufeff${SVG}`, 'utf16le'))],
      ['SVG, zipped', gzipSync(SVG)],
      [
        'SVG behind the first bytes of a JPEG',
        Buffer.concat([Buffer.from([0xff, 0xd8, 0xff]), bytes(SVG)]),
      ],
      ['SVG in a WebP’s frame', Buffer.concat([bytes('RIFF\0\0\0\0WEBP'), bytes(SVG)])],
      ['a JPEG cut in half', (await plainPicture(400, 300).jpeg().toBuffer()).subarray(0, 900)],
    ];
    for (const [what, content] of refused) {
      for (const [name, type] of [
        ['photo.jpg', 'image/jpeg'],
        ['photo.png', 'image/png'],
      ] as const) {
        const answer = await uploadPicture(author, draft.id, content, name, type);
        expect(answer.status, what).toBe(422);
        expect(answer.problem.code, what).toBe('bad-picture');
      }
    }
    const heic = Buffer.concat([Buffer.from([0, 0, 0, 24]), bytes('ftypheic\0\0\0\0mif1heic')]);
    const answer = await uploadPicture(author, draft.id, heic, 'IMG_0001.HEIC', 'image/heic');
    expect(answer.problem.detail).toMatch(/HEIC.*Most compatible/);
    expect(await stored(api)).toEqual([]);
  });

  test('a picture called something else is a picture all the same', async ({ api }) => {
    const author = await api.signedIn();
    const draft = await startNote(author, null);
    const names = [
      '../../../etc/passwd',
      '..\\..\\boot.ini',
      'a\r\nSet-Cookie: x=1.jpg',
      '\u202egpj.exe',
      `${'ä'.repeat(300)}.jpg`,
      '"; filename="b.jpg',
      'photo.svg',
    ];
    const image = await plainPicture().webp().toBuffer();
    for (const name of names) {
      const answer = await uploadPicture(author, draft.id, image, name, 'text/html');
      expect(answer.status, name).toBe(201);
      const { name: given, widths } = answer.as(pictureSchema);
      expect(given).toMatch(/^[0-9a-f]{32}$/);
      expect(widths).toEqual([64]);
    }
    const nul = await uploadPicture(author, draft.id, image, 'a\0.php');
    expect(nul.status).toBe(400);
    const files = await stored(api);
    expect(files).toHaveLength(names.length * 2);
    for (const file of files) {
      expect(file).toMatch(/^pictures\/[0-9a-f]{32}\/(64\.webp|preview\.jpg)$/);
    }
  });
});

describe('size', () => {
  test('30 million pixels are kept, more than 40 million refused, bombs before they are decoded', async ({
    api,
  }) => {
    const author = await api.signedIn();
    const draft = await startNote(author, null);
    const large = await kept(author, draft.id, await plainPicture(6000, 5000).jpeg().toBuffer());
    expect([large.width, large.height]).toEqual([1920, 1600]);
    const inflating = deflateSync(Buffer.alloc(60_000_000));
    const bombs: [string, Uint8Array, number][] = [
      ['41 MP', await plainPicture(8200, 5000).jpeg().toBuffer(), 413],
      ['256 MP', pngClaiming(16_000, 16_000), 413],
      ['2,500 MP', pngClaiming(50_000, 50_000), 413],
      ['a false size', pngClaiming(6000, 6000), 422],
      [
        'an inflating text',
        pngClaiming(8, 8, {
          rows: 8,
          extra: [['zTXt', Buffer.concat([bytes('a\0\0'), inflating])]],
        }),
        201,
      ],
      [
        'an inflating profile',
        pngClaiming(8, 8, {
          rows: 8,
          extra: [['iCCP', Buffer.concat([bytes('a\0\0'), inflating])]],
        }),
        201,
      ],
    ];
    for (const [what, bomb, status] of bombs) {
      const before = process.cpuUsage();
      const memoryBefore = process.memoryUsage().rss;
      const answer = await uploadPicture(author, draft.id, bomb);
      const used = process.cpuUsage(before);
      expect([answer.status, what]).toEqual([status, what]);
      expect((used.user + used.system) / 1e6, what).toBeLessThan(3);
      expect((process.memoryUsage().rss - memoryBefore) / 1e6, what).toBeLessThan(200);
      if (status === 413) expect(answer.problem.detail).toContain('40 million pixels');
    }
  });

  test('a strip of a picture is made small enough to be kept', async ({ api }) => {
    const author = await api.signedIn();
    const draft = await startNote(author, null);
    const strip = await plainPicture(10, 20_000).png().toBuffer();
    const picture = await kept(author, draft.id, strip);
    expect(picture.height).toBe(8000);
    expect(picture.width).toBe(4);
  });

  test('over 16 MiB, over one file or ten fields: 413, and over 20 pictures or the quota', async ({
    api,
  }) => {
    const author = await api.signedIn();
    const draft = await startNote(author, null);
    const path = `/api/notes/${String(draft.id)}/pictures`;
    const heavy = await slowUpload(api, author, path, 22_000_000);
    expect(heavy.status).toBe(413);
    expect(heavy.answer).toContain('16 MiB');
    expect(heavy.sent).toBeLessThan(1024 * 1024);

    const image = await plainPicture().jpeg().toBuffer();
    const several = new FormData();
    for (let index = 0; index < 50; index += 1) {
      several.append('file', new Blob([new Uint8Array(image)]), 'a.jpg');
    }
    expect((await author.post(path, undefined, { rawBody: several })).status).toBe(413);
    const fields = new FormData();
    for (let index = 0; index < 5000; index += 1) fields.set(`f${String(index)}`, 'x');
    fields.set('file', new Blob([new Uint8Array(image)]), 'a.jpg');
    expect((await author.post(path, undefined, { rawBody: fields })).status).toBe(413);

    const row = (size: number, index: number) => ({
      name: index.toString(16).padStart(32, '0'),
      owner_id: author.member.id,
      note_id: draft.id,
      width: 1,
      height: 1,
      widths: '[1]',
      placeholder: '',
      bytes: size,
    });
    await api.db('pictures').insert(Array.from({ length: 19 }, (_, index) => row(1000, index)));
    await kept(author, draft.id, image);
    const more = await uploadPicture(author, draft.id, image);
    expect(more.status).toBe(413);
    expect(more.problem.detail).toContain('20 pictures');
    await api
      .db('pictures')
      .where({ name: row(0, 0).name })
      .update({ bytes: 1024 ** 3, note_id: null });
    const full = await uploadPicture(author, draft.id, image);
    expect(full.status).toBe(413);
    expect(full.problem.detail).toContain('gigabyte');
    expect(await stored(api)).toHaveLength(2);
  });
});
