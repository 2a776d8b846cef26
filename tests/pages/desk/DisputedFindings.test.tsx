import { screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import type { DisputedFindings as List } from '#shared/api/disputes.ts';
import { METRIC_UNITS } from '#shared/units/units.ts';
import { DisputedFindings } from '../../../src/desk/DisputedFindings.tsx';
import { answerFetch, ok, refused } from '../../support/page-fetch.ts';
import { renderPages } from '../../support/render-pages.tsx';

afterEach(() => vi.unstubAllGlobals());

const LIST = 'GET /api/desk/disputes';
const ANSWER = 'PUT /api/desk/disputes/4';
const KEEP = 'The marks show no change of gas.';

function aRow(over: Partial<List['disputes'][number]['dispute']> = {}, own = false) {
  return {
    note: { id: 31, slug: 'a-stall', title: 'A stall in the rain' },
    author: { id: 9, name: 'Nell Ashby' },
    finding: {
      code: 'stall',
      trouble: 'stall',
      fromMinute: 28,
      toMinute: 46,
      numbers: { levelCelsius: 700, minutes: 18 },
      then: 'shut-off',
    },
    dispute: {
      id: 4,
      version: 1,
      code: 'stall',
      minute: 28,
      sentence: 'I turned the gas down myself.',
      state: 'disputed',
      at: '2026-06-04T10:00:00.000Z',
      answer: null,
      ...over,
    },
    own,
  };
}
const restored = aRow({
  version: 2,
  state: 'restored',
  answer: { sentence: KEEP, by: { id: 7, name: 'Ada Weir' }, at: '2026-06-05T10:00:00.000Z' },
});
const show = () =>
  renderPages([{ path: '/', Component: () => <DisputedFindings units={METRIC_UNITS} /> }], '/');

describe('the desk’s disputed findings', () => {
  it('say the finding and why its author disagrees, and lead to the note', async () => {
    answerFetch({ [LIST]: ok({ disputes: [aRow()] }) });
    show();
    expect(await screen.findByRole('link', { name: 'A stall in the rain' })).toHaveAttribute(
      'href',
      '/notes/31/a-stall',
    );
    expect(screen.getByText(/Levelled off at 700/)).toBeVisible();
    expect(screen.getByText(/The author disagrees/).parentElement).toHaveTextContent(
      'I turned the gas down myself.',
    );
  });

  it('restore one with a sentence that is asked for first, from the version that was read', async () => {
    const sent = answerFetch({
      [LIST]: ok({ disputes: [aRow()] }),
      [ANSWER]: ok({ disputes: [restored] }),
    });
    show();
    const keep = await screen.findByRole('button', { name: 'Keep the finding' });
    await userEvent.click(keep);
    expect(screen.getByText('Say in a sentence why the finding is kept.')).toBeVisible();
    expect(sent).toHaveLength(1);
    await userEvent.type(screen.getByRole('textbox', { name: /Your sentence/ }), KEEP);
    await userEvent.click(keep);
    expect(await screen.findByText(/The finding counts again/)).toBeInTheDocument();
    expect(sent.at(-1)?.body).toEqual({ decision: 'restore', sentence: KEEP });
    expect(screen.getByText('Every one has been looked at.')).toBeVisible();
    expect(screen.getByText('Looked at: 1')).toBeVisible();
  });

  it('leave one out without a sentence', async () => {
    const sent = answerFetch({
      [LIST]: ok({ disputes: [aRow()] }),
      [ANSWER]: ok({ disputes: [aRow({ version: 2, state: 'left' })] }),
    });
    show();
    await userEvent.click(await screen.findByRole('button', { name: 'Leave it out' }));
    expect(await screen.findByText(/It stays out of the figures/)).toBeInTheDocument();
    expect(sent.at(-1)?.body).toEqual({ decision: 'leave', sentence: '' });
  });

  it('keep what was written and say who was quicker', async () => {
    answerFetch({
      [LIST]: ok({ disputes: [aRow()] }),
      [ANSWER]: refused(412, 'stale', 'A newer version was saved elsewhere', {
        detail: 'Ben Oakes was quicker. Read what was said first.',
      }),
    });
    show();
    const field = await screen.findByRole('textbox', { name: /Your sentence/ });
    await userEvent.type(field, KEEP);
    await userEvent.click(screen.getByRole('button', { name: 'Keep the finding' }));
    expect(await screen.findByRole('alert')).toHaveTextContent('Ben Oakes was quicker');
    expect(screen.getByRole('textbox', { name: /Your sentence/ })).toHaveValue(KEEP);
  });

  it('are not answered by a moderator whose own note it is', async () => {
    answerFetch({ [LIST]: ok({ disputes: [aRow({}, true)] }) });
    show();
    const list = await screen.findByRole('list');
    expect(within(list).getByText(/another moderator looks at it/)).toBeVisible();
    expect(screen.queryByRole('button', { name: 'Keep the finding' })).toBeNull();
  });

  it('can be fetched again after a failure, and say when there is none', async () => {
    let away = true;
    answerFetch({
      [LIST]: () =>
        away ? refused(503, 'away', 'A part of Spyhole is away') : ok({ disputes: [] }),
    });
    show();
    const retry = await screen.findByRole('button', { name: 'Try again' });
    away = false;
    await userEvent.click(retry);
    expect(await screen.findByText('None is disputed.')).toBeVisible();
  });
});
