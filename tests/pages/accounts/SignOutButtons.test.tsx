import { screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { emptyNoteFields } from '#shared/note/note-fields.ts';
import { SignOutButtons } from '../../../src/accounts/SignOutButtons.tsx';
import { unsentFileText } from '../../../src/accounts/unsent-file.ts';
import { allUnsent, keepUnsent } from '../../../src/write/unsent-work.ts';
import { giveDialogs } from '../../support/dialogs.ts';
import { answerFetch, ok, refused } from '../../support/page-fetch.ts';
import { aMe, aSession, renderPages } from '../../support/render-pages.tsx';

const ME = aMe();
const DONE = { 'DELETE /api/session': ok(aSession(null)) };

beforeEach(giveDialogs);
afterEach(() => {
  vi.unstubAllGlobals();
  localStorage.clear();
  sessionStorage.clear();
});

function open() {
  return renderPages(
    [
      { path: '/settings', element: <SignOutButtons me={ME} /> },
      { path: '/', element: <h1>The front page</h1> },
    ],
    '/settings',
  );
}

function keepWork(): void {
  keepUnsent(ME.id, 41, {
    fromVersion: 3,
    at: '2026-05-04T10:00:00.000Z',
    fields: { ...emptyNoteFields(), title: 'The slow one in the rain' },
  });
}

describe('Signing out', () => {
  it('clears what was read and what this browser keeps, except the theme', async () => {
    const sent = answerFetch(DONE);
    localStorage.setItem('spyhole-theme', 'dusk');
    localStorage.setItem('spyhole-something', 'x');
    sessionStorage.setItem('spyhole-place', 'x');
    localStorage.setItem('of-another-site', 'x');
    const { client, router } = open();
    client.setQueryData(['session', 'current'], aSession(ME));
    client.setQueryData(['notes', 'notebook'], { drafts: ['private'] });
    await userEvent.click(screen.getByRole('button', { name: 'Sign out' }));
    expect(await screen.findByText('The front page')).toBeVisible();
    expect(router.state.historyAction).toBe('REPLACE');
    expect(sent).toEqual([{ method: 'DELETE', path: '/api/session', body: undefined }]);
    expect(client.getQueryData(['notes', 'notebook'])).toBeUndefined();
    expect(JSON.stringify(client.getQueriesData({}))).not.toContain(ME.name);
    expect(Object.keys(localStorage).sort()).toEqual(['of-another-site', 'spyhole-theme']);
    expect(Object.keys(sessionStorage)).toEqual([]);
  });

  it('asks first when this browser holds work the server does not have', async () => {
    const sent = answerFetch(DONE);
    keepWork();
    open();
    await userEvent.click(screen.getByRole('button', { name: 'Sign out' }));
    const dialog = await screen.findByRole('dialog');
    expect(dialog).toHaveTextContent('The slow one in the rain');
    expect(sent).toEqual([]);

    await userEvent.click(within(dialog).getByRole('button', { name: 'Stay signed in' }));
    expect(allUnsent(ME.id)).toHaveLength(1);
    expect(sent).toEqual([]);
  });

  it('offers the work as a file, and clears it only when told to', async () => {
    const sent = answerFetch(DONE);
    keepWork();
    const files: Blob[] = [];
    vi.stubGlobal(
      'URL',
      Object.assign(URL, {
        createObjectURL: (file: Blob) => {
          files.push(file);
          return 'blob:a-file';
        },
        revokeObjectURL: () => undefined,
      }),
    );
    const clicked = vi.spyOn(HTMLAnchorElement.prototype, 'click').mockImplementation(() => {});
    open();
    await userEvent.click(screen.getByRole('button', { name: 'Sign out' }));
    await userEvent.click(await screen.findByRole('button', { name: 'Download it' }));
    expect(clicked).toHaveBeenCalledOnce();
    expect(files.map(({ type }) => type)).toEqual(['application/json']);
    expect(allUnsent(ME.id)).toHaveLength(1);

    await userEvent.click(screen.getByRole('button', { name: 'Clear it and sign out' }));
    expect(await screen.findByText('The front page')).toBeVisible();
    expect(sent.map(({ method }) => method)).toEqual(['DELETE']);
    expect(allUnsent(ME.id)).toEqual([]);
    clicked.mockRestore();
  });

  it('keeps everything when signing out did not go through, and says so', async () => {
    answerFetch({ 'DELETE /api/session': refused(503, 'away', 'A part of Spyhole is away') });
    localStorage.setItem('spyhole-something', 'x');
    const { router } = open();
    await userEvent.click(screen.getByRole('button', { name: 'Sign out' }));
    expect(await screen.findByText(/You are still signed in/)).toBeInTheDocument();
    expect(localStorage.getItem('spyhole-something')).toBe('x');
    expect(router.state.location.pathname).toBe('/settings');
  });

  it('goes through when the session had ended already', async () => {
    answerFetch({ 'DELETE /api/sessions': refused(401, 'sign-in-needed', 'Sign in first') });
    open();
    await userEvent.click(screen.getByRole('button', { name: 'Sign out everywhere' }));
    await waitFor(() => expect(screen.getByText('The front page')).toBeVisible());
  });
});

describe('The file of unsent notes', () => {
  it('holds every field of every note', () => {
    keepWork();
    const file = JSON.parse(unsentFileText(ME, allUnsent(ME.id))) as { notes: unknown[] };
    expect(file.notes).toEqual([
      {
        noteId: 41,
        writtenAt: '2026-05-04T10:00:00.000Z',
        onTopOfVersion: 3,
        fields: { ...emptyNoteFields(), title: 'The slow one in the rain' },
      },
    ]);
  });
});
