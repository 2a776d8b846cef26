import { createHash } from 'node:crypto';
import { isIPv6 } from 'node:net';
import type { Knex } from 'knex';
import { inTransaction } from '../database/transaction.ts';
import { AppError } from '../http/problem.ts';

/** How often something may be tried within a window that starts with the first try. */
export interface ThrottleRule {
  readonly name: string;
  readonly limit: number;
  readonly windowSeconds: number;
  /**
   * Once the limit is reached: one try at a time, each after twice the wait of the one before. The
   * longest wait bounds it, so nothing is ever locked for good.
   */
  readonly longestWaitSeconds?: number;
}

const MINUTE = 60;
export const THROTTLES = {
  signInOfAccount: {
    name: 'sign-in-account',
    limit: 10,
    windowSeconds: 15 * MINUTE,
    longestWaitSeconds: 6 * 60 * MINUTE,
  },
  signInFromClient: { name: 'sign-in-client', limit: 25, windowSeconds: 5 * MINUTE },
  joining: { name: 'join', limit: 5, windowSeconds: 30 * MINUTE },
  passwordReset: { name: 'reset', limit: 5, windowSeconds: 30 * MINUTE },
  verification: { name: 'verify', limit: 5, windowSeconds: 30 * MINUTE },
  linkUse: { name: 'link', limit: 20, windowSeconds: 30 * MINUTE },
  newSession: { name: 'session', limit: 120, windowSeconds: 5 * MINUTE },
} as const satisfies Record<string, ThrottleRule>;

/** A growing wait is forgotten after this long without a try. */
const FORGOTTEN_AFTER_SECONDS = 24 * 60 * MINUTE;

export interface Tries {
  readonly count: number;
  /** Seconds until the window ends; negative when it has ended. */
  readonly secondsLeft: number;
}

/** One more try: what to store then, or how many seconds to wait first. */
export function nextTries(
  rule: ThrottleRule,
  tries: Tries,
): { count: number; windowSeconds: number } | { waitSeconds: number } {
  const open = tries.secondsLeft > 0;
  if (open && tries.count >= rule.limit) return { waitSeconds: tries.secondsLeft };
  if (open) return { count: tries.count + 1, windowSeconds: tries.secondsLeft };
  const grows = rule.longestWaitSeconds !== undefined && tries.count >= rule.limit;
  if (grows && tries.secondsLeft > -FORGOTTEN_AFTER_SECONDS) {
    const wait = rule.windowSeconds * 2 ** Math.min(20, tries.count - rule.limit + 1);
    return { count: tries.count + 1, windowSeconds: Math.min(wait, rule.longestWaitSeconds) };
  }
  return { count: 1, windowSeconds: rule.windowSeconds };
}

const keyOf = (rule: ThrottleRule, subject: string): string =>
  createHash('sha256').update(`${rule.name}\n${subject}`).digest('hex');

/**
 * Counts a try before it is made, under a lock on its row: a hundred at once cannot slip through
 * together. The counts are in the database and outlive a restart.
 *
 * @throws AppError 'too-many' with the seconds to wait
 */
export async function takeTry(db: Knex, rule: ThrottleRule, subject: string): Promise<void> {
  const key = keyOf(rule, subject);
  // The usual case in one statement: a window is open and there is room in it.
  const counted = await db('throttles')
    .where({ key_hash: key })
    .where('count', '<', rule.limit)
    .where('window_ends_at', '>', db.raw('NOW(3)'))
    .increment('count', 1);
  if (counted > 0) return;
  const waitSeconds = await inTransaction(db, async (trx) => {
    await trx.raw(
      `INSERT INTO throttles (key_hash, count, window_ends_at) VALUES (?, 0, NOW(3))
       ON DUPLICATE KEY UPDATE count = count`,
      [key],
    );
    const tries = await trx('throttles')
      .where('throttles.key_hash', key)
      .forUpdate()
      .first<{ count: number; secondsLeft: number }>(
        'throttles.count',
        trx.raw(
          'TIMESTAMPDIFF(MICROSECOND, NOW(3), throttles.window_ends_at) / 1e6 AS secondsLeft',
        ),
      );
    const next = nextTries(rule, tries);
    if ('waitSeconds' in next) return next.waitSeconds;
    await trx('throttles')
      .where({ key_hash: key })
      .update({
        count: next.count,
        window_ends_at: trx.raw('NOW(3) + INTERVAL ? SECOND', [next.windowSeconds]),
      });
    return 0;
  });
  if (waitSeconds > 0) {
    const retryAfter = Math.ceil(waitSeconds);
    throw new AppError('too-many', { detail: `Try again in ${inWords(retryAfter)}.`, retryAfter });
  }
}

/** A try that turned out right does not count. */
export async function giveTryBack(db: Knex, rule: ThrottleRule, subject: string): Promise<void> {
  await db('throttles')
    .where({ key_hash: keyOf(rule, subject) })
    .where('count', '>', 0)
    .decrement('count', 1);
}

/** The right password ends the count of wrong ones. */
export async function forgetTries(db: Knex, rule: ThrottleRule, subject: string): Promise<void> {
  await db('throttles')
    .where({ key_hash: keyOf(rule, subject) })
    .delete();
}

function inWords(seconds: number): string {
  if (seconds < 90) return `${String(seconds)} seconds`;
  if (seconds < 90 * MINUTE) return `${String(Math.ceil(seconds / MINUTE))} minutes`;
  return `${String(Math.ceil(seconds / 3600))} hours`;
}

/**
 * Who a client address stands for: an IPv4 address, or the first 64 bits of an IPv6 one, since one
 * household has all the rest.
 */
export function clientOf(address: string | undefined): string {
  if (address === undefined) return 'unknown';
  const mapped = /^::ffff:(\d+\.\d+\.\d+\.\d+)$/i.exec(address);
  if (mapped?.[1] !== undefined) return mapped[1];
  if (!isIPv6(address)) return address;
  const [head = '', tail] = (address.split('%')[0] ?? '').toLowerCase().split('::');
  const left = head === '' ? [] : head.split(':');
  const right = tail === undefined || tail === '' ? [] : tail.split(':');
  const zeros = tail === undefined ? 0 : 8 - left.length - right.length;
  const groups = [...left, ...Array<string>(Math.max(0, zeros)).fill('0'), ...right];
  return groups
    .slice(0, 4)
    .map((group) => group.replace(/^0+(?=.)/, ''))
    .join(':');
}
