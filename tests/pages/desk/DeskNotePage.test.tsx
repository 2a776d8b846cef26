import { screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { DeskNotePage } from '../../../src/desk/DeskNotePage.tsx';
import { aDeskNote } from '../../support/desk-note.ts';
import { answerFetch, ok, refused } from '../../support/page-fetch.ts';
import { aMe, aSession, renderPages } from '../../support/render-pages.tsx';

beforeEach(() => localStorage.clear());
afterEach(() => vi.unstubAllGlobals());

const ROUTES = [
  { path: '/desk/:id', Component: DeskNotePage },
  { path: '/desk', Component: () => <p>The pile</p> },
];
const AS_MODERATOR = {
  'GET /api/session': ok(aSession(aMe({ id: 7, role: 'moderator' }))),
  'GET /api/desk': ok({ waiting: [] }),
};
const DECISION = 'POST /api/desk/notes/31/decision';

async function writeReason(words: string) {
  await userEvent.type(await screen.findByLabelText('Why, for the author'), words);
}

describe('DeskNotePage', () => {
  it('sends the revision that was read, the reason and the checklist, and goes on to the pile', async () => {
    const sent = answerFetch({
      ...AS_MODERATOR,
      'GET /api/desk/notes/31': ok(aDeskNote()),
      [DECISION]: ok({ message: 'Decided.' }),
    });
    renderPages(ROUTES, '/desk/31');
    const publish = await screen.findByRole('button', { name: 'Publish' });
    expect(publish).toHaveAttribute('aria-disabled', 'true');
    for (const box of screen.getAllByRole('checkbox')) await userEvent.click(box);
    await userEvent.click(publish);
    expect(await screen.findByText('The pile')).toBeVisible();
    expect(sent.find(({ method }) => method === 'POST')?.body).toEqual({
      decision: 'publish',
      revisionId: 77,
      reason: '',
      checklist: ['complete', 'consistent', 'kind', 'safe', 'theirs'],
    });
    expect(Object.keys(localStorage)).toEqual([]);
  });

  it('keeps the reason and says who was quicker when another moderator has decided first', async () => {
    answerFetch({
      ...AS_MODERATOR,
      'GET /api/desk/notes/31': ok(aDeskNote()),
      [DECISION]: refused(409, 'wrong-status', 'The note is no longer where it was', {
        detail: 'Bertil Onn has decided on this note already: published.',
      }),
    });
    renderPages(ROUTES, '/desk/31');
    await writeReason('Say where you fired.');
    await userEvent.click(screen.getByRole('button', { name: 'Send back' }));
    expect(await screen.findByRole('alert')).toHaveTextContent('Bertil Onn has decided');
    expect(screen.getByLabelText('Why, for the author')).toHaveValue('Say where you fired.');
    expect(JSON.stringify(localStorage)).toContain('Say where you fired.');
  });

  it('has the words still after the page was closed and the claim has gone to another', async () => {
    const mine = aDeskNote();
    answerFetch({ ...AS_MODERATOR, 'GET /api/desk/notes/31': ok(mine) });
    const first = renderPages(ROUTES, '/desk/31');
    await writeReason('Not lost.');
    await userEvent.type(screen.getByLabelText('Remark'), 'Which garage?');
    await first.router.navigate('/desk');
    const theirs = aDeskNote({
      claim: { by: { id: 8, name: 'Bertil Onn' }, until: '2026-06-02T12:00:00.000Z', mine: false },
      abilities: { decide: false, remark: false },
    });
    vi.unstubAllGlobals();
    answerFetch({ ...AS_MODERATOR, 'GET /api/desk/notes/31': ok(theirs) });
    first.client.clear();
    await first.router.navigate('/desk/31');
    expect(await screen.findByText('Bertil Onn has this note on the desk')).toBeVisible();
    expect(screen.getByLabelText('Why, for the author')).toHaveValue('Not lost.');
    expect(screen.getByLabelText('Remark')).toHaveValue('Which garage?');
    expect(screen.queryByRole('button', { name: 'Publish' })).toBeNull();
    expect(screen.getByRole('button', { name: 'Pin the remark' })).toHaveAttribute(
      'aria-disabled',
      'true',
    );
  });

  it('keeps a remark that was refused, and empties the field of one that was pinned', async () => {
    let tries = 0;
    const sent = answerFetch({
      ...AS_MODERATOR,
      'GET /api/desk/notes/31': ok(aDeskNote()),
      'POST /api/desk/notes/31/remarks': () => {
        tries += 1;
        return tries === 1
          ? refused(409, 'already-claimed', 'Another moderator has this note on the desk')
          : ok(
              aDeskNote({
                remarks: [
                  {
                    id: 1,
                    pointer: '/story',
                    text: 'Which garage?',
                    by: { id: 7, name: 'Marit Quell' },
                    at: '2026-06-02T11:00:00.000Z',
                    mended: false,
                  },
                ],
              }),
            );
      },
    });
    renderPages(ROUTES, '/desk/31');
    const field = await screen.findByLabelText('Remark');
    await userEvent.selectOptions(screen.getByLabelText('Pinned to'), 'Story');
    await userEvent.type(field, 'Which garage?');
    await userEvent.click(screen.getByRole('button', { name: 'Pin the remark' }));
    expect(await screen.findByRole('alert')).toHaveTextContent('kept in this browser');
    expect(field).toHaveValue('Which garage?');
    await userEvent.click(screen.getByRole('button', { name: 'Pin the remark' }));
    await waitFor(() => expect(field).toHaveValue(''));
    expect(screen.getByText('Which garage?')).toBeVisible();
    expect(sent.filter(({ method }) => method === 'POST').map(({ body }) => body)).toEqual([
      { pointer: '/story', text: 'Which garage?' },
      { pointer: '/story', text: 'Which garage?' },
    ]);
  });

  it('lets nobody decide on a note of their own', async () => {
    const own = aDeskNote({
      claim: null,
      abilities: { decide: false, remark: false },
    });
    answerFetch({
      ...AS_MODERATOR,
      'GET /api/session': ok(aSession(aMe({ id: 9, role: 'moderator' }))),
      'GET /api/desk/notes/31': ok(own),
    });
    renderPages(ROUTES, '/desk/31');
    expect(await screen.findByText('Your own note')).toBeVisible();
    expect(screen.queryByRole('heading', { name: 'Decide' })).toBeNull();
    expect(screen.queryByRole('button', { name: /Take it/ })).toBeNull();
  });

  it('lists unsafe words with their reason, beside the note', async () => {
    answerFetch({
      ...AS_MODERATOR,
      'GET /api/desk/notes/31': ok(
        aDeskNote({
          unsafe: [
            { passage: 'fired in the garage', reason: 'Fired indoors: “fired in the garage”' },
          ],
        }),
      ),
    });
    renderPages(ROUTES, '/desk/31');
    expect(await screen.findByText(/Fired indoors/)).toBeVisible();
    expect(
      screen.getByRole('button', { name: 'Show where it stands: fired in the garage' }),
    ).toBeVisible();
  });
});
