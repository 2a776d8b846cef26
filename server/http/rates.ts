import type { ThrottleRule } from '../accounts/throttle.ts';

const MINUTE = 60;

/** How often a member, or a visitor's address, may ask for what costs the server much. */
export const RATES = {
  newNotes: { name: 'new-note', limit: 30, windowSeconds: 60 * MINUTE },
  uploads: { name: 'upload', limit: 60, windowSeconds: 30 * MINUTE },
  recordFiles: { name: 'record-file', limit: 60, windowSeconds: 30 * MINUTE },
  lookAlikes: { name: 'look-alike', limit: 30, windowSeconds: MINUTE },
  lookAlikesOfNotes: { name: 'look-alike-note', limit: 120, windowSeconds: MINUTE },
  searches: { name: 'search', limit: 60, windowSeconds: MINUTE },
  disputes: { name: 'dispute', limit: 30, windowSeconds: 60 * MINUTE },
  questions: { name: 'question', limit: 10, windowSeconds: 60 * MINUTE },
  savedSearches: { name: 'saved-search', limit: 60, windowSeconds: 60 * MINUTE },
  unsubscribes: { name: 'unsubscribe', limit: 60, windowSeconds: MINUTE },
  answers: { name: 'answer', limit: 60, windowSeconds: 60 * MINUTE },
  exports: { name: 'export', limit: 10, windowSeconds: 60 * MINUTE },
} as const satisfies Record<string, ThrottleRule>;
