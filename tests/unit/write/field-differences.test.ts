import { describe, expect, it } from 'vitest';
import { emptyNoteFields, type NoteFields } from '#shared/note/note-fields.ts';
import { METRIC_UNITS } from '#shared/units/units.ts';
import { fieldDifferences, sameFields } from '../../../src/write/field-differences.ts';

const blank = emptyNoteFields();
const withSetUp = (setUp: Partial<NoteFields['setUp']>): NoteFields => ({
  ...blank,
  setUp: { ...blank.setUp, ...setUp },
});

describe('what differs between two versions of a note', () => {
  it('is nothing between equal versions, whatever the order of their members', () => {
    const reversed = Object.fromEntries(Object.entries(blank).reverse()) as NoteFields;
    expect(sameFields(blank, reversed)).toBe(true);
    expect(fieldDifferences(blank, reversed, METRIC_UNITS)).toEqual([]);
  });

  it('tells zero from blank', () => {
    expect(
      fieldDifferences(withSetUp({ lidGapMm: 0 }), withSetUp({ lidGapMm: null }), METRIC_UNITS),
    ).toEqual([{ pointer: '/setUp/lidGapMm', label: 'Lid gap', mine: '0\u00a0mm', theirs: '' }]);
  });

  it('shows temperatures and lengths in the reader’s units', () => {
    const mine: NoteFields = {
      ...withSetUp({ burnerSetbackMm: 50.8 }),
      plan: { ...blank.plan, targetCelsius: 1010 },
    };
    const shown = fieldDifferences(mine, blank, { temperature: 'F', system: 'imperial' });
    expect(shown.map(({ label, mine: here }) => `${label}: ${here}`)).toEqual([
      'Burner setback: 2\u00a0in',
      'Target: 1850\u00a0°F',
    ]);
  });

  it('tells of readings by their number, even where only one in the middle differs', () => {
    const rows = (middle: number): NoteFields => ({
      ...blank,
      record: {
        ...blank.record,
        typedRows: [20, middle, 300].map((celsius, minute) => ({ minute, celsius })),
      },
    });
    expect(fieldDifferences(rows(100), blank, METRIC_UNITS)[0]?.mine).toBe(
      '3 rows, the last 300\u00a0°C at 2\u00a0min',
    );
    const found = fieldDifferences(rows(100), rows(101), METRIC_UNITS);
    expect(found.map(({ label }) => label)).toEqual(['Typed readings']);
  });
});
