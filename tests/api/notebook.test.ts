import { describe, expect, vi } from 'vitest';
import { draftSchema, notebookSchema } from '#shared/api/notes.ts';
import { test, type Client } from '../support/api.ts';
import { addKiln, completeFields, saveDraft, stalledRows, startNote } from '../support/notes.ts';
import { readUpload } from '../support/records.ts';

// Seconds alone, more where the machine is shared.
vi.setConfig({ testTimeout: 90_000 });

async function entryOf(author: Client, noteId: number) {
  const { notes } = (await author.get('/api/notebook')).as(notebookSchema);
  return notes.find(({ id }) => id === noteId);
}

describe('the notebook', () => {
  test('draws the strip of a draft that was never handed in, of typed rows or of a file', async ({
    api,
  }) => {
    const author = await api.signedIn();
    const kiln = await addKiln(author);
    const draft = await startNote(author, kiln.id);
    expect(await entryOf(author, draft.id)).toMatchObject({ strip: null, stripWords: '' });
    const fields = completeFields(kiln.id, { date: '2026-05-01', stalledAt: 700 });
    const typed = await saveDraft(author, draft, fields);
    const drawn = await entryOf(author, draft.id);
    expect(drawn?.strip?.[0]).toEqual([0, 15]);
    expect(drawn?.strip?.at(-1)?.[0]).toBe(fields.record.typedRows.at(-1)?.minute);
    expect(drawn?.stripWords).toMatch(/^climbs to 70\d\s°C in .+, stays there/);

    const rows = stalledRows(640).map(({ minute, celsius }) => `${minute},${celsius}`);
    const record = await readUpload(api, author, draft.id, `m,c\n${rows.join('\n')}`);
    await saveDraft(author, typed, {
      ...fields,
      record: { ...fields.record, recordId: record.id },
    });
    const filed = await entryOf(author, draft.id);
    expect(filed?.strip).toEqual(record.strip);
    expect(filed?.stripWords).toMatch(/^climbs to 64\d\s°C/);

    // The next firing of the kiln shows it too.
    const next = await startNote(author, kiln.id);
    const later = await saveDraft(author, next, completeFields(kiln.id, { date: '2026-05-09' }));
    expect(later.earlier).toMatchObject({ noteId: draft.id, strip: record.strip });
    expect(later.earlier?.stripWords).toBe(filed?.stripWords);
  });

  test('never draws another note’s record, nor one still being read', async ({ api }) => {
    const author = await api.signedIn();
    const draft = await startNote(author, null);
    const record = await readUpload(api, author, draft.id, 'm,c\n0,20\n5,300\n9,500\n15,640');
    await saveDraft(author, draft, {
      ...draft.fields,
      record: { ...draft.fields.record, recordId: record.id },
    });
    expect((await entryOf(author, draft.id))?.strip).toHaveLength(4);
    await api.db('records').where({ id: record.id }).update({ status: 'reading' });
    expect((await entryOf(author, draft.id))?.strip).toBeNull();
    const other = await startNote(author, null);
    await api.db('records').where({ id: record.id }).update({ status: 'ready', note_id: other.id });
    expect((await entryOf(author, draft.id))?.strip).toBeNull();
    const read = await author.get(`/api/notes/${String(draft.id)}/draft`);
    expect(read.as(draftSchema).record).toBeNull();
  });
});
