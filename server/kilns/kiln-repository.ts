import type { Knex } from 'knex';
import type { KilnFields } from '#shared/note/kiln-fields.ts';
import { readJson } from '../database/read-json.ts';

/** A kiln in its present version, with those it is lent to. */
export interface KilnRow {
  readonly id: number;
  readonly keeperId: number | null;
  readonly keeperName: string | null;
  readonly version: number;
  readonly fields: KilnFields;
  readonly volumeLitres: number | null;
  readonly pictureId: number | null;
  readonly removed: boolean;
  readonly lentTo: readonly { readonly id: number; readonly name: string }[];
}

interface RawKiln {
  id: number;
  keeper_id: number | null;
  keeper_name: string | null;
  current_version: number;
  fields: unknown;
  volume_litres: number | null;
  picture_id: number | null;
  removed_at: Date | null;
}

const presentVersion = (db: Knex) =>
  db('kilns')
    .join('kiln_versions', (join) => {
      join
        .on('kiln_versions.kiln_id', 'kilns.id')
        .andOn('kiln_versions.version', 'kilns.current_version');
    })
    .leftJoin('members', 'members.id', 'kilns.keeper_id')
    .select<RawKiln[]>(
      'kilns.id',
      'kilns.keeper_id',
      'members.name as keeper_name',
      'kilns.current_version',
      'kiln_versions.fields',
      'kiln_versions.volume_litres',
      'kilns.picture_id',
      'kilns.removed_at',
    );

async function withLoans(db: Knex, rows: readonly RawKiln[]): Promise<KilnRow[]> {
  const loans =
    rows.length === 0
      ? []
      : await db('kiln_loans')
          .join('members', 'members.id', 'kiln_loans.member_id')
          .whereIn(
            'kiln_loans.kiln_id',
            rows.map((row) => row.id),
          )
          .orderBy('members.name')
          .select<{ kiln_id: number; id: number; name: string }[]>(
            'kiln_loans.kiln_id',
            'members.id',
            'members.name',
          );
  return rows.map((row) => ({
    id: row.id,
    keeperId: row.keeper_id,
    keeperName: row.keeper_name,
    version: row.current_version,
    fields: readJson(row.fields) as KilnFields,
    volumeLitres: row.volume_litres,
    pictureId: row.picture_id,
    removed: row.removed_at !== null,
    lentTo: loans.filter((loan) => loan.kiln_id === row.id).map(({ id, name }) => ({ id, name })),
  }));
}

export async function findKiln(db: Knex, kilnId: number): Promise<KilnRow | null> {
  const rows = await presentVersion(db).where('kilns.id', kilnId);
  return (await withLoans(db, rows))[0] ?? null;
}

/** Kilns the member keeps or is lent, by name. */
export async function kilnsOf(db: Knex, memberId: number): Promise<KilnRow[]> {
  const rows = await presentVersion(db)
    .whereNull('kilns.removed_at')
    .where((either) => {
      void either
        .where('kilns.keeper_id', memberId)
        .orWhereIn(
          'kilns.id',
          db('kiln_loans').select('kiln_loans.kiln_id').where('kiln_loans.member_id', memberId),
        );
    })
    .orderBy('kilns.name');
  return withLoans(db, rows);
}

/** True when readers without rights of their own may see the kiln: it has a published firing. */
export async function hasPublishedFirings(db: Knex, kilnId: number): Promise<boolean> {
  const row = await db('published_firings')
    .where('published_firings.kiln_id', kilnId)
    .first<{ note_id: number } | undefined>('published_firings.note_id');
  return row !== undefined;
}

export async function insertKiln(
  db: Knex,
  kiln: { keeperId: number; fields: KilnFields; volumeLitres: number | null },
): Promise<number> {
  const [id] = await db('kilns').insert({ keeper_id: kiln.keeperId, name: kiln.fields.name });
  if (id === undefined) throw new Error('MariaDB gave no id.');
  await insertVersion(db, id, 1, kiln.fields, kiln.volumeLitres);
  return id;
}

export async function insertVersion(
  db: Knex,
  kilnId: number,
  version: number,
  fields: KilnFields,
  volumeLitres: number | null,
): Promise<void> {
  await db('kiln_versions').insert({
    kiln_id: kilnId,
    version,
    fields: JSON.stringify(fields),
    volume_litres: volumeLitres,
  });
}

/** Moves the kiln on to its next version; false when somebody else was quicker. */
export async function advanceVersion(
  db: Knex,
  kilnId: number,
  from: number,
  name: string,
): Promise<boolean> {
  const changed = await db('kilns')
    .where({ id: kilnId, current_version: from })
    .update({ current_version: from + 1, name });
  return changed === 1;
}

export async function markKilnRemoved(db: Knex, kilnId: number): Promise<void> {
  await db('kilns')
    .where({ id: kilnId })
    .whereNull('removed_at')
    .update({ removed_at: db.fn.now(3) });
}

export async function membersByNameKeys(
  db: Knex,
  nameKeys: readonly string[],
): Promise<{ id: number; name: string; nameKey: string }[]> {
  return db('members')
    .whereIn('members.name_key', nameKeys)
    .select('members.id', 'members.name', 'members.name_key as nameKey');
}

export async function replaceLoans(
  db: Knex,
  kilnId: number,
  memberIds: readonly number[],
): Promise<void> {
  await db('kiln_loans').where({ kiln_id: kilnId }).delete();
  if (memberIds.length > 0) {
    await db('kiln_loans').insert(memberIds.map((id) => ({ kiln_id: kilnId, member_id: id })));
  }
}

export async function kilnVersions(
  db: Knex,
  kilnId: number,
): Promise<{ version: number; fields: KilnFields; createdAt: Date }[]> {
  const rows = await db('kiln_versions')
    .where('kiln_versions.kiln_id', kilnId)
    .orderBy('kiln_versions.version')
    .select<{ version: number; fields: unknown; createdAt: Date }[]>(
      'kiln_versions.version',
      'kiln_versions.fields',
      'kiln_versions.created_at as createdAt',
    );
  return rows.map((row) => ({ ...row, fields: readJson(row.fields) as KilnFields }));
}

/** The kiln as it was in one version. */
export async function findKilnVersion(
  db: Knex,
  kilnId: number,
  version: number,
): Promise<KilnFields | null> {
  const row = await db('kiln_versions')
    .where({ kiln_id: kilnId, version })
    .first<{ fields: unknown } | undefined>('kiln_versions.fields');
  return row ? (readJson(row.fields) as KilnFields) : null;
}
