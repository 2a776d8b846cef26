import { describe, expect, it } from 'vitest';
import { checkNote } from '#shared/note/checks/check-note.ts';
import { emptyNoteFields, type NoteFields } from '#shared/note/note-fields.ts';
import { isDueBeside } from '../../../src/write/begun-parts.ts';
import { blankPiece } from '../../../src/write/blank-piece.ts';

const blank = emptyNoteFields();
const due = (fields: NoteFields): string[] =>
  checkNote({
    fields,
    kiln: null,
    reading: null,
    hasRecord: false,
    earlier: null,
    today: '2026-06-01',
  })
    .filter((check) => isDueBeside(check, fields))
    .map(({ code }) => code);

describe('checks beside the fields of a form just begun', () => {
  it('are none on a blank note, whatever the kiln and the settings filled in', () => {
    expect(due(blank)).toEqual([]);
    expect(
      due({
        ...blank,
        when: { ...blank.when, timeZone: 'Europe/London' },
        plan: { ...blank.plan, typedIn: 'F' },
        pieces: [blankPiece()],
      }),
    ).toEqual([]);
  });

  it('ask for the rest of a part once something of it is filled in, and of no other part', () => {
    const codes = due({ ...blank, when: { ...blank.when, date: '2026-05-02' } });
    expect(codes).toEqual(['start-time-missing', 'start-class-missing']);
  });

  it('ask for the rest of a row of pieces, and not of the blank row beside it', () => {
    const pieces = [{ ...blankPiece(), form: 'bowl' as const }, blankPiece()];
    const checks = checkNote({
      fields: { ...blank, pieces },
      kiln: null,
      reading: null,
      hasRecord: false,
      earlier: null,
      today: '2026-06-01',
    }).filter((check) => isDueBeside(check, { ...blank, pieces }));
    expect(checks.length).toBeGreaterThan(2);
    expect(checks.every(({ pointer }) => pointer.startsWith('/pieces/0'))).toBe(true);
  });

  it('say at once what is wrong, begun or not', () => {
    expect(due({ ...blank, setUp: { ...blank.setUp, airCelsius: 99 } })).toContain('out-of-range');
  });
});
