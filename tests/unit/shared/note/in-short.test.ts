import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { firingFacts } from '#shared/note/facts.ts';
import { inShort } from '#shared/note/in-short.ts';
import type { NoteSummary } from '#shared/note/in-short.ts';
import { noteSummary } from '#shared/note/note-summary.ts';
import { IMPERIAL_UNITS, METRIC_UNITS } from '#shared/units/units.ts';
import { CHANGE_IDS } from '#shared/vocabulary/changes.ts';
import { CRACK_PLACES, FORM_IDS, MELTS } from '#shared/vocabulary/ware.ts';
import { idsOf } from '#shared/vocabulary/terms.ts';
import { aKiln, aNote, aPiece, aReading, aStall } from './a-note.ts';

const STALLED: NoteSummary = {
  peakCelsius: 712,
  targetCelsius: 1000,
  reached: false,
  aimCelsius: 1000,
  timeToTemperatureMinutes: null,
  holdMinutes: null,
  levels: [{ levelCelsius: 708, atMinute: 29, minutes: 17 }],
  sags: [],
  pieces: [
    { form: 'bowl', count: 2, whole: true, melt: 'matured', crackPlace: null, cracked: false },
    { form: 'flat-plate', count: 1, whole: false, melt: null, crackPlace: 'base', cracked: true },
  ],
  changes: ['floor-insulated'],
};
const REACHED: NoteSummary = {
  ...STALLED,
  reached: true,
  levels: [],
  peakCelsius: 1005,
  timeToTemperatureMinutes: 32,
  holdMinutes: 4,
};
const said = (summary: NoteSummary, units = METRIC_UNITS): string[] =>
  inShort(summary, units).map((sentence) => sentence.replaceAll('\u00A0', ' '));
const climb = (over: Partial<NoteSummary>): string | undefined => said({ ...REACHED, ...over })[0];
const pieces = (...rows: Partial<NoteSummary['pieces'][number]>[]): string | undefined =>
  said({
    ...REACHED,
    pieces: rows.map((row) => ({
      form: 'bowl',
      count: 1,
      whole: true,
      melt: 'matured',
      crackPlace: null,
      cracked: false,
      ...row,
    })),
  })[2];

describe('a note in short', () => {
  it('tells the climb, the change and the ware', () => {
    expect(said(STALLED)).toEqual([
      'Climbed to 708 °C in 29 minutes and stayed there for 17.',
      'Floor insulated since the firing before.',
      'Two bowls whole, one plate cracked through the base.',
    ]);
  });

  it.each<[Partial<NoteSummary>, string]>([
    [{}, 'Came to 1000 °C in 32 minutes and held there for 4.'],
    [{ holdMinutes: 0 }, 'Came to 1000 °C in 32 minutes and was not held.'],
    [{ holdMinutes: null }, 'Came to 1000 °C in 32 minutes.'],
    [
      { timeToTemperatureMinutes: null, holdMinutes: 1 },
      'Came to 1000 °C and held there for 1 minute.',
    ],
    [
      { timeToTemperatureMinutes: 145 },
      'Came to 1000 °C in 2 hours and 25 minutes and held there for 4.',
    ],
    [
      { levels: [{ levelCelsius: 700, atMinute: 20, minutes: 8 }] },
      'Climbed to 700 °C in 20 minutes, stayed there for 8, and came to 1000 °C after 32 minutes.',
    ],
    [
      { sags: [{ topCelsius: 820, dropCelsius: 35 }], holdMinutes: null },
      'Came to 1000 °C in 32 minutes, after falling back 35 °C from 820 °C.',
    ],
    [{ reached: false, peakCelsius: 870 }, 'Climbed to 870 °C, 130 °C short of the aim.'],
    [
      { aimCelsius: null, peakCelsius: null, reached: null, timeToTemperatureMinutes: 45 },
      'Fired by eye in 45 minutes and held there for 4.',
    ],
    [
      {
        aimCelsius: null,
        peakCelsius: null,
        reached: null,
        timeToTemperatureMinutes: null,
        holdMinutes: null,
      },
      'Fired by eye.',
    ],
  ])('says of the climb %j: %s', (over, sentence) => {
    expect(climb(over)).toBe(sentence);
  });

  it('speaks °F to those who read it, differences included', () => {
    expect(said(STALLED, IMPERIAL_UNITS)[0]).toBe(
      'Climbed to 1306 °F in 29 minutes and stayed there for 17.',
    );
    expect(said({ ...REACHED, reached: false, peakCelsius: 900 }, IMPERIAL_UNITS)[0]).toBe(
      'Climbed to 1652 °F, 180 °F short of the aim.',
    );
  });

  it('lists changes, and counts them beyond the third', () => {
    const changes = (...of: NonNullable<NoteSummary['changes']>[number][]) =>
      said({ ...REACHED, changes: of })[1];
    expect(changes()).toBe('No change named since the firing before.');
    expect(changes('gas-less', 'quenched')).toBe(
      'Less gas and ware quenched since the firing before.',
    );
    expect(changes('gas-less', 'faster', 'form', 'clay', 'glaze')).toBe(
      'Less gas, faster climb, other form and two more changes since the firing before.',
    );
    expect(said({ ...REACHED, changes: null })[1]).toBe('No change named.');
  });

  it('counts like pieces together, in words up to twelve', () => {
    expect(pieces({ count: 1 }, { count: 1 })).toBe('Two bowls whole.');
    expect(pieces({ form: 'box', count: 2 })).toBe('Two boxes whole.');
    expect(pieces({ form: null, count: 13 })).toBe('13 pieces whole.');
    expect(pieces({ melt: 'under-fired' })).toBe('One bowl whole but under-fired.');
    expect(pieces({ whole: false })).toBe('One bowl not whole.');
    expect(pieces({ whole: null, melt: null })).toBe('One bowl with no result given.');
    expect(pieces({ cracked: true })).toBe('One bowl cracked.');
    expect(pieces()).toBe('No pieces named.');
  });

  it('is made of a note’s fields and facts', () => {
    const fields = aNote((note) => {
      note.plan.drawnBecause = 'gave-up';
      note.pieces = [aPiece({ count: 3 })];
      note.changes = [{ change: 'wind-shelter', purpose: '' }];
    });
    const reading = aReading({
      start: { minute: 2, inferred: false },
      levels: [aStall()],
      reachedMinute: null,
      timeToTemperatureMinutes: null,
    });
    expect(
      said(noteSummary(fields, firingFacts({ fields, kiln: aKiln(), reading }), true)),
    ).toEqual([
      'Climbed to 708 °C in 27 minutes and stayed there for 17.',
      'Wind shelter put up since the firing before.',
      'Three bowls whole.',
    ]);
    const first = aNote();
    const facts = firingFacts({ fields: first, kiln: aKiln(), reading: null });
    expect(said(noteSummary(first, facts, false))[1]).toBe('No change named.');
  });
});

describe('the grammar of a note in short', () => {
  const maybe = <T>(arbitrary: fc.Arbitrary<T>) => fc.option(arbitrary, { nil: null });
  const celsius = fc.double({ min: -40, max: 1400, noNaN: true });
  const minutes = fc.double({ min: 0, max: 3000, noNaN: true });
  const summaries: fc.Arbitrary<NoteSummary> = fc.record({
    peakCelsius: maybe(celsius),
    targetCelsius: maybe(celsius),
    reached: maybe(fc.boolean()),
    aimCelsius: maybe(celsius),
    timeToTemperatureMinutes: maybe(minutes),
    holdMinutes: maybe(minutes),
    levels: fc.array(fc.record({ levelCelsius: celsius, atMinute: maybe(minutes), minutes }), {
      maxLength: 3,
    }),
    sags: fc.array(fc.record({ topCelsius: celsius, dropCelsius: minutes }), { maxLength: 3 }),
    pieces: fc.array(
      fc.record({
        form: maybe(fc.constantFrom(...FORM_IDS)),
        count: fc.integer({ min: 0, max: 100 }),
        whole: maybe(fc.boolean()),
        melt: maybe(fc.constantFrom(...idsOf(MELTS))),
        crackPlace: maybe(fc.constantFrom(...idsOf(CRACK_PLACES))),
        cracked: fc.boolean(),
      }),
      { maxLength: 6 },
    ),
    changes: maybe(fc.uniqueArray(fc.constantFrom(...CHANGE_IDS), { maxLength: 20 })),
  });

  it('holds for every combination of what is known and what is not', () => {
    fc.assert(
      fc.property(summaries, fc.constantFrom(METRIC_UNITS, IMPERIAL_UNITS), (summary, units) => {
        const sentences = inShort(summary, units);
        expect(sentences).toHaveLength(3);
        for (const sentence of sentences) {
          expect(sentence).toMatch(/^[A-Z0-9][^.]*\.$/);
          expect(sentence).not.toMatch(/\s{2}|\s[.,]|,,|undefined|NaN|null|Infinity|–/);
          expect(sentence).not.toMatch(/\b(one|1) (\w+ )?(minutes|pieces|bowls|plates|changes)\b/);
          expect(sentence).not.toMatch(/\band and\b|, and \w+ and was/);
        }
      }),
      { numRuns: 2000 },
    );
  });
});
