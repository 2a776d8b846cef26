import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { findAnswerSchema, type FindAnswer } from '#shared/api/search.ts';
import { defaultSettings } from '#shared/api/settings.ts';
import { FindPage } from '../../../src/find/FindPage.tsx';
import { recentQuestions } from '../../../src/find/recent-questions.ts';
import { aNoteRow } from '../../support/desk-note.ts';
import { answerFetch, ok, type FakeAnswer } from '../../support/page-fetch.ts';
import { aMe, aSession, renderPages } from '../../support/render-pages.tsx';

beforeEach(() => {
  localStorage.clear();
  vi.stubGlobal('matchMedia', () => ({
    matches: true,
    addEventListener: () => undefined,
    removeEventListener: () => undefined,
  }));
});
afterEach(() => vi.unstubAllGlobals());

const ROUTES = [{ path: '/find', Component: FindPage }];
const PARTS = [
  { key: 'trouble:stall', kind: 'trouble', label: 'stall', off: false },
  { key: 'temperature', kind: 'temperature', label: 'near 700 °C ± 20', off: false },
];

function anAnswer(over: object = {}): FindAnswer {
  return findAnswerSchema.parse({
    parts: PARTS,
    hits: [
      {
        note: aNoteRow(),
        tier: 'close',
        why: 'levelled off at 702 °C, 2 °C from what you asked',
        passage: [
          { text: 'it ', hit: false },
          { text: 'stalled', hit: true },
          { text: ' <b>for good</b>', hit: false },
        ],
      },
    ],
    total: 1,
    page: 1,
    pages: 1,
    facets: { forms: [{ value: 'plate', count: 3 }] },
    pooled: null,
    loosen: [],
    plain: false,
    ...over,
  });
}

const VISITOR = { 'GET /api/session': ok(aSession(null)) };
const QUESTION = '/api/search?q=stalled+at+700';
const withOff = (key: string) => PARTS.map((part) => ({ ...part, off: part.key === key }));

describe('FindPage', () => {
  it('says at once how the question is read, before any answer has come', async () => {
    answerFetch({ ...VISITOR });
    vi.stubGlobal('fetch', () => new Promise(() => undefined));
    renderPages(ROUTES, '/find?q=stalled+at+700');
    expect(await screen.findByRole('button', { name: 'Leave stall out' })).toBeVisible();
    expect(screen.getByText(/near 700.°C ± 20/)).toBeVisible();
  });

  it('switches a part off in the address, asks anew, takes it in again, and follows Back', async () => {
    const sent = answerFetch({
      ...VISITOR,
      [`GET ${QUESTION}`]: ok(anAnswer()),
      [`GET ${QUESTION}&off=temperature`]: ok(
        anAnswer({ parts: withOff('temperature'), total: 9 }),
      ),
    });
    const { router } = renderPages(ROUTES, '/find?q=stalled+at+700');
    expect(await screen.findByText('1 note found', { selector: 'h2' })).toBeVisible();
    await userEvent.click(screen.getByRole('button', { name: /^Leave near 700/ }));
    expect(await screen.findByText('9 notes found', { selector: 'h2' })).toBeVisible();
    expect(router.state.location.search).toBe('?q=stalled+at+700&off=temperature');
    const again = screen.getByRole('button', { name: /^Take near 700.* in again$/ });
    expect(again).toHaveFocus();
    await router.navigate(-1);
    expect(await screen.findByText('1 note found', { selector: 'h2' })).toBeVisible();
    expect(screen.getByRole('button', { name: /^Leave near 700/ })).toBeVisible();
    expect(sent.filter(({ path }) => path.startsWith('/api/search')).length).toBeGreaterThan(1);
  });

  it('keeps the rows while a filter is being answered, and says that it looks again', async () => {
    let answer: (value: FakeAnswer) => void = () => undefined;
    const slow = new Promise<FakeAnswer>((resolve) => (answer = resolve));
    answerFetch({ ...VISITOR, [`GET ${QUESTION}`]: ok(anAnswer()) });
    const quick = globalThis.fetch;
    vi.stubGlobal('fetch', async (path: string, init: RequestInit) => {
      if (!path.includes('forms=plate')) return quick(path, init);
      return new Response(JSON.stringify((await slow).body));
    });
    renderPages(ROUTES, '/find?q=stalled+at+700');
    await userEvent.click(await screen.findByRole('checkbox', { name: /plate/ }));
    expect(await screen.findByText('Looking again')).toBeVisible();
    expect(screen.getByRole('link', { name: 'A stall in the rain' })).toBeVisible();
    answer(ok(anAnswer({ hits: [], total: 0 })));
    expect(await screen.findByText('No note fits all of this')).toBeVisible();
    expect(screen.getByRole('button', { name: 'Take the filter off' })).toBeVisible();
  });

  it('marks hits as text, never as markup of the note', async () => {
    answerFetch({ ...VISITOR, [`GET ${QUESTION}`]: ok(anAnswer()) });
    renderPages(ROUTES, '/find?q=stalled+at+700');
    const mark = await screen.findByText('stalled', { selector: 'mark' });
    expect(mark.parentElement).toHaveTextContent('it stalled <b>for good</b>');
    expect(mark.parentElement?.querySelector('b')).toBeNull();
  });

  it('says which part to leave out when nothing is found, with the count it would give', async () => {
    const none = anAnswer({
      hits: [],
      total: 0,
      loosen: [{ key: 'temperature', label: 'near 700 °C ± 20', count: 12 }],
    });
    answerFetch({
      ...VISITOR,
      [`GET ${QUESTION}`]: ok(none),
      [`GET ${QUESTION}&off=temperature`]: ok(anAnswer({ parts: withOff('temperature') })),
    });
    const { router } = renderPages(ROUTES, '/find?q=stalled+at+700');
    const loosen = await screen.findByRole('button', { name: /Leave out.*12 notes/ });
    // One heading says it, not a count above and words below.
    const notes = within(screen.getByRole('region', { name: 'Notes' }));
    const headings = notes.getAllByRole('heading');
    expect(headings.map((heading) => heading.textContent)).toEqual(['No note fits all of this']);
    await userEvent.click(loosen);
    await waitFor(() => expect(router.state.location.search).toContain('off=temperature'));
  });

  it('does not blame the words when it is the parts together that no note fits', async () => {
    answerFetch({ ...VISITOR, [`GET ${QUESTION}`]: ok(anAnswer({ hits: [], total: 0 })) });
    renderPages(ROUTES, '/find?q=stalled+at+700');
    expect(await screen.findByText('No note fits all of this')).toBeVisible();
    expect(screen.getByText(/Leave more than one part of it out/)).toBeVisible();
  });

  it('gives the pooled answer with no change beside the changes, and cautions beside theirs', async () => {
    const pooled = {
      trouble: 'stall',
      startClass: 'cold',
      source: 'measured',
      pairs: 23,
      rows: [
        { change: null, gone: 2, firings: 8, members: 6, verdict: 'reference', caution: null },
        {
          change: 'floor-insulated',
          gone: 7,
          firings: 9,
          members: 5,
          verdict: 'better',
          caution: null,
        },
        {
          change: 'gas-more',
          gone: 1,
          firings: 6,
          members: 4,
          verdict: 'cannot-be-told',
          caution: 'Carbon monoxide has no smell.',
        },
      ],
    };
    answerFetch({ ...VISITOR, [`GET ${QUESTION}`]: ok(anAnswer({ pooled })) });
    renderPages(ROUTES, '/find?q=stalled+at+700');
    const part = await screen.findByRole('region', { name: 'What was tried next' });
    expect(part).toHaveTextContent(/floor insulated, gone 7 of 9 \(5 members; better/);
    expect(part).toHaveTextContent(/no change named, gone 2 of 8/);
    expect(part).toHaveTextContent('Carbon monoxide has no smell.');
    expect(within(part).getByRole('link')).toHaveAttribute('href', '/what-helped/stall');
    expect(screen.getByRole('link', { name: /during the firing/ })).toHaveAttribute(
      'href',
      '/what-helped/stall#during',
    );
  });

  it('says plainly that the engine is away', async () => {
    answerFetch({ ...VISITOR, [`GET ${QUESTION}`]: ok(anAnswer({ plain: true, facets: {} })) });
    renderPages(ROUTES, '/find?q=stalled+at+700');
    expect(await screen.findByText(/search engine is away/)).toBeVisible();
  });

  it('remembers a question once it is answered, and forgets all when asked to', async () => {
    answerFetch({
      ...VISITOR,
      [`GET ${QUESTION}`]: ok(anAnswer()),
      'GET /api/search?sort=newest': ok(anAnswer({ parts: [] })),
      'GET /api/what-helped': ok({ notes: 0, members: 0, troubles: [] }),
    });
    const { router } = renderPages(ROUTES, '/find?q=stalled+at+700');
    await screen.findByText('1 note found', { selector: 'h2' });
    expect(recentQuestions()).toEqual(['stalled at 700']);
    await router.navigate('/find');
    expect(await screen.findByRole('link', { name: 'stalled at 700' })).toBeVisible();
    await userEvent.click(screen.getByRole('button', { name: 'Forget these' }));
    expect(recentQuestions()).toEqual([]);
    expect(screen.queryByRole('link', { name: 'stalled at 700' })).toBeNull();
  });
});

describe('a part of the question', () => {
  it('is changed by its numbers, in the words and the address of the question', async () => {
    const changed = '/api/search?q=stalled+at+700+to+740+%C2%B0C';
    answerFetch({
      ...VISITOR,
      [`GET ${QUESTION}`]: ok(anAnswer()),
      [`GET ${changed}`]: ok(anAnswer({ total: 4 })),
    });
    const { router } = renderPages(ROUTES, '/find?q=stalled+at+700');
    await userEvent.click(await screen.findByRole('button', { name: /^near 700/ }));
    const near = screen.getByRole('textbox', { name: /Near/ });
    expect(near).toHaveFocus();
    await userEvent.clear(near);
    await userEvent.type(near, '720');
    await userEvent.click(screen.getByRole('button', { name: 'Ask it so' }));
    expect(await screen.findByText('4 notes found', { selector: 'h2' })).toBeVisible();
    const q = new URLSearchParams(router.state.location.search).get('q');
    expect(q).toBe('stalled at 700 to 740 °C');
    expect(screen.queryByRole('button', { name: 'Ask it so' })).toBeNull();
  });
});

describe('a range', () => {
  const histograms = [{ range: 'peak', from: 600, step: 50, counts: [1, 4, 0, 2] }];
  const RANGED = `${QUESTION}&peak=650..`;

  it('is set by its fields, stands in the address, and is taken off again', async () => {
    answerFetch({
      ...VISITOR,
      [`GET ${QUESTION}`]: ok(anAnswer({ histograms })),
      [`GET ${RANGED}`]: ok(anAnswer({ histograms, total: 6 })),
    });
    const { router } = renderPages(ROUTES, '/find?q=stalled+at+700');
    expect(
      await screen.findByRole('img', {
        name: /Peak of these notes: 600 to 800.*650 to 700.*\(4\)/,
      }),
    ).toBeVisible();
    await userEvent.type(screen.getByRole('textbox', { name: 'from Peak' }), '650{Enter}');
    expect(await screen.findByText('6 notes found', { selector: 'h2' })).toBeVisible();
    expect(router.state.location.search).toBe('?q=stalled+at+700&peak=650..');
    await userEvent.click(screen.getByRole('button', { name: 'Any peak' }));
    expect(await screen.findByText('1 note found', { selector: 'h2' })).toBeVisible();
  });

  it('keeps what cannot be read and says so', async () => {
    answerFetch({ ...VISITOR, [`GET ${QUESTION}`]: ok(anAnswer({ histograms })) });
    const { router } = renderPages(ROUTES, '/find?q=stalled+at+700');
    await userEvent.type(await screen.findByRole('textbox', { name: 'to Peak' }), 'hot{Enter}');
    expect(screen.getByRole('alert')).toHaveTextContent('Numbers only.');
    expect(router.state.location.search).toBe('?q=stalled+at+700');
  });
});

describe('the "/" key', () => {
  const press = (target: Element) => fireEvent.keyDown(target, { key: '/' });

  it('goes to the question field, but not while something is typed', async () => {
    answerFetch({ ...VISITOR, [`GET ${QUESTION}`]: ok(anAnswer()) });
    renderPages(ROUTES, '/find?q=stalled+at+700');
    await screen.findByText('1 note found', { selector: 'h2' });
    const field = screen.getByRole('combobox', { name: /What happened/ });
    press(document.body);
    expect(field).toHaveFocus();
    const order = screen.getByRole('checkbox', { name: /plate/ });
    order.focus();
    press(order);
    expect(order).toHaveFocus();
  });

  it('does nothing for a member who switched single keys off', async () => {
    const me = aMe({ settings: { ...defaultSettings(), singleKeys: false } });
    answerFetch({
      'GET /api/session': ok(aSession(me)),
      'GET /api/saved-searches': ok({ searches: [] }),
      [`GET ${QUESTION}`]: ok(anAnswer()),
    });
    const { client } = renderPages(ROUTES, '/find?q=stalled+at+700');
    await screen.findByText('1 note found', { selector: 'h2' });
    await waitFor(() => expect(client.isFetching()).toBe(0));
    press(document.body);
    expect(screen.getByRole('combobox', { name: /What happened/ })).not.toHaveFocus();
  });
});
