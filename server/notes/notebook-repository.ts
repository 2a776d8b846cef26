import type { Knex } from 'knex';
import type { StripPoints } from '#shared/api/note-rows.ts';
import type { Check } from '#shared/note/checks/check.ts';
import { readJson } from '../database/read-json.ts';

/** Strip and checks of each note's latest revision; notes never handed in have none. */
export async function revisionSummaries(
  db: Knex,
  noteIds: readonly number[],
): Promise<Map<number, { strip: StripPoints | null; stripWords: string; checks: Check[] }>> {
  if (noteIds.length === 0) return new Map();
  const latest = db('note_revisions as newest')
    .whereIn('newest.note_id', [...noteIds])
    .groupBy('newest.note_id')
    .max('newest.id');
  const rows = await db('note_revisions')
    .whereIn('note_revisions.id', latest)
    .select<{ note_id: number; strip: unknown; strip_words: string; checks: unknown }[]>(
      'note_revisions.note_id',
      'note_revisions.strip',
      'note_revisions.strip_words',
      'note_revisions.checks',
    );
  return new Map(
    rows.map((row) => [
      row.note_id,
      {
        strip: readJson(row.strip) as StripPoints | null,
        stripWords: row.strip_words,
        checks: readJson(row.checks) as Check[],
      },
    ]),
  );
}
