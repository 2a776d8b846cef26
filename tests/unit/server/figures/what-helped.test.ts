import { describe, expect, it } from 'vitest';
import { whatHelpedSchema } from '#shared/api/figures.ts';
import type { Change } from '#shared/vocabulary/changes.ts';
import { newcombe, wilson } from '../../../../server/figures/intervals.ts';
import type { PublishedFiring } from '../../../../server/figures/pairs.ts';
import { whatHelped } from '../../../../server/figures/what-helped.ts';
import { aFiring, aStalled } from './a-firing.ts';

let kilns = 1000;
/** So many kilns that stalled and then fired again with the changes, `gone` of them without a stall. */
function tried(
  changes: readonly Change[],
  { gone, of }: { gone: number; of: number },
  over: Partial<PublishedFiring> = {},
): PublishedFiring[] {
  return Array.from({ length: of }, (_, index) => {
    kilns += 1;
    const kiln = { kilnId: kilns, memberId: kilns, ...over };
    const next = { ...kiln, firedOn: '2024-05-02', changes };
    return [
      aStalled({ ...kiln, firedOn: '2024-05-01' }),
      // The follow-on that stalls again has no follow-on of its own.
      index < gone ? aFiring(next) : aStalled(next),
    ];
  }).flat();
}
const tableOf = (firings: PublishedFiring[]) => whatHelped('stall', 'cold', firings, 'measured');
const rowOf = (firings: PublishedFiring[], change: Change | null) =>
  tableOf(firings).ranked.find((row) => row.change === change);

describe('what helped', () => {
  const unchanged = tried([], { gone: 2, of: 12 });
  const insulated = tried(['floor-insulated'], { gone: 14, of: 15 });

  it('gives each change its share, Wilson’s interval, and Newcombe’s against no change named', () => {
    const row = rowOf([...unchanged, ...insulated], 'floor-insulated');
    const interval = wilson(14, 15);
    // One change shown: the level is 1 − 0.05/1.
    const difference = newcombe({ successes: 14, n: 15 }, { successes: 2, n: 12 }, 0.95);
    expect(row).toMatchObject({
      firings: 15,
      members: 15,
      gone: 14,
      share: 14 / 15,
      verdict: 'better',
      alone: { gone: 14, firings: 15 },
    });
    expect(row?.interval?.low).toBeCloseTo(interval?.lower ?? 0, 12);
    expect(row?.difference?.low).toBeCloseTo(difference?.lower ?? 0, 12);
    expect(row?.difference?.high).toBeCloseTo(difference?.upper ?? 0, 12);
  });

  it('is stricter the more changes are shown', () => {
    const others = tried(['gas-less'], { gone: 1, of: 5 });
    const one = rowOf([...unchanged, ...insulated], 'floor-insulated');
    const two = rowOf([...unchanged, ...insulated, ...others], 'floor-insulated');
    const strict = newcombe({ successes: 14, n: 15 }, { successes: 2, n: 12 }, 0.975);
    expect(two?.difference?.low).toBeCloseTo(strict?.lower ?? 0, 12);
    expect(two?.difference?.low).toBeLessThan(one?.difference?.low ?? 0);
  });

  it('puts the row without a named change first, even when it is too small to say', () => {
    const table = tableOf([...tried([], { gone: 1, of: 1 }), ...insulated]);
    expect(table.ranked[0]).toMatchObject({
      change: null,
      verdict: 'reference',
      firings: 1,
      share: null,
    });
    expect(table.ranked[1]).toMatchObject({
      change: 'floor-insulated',
      difference: null,
      verdict: 'cannot-be-told',
    });
  });

  it('cannot tell a small difference from changing nothing', () => {
    const row = rowOf(
      [...unchanged, ...tried(['setback-longer'], { gone: 2, of: 6 })],
      'setback-longer',
    );
    expect(row?.verdict).toBe('cannot-be-told');
  });

  it('lists apart what under five firings or three members tried', () => {
    const four = tried(['setback-longer'], { gone: 4, of: 4 });
    const twoMembers = tried(['load-less'], { gone: 6, of: 6 }, { memberId: 7 }).map((firing) =>
      firing.kilnId % 2 === 0 ? { ...firing, memberId: 8 } : firing,
    );
    const table = tableOf([...unchanged, ...four, ...twoMembers]);
    expect(table.ranked).toHaveLength(1);
    expect(table.tooFew.map((row) => [row.change, row.firings, row.members, row.verdict])).toEqual([
      ['setback-longer', 4, 4, 'too-few'],
      ['load-less', 6, 2, 'too-few'],
    ]);
  });

  it('does not let one busy member decide', () => {
    const busy = [
      ...tried(['shelf-raised'], { gone: 18, of: 18 }, { memberId: 7 }),
      ...tried(['shelf-raised'], { gone: 2, of: 2 }),
    ];
    const many = tried(['kiln-dried'], { gone: 20, of: 20 });
    const table = tableOf([...unchanged, ...busy, ...many]);
    const [, first, second] = table.ranked;
    expect([first?.change, second?.change]).toEqual(['kiln-dried', 'shelf-raised']);
    // By hand: k = (18² + 1 + 1) / 20 = 16.3, n_eff = 20 / (1 + 0.2 · 15.3) = 4.9261.
    const effective = 20 / (1 + 0.2 * 15.3);
    expect(second?.interval?.low).toBeCloseTo(wilson(effective, effective)?.lower ?? 0, 10);
    expect(first?.interval?.low).toBeCloseTo(wilson(20, 20)?.lower ?? 0, 10);
  });

  it('never puts a change that can hurt first, and never shows it without its caution', () => {
    const gas = tried(['gas-more'], { gone: 15, of: 15 });
    const weak = tried(['wind-shelter'], { gone: 1, of: 6 });
    const table = tableOf([...unchanged, ...gas, ...weak]);
    expect(table.ranked.map((row) => row.change)).toEqual([null, 'wind-shelter', 'gas-more']);
    expect(table.ranked[2]?.caution).toContain('licensed gas engineer');
  });

  it('never pools a hot start with a cold one', () => {
    const hot = tried(['floor-insulated'], { gone: 6, of: 6 }, { startClass: 'hot' });
    const all = [...unchanged, ...insulated, ...hot];
    expect(rowOf(all, 'floor-insulated')?.firings).toBe(15);
    const table = whatHelped('stall', 'hot', all, 'measured');
    expect(table.ranked.find((row) => row.change === 'floor-insulated')?.firings).toBe(6);
    expect(table.ranked[0]).toMatchObject({ change: null, firings: 0, members: 0, share: null });
  });

  it('tells how often a change was tried alone', () => {
    const together = tried(['floor-insulated', 'wind-shelter'], { gone: 5, of: 5 });
    const row = rowOf([...unchanged, ...insulated, ...together], 'floor-insulated');
    expect(row).toMatchObject({ gone: 19, firings: 20, alone: { gone: 14, firings: 15 } });
  });

  it('says what a share becomes if every follow-on with a missing outcome had failed', () => {
    const unknown = [
      ...tried(['floor-insulated'], { gone: 3, of: 3 }).map((firing) =>
        firing.firedOn === '2024-05-02' ? { ...firing, unreportedFirings: 2 } : firing,
      ),
    ];
    const all = [...unchanged, ...insulated, ...unknown];
    const row = rowOf(all, 'floor-insulated');
    expect(row?.share).toBe(14 / 15);
    expect(row?.shareIfMissingFailed).toBe(14 / 18);
    expect(tableOf(all).leftOut).toContainEqual({
      reason: 'firings in between were not written up',
      count: 3,
    });
  });

  it('lets a disputed finding leave the number at once and counts it', () => {
    const disputed = insulated.map((firing, index) =>
      index === 0 ? { ...firing, disputed: ['stall' as const] } : firing,
    );
    const table = tableOf([...unchanged, ...disputed]);
    expect(table.ranked[1]).toMatchObject({ firings: 14, gone: 13 });
    expect(table.ranked[1]?.shareIfMissingFailed).toBe(13 / 14);
    expect(table.leftOut).toContainEqual({ reason: 'the finding is disputed', count: 1 });
  });

  it('is what the interface promises', () => {
    const tables = [tableOf([...unchanged, ...insulated])];
    const answer = { trouble: 'stall', tables, duringTheFiring: [], disputed: 0, notes: {} };
    expect(whatHelpedSchema.parse(answer)).toEqual(answer);
  });

  it('says nothing of no firings', () => {
    const table = tableOf([]);
    expect(table).toMatchObject({ pairs: 0, leftOut: [], tooFew: [] });
    expect(table.ranked).toHaveLength(1);
  });
});
