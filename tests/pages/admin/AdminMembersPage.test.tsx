import { screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { AdminMembersPage } from '../../../src/admin/AdminMembersPage.tsx';
import { giveDialogs } from '../../support/dialogs.ts';
import { answerFetch, ok, refused } from '../../support/page-fetch.ts';
import { aMe, aSession, renderPages } from '../../support/render-pages.tsx';

beforeEach(giveDialogs);
afterEach(() => vi.unstubAllGlobals());

const ADMIN = aMe({ id: 1, name: 'Imme Harrow', role: 'admin' });
const member = (id: number, name: string, suspended = false) => ({
  id,
  name,
  emailHint: 'w…@example.org',
  emailVerified: true,
  role: 'member',
  suspended,
  joinedOn: '2026-02-01',
  publishedNotes: 3,
});

/** A server that wants the password before it takes an act. */
function careful() {
  let confirmed = false;
  let suspended = false;
  return answerFetch({
    'GET /api/session': ok(aSession(ADMIN)),
    'GET /api/admin/members?page=1': () =>
      ok({ members: [member(1, ADMIN.name), member(9, 'Wren Tallow', suspended)], total: 2 }),
    'PUT /api/admin/members/9/suspended': () => {
      if (!confirmed) return refused(403, 'confirm-password', 'Type your password again first');
      suspended = true;
      return ok({ message: 'The member is suspended.' });
    },
    'POST /api/session/confirm': ({ body }) => {
      if ((body as { password: string }).password !== 'the right one') {
        const detail = 'This is not your password.';
        return refused(422, 'bad-input', detail, { errors: [{ pointer: '/password', detail }] });
      }
      confirmed = true;
      return ok({ message: 'Confirmed for the next ten minutes.' });
    },
  });
}

const open = () =>
  renderPages([{ path: '/admin/members', Component: AdminMembersPage }], '/admin/members');

describe('AdminMembersPage', () => {
  it('asks for the password when the server wants it, and then does the act by itself', async () => {
    const sent = careful();
    const user = userEvent.setup();
    open();
    await user.click(await screen.findByRole('button', { name: 'Suspend: Wren Tallow' }));
    const reason = await screen.findByRole('dialog', { name: 'Suspend Wren Tallow?' });
    await user.type(within(reason).getByLabelText(/^Why/), 'Sells cars here');
    await user.click(within(reason).getByRole('button', { name: 'Suspend' }));

    const password = await screen.findByRole('dialog', { name: 'Type your password again' });
    await user.type(within(password).getByLabelText(/^Your password/), 'a wrong one');
    await user.click(within(password).getByRole('button', { name: 'Go on' }));
    await waitFor(() =>
      expect(within(password).getByLabelText(/^Your password/)).toHaveAccessibleDescription(
        /not your password/,
      ),
    );
    await user.clear(within(password).getByLabelText(/^Your password/));
    await user.type(within(password).getByLabelText(/^Your password/), 'the right one');
    await user.click(within(password).getByRole('button', { name: 'Go on' }));

    expect(await screen.findByText('The member is suspended.')).toBeInTheDocument();
    expect(await screen.findByRole('button', { name: 'Let in again: Wren Tallow' })).toBeVisible();
    const acts = sent.filter(({ method }) => method === 'PUT');
    expect(acts.map(({ body }) => body)).toEqual([
      { suspended: true, reason: 'Sells cars here' },
      { suspended: true, reason: 'Sells cars here' },
    ]);
  });

  it('does nothing to the member when the password is not given', async () => {
    const sent = careful();
    const user = userEvent.setup();
    open();
    await user.click(await screen.findByRole('button', { name: 'Suspend: Wren Tallow' }));
    const reason = await screen.findByRole('dialog', { name: 'Suspend Wren Tallow?' });
    await user.type(within(reason).getByLabelText(/^Why/), 'Sells cars here');
    await user.click(within(reason).getByRole('button', { name: 'Suspend' }));
    const password = await screen.findByRole('dialog', { name: 'Type your password again' });
    await user.click(within(password).getByRole('button', { name: 'Leave it' }));
    await waitFor(() =>
      expect(screen.queryByRole('dialog', { name: 'Type your password again' })).toBeNull(),
    );
    expect(within(reason).getByLabelText(/^Why/)).toHaveValue('Sells cars here');
    expect(sent.filter(({ method }) => method === 'PUT')).toHaveLength(1);
  });

  it('offers no acts on oneself', async () => {
    careful();
    open();
    expect(await screen.findByText('yourself')).toBeVisible();
    expect(screen.queryByRole('button', { name: `Suspend: ${ADMIN.name}` })).toBeNull();
  });

  it('shows what the server answers to who is no admin', async () => {
    answerFetch({
      'GET /api/session': ok(aSession(aMe())),
      'GET /api/admin/members?page=1': refused(403, 'not-allowed', 'You may not do this'),
    });
    open();
    expect(await screen.findByRole('heading', { name: 'You may not see this' })).toBeVisible();
    expect(screen.queryByRole('navigation', { name: 'Admin' })).toBeNull();
  });
});
