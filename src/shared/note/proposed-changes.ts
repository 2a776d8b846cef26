import { CHANGE_IDS } from '../vocabulary/changes.ts';
import type { Change } from '../vocabulary/changes.ts';
import type { KilnFields } from './kiln-fields.ts';
import { kilnChanges } from './kiln-changes.ts';
import type { NoteFields } from './note-fields.ts';
import { planChanges } from './plan-changes.ts';
import { reductionChanges } from './reduction-changes.ts';
import { setUpChanges } from './set-up-changes.ts';
import { wareChanges } from './ware-changes.ts';

/** A change that the difference of two firings proposes; the author says whether it was meant. */
export interface ProposedChange {
  readonly change: Change;
  /** The difference in words: "burner at 45° instead of 90°". */
  readonly text: string;
}

export interface FiringToCompare {
  readonly fields: NoteFields;
  readonly kiln: KilnFields | null;
}

/**
 * Changes that no field's difference proposes, because nothing in a note holds what was done: how
 * fast the author meant to go (the time it took is what came out of it), and how thick the glaze
 * lay. The author adds them.
 */
export const NOT_PROPOSED: readonly Change[] = [
  'slower-start',
  'faster',
  'glaze-thicker',
  'glaze-thinner',
];

/**
 * Every change of the vocabulary that the differences from the earlier firing of the same kiln can
 * propose, in the vocabulary's order, each once. A blank on either side proposes nothing: blank is
 * not zero.
 */
export function proposeChanges(earlier: FiringToCompare, now: FiringToCompare): ProposedChange[] {
  const found = [
    ...(earlier.kiln && now.kiln ? kilnChanges(earlier.kiln, now.kiln) : []),
    ...setUpChanges(earlier.fields, now.fields),
    ...planChanges(earlier.fields.plan, now.fields.plan),
    ...wareChanges(earlier.fields.pieces, now.fields.pieces),
    ...reductionChanges(earlier.fields, now.fields),
  ];
  return CHANGE_IDS.flatMap((change) => found.find((proposal) => proposal.change === change) ?? []);
}
