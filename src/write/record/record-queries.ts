import { queryOptions } from '@tanstack/react-query';
import { recordSchema, type FiringRecord } from '#shared/api/records.ts';
import type { RecordChoice } from '#shared/record/record-choice.ts';
import { fetchBytes, send } from '../../http/client.ts';
import { upload } from '../../http/upload.ts';
import { noteQueries } from '../../notes/note-queries.ts';
import { sourceOfKept, type RecordSource } from './record-source.ts';

const POLL_MILLISECONDS = 1000;

const address = (noteId: number, recordId: number): string =>
  `/api/notes/${String(noteId)}/records/${String(recordId)}`;

/** How far the server's reading of a record has come: asked every second until it is through. */
export const recordQueries = {
  points: (noteId: number) => [...noteQueries.all, 'record', noteId, 'draft'] as const,
  status: (noteId: number, recordId: number) =>
    queryOptions({
      queryKey: [...noteQueries.all, 'record-status', noteId, recordId],
      queryFn: ({ signal }) =>
        send({ path: address(noteId, recordId), answer: recordSchema, signal }),
      staleTime: Infinity,
      refetchInterval: (query) =>
        query.state.data === undefined || query.state.data.status === 'reading'
          ? POLL_MILLISECONDS
          : false,
    }),
};

/** Sends a table with the choice it is to be read by. */
export function sendRecord(
  noteId: number,
  source: RecordSource,
  choice: RecordChoice,
  options: { readonly onProgress: (share: number) => void; readonly signal: AbortSignal },
): Promise<FiringRecord> {
  return upload({
    path: `/api/notes/${String(noteId)}/records`,
    kind: 'record',
    file: source.file ?? new Blob([source.text], { type: 'text/csv' }),
    fileName: source.fileName,
    fields: { source: source.source, choice: JSON.stringify(choice) },
    answer: recordSchema,
    ...options,
  });
}

/** The table of a stored record, as the server keeps it; null where it keeps none. */
export async function fetchKeptTable(
  noteId: number,
  record: FiringRecord,
): Promise<RecordSource | null> {
  if (record.choice === null) return null;
  const bytes = await fetchBytes(`${address(noteId, record.id)}/file`);
  return sourceOfKept(new Uint8Array(bytes), record, record.choice);
}

/** Has the kept file read again with other columns or units. */
export function readRecordAgain(
  noteId: number,
  recordId: number,
  choice: RecordChoice,
): Promise<FiringRecord> {
  return send({
    method: 'PUT',
    path: address(noteId, recordId),
    body: { choice },
    answer: recordSchema,
  });
}
