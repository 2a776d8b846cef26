import { describe, expect } from 'vitest';
import { draftSchema } from '#shared/api/notes.ts';
import { recordPointsSchema } from '#shared/api/records.ts';
import { test } from '../support/api.ts';
import { saveDraft, startNote } from '../support/notes.ts';
import { readUpload } from '../support/records.ts';

const COUNT = 50_000;
const WILD_SECOND = 31_415;
const celsiusAt = (second: number): number =>
  second === WILD_SECOND ? 968 : Math.round((20 + second / 50 + Math.sin(second)) * 10) / 10;
/** A reading a second, a second probe five degrees below, and one second that is wild. */
const LONG = [
  'minute,celsius,second',
  ...Array.from(
    { length: COUNT },
    (_, second) =>
      `${String(second / 60)},${String(celsiusAt(second))},${String(celsiusAt(second) - 5)}`,
  ),
].join('\n');

describe('a part of a record', () => {
  test('is sent as finely as a screen can show it, extremes kept, both probes', async ({ api }) => {
    const author = await api.signedIn();
    const draft = await startNote(author, null);
    const record = await readUpload(api, author, draft.id, LONG, { secondColumn: 2 });
    await saveDraft(author, draft, {
      ...draftSchema.parse(draft).fields,
      record: { ...draft.fields.record, recordId: record.id },
    });
    const path = `/api/notes/${String(draft.id)}/record?of=draft`;
    const whole = (await author.get(path)).as(recordPointsSchema);
    expect(whole.count).toBe(COUNT);
    expect(whole.points.length).toBeLessThanOrEqual(3000);

    const at = WILD_SECOND / 60;
    const part = (await author.get(`${path}&from=${String(at - 10)}&to=${String(at + 10)}`)).as(
      recordPointsSchema,
    );
    // Twenty minutes hold 1,200 readings: fewer than four a column, so every one of them comes.
    expect(part.points.length).toBeGreaterThanOrEqual(1200);
    expect(part.points.length).toBeLessThanOrEqual(1203);
    expect(part.points.map(([, celsius]) => celsius)).toContain(968);
    expect(part.secondProbe?.map(([, celsius]) => celsius)).toContain(963);
    expect(part.count).toBe(COUNT);

    const all = (await author.get(`${path}&from=0&to=834`)).as(recordPointsSchema);
    expect(all.points.length).toBeGreaterThan(4000);
    expect(all.points.length).toBeLessThanOrEqual(8002);
    expect(all.points.map(([, celsius]) => celsius)).toContain(968);
  });

  test('has two ends in their order, and is nobody’s who may not see the whole', async ({
    api,
  }) => {
    const author = await api.signedIn();
    const draft = await startNote(author, null);
    const path = `/api/notes/${String(draft.id)}/record?of=draft`;
    for (const query of [
      'from=1',
      'to=1',
      'from=2&to=1',
      'from=1&to=1',
      'from=x&to=2',
      'from=1&to=1e9',
    ])
      expect((await author.get(`${path}&${query}`)).status, query).toBe(400);
    const other = await api.signedIn();
    expect((await other.get(`${path}&from=1&to=2`)).status).toBe(404);
  });

  test('of a file whose rows are in no order is in order of time', async ({ api }) => {
    const author = await api.signedIn();
    const draft = await startNote(author, null);
    const file = 'm,c\n0,20\n30,700\n10,300\n20,500\n40,900';
    const record = await readUpload(api, author, draft.id, file);
    await saveDraft(author, draft, {
      ...draft.fields,
      record: { ...draft.fields.record, recordId: record.id },
    });
    const path = `/api/notes/${String(draft.id)}/record?of=draft`;
    const minutes = async (query: string) =>
      (await author.get(path + query)).as(recordPointsSchema).points.map(([minute]) => minute);
    const whole = await minutes('');
    expect(whole).toEqual([...whole].sort((a, b) => a - b));
    expect(await minutes('&from=5&to=25')).toEqual([0, 10, 20, 30]);
  });
});
