import type { Draft } from '#shared/api/notes.ts';
import type { NoteFields } from '#shared/note/note-fields.ts';

export type SaveState =
  | { readonly kind: 'saved'; readonly at: string }
  | { readonly kind: 'waiting' }
  | { readonly kind: 'saving' }
  /** Not sent: no network, or the server is away. Tried again by itself. */
  | { readonly kind: 'unsent'; readonly reason: string; readonly keptHere: boolean }
  /** Saved elsewhere meanwhile: both versions are shown, and nothing is sent until one is chosen. */
  | {
      readonly kind: 'conflict';
      readonly theirs: NoteFields;
      readonly theirVersion: number;
      readonly theirsAt: string;
    }
  /** The server refused what was typed, or the note can no longer be edited. */
  | { readonly kind: 'refused'; readonly reason: string };

export interface KeptDraft {
  /** What is on the screen. */
  readonly fields: NoteFields;
  /** The server's last answer: checks, findings, record, remarks. */
  readonly draft: Draft;
  readonly state: SaveState;
}

/** Another version is on the server than the one that was written on top of. */
export const conflictWith = (
  theirs: Pick<Draft, 'fields' | 'version' | 'savedAt'>,
): SaveState & { readonly kind: 'conflict' } => ({
  kind: 'conflict',
  theirs: theirs.fields,
  theirVersion: theirs.version,
  theirsAt: theirs.savedAt,
});
