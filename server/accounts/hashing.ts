import argon2 from 'argon2';
import { turnstile } from '../http/turnstile.ts';

/**
 * argon2id with the parameters OWASP's Password Storage page gives as its floor: 19 MiB, two passes,
 * one lane. RFC 9106's second choice (64 MiB, 3, 4) was measured on the two cores this is meant to
 * run on: 166 ms and 64 MiB a hash against 46 ms and 19 MiB, which four at once turn into a quarter
 * of a gigabyte and every thread of the process. Passwords here have 15 characters or more.
 */
export const HASH_PARAMETERS = {
  type: argon2.argon2id,
  memoryCost: 19_456,
  timeCost: 2,
  parallelism: 1,
} as const;

/** Hashes under way at once, and how many may wait for their turn; more are told to come back. */
const AT_ONCE = 4;
const MAY_WAIT = 40;

const inTurn = turnstile(AT_ONCE, MAY_WAIT);

/** @throws AppError 'busy' when too many hashes wait already */
export function hashPassword(password: string): Promise<string> {
  return inTurn(() => argon2.hash(password.normalize('NFC'), HASH_PARAMETERS));
}

/** A hash that no password opens; verifying against it costs what verifying a real one costs. */
let nobody: Promise<string> | undefined;
export function prepareNobody(): Promise<string> {
  nobody ??= argon2.hash(crypto.getRandomValues(new Uint8Array(32)).toString(), HASH_PARAMETERS);
  return nobody;
}

/**
 * Whether the password belongs to the hash. With no hash (an unknown address) it is false, after
 * the same work, so that the time tells nothing.
 */
export async function isPassword(hash: string | null, password: string): Promise<boolean> {
  const against = hash ?? (await prepareNobody());
  const right = await inTurn(() => argon2.verify(against, password.normalize('NFC')));
  return right && hash !== null;
}

/** True for hashes made with weaker parameters than today's. */
export function isOutdated(hash: string): boolean {
  return argon2.needsRehash(hash, HASH_PARAMETERS);
}
