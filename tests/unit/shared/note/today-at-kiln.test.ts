import { describe, expect, it } from 'vitest';
import { emptyNoteFields } from '#shared/note/note-fields.ts';
import { todayAtKiln } from '#shared/note/today-at-kiln.ts';
import { kilnFields } from '../../../support/notes.ts';

const noteIn = (timeZone: string) => {
  const blank = emptyNoteFields();
  return { ...blank, when: { ...blank.when, timeZone } };
};
/** Half past nine in the evening of the last of May in Greenwich. */
const EVENING = new Date('2026-05-31T21:30:00Z');

describe('todayAtKiln', () => {
  it('is the day where the kiln stands, not the one in Greenwich', () => {
    expect(todayAtKiln(noteIn('Europe/Athens'), null, EVENING)).toBe('2026-06-01');
    expect(todayAtKiln(noteIn('Europe/London'), null, EVENING)).toBe('2026-05-31');
    expect(todayAtKiln(noteIn('America/New_York'), null, new Date('2026-06-01T02:00:00Z'))).toBe(
      '2026-05-31',
    );
  });

  it('goes by the note’s own zone before the kiln’s, which may have moved since', () => {
    const kiln = kilnFields({ timeZone: 'Asia/Tokyo' });
    expect(todayAtKiln(noteIn('Europe/London'), kiln, EVENING)).toBe('2026-05-31');
    expect(todayAtKiln(noteIn(''), kiln, EVENING)).toBe('2026-06-01');
    expect(todayAtKiln(noteIn('Nowhere/Known'), kiln, EVENING)).toBe('2026-06-01');
  });

  it('is the day that has begun anywhere where no zone is known', () => {
    const morning = new Date('2026-05-31T10:30:00Z');
    expect(todayAtKiln(noteIn(''), null, morning)).toBe('2026-06-01');
    expect(todayAtKiln(noteIn('Nowhere/Known'), null, morning)).toBe('2026-06-01');
  });
});
