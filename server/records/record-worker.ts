import { parentPort, workerData } from 'node:worker_threads';
import { decodeRecordBytes } from '#shared/record/decode-record-bytes.ts';
import { readTable } from '#shared/record/read-table.ts';
import { RecordError } from '#shared/record/record-error.ts';
import type { RecordChoice } from '#shared/record/record-choice.ts';

/** Reads one uploaded record on a thread of its own and answers once. */
const { bytes, choice } = workerData as { bytes: Uint8Array; choice: RecordChoice };
try {
  parentPort?.postMessage({ read: readTable(decodeRecordBytes(bytes), choice) });
} catch (error) {
  if (!(error instanceof RecordError)) throw error;
  parentPort?.postMessage({ error: { message: error.message, line: error.line } });
}
