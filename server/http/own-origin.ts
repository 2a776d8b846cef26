import { timingSafeEqual } from 'node:crypto';
import type { Request } from 'express';
import { AppError } from './problem.ts';

/**
 * A change is taken only from Spyhole's own pages: the Origin must be ours (or, where a browser
 * leaves it out, Sec-Fetch-Site must say same-origin), and the token given to this session must
 * come back. SameSite cookies alone are not enough (draft-ietf-httpbis-rfc6265bis).
 */
export function checkOwnOrigin(request: Request, publicUrl: string): void {
  const origin = request.get('Origin');
  const site = request.get('Sec-Fetch-Site');
  const own =
    origin === undefined
      ? site === 'same-origin'
      : origin === new URL(publicUrl).origin || site === 'same-origin';
  if (!own) throw new AppError('foreign-origin');
  // Asking for a token is the one change that cannot carry one yet.
  if (request.path === '/api/session/token') return;
  const expected = request.session?.token;
  const given = request.get('X-Spyhole-Token');
  if (
    typeof expected !== 'string' ||
    given === undefined ||
    !equalInConstantTime(expected, given)
  ) {
    throw new AppError('token-refused', 'Load the page again and try once more; nothing was lost.');
  }
}

/** Compares secrets without telling by its time where they differ. */
export function equalInConstantTime(left: string, right: string): boolean {
  const a = Buffer.from(left);
  const b = Buffer.from(right);
  return a.length === b.length && timingSafeEqual(a, b);
}
