import type { Deps } from '../deps.ts';
import { mailHandler } from '../mail/mail-handler.ts';
import type { Handlers } from './job.ts';

export interface HandlerParts {
  /** Turns an uploaded file into readings. */
  readonly readRecord: (deps: Deps, recordId: number) => Promise<void>;
  /** Brings one note's document in the index up to date with the database, or removes it. */
  readonly indexNote: (deps: Deps, noteId: number) => Promise<void>;
}

/** Topic → what is done. */
export function createHandlers(deps: Deps, { indexNote, readRecord }: HandlerParts): Handlers {
  return {
    mail: mailHandler(deps),
    'read-record': {
      handle: (job) => readRecord(deps, job.payload.recordId),
      // Each takes a thread and much memory.
      atOnce: 1,
      groupOf: ({ recordId }) => String(recordId),
      firstWaitSeconds: 2,
      longestWaitSeconds: 10 * 60,
      giveUpAfterSeconds: 24 * 60 * 60,
    },
    'index-note': {
      handle: (job) => indexNote(deps, job.payload.noteId),
      // Several notes at once, but never one note twice at once: the newest state is written last.
      atOnce: 16,
      groupOf: ({ noteId }) => String(noteId),
      // An engine that was away is caught up with within a minute of its return, and never given up.
      firstWaitSeconds: 1,
      longestWaitSeconds: 30,
      giveUpAfterSeconds: null,
    },
  };
}
