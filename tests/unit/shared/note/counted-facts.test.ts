import { describe, expect, it } from 'vitest';
import type { Finding } from '#shared/firing/findings.ts';
import { countedFacts } from '#shared/note/counted-facts.ts';
import type { FiringFacts } from '#shared/note/facts.ts';
import type { StandingDispute } from '#shared/note/finding-disputes.ts';
import { noteSummary } from '#shared/note/note-summary.ts';
import { aFiring } from '../../server/figures/a-firing.ts';
import { aNote } from './a-note.ts';

const finding = (
  code: Finding['code'],
  fromMinute: number,
  numbers: Record<string, number> = {},
): Finding => ({
  code,
  trouble:
    code === 'stall' || code === 'sag' || code === 'slow-climb' || code === 'overshoot'
      ? code
      : null,
  fromMinute,
  toMinute: fromMinute + 12,
  numbers,
  then: null,
});
const stall = (fromMinute: number, levelCelsius: number) => ({
  levelCelsius,
  fromMinute,
  toMinute: fromMinute + 12,
  minutes: 12,
  wentOn: false,
});
const disputeOf = (
  { code, fromMinute }: Finding,
  state: StandingDispute['state'] = 'disputed',
): StandingDispute => ({ code, minute: fromMinute, state });

const EARLY = finding('stall', 20, { levelCelsius: 640 });
const LATE = finding('stall', 40, { levelCelsius: 720 });
const SAG = finding('sag', 60, { topCelsius: 800, dropCelsius: 22 });
const FACTS: FiringFacts = {
  ...aFiring(),
  measuredTroubles: ['stall', 'sag'],
  namedTroubles: ['stall', 'crawling'],
  stalls: [stall(20, 640), stall(40, 720)],
  sags: [
    { topCelsius: 800, dropCelsius: 22 },
    { topCelsius: 870, dropCelsius: 31 },
  ],
};
const FINDINGS = [EARLY, LATE, SAG, finding('sag', 70, { topCelsius: 870, dropCelsius: 31 })];

describe('the facts that count', () => {
  it('are all of them where nothing is disputed', () => {
    expect(countedFacts(FACTS, FINDINGS, [])).toEqual({ ...FACTS, disputed: [] });
  });

  it('lose one disputed stall of two, and the firing is still one with a stall', () => {
    const counted = countedFacts(FACTS, FINDINGS, [disputeOf(EARLY)]);
    expect(counted.stalls.map(({ levelCelsius }) => levelCelsius)).toEqual([720]);
    expect(counted.measuredTroubles).toEqual(['stall', 'sag']);
    expect(counted.disputed).toEqual([]);
  });

  it('lose the trouble with its last finding, also where the author had ticked it', () => {
    const counted = countedFacts(FACTS, FINDINGS, [disputeOf(EARLY), disputeOf(LATE, 'left')]);
    expect(counted.stalls).toEqual([]);
    expect(counted.measuredTroubles).toEqual(['sag']);
    expect(counted.namedTroubles).toEqual(['crawling']);
    expect(counted.disputed).toEqual(['stall']);
  });

  it('have a restored finding again', () => {
    const counted = countedFacts(FACTS, FINDINGS, [
      disputeOf(EARLY, 'restored'),
      disputeOf(LATE, 'restored'),
    ]);
    expect(counted).toEqual({ ...FACTS, disputed: [] });
  });

  it('lose the very sag that is disputed', () => {
    const counted = countedFacts(FACTS, FINDINGS, [disputeOf(SAG)]);
    expect(counted.sags).toEqual([{ topCelsius: 870, dropCelsius: 31 }]);
    expect(counted.measuredTroubles).toContain('sag');
  });

  it('do without the number that a disputed finding tells, and without no other', () => {
    const numbers: FiringFacts = {
      ...FACTS,
      timeToTemperatureMinutes: 41,
      peakCelsius: 1030,
      holdMinutes: 4,
      crossingRatePerMinute: 19,
      rate400To700: 17,
    };
    const each = {
      reached: { timeToTemperatureMinutes: null },
      overshoot: { peakCelsius: null },
      'not-reached': { peakCelsius: null },
      hold: { holdMinutes: null },
    } as const;
    for (const [code, without] of Object.entries(each)) {
      const one = finding(code as Finding['code'], 90);
      const { disputed: _disputed, ...counted } = countedFacts(
        numbers,
        [...FINDINGS, one],
        [disputeOf(one)],
      );
      expect(counted, code).toEqual({ ...numbers, ...without });
    }
  });

  it('do without the rates when the last crossing is disputed, not when an earlier one is', () => {
    const first = finding('quartz-crossing', 15);
    const last = finding('quartz-crossing', 33);
    const rates = (dispute: Finding) => {
      const counted = countedFacts(
        { ...FACTS, crossingRatePerMinute: 19, rate400To700: 17 },
        [first, last],
        [disputeOf(dispute)],
      );
      return [counted.crossingRatePerMinute, counted.rate400To700];
    };
    expect(rates(first)).toEqual([19, 17]);
    expect(rates(last)).toEqual([null, null]);
  });

  it('leave a disputed stall out of what is said in short', () => {
    const levels = (disputes: StandingDispute[]) =>
      noteSummary(aNote(), countedFacts(FACTS, FINDINGS, disputes), false).levels.length;
    expect(levels([])).toBe(2);
    expect(levels([disputeOf(LATE)])).toBe(1);
  });
});
