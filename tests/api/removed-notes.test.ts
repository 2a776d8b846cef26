import { readdir, utimes } from 'node:fs/promises';
import path from 'node:path';
import { describe, expect, vi } from 'vitest';
import { DESK_QUESTIONS } from '#shared/api/desk.ts';
import { draftSchema, notebookSchema } from '#shared/api/notes.ts';
import { tidyUp } from '../../server/housekeeping.ts';
import { sweepUploads } from '../../server/storage/sweep-uploads.ts';
import { test, type Api, type ApiAnswer, type Client } from '../support/api.ts';
import {
  addKiln,
  completeFields,
  decideOn,
  handIn,
  ifMatch,
  publishedNote,
  saveDraft,
  startNote,
} from '../support/notes.ts';
import { keptPicture, plainPicture, storedFiles } from '../support/pictures.ts';
import { readUpload } from '../support/records.ts';

// Seconds alone, more where the machine is shared.
vi.setConfig({ testTimeout: 90_000 });

const at = (noteId: number, act = '') => `/api/notes/${String(noteId)}${act}`;
const isInNotebook = async (author: Client, noteId: number): Promise<boolean> =>
  (await author.get('/api/notebook')).as(notebookSchema).notes.some(({ id }) => id === noteId);
const removedDaysAgo = (api: Api, noteId: number, days: number) =>
  api
    .db('notes')
    .where({ id: noteId })
    .update({ removed_at: api.db.raw('NOW(3) - INTERVAL ? DAY', [days]) });

describe('a removed note', () => {
  test('comes back as it was: text, version, record and pictures', async ({ api }) => {
    const author = await api.signedIn();
    const kiln = await addKiln(author);
    const started = await startNote(author, kiln.id);
    const picture = await keptPicture(author, started.id, await plainPicture().jpeg().toBuffer());
    const record = await readUpload(api, author, started.id, 'm,c\n0,20\n9,400\n20,800');
    const fields = completeFields(kiln.id, { title: 'Not lost' });
    await saveDraft(author, started, {
      ...fields,
      record: { ...fields.record, recordId: record.id },
    });
    const before = (await author.get(at(started.id, '/draft'))).as(draftSchema);

    expect((await author.delete(at(started.id))).status).toBe(200);
    expect((await author.get(at(started.id, '/draft'))).status).toBe(404);
    expect(await isInNotebook(author, started.id)).toBe(false);
    const back = (await author.post(at(started.id, '/restore'))).as(draftSchema);
    expect(back).toEqual(before);
    expect(back.pictures).toEqual([picture]);
    expect(await isInNotebook(author, started.id)).toBe(true);
    // Pressed twice it is done once.
    expect((await author.post(at(started.id, '/restore'))).status).toBe(200);
    const acts = await api.db('audit_log').where({ target_id: started.id }).pluck<string[]>('act');
    expect(acts).toEqual(['removed', 'brought-back']);
  });

  test('comes back to where it stood, and not at all to anybody else', async ({ api }) => {
    const author = await api.signedIn();
    const moderator = await api.signedIn('moderator');
    const kiln = await addKiln(author);
    const draft = await startNote(author, kiln.id);
    await handIn(author, draft, completeFields(kiln.id));
    await decideOn(moderator, draft.id, 'send-back', 'Almost.');
    expect((await author.delete(at(draft.id))).status).toBe(200);
    for (const client of [await api.signedIn(), moderator, await api.signedIn('admin')]) {
      expect((await client.post(at(draft.id, '/restore'))).status).toBe(404);
    }
    const back = (await author.post(at(draft.id, '/restore'))).as(draftSchema);
    expect([back.status, back.decision?.reason]).toEqual(['sent-back', 'Almost.']);
    // One that is public has not been removed, and is nobody else's to bring anywhere.
    const up = await publishedNote(author, moderator, kiln.id);
    expect((await moderator.post(at(up, '/restore'))).status).toBe(404);
    expect((await author.post(at(up, '/restore'))).as(draftSchema).status).toBe('published');
  });

  test('is nothing to every other act, of its author and of staff, and comes back to each state', async ({
    api,
  }) => {
    const author = await api.signedIn();
    const moderator = await api.signedIn('moderator');
    const kiln = await addKiln(author);
    const draft = await startNote(author, kiln.id);
    const desk = `/api/desk/notes/${String(draft.id)}`;
    const decision = { revisionId: 1, reason: 'Because.', checklist: DESK_QUESTIONS };
    const note = at(draft.id);
    const tag = ifMatch(draft.version);
    const acts: Record<string, () => Promise<ApiAnswer>> = {
      read: () => author.get(`${note}/draft`),
      edit: () => author.put(`${note}/draft`, { fields: draft.fields }, tag),
      'hand in': () => author.post(`${note}/hand-in`, undefined, tag),
      'take back': () => author.post(`${note}/take-back`),
      revise: () => author.post(`${note}/revise`),
      remove: () => author.delete(note),
      preview: () => author.get(`${note}/preview`),
      look: () => moderator.get(desk),
      claim: () => moderator.put(`${desk}/claim`),
      'give up': () => moderator.delete(`${desk}/claim`),
      publish: () => moderator.post(`${desk}/decision`, { ...decision, decision: 'publish' }),
      decline: () => moderator.post(`${desk}/decision`, { ...decision, decision: 'decline' }),
      'take down': () => moderator.post(`${note}/take-down`, { reason: 'Because.' }),
    };
    for (const status of ['draft', 'sent-back', 'declined', 'taken-down']) {
      await api.db('notes').where({ id: draft.id }).update({ status });
      expect((await author.delete(note)).status).toBe(200);
      for (const [act, send] of Object.entries(acts)) {
        expect([status, act, (await send()).status]).toEqual([status, act, 404]);
      }
      const back = (await author.post(`${note}/restore`)).as(draftSchema);
      expect(back.status).toBe(status);
    }
  });

  test('goes for good after thirty days, with its files; others stay', async ({ api }) => {
    const author = await api.signedIn();
    const moderator = await api.signedIn('moderator');
    const kiln = await addKiln(author);
    const image = await plainPicture().jpeg().toBuffer();
    const [gone, kept] = [await startNote(author, kiln.id), await startNote(author, kiln.id)];
    for (const { id } of [gone, kept]) await keptPicture(author, id, image);
    // One that has been at the desk has revisions and remarks of its own.
    await handIn(author, gone, completeFields(kiln.id));
    await decideOn(moderator, gone.id, 'decline', 'Not a firing.');
    for (const { id } of [gone, kept]) expect((await author.delete(at(id))).status).toBe(200);
    await removedDaysAgo(api, gone.id, 31);
    await removedDaysAgo(api, kept.id, 29);
    await tidyUp(api.db);
    expect((await author.post(at(gone.id, '/restore'))).status).toBe(404);
    expect(await api.db('note_revisions').where({ note_id: gone.id })).toEqual([]);

    const files = (await storedFiles(api)).length;
    const root = api.deps.config.uploadsFolder;
    const old = new Date(Date.now() - 25 * 3_600_000);
    for (const name of await readdir(root, { recursive: true })) {
      await utimes(path.join(root, name), old, old);
    }
    await sweepUploads(api.deps);
    expect(await storedFiles(api)).toHaveLength(files / 2);
    const back = (await author.post(at(kept.id, '/restore'))).as(draftSchema);
    expect(back.pictures).toHaveLength(1);
  });
});
