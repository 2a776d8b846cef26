import { formatNumber } from '../units/number.ts';
import type { Change } from '../vocabulary/changes.ts';
import type { ProposedChange } from './proposed-changes.ts';

/** The change for a rise and the change for a fall; either may be missing. */
interface Directions {
  readonly up?: Change;
  readonly down?: Change;
}

/**
 * A proposal from two numbers at least `threshold` apart.
 * @param say the two in words, the later first
 */
export function compareNumbers(
  before: number | null,
  now: number | null,
  threshold: number,
  { up, down }: Directions,
  say: (now: number, before: number) => string,
): ProposedChange[] {
  if (before === null || now === null || Math.abs(now - before) < threshold) return [];
  const change = now > before ? up : down;
  return change ? [{ change, text: say(now, before) }] : [];
}

/** The same with a threshold that is a share of the earlier number, and at least `least`. */
export function compareShares(
  before: number | null,
  now: number | null,
  { share, least = 1e-9 }: { readonly share: number; readonly least?: number },
  directions: Directions,
  say: (now: number, before: number) => string,
): ProposedChange[] {
  const threshold = Math.max(least, share * Math.abs(before ?? 0));
  return compareNumbers(before, now, threshold, directions, say);
}

/** A proposal from two terms of an ordered list. */
export function compareOrder<Id extends string>(
  before: Id | null,
  now: Id | null,
  order: readonly Id[],
  directions: Directions,
  say: (now: Id, before: Id) => string,
): ProposedChange[] {
  if (before === null || now === null) return [];
  return compareNumbers(order.indexOf(before), order.indexOf(now), 1, directions, () =>
    say(now, before),
  );
}

/** Whether two sets, both known, have nothing in common. */
export function haveNothingInCommon(before: readonly string[], now: readonly string[]): boolean {
  if (before.length === 0 || now.length === 0) return false;
  const kept = new Set(before.map((word) => word.toLowerCase()));
  return !now.some((word) => kept.has(word.toLowerCase()));
}

/** "45° instead of 90°". */
export function insteadOf(unit: string): (now: number, before: number) => string {
  return (now, before) =>
    `${formatNumber(now, 2)}${unit} instead of ${formatNumber(before, 2)}${unit}`;
}

/** "bowl, cup and plate". */
export function listed(words: readonly string[]): string {
  if (words.length <= 1) return words[0] ?? '';
  return `${words.slice(0, -1).join(', ')} and ${words.at(-1) ?? ''}`;
}

/** The distinct words that are not blank, in order. */
export function distinct<Word extends string>(words: readonly (Word | null | '')[]): Word[] {
  return [...new Set(words.filter((word): word is Word => word !== null && word.trim() !== ''))];
}

/** The mean of the known numbers, or null. */
export function meanOf(numbers: readonly (number | null)[]): number | null {
  const known = numbers.filter((value) => value !== null);
  if (known.length === 0) return null;
  return known.reduce((sum, value) => sum + value, 0) / known.length;
}
