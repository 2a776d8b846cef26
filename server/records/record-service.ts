import { createHash, randomUUID } from 'node:crypto';
import type { Knex } from 'knex';
import { chartPoints } from '#shared/firing/strip.ts';
import type { RecordPoints } from '#shared/api/records.ts';
import type { RecordChoice } from '#shared/record/record-choice.ts';
import { thinToColumns } from '#shared/record/thin-to-columns.ts';
import type { Actor } from '../authorization/actor.ts';
import { canOnNote } from '../authorization/rules.ts';
import { inTransaction } from '../database/transaction.ts';
import { AppError } from '../http/problem.ts';
import { findNote, type NoteRecord } from '../notes/note-repository.ts';
import { noteSubject } from '../notes/note-subject.ts';
import { findRevision } from '../notes/revision-repository.ts';
import { nudgeOutbox } from '../outbox/nudge.ts';
import { enqueue } from '../outbox/outbox.ts';
import type { FileStore } from '../storage/file-store.ts';
import { loadContent, type RecordContent } from './record-content.ts';
import { recordCsv } from './record-csv.ts';
import { chooseAgain, findRecord, insertRecord, type RecordRow } from './record-repository.ts';

const CHART_POINTS = 3000;
/** The part asked for reaches beyond what is in sight: some 1,300 columns of these are. */
const DETAIL_COLUMNS = 2000;

async function promiseReading(trx: Knex, recordId: number): Promise<void> {
  await enqueue(trx, 'read-record', `${String(recordId)}:${randomUUID()}`, { recordId });
}

/** Keeps the file by its content hash and promises to read it. @returns the record's id */
export async function addRecord(
  db: Knex,
  store: FileStore,
  noteId: number,
  upload: { bytes: Buffer; fileName: string; source: 'file' | 'pasted' },
  choice: RecordChoice,
): Promise<number> {
  const hash = createHash('sha256').update(upload.bytes).digest('hex');
  const storageKey = `records/${hash}`;
  await store.put(storageKey, upload.bytes);
  const id = await inTransaction(db, async (trx) => {
    const recordId = await insertRecord(trx, {
      noteId,
      source: upload.source,
      fileName: upload.fileName,
      storageKey,
      choice,
    });
    await promiseReading(trx, recordId);
    return recordId;
  });
  nudgeOutbox();
  return id;
}

export async function requireRecord(
  db: Knex,
  noteId: number,
  recordId: number,
): Promise<RecordRow> {
  const record = await findRecord(db, noteId, recordId);
  if (!record) throw new AppError('not-found');
  return record;
}

/** Reads a kept file again with other columns or units. */
export async function readAgain(
  db: Knex,
  noteId: number,
  recordId: number,
  choice: RecordChoice,
): Promise<void> {
  await requireRecord(db, noteId, recordId);
  await inTransaction(db, async (trx) => {
    await chooseAgain(trx, recordId, choice);
    await promiseReading(trx, recordId);
  });
  nudgeOutbox();
}

/** Whose record is asked for: the readers' one, the desk's, or the author's working copy's. */
export type RecordOf = 'published' | 'handed-in' | 'draft';

/** The note, for those who may see that state of it. */
async function noteFor(db: Knex, actor: Actor, noteId: number, of: RecordOf): Promise<NoteRecord> {
  const note = await findNote(db, noteId);
  const subject = note && noteSubject(note);
  const allowed =
    subject &&
    (of === 'published'
      ? subject.hasPublished || canOnNote(actor, 'read-draft', subject)
      : canOnNote(actor, 'read-draft', subject) ||
        (of === 'handed-in' && canOnNote(actor, 'read-handed-in', subject)));
  if (!note || !allowed) throw new AppError('not-found');
  return note;
}

const revisionOf = (note: NoteRecord, of: Exclude<RecordOf, 'draft'>): number | null =>
  of === 'published' ? note.publishedRevisionId : note.handedInRevisionId;

/** The readings of a note, for those who may see that state of it. */
export async function readingsFor(
  db: Knex,
  actor: Actor,
  noteId: number,
  of: RecordOf,
): Promise<RecordContent> {
  const note = await noteFor(db, actor, noteId, of);
  const contentId =
    of === 'draft'
      ? note.draft.record.recordId === null
        ? null
        : (await requireRecord(db, noteId, note.draft.record.recordId)).contentId
      : await contentOfRevision(db, revisionOf(note, of));
  if (contentId === null) throw new AppError('not-found', 'This note has no record.');
  return loadContent(db, contentId);
}

/** The record of a note as CSV, with what was done when. */
export async function recordCsvFor(
  db: Knex,
  actor: Actor,
  noteId: number,
  of: RecordOf,
): Promise<string> {
  const content = await readingsFor(db, actor, noteId, of);
  const note = await noteFor(db, actor, noteId, of);
  const revisionId = of === 'draft' ? null : revisionOf(note, of);
  const revision = revisionId === null ? null : await findRevision(db, revisionId);
  return recordCsv(content, (revision?.fields ?? note.draft).record.marks);
}

async function contentOfRevision(db: Knex, revisionId: number | null): Promise<number | null> {
  if (revisionId === null) return null;
  const row = await db('note_revisions')
    .where('note_revisions.id', revisionId)
    .first<{ record_content_id: number | null } | undefined>('note_revisions.record_content_id');
  return row?.record_content_id ?? null;
}

/** In order of time: a file may hold its rows in any. */
function inOrder(readings: RecordContent['readings']): RecordContent['readings'] {
  const unordered = readings.some(
    ({ minute }, index) => minute < (readings[index - 1]?.minute ?? -Infinity),
  );
  return unordered ? [...readings].sort((one, other) => one.minute - other.minute) : readings;
}

/** A part of a record, minutes. */
export interface MinuteSpan {
  readonly from: number;
  readonly to: number;
}

/**
 * The same, thinned for a chart without losing extremes: all of it, or as finely as a screen can
 * show a part of it.
 */
export function presentPoints(content: RecordContent, span: MinuteSpan | null): RecordPoints {
  const thin = (readings: RecordContent['readings']): [number, number][] => {
    const ordered = inOrder(readings);
    if (!span) {
      return chartPoints(ordered, CHART_POINTS).map(({ minute, celsius }) => [minute, celsius]);
    }
    const points = ordered.map(({ minute, celsius }): [number, number] => [minute, celsius]);
    return thinToColumns(points, span.from, span.to, DETAIL_COLUMNS).map(([minute, celsius]) => [
      Math.round(minute * 1e4) / 1e4,
      Math.round(celsius * 100) / 100,
    ]);
  };
  return {
    points: thin(content.readings),
    secondProbe: content.secondProbe ? thin(content.secondProbe) : null,
    count: content.readings.length,
  };
}
