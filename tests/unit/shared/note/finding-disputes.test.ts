import { describe, expect, it } from 'vitest';
import type { Finding } from '#shared/firing/findings.ts';
import {
  disputeAbout,
  draftDisputeSchema,
  findingMeant,
  isReason,
  levelAnswerAbout,
  reasonedDisputes,
  reasonSchema,
  withDispute,
} from '#shared/note/finding-disputes.ts';

const finding = (code: Finding['code'], fromMinute: number): Finding => ({
  code,
  trouble: code === 'stall' || code === 'sag' ? code : null,
  fromMinute,
  toMinute: fromMinute + 10,
  numbers: {},
  then: null,
});
const REASON = 'The probe had slipped out of the port.';

describe('the finding that a disagreement is about', () => {
  const early = finding('stall', 20);
  const late = finding('stall', 25);
  const sag = finding('sag', 21);
  const findings = [early, sag, late];

  it('is that of the same code which begins nearest', () => {
    expect(findingMeant(findings, { code: 'stall', minute: 20 })).toBe(early);
    expect(findingMeant(findings, { code: 'stall', minute: 22.4 })).toBe(early);
    expect(findingMeant(findings, { code: 'stall', minute: 22.6 })).toBe(late);
    expect(findingMeant(findings, { code: 'sag', minute: 22.6 })).toBe(sag);
  });

  it('is found again where a re-reading moved it by up to three minutes, and no farther', () => {
    expect(findingMeant([late], { code: 'stall', minute: 28 })).toBe(late);
    expect(findingMeant([late], { code: 'stall', minute: 22 })).toBe(late);
    expect(findingMeant([late], { code: 'stall', minute: 28.1 })).toBeNull();
    expect(findingMeant([late], { code: 'stall', minute: 21.9 })).toBeNull();
  });

  it('is nothing once the record no longer shows one of that code', () => {
    expect(findingMeant([sag], { code: 'stall', minute: 21 })).toBeNull();
    expect(findingMeant([finding('pause', 20)], { code: 'stall', minute: 20 })).toBeNull();
  });

  it('gives each finding its own disagreement, the last where there are several', () => {
    const first = { code: 'stall', minute: 20, n: 1 } as const;
    const second = { code: 'stall', minute: 21, n: 2 } as const;
    const other = { code: 'stall', minute: 25, n: 3 } as const;
    expect(disputeAbout(early, findings, [first, second, other])).toBe(second);
    expect(disputeAbout(late, findings, [first, second, other])).toBe(other);
    expect(disputeAbout(sag, findings, [first, second, other])).toBeNull();
  });
});

describe('the sentence of a disagreement', () => {
  it('has ten to three hundred characters without the blanks at its ends', () => {
    expect(isReason('too short')).toBe(false);
    expect(isReason('   spaces    ')).toBe(false);
    expect(isReason('ten chars!')).toBe(true);
    expect(reasonSchema.safeParse(' nine long ').success).toBe(false);
    expect(reasonSchema.parse(`  ${REASON} `)).toBe(REASON);
    expect(reasonSchema.safeParse('x'.repeat(300)).success).toBe(true);
    expect(reasonSchema.safeParse('x'.repeat(301)).success).toBe(false);
    expect(reasonSchema.safeParse('a bell\u0007 rings here').success).toBe(false);
  });

  it('counts characters as people do, not in UTF-16', () => {
    expect(isReason('🔥'.repeat(9))).toBe(false);
    expect(isReason('🔥'.repeat(10))).toBe(true);
    expect(reasonSchema.safeParse('🔥'.repeat(300)).success).toBe(true);
  });

  it('is kept in a draft also while it is being typed, and does not count until it is one', () => {
    const stall = finding('stall', 20);
    const typing = draftDisputeSchema.parse({ code: 'stall', minute: 20, sentence: 'The' });
    expect(reasonedDisputes([stall], [typing])).toEqual([]);
    expect(reasonedDisputes([stall], [{ ...typing, sentence: `${REASON} ` }])).toEqual([
      { finding: stall, sentence: REASON },
    ]);
  });
});

describe('disagreeing in a draft', () => {
  const early = finding('stall', 20);
  const late = finding('stall', 25);
  const findings = [early, late];

  it('adds one, words it anew in its place, and takes it back without touching another', () => {
    const one = withDispute(findings, [], early, '');
    expect(one).toEqual([{ code: 'stall', minute: 20, sentence: '' }]);
    const both = withDispute(findings, one, late, REASON);
    const worded = withDispute(findings, both, early, 'We lowered the gas on purpose.');
    expect(worded.map(({ minute, sentence }) => [minute, sentence])).toEqual([
      [20, 'We lowered the gas on purpose.'],
      [25, REASON],
    ]);
    expect(withDispute(findings, worded, early, null)).toEqual([
      { code: 'stall', minute: 25, sentence: REASON },
    ]);
  });
});

describe('the answer to a level stretch', () => {
  it('is told beside a stall or a pause within three minutes of it, the last one given', () => {
    const answers = [
      { fromMinute: 20, answer: 'meant' },
      { fromMinute: 21, answer: 'stuck' },
    ];
    expect(levelAnswerAbout(finding('stall', 19), answers)?.answer).toBe('stuck');
    expect(levelAnswerAbout(finding('pause', 24), answers)?.answer).toBe('stuck');
    expect(levelAnswerAbout(finding('stall', 25), answers)).toBeNull();
    expect(levelAnswerAbout(finding('sag', 20), answers)).toBeNull();
  });
});
