import { describe, expect, it } from 'vitest';
import type { Trouble } from '#shared/vocabulary/troubles.ts';
import { canHandIn } from '#shared/note/checks/check.ts';
import { checkNote } from '#shared/note/checks/check-note.ts';
import type { NoteFields } from '#shared/note/note-fields.ts';
import { aKiln, aNote, aReading, aStall } from '../a-note.ts';

const STALL = aStall();
const REASON = 'The gas was turned down on purpose.';
const about = (minute: number, sentence = REASON): NoteFields['findingDisputes'][number] => ({
  code: 'stall',
  minute,
  sentence,
});

function checksOf(
  disputes: NoteFields['findingDisputes'],
  levels = [STALL],
  troubles: Trouble[] = [],
) {
  const fields = aNote((note) => {
    note.findingDisputes = disputes;
    note.result.troubles = troubles;
  });
  return checkNote({
    fields,
    kiln: aKiln(),
    reading: aReading({ levels }),
    hasRecord: true,
    earlier: null,
    today: '2024-06-01',
  });
}
const codes = (...given: Parameters<typeof checksOf>) => checksOf(...given).map(({ code }) => code);

describe('checking a note whose author disagrees with a finding', () => {
  it('asks no more for a trouble that is disputed with a sentence', () => {
    expect(codes([])).toContain('stall-not-named');
    expect(codes([about(STALL.fromMinute)])).toEqual([]);
  });

  it('asks for the sentence, which nothing but a sentence or taking it back can close', () => {
    const checks = checksOf([about(STALL.fromMinute, '  It  ')]);
    expect(checks.map(({ code, kind, pointer }) => [code, kind, pointer])).toContainEqual([
      'dispute-without-reason',
      'must-mend',
      '/findingDisputes',
    ]);
    expect(canHandIn(checks, [])).toBe(false);
  });

  it('says nothing of a disagreement with a finding that is no longer there', () => {
    expect(codes([about(STALL.fromMinute + 10, '')])).not.toContain('dispute-without-reason');
    expect(codes([about(STALL.fromMinute, '')], [])).toEqual([]);
  });

  it('still asks for the trouble while one of two findings of it stands undisputed', () => {
    const later = { ...STALL, fromMinute: STALL.fromMinute + 30, toMinute: STALL.toMinute + 30 };
    expect(codes([about(STALL.fromMinute)], [STALL, later])).toContain('stall-not-named');
    expect(codes([about(STALL.fromMinute), about(later.fromMinute)], [STALL, later])).toEqual([]);
  });

  it('asks about a trouble that is both named and disputed, and offers to take it out', () => {
    const check = checksOf([about(STALL.fromMinute)], [STALL], ['stall', 'sag']).find(
      ({ code }) => code === 'stall-named-and-disputed',
    );
    expect(check).toMatchObject({ kind: 'look-again', offer: { value: ['sag'] } });
    expect(codes([], [STALL], ['stall'])).toEqual([]);
  });
});
