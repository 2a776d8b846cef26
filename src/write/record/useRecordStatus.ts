import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useEffect, useEffectEvent } from 'react';
import { noteQueries } from '../../notes/note-queries.ts';
import { useWriteForm } from '../form-context.ts';
import { recordQueries } from './record-queries.ts';

/**
 * The stored record of the draft and how far its reading has come. Once it is through, the draft is
 * asked for again, because the server's findings and checks stand on it.
 */
export function useRecordStatus(recordId: number | null) {
  const { draft, keeper } = useWriteForm();
  const client = useQueryClient();
  const known = draft.record?.id === recordId ? draft.record : undefined;
  const status = useQuery({
    ...recordQueries.status(draft.id, recordId ?? 0),
    enabled: recordId !== null,
    ...(known ? { initialData: known } : {}),
  });
  const record = recordId === null ? null : (status.data ?? null);

  const refresh = useEffectEvent(async () => {
    await keeper.flush();
    const before = keeper.current().draft.version;
    const fresh = await client.fetchQuery({ ...noteQueries.draft(draft.id), staleTime: 0 });
    // Typed on meanwhile, and saved elsewhere too: the next save will say so, nothing is mixed.
    if (keeper.hasUnsent && fresh.version !== before) return;
    keeper.accept(fresh);
    await client.invalidateQueries({ queryKey: recordQueries.points(draft.id) });
  });
  const settled =
    record === null || record.status === 'reading' ? null : `${record.id}:${record.status}`;
  const onDraft = draft.record ? `${draft.record.id}:${draft.record.status}` : null;
  useEffect(() => {
    if (settled !== null && settled !== onDraft) {
      refresh().catch(() => {
        // Away just now: the next save brings the same.
      });
    }
  }, [settled, onDraft]);

  return { status, record };
}
