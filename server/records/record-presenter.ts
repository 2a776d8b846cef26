import type { FiringRecord } from '#shared/api/records.ts';
import type { RecordRow } from './record-repository.ts';

/** How far the reading of a record has come, for its author and the desk. */
export function presentRecord(record: RecordRow): FiringRecord {
  const ready = record.status === 'ready';
  return {
    id: record.id,
    status: record.status,
    fileName: record.fileName,
    source: record.source,
    count: ready ? record.count : null,
    unit: record.unit,
    assumed: record.assumed,
    skipped: record.skipped.slice(0, 20),
    skippedCount: record.skippedCount,
    strip: ready ? record.strip : null,
    error: record.error,
    choice: record.storageKey === null ? null : record.choice,
  };
}
