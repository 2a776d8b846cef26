import { parentPort, workerData } from 'node:worker_threads';
import type { RecordChoice } from '#shared/record/record-choice.ts';
import { readBytes } from './read-bytes.ts';

/** Reads one uploaded record on a thread of its own and answers once. */
const { bytes, choice } = workerData as { bytes: Uint8Array; choice: RecordChoice };
parentPort?.postMessage(readBytes(bytes, choice));
