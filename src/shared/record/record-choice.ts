import { z } from 'zod';
import { RECORD_LIMITS } from './record-limits.ts';
import { TIME_FORMATS } from './parse-time.ts';
import { DELIMITERS } from './scan-rows.ts';

const column = z
  .number()
  .int()
  .min(0)
  .max(RECORD_LIMITS.columns - 1);

/** How to read a table, as detected and confirmed. Columns count from 0, lines from 1. */
export const recordChoiceSchema = z.object({
  delimiter: z.enum(DELIMITERS),
  decimal: z.enum(['.', ',']),
  /** Line of the column names; null when the file has none. Readings are looked for below it. */
  headerLine: z.number().int().min(1).max(RECORD_LIMITS.rows).nullable(),
  timeColumn: column,
  /** A column with the date alone, where the time column holds the time of day; left out for none. */
  dateColumn: column.nullable().optional(),
  timeFormat: z.enum(TIME_FORMATS),
  temperatureColumn: column,
  secondColumn: column.nullable(),
  unit: z.enum(['C', 'F', 'K']),
});
export type RecordChoice = z.infer<typeof recordChoiceSchema>;
