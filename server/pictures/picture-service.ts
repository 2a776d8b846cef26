import { randomBytes } from 'node:crypto';
import type { Knex } from 'knex';
import { MAX_PICTURES, type Picture } from '#shared/api/pictures.ts';
import type { Actor, SignedIn } from '../authorization/actor.ts';
import { canOnKiln, canOnNote, canOnSite } from '../authorization/rules.ts';
import { inTransaction } from '../database/transaction.ts';
import { AppError } from '../http/problem.ts';
import { readKiln, kilnSubject } from '../kilns/kiln-service.ts';
import { findNote, lockNote } from '../notes/note-repository.ts';
import { noteSubject } from '../notes/note-subject.ts';
import type { FileStore } from '../storage/file-store.ts';
import { encodePicture } from './encode-picture.ts';
import { insertPicture, pictureRights, pictureUse } from './picture-repository.ts';

/** What one member may keep in all. */
const QUOTA_BYTES = 1024 * 1024 * 1024;

/** Whether the actor may add a picture to the note; asked before the upload is read. */
export async function requireEditableNote(db: Knex, actor: Actor, noteId: number): Promise<void> {
  const note = await findNote(db, noteId);
  if (!note || !canOnNote(actor, 'read-draft', noteSubject(note))) throw new AppError('not-found');
  if (!canOnNote(actor, 'edit', noteSubject(note))) throw new AppError('wrong-status');
}

export async function requireEditableKiln(db: Knex, actor: Actor, kilnId: number): Promise<void> {
  const kiln = await readKiln(db, actor, kilnId);
  if (!canOnKiln(actor, 'edit', kilnSubject(kiln))) throw new AppError('not-allowed');
}

/** Files first, flushed, then the row: no row without its files. */
async function keep(
  db: Knex,
  store: FileStore,
  actor: SignedIn,
  bytes: Buffer,
  belongsTo: { noteId: number | null; kilnId: number | null },
  inSameTransaction: (trx: Knex, pictureId: number) => Promise<void>,
): Promise<Picture> {
  const encoded = await encodePicture(bytes);
  const name = randomBytes(16).toString('hex');
  const picture: Picture = {
    name,
    width: encoded.width,
    height: encoded.height,
    widths: encoded.widths,
    placeholder: encoded.placeholder,
  };
  try {
    for (const file of encoded.files) await store.put(`pictures/${name}/${file.name}`, file.bytes);
    await inTransaction(db, async (trx) => {
      if (belongsTo.noteId !== null) await lockNote(trx, belongsTo.noteId);
      const use = await pictureUse(trx, actor.id, belongsTo.noteId);
      if (use.onNote >= MAX_PICTURES) {
        throw new AppError('too-large', `A note holds at most ${String(MAX_PICTURES)} pictures.`);
      }
      const size = encoded.files.reduce((sum, file) => sum + file.bytes.length, 0);
      if (use.bytes + size > QUOTA_BYTES) {
        throw new AppError(
          'too-large',
          'Your pictures fill the gigabyte that one member may keep.',
        );
      }
      const id = await insertPicture(trx, {
        ...picture,
        ...belongsTo,
        ownerId: actor.id,
        bytes: size,
      });
      await inSameTransaction(trx, id);
    });
  } catch (error) {
    await store.remove(`pictures/${name}`);
    throw error;
  }
  return picture;
}

export async function addNotePicture(
  db: Knex,
  store: FileStore,
  actor: SignedIn,
  noteId: number,
  bytes: Buffer,
): Promise<Picture> {
  await requireEditableNote(db, actor, noteId);
  return keep(db, store, actor, bytes, { noteId, kilnId: null }, () => Promise.resolve());
}

export async function setKilnPicture(
  db: Knex,
  store: FileStore,
  actor: SignedIn,
  kilnId: number,
  bytes: Buffer,
): Promise<Picture> {
  await requireEditableKiln(db, actor, kilnId);
  return keep(db, store, actor, bytes, { noteId: null, kilnId }, async (trx, pictureId) => {
    await trx('kilns').where({ id: kilnId }).update({ picture_id: pictureId });
  });
}

/**
 * Whether the reader may fetch the picture, and whether anybody may: the published ones may be kept
 * by shared caches for a short while, the others by nobody.
 */
export async function mayFetch(
  db: Knex,
  actor: Actor,
  name: string,
): Promise<{ allowed: boolean; isPublic: boolean }> {
  const rights = await pictureRights(db, name);
  if (!rights) return { allowed: false, isPublic: false };
  if (rights.inPublished) return { allowed: true, isPublic: true };
  if (actor.kind === 'member' && actor.id === rights.ownerId)
    return { allowed: true, isPublic: false };
  if (rights.inHandedIn && canOnSite(actor, 'moderate')) return { allowed: true, isPublic: false };
  if (rights.kilnId !== null) {
    const visible = await readKiln(db, actor, rights.kilnId).then(
      () => true,
      (error: unknown) => {
        if (error instanceof AppError && error.code === 'not-found') return false;
        throw error;
      },
    );
    return { allowed: visible, isPublic: false };
  }
  return { allowed: false, isPublic: false };
}
