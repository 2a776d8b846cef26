import type { NoteStatus } from '#shared/vocabulary/statuses.ts';

export type NoteAct =
  | 'hand-in'
  | 'take-back'
  | 'claim'
  | 'give-up-claim'
  | 'publish'
  | 'send-back'
  | 'decline'
  | 'take-down'
  | 'revise';

/**
 * Which act leads from where to where. While a published note is revised, `status` tells of the
 * revision; the published one stays up through `published_revision_id`.
 */
const TRANSITIONS: Readonly<Record<NoteAct, { from: readonly NoteStatus[]; to: NoteStatus }>> = {
  'hand-in': { from: ['draft', 'sent-back'], to: 'handed-in' },
  'take-back': { from: ['handed-in', 'on-the-desk'], to: 'draft' },
  claim: { from: ['handed-in', 'on-the-desk'], to: 'on-the-desk' },
  'give-up-claim': { from: ['on-the-desk'], to: 'handed-in' },
  publish: { from: ['on-the-desk'], to: 'published' },
  'send-back': { from: ['on-the-desk'], to: 'sent-back' },
  decline: { from: ['on-the-desk'], to: 'declined' },
  'take-down': {
    from: ['published', 'draft', 'sent-back', 'declined', 'handed-in', 'on-the-desk'],
    to: 'taken-down',
  },
  revise: { from: ['published', 'declined', 'taken-down'], to: 'draft' },
};

/** The status an act leads to, or null when it cannot be done from here. */
export function statusAfter(act: NoteAct, from: NoteStatus): NoteStatus | null {
  const transition = TRANSITIONS[act];
  return transition.from.includes(from) ? transition.to : null;
}

/** Statuses in which the working copy is its author's to write in. */
const BEING_WRITTEN: readonly NoteStatus[] = ['draft', 'sent-back'];
export const isBeingWritten = (status: NoteStatus): boolean => BEING_WRITTEN.includes(status);

/**
 * Statuses in which a note that is not published still stands in its author's series: as the
 * earlier or the next firing of a kiln, to compare with. One that was declined or taken down does
 * not, until its author opens it again.
 */
export const IN_OWN_SERIES: readonly NoteStatus[] = [
  'draft',
  'sent-back',
  'handed-in',
  'on-the-desk',
];

/** The statuses an act may start from, for the condition of its UPDATE. */
export function statusesBefore(act: NoteAct): readonly NoteStatus[] {
  return TRANSITIONS[act].from;
}
