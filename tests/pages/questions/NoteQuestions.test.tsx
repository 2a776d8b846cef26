import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { noteQuestionsSchema, type NoteQuestions as Shown } from '#shared/api/questions.ts';
import { NoteQuestions } from '../../../src/questions/NoteQuestions.tsx';
import { giveDialogs } from '../../support/dialogs.ts';
import { answerFetch, ok, refused } from '../../support/page-fetch.ts';
import { aMe, aSession, renderPages } from '../../support/render-pages.tsx';

const LIST = '/api/notes/31/questions';
const ROUTES = [{ path: '/notes/:id', element: <NoteQuestions noteId={31} /> }];
const VISITOR = { 'GET /api/session': ok(aSession(null)) };
const MEMBER = { 'GET /api/session': ok(aSession(aMe())) };

function shown(over: object = {}, traits: object = {}): Shown {
  return noteQuestionsSchema.parse({
    questions: [
      {
        id: 5,
        text: 'What stood the <b>kiln</b> on?\nAnd was it dry?',
        by: { id: 8, name: 'Wren Halloran' },
        at: '2026-06-03T10:00:00.000Z',
        answers: [],
        abilities: { answer: false, remove: false },
        ...traits,
      },
    ],
    abilities: { ask: false },
    ...over,
  });
}
const ANSWER = {
  id: 9,
  text: 'A dry slab.',
  by: { id: 7, name: 'Marit Quell' },
  byAuthor: true,
  at: '2026-06-04T10:00:00.000Z',
  changed: false,
  mine: true,
};

beforeEach(() => {
  giveDialogs();
});
afterEach(() => vi.unstubAllGlobals());

describe('the questions of a note', () => {
  it('are shown as text to a visitor, who is told what would let them ask', async () => {
    answerFetch({ ...VISITOR, [`GET ${LIST}`]: ok(shown({}, { answers: [ANSWER] })) });
    renderPages(ROUTES, '/notes/31');
    const section = await screen.findByRole('region', { name: 'Questions' });
    const question = await within(section).findByText(/What stood the <b>kiln<\/b> on/);
    expect(question.querySelector('b')).toBeNull();
    expect(section).toHaveTextContent(/Marit Quell, the author/);
    expect(await within(section).findByRole('link', { name: 'Sign in' })).toHaveAttribute(
      'href',
      '/sign-in?next=%2Fnotes%2F31',
    );
    expect(within(section).queryByRole('button')).toBeNull();
    expect(within(section).queryByRole('textbox')).toBeNull();
  });

  it('ask a member with an unconfirmed address to confirm it first', async () => {
    answerFetch({
      'GET /api/session': ok(aSession(aMe({ emailVerified: false }))),
      [`GET ${LIST}`]: ok(shown({ questions: [] })),
    });
    renderPages(ROUTES, '/notes/31');
    expect(await screen.findByText('None asked yet.')).toBeVisible();
    expect(await screen.findByRole('link', { name: 'Confirm your address' })).toBeVisible();
  });

  it('keep what was typed when asking fails, and send the repeat under the same key', async () => {
    let away = true;
    const keys: (string | null)[] = [];
    answerFetch({
      ...MEMBER,
      [`GET ${LIST}`]: ok(shown({ questions: [], abilities: { ask: true } })),
      [`POST ${LIST}`]: () =>
        away ? refused(503, 'away', 'A part is away') : ok(shown({ abilities: { ask: true } })),
    });
    const rest = globalThis.fetch;
    vi.stubGlobal('fetch', (path: string, init?: RequestInit) => {
      if (init?.method === 'POST') keys.push(new Headers(init.headers).get('Idempotency-Key'));
      return rest(path, init);
    });
    renderPages(ROUTES, '/notes/31');
    const field = await screen.findByRole('textbox', { name: 'Your question' });
    await userEvent.type(field, 'Was it?');
    await userEvent.click(screen.getByRole('button', { name: 'Ask' }));
    expect(field).toHaveAccessibleDescription(/at least 10 characters/);
    expect(keys).toEqual([]);
    await userEvent.type(field, ' Was it dry?');
    await userEvent.click(screen.getByRole('button', { name: 'Ask' }));
    expect(await screen.findByRole('alert')).toHaveTextContent('It was not asked: A part is away');
    expect(field).toHaveValue('Was it? Was it dry?');
    away = false;
    await userEvent.click(screen.getByRole('button', { name: 'Try again' }));
    expect(await screen.findByText(/And was it dry/)).toBeVisible();
    expect(field).toHaveValue('');
    expect(keys).toHaveLength(2);
    expect(keys[0]).toBe(keys[1]);
  });

  it('can be answered by whom the server lets, and the answer changed', async () => {
    const abilities = { answer: true, remove: false };
    const sent = answerFetch({
      ...MEMBER,
      [`GET ${LIST}`]: ok(shown({}, { abilities })),
      [`PUT ${LIST}/5/answer`]: ok(shown({}, { abilities, answers: [ANSWER] })),
    });
    renderPages(ROUTES, '/notes/31');
    await userEvent.click(await screen.findByRole('button', { name: /^Answer: What stood/ }));
    const field = screen.getByRole('textbox', { name: 'Your answer' });
    expect(field).toHaveFocus();
    await userEvent.type(field, ' A dry slab. ');
    await userEvent.click(screen.getByRole('button', { name: 'Answer' }));
    expect(await screen.findByText('A dry slab.')).toBeVisible();
    expect(sent.find(({ method }) => method === 'PUT')?.body).toEqual({ text: 'A dry slab.' });
    const change = screen.getByRole('button', { name: /^Change my answer/ });
    expect(change).toHaveFocus();
    await userEvent.click(change);
    expect(screen.getByRole('textbox', { name: 'Your answer' })).toHaveValue('A dry slab.');
  });

  it('are removed only after a second word', async () => {
    const sent = answerFetch({
      ...MEMBER,
      [`GET ${LIST}`]: ok(shown({}, { abilities: { answer: false, remove: true } })),
      [`DELETE ${LIST}/5`]: ok(shown({ questions: [] })),
    });
    renderPages(ROUTES, '/notes/31');
    await userEvent.click(await screen.findByRole('button', { name: /^Remove: What stood/ }));
    expect(sent.some(({ method }) => method === 'DELETE')).toBe(false);
    fireEvent.click(screen.getByRole('button', { name: 'Remove it', hidden: true }));
    expect(await screen.findByText('None asked yet.')).toBeVisible();
    await waitFor(() => expect(screen.getByRole('heading', { name: 'Questions' })).toHaveFocus());
  });
});
