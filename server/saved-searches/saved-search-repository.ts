import type { Knex } from 'knex';
import { askedSchema, type Asked } from '#shared/api/saved-searches.ts';

export interface StoredSearch {
  readonly id: number;
  readonly memberId: number;
  readonly name: string;
  /** Null for what an older Spyhole kept and this one cannot ask any more. */
  readonly search: Asked | null;
  /** As it stands in the table: the same search is the same text. */
  readonly searchText: string;
  readonly mails: boolean;
  readonly savedAt: Date;
  readonly lookedUntil: Date;
  readonly mailedAt: Date | null;
}
type RawSearch = Omit<StoredSearch, 'mails' | 'search'> & { mails: number };

function toSearch(raw: RawSearch): StoredSearch {
  const parsed = askedSchema.safeParse(JSON.parse(raw.searchText));
  return { ...raw, search: parsed.success ? parsed.data : null, mails: raw.mails === 1 };
}

/** A search as text: what is not asked for is left out, the rest has one order. */
export function searchText(asked: Asked): string {
  return JSON.stringify(
    Object.fromEntries(
      Object.entries(asked)
        .map(([key, value]): [string, string] => [key, (value ?? '').trim()])
        .filter(([, value]) => value !== '')
        .sort(([a], [b]) => (a < b ? -1 : 1)),
    ),
  );
}

const selectSearches = (db: Knex) =>
  db('saved_searches').select<RawSearch[]>(
    'saved_searches.id',
    'saved_searches.member_id AS memberId',
    'saved_searches.name',
    'saved_searches.search AS searchText',
    'saved_searches.mails',
    'saved_searches.saved_at AS savedAt',
    'saved_searches.looked_until AS lookedUntil',
    'saved_searches.mailed_at AS mailedAt',
  );

/** Oldest first. */
export async function searchesOf(db: Knex, memberId: number): Promise<StoredSearch[]> {
  const rows = await selectSearches(db)
    .where('saved_searches.member_id', memberId)
    .orderBy('saved_searches.id');
  return rows.map(toSearch);
}

export async function findSavedSearch(db: Knex, id: number): Promise<StoredSearch | null> {
  const [row] = await selectSearches(db).where('saved_searches.id', id);
  return row ? toSearch(row) : null;
}

/** Held until the transaction ends, so that a member's searches are counted and looked through once. */
export async function lockMember(trx: Knex, memberId: number): Promise<void> {
  await trx('members').where('members.id', memberId).forUpdate().select('members.id');
}

export async function insertSearch(
  trx: Knex,
  search: { memberId: number; name: string; searchText: string },
): Promise<void> {
  await trx('saved_searches').insert({
    member_id: search.memberId,
    name: search.name,
    search: search.searchText,
  });
}

/** Mails switched on again tell of what is published from then on. */
export async function updateSearch(
  db: Knex,
  id: number,
  { name, mails }: { name: string; mails: boolean },
): Promise<void> {
  await db('saved_searches')
    .where({ id })
    .update({
      name,
      looked_until: db.raw('IF(mails = 0 AND ?, NOW(3), looked_until)', [mails]),
      mails,
    });
}

export async function deleteSearch(db: Knex, id: number): Promise<void> {
  await db('saved_searches').where({ id }).delete();
}

/** What was published by then has been looked through; those with news have been written about. */
export async function markLooked(
  trx: Knex,
  searchIds: readonly number[],
  until: Date,
  mailedIds: readonly number[],
): Promise<void> {
  await trx('saved_searches')
    .whereIn('id', [...searchIds])
    .update({ looked_until: until });
  if (mailedIds.length === 0) return;
  await trx('saved_searches')
    .whereIn('id', [...mailedIds])
    .update({ mailed_at: trx.raw('NOW(3)') });
}
