import { decodeRecordBytes } from '#shared/record/decode-record-bytes.ts';
import { readTable, type TableReadings } from '#shared/record/read-table.ts';
import { RecordError } from '#shared/record/record-error.ts';
import type { RecordChoice } from '#shared/record/record-choice.ts';

/** Skipped lines kept with a record; the rest are only counted. */
const SHOWN = 100;

/** Readings, or what is wrong with the file. */
export type ReadOutcome =
  | { read: Omit<TableReadings, 'rowCount'> & { skippedCount: number }; error?: undefined }
  | { read?: undefined; error: { message: string; line: number | null } };

/** Reads one record's bytes; how long it takes depends on whoever made the file. */
export function readBytes(bytes: Uint8Array, choice: RecordChoice): ReadOutcome {
  try {
    const { skipped, rowCount: _all, ...read } = readTable(decodeRecordBytes(bytes), choice);
    return { read: { ...read, skipped: skipped.slice(0, SHOWN), skippedCount: skipped.length } };
  } catch (error) {
    if (!(error instanceof RecordError)) throw error;
    return { error: { message: error.message, line: error.line } };
  }
}
