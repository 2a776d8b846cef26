import type { NoteSubject } from '../authorization/rules.ts';
import type { NoteRecord } from './note-repository.ts';

/** What the rules need to know of a note. Removed notes are not loaded in the first place. */
export function noteSubject(note: NoteRecord): NoteSubject {
  return {
    authorId: note.authorId,
    status: note.status,
    hasPublished: note.publishedRevisionId !== null,
    removed: false,
    claimedBy: note.claimedBy,
    claimLapsed: note.claimLapsed,
  };
}
