import type { Trouble } from '../vocabulary/troubles.ts';
import type { FormFamily } from '../vocabulary/ware.ts';
import type { Match } from './phrases.ts';

type CrackKind = 'plain' | 'burst' | 'dunt';

function crackKind(match: Match): CrackKind | null {
  if (match.means.includes('crack:burst')) return 'burst';
  if (match.means.includes('crack:dunt')) return 'dunt';
  return match.means.includes('crack:plain') ? 'plain' : null;
}

export function isCrack(match: Match): boolean {
  return crackKind(match) !== null;
}

export interface CrackPlace {
  readonly form: FormFamily | null;
  /** A temperature led to by "at", "around" or the like. */
  readonly atTemperature: boolean;
}

/**
 * The troubles a crack may be. Where the question says that it happened on drawing, smoking or
 * cooling, or in the kiln or at a temperature, one kind; else both. Bursts put the firing first,
 * all others the draw, where raku mostly cracks.
 */
export function crackTroubles(
  cracks: readonly Match[],
  matches: readonly Match[],
  place: CrackPlace,
): Trouble[] {
  const kinds = new Set(cracks.map(crackKind));
  const after = matches.some((match) => match.means.includes('place:after'));
  const inFiring = matches.some((match) => match.means.includes('place:firing'));
  if (after) return ['crack-after-draw'];
  if (inFiring || place.atTemperature) return ['crack-in-firing'];
  const burst = kinds.has('burst') && place.form !== 'plate' && !kinds.has('dunt');
  return burst ? ['crack-in-firing', 'crack-after-draw'] : ['crack-after-draw', 'crack-in-firing'];
}
