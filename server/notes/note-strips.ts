import type { Knex } from 'knex';
import type { StripPoints } from '#shared/api/note-rows.ts';
import { readFiring } from '#shared/firing/read-firing.ts';
import { stripSignature } from '#shared/firing/strip.ts';
import { stripWords } from '#shared/firing/strip-words.ts';
import type { NoteFields } from '#shared/note/note-fields.ts';
import { firingInputOf, readingsOf } from '#shared/note/read-note.ts';
import { METRIC_UNITS } from '#shared/units/units.ts';
import type { NoteStatus } from '#shared/vocabulary/statuses.ts';
import { readJson } from '../database/read-json.ts';
import { isBeingWritten } from './note-status.ts';
import { revisionSummaries } from './notebook-repository.ts';

export interface NoteStrip {
  readonly strip: StripPoints | null;
  readonly stripWords: string;
}
interface NoteWithStrip {
  readonly id: number;
  readonly status: NoteStatus;
  readonly draft: NoteFields;
}

/**
 * The strips of an author's own notes: of those being written as the working copy has it, so that a
 * record shows from the day it is given; of all others as the latest revision was read.
 */
export async function stripsOfNotes(
  db: Knex,
  notes: readonly NoteWithStrip[],
): Promise<Map<number, NoteStrip>> {
  const written = notes.filter(({ status }) => isBeingWritten(status));
  const others = notes.filter(({ status }) => !isBeingWritten(status));
  const [working, revisions] = await Promise.all([
    workingStrips(db, written),
    revisionSummaries(
      db,
      others.map(({ id }) => id),
    ),
  ]);
  return new Map([...revisions, ...working]);
}

async function workingStrips(
  db: Knex,
  notes: readonly NoteWithStrip[],
): Promise<Map<number, NoteStrip>> {
  const recordIds = notes.flatMap(({ draft }) => draft.record.recordId ?? []);
  const rows =
    recordIds.length === 0
      ? []
      : await db('records')
          .join('record_contents', 'record_contents.id', 'records.content_id')
          .whereIn('records.id', recordIds)
          .where('records.status', 'ready')
          .select<{ id: number; note_id: number; strip: unknown }[]>(
            'records.id',
            'records.note_id',
            'record_contents.strip',
          );
  return new Map(
    notes.map(({ id, draft }) => {
      const { recordId } = draft.record;
      const kept = rows.find((row) => row.id === recordId && row.note_id === id);
      const strip =
        recordId === null
          ? stripSignature(readingsOf(draft, null))
          : kept
            ? (readJson(kept.strip) as StripPoints)
            : [];
      return [id, strip.length > 0 ? { strip, stripWords: wordsOf(draft, strip) } : NO_STRIP];
    }),
  );
}

const NO_STRIP: NoteStrip = { strip: null, stripWords: '' };

/** Read off the strip itself: the notebook need not load whole records for a line of words. */
function wordsOf(draft: NoteFields, strip: StripPoints): string {
  const readings = strip.map(([minute, celsius]) => ({ minute, celsius }));
  const reading = readFiring(firingInputOf(draft, null, { readings, secondProbe: null }));
  return reading ? stripWords(reading, METRIC_UNITS) : '';
}
