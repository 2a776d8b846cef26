import { parentPort, workerData } from 'node:worker_threads';
import { decodeRecordBytes } from '#shared/record/decode-record-bytes.ts';
import { readTable } from '#shared/record/read-table.ts';
import { RecordError } from '#shared/record/record-error.ts';
import type { RecordChoice } from '#shared/record/record-choice.ts';
import type { ReadOutcome } from './read-record.ts';

/** Reads one uploaded record on a thread of its own and answers once. */
const SHOWN = 100;
const answer = (outcome: ReadOutcome): void => parentPort?.postMessage(outcome);
const { bytes, choice } = workerData as { bytes: Uint8Array; choice: RecordChoice };
try {
  const { skipped, ...read } = readTable(decodeRecordBytes(bytes), choice);
  answer({ read: { ...read, skipped: skipped.slice(0, SHOWN), skippedCount: skipped.length } });
} catch (error) {
  if (!(error instanceof RecordError)) throw error;
  answer({ error: { message: error.message, line: error.line } });
}
