import { randomBytes } from 'node:crypto';
import type { Request } from 'express';
import type { Role } from '#shared/vocabulary/statuses.ts';
import { sessionEnds } from './session-store.ts';
import { browserName } from './browser-name.ts';

export const newToken = (): string => randomBytes(24).toString('base64url');

/**
 * A session for a member under a new identifier; whatever the browser came with ends here. Called at
 * sign-in and when the password changes. It is stored before the answer goes out.
 */
export async function beginSession(
  request: Request,
  member: { id: number; role: Role },
): Promise<{ token: string }> {
  await callback((done) => request.session.regenerate(done));
  const { session } = request;
  const token = newToken();
  session.token = token;
  session.memberId = member.id;
  session.role = member.role;
  session.confirmedAt = Date.now();
  session.browser = browserName(request.get('User-Agent'));
  session.cookie.maxAge = sessionEnds(member.role).absoluteSeconds * 1000;
  await saveSession(request);
  return { token };
}

/** Writes the session now, so that a store that is away is told before anything is answered. */
export function saveSession(request: Request): Promise<void> {
  return callback((done) => request.session.save(done));
}

export function endSession(request: Request): Promise<void> {
  return callback((done) => request.session.destroy(done));
}

function callback(run: (done: (error: unknown) => void) => void): Promise<void> {
  return new Promise((resolve, reject) => {
    run((error) => {
      if (error) reject(error instanceof Error ? error : new Error('The session was not kept.'));
      else resolve();
    });
  });
}
