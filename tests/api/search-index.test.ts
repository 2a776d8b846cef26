import { describe, expect, vi } from 'vitest';
import type { FindAnswer } from '#shared/api/search.ts';
import { NOTES_INDEX, type NoteDocument } from '../../search/note-document.ts';
import { indexNote } from '../../server/search/index-note.ts';
import { mendIndex } from '../../server/search/mend-index.ts';
import { catchUpIndex, countInIndex, reindex } from '../../server/search/reindex.ts';
import { writingClient } from '../../server/search/search-client.ts';
import { completeFields, handIn, publishedNote, saveDraft, startNote } from '../support/notes.ts';
import { aSmallNotebook, test, type SearchApi } from '../support/search.ts';

vi.setConfig({ testTimeout: 90_000 });

const titles = (answer: FindAnswer): string[] => answer.hits.map(({ note }) => note.title);

/** Everything the engine holds, as text. */
async function wholeIndex(api: SearchApi): Promise<string> {
  const index = writingClient(api.deps.config).index<NoteDocument>(NOTES_INDEX);
  return JSON.stringify((await index.getDocuments({ limit: 1000 })).results);
}
const idsIn = async (api: SearchApi): Promise<number[]> =>
  (JSON.parse(await wholeIndex(api)) as NoteDocument[])
    .map(({ noteId }) => noteId)
    .sort((a, b) => a - b);

describe('the index', () => {
  test('never holds what is not published, and loses at once what is taken down', async ({
    searchApi: api,
  }) => {
    const { author, moderator, kilns, ids } = await aSmallNotebook(api);
    const kilnId = kilns[0]?.id ?? 0;
    const draft = await startNote(author, kilnId);
    await saveDraft(author, draft, completeFields(kilnId, { story: 'Canary of a draft.' }));
    const waiting = await startNote(author, kilnId);
    await handIn(author, waiting, completeFields(kilnId, { story: 'Canary at the desk.' }));
    const heron = ids[5] ?? 0;
    await author.post(`/api/notes/${String(heron)}/revise`);
    await api.catchUp();
    for (const noteId of [draft.id, waiting.id, heron]) await indexNote(api.deps, noteId);
    expect(await wholeIndex(api)).not.toContain('anary');
    expect(titles(await api.find('canary'))).toEqual([]);
    expect(titles(await api.find('heron'))).toEqual(['All went well']);

    const down = await moderator.post(`/api/notes/${String(heron)}/take-down`, {
      reason: 'Asked.',
    });
    expect(down.status).toBe(200);
    // Not shown from the next request on, though the engine has not been told yet.
    expect(titles(await api.find('heron'))).toEqual([]);
    await api.catchUp();
    expect(await wholeIndex(api)).not.toContain('heron');
  });

  test('is caught up with when the engine comes back; meanwhile the search is plain', async ({
    searchApi: api,
  }) => {
    const { author, moderator, kilns, ids } = await aSmallNotebook(api);
    await api.catchUp();
    await api.engine.stop();
    const kilnId = kilns[5]?.id ?? 0;
    const added = [
      await publishedNote(author, moderator, kilnId, {
        title: 'While it was away',
        date: '2026-06-01',
      }),
      await publishedNote(author, moderator, kilnId, { title: 'Kingfisher', date: '2026-06-08' }),
    ];
    const gone = ids[5] ?? 0;
    await moderator.post(`/api/notes/${String(gone)}/take-down`, { reason: 'Asked.' });
    const plain = await api.find('kingfisher');
    expect([plain.plain, titles(plain)]).toEqual([true, ['Kingfisher']]);
    expect(titles(await api.find('heron'))).toEqual([]);
    expect((await api.find('stalled at 700 °C')).hits.length).toBeGreaterThanOrEqual(3);
    expect((await api.client().get('/api/suggestions?q=stu')).status).toBe(200);
    await api.catchUp();
    const open = await api.db('outbox').where({ topic: 'index-note' }).whereNull('done_at');
    expect(open.length).toBeGreaterThan(0);

    await api.engine.start();
    await api.catchUp();
    const expected = [...ids.filter((id) => id !== gone), ...added].sort((a, b) => a - b);
    expect(await idsIn(api)).toEqual(expected);
    const back = await api.find('kingfisher');
    expect([back.plain, titles(back)]).toEqual([false, ['Kingfisher']]);
    // Once more, as after a kill between sending and marking: nothing changes.
    const before = await wholeIndex(api);
    await api.db('outbox').where({ topic: 'index-note' }).update({ done_at: null });
    await api.catchUp();
    expect(await wholeIndex(api)).toBe(before);
  });

  test('takes the rest when one note cannot be taken', async ({ searchApi: api }) => {
    const { ids } = await aSmallNotebook(api);
    const poison = ids[2] ?? 0;
    const row = { note_id: poison };
    const kept = await api
      .db('published_firings')
      .where(row)
      .first<{ note_row: unknown }>('note_row');
    await api
      .db('published_firings')
      .where(row)
      .update({
        note_row: api.db.raw("JSON_SET(note_row, '$.troubles', JSON_ARRAY('poison'))"),
      });
    await api.catchUp();
    expect(await idsIn(api)).toEqual(ids.filter((id) => id !== poison).sort((a, b) => a - b));
    const open = await api.db('outbox').where({ topic: 'index-note' }).whereNull('done_at');
    expect(open).toHaveLength(1);
    const before = kept?.note_row;
    await api
      .db('published_firings')
      .where(row)
      .update({ note_row: typeof before === 'string' ? before : JSON.stringify(before) });
    await api.catchUp();
    expect(await idsIn(api)).toHaveLength(6);
  });

  test('is made anew without a gap: every search meanwhile finds everything', async ({
    searchApi: api,
  }) => {
    const { ids } = await aSmallNotebook(api);
    await api.catchUp();
    const index = writingClient(api.deps.config).index<NoteDocument>(NOTES_INDEX);
    const [one] = (await index.getDocuments({ limit: 1 })).results;
    await index
      .addDocuments([{ ...one, id: '999999', noteId: 999_999 } as NoteDocument])
      .waitTask();
    let finished = false;
    const seen: [number, boolean][] = [];
    const rebuilding = reindex(api.deps).finally(() => (finished = true));
    while (!finished && seen.length < 50) {
      const { hits, plain } = await api.find('');
      seen.push([hits.length, plain]);
    }
    expect(await rebuilding).toBe(6);
    expect(seen.length).toBeGreaterThan(0);
    for (const each of seen) expect(each).toEqual([6, false]);
    expect(await idsIn(api)).toEqual([...ids].sort((a, b) => a - b));

    // An index that is gone is noticed at the next start.
    await writingClient(api.deps.config).deleteIndex(NOTES_INDEX).waitTask();
    await catchUpIndex(api.deps);
    expect(await countInIndex(api.deps)).toBe(6);
    expect((await api.find('')).total).toBe(6);
  });

  test('is mended where it differs from the database', async ({ searchApi: api }) => {
    const { ids } = await aSmallNotebook(api);
    await api.catchUp();
    expect(await mendIndex(api.deps)).toBe(0);
    const before = await wholeIndex(api);
    const index = writingClient(api.deps.config).index<NoteDocument>(NOTES_INDEX);
    const documents = (await index.getDocuments({ limit: 10 })).results;
    await index.deleteDocument(String(ids[0])).waitTask();
    const stale = { ...documents.find(({ noteId }) => noteId === ids[1]), title: 'Old title' };
    const extra = { ...documents[0], id: '999999', noteId: 999_999 };
    await index.addDocuments([stale, extra] as NoteDocument[]).waitTask();
    expect(await mendIndex(api.deps)).toBe(3);
    const sorted = (text: string) =>
      (JSON.parse(text) as NoteDocument[]).sort((a, b) => a.noteId - b.noteId);
    expect(sorted(await wholeIndex(api))).toEqual(sorted(before));
    expect(await mendIndex(api.deps)).toBe(0);
  });
});
