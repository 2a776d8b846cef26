import { screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { lookAlikesSchema, type LookAlikes } from '#shared/api/look-alikes.ts';
import { readClimb } from '#shared/look-alike/read-climb.ts';
import { LookAlikesOfNote } from '../../../src/look-alikes/LookAlikesOfNote.tsx';
import { LookAlikesPage } from '../../../src/look-alikes/LookAlikesPage.tsx';
import { METRIC_UNITS } from '#shared/units/units.ts';
import { aNoteRow } from '../../support/desk-note.ts';
import { stalledRows } from '../../support/notes.ts';
import { answerFetch, ok, refused } from '../../support/page-fetch.ts';
import { aSession, renderPages } from '../../support/render-pages.tsx';

beforeEach(() => sessionStorage.clear());
afterEach(() => vi.unstubAllGlobals());

const ROUTES = [{ path: '/look-alikes', Component: LookAlikesPage }];
const VISITOR = { 'GET /api/session': ok(aSession(null)) };
const ASK = 'POST /api/look-alikes';
const TSV = stalledRows(705, 29, 20)
  .map(({ minute, celsius }) => `${String(minute)}\t${String(celsius)}`)
  .join('\n');

function climbOf(level: number) {
  const read = readClimb({ readings: stalledRows(level), targetCelsius: 1000 });
  if (read === null) throw new Error('It has a climb.');
  return { celsius: [...read.signature], traits: read.traits };
}
function anAnswer(over: object = {}): LookAlikes {
  return lookAlikesSchema.parse({
    climb: climbOf(705),
    compared: 214,
    hits: [
      { ...climbOf(712), note: aNoteRow({ id: 31 }), apartCelsius: 11.4, sameKiln: true },
      {
        ...climbOf(720),
        note: aNoteRow({ id: 32, title: 'The other one' }),
        apartCelsius: 24,
        sameKiln: false,
      },
    ],
    ...over,
  });
}

async function paste(text: string) {
  await userEvent.click(await screen.findByRole('radio', { name: 'Paste columns' }));
  const field = screen.getByRole('textbox', { name: 'Pasted columns' });
  await userEvent.click(field);
  await userEvent.paste(text);
  await userEvent.click(await screen.findByRole('button', { name: /^Use these/ }));
}

describe('LookAlikesPage', () => {
  it('sends pasted readings and shows whose climb is like them, why, how far apart and what came next', async () => {
    const sent = answerFetch({ ...VISITOR, [ASK]: ok(anAnswer()) });
    renderPages(ROUTES, '/look-alikes');
    await paste(TSV);

    expect(await screen.findByText('2 firings alike, of 214 with a record')).toBeVisible();
    const asked = sent.find(({ path }) => path === '/api/look-alikes');
    expect(asked?.body).toMatchObject({ targetCelsius: null });
    expect((asked?.body as { readings: unknown[] }).readings).toHaveLength(50);
    const [first, second] = screen
      .getAllByRole('listitem')
      .filter((item) => within(item).queryByRole('heading') !== null);
    if (!first || !second) throw new Error('Two rows are shown.');
    expect(first).toHaveTextContent(/Both level off within \d+ °C of 710 °C/);
    expect(first).toHaveTextContent('About 11 °C apart minute by minute');
    expect(first).toHaveTextContent('the same kiln');
    expect(second).not.toHaveTextContent('the same kiln');
    expect(within(first).getByRole('img').getAttribute('aria-label')).toContain(
      'drawn below yours',
    );
  });

  it('asks again with the target, and finds the record again after leaving the page', async () => {
    const sent = answerFetch({ ...VISITOR, [ASK]: ok(anAnswer()) });
    renderPages(ROUTES, '/look-alikes');
    await paste(TSV);
    await screen.findByText('2 firings alike, of 214 with a record');
    await userEvent.type(screen.getByRole('textbox', { name: /Aimed at/ }), '1000');
    await waitFor(() =>
      expect(
        sent.filter(({ path }) => path === '/api/look-alikes').map(({ body }) => body),
      ).toEqual([
        expect.objectContaining({ targetCelsius: null }),
        expect.objectContaining({ targetCelsius: 1000 }),
      ]),
    );
    document.body.innerHTML = '';
    renderPages(ROUTES, '/look-alikes');
    expect(await screen.findByRole('heading', { name: 'The pasted readings' })).toBeVisible();
    await userEvent.click(screen.getByRole('button', { name: 'Another record' }));
    expect(screen.getByRole('radio', { name: 'Upload a file' })).toBeChecked();
    expect(sessionStorage.length).toBe(0);
  });

  it('says when no firing climbed like it, and when the record has no climb', async () => {
    let answer = anAnswer({ hits: [] });
    answerFetch({ ...VISITOR, [ASK]: () => ok(answer) });
    renderPages(ROUTES, '/look-alikes');
    await paste(TSV);
    expect(await screen.findByText('No firing climbed like this')).toBeVisible();
    expect(screen.getByText(/None of the 214 published firings/)).toHaveTextContent('80 °C');
    answer = anAnswer({ climb: null, hits: [] });
    const [other] = screen.getAllByRole('button', { name: 'Another record' });
    if (other) await userEvent.click(other);
    await paste(`${TSV}\n60\t705`);
    expect(await screen.findByText('There is no climb in this record')).toBeVisible();
  });

  it('tells a refusal and asks again on request', async () => {
    let isAway = true;
    answerFetch({
      ...VISITOR,
      [ASK]: () => (isAway ? refused(429, 'too-many', 'Too many tries') : ok(anAnswer())),
    });
    renderPages(ROUTES, '/look-alikes');
    await paste(TSV);
    const again = await screen.findByRole('button', { name: /again/i });
    isAway = false;
    await userEvent.click(again);
    expect(await screen.findByText('2 firings alike, of 214 with a record')).toBeVisible();
  });
});

describe('the panel under a note', () => {
  const PANEL = [
    {
      path: '/note',
      Component: () => <LookAlikesOfNote noteId={5} revision={1} units={METRIC_UNITS} />,
    },
  ];

  it('shows the first three and the rest on request', async () => {
    const [hit] = anAnswer().hits;
    if (!hit) throw new Error('There is one.');
    const hits = [1, 2, 3, 4, 5].map((id) => ({
      ...hit,
      note: aNoteRow({ id, title: `Firing ${String(id)}` }),
    }));
    answerFetch({ 'GET /api/notes/5/look-alikes': ok(anAnswer({ hits })) });
    renderPages(PANEL, '/note');
    expect(await screen.findByRole('link', { name: 'Firing 3' })).toBeVisible();
    expect(screen.queryByRole('link', { name: 'Firing 4' })).toBeNull();
    await userEvent.click(screen.getByRole('button', { name: 'Show all 5' }));
    expect(screen.getByRole('link', { name: 'Firing 5' })).toBeVisible();
  });

  it('is not there when the record has no climb', async () => {
    const sent = answerFetch({
      'GET /api/notes/5/look-alikes': ok(anAnswer({ climb: null, hits: [] })),
    });
    renderPages(PANEL, '/note');
    await waitFor(() => expect(sent).toHaveLength(1));
    await waitFor(() => expect(screen.queryByRole('heading')).toBeNull());
  });
});
