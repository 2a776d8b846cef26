import { describe, expect, it } from 'vitest';
import {
  gapWords,
  isInWork,
  notesByKiln,
  type NotebookNote,
} from '../../../src/notes/notebook-groups.ts';

function note(id: number, traits: Partial<NotebookNote> = {}): NotebookNote {
  return {
    id,
    slug: '',
    title: `Firing ${String(id)}`,
    status: 'published',
    published: true,
    revising: false,
    kiln: { id: 1, name: 'Drum' },
    firedOn: '2026-05-02',
    savedAt: '2026-05-03T10:00:00.000Z',
    strip: null,
    stripWords: '',
    openChecks: 0,
    openRemarks: 0,
    peakCelsius: null,
    timeToTemperatureMinutes: null,
    changes: [],
    decisionReason: null,
    ...traits,
  };
}
const order = (notes: NotebookNote[]) =>
  notesByKiln(notes).map(({ kiln, notes: group }) => [
    kiln?.name ?? null,
    group.map(({ id }) => id),
  ]);

describe('the notebook by kiln', () => {
  it('puts each kiln’s firings newest first, and the kiln fired last before the others', () => {
    const box = { id: 2, name: 'Box' };
    expect(
      order([
        note(1, { firedOn: '2026-03-01' }),
        note(2, { firedOn: '2026-06-01', kiln: box }),
        note(3, { firedOn: '2026-05-01' }),
        note(4, { firedOn: '2026-01-01', kiln: box }),
      ]),
    ).toEqual([
      ['Box', [2, 4]],
      ['Drum', [3, 1]],
    ]);
  });

  it('puts a draft without a day before the dated ones, and notes without a kiln at the end', () => {
    expect(
      order([
        note(1, { kiln: null, firedOn: '2026-09-09' }),
        note(2),
        note(3, { firedOn: null, status: 'draft' }),
      ]),
    ).toEqual([
      ['Drum', [3, 2]],
      [null, [1]],
    ]);
  });

  it('counts what waits for its author: drafts, notes sent back, remarks left', () => {
    expect(isInWork(note(1))).toBe(false);
    expect(isInWork(note(1, { status: 'handed-in' }))).toBe(false);
    expect(isInWork(note(1, { status: 'sent-back' }))).toBe(true);
    expect(isInWork(note(1, { openRemarks: 1 }))).toBe(true);
  });
});

describe('the time between two firings in words', () => {
  it('is told in days, then months, then years', () => {
    expect(gapWords('2026-05-02', '2026-05-02')).toBe('the same day');
    expect(gapWords('2026-05-02', '2026-05-03')).toBe('a day later');
    expect(gapWords('2026-05-02', '2026-05-21')).toBe('19 days later');
    expect(gapWords('2026-01-01', '2026-07-01')).toBe('6 months later');
    expect(gapWords('2023-01-01', '2026-01-01')).toBe('3 years later');
  });

  it('is not told where a day is not known', () => {
    expect(gapWords(null, '2026-05-03')).toBeNull();
    expect(gapWords('2026-05-02', null)).toBeNull();
  });
});
