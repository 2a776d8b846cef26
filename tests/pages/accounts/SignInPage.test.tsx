import { screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { SignInPage } from '../../../src/accounts/SignInPage.tsx';
import { answerFetch, ok, refused } from '../../support/page-fetch.ts';
import { aMe, aSession, renderPages } from '../../support/render-pages.tsx';

afterEach(() => vi.unstubAllGlobals());

const VISITOR = { 'GET /api/session': ok(aSession(null)) };

/** A server that takes the password, and knows from then on who asks. */
function takesThePassword() {
  let signedIn = false;
  return {
    'GET /api/session': () => ok(aSession(signedIn ? aMe() : null)),
    'POST /api/session': () => {
      signedIn = true;
      return ok(aSession(aMe()));
    },
  };
}

function open(address: string) {
  return renderPages(
    [
      { path: '/sign-in', Component: SignInPage },
      { path: '/', element: <h1>The front page</h1> },
      { path: '/settings', element: <h1>The settings</h1> },
    ],
    address,
  );
}

async function fillIn(email = 'marit@example.org', password = 'a rather long password') {
  const user = userEvent.setup();
  if (email) await user.type(await screen.findByLabelText(/E-mail address/), email);
  if (password) await user.type(await screen.findByLabelText(/^Password/), password);
  await user.click(screen.getByRole('button', { name: 'Sign in' }));
  return user;
}

describe('SignInPage', () => {
  it('says in words that address or password are wrong, and keeps what was typed', async () => {
    answerFetch({
      ...VISITOR,
      'POST /api/session': refused(
        401,
        'wrong-credentials',
        'The address or the password is wrong',
      ),
    });
    open('/sign-in');
    await fillIn();
    expect(await screen.findByRole('alert')).toHaveTextContent(
      'The address or the password is wrong',
    );
    expect(screen.getByLabelText(/E-mail address/)).toHaveValue('marit@example.org');
    expect(screen.getByLabelText(/^Password/)).toHaveValue('a rather long password');
  });

  it('says how long to wait after too many tries', async () => {
    answerFetch({
      ...VISITOR,
      'POST /api/session': refused(429, 'too-many', 'Too many tries', {
        detail: 'Try again in 12 minutes.',
        retryAfter: 720,
      }),
    });
    open('/sign-in');
    await fillIn();
    const said = await screen.findByRole('alert');
    expect(said).toHaveTextContent('Try again in 12 minutes.');
    expect(said).toHaveTextContent(/That is at \d\d:\d\d\./);
  });

  it('sends nothing for a blank field, and puts the focus into it', async () => {
    const sent = answerFetch(VISITOR);
    open('/sign-in');
    await fillIn('', 'a rather long password');
    await waitFor(() => expect(screen.getByLabelText(/E-mail address/)).toHaveFocus());
    expect(screen.getByLabelText(/E-mail address/)).toHaveAccessibleDescription(/needed/);
    expect(sent.filter(({ method }) => method === 'POST')).toEqual([]);
  });

  it('goes on to the own path it was asked from, with nothing left of what a visitor read', async () => {
    answerFetch(takesThePassword());
    const { client, router } = open('/sign-in?next=%2Fsettings');
    client.setQueryData(['notes', 'page', 3], { title: 'As a visitor sees it' });
    await fillIn();
    expect(await screen.findByText('The settings')).toBeVisible();
    expect(router.state.historyAction).toBe('REPLACE');
    expect(client.getQueryData(['notes', 'page', 3])).toBeUndefined();
  });

  it.each([
    'https://elsewhere.example/',
    '//elsewhere.example',
    '/\\elsewhere.example',
    'settings',
  ])('goes to the front page when asked to go on to %s', async (next) => {
    answerFetch(takesThePassword());
    const { router } = open(`/sign-in?next=${encodeURIComponent(next)}`);
    await fillIn();
    expect(await screen.findByText('The front page')).toBeVisible();
    expect(router.state.location.pathname).toBe('/');
  });

  it('sends on who is signed in already', async () => {
    answerFetch({ 'GET /api/session': ok(aSession(aMe())) });
    open('/sign-in?next=%2Fsettings');
    expect(await screen.findByText('The settings')).toBeVisible();
  });

  it('asks for the password again when the session it remembers has ended', async () => {
    answerFetch(VISITOR);
    const { client } = open('/sign-in?next=%2Fsettings');
    client.setQueryData(['session', 'current'], aSession(aMe()));
    expect(await screen.findByLabelText(/^Password/)).toBeVisible();
    expect(screen.queryByText('The settings')).toBeNull();
  });
});
