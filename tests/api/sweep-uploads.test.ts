import { mkdir, readdir, utimes, writeFile } from 'node:fs/promises';
import path from 'node:path';
import { describe, expect } from 'vitest';
import type { Picture } from '#shared/api/pictures.ts';
import { sweepUploads } from '../../server/storage/sweep-uploads.ts';
import { test, type Api } from '../support/api.ts';
import {
  addKiln,
  completeFields,
  decideOn,
  handIn,
  saveDraft,
  startNote,
} from '../support/notes.ts';
import { keptPicture, plainPicture } from '../support/pictures.ts';
import { uploadRecord } from '../support/records.ts';

/** Moves every upload and its files back in time. */
async function age(api: Api, hours: number): Promise<void> {
  await api.db('pictures').update({ created_at: api.db.raw('NOW(3) - INTERVAL ? HOUR', [hours]) });
  const then = new Date(Date.now() - hours * 3_600_000);
  const root = api.deps.config.uploadsFolder;
  for (const name of await readdir(root, { recursive: true })) {
    await utimes(path.join(root, name), then, then);
  }
}

const names = async (api: Api): Promise<string[]> => {
  const rows = await api.db('pictures').orderBy('id').pluck<string[]>('name');
  const folder = path.join(api.deps.config.uploadsFolder, 'pictures');
  // Rows and folders always tell the same.
  expect((await readdir(folder)).sort()).toEqual([...rows].sort());
  return rows;
};

const withPicture = (kilnId: number, picture: Picture) =>
  completeFields(kilnId, {
    overrides: {
      story: {
        type: 'doc',
        content: [
          { type: 'paragraph', content: [{ type: 'text', text: 'As it came out.' }] },
          { type: 'picture', attrs: { name: picture.name, alt: 'A bowl', caption: '' } },
        ],
      },
    },
  });

describe('the sweep', () => {
  test('takes pictures nothing refers to after a day, a week beside a draft, others never', async ({
    api,
  }) => {
    const author = await api.signedIn();
    const moderator = await api.signedIn('moderator');
    const kiln = await addKiln(author);
    const image = await plainPicture().jpeg().toBuffer();
    const kilnPicture = async () => {
      const form = new FormData();
      form.set('file', new Blob([new Uint8Array(image)]), 'a.jpg');
      const kilnPath = `/api/kilns/${String(kiln.id)}/picture`;
      return (await author.post(kilnPath, undefined, { rawBody: form })).json as Picture;
    };
    const replaced = await kilnPicture();
    const current = await kilnPicture();
    const draft = await startNote(author, kiln.id);
    const [placed, waiting] = [
      await keptPicture(author, draft.id, image),
      await keptPicture(author, draft.id, image),
    ];
    await saveDraft(author, draft, withPicture(kiln.id, placed));
    const note = await startNote(author, kiln.id);
    const [shown, spare] = [
      await keptPicture(author, note.id, image),
      await keptPicture(author, note.id, image),
    ];
    await handIn(author, note, withPicture(kiln.id, shown));
    await decideOn(moderator, note.id, 'publish');
    const all = [replaced, current, placed, waiting, shown, spare].map(({ name }) => name);

    await age(api, 23);
    expect(await sweepUploads(api.deps)).toBe(0);
    expect(await names(api)).toEqual(all);
    await age(api, 25);
    expect(await sweepUploads(api.deps)).toBe(2);
    expect(await names(api)).toEqual([current, placed, waiting, shown].map(({ name }) => name));
    await age(api, 8 * 24);
    expect(await sweepUploads(api.deps)).toBe(1);
    await age(api, 400 * 24);
    expect(await sweepUploads(api.deps)).toBe(0);
    expect(await names(api)).toEqual([current, placed, shown].map(({ name }) => name));
  });

  test('takes files without rows after a day: cut short, left behind, of notes that are gone', async ({
    api,
  }) => {
    const author = await api.signedIn();
    const [kept, gone] = [await startNote(author, null), await startNote(author, null)];
    await uploadRecord(author, kept.id, 'm,c\n0,20\n5,300');
    await uploadRecord(author, gone.id, 'm,c\n0,21\n5,301');
    await api.db('notes').where({ id: gone.id }).delete();
    const root = api.deps.config.uploadsFolder;
    const lost = path.join(root, 'pictures', '0'.repeat(32));
    await mkdir(lost, { recursive: true });
    await writeFile(path.join(lost, '480.webp'), 'x');
    await writeFile(path.join(root, 'records', `${'1'.repeat(64)}.0123456789ab.part`), 'x');
    await age(api, 23);
    expect(await sweepUploads(api.deps)).toBe(0);
    await age(api, 25);
    expect(await sweepUploads(api.deps)).toBe(3);
    const [key] = await api.db('records').pluck<string[]>('storage_key');
    expect(await readdir(path.join(root, 'records'))).toEqual([key?.slice('records/'.length)]);
    expect(await readdir(path.join(root, 'pictures'))).toEqual([]);
  });
});
