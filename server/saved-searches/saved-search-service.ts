import type { Knex } from 'knex';
import type { z } from 'zod';
import {
  MOST_SAVED_SEARCHES,
  type changeSavedSearchBodySchema,
  type SavedSearches,
  type saveSearchBodySchema,
} from '#shared/api/saved-searches.ts';
import type { SignedIn } from '../authorization/actor.ts';
import { canOnSavedSearch } from '../authorization/rules.ts';
import { inTransaction } from '../database/transaction.ts';
import { AppError } from '../http/problem.ts';
import {
  deleteSearch,
  findSavedSearch,
  insertSearch,
  lockMember,
  searchesOf,
  searchText,
  updateSearch,
} from './saved-search-repository.ts';

export async function readSavedSearches(db: Knex, actor: SignedIn): Promise<SavedSearches> {
  const searches = await searchesOf(db, actor.id);
  return {
    searches: searches.flatMap(({ id, name, search, mails, savedAt, mailedAt }) =>
      search === null
        ? []
        : {
            id,
            name,
            search,
            mails,
            savedAt: savedAt.toISOString(),
            mailedAt: mailedAt?.toISOString() ?? null,
          },
    ),
  };
}

/** @throws AppError 'in-use' when this very search is kept already, 'bad-input' when no more fit */
export async function saveSearch(
  db: Knex,
  actor: SignedIn,
  { name, search }: z.output<typeof saveSearchBodySchema>,
): Promise<void> {
  const text = searchText(search);
  await inTransaction(db, async (trx) => {
    await lockMember(trx, actor.id);
    const kept = await searchesOf(trx, actor.id);
    const same = kept.find((one) => one.searchText === text);
    if (same) throw new AppError('in-use', `You have saved this search already: “${same.name}”.`);
    if (kept.length >= MOST_SAVED_SEARCHES) {
      throw new AppError(
        'bad-input',
        `You have ${String(MOST_SAVED_SEARCHES)} saved searches, which is all there is room for. Remove one first.`,
      );
    }
    await insertSearch(trx, { memberId: actor.id, name, searchText: text });
  });
}

/** Another member's is as one that is not there. */
async function requireOwn(db: Knex, actor: SignedIn, id: number): Promise<void> {
  const found = await findSavedSearch(db, id);
  if (!found || !canOnSavedSearch(actor, { ownerId: found.memberId })) {
    throw new AppError('not-found');
  }
}

export async function changeSavedSearch(
  db: Knex,
  actor: SignedIn,
  id: number,
  changed: z.output<typeof changeSavedSearchBodySchema>,
): Promise<void> {
  await requireOwn(db, actor, id);
  await updateSearch(db, id, changed);
}

export async function removeSavedSearch(db: Knex, actor: SignedIn, id: number): Promise<void> {
  await requireOwn(db, actor, id);
  await deleteSearch(db, id);
}
