import { screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { useQuery } from '@tanstack/react-query';
import type { NotePageData } from '#shared/api/notes.ts';
import { METRIC_UNITS } from '#shared/units/units.ts';
import { NoteFindings } from '../../../src/notes/NoteFindings.tsx';
import { noteQueries } from '../../../src/notes/note-queries.ts';
import { aDeskNote } from '../../support/desk-note.ts';
import { giveDialogs } from '../../support/dialogs.ts';
import { answerFetch, ok, refused } from '../../support/page-fetch.ts';
import { renderPages } from '../../support/render-pages.tsx';

beforeEach(giveDialogs);
afterEach(() => vi.unstubAllGlobals());

const REASON = 'I turned the gas down myself.';
const DISPUTE: NotePageData['disputes'][number] = {
  id: 4,
  version: 1,
  code: 'stall',
  minute: 28,
  sentence: REASON,
  state: 'disputed',
  at: '2026-06-04T10:00:00.000Z',
  answer: null,
};

function aPage(over: Partial<NotePageData> = {}, dispute = false): NotePageData {
  const { page } = aDeskNote();
  return {
    ...page,
    status: 'published',
    publishedAt: '2026-06-03T10:00:00.000Z',
    findings: [
      {
        code: 'stall',
        trouble: 'stall',
        fromMinute: 28,
        toMinute: 46,
        numbers: { levelCelsius: 700, minutes: 18 },
        then: 'shut-off',
      },
      {
        code: 'hold',
        trouble: null,
        fromMinute: 60,
        toMinute: 64,
        numbers: { minutes: 4, levelCelsius: 1000, sdCelsius: 1 },
        then: null,
      },
    ],
    abilities: { ...page.abilities, dispute },
    ...over,
  };
}

/** The findings of note 31 as the server has it. */
function Shown() {
  const note = useQuery(noteQueries.page(31));
  return note.data ? <NoteFindings page={note.data} units={METRIC_UNITS} of="published" /> : null;
}
const show = () => renderPages([{ path: '/', Component: Shown }], '/');
const stall = async () => {
  const text = await screen.findByText(/Levelled off at 700/);
  const item = text.closest('li');
  if (!item) throw new Error('The finding stands in no list.');
  return within(item);
};

describe('the findings of a note', () => {
  it('are read with the author’s disagreement beside the finding it is about', async () => {
    answerFetch({ 'GET /api/notes/31': ok(aPage({ disputes: [DISPUTE] })) });
    show();
    const item = await stall();
    expect(item.getByText(/The author disagrees/).parentElement).toHaveTextContent(`“${REASON}”`);
    expect(item.getByText(/counts in no figure, until a moderator restores it/)).toBeVisible();
    expect(screen.getAllByText(/The author disagrees/)).toHaveLength(1);
    // A reader has nothing to press.
    expect(screen.queryByRole('button')).toBeNull();
  });

  it('say what a moderator made of it', async () => {
    const answer = {
      sentence: 'The marks show no change of gas.',
      by: { id: 9, name: 'Ada Weir' },
      at: '2026-06-05T10:00:00.000Z',
    };
    answerFetch({
      'GET /api/notes/31': ok(
        aPage({ disputes: [{ ...DISPUTE, state: 'restored', answer }] }, true),
      ),
    });
    show();
    const item = await stall();
    expect(
      item.getByText(/A moderator looked and keeps the finding/).parentElement,
    ).toHaveTextContent('“The marks show no change of gas.”');
    // Settled: the author cannot take it back any more, but may disagree with the other.
    expect(screen.getAllByRole('button').map((each) => each.textContent)).toEqual(['I disagree']);
  });

  it('say that a finding is left out, with the sentence where there is one', async () => {
    const answer = { sentence: '', by: null, at: '2026-06-05T10:00:00.000Z' };
    answerFetch({
      'GET /api/notes/31': ok(aPage({ disputes: [{ ...DISPUTE, state: 'left', answer }] })),
    });
    show();
    const said = (await stall()).getByText(/leaves it out of the figures/);
    expect(said).toHaveTextContent(/figures\.$/);
  });

  it('tell what the author answered of a level stretch', async () => {
    answerFetch({
      'GET /api/notes/31': ok(aPage({ levelAnswers: [{ fromMinute: 29, answer: 'stuck' }] })),
    });
    show();
    expect((await stall()).getByText('The author says it was stuck.')).toBeVisible();
  });

  it('can be disagreed with by the author, after a sentence, and that can be taken back', async () => {
    const sent = answerFetch({
      'GET /api/notes/31': ok(aPage({}, true)),
      'PUT /api/notes/31/disputes': ok(aPage({ disputes: [DISPUTE] }, true)),
      'DELETE /api/notes/31/disputes/4': ok(aPage({}, true)),
    });
    show();
    await userEvent.click(await screen.findByRole('button', { name: /I disagree: Levelled off/ }));
    const dialog = within(await screen.findByRole('dialog'));
    await userEvent.click(dialog.getByRole('button', { name: 'Disagree' }));
    expect(dialog.getByText('Say why in a sentence.')).toBeVisible();
    expect(sent.map(({ method }) => method)).toEqual(['GET']);
    await userEvent.type(dialog.getByRole('textbox'), ` ${REASON} `);
    await userEvent.click(dialog.getByRole('button', { name: 'Disagree' }));
    const undo = await screen.findByRole('button', { name: /Take it back: Levelled off/ });
    expect(sent.at(-1)).toMatchObject({
      method: 'PUT',
      body: { code: 'stall', minute: 28, sentence: REASON },
    });
    expect(screen.queryByRole('dialog')).toBeNull();
    expect(
      await screen.findByText('Your disagreement stands beside the finding.'),
    ).toBeInTheDocument();
    await userEvent.click(undo);
    expect(await screen.findByText('Taken back. The finding counts again.')).toBeInTheDocument();
    expect(screen.queryByText(/The author disagrees/)).toBeNull();
    expect(screen.getByRole('button', { name: /I disagree: Levelled off/ })).toHaveFocus();
  });

  it('keep the sentence and say why when the server refuses', async () => {
    answerFetch({
      'GET /api/notes/31': ok(aPage({}, true)),
      'PUT /api/notes/31/disputes': refused(409, 'stale-revision', 'The note has changed'),
    });
    show();
    await userEvent.click(await screen.findByRole('button', { name: /I disagree: Levelled off/ }));
    const dialog = within(await screen.findByRole('dialog'));
    await userEvent.type(dialog.getByRole('textbox'), REASON);
    await userEvent.click(dialog.getByRole('button', { name: 'Disagree' }));
    expect(await dialog.findByRole('alert')).toHaveTextContent('The note has changed');
    expect(dialog.getByRole('textbox')).toHaveValue(REASON);
  });
});
