import type { FiringFacts } from '#shared/note/facts.ts';
import type { Change } from '#shared/vocabulary/changes.ts';
import type { StartClass } from '#shared/vocabulary/kiln.ts';
import { MEASURED_TROUBLES } from '#shared/vocabulary/troubles.ts';
import type { Trouble } from '#shared/vocabulary/troubles.ts';
import { compareFirings } from './comparison.ts';
import type { Outcome, Source } from './comparison.ts';

/** Facts of a firing with what is disputed of them. */
export interface DisputableFacts extends FiringFacts {
  /**
   * Troubles whose every finding is disputed: they leave every headline number at once. Facts kept
   * before there were disputes say nothing of them.
   */
  readonly disputed?: readonly Trouble[];
}

/** A published firing as the figures read it. */
export interface PublishedFiring extends DisputableFacts {
  readonly noteId: number;
  readonly kilnId: number;
  readonly memberId: number;
  /** Firings of one kiln within one season tell one story, and count once. */
  readonly season: string;
  /** The author confirmed, a week later, that nothing cracked since. */
  readonly cracksConfirmed?: boolean;
}

export const LEFT_OUT = {
  'no-follow-on': 'no next firing written up yet',
  disputed: 'the finding is disputed',
  'other-start': 'the next firing started otherwise, hot or cold',
  unreported: 'firings in between were not written up',
  'not-comparable': 'not comparable',
} as const;
export type LeftOut = keyof typeof LEFT_OUT;

/** The row for pairs in which no change is named. */
export const NO_CHANGE = 'none';

/** A firing with a trouble, and the same kiln's next firing by date. */
export interface Pair {
  readonly trouble: Trouble;
  readonly source: Source;
  readonly startClass: StartClass | null;
  readonly kilnId: number;
  readonly earlierNoteId: number;
  readonly laterNoteId: number | null;
  /** Who fired the later one, and when. */
  readonly memberId: number | null;
  readonly season: string | null;
  readonly changes: readonly Change[];
  /** Null when the pair is comparable. */
  readonly leftOut: LeftOut | null;
  /** What kept them from being compared, in words. */
  readonly because: string | null;
  /** Null when the pair is left out. */
  readonly outcome: Outcome | null;
  /** A crack can still show: not confirmed by the author yet. */
  readonly provisional: boolean;
  /**
   * The changes (or none) for which this pair counts: within one kiln and season only the first
   * pair of a trouble and change does.
   */
  readonly countsFor: readonly (Change | typeof NO_CHANGE)[];
}

const MEASURABLE: readonly string[] = MEASURED_TROUBLES;

/**
 * How a firing is known to have had a trouble; null when it did not. Where there is a record, what
 * the author names of a trouble that a record shows is not evidence of its own. A disputed one was
 * measured: it makes a pair, which is left out and counted as disputed.
 */
export function sourceOf(trouble: Trouble, facts: DisputableFacts): Source | null {
  if (facts.disputed?.includes(trouble)) return 'measured';
  if (facts.measuredTroubles.some((found) => found === trouble)) return 'measured';
  if (!facts.namedTroubles.includes(trouble)) return null;
  return MEASURABLE.includes(trouble) && facts.hasRecord ? null : 'named';
}

/** Firings of each kiln in the order they were fired. */
function series(firings: readonly PublishedFiring[]): PublishedFiring[][] {
  const kilns = new Map<number, PublishedFiring[]>();
  for (const firing of firings) {
    if (firing.firedOn === null) continue;
    const before = kilns.get(firing.kilnId);
    if (before) before.push(firing);
    else kilns.set(firing.kilnId, [firing]);
  }
  const moment = ({ firedOn, startTime }: PublishedFiring): string =>
    `${firedOn ?? ''} ${startTime ?? ''}`;
  return [...kilns.values()].map((each) =>
    each.sort((a, b) => {
      const [one, other] = [moment(a), moment(b)];
      return one < other ? -1 : one > other ? 1 : a.noteId - b.noteId;
    }),
  );
}

const CRACKS: readonly Trouble[] = ['crack-in-firing', 'crack-after-draw'];

function pairOf(
  trouble: Trouble,
  source: Source,
  before: PublishedFiring,
  now: PublishedFiring | undefined,
): Pair {
  const pair = {
    trouble,
    source,
    startClass: before.startClass,
    kilnId: before.kilnId,
    earlierNoteId: before.noteId,
    laterNoteId: now?.noteId ?? null,
    memberId: now?.memberId ?? null,
    season: now?.season ?? null,
    changes: now?.changes ?? [],
    because: null,
    outcome: null,
    provisional: false,
    countsFor: [],
  };
  if ([before, now].some((firing) => firing?.disputed?.includes(trouble))) {
    return { ...pair, leftOut: 'disputed' };
  }
  if (!now) return { ...pair, leftOut: 'no-follow-on' };
  if (before.startClass === null || before.startClass !== now.startClass) {
    return { ...pair, leftOut: 'other-start' };
  }
  // Not said is not none.
  if (now.unreportedFirings !== 0) return { ...pair, leftOut: 'unreported' };
  const comparison = compareFirings(trouble, source, before, now);
  if (!comparison.comparable) {
    return { ...pair, leftOut: 'not-comparable', because: comparison.because };
  }
  return {
    ...pair,
    leftOut: null,
    outcome: comparison.outcome,
    provisional:
      CRACKS.includes(trouble) && comparison.outcome === 'gone' && now.cracksConfirmed !== true,
  };
}

/**
 * Every firing with the trouble, paired with the same kiln's next firing by date; those that cannot
 * be compared are kept and say why. Cold and hot starts, measured and author-named, are never mixed
 * in one pair; whoever pools them tells them apart by `startClass` and `source`.
 */
export function pairsFor(trouble: Trouble, firings: readonly PublishedFiring[]): Pair[] {
  return series(firings).flatMap((kiln) => {
    const taken = new Set<string>();
    return kiln.flatMap((before, index): Pair[] => {
      const source = sourceOf(trouble, before);
      if (source === null) return [];
      const pair = pairOf(trouble, source, before, kiln[index + 1]);
      if (pair.outcome === null || pair.outcome === 'cannot-say') return [pair];
      const named = pair.changes.length > 0 ? pair.changes : [NO_CHANGE as typeof NO_CHANGE];
      const countsFor = named.filter((change) => {
        const key = [source, pair.startClass, pair.season, change].join('|');
        if (taken.has(key)) return false;
        taken.add(key);
        return true;
      });
      return [{ ...pair, countsFor }];
    });
  });
}
