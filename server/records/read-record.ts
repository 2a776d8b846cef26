import { Worker } from 'node:worker_threads';
import type { RecordChoice } from '#shared/record/record-choice.ts';
import type { TableReadings } from '#shared/record/read-table.ts';
import { inTransaction } from '../database/transaction.ts';
import type { Deps } from '../deps.ts';
import { storeContent } from './record-content.ts';
import { findRecordById, markFailed, markReady } from './record-repository.ts';

const LIMIT_MILLISECONDS = 20_000;
const MEMORY_MEGABYTES = 512;

type Outcome =
  | { read: TableReadings; error?: undefined }
  | { read?: undefined; error: { message: string; line: number | null } };

/** Reads the bytes on a thread of their own, so that no file can hold up the page server. */
function readOnThread(bytes: Uint8Array, choice: RecordChoice): Promise<Outcome> {
  return new Promise((resolve, reject) => {
    const worker = new Worker(new URL('./record-worker.ts', import.meta.url), {
      workerData: { bytes, choice },
      execArgv: ['--import', 'tsx'],
      resourceLimits: { maxOldGenerationSizeMb: MEMORY_MEGABYTES },
    });
    const timer = setTimeout(() => {
      resolve({ error: { message: 'This file took too long to read.', line: null } });
      void worker.terminate();
    }, LIMIT_MILLISECONDS);
    worker.once('message', (outcome: Outcome) => {
      clearTimeout(timer);
      resolve(outcome);
      void worker.terminate();
    });
    worker.once('error', (error) => {
      clearTimeout(timer);
      reject(error);
    });
  });
}

async function bytesOf(deps: Deps, key: string): Promise<Uint8Array | null> {
  const file = await deps.store.read(key);
  if (!file) return null;
  const chunks: Buffer[] = [];
  for await (const chunk of file.stream) chunks.push(chunk as Buffer);
  return new Uint8Array(Buffer.concat(chunks));
}

/**
 * The outbox job `read-record`: turns the stored file into readings, or says why it cannot. Running
 * twice gives the same; a record chosen anew meanwhile is read by the job of that choice.
 */
export async function readRecord(deps: Deps, recordId: number): Promise<void> {
  const record = await findRecordById(deps.db, recordId);
  if (record?.status !== 'reading' || record.storageKey === null) return;
  const bytes = await bytesOf(deps, record.storageKey);
  const outcome: Outcome = bytes
    ? await readOnThread(bytes, record.choice)
    : { error: { message: 'The file is gone; upload it again.', line: null } };
  await inTransaction(deps.db, async (trx) => {
    if (!outcome.read) {
      await markFailed(trx, recordId, outcome.error);
      return;
    }
    const { readings, secondProbe, assumed, skipped } = outcome.read;
    await markReady(trx, recordId, {
      contentId: await storeContent(trx, { readings, secondProbe }),
      unit: record.choice.unit,
      assumed,
      skipped,
    });
  });
}
