import { describe, expect, it } from 'vitest';
import type { Trouble } from '#shared/vocabulary/troubles.ts';
import { outcomesBetween } from '../../../../server/figures/outcomes-between.ts';
import { pairsFor } from '../../../../server/figures/pairs.ts';
import type { Pair, PublishedFiring } from '../../../../server/figures/pairs.ts';
import { aFiring, aStalled, pieceOf } from './a-firing.ts';

type Over = Partial<PublishedFiring>;

/** The pair of two firings of one kiln on following days. */
function pairOf(trouble: Trouble, before: Over, now: Over): Pair {
  const kiln = { kilnId: 900, memberId: 900 };
  const pairs = pairsFor(trouble, [
    aFiring({ ...kiln, firedOn: '2024-05-02', ...now }),
    aFiring({ ...kiln, firedOn: '2024-05-01', ...before }),
  ]).filter(({ laterNoteId }) => laterNoteId !== null);
  const [pair] = pairs;
  if (!pair || pairs.length > 1) throw new Error(`${String(pairs.length)} pairs`);
  return pair;
}
const stalled: Over = {
  measuredTroubles: ['stall'],
  stalls: [{ levelCelsius: 708, fromMinute: 29, toMinute: 46, minutes: 17, wentOn: false }],
  peakCelsius: 712,
};

describe('pairing a trouble with the next firing', () => {
  it('takes the same kiln’s next firing by date and then by time, whatever the order given', () => {
    const kiln = { kilnId: 901 };
    const evening = aFiring({ ...kiln, firedOn: '2024-05-01', startTime: '19:00' });
    const morning = aStalled({ ...kiln, firedOn: '2024-05-01', startTime: '09:00' });
    const later = aFiring({ ...kiln, firedOn: '2024-06-01' });
    const otherKiln = aFiring({ firedOn: '2024-05-01', startTime: '10:00' });
    const pairs = pairsFor('stall', [later, evening, otherKiln, morning]);
    expect(pairs.map((pair) => [pair.earlierNoteId, pair.laterNoteId])).toEqual([
      [morning.noteId, evening.noteId],
    ]);
  });

  it('counts as left out a firing without a next one', () => {
    expect(pairsFor('stall', [aStalled()])[0]).toMatchObject({
      leftOut: 'no-follow-on',
      outcome: null,
      countsFor: [],
    });
  });

  it('never pairs a cold start with a hot one', () => {
    expect(pairOf('stall', stalled, { startClass: 'hot' }).leftOut).toBe('other-start');
    expect(pairOf('stall', { ...stalled, startClass: 'hot' }, { startClass: 'hot' })).toMatchObject(
      { startClass: 'hot', leftOut: null, outcome: 'gone' },
    );
    expect(pairOf('stall', { ...stalled, startClass: null }, { startClass: null }).leftOut).toBe(
      'other-start',
    );
  });

  it('leaves out a pair with firings in between, and takes a blank for no “none”', () => {
    expect(pairOf('stall', stalled, { unreportedFirings: 1 }).leftOut).toBe('unreported');
    expect(pairOf('stall', stalled, { unreportedFirings: null }).leftOut).toBe('unreported');
  });

  it('leaves out a disputed finding of either firing', () => {
    expect(pairOf('stall', { ...stalled, disputed: ['stall'] }, {}).leftOut).toBe('disputed');
    expect(pairOf('stall', stalled, { disputed: ['stall'] }).leftOut).toBe('disputed');
    expect(pairOf('stall', stalled, { disputed: ['sag'] }).leftOut).toBeNull();
  });

  it('counts a disputed finding as disputed also where nothing was fired since', () => {
    const [pair] = pairsFor('stall', [
      aFiring({ disputed: ['stall'], measuredTroubles: [], namedTroubles: [] }),
    ]);
    expect(pair).toMatchObject({ source: 'measured', leftOut: 'disputed', laterNoteId: null });
  });

  it('says nothing of what came of a trouble that either firing disputes', () => {
    const outcome = (before: Over, now: Over) =>
      outcomesBetween(aStalled(before), aFiring(now)).map((each) => each.outcome);
    expect(outcome({}, {})).toEqual(['gone']);
    expect(outcome({}, { disputed: ['stall'] })).toEqual(['cannot-say']);
    expect(outcome({ disputed: ['stall'], measuredTroubles: [] }, {})).toEqual([]);
  });

  it('keeps measured and author-named troubles apart', () => {
    const named: Over = { namedTroubles: ['overshoot'], hasRecord: false };
    expect(pairOf('overshoot', named, { hasRecord: false })).toMatchObject({
      source: 'named',
      outcome: 'gone',
    });
    expect(pairOf('overshoot', named, {}).leftOut).toBe('not-comparable');
    const both: Over = { measuredTroubles: ['overshoot'], namedTroubles: ['overshoot'] };
    expect(pairOf('overshoot', both, {}).source).toBe('measured');
    expect(pairsFor('overshoot', [aFiring({ namedTroubles: ['overshoot'] })])).toEqual([]);
  });

  it('counts one pair for each trouble and change of a kiln in a season', () => {
    const kiln = { kilnId: 902, changes: ['floor-insulated'] as const };
    const firings = [
      aStalled({ ...kiln, firedOn: '2024-05-01' }),
      aStalled({ ...kiln, firedOn: '2024-05-02' }),
      aStalled({ ...kiln, firedOn: '2024-05-03', changes: ['floor-insulated', 'gas-less'] }),
      aFiring({ ...kiln, firedOn: '2025-05-04', season: '2025' }),
    ];
    expect(pairsFor('stall', firings).map(({ countsFor }) => countsFor)).toEqual([
      ['floor-insulated'],
      ['gas-less'],
      ['floor-insulated'],
    ]);
  });
});

describe('whether a trouble was gone', () => {
  it.each<[string, Trouble, Over, Over, string]>([
    ['passed the level by 50', 'stall', stalled, { peakCelsius: 760, targetCelsius: 1000 }, 'gone'],
    [
      'came near the lower aim',
      'stall',
      { ...stalled, aimCelsius: 750 },
      { peakCelsius: 736 },
      'gone',
    ],
    ['gave up early', 'stall', stalled, { peakCelsius: 740, aimCelsius: 1000 }, 'cannot-say'],
    ['levelled off higher', 'stall', stalled, { ...stalled, peakCelsius: 900 }, 'not-gone'],
    [
      'fell back again',
      'sag',
      { measuredTroubles: ['sag'], sags: [{ topCelsius: 820, dropCelsius: 40 }] },
      { sags: [{ topCelsius: 850, dropCelsius: 20 }] },
      'not-gone',
    ],
    [
      'took four fifths of the time',
      'slow-climb',
      { measuredTroubles: ['slow-climb'], timeToTemperatureMinutes: 100 },
      { timeToTemperatureMinutes: 80 },
      'gone',
    ],
    [
      'was a little quicker',
      'slow-climb',
      { measuredTroubles: ['slow-climb'], timeToTemperatureMinutes: 100 },
      { timeToTemperatureMinutes: 81 },
      'not-gone',
    ],
    [
      'was quicker and still slow',
      'slow-climb',
      { measuredTroubles: ['slow-climb'], timeToTemperatureMinutes: 100 },
      { measuredTroubles: ['slow-climb'], timeToTemperatureMinutes: 70 },
      'not-gone',
    ],
    ['lit and stayed lit', 'flame-out', { namedTroubles: ['flame-out'] }, {}, 'gone'],
    [
      'was as cold',
      'tank-chill',
      { namedTroubles: ['tank-chill'], airCelsius: 5 },
      { namedTroubles: ['tank-chill'], airCelsius: 15 },
      'not-gone',
    ],
    [
      'kept its plate whole',
      'crack-in-firing',
      {
        namedTroubles: ['crack-in-firing'],
        pieces: [pieceOf({ family: 'plate', spanMm: 300, crackedInFiring: true })],
      },
      { pieces: [pieceOf({ family: 'plate', spanMm: 390 })] },
      'gone',
    ],
    [
      'cracked a plate only after the draw',
      'crack-in-firing',
      {
        namedTroubles: ['crack-in-firing'],
        pieces: [pieceOf({ family: 'plate', spanMm: 300, crackedInFiring: true })],
      },
      { pieces: [pieceOf({ family: 'plate', spanMm: 300, crackedAfterDraw: true })] },
      'gone',
    ],
    [
      'was dull again in that glaze',
      'dull-glaze',
      {
        namedTroubles: ['dull-glaze'],
        pieces: [pieceOf({ glazeFamily: 'crackle', melt: 'under-fired' })],
      },
      { pieces: [pieceOf({ glazeFamily: 'crackle', melt: 'under-fired' })] },
      'not-gone',
    ],
    [
      'came out black and as hoped',
      'weak-reduction',
      { namedTroubles: ['weak-reduction'], pieces: [pieceOf({ bareClay: 'pale' })] },
      { pieces: [pieceOf({ bareClay: 'black', colour: 'as-hoped' })] },
      'gone',
    ],
    [
      'came out black, colour not said',
      'weak-reduction',
      { namedTroubles: ['weak-reduction'], pieces: [pieceOf({ bareClay: 'pale' })] },
      { pieces: [pieceOf({ bareClay: 'black', colour: null })] },
      'cannot-say',
    ],
  ])('when the next firing %s (%s)', (_what, trouble, before, now, outcome) => {
    expect(pairOf(trouble, before, now)).toMatchObject({ leftOut: null, outcome });
  });

  it.each<[string, Trouble, Over, Over]>([
    ['a lower target', 'stall', stalled, { targetCelsius: 949 }],
    ['no record', 'stall', stalled, { hasRecord: false }],
    [
      'a time not known',
      'slow-climb',
      { measuredTroubles: ['slow-climb'] },
      { timeToTemperatureMinutes: null },
    ],
    [
      'one probe',
      'uneven-heat',
      { measuredTroubles: ['uneven-heat'], hasSecondProbe: true },
      { hasSecondProbe: false },
    ],
    [
      'warmer air',
      'tank-chill',
      { namedTroubles: ['tank-chill'], airCelsius: 5 },
      { airCelsius: 16 },
    ],
    [
      'a smaller plate',
      'crack-in-firing',
      {
        namedTroubles: ['crack-in-firing'],
        pieces: [pieceOf({ family: 'plate', spanMm: 300, crackedInFiring: true })],
      },
      { pieces: [pieceOf({ family: 'plate', spanMm: 200 })] },
    ],
    [
      'another glaze',
      'crawling',
      {
        namedTroubles: ['crawling'],
        pieces: [pieceOf({ glazeFamily: 'crackle', faults: ['crawling'] })],
      },
      { pieces: [pieceOf({ glazeFamily: 'lustre' })] },
    ],
    [
      'another route',
      'weak-reduction',
      { namedTroubles: ['weak-reduction'], pieces: [pieceOf({ bareClay: 'pale' })] },
      { pieces: [pieceOf({ route: 'horsehair' })] },
    ],
  ])('is not asked with %s', (_what, trouble, before, now) => {
    const pair = pairOf(trouble, before, now);
    expect(pair.leftOut).toBe('not-comparable');
    expect(pair.because).not.toBeNull();
  });

  it('is provisional for cracks until the author has confirmed it', () => {
    const before: Over = {
      namedTroubles: ['crack-after-draw'],
      pieces: [pieceOf({ spanMm: 100, crackedAfterDraw: true })],
    };
    const whole: Over = { pieces: [pieceOf({ spanMm: 100 })] };
    expect(pairOf('crack-after-draw', before, whole).provisional).toBe(true);
    expect(
      pairOf('crack-after-draw', before, { ...whole, cracksConfirmed: true }).provisional,
    ).toBe(false);
  });
});

describe('the outcomes between two firings', () => {
  it('say of each trouble whether it was gone, or that it cannot be said', () => {
    const before = aStalled({ namedTroubles: ['stall', 'flame-out', 'tank-chill'] });
    expect(outcomesBetween(before, aFiring({ namedTroubles: ['flame-out'] }))).toEqual([
      { trouble: 'stall', outcome: 'gone' },
      { trouble: 'flame-out', outcome: 'not-gone' },
      { trouble: 'tank-chill', outcome: 'cannot-say' },
    ]);
    expect(outcomesBetween(aStalled(), aFiring({ startClass: 'hot' }))).toEqual([
      { trouble: 'stall', outcome: 'cannot-say' },
    ]);
  });
});
