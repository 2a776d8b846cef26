import type { Knex } from 'knex';
import { findAccountById, type Account } from '../accounts/account-repository.ts';
import { inTransaction } from '../database/transaction.ts';
import { selectRows } from '../database/select-rows.ts';
import type { Deps } from '../deps.ts';
import { nudgeOutbox } from '../outbox/nudge.ts';
import { enqueue } from '../outbox/outbox.ts';
import { closeFinds } from '../search/close-finds.ts';
import {
  lockMember,
  markLooked,
  searchesOf,
  type StoredSearch,
} from './saved-search-repository.ts';
import { wantsNews } from './wants-news.ts';

/** At most one mail in so many hours, whatever is found. */
const HOURS_BETWEEN_MAILS = 24;
/** Notes are looked at when they have been published so long: by then they are in the index. */
const LAG_SECONDS = 5 * 60;
/** The newest of a member's news; nobody reads a longer list. */
const MOST_NEWS = 500;

type Watching = Pick<Deps, 'db' | 'log' | 'config'>;

interface NewNote {
  readonly noteId: number;
  readonly authorId: number | null;
  readonly publishedAt: Date;
}

/**
 * Looks for published notes that are new to saved searches, and promises each member one mail about
 * all of them: at most one a day, every note once a search, none of one's own. Each note is looked at
 * once, when it is in the index.
 *
 * @returns to how many members a mail was promised
 */
export async function watchSearches(
  deps: Watching,
  { lagSeconds = LAG_SECONDS } = {},
): Promise<number> {
  const until = await indexedUntil(deps.db, lagSeconds);
  const memberIds = await membersDue(deps.db, until);
  let mailed = 0;
  for (const memberId of memberIds) {
    if (await watchFor(deps, memberId, until)) mailed += 1;
  }
  if (mailed > 0) {
    nudgeOutbox();
    deps.log.info({ event: 'saved-searches', mailed }, 'news for saved searches');
  }
  return mailed;
}

/** Everything published by then has its document in the index. */
async function indexedUntil(db: Knex, lagSeconds: number): Promise<Date> {
  const [row] = await selectRows<{ until: Date }>(
    db,
    `SELECT LEAST(
       NOW(3) - INTERVAL ? SECOND,
       COALESCE(MIN(outbox.created_at) - INTERVAL 1 MINUTE, NOW(3))
     ) AS until
     FROM outbox
     WHERE outbox.topic = 'index-note' AND outbox.done_at IS NULL AND outbox.given_up_at IS NULL`,
    [lagSeconds],
  );
  if (!row) throw new Error('MariaDB gave no time.');
  return row.until;
}

/** Members with something to look at, and no mail of this kind in the last day. */
async function membersDue(db: Knex, until: Date): Promise<number[]> {
  const rows = await selectRows<{ memberId: number }>(
    db,
    `SELECT saved_searches.member_id AS memberId
     FROM saved_searches
     GROUP BY saved_searches.member_id
     HAVING COALESCE(MAX(saved_searches.mailed_at) <= NOW(3) - INTERVAL ? HOUR, TRUE)
       AND MIN(saved_searches.looked_until) <
         (SELECT MAX(published_firings.published_at) FROM published_firings
          WHERE published_firings.published_at <= ?)
     ORDER BY saved_searches.member_id`,
    [HOURS_BETWEEN_MAILS, until],
  );
  return rows.map(({ memberId }) => memberId);
}

async function watchFor(deps: Watching, memberId: number, until: Date): Promise<boolean> {
  const { db } = deps;
  const account = await findAccountById(db, memberId);
  const searches = await searchesOf(db, memberId);
  const finds = account && wantsNews(account) ? await newsFor(deps, account, searches, until) : [];
  return inTransaction(db, async (trx) => {
    await lockMember(trx, memberId);
    const now = await searchesOf(trx, memberId);
    // Another server has looked meanwhile: what it found is its to tell.
    const looked = now.filter(({ id, lookedUntil }) =>
      searches.some((one) => one.id === id && one.lookedUntil.getTime() === lookedUntil.getTime()),
    );
    const told = finds.filter(({ searchId }) =>
      looked.some(({ id, mails }) => id === searchId && mails),
    );
    await markLooked(
      trx,
      looked.map(({ id }) => id),
      until,
      told.map(({ searchId }) => searchId),
    );
    if (told.length === 0) return false;
    const key = `news-of-searches:${String(memberId)}:${String(until.getTime())}`;
    await enqueue(trx, 'mail', key, { kind: 'news-of-searches', memberId, finds: told });
    return true;
  });
}

async function newsFor(
  { db, config }: Watching,
  account: Account,
  searches: readonly StoredSearch[],
  until: Date,
): Promise<{ searchId: number; noteIds: number[] }[]> {
  const since = Math.min(...searches.map(({ lookedUntil }) => lookedUntil.getTime()));
  const notes = await db('published_firings')
    .where('published_firings.published_at', '>', new Date(since))
    .where('published_firings.published_at', '<=', until)
    .orderBy('published_firings.published_at', 'desc')
    .limit(MOST_NEWS)
    .select<NewNote[]>(
      'published_firings.note_id AS noteId',
      'published_firings.author_id AS authorId',
      'published_firings.published_at AS publishedAt',
    );
  const asked = searches.flatMap((search) => {
    const query = search.search && { ...search.search, sort: 'newest' as const, page: 1 };
    const noteIds = notes
      .filter(
        ({ authorId, publishedAt }) => authorId !== account.id && publishedAt > search.lookedUntil,
      )
      .map(({ noteId }) => noteId);
    return search.mails && query && noteIds.length > 0
      ? [{ searchId: search.id, query, noteIds }]
      : [];
  });
  const found = await closeFinds(config, asked, account.settings);
  return asked.flatMap(({ searchId, noteIds }, index) => {
    const fitting = new Set(found[index]);
    const news = noteIds.filter((noteId) => fitting.has(noteId));
    return news.length > 0 ? [{ searchId, noteIds: news }] : [];
  });
}
