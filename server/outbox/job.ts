import type { OutboxJobs, OutboxTopic } from './outbox.ts';

/** One promised piece of work, as its handler gets it. */
export interface Job<Topic extends OutboxTopic> {
  readonly id: number;
  readonly payload: OutboxJobs[Topic];
  /** This try included. */
  readonly attempts: number;
  readonly ageSeconds: number;
  /** An earlier try had handed its work over to another server, and then nothing more was heard. */
  readonly wasHandedOver: boolean;
  /**
   * Writes down that from now on it cannot be known whether the work was done. For work that must
   * not be done twice: if this process ends here, the next one finds `wasHandedOver`.
   */
  readonly handOver: () => Promise<void>;
}

/** How the jobs of a topic are done, and tried again. */
export interface Handler<Topic extends OutboxTopic> {
  readonly handle: (job: Job<Topic>) => Promise<void>;
  /** Jobs claimed together; groups among them run side by side. */
  readonly atOnce: number;
  /** Jobs with the same group are done one after the other, oldest first. */
  readonly groupOf: (payload: OutboxJobs[Topic]) => string;
  /** The wait doubles from the first to the longest. */
  readonly firstWaitSeconds: number;
  readonly longestWaitSeconds: number;
  /** Null: never. */
  readonly giveUpAfterSeconds: number | null;
}
export type Handlers = { readonly [Topic in OutboxTopic]: Handler<Topic> };

/** Thrown by a handler when trying again cannot help. */
export class GiveUp extends Error {}

/**
 * Seconds until the next try: twice the last wait, a fifth more or less, so that jobs which failed
 * together do not come back together; never more than the longest.
 *
 * @param chance 0 to 1
 */
export function waitSeconds(
  handler: Pick<Handler<OutboxTopic>, 'firstWaitSeconds' | 'longestWaitSeconds'>,
  attempts: number,
  chance: number,
): number {
  const doubled = handler.firstWaitSeconds * 2 ** Math.min(30, Math.max(0, attempts - 1));
  return Math.min(handler.longestWaitSeconds, doubled * (0.8 + 0.4 * chance));
}

/**
 * What is kept of an error for the admins: one line without mail addresses, since servers like to
 * repeat them.
 */
export function describeError(error: unknown): string {
  const message = error instanceof Error ? error.message : String(error);
  return message
    .replace(/[^\s<>"'()]+@[^\s<>"'()]+/g, '(an address)')
    .replace(/[\p{Cc}\p{Cf}\s]+/gu, ' ')
    .slice(0, 300)
    .trim();
}
