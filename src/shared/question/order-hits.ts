/**
 * How a note ended, best first in a search: 3 the trouble was gone in the follow-on, 2 a change was
 * tried and its outcome is open, 1 the trouble with a record but no follow-on, 0 without a record.
 */
export type OutcomeTier = 0 | 1 | 2 | 3;

/** What ordering needs to know of a hit. Temperatures in °C; `firedOn` in days since 1970. */
export interface OrderableHit {
  readonly outcome: number;
  /** Levels of the trouble asked about: of its stalls, the tops of its falls, or its peak. */
  readonly levelsC: readonly number[];
  readonly firedOn: number;
  /** Which of the tier's texts found it: 0 the words, 1 the filter alone. */
  readonly foundBy?: number;
}

/** °C from the nearest level to what was asked; Infinity where a note has none. */
export function distanceTo(levelsC: readonly number[], tempC: number): number {
  return Math.min(Infinity, ...levelsC.map((level) => Math.abs(level - tempC)));
}

function compare(a: number, b: number): number {
  return a === b ? 0 : a < b ? -1 : 1;
}

/**
 * Order within a tier: found by the words first, then by how it ended, then nearest to the
 * temperature asked for, then newest. Equal hits keep the engine's order.
 */
export function orderHits<Hit extends OrderableHit>(
  hits: readonly Hit[],
  tempC: number | null,
): Hit[] {
  return [...hits].sort(
    (a, b) =>
      compare(a.foundBy ?? 0, b.foundBy ?? 0) ||
      compare(b.outcome, a.outcome) ||
      (tempC === null ? 0 : compare(distanceTo(a.levelsC, tempC), distanceTo(b.levelsC, tempC))) ||
      compare(b.firedOn, a.firedOn),
  );
}

/** Order by nearness alone, for the reader who asks for it. */
export function orderByNearness<Hit extends OrderableHit>(
  hits: readonly Hit[],
  tempC: number,
): Hit[] {
  return [...hits].sort(
    (a, b) =>
      compare(distanceTo(a.levelsC, tempC), distanceTo(b.levelsC, tempC)) ||
      compare(b.outcome, a.outcome) ||
      compare(b.firedOn, a.firedOn),
  );
}

/** The temperature nearness is measured from: the centre asked for, else the middle of a range. */
export function nearnessCentre(asked: {
  readonly tempC: number | null;
  readonly tempMinC: number | null;
  readonly tempMaxC: number | null;
}): number | null {
  if (asked.tempC !== null) return asked.tempC;
  const { tempMinC, tempMaxC } = asked;
  return tempMinC !== null && tempMaxC !== null
    ? (tempMinC + tempMaxC) / 2
    : (tempMinC ?? tempMaxC);
}
