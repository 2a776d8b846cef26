import type { Match } from './phrases.ts';
import { firstItem } from './phrases.ts';
import type { Meaning } from './vocabulary-entry.ts';

export type MeaningKind = 'trouble' | 'cause' | 'form' | 'glaze' | 'change' | 'fuel' | 'clay';
/** The ids a kind of meaning can have: "trouble" gives the troubles. */
export type ValueOf<Kind extends MeaningKind> =
  Extract<Meaning, `${Kind}:${string}`> extends infer M
    ? M extends `${Kind}:${infer Value}`
      ? Value
      : never
    : never;

/** The values of one kind that phrases mean, in the order of the text, repeats included. */
export function meaningsIn<Kind extends MeaningKind>(
  matches: readonly Match[],
  kind: Kind,
): ValueOf<Kind>[] {
  const prefix = `${kind}:`;
  return matches.flatMap(({ means }) =>
    means.flatMap((meaning) =>
      meaning.startsWith(prefix) ? [meaning.slice(prefix.length) as ValueOf<Kind>] : [],
    ),
  );
}

export interface Nearest<Kind extends MeaningKind> {
  readonly value: ValueOf<Kind>;
  /** Items of every phrase that says it. */
  readonly taken: readonly number[];
}

/** Of several forms (or glazes ...) named, the one nearest the trouble; else the first. */
export function nearestOf<Kind extends MeaningKind>(
  matches: readonly Match[],
  kind: Kind,
  anchor: number | null,
): Nearest<Kind> | null {
  let best: ValueOf<Kind> | null = null;
  let least = Infinity;
  for (const match of matches) {
    const value = meaningsIn([match], kind)[0];
    if (value === undefined) continue;
    const far = anchor === null ? firstItem(match) : Math.abs(firstItem(match) - anchor);
    if (far < least) [best, least] = [value, far];
  }
  if (best === null) return null;
  const chosen = best;
  const saying = matches.filter((match) => meaningsIn([match], kind).includes(chosen));
  return { value: chosen, taken: saying.flatMap(({ taken }) => taken) };
}
