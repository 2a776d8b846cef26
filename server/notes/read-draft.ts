import type { Knex } from 'knex';
import { chartPoints } from '#shared/firing/strip.ts';
import type { KilnFields } from '#shared/note/kiln-fields.ts';
import type { NoteFields } from '#shared/note/note-fields.ts';
import { readNote, type NoteReading, type StoredReadings } from '#shared/note/read-note.ts';
import { todayAtKiln } from '#shared/note/today-at-kiln.ts';
import type { Neighbour } from '#shared/api/notes.ts';
import { findKiln } from '../kilns/kiln-repository.ts';
import { loadContent } from '../records/record-content.ts';
import { findRecord, type RecordRow } from '../records/record-repository.ts';
import { earlierFiring } from './neighbour-repository.ts';

/** While typing, a long record is read from this many of its points; handing in reads them all. */
const DRAFT_POINTS = 5000;

export interface DraftReading extends NoteReading {
  readonly kiln: {
    readonly id: number;
    readonly version: number;
    readonly fields: KilnFields;
  } | null;
  readonly record: RecordRow | null;
  readonly stored: StoredReadings | null;
  readonly earlier: Neighbour | null;
}

/** Loads what a working copy refers to and reads it: whole for handing in, thinned while typing. */
export async function readDraft(
  db: Knex,
  note: { id: number; authorId: number; fields: NoteFields },
  whole: boolean,
): Promise<DraftReading> {
  const { fields } = note;
  const [kiln, record] = await Promise.all([
    fields.kilnId === null ? null : findKiln(db, fields.kilnId),
    fields.record.recordId === null ? null : findRecord(db, note.id, fields.record.recordId),
  ]);
  const content =
    record?.status === 'ready' && record.contentId !== null
      ? await loadContent(db, record.contentId)
      : null;
  const stored: StoredReadings | null = content
    ? {
        readings: whole ? content.readings : chartPoints(content.readings, DRAFT_POINTS),
        secondProbe:
          content.secondProbe &&
          (whole ? content.secondProbe : chartPoints(content.secondProbe, DRAFT_POINTS)),
      }
    : null;
  const earlier =
    kiln && fields.when.date
      ? await earlierFiring(
          db,
          {
            noteId: note.id,
            kilnId: kiln.id,
            firedOn: fields.when.date,
            startTime: fields.when.startTime,
          },
          note.authorId,
        )
      : null;
  const reading = readNote({
    fields,
    kiln: kiln?.fields ?? null,
    stored,
    earlier: earlier?.firing ?? null,
    today: todayAtKiln(fields, kiln?.fields ?? null),
  });
  return {
    ...reading,
    kiln: kiln ? { id: kiln.id, version: kiln.version, fields: kiln.fields } : null,
    record,
    stored,
    earlier: earlier?.neighbour ?? null,
  };
}
