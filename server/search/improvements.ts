import type { Knex } from 'knex';
import { readJson } from '../database/read-json.ts';

interface RawPeaks {
  noteId: number;
  peaks: unknown;
}
interface Peaks {
  readonly target: number | null;
  readonly peak: number | null;
  readonly next: number | null;
}

/**
 * By how many °C the peak of the next firing came nearer to what this one aimed at, for those of the
 * notes that have an aim, a peak and a published next firing. Below zero: it ended farther away.
 */
export async function improvementsOf(
  db: Knex,
  noteIds: readonly number[],
): Promise<Map<number, number>> {
  if (noteIds.length === 0) return new Map();
  const rows = await db('published_firings')
    .whereIn('published_firings.note_id', [...noteIds])
    .select<RawPeaks[]>(
      'published_firings.note_id AS noteId',
      db.raw(
        "JSON_OBJECT('target', JSON_EXTRACT(published_firings.note_row, '$.targetCelsius'), 'peak', JSON_EXTRACT(published_firings.note_row, '$.peakCelsius'), 'next', JSON_EXTRACT(published_firings.note_row, '$.followOn.peakCelsius')) AS peaks",
      ),
    );
  const gains = new Map<number, number>();
  for (const { noteId, peaks } of rows) {
    const { target, peak, next } = readJson(peaks) as Peaks;
    if (target === null || peak === null || next === null) continue;
    gains.set(noteId, Math.abs(peak - target) - Math.abs(next - target));
  }
  return gains;
}
