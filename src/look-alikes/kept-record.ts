import { z } from 'zod';
import { lookAlikesBodySchema } from '#shared/api/look-alikes.ts';

const KEY = 'spyhole look-alikes';

const askedRecordSchema = z.object({
  name: z.string(),
  readings: lookAlikesBodySchema.shape.readings,
  targetCelsius: z.number().nullable(),
});
/** The record asked about, thinned as it is sent. */
export type AskedRecord = z.infer<typeof askedRecordSchema>;

/** The record asked about last in this tab, so that Back from a note finds it again. */
export function keptRecord(): AskedRecord | null {
  try {
    const kept = askedRecordSchema.safeParse(JSON.parse(sessionStorage.getItem(KEY) ?? 'null'));
    return kept.success ? kept.data : null;
  } catch {
    return null;
  }
}

export function keepRecord(record: AskedRecord | null): void {
  try {
    if (record === null) sessionStorage.removeItem(KEY);
    else sessionStorage.setItem(KEY, JSON.stringify(record));
  } catch {
    // A browser that keeps nothing asks for the record again.
  }
}
