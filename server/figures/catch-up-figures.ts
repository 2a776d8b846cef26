import type { Knex } from 'knex';
import type { CountedFacts } from '#shared/note/counted-facts.ts';
import type { NoteFields } from '#shared/note/note-fields.ts';
import { readJson } from '../database/read-json.ts';
import { inTransaction } from '../database/transaction.ts';
import { findRevision } from '../notes/revision-repository.ts';
import { FIGURE_NUMBERS_VERSION, figureNumbers } from './figure-numbers.ts';
import { notesWithoutFigures } from './topic-repository.ts';

const AT_ONCE = 100;

/** The row of `published_figures` of a published firing. */
export function figureRow(
  noteId: number,
  fields: Pick<NoteFields, 'pieces'>,
  facts: CountedFacts,
): { note_id: number; version: number; numbers: string } {
  return {
    note_id: noteId,
    version: FIGURE_NUMBERS_VERSION,
    numbers: JSON.stringify(figureNumbers(fields, facts)),
  };
}

/**
 * Keeps the numbers of published notes that lack them: those published before plots were drawn, and
 * all of them once other numbers are kept. @returns how many were read
 */
export async function catchUpFigures(db: Knex, signal?: AbortSignal): Promise<number> {
  let read = 0;
  for (;;) {
    const noteIds = await notesWithoutFigures(db, AT_ONCE);
    if (noteIds.length === 0) return read;
    for (const noteId of noteIds) {
      if (signal?.aborted === true) return read;
      await inTransaction(db, (trx) => keepPublished(trx, noteId));
      read += 1;
    }
  }
}

/** Forgets the numbers of all notes and reads them anew. @returns how many were read */
export async function rebuildFigures(db: Knex): Promise<number> {
  await db('published_figures').update({ version: 0 });
  return catchUpFigures(db);
}

/** The firing's row is locked, so that it is not taken down or published anew meanwhile. */
async function keepPublished(trx: Knex, noteId: number): Promise<void> {
  const row = await trx('published_firings')
    .where('published_firings.note_id', noteId)
    .forUpdate()
    .first<{ revision_id: number; facts: unknown } | undefined>(
      'published_firings.revision_id',
      'published_firings.facts',
    );
  const revision = row ? await findRevision(trx, row.revision_id) : null;
  if (!row || !revision) return;
  await trx('published_figures')
    .insert(figureRow(noteId, revision.fields, readJson(row.facts) as CountedFacts))
    .onConflict('note_id')
    .merge();
}
