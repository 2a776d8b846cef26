import type { Knex } from 'knex';
import { emptyNoteFields, type NoteFields } from '#shared/note/note-fields.ts';
import type { NoteStatus } from '#shared/vocabulary/statuses.ts';
import { dayOrNull } from '../database/day.ts';
import { readJson } from '../database/read-json.ts';
import { statusesBefore, type NoteAct } from './note-status.ts';

/** A note's state and working copy. Missing and removed notes are null to every caller. */
export interface NoteRecord {
  readonly id: number;
  readonly authorId: number | null;
  readonly status: NoteStatus;
  readonly version: number;
  readonly draft: NoteFields;
  readonly draftSavedAt: Date;
  readonly handedInRevisionId: number | null;
  readonly handedInAt: Date | null;
  readonly publishedRevisionId: number | null;
  readonly publishedAt: Date | null;
  readonly revisedAt: Date | null;
  readonly claimedBy: number | null;
  readonly claimedByName: string | null;
  readonly claimedUntil: Date | null;
  /** By the database's clock: nobody holds it any more. */
  readonly claimLapsed: boolean;
  readonly kilnId: number | null;
  readonly firedOn: string | null;
}

interface RawNote {
  id: number;
  author_id: number | null;
  status: NoteStatus;
  version: number;
  draft: unknown;
  draft_saved_at: Date;
  handed_in_revision_id: number | null;
  handed_in_at: Date | null;
  published_revision_id: number | null;
  published_at: Date | null;
  revised_at: Date | null;
  claimed_by: number | null;
  claimed_by_name: string | null;
  claimed_until: Date | null;
  claim_lapsed: number;
  kiln_id: number | null;
  fired_on: Date | null;
}

const toRecord = (row: RawNote): NoteRecord => ({
  id: row.id,
  authorId: row.author_id,
  status: row.status,
  version: row.version,
  draft: { ...emptyNoteFields(), ...(readJson(row.draft) as NoteFields) },
  draftSavedAt: row.draft_saved_at,
  handedInRevisionId: row.handed_in_revision_id,
  handedInAt: row.handed_in_at,
  publishedRevisionId: row.published_revision_id,
  publishedAt: row.published_at,
  revisedAt: row.revised_at,
  claimedBy: row.claimed_by,
  claimedByName: row.claimed_by_name,
  claimedUntil: row.claimed_until,
  claimLapsed: row.claim_lapsed === 1,
  kilnId: row.kiln_id,
  firedOn: dayOrNull(row.fired_on),
});

const selectNotes = (db: Knex, which: 'living' | 'removed' = 'living') =>
  db('notes')
    .leftJoin('members as claimer', 'claimer.id', 'notes.claimed_by')
    .where((there) => {
      void (which === 'living'
        ? there.whereNull('notes.removed_at')
        : there.whereNotNull('notes.removed_at'));
    })
    .select<RawNote[]>(
      'notes.id',
      'notes.author_id',
      'notes.status',
      'notes.version',
      'notes.draft',
      'notes.draft_saved_at',
      'notes.handed_in_revision_id',
      'notes.handed_in_at',
      'notes.published_revision_id',
      'notes.published_at',
      'notes.revised_at',
      'notes.claimed_by',
      'claimer.name as claimed_by_name',
      'notes.claimed_until',
      db.raw('COALESCE(notes.claimed_until < CURRENT_TIMESTAMP(3), 1) AS claim_lapsed'),
      'notes.kiln_id',
      'notes.fired_on',
    );

export async function findNote(db: Knex, noteId: number): Promise<NoteRecord | null> {
  const [row] = await selectNotes(db).where('notes.id', noteId);
  return row ? toRecord(row) : null;
}

/** The same with the row locked until the transaction ends: for decisions and hand-ins. */
export async function lockNote(trx: Knex, noteId: number): Promise<NoteRecord | null> {
  const [row] = await selectNotes(trx).where('notes.id', noteId).forUpdate('notes');
  return row ? toRecord(row) : null;
}

/** A note in the trash, its row locked: the one way to one. */
export async function lockRemovedNote(trx: Knex, noteId: number): Promise<NoteRecord | null> {
  const [row] = await selectNotes(trx, 'removed').where('notes.id', noteId).forUpdate('notes');
  return row ? toRecord(row) : null;
}

export async function insertNote(db: Knex, authorId: number, draft: NoteFields): Promise<number> {
  const [id] = await db('notes').insert({
    author_id: authorId,
    draft: JSON.stringify(draft),
    ...columnsOf(draft),
  });
  if (id === undefined) throw new Error('MariaDB gave no id.');
  return id;
}

/** The columns that repeat parts of the working copy, for order and joins. */
function columnsOf(draft: NoteFields) {
  return {
    kiln_id: draft.kilnId,
    fired_on: draft.when.date,
    fired_at_time: draft.when.startTime,
  };
}

/**
 * Saves the working copy when it is still the version the save started from: one UPDATE compares
 * and writes. False when a newer one is there, or the note is no longer editable.
 */
export async function saveDraft(
  db: Knex,
  noteId: number,
  fromVersion: number,
  draft: NoteFields,
): Promise<boolean> {
  const changed = await db('notes')
    .where({ id: noteId, version: fromVersion })
    .whereIn('status', ['draft', 'sent-back'])
    .whereNull('removed_at')
    .update({
      draft: JSON.stringify(draft),
      ...columnsOf(draft),
      draft_saved_at: db.fn.now(3),
      version: fromVersion + 1,
    });
  return changed === 1;
}

/**
 * Writes into the working copy, whoever is writing in it. The caller holds the row locked. The
 * version goes up, so that a save under way in another tab is told.
 */
export async function rewriteDraft(trx: Knex, noteId: number, draft: NoteFields): Promise<void> {
  await trx('notes')
    .where({ id: noteId })
    .update({ draft: JSON.stringify(draft), version: trx.raw('version + 1') });
}

/** Columns an act may set beside the status. */
export interface NoteChange {
  handed_in_revision_id?: number | null;
  handed_in_at?: Knex.Raw | null;
  published_revision_id?: number | null;
  published_at?: Knex.Raw | Date | null;
  revised_at?: Knex.Raw | null;
  claimed_by?: number | null;
  claimed_until?: Knex.Raw | null;
}

/**
 * Moves a note on in its life, in one UPDATE that checks where it was. The version goes up too, so
 * that a save under way in another tab is told. False when the note was no longer there.
 */
export async function moveNote(
  db: Knex,
  noteId: number,
  act: NoteAct,
  to: NoteStatus,
  change: NoteChange,
): Promise<boolean> {
  const changed = await db('notes')
    .where({ id: noteId })
    .whereIn('status', [...statusesBefore(act)])
    .whereNull('removed_at')
    .update({
      status: to,
      ...change,
      ...(act === 'claim' ? {} : { version: db.raw('version + 1') }),
    });
  return changed === 1;
}

export async function markNoteRemoved(db: Knex, noteId: number): Promise<void> {
  await db('notes')
    .where({ id: noteId })
    .update({ removed_at: db.fn.now(3) });
}

export async function markNoteRestored(db: Knex, noteId: number): Promise<void> {
  await db('notes').where({ id: noteId }).update({ removed_at: null });
}

/** All notes of one author, newest firing first. */
export async function notesOf(db: Knex, authorId: number): Promise<NoteRecord[]> {
  const rows = await selectNotes(db)
    .where('notes.author_id', authorId)
    .orderByRaw('notes.fired_on IS NULL DESC, notes.fired_on DESC, notes.id DESC')
    .limit(500);
  return rows.map(toRecord);
}
