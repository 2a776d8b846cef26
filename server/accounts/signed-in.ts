import type { Actor, SignedIn } from '../authorization/actor.ts';
import { AppError } from '../http/problem.ts';

/** The member behind an actor whose route asks for one. @throws AppError sign-in-needed */
export function signedIn(actor: Actor): SignedIn {
  if (actor.kind === 'visitor') throw new AppError('sign-in-needed');
  return actor;
}

/** How long a typed password counts for acts that hurt. */
const CONFIRMED_MILLISECONDS = 10 * 60_000;

/**
 * Acts that hurt need the password typed within ten minutes (ASVS 7.5.3). A time in the future means
 * that the clock was set back: it confirms nothing.
 *
 * @throws AppError confirm-password
 */
export function requireConfirmed(actor: SignedIn, now: number = Date.now()): void {
  const age = now - actor.confirmedAt;
  if (age < 0 || age > CONFIRMED_MILLISECONDS) throw new AppError('confirm-password');
}
