import { describe, expect, vi } from 'vitest';
import { draftSchema, notePageSchema } from '#shared/api/notes.ts';
import { recordPointsSchema, recordSchema } from '#shared/api/records.ts';
import { markSchema } from '#shared/note/plan.ts';
import { createHandlers } from '../../server/outbox/handlers.ts';
import { workOnce } from '../../server/outbox/worker.ts';
import { readRecord } from '../../server/records/read-record.ts';
import { test, type Client } from '../support/api.ts';
import { cookiesOf } from '../support/pages.ts';
import {
  addKiln,
  completeFields,
  decideOn,
  handIn,
  saveDraft,
  startNote,
} from '../support/notes.ts';
import {
  MINUTES_CELSIUS,
  readUpload as read,
  recordPath as pathOf,
  uploadRecord,
} from '../support/records.ts';
import { slowUpload } from '../support/slow-upload.ts';

// Seconds alone, more where the machine is shared.
vi.setConfig({ testTimeout: 90_000 });

/** A plain climb, `count` readings. */
function climb(count: number, line = (minute: number, celsius: number) => `${minute},${celsius}`) {
  return Array.from({ length: count }, (_, index) =>
    line(index / 4, Math.round((20 + (980 * index) / count) * 10) / 10),
  );
}

describe('an uploaded record', () => {
  test('is promised to the outbox, read on its own thread, and then ready', async ({
    committedApi: api,
  }) => {
    const author = await api.signedIn();
    const draft = await startNote(author, null);
    const answer = await uploadRecord(
      author,
      draft.id,
      ['minute,celsius', ...climb(50)].join('\n'),
    );
    expect(answer.status).toBe(201);
    const { id, status, count } = answer.as(recordSchema);
    expect({ status, count }).toEqual({ status: 'reading', count: null });

    const handlers = createHandlers(api.deps, {
      readRecord,
      indexNote: () => Promise.resolve(),
    });
    expect(await workOnce(api.deps, 'read-record', handlers['read-record'])).toBe(1);
    const ready = (await author.get(pathOf(draft.id, id))).as(recordSchema);
    expect(ready).toMatchObject({ status: 'ready', count: 50, unit: 'C', error: null });
    expect(ready.strip?.length).toBeGreaterThan(10);
    // Doing it twice changes nothing.
    await readRecord(api.deps, id);
    expect((await author.get(pathOf(draft.id, id))).as(recordSchema)).toEqual(ready);
  });

  test('that cannot be read says why and on which line, and can be chosen again', async ({
    api,
  }) => {
    const author = await api.signedIn();
    const draft = await startNote(author, null);
    const lines = climb(30, (minute, celsius) => `${celsius};${minute}`);
    lines[19] = '640.5;ten past';
    const file = ['celsius;minute', ...lines].join('\r\n');
    const choice = { delimiter: ';', timeColumn: 1, temperatureColumn: 0 } as const;
    const failed = await read(api, author, draft.id, file, choice);
    expect(failed).toMatchObject({ status: 'failed', count: null, strip: null });
    expect(failed.error?.line).toBe(21);
    expect(failed.error?.message).toContain('ten past');

    const kept = ['C;min', '20;0', '500;10', '900;20'].join('\n');
    const swapped = await read(api, author, draft.id, kept, { delimiter: ';' });
    expect(swapped.count).toBe(3);
    const again = await author.put(pathOf(draft.id, swapped.id), {
      choice: { ...MINUTES_CELSIUS, ...choice, unit: 'F' },
    });
    expect(again.as(recordSchema)).toMatchObject({ status: 'reading', count: null });
    await readRecord(api.deps, swapped.id);
    const mended = (await author.get(pathOf(draft.id, swapped.id))).as(recordSchema);
    expect(mended).toMatchObject({ status: 'ready', count: 3, unit: 'F' });
    expect(mended.strip?.at(-1)).toEqual([20, expect.closeTo(482.2, 1)]);
  });

  test('chosen again while it is being read is read by the last choice', async ({
    committedApi: api,
  }) => {
    const author = await api.signedIn();
    const draft = await startNote(author, null);
    const answer = await uploadRecord(
      author,
      draft.id,
      ['minute,celsius', ...climb(20)].join('\n'),
    );
    const { id } = answer.as(recordSchema);
    const first = readRecord(api.deps, id);
    const chosen = await author.put(pathOf(draft.id, id), {
      choice: { ...MINUTES_CELSIUS, unit: 'K' },
    });
    expect(chosen.status).toBe(200);
    await first;
    await readRecord(api.deps, id);
    const now = (await author.get(pathOf(draft.id, id))).as(recordSchema);
    expect(now).toMatchObject({ status: 'ready', unit: 'K' });
  });

  test('is kept as it was sent, so that its columns can be chosen again in another visit', async ({
    api,
  }) => {
    const author = await api.signedIn();
    const draft = await startNote(author, null);
    // Latin-1 with an old logger's line ends: not a byte may differ.
    const bytes = Buffer.from('Zeit;°C\r\n0;20,5\r\n10;310\r\n20;480\r\n', 'latin1');
    const choice = { delimiter: ';', decimal: ',' } as const;
    const record = await read(api, author, draft.id, bytes, choice);
    expect(record).toMatchObject({ status: 'ready', choice: { ...MINUTES_CELSIUS, ...choice } });
    const file = await fetch(`${api.baseUrl}${pathOf(draft.id, record.id)}/file`, {
      headers: { Cookie: cookiesOf(author) },
    });
    expect(Buffer.from(await file.arrayBuffer()).equals(bytes)).toBe(true);
    expect(file.headers.get('content-type')).toBe('application/octet-stream');
    expect(file.headers.get('content-disposition')).toMatch(/^attachment/);
    expect(file.headers.get('content-security-policy')).toContain('sandbox');
    expect(file.headers.get('cache-control')).toContain('no-store');
    // Without its file there is nothing to choose again.
    await api.db('records').where({ id: record.id }).update({ storage_key: null });
    expect((await author.get(`${pathOf(draft.id, record.id)}/file`)).status).toBe(404);
    const without = (await author.get(pathOf(draft.id, record.id))).as(recordSchema);
    expect(without.choice).toBeNull();
  });

  test('is nobody else’s to see or to choose', async ({ api }) => {
    const author = await api.signedIn();
    const draft = await startNote(author, null);
    const own = await read(api, author, draft.id, 'm,c\n0,20\n5,300\n9,500');
    const moderator = await api.signedIn('moderator');
    const other = await api.signedIn();
    const othersDraft = await startNote(other, null);
    for (const client of [other, moderator]) {
      expect((await client.get(pathOf(draft.id, own.id))).status).toBe(404);
      expect((await client.get(`${pathOf(draft.id, own.id)}/file`)).status).toBe(404);
      const put = await client.put(pathOf(draft.id, own.id), { choice: MINUTES_CELSIUS });
      expect(put.status).toBe(404);
      expect((await uploadRecord(client, draft.id, 'm,c\n0,20')).status).toBe(404);
      for (const of of ['draft', 'handed-in', 'published']) {
        const url = `/api/notes/${String(draft.id)}/record.csv?of=${of}`;
        expect((await client.get(url)).status, of).toBe(404);
      }
    }
    // Nor by way of a note of one's own.
    expect((await other.get(pathOf(othersDraft.id, own.id))).status).toBe(404);
    const fields = {
      ...othersDraft.fields,
      record: { ...othersDraft.fields.record, recordId: own.id },
    };
    const stolen = await other.put(
      `/api/notes/${String(othersDraft.id)}/draft`,
      { fields },
      { headers: { 'If-Match': `"v${String(othersDraft.version)}"` } },
    );
    expect(stolen.status).toBe(422);
    expect(stolen.problem.errors?.[0]?.pointer).toBe('/fields/record/recordId');
  });

  test('comes out of the export as it went in', async ({ api }) => {
    const author = await api.signedIn();
    const moderator = await api.signedIn('moderator');
    const kiln = await addKiln(author);
    const draft = await startNote(author, kiln.id);
    // Steps of 15 seconds with one sharp peak between two points of any thinning.
    const lines = climb(6000).map((line, index) => (index === 3333 ? `${index / 4},1101.7` : line));
    const record = await read(api, author, draft.id, ['minute,celsius', ...lines].join('\n'));
    const fields = completeFields(kiln.id);
    await handIn(author, draft, {
      ...fields,
      record: { ...fields.record, typedRows: [], marks: [], recordId: record.id },
    });
    const csvPath = `/api/notes/${String(draft.id)}/record.csv`;
    const visitor = api.client();
    expect((await visitor.get(csvPath)).status).toBe(404);
    expect((await moderator.get(`${csvPath}?of=handed-in`)).status).toBe(200);
    await decideOn(moderator, draft.id, 'publish');

    const csv = await visitor.get(csvPath);
    expect(csv.headers.get('content-disposition')).toBe(
      `attachment; filename=firing-${String(draft.id)}.csv`,
    );
    expect(csv.headers.get('content-type')).toBe('text/csv; charset=utf-8');
    const rows = csv.text.trim().split('\r\n');
    expect(rows.shift()).toBe('minute,celsius');
    expect(rows).toHaveLength(lines.length);
    const values = (row: string | undefined) => (row ?? '').split(',').map(Number);
    for (const [index, row] of rows.entries()) {
      const [minute = NaN, celsius = NaN] = values(row);
      const [wasMinute = NaN, wasCelsius = NaN] = values(lines[index]);
      if (Math.abs(minute - wasMinute) > 0.001 || Math.abs(celsius - wasCelsius) > 0.05) {
        expect(row, `line ${String(index + 2)}`).toBe(lines[index]);
      }
    }
    const chart = (await visitor.get(`/api/notes/${String(draft.id)}/record`)).as(
      recordPointsSchema,
    );
    expect(chart.count).toBe(6000);
    expect(chart.points.length).toBeLessThanOrEqual(3000);
    expect(Math.max(...chart.points.map(([, celsius]) => celsius))).toBe(1101.7);
    const page = (await visitor.get(`/api/notes/${String(draft.id)}`)).as(notePageSchema);
    expect(page.hasRecord).toBe(true);
  });

  test('is exported with its second probe, and with the marks of the state asked for', async ({
    api,
  }) => {
    const author = await api.signedIn();
    const moderator = await api.signedIn('moderator');
    const kiln = await addKiln(author);
    const draft = await startNote(author, kiln.id);
    const lines = climb(60, (minute, celsius) => `${minute},${celsius},${celsius + 12}`);
    const record = await read(api, author, draft.id, ['m,top,floor', ...lines].join('\n'), {
      secondColumn: 2,
    });
    const fields = completeFields(kiln.id);
    const lit = markSchema.parse({ minute: 0, kind: 'lit' });
    const withMarks = (marks: (typeof lit)[]) => ({
      ...fields,
      record: { ...fields.record, typedRows: [], marks, recordId: record.id },
    });
    await handIn(author, draft, withMarks([lit]));
    await decideOn(moderator, draft.id, 'publish');
    expect((await author.post(`/api/notes/${String(draft.id)}/revise`)).status).toBe(200);
    const revising = (await author.get(`/api/notes/${String(draft.id)}/draft`)).as(draftSchema);
    await saveDraft(author, revising, withMarks([{ ...lit, kind: 'gas-up' }]));

    const csv = async (client: Client, of: string) =>
      (await client.get(`/api/notes/${String(draft.id)}/record.csv?of=${of}`)).text.split('\r\n');
    const published = await csv(api.client(), 'published');
    expect(published[0]).toBe('minute,probe 1 celsius,probe 2 celsius,mark');
    expect(published).toContain('0,,,Lit');
    const cells = (line: string | undefined) => (line ?? '').split(',').slice(0, 3).map(Number);
    const readings = published.slice(1, -1).filter((line) => !line.endsWith('Lit'));
    expect(readings.map(cells)).toEqual(
      lines.map((line) => cells(line).map((value) => expect.closeTo(value, 3) as number)),
    );
    expect(await csv(author, 'draft')).toContain('0,,,Gas up');
  });
});

describe('a refused upload', () => {
  test('is answered before a megabyte of it was read', async ({ api }) => {
    const author = await api.signedIn();
    const draft = await startNote(author, null);
    for (const kind of ['records', 'pictures']) {
      const path = `/api/notes/${String(draft.id)}/${kind}`;
      const size = 16 * 1024 * 1024;
      const refused = await slowUpload(api, api.client(), path, size);
      expect(refused.status, kind).toBe(401);
      expect(refused.answer.toLowerCase()).toContain('connection: close');
      expect(refused.sent).toBeLessThan(1024 * 1024);
      // Nor is the upload to another's note, for whom there is nothing here.
      const other = await slowUpload(api, await api.signedIn(), path, size);
      expect(other.status, kind).toBe(404);
      expect(other.sent).toBeLessThan(1024 * 1024);
    }
  });
});
