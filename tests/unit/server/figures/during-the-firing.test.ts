import { describe, expect, it } from 'vitest';
import type { MarkKind } from '#shared/vocabulary/marks.ts';
import { duringTheFiring } from '../../../../server/figures/during-the-firing.ts';
import type { PublishedFiring } from '../../../../server/figures/pairs.ts';
import { aStalled } from './a-firing.ts';

/** A stall from minute 29 to 46, with a mark. */
const stalledWith = (
  kind: MarkKind,
  minute: number,
  wentOn: boolean | null,
  over: Partial<PublishedFiring> = {},
): PublishedFiring =>
  aStalled({
    marks: [{ kind, minute }],
    stalls: [{ levelCelsius: 708, fromMinute: 29, toMinute: 46, minutes: 17, wentOn }],
    ...over,
  });
const times = (count: number, make: () => PublishedFiring) => Array.from({ length: count }, make);

describe('what was done during the firing', () => {
  it('counts a mark in the last ten minutes of a stall or at its end', () => {
    const rows = duringTheFiring('cold', [
      stalledWith('flue-opened', 36, true),
      stalledWith('flue-opened', 46.5, true),
      stalledWith('flue-opened', 35, true),
      stalledWith('flue-opened', 48, true),
    ]);
    expect(rows.map((row) => [row.mark, row.firings])).toEqual([
      [null, 2],
      ['flue-opened', 2],
    ]);
  });

  it('puts first the stalls at which nothing was done, and what can hurt last', () => {
    const rows = duringTheFiring('cold', [
      ...times(6, () => stalledWith('gas-up', 45, true)),
      ...times(5, () => stalledWith('air-more', 45, true)),
    ]);
    expect(rows.map((row) => row.mark)).toEqual([null, 'air-more', 'gas-up']);
    expect(rows[2]?.caution).toContain('carbon monoxide');
  });

  it('takes a gust, a cone or the shutting off for nothing done', () => {
    const rows = duringTheFiring('cold', [
      stalledWith('gust', 45, false),
      stalledWith('cone-down', 45, false),
      stalledWith('shut-off', 46, false),
    ]);
    expect(rows).toHaveLength(1);
    expect(rows[0]).toMatchObject({ mark: null, firings: 3, wentOn: 0 });
  });

  it('leaves out the other start class, what is not known, and what is disputed', () => {
    const rows = duringTheFiring('cold', [
      stalledWith('air-more', 45, true, { startClass: 'hot' }),
      stalledWith('air-more', 45, null),
      stalledWith('air-more', 45, true, { disputed: ['stall'] }),
    ]);
    expect(rows.map((row) => row.firings)).toEqual([0]);
  });

  it('says no share under five firings or three members', () => {
    const four = duringTheFiring(
      'cold',
      times(4, () => stalledWith('air-more', 45, true)),
    );
    expect(four[1]).toMatchObject({ firings: 4, wentOn: 4, share: null, interval: null });
    const one = duringTheFiring(
      'cold',
      times(5, () => stalledWith('air-more', 45, true, { memberId: 1 })),
    );
    expect(one[1]?.share).toBeNull();
    const five = duringTheFiring(
      'cold',
      times(5, () => stalledWith('air-more', 45, true)),
    );
    expect(five[1]?.share).toBe(1);
  });

  it('counts a firing once for one thing done at two stalls', () => {
    const stall = { levelCelsius: 500, fromMinute: 10, toMinute: 20, minutes: 10, wentOn: true };
    const twice = aStalled({
      marks: [
        { kind: 'air-more', minute: 20 },
        { kind: 'air-more', minute: 46 },
      ],
      stalls: [stall, { ...stall, levelCelsius: 708, fromMinute: 29, toMinute: 46, wentOn: false }],
    });
    expect(duringTheFiring('cold', [twice])[1]).toMatchObject({ firings: 1, wentOn: 0 });
  });
});
