import { screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { draftSchema } from '#shared/api/notes.ts';
import { emptyNoteFields } from '#shared/note/note-fields.ts';
import { WritePage } from '../../../src/write/WritePage.tsx';
import { giveDialogs } from '../../support/dialogs.ts';
import { answerFetch, ok, refused } from '../../support/page-fetch.ts';
import { aMe, aSession, renderPages } from '../../support/render-pages.tsx';

// The editor of the story has tests of its own, in a browser.
vi.mock('../../../src/write/story/StorySection.tsx', () => ({ StorySection: () => null }));
beforeEach(() => {
  giveDialogs();
  localStorage.clear();
});
afterEach(() => vi.unstubAllGlobals());

const ROUTES = [
  { path: '/write/:id', Component: WritePage },
  { path: '/notebook', Component: () => <p>The notebook</p> },
];
const DRAFT = draftSchema.parse({
  id: 31,
  version: 4,
  status: 'draft',
  publishedRevision: null,
  savedAt: '2026-05-02T14:32:00.000Z',
  fields: { ...emptyNoteFields(), title: 'Nearly gone' },
  record: null,
  pictures: [],
  findings: [],
  checks: [],
  proposedChanges: [],
  earlier: null,
  remarks: [],
  decision: null,
  abilities: {
    edit: true,
    handIn: true,
    takeBack: false,
    revise: false,
    remove: true,
    claim: false,
    takeDown: false,
    dispute: false,
    tryIt: false,
  },
});

describe('removing a note', () => {
  it('can be undone from the page that comes next, and tried again where that fails', async () => {
    let tries = 0;
    const sent = answerFetch({
      'GET /api/session': ok(aSession(aMe())),
      'GET /api/kilns': ok({ kilns: [] }),
      'GET /api/notes/31/draft': ok(DRAFT),
      'DELETE /api/notes/31': ok({ message: 'The note is removed.' }),
      'POST /api/notes/31/restore': () => {
        tries += 1;
        return tries === 1 ? refused(503, 'busy', 'Too busy just now') : ok(DRAFT);
      },
    });
    const { router } = renderPages(ROUTES, '/write/31');
    await userEvent.click(await screen.findByRole('button', { name: 'Remove this note' }));
    await userEvent.click(await screen.findByRole('button', { name: 'Remove it' }));
    expect(await screen.findByText('The notebook')).toBeVisible();
    // Messages are in the top layer, which this environment does not show.
    await userEvent.click(await screen.findByText('Undo'));
    expect(await screen.findByText(/did not come back: Too busy/)).toBeInTheDocument();
    await userEvent.click(screen.getByText('Try again'));
    expect(await screen.findByText('The note is back.')).toBeInTheDocument();
    await waitFor(() => expect(router.state.location.pathname).toBe('/write/31'));
    expect(await screen.findByRole('button', { name: 'Remove this note' })).toBeVisible();
    expect(sent.filter(({ method }) => method === 'POST')).toHaveLength(2);
  });
});
