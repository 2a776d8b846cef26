import type { Knex } from 'knex';
import { picturePreviewUrl } from '#shared/api/pictures.ts';
import { paths, type PagePattern } from '#shared/paths.ts';
import { picturesIn } from '#shared/note/story.ts';
import { TROUBLES, type Trouble } from '#shared/vocabulary/troubles.ts';
import { VISITOR } from '../authorization/actor.ts';
import { AppError } from '../http/problem.ts';
import { readKiln } from '../kilns/kiln-service.ts';
import { publishedRows } from '../notes/published-repository.ts';
import { findNote } from '../notes/note-repository.ts';
import { countedRevision } from '../disputes/counted-revision.ts';
import { findRevision } from '../notes/revision-repository.ts';
import { noteInShort } from '../notes/note-in-short.ts';
import type { PageHead } from './page-head.ts';

const SITE =
  'A shared notebook of raku firings: what was set up, measured, changed and got, and what helped.';

const page = (title: string, description = SITE, canonical: string | null = null): PageHead => ({
  title: title === 'Spyhole' ? title : `${title} · Spyhole`,
  description,
  canonical,
  image: null,
  type: 'website',
  jsonLd: null,
});

/** Pages that are the same for everybody, or private: nothing is looked up for them. */
const FIXED: Readonly<Partial<Record<PagePattern, PageHead>>> = {
  '/': {
    ...page('Spyhole', SITE, '/'),
    title: 'Spyhole, a shared notebook of raku firings',
  },
  '/find': page(
    'Find',
    'Ask what happened in the kiln, and find who had it and what helped.',
    '/find',
  ),
  '/look-alikes': page(
    'Look-alikes',
    'Give a temperature record, and find the published firings that climbed like it, and what was changed next.',
    '/look-alikes',
  ),
  '/notes': page('Newest notes', 'The newest notes of raku firings.', '/notes'),
  '/what-helped': page(
    'What helped',
    'For each trouble of a raku firing: what was changed next, and how often the trouble was then gone.',
    '/what-helped',
  ),
  '/figures': page(
    'Figures',
    'Cracks, reduction, time to temperature, stalls and gas of published raku firings, in plots with every point and its count.',
    '/figures',
  ),
  '/cautions': page('Cautions', 'What to know before firing with gas outdoors.', '/cautions'),
  '/sign-in': page('Sign in'),
  '/join': page('Join'),
  '/forgotten-password': page('Forgotten password'),
  '/new-password': page('New password'),
  '/confirm-address': page('Confirm your address'),
  '/settings': page('Settings'),
  '/saved-searches': page('Saved searches'),
  '/unsubscribe': page('End mails about saved searches'),
  '/write': page('Write'),
  '/write/:id': page('Write'),
  '/write/:id/preview': page('Preview'),
  '/notebook': page('Notebook'),
  '/kilns': page('Your kilns'),
  '/kilns/new': page('A new kiln'),
  '/kilns/:id/edit': page('Alter the kiln'),
  '/desk': page('Desk'),
  '/desk/:id': page('Desk'),
  '/admin/members': page('Members'),
  '/admin/state': page('State'),
  '/admin/mail': page('Mail'),
  '/admin/audit': page('Audit'),
  '/workbench': page('Workbench'),
};

/** The head of a page for a visitor; null when a visitor finds nothing there. */
export async function headOf(
  db: Knex,
  pattern: PagePattern,
  parts: Readonly<Record<string, string>>,
): Promise<PageHead | null> {
  const id = Number(parts['id']);
  switch (pattern) {
    case '/notes/:id':
    case '/notes/:id/:slug':
      return noteHead(db, id);
    case '/kilns/:id':
      return kilnHead(db, id);
    case '/members/:id':
      return memberHead(db, id);
    case '/what-helped/:trouble': {
      const trouble = parts['trouble'] ?? '';
      if (!Object.hasOwn(TROUBLES, trouble)) return null;
      const label = TROUBLES[trouble as Trouble];
      return page(
        `What helped: ${label.toLowerCase()}`,
        `What members changed in the firing after this trouble (${label.toLowerCase()}), and how often it was then gone.`,
        paths.whatHelpedWith(trouble),
      );
    }
    default:
      return FIXED[pattern] ?? null;
  }
}

async function noteHead(db: Knex, noteId: number): Promise<PageHead | null> {
  const [[row], note] = await Promise.all([publishedRows(db, [noteId]), findNote(db, noteId)]);
  if (!row || !note || note.publishedRevisionId === null) return null;
  const revision = await findRevision(db, note.publishedRevisionId);
  if (!revision) return null;
  const description = noteInShort(await countedRevision(db, revision)).join(' ') || SITE;
  const [picture] = picturesIn(revision.fields.story);
  const canonical = paths.note(row.id, row.slug);
  const image = picture === undefined ? null : picturePreviewUrl(picture);
  return {
    title: `${row.title} · Spyhole`,
    description,
    canonical,
    image,
    type: 'article',
    jsonLd: {
      '@context': 'https://schema.org',
      '@type': 'Article',
      headline: row.title,
      description,
      datePublished: row.publishedAt,
      ...(row.author ? { author: { '@type': 'Person', name: row.author.name } } : {}),
      ...(image ? { image } : {}),
    },
  };
}

async function kilnHead(db: Knex, kilnId: number): Promise<PageHead | null> {
  try {
    const kiln = await readKiln(db, VISITOR, kilnId);
    return page(
      kiln.fields.name,
      `The firings of ${kiln.fields.name} in order, and what was changed between them.`,
      paths.kiln(kilnId),
    );
  } catch (error) {
    // A kiln without published firings exists for its keeper only.
    if (error instanceof AppError && error.code === 'not-found') return null;
    throw error;
  }
}

async function memberHead(db: Knex, memberId: number): Promise<PageHead | null> {
  const member = await db('members')
    .where('members.id', memberId)
    .first<{ name: string } | undefined>('members.name');
  return member
    ? page(member.name, `Notes and kilns of ${member.name}.`, paths.member(memberId))
    : null;
}
