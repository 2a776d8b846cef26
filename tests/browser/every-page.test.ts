import { expect, describe } from 'vitest';
import type { Page } from 'playwright-core';
import { deskQueueSchema } from '#shared/api/desk.ts';
import { notebookSchema } from '#shared/api/notes.ts';
import { findAnswerSchema } from '#shared/api/search.ts';
import { matchPage, PAGE_PATTERNS, paths } from '#shared/paths.ts';
import { test, type Visiting } from './browser.ts';
import { axeFindings, outline, overflow, settled, skipLink, tabStops } from './page-checks.ts';

const STALLED = 'stalled at 700 °C';
const WIDE = 1280;
const PHONE = 390;
const NARROWEST = 320;

async function answer(page: Page, path: string): Promise<unknown> {
  const response = await page.request.get(path);
  expect(response.status(), path).toBe(200);
  return response.json();
}

/** The first note found for a question, with its kiln and its author. */
async function foundNote(page: Page) {
  const { hits } = findAnswerSchema.parse(
    await answer(page, `/api/search?q=${encodeURIComponent(STALLED)}`),
  );
  const note = hits[0]?.note;
  if (!note?.author) throw new Error('The demo has no note of a stall.');
  return { ...note, author: note.author };
}

/** All that can be wrong with a page, in one theme at every width. */
async function examine(page: Page, address: string, theme: string): Promise<string[]> {
  const found: string[] = [];
  const say = (where: string, things: readonly string[]): void => {
    found.push(...things.map((thing) => `${address} ${theme} ${where}: ${thing}`));
  };
  await page.setViewportSize({ width: WIDE, height: 900 });
  await page.goto(address);
  await settled(page);
  say('', await outline(page));
  const about = theme === 'light' ? 'all' : 'colours';
  say(`${WIDE}`, await axeFindings(page, about));
  say(`${WIDE}`, await overflow(page));
  if (theme === 'light') say(`${WIDE}`, await tabStops(page));
  await page.setViewportSize({ width: PHONE, height: 844 });
  await settled(page);
  say(`${PHONE}`, await axeFindings(page, about));
  say(`${PHONE}`, await overflow(page));
  if (theme === 'dark') say(`${PHONE}`, await tabStops(page));
  if (theme === 'dark') say('', await skipLink(page));
  await page.setViewportSize({ width: NARROWEST, height: 640 });
  await settled(page);
  say(`${NARROWEST}`, await overflow(page));
  return found;
}

/** Both themes beside each other, each in one window of its own. */
async function examineAll(
  { visit }: Visiting,
  role: Parameters<Visiting['visit']>[0],
  addresses: readonly string[],
): Promise<string[]> {
  const found = await Promise.all(
    (['light', 'dark'] as const).map(async (theme) => {
      const { page } = await visit({ ...role, theme });
      const inTheme: string[] = [];
      page.on('console', (message) => {
        // The page for what is nowhere is answered with 404, and Chromium says so.
        const isExpected = page.url().endsWith('/nowhere') && message.text().includes('404');
        if (message.type() === 'error' && !isExpected) {
          inTheme.push(`${page.url()} console: ${message.text()} ${message.location().url}`);
        }
      });
      for (const address of addresses) {
        const about = await examine(page, address, theme).catch((error: unknown) => [
          `${address} ${theme}: ${error instanceof Error ? error.message : String(error)}`,
        ]);
        inTheme.push(...about);
      }
      return inTheme;
    }),
  );
  return found.flat();
}

const examined = new Set<string>();
function note(addresses: readonly string[]): readonly string[] {
  for (const address of addresses) {
    const match = matchPage(new URL(address, 'http://localhost').pathname);
    if (match) examined.add(match.pattern);
  }
  return addresses;
}

describe('every page is sound in both themes, on a phone and on a wide screen', () => {
  test('for a visitor', async ({ visiting }) => {
    const { page } = await visiting.visit();
    const found = await foundNote(page);
    const addresses = note([
      paths.front,
      paths.find(STALLED),
      paths.find('zzzz qqqq'),
      paths.find(),
      paths.newest,
      paths.lookAlikes,
      paths.note(found.id, found.slug),
      paths.kiln(found.kiln.id),
      paths.member(found.author.id),
      paths.whatHelped,
      paths.whatHelpedWith('stall'),
      paths.figures,
      `${paths.figures}?topic=time&by=volume`,
      paths.cautions,
      paths.signIn(),
      paths.join,
      paths.forgottenPassword,
      `${paths.newPassword}#token=none`,
      `${paths.confirmAddress}#token=none`,
      `${paths.unsubscribe}#token`,
      '/nowhere',
    ]);
    expect(await examineAll(visiting, {}, addresses)).toEqual([]);

    // Its address without words is the same page.
    note([`/notes/${found.id}`]);
    await page.goto(`/notes/${found.id}`);
    await page.getByRole('heading', { name: found.title, level: 1 }).waitFor();
  });

  test('for a member', async ({ visiting }) => {
    const account = visiting.account('admin');
    const { page } = await visiting.visit({ as: account });
    const { notes } = notebookSchema.parse(await answer(page, '/api/notebook'));
    const draft = notes.find(({ status }) => status === 'draft');
    const kiln = draft?.kiln;
    if (!draft || !kiln) throw new Error('The demo has no draft with a kiln.');
    const addresses = note([
      paths.notebook,
      paths.newNote(),
      paths.write(draft.id),
      paths.preview(draft.id),
      paths.kilns,
      paths.newKiln,
      paths.kiln(kiln.id),
      paths.editKiln(kiln.id),
      paths.settings,
      paths.savedSearches,
    ]);
    expect(await examineAll(visiting, { as: account }, addresses)).toEqual([]);
  });

  test('for a moderator and an admin', async ({ visiting }) => {
    const moderator = visiting.account('moderator');
    const { page } = await visiting.visit({ as: moderator });
    const { waiting } = deskQueueSchema.parse(await answer(page, '/api/desk'));
    const row = waiting.find(({ own }) => !own);
    if (!row) throw new Error('Nothing waits at the desk of the demo.');
    const atTheDesk = note([paths.desk, paths.deskNote(row.noteId)]);
    const admins = note([paths.adminMembers, paths.adminState, paths.adminMail, paths.adminAudit]);
    const found = [
      ...(await examineAll(visiting, { as: moderator }, atTheDesk)),
      ...(await examineAll(visiting, { as: visiting.account('admin') }, admins)),
    ];
    expect(found).toEqual([]);
  });

  test('and no page is left out', () => {
    const built = PAGE_PATTERNS.filter((pattern) => pattern !== '/workbench');
    expect(built.filter((pattern) => !examined.has(pattern))).toEqual([]);
  });
});
