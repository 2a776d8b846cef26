import { describe, expect, vi } from 'vitest';
import { kilnPageSchema } from '#shared/api/kilns.ts';
import { draftSchema, notePageSchema } from '#shared/api/notes.ts';
import { pictureSchema, type Picture } from '#shared/api/pictures.ts';
import { test } from '../support/api.ts';
import {
  addKiln,
  completeFields,
  decideOn,
  handIn,
  saveDraft,
  startNote,
} from '../support/notes.ts';
import { keptPicture, plainPicture, storedFiles } from '../support/pictures.ts';

// Seconds alone, more where the machine is shared.
vi.setConfig({ testTimeout: 90_000 });

const pathOf = (noteId: number, { name }: Picture) =>
  `/api/notes/${String(noteId)}/pictures/${name}`;
const mediaOf = ({ name }: Picture) => `/media/pictures/${name}/preview.jpg`;
const showing = (kilnId: number, pictures: readonly Picture[]) =>
  completeFields(kilnId, {
    overrides: {
      story: {
        type: 'doc',
        content: [
          { type: 'paragraph', content: [{ type: 'text', text: 'As it came out.' }] },
          ...pictures.map(({ name }) => ({
            type: 'picture' as const,
            attrs: { name, alt: 'A bowl', caption: '' },
          })),
        ],
      },
    },
  });

describe('deleting a picture of a note', () => {
  test('takes its row and its files at once, once the story does not show it', async ({ api }) => {
    const author = await api.signedIn();
    const kiln = await addKiln(author);
    const draft = await startNote(author, kiln.id);
    const image = await plainPicture().jpeg().toBuffer();
    const kept = await keptPicture(author, draft.id, image);
    const files = await storedFiles(api);
    const placed = await keptPicture(author, draft.id, image);
    const saved = await saveDraft(author, draft, showing(kiln.id, [placed]));
    const inUse = await author.delete(pathOf(draft.id, placed));
    expect([inUse.status, inUse.problem.code]).toEqual([409, 'in-use']);
    await saveDraft(author, saved, showing(kiln.id, []));
    expect((await author.delete(pathOf(draft.id, placed))).status).toBe(200);
    expect(await storedFiles(api)).toEqual(files);
    expect((await author.get(mediaOf(placed))).status).toBe(404);
    expect((await author.delete(pathOf(draft.id, placed))).status).toBe(404);
    const left = (await author.get(`/api/notes/${String(draft.id)}/draft`)).as(draftSchema);
    expect(left.pictures).toEqual([kept]);
  });

  test('leaves it to the revision that is up, and makes room for another', async ({ api }) => {
    const author = await api.signedIn();
    const moderator = await api.signedIn('moderator');
    const kiln = await addKiln(author);
    const draft = await startNote(author, kiln.id);
    const picture = await keptPicture(author, draft.id, await plainPicture().jpeg().toBuffer());
    await handIn(author, draft, showing(kiln.id, [picture]));
    const path = pathOf(draft.id, picture);
    expect((await author.delete(path)).status).toBe(409);
    await decideOn(moderator, draft.id, 'publish');
    expect((await author.delete(path)).status).toBe(409);
    const revising = (await author.post(`/api/notes/${String(draft.id)}/revise`)).as(draftSchema);
    await saveDraft(author, revising, showing(kiln.id, []));
    expect((await author.delete(path)).status).toBe(200);
    const now = (await author.get(`/api/notes/${String(draft.id)}/draft`)).as(draftSchema);
    expect(now.pictures).toEqual([]);
    // Its readers miss nothing.
    const visitor = api.client();
    const page = (await visitor.get(`/api/notes/${String(draft.id)}`)).as(notePageSchema);
    expect(page.pictures).toEqual([picture]);
    expect((await visitor.get(mediaOf(picture))).status).toBe(200);
  });

  test('is its author’s alone, and of this very note', async ({ api }) => {
    const author = await api.signedIn();
    const [draft, second] = [await startNote(author, null), await startNote(author, null)];
    const picture = await keptPicture(author, draft.id, await plainPicture().jpeg().toBuffer());
    for (const client of [await api.signedIn(), await api.signedIn('admin')]) {
      expect((await client.delete(pathOf(draft.id, picture))).status).toBe(404);
    }
    expect((await author.delete(pathOf(second.id, picture))).status).toBe(404);
    expect((await author.get(mediaOf(picture))).status).toBe(200);
  });
});

describe('deleting the picture of a kiln', () => {
  test('is for its keeper, and takes the files along', async ({ api }) => {
    const keeper = await api.signedIn();
    const borrower = await api.signedIn({ name: 'Wren Halloran' });
    const kiln = await addKiln(keeper);
    const path = `/api/kilns/${String(kiln.id)}`;
    await keeper.put(`${path}/loans`, { members: ['Wren Halloran'] });
    expect((await keeper.delete(`${path}/picture`)).status).toBe(404);
    const form = new FormData();
    const image = await plainPicture().jpeg().toBuffer();
    form.set('file', new Blob([new Uint8Array(image)]), 'a.jpg');
    const sent = await keeper.post(`${path}/picture`, undefined, { rawBody: form });
    const picture = sent.as(pictureSchema);
    expect((await borrower.delete(`${path}/picture`)).status).toBe(403);
    expect((await (await api.signedIn()).delete(`${path}/picture`)).status).toBe(404);
    expect((await keeper.get(path)).as(kilnPageSchema).picture).toEqual(picture);
    expect((await keeper.delete(`${path}/picture`)).status).toBe(200);
    expect((await keeper.get(path)).as(kilnPageSchema).picture).toBeNull();
    expect(await storedFiles(api)).toEqual([]);
  });
});
