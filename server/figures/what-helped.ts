import type { WhatHelped, WhatHelpedRow } from '#shared/api/figures.ts';
import { CAUTIOUS_CHANGES, CHANGE_IDS } from '#shared/vocabulary/changes.ts';
import type { Change } from '#shared/vocabulary/changes.ts';
import type { StartClass } from '#shared/vocabulary/kiln.ts';
import type { Trouble } from '#shared/vocabulary/troubles.ts';
import type { Source } from './comparison.ts';
import { effectiveProportion, newcombe, wilson } from './intervals.ts';
import { LEFT_OUT, NO_CHANGE, pairsFor } from './pairs.ts';
import type { Pair, PublishedFiring } from './pairs.ts';

export type WhatHelpedTable = WhatHelped['tables'][number];

/** Under so many firings or members it is too few to say. */
export const FEWEST_FIRINGS = 5;
export const FEWEST_MEMBERS = 3;

const CANNOT_SAY = 'the next firing does not tell';
const SAME_SEASON = 'the kiln already counts for that change this season';

type RowChange = Change | typeof NO_CHANGE;

const membersOf = (pairs: readonly Pair[]): number[] =>
  pairs.flatMap(({ memberId }) => memberId ?? []);

const isGone = ({ outcome }: Pair): boolean => outcome === 'gone';

/** Follow-ons in which the change was tried and whose outcome nobody knows. */
function missingFor(change: RowChange, pairs: readonly Pair[]): number {
  return pairs.filter(
    ({ laterNoteId, leftOut, outcome, changes }) =>
      laterNoteId !== null &&
      leftOut !== 'disputed' &&
      (outcome === null || outcome === 'cannot-say') &&
      (change === NO_CHANGE ? changes.length === 0 : changes.includes(change)),
  ).length;
}

interface Counted {
  readonly change: RowChange;
  readonly pairs: readonly Pair[];
  readonly row: WhatHelpedRow;
}

function countRow(change: RowChange, all: readonly Pair[]): Counted {
  const pairs = all.filter(({ countsFor }) => countsFor.includes(change));
  const members = membersOf(pairs);
  const gone = pairs.filter(isGone).length;
  const alone = pairs.filter(({ changes }) => changes.length <= 1);
  const memberCount = new Set(members).size;
  const enough = pairs.length >= FEWEST_FIRINGS && memberCount >= FEWEST_MEMBERS;
  const effective = effectiveProportion(gone, members);
  const interval = enough ? wilson(effective.successes, effective.n) : null;
  return {
    change,
    pairs,
    row: {
      change: change === NO_CHANGE ? null : change,
      firings: pairs.length,
      members: memberCount,
      gone,
      share: enough ? gone / pairs.length : null,
      interval: interval && { low: interval.lower, high: interval.upper },
      difference: null,
      verdict: change === NO_CHANGE ? 'reference' : enough ? 'cannot-be-told' : 'too-few',
      alone: { gone: alone.filter(isGone).length, firings: alone.length },
      shareIfMissingFailed: enough ? gone / (pairs.length + missingFor(change, all)) : null,
      caution: change === NO_CHANGE ? null : (CAUTIOUS_CHANGES[change] ?? null),
      noteIds: [
        ...new Set(pairs.flatMap((pair) => [pair.earlierNoteId, pair.laterNoteId ?? []].flat())),
      ],
    },
  };
}

const proportionOf = ({ row, pairs }: Counted) => effectiveProportion(row.gone, membersOf(pairs));

/**
 * Against the follow-ons in which no change is named, at level 1 − 0.05/m for m changes shown, so
 * that many comparisons do not find something by chance (Bonferroni).
 */
function compared(counted: Counted, unchanged: Counted, shown: number): WhatHelpedRow {
  if (unchanged.row.share === null) return counted.row;
  const level = 1 - 0.05 / shown;
  const difference = newcombe(proportionOf(counted), proportionOf(unchanged), level);
  if (!difference) return counted.row;
  const { lower, upper } = difference;
  return {
    ...counted.row,
    difference: { share: difference.difference, low: lower, high: upper },
    verdict: lower > 0 ? 'better' : upper < 0 ? 'worse' : 'cannot-be-told',
  };
}

/** By lower bound; but no change that can hurt somebody comes first. */
function ranked(rows: readonly WhatHelpedRow[]): WhatHelpedRow[] {
  const sorted = [...rows].sort(
    (a, b) => (b.interval?.low ?? 0) - (a.interval?.low ?? 0) || b.firings - a.firings,
  );
  const firstSafe = sorted.findIndex(({ caution }) => caution === null);
  if (firstSafe <= 0) return sorted;
  const [safe] = sorted.splice(firstSafe, 1);
  return safe ? [safe, ...sorted] : sorted;
}

function leftOutCounts(pairs: readonly Pair[]): WhatHelpedTable['leftOut'] {
  const counts = new Map<string, number>();
  for (const { leftOut, outcome, countsFor } of pairs) {
    const reason =
      leftOut !== null
        ? LEFT_OUT[leftOut]
        : outcome === 'cannot-say'
          ? CANNOT_SAY
          : countsFor.length === 0
            ? SAME_SEASON
            : null;
    if (reason !== null) counts.set(reason, (counts.get(reason) ?? 0) + 1);
  }
  return [...counts].map(([reason, count]) => ({ reason, count }));
}

/**
 * For a trouble, each change tried in the kiln's next firing and how often the trouble was then
 * gone: one start class, one source, never pooled with others. The first row is always that in
 * which no change is named.
 */
export function whatHelped(
  trouble: Trouble,
  startClass: StartClass,
  firings: readonly PublishedFiring[],
  source: Source,
): WhatHelpedTable {
  const pairs = pairsFor(trouble, firings).filter(
    (pair) => pair.startClass === startClass && pair.source === source,
  );
  const unchanged = countRow(NO_CHANGE, pairs);
  const tried = CHANGE_IDS.map((change) => countRow(change, pairs)).filter(
    (counted) => counted.pairs.length > 0,
  );
  const shown = tried.filter(({ row }) => row.share !== null);
  return {
    startClass,
    source,
    ranked: [
      unchanged.row,
      ...ranked(shown.map((counted) => compared(counted, unchanged, shown.length))),
    ],
    tooFew: tried.filter(({ row }) => row.share === null).map(({ row }) => row),
    pairs: pairs.filter(({ countsFor }) => countsFor.length > 0).length,
    leftOut: leftOutCounts(pairs),
  };
}
