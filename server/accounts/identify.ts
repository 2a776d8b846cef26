import type { RequestHandler } from 'express';
import session from 'express-session';
import { VISITOR } from '../authorization/actor.ts';
import type { Deps } from '../deps.ts';
import { prepareNobody } from './hashing.ts';
import { sessionCookieName, sessionCookieOptions } from './session-cookie.ts';
import { DatabaseSessionStore } from './session-store.ts';

/**
 * Finds out who asks. The session and its member are read with one query; a request without a cookie
 * costs none and is given no cookie. Rights are read anew with every request, so a change of them
 * holds from the next one on.
 */
export function identify(deps: Deps): RequestHandler[] {
  const { config, db } = deps;
  // Made before it is needed, or the first unknown address would cost two hashes.
  void prepareNobody();
  return [
    session({
      name: sessionCookieName(config),
      secret: [...config.sessionSecrets],
      store: new DatabaseSessionStore(db),
      resave: false,
      saveUninitialized: false,
      cookie: sessionCookieOptions(config),
    }),
    (request, _response, next) => {
      const { reader, confirmedAt } = request.session;
      request.actor = VISITOR;
      if (!reader) {
        next();
        return;
      }
      if (reader.suspended) {
        request.session.destroy(next);
        return;
      }
      request.actor = {
        kind: 'member',
        id: reader.id,
        name: reader.name,
        role: reader.role,
        emailVerified: reader.emailVerified,
        confirmedAt: confirmedAt ?? 0,
      };
      next();
    },
  ];
}
