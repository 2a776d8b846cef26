import type { Knex } from 'knex';
import type { Picture } from '#shared/api/pictures.ts';
import { readJson } from '../database/read-json.ts';

interface RawPicture {
  id: number;
  name: string;
  width: number;
  height: number;
  widths: unknown;
  placeholder: string;
}
const COLUMNS = [
  'pictures.id',
  'pictures.name',
  'pictures.width',
  'pictures.height',
  'pictures.widths',
  'pictures.placeholder',
];
const toPicture = (row: RawPicture): Picture => ({
  name: row.name,
  width: row.width,
  height: row.height,
  widths: readJson(row.widths) as number[],
  placeholder: row.placeholder,
});

export interface NewPicture extends Picture {
  readonly ownerId: number;
  readonly noteId: number | null;
  readonly kilnId: number | null;
  readonly bytes: number;
}

export async function insertPicture(trx: Knex, picture: NewPicture): Promise<number> {
  const [id] = await trx('pictures').insert({
    name: picture.name,
    owner_id: picture.ownerId,
    note_id: picture.noteId,
    kiln_id: picture.kilnId,
    width: picture.width,
    height: picture.height,
    widths: JSON.stringify(picture.widths),
    placeholder: picture.placeholder,
    bytes: picture.bytes,
  });
  if (id === undefined) throw new Error('MariaDB gave no id.');
  return id;
}

/** The pictures of a note's working copy. Those taken off it live on in revisions alone. */
export async function picturesOfNote(db: Knex, noteId: number): Promise<Picture[]> {
  const rows = await db('pictures')
    .where('pictures.note_id', noteId)
    .whereNull('pictures.taken_off_at')
    .orderBy('pictures.id')
    .select<RawPicture[]>(COLUMNS);
  return rows.map(toPicture);
}

/** The id of a picture of the note's working copy. */
export async function findPictureOfNote(
  db: Knex,
  noteId: number,
  name: string,
): Promise<number | null> {
  const row = await db('pictures')
    .where({ note_id: noteId, name })
    .whereNull('taken_off_at')
    .first<{ id: number } | undefined>('id');
  return row?.id ?? null;
}

export async function isInRevision(db: Knex, pictureId: number): Promise<boolean> {
  const row = await db('revision_pictures')
    .where({ picture_id: pictureId })
    .first<{ picture_id: number } | undefined>('picture_id');
  return row !== undefined;
}

export async function takeOffNote(db: Knex, pictureId: number): Promise<void> {
  await db('pictures')
    .where({ id: pictureId })
    .update({ taken_off_at: db.fn.now(3) });
}

export async function deletePicture(db: Knex, pictureId: number): Promise<void> {
  await db('pictures').where({ id: pictureId }).delete();
}

/** The note's pictures of these names, in the order of the names. */
export async function picturesByNames(
  db: Knex,
  noteId: number,
  names: readonly string[],
): Promise<Picture[]> {
  if (names.length === 0) return [];
  const rows = await db('pictures')
    .where('pictures.note_id', noteId)
    .whereIn('pictures.name', [...names])
    .select<RawPicture[]>(COLUMNS);
  const byName = new Map(rows.map((row) => [row.name, toPicture(row)]));
  return names.flatMap((name) => byName.get(name) ?? []);
}

export async function findPictures(
  db: Knex,
  ids: readonly number[],
): Promise<Map<number, Picture>> {
  if (ids.length === 0) return new Map();
  const rows = await db('pictures')
    .whereIn('pictures.id', [...ids])
    .select<RawPicture[]>(COLUMNS);
  return new Map(rows.map((row) => [row.id, toPicture(row)]));
}

/** Pictures of a note counted, and a member's bytes, for the limits. The note's row is locked. */
export async function pictureUse(
  trx: Knex,
  ownerId: number,
  noteId: number | null,
): Promise<{ onNote: number; bytes: number }> {
  const [onNote, bytes] = await Promise.all([
    noteId === null
      ? undefined
      : trx('pictures')
          .where({ note_id: noteId })
          .whereNull('taken_off_at')
          .count<{ n: number }>({ n: '*' })
          .first(),
    trx('pictures').where({ owner_id: ownerId }).sum<{ n: number | null }>({ n: 'bytes' }).first(),
  ]);
  return { onNote: Number(onNote?.n ?? 0), bytes: Number(bytes?.n ?? 0) };
}

export interface PictureRights {
  readonly ownerId: number | null;
  /** Stands in the published revision of its note. */
  readonly inPublished: boolean;
  /** Stands in the revision that waits at the desk. */
  readonly inHandedIn: boolean;
  readonly kilnId: number | null;
}

/** What decides who may see a picture: asked by every fetch of every size. */
export async function pictureRights(db: Knex, name: string): Promise<PictureRights | null> {
  const row = await db('pictures')
    .leftJoin('notes', 'notes.id', 'pictures.note_id')
    .leftJoin('revision_pictures as shown', (join) => {
      join
        .on('shown.picture_id', 'pictures.id')
        .andOn('shown.revision_id', 'notes.published_revision_id');
    })
    .leftJoin('revision_pictures as waiting', (join) => {
      join
        .on('waiting.picture_id', 'pictures.id')
        .andOn('waiting.revision_id', 'notes.handed_in_revision_id');
    })
    .where('pictures.name', name)
    .first<
      | {
          owner_id: number | null;
          author_id: number | null;
          kiln_id: number | null;
          removed_at: Date | null;
          shown: number | null;
          waiting: number | null;
        }
      | undefined
    >(
      'pictures.owner_id',
      'notes.author_id',
      'pictures.kiln_id',
      'notes.removed_at',
      'shown.revision_id as shown',
      'waiting.revision_id as waiting',
    );
  if (!row) return null;
  const there = row.removed_at === null;
  return {
    ownerId: row.author_id ?? row.owner_id,
    inPublished: there && row.shown !== null,
    inHandedIn: there && row.waiting !== null,
    kilnId: row.kiln_id,
  };
}
