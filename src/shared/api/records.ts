import { z } from 'zod';
import { recordChoiceSchema } from '../record/record-choice.ts';
import { stripPointsSchema } from './note-rows.ts';

/**
 * A stored record and how far its reading has come. The file is kept whole by content hash; reading
 * happens off the request path.
 */
export const recordSchema = z.object({
  id: z.number(),
  status: z.enum(['reading', 'ready', 'failed']),
  fileName: z.string(),
  source: z.enum(['file', 'pasted', 'typed']),
  count: z.number().nullable(),
  unit: z.enum(['C', 'F', 'K']).nullable(),
  assumed: z.array(z.string()),
  skipped: z.array(z.object({ line: z.number(), reason: z.string() })),
  skippedCount: z.number(),
  strip: stripPointsSchema.nullable(),
  error: z.object({ message: z.string(), line: z.number().nullable() }).nullable(),
  /** How its table is read: another choice can be made. Null where no table is kept. */
  choice: recordChoiceSchema.nullable(),
});
export type FiringRecord = z.infer<typeof recordSchema>;

/** Points for the chart: downsampled without losing extremes. */
export const recordPointsSchema = z.object({
  points: stripPointsSchema,
  secondProbe: stripPointsSchema.nullable(),
  count: z.number(),
});
export type RecordPoints = z.infer<typeof recordPointsSchema>;
