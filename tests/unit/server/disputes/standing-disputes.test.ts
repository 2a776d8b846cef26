import { describe, expect, it } from 'vitest';
import type { Finding } from '#shared/firing/findings.ts';
import { emptyNoteFields } from '#shared/note/note-fields.ts';
import type { Dispute } from '../../../../server/disputes/dispute-repository.ts';
import {
  disputesAtPublishing,
  disputesWhenPublished,
  standingDisputes,
} from '../../../../server/disputes/standing-disputes.ts';

const STALL: Finding = {
  code: 'stall',
  trouble: 'stall',
  fromMinute: 28,
  toMinute: 46,
  numbers: { levelCelsius: 700, minutes: 18 },
  then: 'shut-off',
};
const REASON = 'The gas was turned down on purpose.';
const HANDED_IN = new Date('2026-06-02T10:00:00Z');
const before = new Date('2026-06-01T10:00:00Z');
const after = new Date('2026-06-03T10:00:00Z');

const row = (over: Partial<Dispute> = {}): Dispute => ({
  id: 4,
  noteId: 1,
  code: 'stall',
  minute: 28,
  sentence: REASON,
  state: 'disputed',
  version: 1,
  saidAt: before,
  answer: '',
  answeredBy: null,
  answeredAt: null,
  ...over,
});
const revision = (sentence: string | null, findings: Finding[] = [STALL]) => ({
  fields: {
    ...emptyNoteFields(),
    findingDisputes: sentence === null ? [] : [{ code: 'stall' as const, minute: 29, sentence }],
  },
  findings,
  createdAt: HANDED_IN,
});
const acts = (...given: Parameters<typeof disputesAtPublishing>) =>
  disputesAtPublishing(...given).map(({ act }) => act);

describe('publishing a revision', () => {
  it('puts in force what it disputes, and nothing whose sentence is not one', () => {
    expect(acts(revision(REASON), [])).toEqual(['add']);
    expect(acts(revision('No!'), [])).toEqual([]);
    expect(acts(revision(null), [])).toEqual([]);
  });

  it('keeps what it says unaltered, and words anew what it says otherwise', () => {
    expect(acts(revision(REASON), [row()])).toEqual(['keep']);
    expect(acts(revision('It was the wind that held it there.'), [row()])).toEqual(['say']);
  });

  it('ends what it no longer disputes, unless the author said it on the page since', () => {
    expect(acts(revision(null), [row()])).toEqual(['withdraw']);
    expect(acts(revision(null), [row({ saidAt: after })])).toEqual(['keep']);
  });

  it('does not bring back what was taken back on the page since it was handed in', () => {
    expect(acts(revision(REASON), [row({ state: 'withdrawn', saidAt: after })])).toEqual([]);
    expect(acts(revision(REASON), [row({ state: 'withdrawn' })])).toEqual(['say']);
  });

  it('never undoes what a moderator restored, whatever it says', () => {
    const restored = row({ state: 'restored' });
    expect(acts(revision('It was the wind that held it there.'), [restored])).toEqual(['keep']);
    expect(acts(revision(null), [restored])).toEqual(['keep']);
    expect(acts(revision(REASON, []), [restored])).toEqual([]);
  });

  it('ends a dispute whose finding is no longer made', () => {
    expect(acts(revision(null, []), [row()])).toEqual(['withdraw']);
    expect(acts(revision(null, [{ ...STALL, fromMinute: 32 }]), [row({ minute: 28 })])).toEqual([
      'withdraw',
    ]);
  });

  it('is shown to author and desk beforehand as it will be', () => {
    expect(disputesWhenPublished(revision(REASON), [])).toMatchObject([
      { id: null, code: 'stall', minute: 28, sentence: REASON, state: 'disputed', answer: null },
    ]);
    expect(disputesWhenPublished(revision(null), [row()])).toEqual([]);
  });
});

describe('the disputes of a published note', () => {
  it('are those in force about findings that are there', () => {
    expect(standingDisputes([STALL], [row({ minute: 26 })])).toMatchObject([{ id: 4 }]);
    expect(standingDisputes([STALL], [row({ state: 'withdrawn' })])).toEqual([]);
    expect(standingDisputes([], [row()])).toEqual([]);
  });

  it('carry the moderator’s answer once there is one', () => {
    const answered = row({
      state: 'restored',
      answer: 'The marks show the gas turned up.',
      answeredBy: { id: 9, name: 'Ada Weir' },
      answeredAt: after,
    });
    expect(standingDisputes([STALL], [answered])[0]).toMatchObject({
      state: 'restored',
      answer: {
        sentence: 'The marks show the gas turned up.',
        by: { name: 'Ada Weir' },
        at: after.toISOString(),
      },
    });
    expect(standingDisputes([STALL], [row()])[0]?.answer).toBeNull();
  });
});
