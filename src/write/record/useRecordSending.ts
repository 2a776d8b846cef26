import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useRef, useState } from 'react';
import type { FiringRecord } from '#shared/api/records.ts';
import type { RecordChoice } from '#shared/record/record-choice.ts';
import type { DraftKeeper } from '../draft-keeper.ts';
import type { RecordSource } from './record-source.ts';
import { readRecordAgain, recordQueries, sendRecord } from './record-queries.ts';

export type Sending =
  | { readonly kind: 'idle' }
  | { readonly kind: 'sending'; readonly share: number }
  | { readonly kind: 'failed'; readonly reason: string; readonly retry: () => void };

/** Sends a confirmed table and attaches it to the draft once the server has it. */
export function useRecordSending(noteId: number, keeper: DraftKeeper) {
  const client = useQueryClient();
  const [sending, setSending] = useState<Sending>({ kind: 'idle' });
  const abort = useRef<AbortController | null>(null);
  useEffect(() => () => abort.current?.abort(), []);

  const attach = async (record: FiringRecord, source: RecordSource): Promise<void> => {
    client.setQueryData(recordQueries.status(noteId, record.id).queryKey, record);
    keeper.change((fields) => ({
      ...fields,
      record: {
        ...fields.record,
        recordId: record.id,
        // Answers were about another curve, as were disagreements; and typed rows that were sent stand in the record now.
        levelAnswers: [],
        typedRows: source.source === 'pasted' ? [] : fields.record.typedRows,
      },
      findingDisputes: [],
    }));
    await keeper.flush();
  };

  const send = async (
    source: RecordSource,
    choice: RecordChoice,
    again: number | null,
  ): Promise<boolean> => {
    const controller = new AbortController();
    abort.current = controller;
    setSending({ kind: 'sending', share: 0 });
    try {
      if (again === null) {
        const onProgress = (share: number): void => setSending({ kind: 'sending', share });
        const record = await sendRecord(noteId, source, choice, {
          onProgress,
          signal: controller.signal,
        });
        await attach(record, source);
      } else {
        const record = await readRecordAgain(noteId, again, choice);
        client.setQueryData(recordQueries.status(noteId, again).queryKey, record);
        const { draft, fields } = keeper.current();
        keeper.accept({ ...draft, fields, record });
      }
      setSending({ kind: 'idle' });
      return true;
    } catch (error) {
      if (error instanceof DOMException && error.name === 'AbortError') {
        setSending({ kind: 'idle' });
        return false;
      }
      setSending({
        kind: 'failed',
        reason: error instanceof Error ? error.message : 'The upload did not work.',
        retry: () => void send(source, choice, again),
      });
      return false;
    }
  };

  return {
    sending,
    send,
    cancel: () => abort.current?.abort(),
    dismiss: () => setSending({ kind: 'idle' }),
  };
}
