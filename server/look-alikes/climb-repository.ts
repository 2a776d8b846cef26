import type { Knex } from 'knex';
import {
  signatureFromBytes,
  SIGNATURE_VERSION,
  type ClimbSignature,
} from '#shared/look-alike/climb-signature.ts';
import { climbTraitsSchema, type ClimbTraits } from '#shared/look-alike/climb-traits.ts';
import { readJson } from '../database/read-json.ts';

export interface KeptClimb {
  readonly noteId: number;
  readonly revisionId: number;
  readonly signature: ClimbSignature | null;
  readonly keptAt: Date;
}
interface RawClimb {
  note_id: number;
  revision_id: number;
  signature: Buffer | null;
  kept_at: Date;
}

const selectClimbs = (db: Knex) =>
  db('published_climbs')
    .where('published_climbs.version', SIGNATURE_VERSION)
    .select<RawClimb[]>(
      'published_climbs.note_id',
      'published_climbs.revision_id',
      'published_climbs.signature',
      'published_climbs.kept_at',
    );

const toClimb = (raw: RawClimb): KeptClimb => ({
  noteId: raw.note_id,
  revisionId: raw.revision_id,
  signature: raw.signature && signatureFromBytes(raw.signature),
  keptAt: raw.kept_at,
});

/** Climbs in order of note, some at a time. */
export async function climbsAfter(db: Knex, noteId: number, limit: number): Promise<KeptClimb[]> {
  const rows = await selectClimbs(db)
    .where('published_climbs.note_id', '>', noteId)
    .orderBy('published_climbs.note_id')
    .limit(limit);
  return rows.map(toClimb);
}

export async function climbsOfNotes(db: Knex, noteIds: readonly number[]): Promise<KeptClimb[]> {
  if (noteIds.length === 0) return [];
  const rows = await selectClimbs(db).whereIn('published_climbs.note_id', [...noteIds]);
  return rows.map(toClimb);
}

/** Which climbs were kept at or after a moment of the database's clock, without the climbs. */
export async function climbsKeptSince(
  db: Knex,
  since: Date,
): Promise<{ noteId: number; keptAt: Date }[]> {
  const rows = await db('published_climbs')
    .where('published_climbs.kept_at', '>=', since)
    .select<{ note_id: number; kept_at: Date }[]>(
      'published_climbs.note_id',
      'published_climbs.kept_at',
    );
  return rows.map((row) => ({ noteId: row.note_id, keptAt: row.kept_at }));
}

/** What was read off the climbs of notes that are published as they were read. */
export async function publishedTraits(
  db: Knex,
  noteIds: readonly number[],
): Promise<Map<number, { revisionId: number; traits: ClimbTraits }>> {
  if (noteIds.length === 0) return new Map();
  const rows = await db('published_climbs')
    .join('published_firings', (join) =>
      join
        .on('published_firings.note_id', 'published_climbs.note_id')
        .andOn('published_firings.revision_id', 'published_climbs.revision_id'),
    )
    .whereIn('published_climbs.note_id', [...noteIds])
    .whereNotNull('published_climbs.traits')
    .select<{ note_id: number; revision_id: number; traits: unknown }[]>(
      'published_climbs.note_id',
      'published_climbs.revision_id',
      'published_climbs.traits',
    );
  return new Map(
    rows.map((row) => [
      row.note_id,
      {
        revisionId: row.revision_id,
        traits: climbTraitsSchema.parse(readJson(row.traits)),
      },
    ]),
  );
}

/** Published notes whose climb is not kept, or kept by an older way of reading. */
export async function notesWithoutClimb(db: Knex, limit: number): Promise<number[]> {
  return db('published_firings')
    .leftJoin('published_climbs', 'published_climbs.note_id', 'published_firings.note_id')
    .where((query) =>
      query
        .whereNull('published_climbs.note_id')
        .orWhereRaw('published_climbs.revision_id <> published_firings.revision_id')
        .orWhereNot('published_climbs.version', SIGNATURE_VERSION),
    )
    .orderBy('published_firings.note_id')
    .limit(limit)
    .pluck<number[]>('published_firings.note_id');
}
