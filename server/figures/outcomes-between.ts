import { TROUBLE_IDS } from '#shared/vocabulary/troubles.ts';
import type { Trouble } from '#shared/vocabulary/troubles.ts';
import { compareFirings } from './comparison.ts';
import type { Outcome } from './comparison.ts';
import { sourceOf, type DisputableFacts } from './pairs.ts';

export interface TroubleOutcome {
  readonly trouble: Trouble;
  readonly outcome: Outcome;
}

/**
 * For each trouble of a firing, whether it was gone in the kiln's next one. It cannot be said where
 * the two do not compare: another start, firings in between not written up, or other ware; and of a
 * finding that is disputed.
 */
export function outcomesBetween(before: DisputableFacts, now: DisputableFacts): TroubleOutcome[] {
  const alike =
    before.startClass !== null &&
    before.startClass === now.startClass &&
    now.unreportedFirings === 0;
  const had = new Set<Trouble>([...before.measuredTroubles, ...before.namedTroubles]);
  return TROUBLE_IDS.filter((trouble) => had.has(trouble)).map((trouble) => {
    const source = sourceOf(trouble, before);
    if (now.disputed?.includes(trouble)) return { trouble, outcome: 'cannot-say' };
    if (!alike || source === null) return { trouble, outcome: 'cannot-say' };
    const comparison = compareFirings(trouble, source, before, now);
    return { trouble, outcome: comparison.comparable ? comparison.outcome : 'cannot-say' };
  });
}
