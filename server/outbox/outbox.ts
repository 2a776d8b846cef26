import type { Knex } from 'knex';

/**
 * Work promised by a transaction: the row commits with the change, a worker does it later, at
 * least once. Payloads are ids; the handler reads the current rows again, so late or twice is
 * harmless. No secret stands in a payload: links' tokens are made when the mail is sent.
 */
export interface OutboxJobs {
  /** Bring one note's document in the index up to date, or remove it. */
  'index-note': { noteId: number };
  /** Read an uploaded record into readings. */
  'read-record': { recordId: number };
  /** Send one mail. */
  mail: MailJob;
}
export type MailJob =
  | { kind: 'verify-email'; memberId: number }
  | { kind: 'already-joined'; memberId: number }
  | { kind: 'reset-password'; memberId: number }
  | { kind: 'password-changed'; memberId: number }
  | { kind: 'change-email'; memberId: number; newEmail: string }
  | { kind: 'email-changed'; memberId: number; oldEmail: string }
  | { kind: 'note-published'; memberId: number; noteId: number; auditReason: string }
  | { kind: 'note-sent-back'; memberId: number; noteId: number; auditReason: string }
  | { kind: 'note-declined'; memberId: number; noteId: number; auditReason: string }
  | { kind: 'note-taken-down'; memberId: number; noteId: number; auditReason: string }
  | { kind: 'dispute-answered'; memberId: number; noteId: number; disputeId: number }
  | { kind: 'question-asked'; memberId: number; noteId: number; questionId: number }
  | {
      kind: 'question-answered';
      memberId: number;
      noteId: number;
      questionId: number;
      byMemberId: number;
    }
  | { kind: 'note-tried'; memberId: number; noteId: number; byNoteId: number }
  | {
      kind: 'news-of-searches';
      memberId: number;
      finds: { searchId: number; noteIds: number[] }[];
    }
  | { kind: 'note-handed-in'; memberId: number; noteId: number };
export type OutboxTopic = keyof OutboxJobs;

/** Adds a job; a second one with the same key while the first waits is the same job. */
export async function enqueue<Topic extends OutboxTopic>(
  trx: Knex,
  topic: Topic,
  dedupeKey: string,
  payload: OutboxJobs[Topic],
): Promise<void> {
  await trx('outbox')
    .insert({ topic, dedupe_key: dedupeKey, payload: JSON.stringify(payload) })
    .onConflict(['topic', 'dedupe_key'])
    .ignore();
}
