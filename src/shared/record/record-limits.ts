import { UPLOAD_LIMITS } from '../upload-limits.ts';

/** Limits of a record's file: a second's logging for two days, with room, and no more. */
export const RECORD_LIMITS = {
  rows: 200_000,
  columns: 50,
  /** Characters in one cell. */
  cellCharacters: 1024,
  /** Bytes of the file. */
  bytes: UPLOAD_LIMITS.record.bytes,
} as const;
