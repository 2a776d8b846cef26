import { screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { ConfirmAddressPage } from '../../../src/accounts/ConfirmAddressPage.tsx';
import { NewPasswordPage } from '../../../src/accounts/NewPasswordPage.tsx';
import { answerFetch, ok, refused } from '../../support/page-fetch.ts';
import { aSession, renderPages } from '../../support/render-pages.tsx';

afterEach(() => vi.unstubAllGlobals());

const TOKEN = 'k'.repeat(43);
const VISITOR = { 'GET /api/session': ok(aSession(null)) };
const ROUTES = [
  { path: '/new-password', Component: NewPasswordPage },
  { path: '/confirm-address', Component: ConfirmAddressPage },
];

async function setPassword(password: string) {
  const user = userEvent.setup();
  await user.type(await screen.findByLabelText(/^New password/), password);
  await user.click(screen.getByRole('button', { name: 'Set the new password' }));
}

describe('NewPasswordPage', () => {
  it('takes the token out of the address at once and sends it in the body', async () => {
    const sent = answerFetch({
      ...VISITOR,
      'POST /api/password-resets/use': ok({ message: 'Your new password is set.' }),
    });
    const { router } = renderPages(ROUTES, `/new-password#${TOKEN}`);
    await waitFor(() => expect(router.state.location.hash).toBe(''));
    expect(router.state.historyAction).toBe('REPLACE');
    expect(sent.filter(({ method }) => method !== 'GET')).toEqual([]);
    await setPassword('seven kilns and a bucket');
    expect(await screen.findByText(/Your new password is set/)).toBeVisible();
    expect(sent.find(({ method }) => method === 'POST')).toEqual({
      method: 'POST',
      path: '/api/password-resets/use',
      body: { token: TOKEN, password: 'seven kilns and a bucket' },
    });
    expect(sent.some(({ path }) => path.includes(TOKEN))).toBe(false);
  });

  it('counts code points: fourteen of any script are too few, fifteen are enough', async () => {
    const sent = answerFetch({
      ...VISITOR,
      'POST /api/password-resets/use': ok({ message: 'Your new password is set.' }),
    });
    renderPages(ROUTES, `/new-password#${TOKEN}`);
    await setPassword('🔥'.repeat(14));
    const field = screen.getByLabelText(/^New password/);
    expect(field).toHaveAccessibleDescription(/At least 15 characters/);
    expect(field).toHaveAccessibleDescription(/1 to go/);
    expect(field).toHaveFocus();
    expect(sent.filter(({ method }) => method === 'POST')).toEqual([]);
    await setPassword('🏺');
    expect(await screen.findByText(/Your new password is set/)).toBeVisible();
  });

  it('says beside the field why the server does not take a password, and keeps the link', async () => {
    answerFetch({
      ...VISITOR,
      'POST /api/password-resets/use': refused(422, 'bad-input', 'Some of this cannot be kept', {
        errors: [{ pointer: '/password', detail: 'This is one of those tried first.' }],
      }),
    });
    renderPages(ROUTES, `/new-password#${TOKEN}`);
    await setPassword('passwordpassword1');
    await waitFor(() =>
      expect(screen.getByLabelText(/^New password/)).toHaveAccessibleDescription(/tried first/),
    );
  });

  it('offers another link when this one was used, is cut short or is missing', async () => {
    answerFetch({
      ...VISITOR,
      'POST /api/password-resets/use': refused(422, 'link-used', 'This link has been used'),
    });
    renderPages(ROUTES, `/new-password#${TOKEN}`);
    await setPassword('seven kilns and a bucket');
    expect(await screen.findByText(/has been used or is out of date/)).toBeVisible();
    expect(screen.getByRole('link', { name: 'Have a new link sent' })).toBeVisible();
  });

  it.each([
    ['#abc', 'This link is not whole'],
    ['', 'This page needs the link from the mail'],
  ])('shows no form for the fragment "%s"', async (hash, words) => {
    answerFetch(VISITOR);
    renderPages(ROUTES, `/new-password${hash}`);
    expect(await screen.findByText(words)).toBeVisible();
    expect(screen.queryByRole('button', { name: 'Set the new password' })).toBeNull();
  });
});

describe('ConfirmAddressPage', () => {
  it('changes nothing by being opened, and confirms with the button', async () => {
    const sent = answerFetch({
      ...VISITOR,
      'POST /api/email-verifications': ok({ message: 'Your address is confirmed.' }),
    });
    const { router } = renderPages(ROUTES, `/confirm-address#${TOKEN}`);
    const button = await screen.findByRole('button', { name: 'Confirm this address' });
    await waitFor(() => expect(router.state.location.hash).toBe(''));
    expect(sent.filter(({ method }) => method !== 'GET')).toEqual([]);
    await userEvent.click(button);
    expect(await screen.findByText(/Your address is confirmed/)).toBeVisible();
    expect(sent.find(({ method }) => method === 'POST')?.body).toEqual({ token: TOKEN });
  });
});
