import { Worker } from 'node:worker_threads';
import type { RecordChoice } from '#shared/record/record-choice.ts';
import { inTransaction } from '../database/transaction.ts';
import type { Deps } from '../deps.ts';
import type { ReadOutcome } from './read-bytes.ts';
import { storeContent } from './record-content.ts';
import { findRecordById, lockRecord, markFailed, markReady } from './record-repository.ts';

const LIMIT_MILLISECONDS = 20_000;
const MEMORY_MEGABYTES = 512;

/** Reads the bytes on a thread of their own, so that no file can hold up the page server. */
function readOnThread(bytes: Uint8Array, choice: RecordChoice): Promise<ReadOutcome> {
  return new Promise((resolve, reject) => {
    const worker = new Worker(new URL('./record-thread.mjs', import.meta.url), {
      workerData: { bytes, choice },
      execArgv: [],
      resourceLimits: { maxOldGenerationSizeMb: MEMORY_MEGABYTES },
    });
    const timer = setTimeout(() => {
      resolve({ error: { message: 'This file took too long to read.', line: null } });
      void worker.terminate();
    }, LIMIT_MILLISECONDS);
    worker.once('message', (outcome: ReadOutcome) => {
      clearTimeout(timer);
      resolve(outcome);
      void worker.terminate();
    });
    worker.once('error', (error: NodeJS.ErrnoException) => {
      clearTimeout(timer);
      if (error.code === 'ERR_WORKER_OUT_OF_MEMORY') {
        resolve({
          error: { message: 'This file takes more memory to read than one may.', line: null },
        });
      } else {
        reject(error);
      }
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
 *
 * @param read how the bytes are read: on a thread, unless the file is known to be harmless
 */
export async function readRecord(
  deps: Deps,
  recordId: number,
  read: (
    bytes: Uint8Array,
    choice: RecordChoice,
  ) => ReadOutcome | Promise<ReadOutcome> = readOnThread,
): Promise<void> {
  const record = await findRecordById(deps.db, recordId);
  if (record?.status !== 'reading' || record.storageKey === null) return;
  const bytes = await bytesOf(deps, record.storageKey);
  const outcome: ReadOutcome = bytes
    ? await read(bytes, record.choice)
    : { error: { message: 'The file is gone; upload it again.', line: null } };
  await inTransaction(deps.db, async (trx) => {
    // Chosen anew while this was read: the job of that choice reads it again.
    const now = await lockRecord(trx, recordId);
    if (now?.status !== 'reading' || !isSameChoice(now.choice, record.choice)) return;
    if (!outcome.read) {
      await markFailed(trx, recordId, outcome.error);
      return;
    }
    const { readings, secondProbe, assumed, skipped, skippedCount } = outcome.read;
    await markReady(trx, recordId, {
      contentId: await storeContent(trx, { readings, secondProbe }),
      unit: record.choice.unit,
      assumed,
      skipped,
      skippedCount,
    });
  });
}

const isSameChoice = (a: RecordChoice, b: RecordChoice): boolean =>
  (Object.keys({ ...a, ...b }) as (keyof RecordChoice)[]).every((part) => a[part] === b[part]);
