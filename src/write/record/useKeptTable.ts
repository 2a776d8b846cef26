import { useState } from 'react';
import type { FiringRecord } from '#shared/api/records.ts';
import { useMessages } from '../../ui/useMessages.ts';
import type { DraftKeeper } from '../draft-keeper.ts';
import { fetchKeptTable } from './record-queries.ts';
import type { RecordSource } from './record-source.ts';

/** Brings the table of a stored record back from the server, in this visit or a later one. */
export function useKeptTable(noteId: number, keeper: DraftKeeper) {
  const tell = useMessages();
  const [fetching, setFetching] = useState(false);

  const fetch = async (
    record: FiringRecord,
    onTable: (source: RecordSource) => void,
  ): Promise<void> => {
    setFetching(true);
    try {
      const source = await fetchKeptTable(noteId, record);
      // Taken off or replaced meanwhile: then nothing is asked about it.
      if (source && keeper.current().fields.record.recordId === record.id) onTable(source);
    } catch (error) {
      tell({
        kind: 'error',
        text: error instanceof Error ? error.message : 'The table could not be fetched.',
        action: { label: 'Try again', onClick: () => void fetch(record, onTable) },
      });
    } finally {
      setFetching(false);
    }
  };
  return { fetching, fetch };
}
