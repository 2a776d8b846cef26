import { describe, expect } from 'vitest';
import { test } from '../support/api.ts';
import { startNote } from '../support/notes.ts';
import { readUpload as read, uploadRecord } from '../support/records.ts';
import { slowUpload } from '../support/slow-upload.ts';

describe('files of every kind', () => {
  const TABLE = ['Zeit;Température', '0;20,5', '10;512,25', '20;998,75'].join('\r\n');
  const GERMAN = { delimiter: ';', decimal: ',' } as const;
  const utf16 = (bigEndian: boolean): Uint8Array => {
    const bytes = Buffer.from(`\ufeff${TABLE}`, 'utf16le');
    return new Uint8Array(bigEndian ? bytes.swap16() : bytes);
  };
  test.for([
    ['UTF-8', Buffer.from(TABLE)],
    ['UTF-8 with a byte-order mark', Buffer.from(`\ufeff${TABLE}`)],
    ['Latin-1', Buffer.from(TABLE, 'latin1')],
    ['UTF-16, least byte first', utf16(false)],
    ['UTF-16, greatest byte first', utf16(true)],
  ] as const)('%s is read', async ([, bytes], { api }) => {
    const author = await api.signedIn();
    const draft = await startNote(author, null);
    const record = await read(api, author, draft.id, bytes, GERMAN);
    expect(record).toMatchObject({ status: 'ready', count: 3 });
    const points = await author.get(`/api/notes/${String(draft.id)}/record?of=draft`);
    expect(points.status).toBe(404);
    expect(record.strip).toEqual([
      [0, 20.5],
      [10, expect.closeTo(512.25, 1)],
      [20, expect.closeTo(998.75, 1)],
    ]);
  });

  const hostile: readonly [string, () => string, RegExp][] = [
    ['a million rows', () => `m,c\n${'1,20\n'.repeat(1_000_000)}`, /200,000 rows/],
    ['20,000 columns', () => `m,c\n${'1,'.repeat(20_000)}\n`, /50 columns/],
    ['one line of 9 MB', () => `m,c\n0,${'9'.repeat(9_000_000)}`, /longer than 1 kB/],
    ['5 million line ends', () => '\n'.repeat(5_000_000), /No reading was found/],
    ['2 million quotation marks', () => '"'.repeat(2_000_000), /longer than 1 kB|never closed/],
    ['2 million comments', () => `m,c\n${'#\n'.repeat(2_000_000)}`, /No reading was found/],
    ['zeros', () => '\0'.repeat(3_000_000), /longer than 1 kB|No reading/],
  ];
  test.for(hostile)(
    '%s fail with a reason, within 5 seconds of work',
    async ([, content, message], { api }) => {
      const author = await api.signedIn();
      const draft = await startNote(author, null);
      const before = process.cpuUsage();
      const record = await read(api, author, draft.id, content());
      const used = process.cpuUsage(before);
      expect(record.status).toBe('failed');
      expect(record.error?.message).toMatch(message);
      expect((used.user + used.system) / 1e6).toBeLessThan(5);
      // The failed import has left nothing that could be taken for readings.
      const contents = await api.db('record_contents').count<{ n: number }[]>({ n: '*' });
      expect(contents[0]?.n).toBe(0);
    },
  );

  test('a line of 12 MB is refused with the limit named', async ({ api }) => {
    const author = await api.signedIn();
    const draft = await startNote(author, null);
    const path = `/api/notes/${String(draft.id)}/records`;
    const { status, answer } = await slowUpload(api, author, path, 12_000_000);
    expect(status).toBe(413);
    expect(answer).toContain('10 MiB');
    expect(await api.db('records').select('id')).toEqual([]);
  });

  test('a choice that makes no sense is refused and leaves nothing', async ({ api }) => {
    const author = await api.signedIn();
    const draft = await startNote(author, null);
    const bad: Record<string, unknown>[] = [
      { timeColumn: -1 },
      { temperatureColumn: 50 },
      { delimiter: '/' },
      { unit: 'R' },
      { headerLine: 0 },
      { timeFormat: '__proto__' },
    ];
    for (const wrong of bad) {
      const answer = await uploadRecord(author, draft.id, 'm,c\n0,20', wrong);
      expect(answer.status, JSON.stringify(wrong)).toBe(422);
    }
    const form = new FormData();
    form.set('file', new Blob(['m,c\n0,20']), 'a.csv');
    const path = `/api/notes/${String(draft.id)}/records`;
    const without = await author.post(path, undefined, { rawBody: form });
    expect(without.status).toBe(400);
    expect(await api.db('records').select('id')).toEqual([]);
  });
});
