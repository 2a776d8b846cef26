import type { Knex } from 'knex';
import type { RecordChoice } from '#shared/record/record-choice.ts';
import { readJson } from '../database/read-json.ts';

/** A record given to a note. */
export interface RecordRow {
  readonly id: number;
  readonly noteId: number;
  readonly source: 'file' | 'pasted' | 'typed';
  readonly fileName: string;
  readonly status: 'reading' | 'ready' | 'failed';
  readonly storageKey: string | null;
  readonly choice: RecordChoice;
  readonly contentId: number | null;
  readonly unit: 'C' | 'F' | 'K' | null;
  readonly assumed: string[];
  readonly skipped: { line: number; reason: string }[];
  readonly skippedCount: number;
  readonly error: { message: string; line: number | null } | null;
  readonly count: number | null;
  readonly strip: [number, number][] | null;
}

interface RawRecord {
  id: number;
  note_id: number;
  source: RecordRow['source'];
  file_name: string;
  status: RecordRow['status'];
  storage_key: string | null;
  choice: unknown;
  content_id: number | null;
  unit: RecordRow['unit'];
  assumed: unknown;
  skipped: unknown;
  skipped_count: number;
  error: unknown;
  count: number | null;
  strip: unknown;
}

const selectRecords = (db: Knex) =>
  db('records')
    .leftJoin('record_contents', 'record_contents.id', 'records.content_id')
    .select<RawRecord[]>(
      'records.id',
      'records.note_id',
      'records.source',
      'records.file_name',
      'records.status',
      'records.storage_key',
      'records.choice',
      'records.content_id',
      'records.unit',
      'records.assumed',
      'records.skipped',
      'records.skipped_count',
      'records.error',
      'record_contents.count',
      'record_contents.strip',
    );

const toRow = (raw: RawRecord): RecordRow => ({
  id: raw.id,
  noteId: raw.note_id,
  source: raw.source,
  fileName: raw.file_name,
  status: raw.status,
  storageKey: raw.storage_key,
  choice: readJson(raw.choice) as RecordChoice,
  contentId: raw.content_id,
  unit: raw.unit,
  assumed: readJson(raw.assumed) as string[],
  skipped: readJson(raw.skipped) as RecordRow['skipped'],
  skippedCount: raw.skipped_count,
  error: readJson(raw.error) as RecordRow['error'],
  count: raw.count,
  strip: readJson(raw.strip) as RecordRow['strip'],
});

/** The record of this very note; another note's is not there. */
export async function findRecord(
  db: Knex,
  noteId: number,
  recordId: number,
): Promise<RecordRow | null> {
  const [row] = await selectRecords(db).where({
    'records.id': recordId,
    'records.note_id': noteId,
  });
  return row ? toRow(row) : null;
}

/** For the worker, which was told only the id. */
export async function findRecordById(db: Knex, recordId: number): Promise<RecordRow | null> {
  const [row] = await selectRecords(db).where('records.id', recordId);
  return row ? toRow(row) : null;
}

/** The same with its row locked until the transaction ends. */
export async function lockRecord(trx: Knex, recordId: number): Promise<RecordRow | null> {
  const [row] = await selectRecords(trx).where('records.id', recordId).forUpdate('records');
  return row ? toRow(row) : null;
}

export async function insertRecord(
  trx: Knex,
  record: {
    noteId: number;
    source: 'file' | 'pasted';
    fileName: string;
    storageKey: string;
    choice: RecordChoice;
  },
): Promise<number> {
  const [id] = await trx('records').insert({
    note_id: record.noteId,
    source: record.source,
    file_name: record.fileName,
    storage_key: record.storageKey,
    choice: JSON.stringify(record.choice),
    assumed: '[]',
    skipped: '[]',
  });
  if (id === undefined) throw new Error('MariaDB gave no id.');
  return id;
}

/** Back to *reading*, with another choice of columns and units. */
export async function chooseAgain(
  trx: Knex,
  recordId: number,
  choice: RecordChoice,
): Promise<void> {
  await trx('records')
    .where({ id: recordId })
    .update({ status: 'reading', choice: JSON.stringify(choice), error: null });
}

export async function markReady(
  trx: Knex,
  recordId: number,
  read: {
    contentId: number;
    unit: string;
    assumed: readonly string[];
    /** The first of them, and how many there are. */
    skipped: readonly { line: number; reason: string }[];
    skippedCount: number;
  },
): Promise<void> {
  await trx('records')
    .where({ id: recordId })
    .update({
      status: 'ready',
      content_id: read.contentId,
      unit: read.unit,
      assumed: JSON.stringify(read.assumed),
      skipped: JSON.stringify(read.skipped),
      skipped_count: read.skippedCount,
      error: null,
    });
}

export async function markFailed(
  trx: Knex,
  recordId: number,
  error: { message: string; line: number | null },
): Promise<void> {
  await trx('records')
    .where({ id: recordId })
    .update({ status: 'failed', content_id: null, error: JSON.stringify(error) });
}
