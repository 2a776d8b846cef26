import type { Knex } from 'knex';
import type { CountedFacts } from '#shared/note/counted-facts.ts';
import type { Trouble } from '#shared/vocabulary/troubles.ts';
import { dayOf } from '../database/day.ts';
import { readJson } from '../database/read-json.ts';
import type { PublishedFiring } from './pairs.ts';

/** A firing whose author's account is gone still counts, as one unknown member of its own. */
export const unknownMember = (noteId: number): number => -noteId;

interface RawFiring {
  note_id: number;
  kiln_id: number;
  author_id: number | null;
  fired_on: Date;
  facts: unknown;
}

/**
 * Every firing of the kilns in which a trouble ever occurred, in order of firing: what its pairs
 * are made from. A season is a calendar year: gas kilns outdoors rest in winter.
 */
export async function firingsAround(db: Knex, trouble: Trouble): Promise<PublishedFiring[]> {
  const rows = await db('published_firings')
    .whereIn(
      'published_firings.kiln_id',
      db('firing_troubles')
        .join('published_firings as struck', 'struck.note_id', 'firing_troubles.note_id')
        .where('firing_troubles.trouble', trouble)
        .select('struck.kiln_id'),
    )
    .orderBy([
      'published_firings.fired_on',
      'published_firings.fired_at_time',
      'published_firings.note_id',
    ])
    .select<RawFiring[]>(
      'published_firings.note_id',
      'published_firings.kiln_id',
      'published_firings.author_id',
      'published_firings.fired_on',
      'published_firings.facts',
    );
  return rows.map((row) => ({
    ...(readJson(row.facts) as CountedFacts),
    noteId: row.note_id,
    kilnId: row.kiln_id,
    memberId: row.author_id ?? unknownMember(row.note_id),
    season: dayOf(row.fired_on).slice(0, 4),
  }));
}

/**
 * How many published notes had each trouble, measured or named; those whose finding of it is disputed
 * are counted apart.
 */
export async function troubleCounts(
  db: Knex,
): Promise<{ trouble: Trouble; notes: number; disputed: number }[]> {
  return db('firing_troubles')
    .groupBy('firing_troubles.trouble')
    .orderBy([{ column: 'notes', order: 'desc' }, { column: 'firing_troubles.trouble' }])
    .select<{ trouble: Trouble; notes: number; disputed: number }[]>(
      'firing_troubles.trouble',
      db.raw('CAST(SUM(NOT firing_troubles.disputed) AS SIGNED) AS notes'),
      db.raw('CAST(SUM(firing_troubles.disputed) AS SIGNED) AS disputed'),
    );
}

/** When anything that figures read last changed, as a short text; equal texts mean equal figures. */
export async function figuresVersion(db: Knex): Promise<string> {
  // One by one each is read from a small index; together they would read every row.
  const row = await db
    .select<{ n: number; latest: number | null; last: Date | null }[]>(
      db.raw('(SELECT COUNT(*) FROM published_firings) AS n'),
      db.raw('(SELECT SUM(published_firings.revision_id) FROM published_firings) AS latest'),
      db.raw('(SELECT MAX(published_firings.published_at) FROM published_firings) AS last'),
    )
    .first();
  // Disputes keep their rows, and each change raises a version: their sum never repeats.
  const disputes = await db('finding_disputes').sum<{ versions: number | null }[]>(
    'finding_disputes.version as versions',
  );
  return [
    row?.n ?? 0,
    row?.latest ?? 0,
    row?.last?.toISOString() ?? '',
    disputes[0]?.versions ?? 0,
  ].join(':');
}
