import type { Knex } from 'knex';

/** The title of a note's newest revision, on one line; null when the note is gone. */
export async function findNoteTitle(db: Knex, noteId: number): Promise<string | null> {
  const row = await db('note_revisions')
    .join('notes', 'notes.id', 'note_revisions.note_id')
    .where('notes.id', noteId)
    .whereNull('notes.removed_at')
    .orderBy('note_revisions.number', 'desc')
    .first<{ title: string | null } | undefined>(
      db.raw("JSON_VALUE(note_revisions.fields, '$.title') AS title"),
    );
  if (!row) return null;
  return row.title?.replace(/\s+/gu, ' ').trim() || 'Untitled';
}
