import { screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type { SavedSearch } from '#shared/api/saved-searches.ts';
import { defaultSettings } from '#shared/api/settings.ts';
import { readFindAddress } from '../../../src/find/find-address.ts';
import { SavedSearchesPage } from '../../../src/saved-searches/SavedSearchesPage.tsx';
import { SaveSearch } from '../../../src/saved-searches/SaveSearch.tsx';
import { UnsubscribePage } from '../../../src/saved-searches/UnsubscribePage.tsx';
import { giveDialogs } from '../../support/dialogs.ts';
import { answerFetch, ok } from '../../support/page-fetch.ts';
import { aMe, aSession, renderPages } from '../../support/render-pages.tsx';

beforeEach(() => giveDialogs());
afterEach(() => vi.unstubAllGlobals());

const SEARCH = { q: 'stalled at 700', fuel: 'propane', peak: '650..750' };
const QUERY = 'q=stalled+at+700&fuel=propane&peak=650..750';
const aSearch = (over: Partial<SavedSearch> = {}): SavedSearch => ({
  id: 3,
  name: 'Cold floors',
  search: SEARCH,
  mails: true,
  savedAt: '2026-11-02T10:00:00.000Z',
  mailedAt: null,
  ...over,
});
const MEMBER = { 'GET /api/session': ok(aSession(aMe())) };
const list = (...searches: SavedSearch[]) => ok({ searches });

function Saving() {
  return (
    <SaveSearch address={readFindAddress(new URLSearchParams(`${QUERY}&sort=newest&page=2`))} />
  );
}
const SAVING = [{ path: '/find', Component: Saving }];
const PAGE = [{ path: '/saved-searches', Component: SavedSearchesPage }];

describe('saving a search', () => {
  it('keeps question and filters under a name, without order and page', async () => {
    const sent = answerFetch({
      ...MEMBER,
      'GET /api/saved-searches': list(),
      'POST /api/saved-searches': { status: 201, body: { searches: [aSearch()] } },
    });
    renderPages(SAVING, `/find?${QUERY}`);
    await userEvent.click(await screen.findByRole('button', { name: 'Save this search' }));
    const name = await screen.findByRole('textbox', { name: /Name/ });
    expect(name).toHaveValue('stalled at 700; fuel: propane; peak 650 to 750\u00a0°C');
    await userEvent.clear(name);
    await userEvent.type(name, 'Cold floors');
    await userEvent.click(screen.getByRole('button', { name: 'Save it' }));
    expect(await screen.findByRole('link', { name: 'Saved as “Cold floors”' })).toBeVisible();
    expect(sent.find(({ method }) => method === 'POST')?.body).toEqual({
      name: 'Cold floors',
      search: SEARCH,
    });
  });

  it('asks a visitor to sign in, and leads back to this search', async () => {
    answerFetch({ 'GET /api/session': ok(aSession(null)) });
    renderPages(SAVING, `/find?${QUERY}`);
    const link = await screen.findByRole('link', { name: 'Sign in to save this search' });
    const next = new URL(link.getAttribute('href') ?? '', 'http://x').searchParams.get('next');
    expect(next).toBe(`/find?${QUERY}`);
  });
});

describe('the page of saved searches', () => {
  it('says what each asks, leads to it, and switches its mails', async () => {
    const sent = answerFetch({
      ...MEMBER,
      'GET /api/saved-searches': list(aSearch()),
      'PUT /api/saved-searches/3': list(aSearch({ mails: false })),
    });
    renderPages(PAGE, '/saved-searches');
    const link = await screen.findByRole('link', { name: 'Cold floors' });
    expect(link).toHaveAttribute('href', `/find?${QUERY}`);
    expect(screen.getByText(/“stalled at 700”; fuel: propane; peak 650 to 750/)).toBeVisible();
    await userEvent.click(screen.getByRole('checkbox', { name: /Mail me new notes/ }));
    await waitFor(() => expect(screen.getByRole('checkbox')).not.toBeChecked());
    expect(sent.find(({ method }) => method === 'PUT')?.body).toEqual({
      name: 'Cold floors',
      mails: false,
    });
  });

  it('removes one and puts it back when asked to', async () => {
    const sent = answerFetch({
      ...MEMBER,
      'GET /api/saved-searches': list(aSearch()),
      'DELETE /api/saved-searches/3': list(),
      'POST /api/saved-searches': { status: 201, body: { searches: [aSearch({ id: 4 })] } },
    });
    renderPages(PAGE, '/saved-searches');
    await userEvent.click(await screen.findByRole('button', { name: 'Remove Cold floors' }));
    expect(await screen.findByText('No search is saved yet')).toBeVisible();
    await userEvent.click(await screen.findByRole('button', { name: 'Put it back', hidden: true }));
    expect(await screen.findByRole('link', { name: 'Cold floors' })).toBeVisible();
    expect(sent.find(({ method }) => method === 'POST')?.body).toEqual({
      name: 'Cold floors',
      search: SEARCH,
    });
  });

  it('says that mails are switched off altogether', async () => {
    const settings = defaultSettings();
    const me = aMe({
      settings: { ...settings, mails: { ...settings.mails, savedSearches: false } },
    });
    answerFetch({
      'GET /api/session': ok(aSession(me)),
      'GET /api/saved-searches': list(aSearch()),
    });
    renderPages(PAGE, '/saved-searches');
    expect(await screen.findByText(/Mails about saved searches are switched off/)).toBeVisible();
  });
});

describe('the page behind the link in a mail', () => {
  const TOKEN = 'A'.repeat(43);
  const ROUTES = [{ path: '/unsubscribe', Component: UnsubscribePage }];

  it('ends the mails with a button, never by being opened, and takes the token off the address', async () => {
    const sent = answerFetch({
      'GET /api/session': ok(aSession(null)),
      [`POST /api/unsubscribe?token=${TOKEN}`]: ok({ message: 'No more mails will come.' }),
    });
    const { router } = renderPages(ROUTES, `/unsubscribe#${TOKEN}`);
    const button = await screen.findByRole('button', { name: 'End these mails' });
    await waitFor(() => expect(router.state.location.hash).toBe(''));
    expect(sent.filter(({ method }) => method === 'POST')).toEqual([]);
    await userEvent.click(button);
    expect(await screen.findByText(/No more mails will come/)).toBeVisible();
  });

  it('says what is wrong with a link that is not whole', async () => {
    answerFetch({ 'GET /api/session': ok(aSession(null)) });
    renderPages(ROUTES, '/unsubscribe#half');
    expect(await screen.findByText('This link is not whole')).toBeVisible();
  });
});
