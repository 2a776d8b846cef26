import type { NoteStatus } from '#shared/vocabulary/statuses.ts';
import type { Actor, SignedIn } from './actor.ts';

/**
 * Who may do what: the one place. Pure; services ask after loading and before writing, presenters
 * send the answers as `abilities`, and `visibility.ts` says the read rules in SQL.
 */
export interface NoteSubject {
  readonly authorId: number | null;
  readonly status: NoteStatus;
  readonly hasPublished: boolean;
  readonly removed: boolean;
  readonly claimedBy: number | null;
  readonly claimLapsed: boolean;
}
export interface KilnSubject {
  readonly keeperId: number | null;
  readonly removed: boolean;
  readonly lentTo: readonly number[];
}
export interface QuestionSubject {
  readonly askerId: number | null;
}
export interface SavedSearchSubject {
  readonly ownerId: number;
}
export type NoteAction =
  | 'read'
  | 'read-draft'
  | 'read-handed-in'
  | 'edit'
  | 'hand-in'
  | 'take-back'
  | 'revise'
  | 'remove'
  | 'restore'
  | 'claim'
  | 'decide'
  | 'take-down'
  | 'dispute'
  | 'answer-dispute'
  | 'ask'
  | 'try-it';
export type KilnAction = 'read' | 'read-loans' | 'edit' | 'lend' | 'remove' | 'fire';
export type QuestionAction = 'answer' | 'remove';
export type SiteAction = 'write' | 'moderate' | 'administer';

const isMember = (actor: Actor): actor is SignedIn => actor.kind === 'member';
const isStaff = (actor: Actor): actor is SignedIn =>
  isMember(actor) && (actor.role === 'moderator' || actor.role === 'admin');

/** Acts on the site as a whole. */
export function canOnSite(actor: Actor, action: SiteAction): boolean {
  switch (action) {
    case 'write':
      return isMember(actor);
    case 'moderate':
      return isStaff(actor);
    case 'administer':
      return isMember(actor) && actor.role === 'admin';
  }
}

/** Handed in or on the desk: waiting for a decision. */
export const isWaiting = (status: NoteStatus): boolean =>
  status === 'handed-in' || status === 'on-the-desk';

/** Statuses in which the working copy may be changed by its author. */
const EDITABLE: readonly NoteStatus[] = ['draft', 'sent-back'];

export function canOnNote(actor: Actor, action: NoteAction, note: NoteSubject): boolean {
  const own = isMember(actor) && note.authorId !== null && actor.id === note.authorId;
  // A removed note is there for nobody but its author, and for one act.
  if (note.removed) return own && action === 'restore';
  switch (action) {
    case 'read':
      return note.hasPublished || own || (isStaff(actor) && isWaiting(note.status));
    case 'read-draft':
      return own;
    case 'read-handed-in':
      return isStaff(actor) && isWaiting(note.status);
    case 'edit':
      return own && EDITABLE.includes(note.status);
    case 'hand-in':
      return own && isMember(actor) && actor.emailVerified && EDITABLE.includes(note.status);
    case 'take-back':
      return own && isWaiting(note.status);
    case 'revise':
      return own && ['published', 'declined', 'taken-down'].includes(note.status);
    case 'remove':
      return own && !note.hasPublished && !isWaiting(note.status);
    case 'restore':
      return false;
    case 'claim':
      return (
        isStaff(actor) &&
        !own &&
        isWaiting(note.status) &&
        (note.claimedBy === null || note.claimLapsed || note.claimedBy === actor.id)
      );
    case 'decide':
      // Never on one's own note, and only while holding the claim.
      return (
        isStaff(actor) &&
        !own &&
        note.status === 'on-the-desk' &&
        note.claimedBy === actor.id &&
        !note.claimLapsed
      );
    case 'take-down':
    case 'answer-dispute':
      return isStaff(actor) && !own && note.hasPublished;
    case 'dispute':
      return own && note.hasPublished;
    case 'ask':
      return isMember(actor) && !own && actor.emailVerified && note.hasPublished;
    case 'try-it':
      return isMember(actor) && note.hasPublished;
  }
}

/** Questions stand on published notes only: nobody does anything with one of another. */
export function canOnQuestion(
  actor: Actor,
  action: QuestionAction,
  note: NoteSubject,
  question: QuestionSubject,
): boolean {
  if (!isMember(actor) || note.removed || !note.hasPublished) return false;
  switch (action) {
    case 'answer':
      return (note.authorId !== null && actor.id === note.authorId) || isStaff(actor);
    case 'remove':
      return (question.askerId !== null && actor.id === question.askerId) || isStaff(actor);
  }
}

export function canOnKiln(actor: Actor, action: KilnAction, kiln: KilnSubject): boolean {
  const keeper = isMember(actor) && kiln.keeperId === actor.id;
  const lent = isMember(actor) && kiln.lentTo.includes(actor.id);
  switch (action) {
    case 'read':
      // A kiln's page is public once it has published firings; the query adds that condition.
      return keeper || lent;
    case 'read-loans':
      return keeper || lent;
    case 'edit':
    case 'lend':
    case 'remove':
      return keeper && !kiln.removed;
    case 'fire':
      return (keeper || lent) && !kiln.removed;
  }
}

/** A saved search is its member's alone: to see, to change, to remove. */
export function canOnSavedSearch(actor: Actor, search: SavedSearchSubject): boolean {
  return isMember(actor) && actor.id === search.ownerId;
}

/** All answers about one note, for the presenter. */
export function noteAbilities(actor: Actor, note: NoteSubject) {
  const may = (action: NoteAction): boolean => canOnNote(actor, action, note);
  return {
    edit: may('edit'),
    handIn: may('hand-in'),
    takeBack: may('take-back'),
    revise: may('revise'),
    remove: may('remove'),
    claim: may('claim'),
    takeDown: may('take-down'),
    dispute: may('dispute'),
    tryIt: may('try-it'),
  };
}

export function kilnAbilities(actor: Actor, kiln: KilnSubject) {
  const may = (action: KilnAction): boolean => canOnKiln(actor, action, kiln);
  return { edit: may('edit'), lend: may('lend'), remove: may('remove'), fire: may('fire') };
}

export function siteAbilities(actor: Actor) {
  return {
    write: canOnSite(actor, 'write'),
    handIn: isMember(actor) && actor.emailVerified,
    moderate: canOnSite(actor, 'moderate'),
    administer: canOnSite(actor, 'administer'),
  };
}
