import type { NoteFields } from '#shared/note/note-fields.ts';
import { forgetUnsent, keepUnsent } from './unsent-work.ts';

/** The copy that one open page keeps of one note, in this browser, while the server lacks it. */
export interface PageCopy {
  /** @returns false where this browser keeps nothing */
  readonly keep: (fields: NoteFields, fromVersion: number) => boolean;
  /** This page goes on with what another left; that copy goes when this page's is through. */
  readonly takeUp: (writer: string) => void;
  readonly forget: () => void;
}

export function pageCopyOf(memberId: number, noteId: number): PageCopy {
  /** This page's own name for the copies it keeps. */
  const ownWriter = crypto.randomUUID().slice(0, 8);
  let takenUp: string | null = null;
  return {
    keep: (fields, fromVersion) => {
      const work = { fromVersion, at: new Date().toISOString(), fields };
      return keepUnsent(memberId, noteId, work, ownWriter);
    },
    takeUp: (writer) => {
      takenUp = writer;
    },
    forget: () => {
      for (const writer of [ownWriter, takenUp]) {
        if (writer !== null) forgetUnsent(memberId, noteId, writer);
      }
      takenUp = null;
    },
  };
}
