import type { Knex } from 'knex';
import type { Asked } from '#shared/api/saved-searches.ts';
import { paths } from '#shared/paths.ts';
import type { Account } from '../accounts/account-repository.ts';
import type { Config } from '../config.ts';
import { publishedRows } from '../notes/published-repository.ts';
import type { MailJob } from '../outbox/outbox.ts';
import { searchesOf } from '../saved-searches/saved-search-repository.ts';
import { unsubscribeToken } from '../saved-searches/unsubscribe-token.ts';
import type { Letter } from './letter.ts';
import { newsOfSearchesMail, type SearchNews } from './messages/news-of-searches.ts';

/** As many notes of a search are named. */
const MOST_NAMED = 10;

const oneLine = (text: string): string => text.replace(/\s+/gu, ' ').trim() || 'Untitled';

/** The query of the find page, newest notes first. */
function addressOf(asked: Asked): string {
  const parts = Object.entries({ ...asked, sort: 'newest' });
  return new URLSearchParams(
    parts.flatMap(([key, value]) => (value ? [[key, value]] : [])),
  ).toString();
}

/**
 * The letter about what is new for saved searches as things are now: searches removed or switched off
 * meanwhile and notes taken down are left out; null when nothing is left.
 */
export async function newsLetter(
  db: Knex,
  config: Pick<Config, 'sessionSecrets'>,
  job: Extract<MailJob, { kind: 'news-of-searches' }>,
  member: Pick<Account, 'id' | 'name'>,
  link: (path: string) => string,
): Promise<Letter | null> {
  const searches = await searchesOf(db, member.id);
  const news: SearchNews[] = [];
  for (const { searchId, noteIds } of job.finds) {
    const search = searches.find(({ id, mails }) => id === searchId && mails);
    const rows = search ? await publishedRows(db, noteIds) : [];
    if (!search?.search || rows.length === 0) continue;
    news.push({
      name: search.name,
      link: link(`${paths.find()}?${addressOf(search.search)}`),
      notes: rows.slice(0, MOST_NAMED).map((row) => ({
        title: oneLine(row.title),
        by: row.author?.name ?? null,
        link: link(paths.note(row.id, row.slug)),
      })),
      more: Math.max(0, rows.length - MOST_NAMED),
    });
  }
  if (news.length === 0) return null;
  const token = unsubscribeToken(config, member.id);
  return newsOfSearchesMail(member.name, news, {
    searches: link(paths.savedSearches),
    unsubscribe: link(`${paths.unsubscribe}#${token}`),
    oneClick: link(`/api/unsubscribe?token=${token}`),
  });
}
