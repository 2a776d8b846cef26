import { letter, type Letter } from '../letter.ts';

export interface SearchNews {
  readonly name: string;
  /** Back to the search itself. */
  readonly link: string;
  readonly notes: readonly {
    readonly title: string;
    readonly by: string | null;
    readonly link: string;
  }[];
  /** How many more there are than are named. */
  readonly more: number;
}

const noteCount = (count: number): string =>
  count === 1 ? '1 new note' : `${String(count)} new notes`;

/** One mail about all searches with news; it says how to end such mails, at the foot and to programs. */
export function newsOfSearchesMail(
  name: string,
  news: readonly SearchNews[],
  links: { readonly searches: string; readonly unsubscribe: string; readonly oneClick: string },
): Letter {
  const total = news.reduce((sum, { notes, more }) => sum + notes.length + more, 0);
  const [only] = news;
  const about = news.length === 1 && only ? `“${only.name}”` : 'your saved searches';
  const written = letter(`${noteCount(total)}: ${about}`, name, [
    `${noteCount(total)} ${total === 1 ? 'fits' : 'fit'} what you wanted to hear of.`,
    ...news.map(({ name: search, link, notes, more }) =>
      [
        `“${search}”`,
        ...notes.map(
          (note) => `- ${note.title}${note.by === null ? '' : `, by ${note.by}`}\n  ${note.link}`,
        ),
        more > 0 ? `and ${String(more)} more:\n  ${link}` : `All it finds:\n  ${link}`,
      ].join('\n'),
    ),
    `Which searches are mailed, at most once a day:\n${links.searches}`,
    `End all mails about saved searches, without signing in:\n${links.unsubscribe}`,
  ]);
  return {
    ...written,
    // RFC 8058: both are needed for a mail program to offer it, and to do it with one click.
    headers: {
      'List-Unsubscribe': `<${links.oneClick}>`,
      'List-Unsubscribe-Post': 'List-Unsubscribe=One-Click',
    },
  };
}
