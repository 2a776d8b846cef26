import type { RecordChoice } from '#shared/record/record-choice.ts';
import { recordSchema, type FiringRecord } from '#shared/api/records.ts';
import { readRecord } from '../../server/records/read-record.ts';
import type { Api, ApiAnswer, Client } from './api.ts';

/** Minutes, then °C, with commas and one line of names. */
export const MINUTES_CELSIUS: RecordChoice = {
  delimiter: ',',
  decimal: '.',
  headerLine: 1,
  timeColumn: 0,
  timeFormat: 'minutes',
  temperatureColumn: 1,
  secondColumn: null,
  unit: 'C',
};

/** Sends a file as a browser's form does, with the choice of columns beside it. */
export function uploadRecord(
  client: Client,
  noteId: number,
  content: Uint8Array | string,
  choice: Partial<RecordChoice> = {},
  fileName = 'logger.csv',
): Promise<ApiAnswer> {
  const form = new FormData();
  form.set('choice', JSON.stringify({ ...MINUTES_CELSIUS, ...choice }));
  form.set('file', new Blob([new Uint8Array(Buffer.from(content))]), fileName);
  return client.post(`/api/notes/${String(noteId)}/records`, undefined, { rawBody: form });
}

export const recordPath = (noteId: number, recordId: number): string =>
  `/api/notes/${String(noteId)}/records/${String(recordId)}`;

/** Uploads and reads, as the outbox would. @returns the record as its author sees it then */
export async function readUpload(
  api: Api,
  author: Client,
  noteId: number,
  content: Uint8Array | string,
  choice: Partial<RecordChoice> = {},
  fileName?: string,
): Promise<FiringRecord> {
  const answer = await uploadRecord(author, noteId, content, choice, fileName);
  if (answer.status !== 201) throw new Error(answer.text);
  const { id } = answer.as(recordSchema);
  await readRecord(api.deps, id);
  return (await author.get(recordPath(noteId, id))).as(recordSchema);
}
