import type { Knex } from 'knex';
import type { NoteRow } from '#shared/api/note-rows.ts';
import type { CountedFacts } from '#shared/note/counted-facts.ts';
import { dayOf } from '../database/day.ts';
import { readJson } from '../database/read-json.ts';

/**
 * Published firings as rows for lists. The projection holds all but the names of author and kiln,
 * which are joined in, so that a new name shows at once.
 */
export type StoredRow = Omit<NoteRow, 'author' | 'kiln' | 'publishedAt' | 'firedOn'> & {
  volumeLitres: number | null;
};

interface RawRow {
  note_id: number;
  note_row: unknown;
  fired_on: Date;
  published_at: Date;
  author_id: number | null;
  author_name: string | null;
  kiln_id: number;
  kiln_name: string;
}

const selectRows = (db: Knex) =>
  db('published_firings')
    .join('kilns', 'kilns.id', 'published_firings.kiln_id')
    .leftJoin('members', 'members.id', 'published_firings.author_id')
    .select<RawRow[]>(
      'published_firings.note_id',
      'published_firings.note_row',
      'published_firings.fired_on',
      'published_firings.published_at',
      'published_firings.author_id',
      'members.name as author_name',
      'published_firings.kiln_id',
      'kilns.name as kiln_name',
    );

function toRow(raw: RawRow): NoteRow {
  const { volumeLitres, ...row } = readJson(raw.note_row) as StoredRow;
  return {
    ...row,
    firedOn: dayOf(raw.fired_on),
    publishedAt: raw.published_at.toISOString(),
    author:
      raw.author_id !== null && raw.author_name !== null
        ? { id: raw.author_id, name: raw.author_name }
        : null,
    kiln: { id: raw.kiln_id, name: raw.kiln_name, volumeLitres },
  };
}

/** Rows of the given notes, in the order asked for; unpublished ones are left out. */
export async function publishedRows(db: Knex, noteIds: readonly number[]): Promise<NoteRow[]> {
  if (noteIds.length === 0) return [];
  const rows = await selectRows(db).whereIn('published_firings.note_id', [...noteIds]);
  const byId = new Map(rows.map((row) => [row.note_id, toRow(row)]));
  return noteIds.flatMap((id) => byId.get(id) ?? []);
}

export async function newestRows(db: Knex, limit: number, offset = 0): Promise<NoteRow[]> {
  // The few are found in the index first: joined at once, all rows would be read and sorted.
  const ids = await db('published_firings')
    .orderBy([
      { column: 'published_firings.published_at', order: 'desc' },
      { column: 'published_firings.note_id', order: 'desc' },
    ])
    .limit(limit)
    .offset(offset)
    .pluck<number[]>('published_firings.note_id');
  return publishedRows(db, ids);
}

export async function countPublished(db: Knex): Promise<{ notes: number; members: number }> {
  const row = await db('published_firings')
    .select<{ notes: number; members: number }[]>(
      db.raw('COUNT(*) AS notes'),
      db.raw('COUNT(DISTINCT published_firings.author_id) AS members'),
    )
    .first();
  return { notes: row?.notes ?? 0, members: row?.members ?? 0 };
}

/** The kiln's published firings in order of firing, oldest first. */
export async function firingsOfKiln(db: Knex, kilnId: number): Promise<NoteRow[]> {
  const rows = await selectRows(db)
    .where('published_firings.kiln_id', kilnId)
    .orderBy([
      'published_firings.fired_on',
      'published_firings.fired_at_time',
      'published_firings.note_id',
    ])
    .limit(500);
  return rows.map(toRow);
}

export async function rowsByAuthor(db: Knex, authorId: number, limit: number): Promise<NoteRow[]> {
  const rows = await selectRows(db)
    .where('published_firings.author_id', authorId)
    .orderBy('published_firings.published_at', 'desc')
    .limit(limit);
  return rows.map(toRow);
}

/** Notes that say they tried a change from this one, newest first. */
export async function rowsThatTried(db: Knex, noteId: number): Promise<NoteRow[]> {
  const rows = await selectRows(db)
    .where('published_firings.tried_note_id', noteId)
    .orderBy('published_firings.published_at', 'desc')
    .limit(20);
  return rows.map(toRow);
}

/** A kiln's firings with their facts, in order: what linking and pairing need. */
export async function factsOfKiln(
  db: Knex,
  kilnId: number,
): Promise<
  { noteId: number; title: string; firedOn: string; facts: CountedFacts; row: StoredRow }[]
> {
  const rows = await db('published_firings')
    .where('published_firings.kiln_id', kilnId)
    .orderBy([
      'published_firings.fired_on',
      'published_firings.fired_at_time',
      'published_firings.note_id',
    ])
    .select<
      { note_id: number; title: string; fired_on: Date; facts: unknown; note_row: unknown }[]
    >(
      'published_firings.note_id',
      'published_firings.title',
      'published_firings.fired_on',
      'published_firings.facts',
      'published_firings.note_row',
    );
  return rows.map((row) => ({
    noteId: row.note_id,
    title: row.title,
    firedOn: dayOf(row.fired_on),
    facts: readJson(row.facts) as CountedFacts,
    row: readJson(row.note_row) as StoredRow,
  }));
}
