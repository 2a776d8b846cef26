/**
 * Every address of the site, as functions for links and as patterns for the router and for the
 * server, which answers 404 to addresses that are none.
 */
const noteAddress = (id: number, slug: string): string =>
  `/notes/${String(id)}${slug ? `/${slug}` : ''}`;

export const paths = {
  front: '/',
  find: (question = '') => (question ? `/find?q=${encodeURIComponent(question)}` : '/find'),
  newest: '/notes',
  lookAlikes: '/look-alikes',
  note: noteAddress,
  write: (noteId: number) => `/write/${String(noteId)}`,
  newNote: (options: { kilnId?: number; tried?: number } = {}) => {
    const text = Object.entries({ kiln: options.kilnId, tried: options.tried })
      .flatMap(([name, id]) => (id === undefined ? [] : [`${name}=${String(id)}`]))
      .join('&');
    return text ? `/write?${text}` : '/write';
  },
  preview: (noteId: number) => `/write/${String(noteId)}/preview`,
  notebook: '/notebook',
  kilns: '/kilns',
  newKiln: '/kilns/new',
  kiln: (id: number) => `/kilns/${String(id)}`,
  editKiln: (id: number) => `/kilns/${String(id)}/edit`,
  desk: '/desk',
  deskNote: (id: number) => `/desk/${String(id)}`,
  whatHelped: '/what-helped',
  whatHelpedWith: (trouble: string) => `/what-helped/${trouble}`,
  figures: '/figures',
  member: (id: number) => `/members/${String(id)}`,
  cautions: '/cautions',
  signIn: (next = '') => (next ? `/sign-in?next=${encodeURIComponent(next)}` : '/sign-in'),
  join: '/join',
  forgottenPassword: '/forgotten-password',
  newPassword: '/new-password',
  confirmAddress: '/confirm-address',
  settings: '/settings',
  savedSearches: '/saved-searches',
  unsubscribe: '/unsubscribe',
  adminMembers: '/admin/members',
  adminState: '/admin/state',
  adminMail: '/admin/mail',
  adminAudit: '/admin/audit',
} as const;

/** Patterns of the pages; `:id` is a number. */
export const PAGE_PATTERNS = [
  '/',
  '/find',
  '/look-alikes',
  '/notes',
  '/notes/:id',
  '/notes/:id/:slug',
  '/write',
  '/write/:id',
  '/write/:id/preview',
  '/notebook',
  '/kilns',
  '/kilns/new',
  '/kilns/:id',
  '/kilns/:id/edit',
  '/desk',
  '/desk/:id',
  '/what-helped',
  '/what-helped/:trouble',
  '/figures',
  '/members/:id',
  '/cautions',
  '/sign-in',
  '/join',
  '/forgotten-password',
  '/new-password',
  '/confirm-address',
  '/settings',
  '/saved-searches',
  '/unsubscribe',
  '/admin/members',
  '/admin/state',
  '/admin/mail',
  '/admin/audit',
  '/workbench',
] as const;
export type PagePattern = (typeof PAGE_PATTERNS)[number];

/** The pattern an address fits, with its parts; null when it is no page of ours. */
export function matchPage(
  pathname: string,
): { pattern: PagePattern; parts: Readonly<Record<string, string>> } | null {
  const given = pathname.replace(/\/+$/, '').split('/');
  for (const pattern of PAGE_PATTERNS) {
    const wanted = pattern === '/' ? [''] : pattern.split('/');
    if (wanted.length !== given.length) continue;
    const parts: Record<string, string> = {};
    const fits = wanted.every((part, index) => {
      const value = given[index] ?? '';
      if (!part.startsWith(':')) return part === value;
      parts[part.slice(1)] = value;
      return part === ':id' ? /^[1-9]\d{0,14}$/.test(value) : value !== '';
    });
    if (fits) return { pattern, parts };
  }
  return null;
}

/** Where to go after signing in: addresses of our own site only, else the front page. */
export function ownPathOnly(next: string | null): string {
  const isOwn = next !== null && /^\/(?![/\\])[\x21-\x5b\x5d-\x7e]*$/.test(next);
  return isOwn ? next : paths.front;
}
