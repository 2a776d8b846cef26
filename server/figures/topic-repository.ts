import type { Knex } from 'knex';
import { dayOf } from '../database/day.ts';
import { readJson } from '../database/read-json.ts';
import { unknownMember } from './figure-repository.ts';
import { FIGURE_NUMBERS_VERSION, type FigureNumbers } from './figure-numbers.ts';
import type { FigureFiring } from './topic-cases.ts';

/** Every published firing with what the plots read of it, in order of note. */
export async function figureFirings(db: Knex): Promise<FigureFiring[]> {
  const rows = await db('published_figures')
    .join('published_firings', 'published_firings.note_id', 'published_figures.note_id')
    .where('published_figures.version', FIGURE_NUMBERS_VERSION)
    .orderBy('published_figures.note_id')
    .select<
      {
        note_id: number;
        kiln_id: number;
        author_id: number | null;
        fired_on: Date;
        numbers: unknown;
      }[]
    >(
      'published_firings.note_id',
      'published_firings.kiln_id',
      'published_firings.author_id',
      'published_firings.fired_on',
      'published_figures.numbers',
    );
  return rows.map((row) => ({
    ...(readJson(row.numbers) as FigureNumbers),
    noteId: row.note_id,
    kilnId: row.kiln_id,
    memberId: row.author_id ?? unknownMember(row.note_id),
    firedOn: dayOf(row.fired_on),
  }));
}

/** What else changes the plots: accounts that went, and notes whose numbers were read since. */
export async function figureRowsVersion(db: Knex): Promise<string> {
  const [firings, figures] = await Promise.all([
    db('published_firings').count<{ n: number }[]>('published_firings.author_id as n'),
    db('published_figures')
      .where('published_figures.version', FIGURE_NUMBERS_VERSION)
      .count<{ n: number }[]>('published_figures.note_id as n'),
  ]);
  return `${String(firings[0]?.n ?? 0)}:${String(figures[0]?.n ?? 0)}`;
}

/** More kilns than this are no list to choose from. */
const MOST_KILNS = 200;

/** Kilns with published firings, those with most first; the wanted one is always among them. */
export async function firedKilns(
  db: Knex,
  wanted: number | undefined,
): Promise<{ id: number; name: string; firings: number }[]> {
  const select = () =>
    db('published_firings')
      .join('kilns', 'kilns.id', 'published_firings.kiln_id')
      .groupBy('kilns.id', 'kilns.name')
      .select<{ id: number; name: string; firings: number }[]>(
        'kilns.id',
        'kilns.name',
        db.raw('COUNT(*) AS firings'),
      );
  const most = await select()
    .orderBy([{ column: 'firings', order: 'desc' }, { column: 'kilns.id' }])
    .limit(MOST_KILNS);
  if (wanted === undefined || most.some(({ id }) => id === wanted)) return most;
  return [...most, ...(await select().where('kilns.id', wanted))];
}

/** Published notes that lack their numbers, or have them of another version. */
export async function notesWithoutFigures(db: Knex, limit: number): Promise<number[]> {
  const rows = await db('published_firings')
    .leftJoin('published_figures', 'published_figures.note_id', 'published_firings.note_id')
    .where((missing) =>
      missing
        .whereNull('published_figures.version')
        .orWhereNot('published_figures.version', FIGURE_NUMBERS_VERSION),
    )
    .orderBy('published_firings.note_id')
    .limit(limit)
    .select<{ note_id: number }[]>('published_firings.note_id');
  return rows.map(({ note_id }) => note_id);
}
