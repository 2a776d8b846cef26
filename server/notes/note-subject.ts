import type { NoteSubject } from '../authorization/rules.ts';
import type { NoteRecord } from './note-repository.ts';

/** What the rules need to know of a note. Removed notes are loaded only to be brought back. */
export function noteSubject(note: NoteRecord, removed = false): NoteSubject {
  return {
    authorId: note.authorId,
    status: note.status,
    hasPublished: note.publishedRevisionId !== null,
    removed,
    claimedBy: note.claimedBy,
    claimLapsed: note.claimLapsed,
  };
}
