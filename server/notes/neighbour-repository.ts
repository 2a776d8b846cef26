import type { Knex } from 'knex';
import type { Neighbour } from '#shared/api/notes.ts';
import type { EarlierFiring } from '#shared/note/read-note.ts';
import { emptyNoteFields, type NoteFields } from '#shared/note/note-fields.ts';
import type { NoteStatus } from '#shared/vocabulary/statuses.ts';
import { dayOf } from '../database/day.ts';
import { readJson } from '../database/read-json.ts';
import { findKilnVersion } from '../kilns/kiln-repository.ts';
import type { StoredRow } from './published-repository.ts';
import { findRevision } from './revision-repository.ts';
import { stripsOfNotes } from './note-strips.ts';
import { IN_OWN_SERIES } from './note-status.ts';
import { slugOf } from './slug.ts';

/** Where a firing stands in its kiln's order: by day, start time, then note. */
export interface PlaceInSeries {
  readonly noteId: number;
  readonly kilnId: number;
  readonly firedOn: string;
  readonly startTime: string | null;
}
type Side = 'earlier' | 'next';

/** A firing without a start time counts as the first of its day. */
const TIME_TESTS = { earlier: "COALESCE(??, '') < ?", next: "COALESCE(??, '') > ?" } as const;

/** Adds "before (or after) this place" to a query on a table with the columns of the order. */
function beside<Query extends Knex.QueryBuilder>(
  query: Query,
  table: 'notes' | 'published_firings',
  idColumn: string,
  place: PlaceInSeries,
  side: Side,
): Query {
  const sign = side === 'earlier' ? '<' : '>';
  const direction = side === 'earlier' ? 'desc' : 'asc';
  const time = place.startTime ?? '';
  void query
    .where(`${table}.kiln_id`, place.kilnId)
    .where((where) => {
      void where.where(`${table}.fired_on`, sign, place.firedOn).orWhere((sameDay) => {
        void sameDay.where(`${table}.fired_on`, place.firedOn).where((either) => {
          void either
            .whereRaw(TIME_TESTS[side], [`${table}.fired_at_time`, time])
            .orWhere((same) => {
              void same
                .whereRaw("COALESCE(??, '') = ?", [`${table}.fired_at_time`, time])
                .where(idColumn, sign, place.noteId);
            });
        });
      });
    })
    .orderBy([
      { column: `${table}.fired_on`, order: direction },
      { column: `${table}.fired_at_time`, order: direction },
      { column: idColumn, order: direction },
    ])
    .limit(1);
  return query;
}

/** A neighbour, and its place in the order as text that sorts like it. */
interface Placed {
  readonly neighbour: Neighbour;
  readonly place: string;
}
const placeKey = ({ firedOn, noteId }: Neighbour, time: string | null): string =>
  `${firedOn} ${(time ?? '').padEnd(5)} ${String(noteId).padStart(16, '0')}`;

async function publishedNeighbour(
  db: Knex,
  place: PlaceInSeries,
  side: Side,
): Promise<Placed | null> {
  const rows = await beside(
    db('published_firings').select<
      { note_id: number; fired_on: Date; fired_at_time: string | null; note_row: unknown }[]
    >(
      'published_firings.note_id',
      'published_firings.fired_on',
      'published_firings.fired_at_time',
      'published_firings.note_row',
    ),
    'published_firings',
    'published_firings.note_id',
    place,
    side,
  );
  const row = rows[0];
  if (!row) return null;
  const stored = readJson(row.note_row) as StoredRow;
  const neighbour: Neighbour = {
    noteId: row.note_id,
    slug: stored.slug,
    title: stored.title,
    firedOn: dayOf(row.fired_on),
    status: 'published',
    strip: stored.strip,
    stripWords: stored.stripWords,
    peakCelsius: stored.peakCelsius,
    timeToTemperatureMinutes: stored.timeToTemperatureMinutes,
    changes: stored.changes,
  };
  return { neighbour, place: placeKey(neighbour, row.fired_at_time) };
}

/** The author's own note beside this one that has no readers yet. */
async function ownUnpublishedNeighbour(
  db: Knex,
  place: PlaceInSeries,
  side: Side,
  authorId: number,
): Promise<Placed | null> {
  const rows = await beside(
    db('notes')
      .whereNull('notes.removed_at')
      .whereNull('notes.published_revision_id')
      .whereIn('notes.status', [...IN_OWN_SERIES])
      .where('notes.author_id', authorId)
      .whereNot('notes.id', place.noteId)
      .select<
        {
          id: number;
          fired_on: Date;
          fired_at_time: string | null;
          status: NoteStatus;
          draft: unknown;
        }[]
      >('notes.id', 'notes.fired_on', 'notes.fired_at_time', 'notes.status', 'notes.draft'),
    'notes',
    'notes.id',
    place,
    side,
  );
  const row = rows[0];
  if (!row) return null;
  const draft = { ...emptyNoteFields(), ...(readJson(row.draft) as NoteFields) };
  const strips = await stripsOfNotes(db, [{ id: row.id, status: row.status, draft }]);
  const neighbour: Neighbour = {
    noteId: row.id,
    slug: slugOf(draft.title),
    title: draft.title,
    firedOn: dayOf(row.fired_on),
    status: row.status,
    strip: strips.get(row.id)?.strip ?? null,
    stripWords: strips.get(row.id)?.stripWords ?? '',
    peakCelsius: draft.plan.peakCelsius,
    timeToTemperatureMinutes: draft.plan.timeToTemperatureMinutes,
    changes: draft.changes.map(({ change }) => change),
  };
  return { neighbour, place: placeKey(neighbour, row.fired_at_time) };
}

/**
 * The firing before or after this place in its kiln's series: the nearer of the published one and,
 * for the author, a living one of their own that has no readers yet (`IN_OWN_SERIES`).
 */
export async function neighbourOf(
  db: Knex,
  place: PlaceInSeries,
  side: Side,
  readerId: number | null,
): Promise<Neighbour | null> {
  const [published, own] = await Promise.all([
    publishedNeighbour(db, place, side),
    readerId === null ? null : ownUnpublishedNeighbour(db, place, side, readerId),
  ]);
  if (!published || !own) return (published ?? own)?.neighbour ?? null;
  const ownIsNearer =
    side === 'earlier' ? own.place > published.place : own.place < published.place;
  return (ownIsNearer ? own : published).neighbour;
}

/** The earlier firing with its fields and kiln, for checks and proposed changes. */
export async function earlierFiring(
  db: Knex,
  place: PlaceInSeries,
  authorId: number,
): Promise<{ neighbour: Neighbour; firing: EarlierFiring } | null> {
  const neighbour = await neighbourOf(db, place, 'earlier', authorId);
  if (!neighbour) return null;
  const note = await db('notes')
    .where('notes.id', neighbour.noteId)
    .first<{ published_revision_id: number | null; draft: unknown } | undefined>(
      'notes.published_revision_id',
      'notes.draft',
    );
  if (!note) return null;
  const revision = note.published_revision_id
    ? await findRevision(db, note.published_revision_id)
    : null;
  const fields = revision?.fields ?? {
    ...emptyNoteFields(),
    ...(readJson(note.draft) as NoteFields),
  };
  const version = revision
    ? revision.kilnVersion
    : ((
        await db('kilns')
          .where('kilns.id', place.kilnId)
          .first<{ current_version: number } | undefined>('kilns.current_version')
      )?.current_version ?? 1);
  const kiln = await findKilnVersion(db, place.kilnId, version);
  return kiln ? { neighbour, firing: { fields, kiln } } : null;
}
