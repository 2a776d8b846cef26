import type { CookieOptions } from 'express';
import type { Config } from '../config.ts';
import { AppError } from '../http/problem.ts';

/**
 * With HTTPS the `__Host-` prefix makes browsers refuse the cookie from anybody else (another host,
 * plain HTTP, a wider path). Without it, which is for one's own machine only, they would refuse the
 * prefix.
 */
export function sessionCookieName(config: Config): string {
  return config.isHttps ? '__Host-spyhole' : 'spyhole';
}

/** No Domain, no Max-Age: those of a session that nobody has signed in to. */
export function sessionCookieOptions(config: Config): CookieOptions {
  return { httpOnly: true, sameSite: 'lax', path: '/', secure: config.isHttps };
}

const LOOPBACK = /^(localhost|127(\.\d{1,3}){3}|\[::1\]|.+\.localhost)$/;

/**
 * Nobody is signed in over a line that others can read.
 *
 * @throws AppError 'not-allowed' saying what the person who runs the site has to set
 */
export function requirePrivateLine(config: Config, isSecure: boolean): void {
  if (config.isHttps) {
    if (isSecure) return;
    throw new AppError(
      'not-allowed',
      'This request came over plain HTTP, so nobody can sign in. If a proxy does the HTTPS, set TRUST_PROXY and let it send X-Forwarded-Proto.',
    );
  }
  const isOwnMachine = LOOPBACK.test(new URL(config.publicUrl).hostname);
  if (config.environment === 'production' && !isOwnMachine) {
    throw new AppError(
      'not-allowed',
      'This site is set up for plain HTTP, so nobody can sign in. PUBLIC_URL must start with https.',
    );
  }
}
