import type { Knex } from 'knex';
import { picturesIn } from '#shared/note/story.ts';
import type { Actor } from '../authorization/actor.ts';
import { inTransaction } from '../database/transaction.ts';
import { AppError } from '../http/problem.ts';
import { lockedOwnNote } from '../notes/draft-service.ts';
import type { FileStore } from '../storage/file-store.ts';
import {
  deletePicture,
  findPictureOfNote,
  isInRevision,
  takeOffNote,
} from './picture-repository.ts';
import { requireEditableKiln } from './picture-service.ts';

/**
 * Takes a picture off a note's working copy for good. Revisions that show it keep it; where none
 * does, its files go too.
 */
export async function removeNotePicture(
  db: Knex,
  store: FileStore,
  actor: Actor,
  noteId: number,
  name: string,
): Promise<void> {
  const isUnused = await inTransaction(db, async (trx) => {
    // Under the note's lock: nobody hands it in with this picture in the same moment.
    const note = await lockedOwnNote(trx, actor, noteId, 'edit');
    const pictureId = await findPictureOfNote(trx, noteId, name);
    if (pictureId === null) throw new AppError('not-found');
    if (picturesIn(note.draft.story).includes(name)) {
      throw new AppError('in-use', 'This picture stands in the story. Take it out there first.');
    }
    if (await isInRevision(trx, pictureId)) {
      await takeOffNote(trx, pictureId);
      return false;
    }
    await deletePicture(trx, pictureId);
    return true;
  });
  // The row first: a file without a row is swept, a row without files is a hole.
  if (isUnused) await store.remove(`pictures/${name}`);
}

/** Leaves the kiln without a picture. */
export async function removeKilnPicture(
  db: Knex,
  store: FileStore,
  actor: Actor,
  kilnId: number,
): Promise<void> {
  await requireEditableKiln(db, actor, kilnId);
  const name = await inTransaction(db, async (trx) => {
    const picture = await trx('kilns')
      .join('pictures', 'pictures.id', 'kilns.picture_id')
      .where('kilns.id', kilnId)
      .forUpdate()
      .first<{ id: number; name: string } | undefined>('pictures.id', 'pictures.name');
    if (!picture) throw new AppError('not-found');
    await trx('kilns').where({ id: kilnId }).update({ picture_id: null });
    await deletePicture(trx, picture.id);
    return picture.name;
  });
  await store.remove(`pictures/${name}`);
}
