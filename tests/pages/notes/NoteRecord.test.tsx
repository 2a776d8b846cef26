import { screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { notePageSchema, type Neighbour, type NotePageData } from '#shared/api/notes.ts';
import { NoteRecord } from '../../../src/notes/NoteRecord.tsx';
import { aDeskNote } from '../../support/desk-note.ts';
import { answerFetch, ok, refused } from '../../support/page-fetch.ts';
import { renderPages } from '../../support/render-pages.tsx';

afterEach(() => vi.unstubAllGlobals());

/** 20 °C a minute from minute 10 on; a reading a minute. */
const points = (length: number): [number, number][] =>
  Array.from({ length }, (_, minute) => [minute, minute < 10 ? 15 : 15 + 20 * (minute - 10)]);
const lit = (minute: number) => ({ minute, kind: 'lit' as const, percent: null, detail: '' });

const neighbour = (traits: Partial<Neighbour>): Neighbour => ({
  noteId: 30,
  slug: 'before',
  title: 'Before the fibre',
  firedOn: '2026-05-20',
  status: 'published',
  strip: points(40),
  stripWords: 'Climbs.',
  peakCelsius: 600,
  timeToTemperatureMinutes: null,
  changes: [],
  ...traits,
});
const aPage = (traits: Partial<NotePageData> = {}): NotePageData =>
  notePageSchema.parse({
    ...aDeskNote().page,
    status: 'published',
    hasRecord: true,
    marks: [lit(10)],
    earlier: neighbour({}),
    ...traits,
  });
const record = (length: number, count = length) =>
  ok({ points: points(length), secondProbe: null, count });

function show(page: NotePageData) {
  const units = { temperature: 'C', system: 'metric' } as const;
  const Component = () => <NoteRecord page={page} units={units} of="published" />;
  renderPages([{ path: '/', Component }], '/');
}
const menu = () => screen.findByLabelText('Lay over it');
const EARLIER = /^Earlier: Before the fibre/;

describe('NoteRecord', () => {
  it('lays the earlier firing over this one, from where both were lit, and takes it off again', async () => {
    answerFetch({
      'GET /api/notes/31/record?of=published': record(60),
      'GET /api/notes/30': ok(
        aPage({ id: 30, row: { ...aPage().row, title: 'Before the fibre' }, marks: [lit(14)] }),
      ),
      'GET /api/notes/30/record?of=published': record(50),
    });
    show(aPage());
    const user = userEvent.setup();
    await user.selectOptions(await menu(), screen.getByRole('option', { name: EARLIER }));
    await screen.findAllByText('earlier firing, “Before the fibre”');

    // Its lighting at 14 min lies on this one's at 10 min: its minute 34 is this one's 30.
    const slider = screen.getByRole('slider');
    slider.focus();
    await user.keyboard('{End}');
    expect(slider.getAttribute('aria-valuetext')).toMatch(/^59\smin, 995\s°C$/);
    await user.keyboard('{Home}{PageUp}{PageUp}{PageUp}{PageUp}{PageUp}');
    const read = slider.getAttribute('aria-valuetext') ?? '';
    const [, minute, own, other] =
      /^([\d.]+)\smin, (\d+)\s°C; (\d+)\s°C, earlier firing, “Before the fibre”/.exec(read) ?? [];
    expect(Number(own)).toBeCloseTo(15 + 20 * (Number(minute) - 10), -1);
    expect(Number(other) - Number(own)).toBe(80);

    await user.selectOptions(screen.getByLabelText('Both counted from'), 'climb');
    expect(slider.getAttribute('aria-valuetext')).not.toBe(read);
    await user.selectOptions(await menu(), '');
    expect(screen.queryAllByText(/earlier firing/)).toEqual([]);
  });

  it('says when the other record could not be fetched, and fetches it again', async () => {
    let answers = 0;
    answerFetch({
      'GET /api/notes/31/record?of=published': record(60),
      'GET /api/notes/30': () =>
        ++answers === 1 ? refused(404, 'not-found', 'Not there') : ok(aPage({ id: 30, marks: [] })),
      'GET /api/notes/30/record?of=published': record(50),
    });
    show(aPage());
    const user = userEvent.setup();
    await user.selectOptions(await menu(), screen.getByRole('option', { name: EARLIER }));
    const said = await screen.findByText('The other record could not be fetched.');
    expect(said).toBeInTheDocument();
    await user.click(screen.getByRole('button', { name: 'Try again' }));
    await screen.findByText(/counted from where the climb begins; the lighting was not marked/);
    expect(screen.queryByText('The other record could not be fetched.')).not.toBeInTheDocument();
  });

  it('offers firings that climbed alike, but none twice', async () => {
    const traits = {
      minutes: 50,
      peakCelsius: 700,
      peakMinute: 50,
      aimCelsius: null,
      reachedMinute: null,
      shape: null,
      rate400To700: null,
      levels: [],
      sags: [],
      hold: null,
    };
    const hit = (id: number, title: string) => ({
      celsius: [15, 35],
      traits,
      note: { ...aPage().row, id, title },
      apartCelsius: 9,
      sameKiln: false,
    });
    answerFetch({
      'GET /api/notes/31/record?of=published': record(60),
      'GET /api/notes/31/look-alikes': ok({
        climb: { celsius: [15, 35], traits },
        compared: 3,
        hits: [hit(30, 'Before the fibre'), hit(77, 'Much the same')],
      }),
      'GET /api/notes/77': ok(
        aPage({ id: 77, row: { ...aPage().row, title: 'Much the same' }, marks: [lit(10)] }),
      ),
      'GET /api/notes/77/record?of=published': record(50),
    });
    show(aPage());
    const alike = await screen.findByRole('option', { name: /^Climbed like it: Much the same/ });
    expect(within(await menu()).getAllByRole('option')).toHaveLength(3);
    await userEvent.selectOptions(await menu(), alike);
    await screen.findAllByText('similar firing, “Much the same”');
  });

  it('offers only firings with a record, one’s own unpublished one as its author sees it', async () => {
    const sent = answerFetch({
      'GET /api/notes/31/record?of=published': record(60),
      'GET /api/notes/33/preview': ok(aPage({ id: 33, status: 'draft' })),
      'GET /api/notes/33/record?of=draft': record(30),
    });
    show(
      aPage({
        earlier: neighbour({ strip: null }),
        next: neighbour({ noteId: 33, status: 'draft', title: 'After it' }),
      }),
    );
    const options = within(await menu()).getAllByRole('option');
    expect(options.map((option) => option.textContent)).toEqual([
      'no other firing',
      expect.stringMatching(/^Next: After it/),
    ]);
    await userEvent.selectOptions(await menu(), 'next');
    await waitFor(() =>
      expect(sent.map(({ path }) => path)).toContain('/api/notes/33/record?of=draft'),
    );
  });

  it('fetches more readings of the part in sight, once where it rests, if there are more', async () => {
    const sent = answerFetch({
      'GET /api/notes/31/record?of=published': record(81, 50_000),
      'GET /api/notes/31/record?of=published&from=20.0000&to=80.0000': record(81, 50_000),
      'GET /api/notes/31/record?of=published&from=30.0000&to=60.0000': record(81, 50_000),
    });
    show(aPage({ earlier: null }));
    const user = userEvent.setup();
    const closer = await screen.findByRole('button', { name: 'Look closer' });
    await user.click(closer);
    await user.click(closer);
    const parts = () => sent.map(({ path }) => path).filter((path) => path.includes('from='));
    await waitFor(() => expect(parts().at(-1)).toContain('from=30.0000&to=60.0000'));
    expect(parts().length).toBeLessThanOrEqual(2);
    expect(screen.queryByLabelText('Lay over it')).not.toBeInTheDocument();
  });
});
