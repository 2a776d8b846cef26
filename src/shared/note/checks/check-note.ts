import type { Check, CheckContext } from './check.ts';
import { disputeChecks } from './dispute-checks.ts';
import { rangeChecks } from './range-checks.ts';
import { recordChecks } from './record-checks.ts';
import { requiredFieldChecks } from './required-fields.ts';
import { storyChecks, unsafePracticeChecks } from './story-checks.ts';
import { troubleChecks } from './trouble-checks.ts';

export type { Check, CheckContext };

const NOTE_ORDER = [
  'when',
  'kilnId',
  'setUp',
  'plan',
  'record',
  'findingDisputes',
  'pieces',
  'reduction',
  'result',
  'changes',
  'title',
  'story',
  'cautionsRead',
];
const placeOf = ({ pointer }: Check): number => NOTE_ORDER.indexOf(pointer.split('/')[1] ?? '');

/**
 * All that a note has to be asked before it can be handed in, in the order of the note. The
 * moderators' own checks are among them, flagged `forModerators`.
 */
export function checkNote(context: CheckContext): Check[] {
  return [
    ...requiredFieldChecks(context),
    ...rangeChecks(context),
    ...recordChecks(context),
    ...disputeChecks(context),
    ...troubleChecks(context),
    ...storyChecks(context),
    ...unsafePracticeChecks(context),
  ].sort((a, b) => placeOf(a) - placeOf(b));
}
