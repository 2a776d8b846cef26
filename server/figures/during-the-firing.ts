import type { StartClass } from '#shared/vocabulary/kiln.ts';
import { FIRE_CHANGING_MARKS, MARK_IDS } from '#shared/vocabulary/marks.ts';
import type { MarkKind } from '#shared/vocabulary/marks.ts';
import type { Change } from '#shared/vocabulary/changes.ts';
import { CAUTIOUS_CHANGES } from '#shared/vocabulary/changes.ts';
import type { StallFacts } from '#shared/note/facts.ts';
import { effectiveProportion, wilson } from './intervals.ts';
import type { PublishedFiring } from './pairs.ts';
import { FEWEST_FIRINGS, FEWEST_MEMBERS } from './what-helped.ts';

/** A mark counts for a stall when it lies in its last 10 min or at its end. */
const BEFORE_END_MINUTES = 10;
/** "At its end": readings and marks are a minute out of step as often as not (our own bound). */
const AT_END_MINUTES = 1;

/** What was done at a stall, and how often the kiln then went on climbing. */
export interface DuringRow {
  /** Null: nothing was done. */
  readonly mark: MarkKind | null;
  readonly firings: number;
  readonly members: number;
  readonly wentOn: number;
  /** Null when too few to say. */
  readonly share: number | null;
  readonly interval: { readonly low: number; readonly high: number } | null;
  readonly caution: string | null;
  readonly noteIds: readonly number[];
}

const CHANGE_OF_MARK: Readonly<Partial<Record<MarkKind, Change>>> = {
  'gas-up': 'gas-more',
  'air-less': 'air-less',
  'flue-closed': 'flue-more-covered',
};

/** What somebody did to the fire; lighting it is no answer to a stall. */
const DONE: readonly MarkKind[] = MARK_IDS.filter(
  (kind) => FIRE_CHANGING_MARKS.includes(kind) && kind !== 'lit',
);

const doneAt = (stall: StallFacts, { marks }: PublishedFiring): MarkKind[] => {
  const from = Math.max(stall.fromMinute, stall.toMinute - BEFORE_END_MINUTES);
  const kinds = marks
    .filter(({ minute }) => minute >= from && minute <= stall.toMinute + AT_END_MINUTES)
    .map(({ kind }) => kind);
  return [...new Set(kinds)].filter((kind) => DONE.includes(kind));
};

interface Try {
  readonly firing: PublishedFiring;
  readonly wentOn: boolean;
}

function rowOf(mark: MarkKind | null, tries: readonly Try[]): DuringRow {
  const memberIds = tries.map(({ firing }) => firing.memberId);
  const members = new Set(memberIds).size;
  const wentOn = tries.filter((each) => each.wentOn).length;
  const enough = tries.length >= FEWEST_FIRINGS && members >= FEWEST_MEMBERS;
  const effective = effectiveProportion(wentOn, memberIds);
  const interval = enough ? wilson(effective.successes, effective.n) : null;
  const change = mark === null ? undefined : CHANGE_OF_MARK[mark];
  return {
    mark,
    firings: tries.length,
    members,
    wentOn,
    share: enough ? wentOn / tries.length : null,
    interval: interval && { low: interval.lower, high: interval.upper },
    caution: (change && CAUTIOUS_CHANGES[change]) ?? null,
    noteIds: tries.map(({ firing }) => firing.noteId),
  };
}

/**
 * Stalls of one start class by what was done in their last minutes, and how often the curve stood
 * 50 °C higher within 20 min. A firing counts once for each thing done, by its last stall at which
 * that was done. Its own table: never pooled with what was tried in the next firing. First the row
 * in which nothing was done, then by how many did it; what can hurt somebody never comes before all
 * else that was done.
 */
export function duringTheFiring(
  startClass: StartClass,
  firings: readonly PublishedFiring[],
): DuringRow[] {
  const tries = new Map<MarkKind | null, Map<number, Try>>();
  for (const firing of firings) {
    if (firing.startClass !== startClass || firing.disputed?.includes('stall')) continue;
    for (const stall of firing.stalls) {
      if (stall.wentOn === null) continue;
      const done = doneAt(stall, firing);
      for (const mark of done.length > 0 ? done : [null]) {
        const ofMark = tries.get(mark) ?? new Map<number, Try>();
        ofMark.set(firing.noteId, { firing, wentOn: stall.wentOn });
        tries.set(mark, ofMark);
      }
    }
  }
  const rows = [...tries]
    .filter(([mark]) => mark !== null)
    .map(([mark, each]) => rowOf(mark, [...each.values()]))
    .sort(
      (a, b) => Number(a.caution !== null) - Number(b.caution !== null) || b.firings - a.firings,
    );
  return [rowOf(null, [...(tries.get(null)?.values() ?? [])]), ...rows];
}
