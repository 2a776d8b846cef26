import type { Knex } from 'knex';
import type { Draft, Remark } from '#shared/api/notes.ts';
import type { NoteStatus } from '#shared/vocabulary/statuses.ts';

interface RawRemark {
  id: number;
  pointer: string;
  text: string;
  moderator_id: number | null;
  moderator_name: string | null;
  created_at: Date;
  mended_at: Date | null;
}

const selectRemarks = (db: Knex, noteId: number) =>
  db('remarks')
    .leftJoin('members', 'members.id', 'remarks.moderator_id')
    .where('remarks.note_id', noteId)
    .orderBy('remarks.id')
    .select<RawRemark[]>(
      'remarks.id',
      'remarks.pointer',
      'remarks.text',
      'remarks.moderator_id',
      'members.name as moderator_name',
      'remarks.created_at',
      'remarks.mended_at',
    );

const toRemark = (row: RawRemark): Remark => ({
  id: row.id,
  pointer: row.pointer,
  text: row.text,
  by:
    row.moderator_id !== null && row.moderator_name !== null
      ? { id: row.moderator_id, name: row.moderator_name }
      : null,
  at: row.created_at.toISOString(),
  mended: row.mended_at !== null,
});

/** What the author was told: remarks that went out with a decision. */
export async function remarksForAuthor(db: Knex, noteId: number): Promise<Remark[]> {
  return (await selectRemarks(db, noteId).whereNotNull('remarks.sent_at')).map(toRemark);
}

/** All remarks, also those not sent yet: they stay for whoever takes the note next. */
export async function remarksForDesk(db: Knex, noteId: number): Promise<Remark[]> {
  return (await selectRemarks(db, noteId)).map(toRemark);
}

export async function insertRemark(
  trx: Knex,
  remark: {
    noteId: number;
    revisionId: number;
    moderatorId: number;
    pointer: string;
    text: string;
  },
): Promise<void> {
  await trx('remarks').insert({
    note_id: remark.noteId,
    revision_id: remark.revisionId,
    moderator_id: remark.moderatorId,
    pointer: remark.pointer,
    text: remark.text,
  });
}

/** Removes a remark that has not been sent. False when there is none such. */
export async function deleteUnsentRemark(
  trx: Knex,
  noteId: number,
  remarkId: number,
): Promise<boolean> {
  const removed = await trx('remarks')
    .where({ id: remarkId, note_id: noteId })
    .whereNull('sent_at')
    .delete();
  return removed === 1;
}

export async function sendRemarks(trx: Knex, noteId: number): Promise<number> {
  return trx('remarks')
    .where({ note_id: noteId })
    .whereNull('sent_at')
    .update({ sent_at: trx.fn.now(3) });
}

export async function setMended(
  db: Knex,
  noteId: number,
  remarkId: number,
  mended: boolean,
): Promise<boolean> {
  const changed = await db('remarks')
    .where({ id: remarkId, note_id: noteId })
    .whereNotNull('sent_at')
    .update({ mended_at: mended ? db.fn.now(3) : null });
  return changed === 1;
}

/** How many sent remarks of each note the author has not ticked off. */
export async function openRemarkCounts(
  db: Knex,
  noteIds: readonly number[],
): Promise<Map<number, number>> {
  if (noteIds.length === 0) return new Map();
  const rows = await db('remarks')
    .whereIn('remarks.note_id', [...noteIds])
    .whereNotNull('remarks.sent_at')
    .whereNull('remarks.mended_at')
    .groupBy('remarks.note_id')
    .select<{ note_id: number; n: number }[]>('remarks.note_id', db.raw('COUNT(*) AS n'));
  return new Map(rows.map((row) => [row.note_id, row.n]));
}

const DECISIONS = ['sent-back', 'declined', 'taken-down'];

/** The words of the last refusal of each note. */
export async function lastDecisionReasons(
  db: Knex,
  noteIds: readonly number[],
): Promise<Map<number, string>> {
  if (noteIds.length === 0) return new Map();
  const rows = await db('audit_log')
    .where('audit_log.target_kind', 'note')
    .whereIn('audit_log.target_id', [...noteIds])
    .whereIn('audit_log.act', DECISIONS)
    .orderBy('audit_log.id')
    .select<{ target_id: number; reason: string }[]>('audit_log.target_id', 'audit_log.reason');
  return new Map(rows.map((row) => [row.target_id, row.reason]));
}

/** The decision that brought the note where it is, when that was a refusal. */
export async function lastDecision(
  db: Knex,
  noteId: number,
  status: NoteStatus,
): Promise<Draft['decision']> {
  if (!DECISIONS.includes(status)) return null;
  const [last] = (await decisionsOf(db, noteId)).slice(-1);
  return last ? { reason: last.reason, by: last.by, at: last.at } : null;
}

/** Every decision about a note, oldest first. */
export async function decisionsOf(
  db: Knex,
  noteId: number,
): Promise<{ act: string; reason: string; by: { id: number; name: string } | null; at: string }[]> {
  const rows = await db('audit_log')
    .leftJoin('members', 'members.id', 'audit_log.actor_id')
    .where('audit_log.target_kind', 'note')
    .where('audit_log.target_id', noteId)
    .whereIn('audit_log.act', [...DECISIONS, 'published'])
    .orderBy('audit_log.id')
    .select<{ act: string; reason: string; id: number | null; name: string | null; at: Date }[]>(
      'audit_log.act',
      'audit_log.reason',
      'members.id',
      'members.name',
      'audit_log.at',
    );
  return rows.map((row) => ({
    act: row.act,
    reason: row.reason,
    by: row.id !== null && row.name !== null ? { id: row.id, name: row.name } : null,
    at: row.at.toISOString(),
  }));
}
