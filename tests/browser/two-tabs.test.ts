import { readFile } from 'node:fs/promises';
import type { BrowserContext, Page } from 'playwright-core';
import { describe, expect } from 'vitest';
import { draftSchema } from '#shared/api/notes.ts';
import { test, type Visiting } from './browser.ts';
import { noteForm } from './write-a-note.ts';

const PATIENTLY = { timeout: 20_000 };
const NOT_SENT = 'Not sent: kept in this browser';

const title = (page: Page) => noteForm(page).field('story', 'Title');

/** A new draft of a member's, open in a tab. */
async function openDraft({ visit, account }: Visiting) {
  const visited = await visit({ as: account('Noor Trevannick') });
  const { page } = visited;
  await page.goto('/write');
  await page.getByRole('button', { name: 'Start without a kiln, and choose it later' }).click();
  await title(page).waitFor();
  return { ...visited, address: page.url() };
}

/** The same draft in one more tab of the same browser. */
async function openAgain(context: BrowserContext, address: string): Promise<Page> {
  const page = await context.newPage();
  await page.goto(address);
  await page.locator('main h1').waitFor();
  return page;
}

async function titleAtServer(page: Page, address: string): Promise<string> {
  const id = /\/write\/(\d+)/.exec(address)?.[1] ?? '';
  const answer = await page.request.get(`/api/notes/${id}/draft`);
  return draftSchema.parse(await answer.json()).fields.title;
}

/** Cut off from the network, a title is typed, and the page says where it is. */
async function typeOffline(context: BrowserContext, page: Page, words: string): Promise<void> {
  await context.setOffline(true);
  await page.getByText('No network', { exact: true }).waitFor();
  await title(page).fill(words);
  await page.getByText(NOT_SENT).first().waitFor();
}

const SAVES = '**/api/notes/*/draft';

/** Types a title while this tab alone does not reach the server: it neither sends nor hears. */
async function typeUnheard(page: Page, words: string): Promise<void> {
  await page.route(SAVES, (route) => route.abort());
  await title(page).fill(words);
  await page.getByText(NOT_SENT).first().waitFor();
}

/** Reaches the server again, and is shown what was saved there meanwhile. */
async function hearAgain(page: Page): Promise<void> {
  await page.unroute(SAVES);
  // As when the network is back: it sends at once and does not wait for its next try.
  await page.evaluate(() => window.dispatchEvent(new Event('online')));
  await page.getByRole('button', { name: 'See both versions' }).click();
  await page.getByRole('heading', { name: 'Two versions of this note' }).waitFor();
}

describe('what was typed is never lost', () => {
  test('of two tabs the later one is shown both versions and chooses', async ({ visiting }) => {
    const { context, page: first, address } = await openDraft(visiting);
    const second = await openAgain(context, address);
    await title(second).waitFor();

    await typeUnheard(second, 'Told in the second tab');
    await title(first).fill('Told in the first tab');
    await expect.poll(() => titleAtServer(first, address), PATIENTLY).toBe('Told in the first tab');
    await hearAgain(second);
    const both = second.getByRole('row', { name: /Title/ });
    expect(await both.textContent()).toContain('Told in the second tab');
    expect(await both.textContent()).toContain('Told in the first tab');
    // Nothing of it went over the other one.
    expect(await titleAtServer(second, address)).toBe('Told in the first tab');

    await typeUnheard(first, 'Told in the first tab again');
    await second.getByRole('button', { name: 'Keep mine' }).click();
    await expect
      .poll(() => titleAtServer(second, address), PATIENTLY)
      .toBe('Told in the second tab');
    expect(await title(second).inputValue()).toBe('Told in the second tab');

    // Now the first one is behind, and takes what the other has.
    await hearAgain(first);
    await first.getByRole('button', { name: 'Take the other' }).click();
    await title(first).waitFor();
    expect(await title(first).inputValue()).toBe('Told in the second tab');
    expect(await titleAtServer(first, address)).toBe('Told in the second tab');
  });

  test('a tab closed before its words were sent finds them again', async ({ visiting }) => {
    const { context, page, address } = await openDraft(visiting);
    await context.setOffline(true);
    await title(page).fill('Typed and shut');
    await page.close();
    await context.setOffline(false);
    const again = await openAgain(context, address);
    await title(again).waitFor();
    expect(await title(again).inputValue()).toBe('Typed and shut');
    await expect.poll(() => titleAtServer(again, address), PATIENTLY).toBe('Typed and shut');
  });

  test('two tabs shut with unsent words keep both', async ({ visiting }) => {
    const { context, page: first, address } = await openDraft(visiting);
    const second = await openAgain(context, address);
    await title(second).waitFor();
    await typeOffline(context, first, 'From the one');
    await title(second).fill('From the other');
    await second.getByText(NOT_SENT).first().waitFor();
    await first.close();
    await second.close();
    await context.setOffline(false);
    // The last written is sent; the other one is laid beside it when the note is opened next.
    const again = await openAgain(context, address);
    await expect.poll(() => titleAtServer(again, address), PATIENTLY).toBe('From the other');
    await again.reload();
    await again.getByRole('heading', { name: 'Two versions of this note' }).waitFor();
    const row = again.getByRole('row', { name: /Title/ });
    expect(await row.textContent()).toContain('From the one');
    expect(await row.textContent()).toContain('From the other');
  });

  test('without a network it is kept, and sent by itself when there is one again', async ({
    visiting,
  }) => {
    const { context, page, address } = await openDraft(visiting);
    await typeOffline(context, page, 'Written in a field');
    await context.setOffline(false);
    await expect.poll(() => titleAtServer(page, address), PATIENTLY).toBe('Written in a field');
    await page
      .getByText(/^Saved \d/)
      .first()
      .waitFor();
    expect(await page.getByText('No network', { exact: true }).count()).toBe(0);
  });

  test('leaving with unsent words asks first', async ({ visiting }) => {
    const { context, page } = await openDraft(visiting);
    await typeOffline(context, page, 'Not yet there');
    const asked = page.waitForEvent('dialog');
    const leaving = page.close({ runBeforeUnload: true });
    const dialog = await asked;
    expect(dialog.type()).toBe('beforeunload');
    await dialog.dismiss();
    await leaving;
    expect(await title(page).inputValue()).toBe('Not yet there');
    await context.setOffline(false);
    await page
      .getByText(/^Saved \d/)
      .first()
      .waitFor();
  });

  test('signing out with unsent words asks, hands them over as a file, then clears them', async ({
    visiting,
  }) => {
    const { visit, account, signIn } = visiting;
    // A session of its own: this one ends.
    const { context, page } = await visit();
    await signIn(page, account('Noor Trevannick'));
    await page.goto('/write');
    await page.getByRole('button', { name: 'Start without a kiln, and choose it later' }).click();
    await title(page).waitFor();
    await context.setOffline(true);
    await title(page).fill('Still in my pocket');
    await page.getByText(NOT_SENT).first().waitFor();
    await page.close();
    await context.setOffline(false);

    const settings = await context.newPage();
    await settings.goto('/settings');
    await settings.getByRole('button', { name: 'Sign out', exact: true }).click();
    const question = settings.getByRole('dialog', {
      name: 'Some of your work has not been sent',
    });
    await question.getByText('Still in my pocket').waitFor();
    const handed = settings.waitForEvent('download');
    await question.getByRole('button', { name: 'Download it' }).click();
    const file = await (await handed).path();
    expect(await readFile(file, 'utf8')).toContain('Still in my pocket');
    await question.getByRole('button', { name: 'Clear it and sign out' }).click();
    await settings.getByText('You are signed out.').waitFor();
    const left = await settings.evaluate(() =>
      Object.keys(localStorage).filter((key) => key.startsWith('spyhole-unsent')),
    );
    expect(left).toEqual([]);
    await settings.goto('/notebook');
    await settings.getByRole('heading', { name: 'Sign in to see this' }).waitFor();
  });
});
