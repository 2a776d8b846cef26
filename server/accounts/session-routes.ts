import type { Request, Response } from 'express';
import { z } from 'zod';
import {
  confirmPasswordBodySchema,
  type Done,
  type SessionAnswer,
  signInBodySchema,
} from '#shared/api/accounts.ts';
import { type Actor, VISITOR } from '../authorization/actor.ts';
import { siteAbilities } from '../authorization/rules.ts';
import type { Deps } from '../deps.ts';
import { defineRoute, reply, type Route } from '../http/define-route.ts';
import { AppError } from '../http/problem.ts';
import { type Account, findAccountById, presentMe } from './account-repository.ts';
import { beginSession, endSession, newToken, saveSession } from './begin-session.ts';
import { authenticate } from './passport.ts';
import { requirePrivateLine, sessionCookieName, sessionCookieOptions } from './session-cookie.ts';
import { endSessionsOf, handleOf, openSessionsOf } from './session-repository.ts';
import { sessionHash } from './session-store.ts';
import { signedIn } from './signed-in.ts';
import { clientOf, takeTry, THROTTLES } from './throttle.ts';
import { confirmPassword } from './verify-credentials.ts';

const done = (message: string): Done => ({ message });

function sessionAnswer(account: Account | null, actor: Actor, token: string | null): SessionAnswer {
  return { me: account && presentMe(account), abilities: siteAbilities(actor), token };
}

const asActor = (account: Account, confirmedAt: number): Actor => ({
  kind: 'member',
  id: account.id,
  name: account.name,
  role: account.role,
  emailVerified: account.emailVerified,
  confirmedAt,
});

const currentHash = (request: Request): string => sessionHash(request.sessionID);

export const sessionRoutes: readonly Route[] = [
  defineRoute({
    method: 'get',
    path: '/api/session',
    access: 'anyone',
    handle: async ({ actor, db, request }) => {
      const account = actor.kind === 'member' ? await findAccountById(db, actor.id) : null;
      return sessionAnswer(account, actor, request.session?.token ?? null);
    },
  }),
  defineRoute({
    method: 'post',
    path: '/api/session/token',
    access: 'anyone',
    handle: async ({ deps, request }) => {
      requirePrivateLine(deps.config, request.secure);
      if (request.session.token === undefined) {
        await takeTry(deps.db, THROTTLES.newSession, clientOf(request.ip));
        request.session.token = newToken();
        await saveSession(request);
      }
      return reply(200, { token: request.session.token }, { 'Cache-Control': 'no-store' });
    },
  }),
  defineRoute({
    method: 'post',
    path: '/api/session',
    access: 'anyone',
    body: signInBodySchema,
    handle: async ({ deps, request, response }) => {
      requirePrivateLine(deps.config, request.secure);
      const account = await authenticate(deps, request, response);
      const { token } = await beginSession(request, account);
      const answer = sessionAnswer(account, asActor(account, Date.now()), token);
      return reply(200, answer, { 'Cache-Control': 'no-store' });
    },
  }),
  defineRoute({
    method: 'delete',
    path: '/api/session',
    access: 'anyone',
    handle: async ({ deps, request, response, actor }) => {
      await endSession(request);
      forgetCookie(deps, response);
      if (actor.kind === 'member') {
        deps.log.info(
          { requestId: request.requestId, event: 'sign-out', memberId: actor.id },
          'sign-out',
        );
      }
      return reply(200, sessionAnswer(null, VISITOR, null), { 'Cache-Control': 'no-store' });
    },
  }),
  defineRoute({
    method: 'get',
    path: '/api/sessions',
    access: 'member',
    handle: async ({ actor, db, request }) => {
      const sessions = await openSessionsOf(db, signedIn(actor).id);
      return {
        sessions: sessions.map((session) => ({
          id: handleOf(session.idHash),
          current: session.idHash === currentHash(request),
          startedAt: session.startedAt.toISOString(),
          lastSeenAt: session.seenAt.toISOString(),
          browser: session.browser,
        })),
      };
    },
  }),
  defineRoute({
    method: 'delete',
    path: '/api/sessions',
    access: 'member',
    handle: async ({ actor, deps, request, response }) => {
      await endSessionsOf(deps.db, signedIn(actor).id);
      await endSession(request);
      forgetCookie(deps, response);
      return done('You are signed out everywhere.');
    },
  }),
  defineRoute({
    method: 'delete',
    path: '/api/sessions/:id',
    access: 'member',
    params: z.object({ id: z.string().regex(/^[0-9a-f]{24}$/) }),
    handle: async ({ actor, params, deps, request, response }) => {
      const { id: memberId } = signedIn(actor);
      const sessions = await openSessionsOf(deps.db, memberId);
      const session = sessions.find((one) => handleOf(one.idHash) === params.id);
      if (!session) throw new AppError('not-found');
      await endSessionsOf(deps.db, memberId, { only: session.idHash });
      if (session.idHash === currentHash(request)) {
        await endSession(request);
        forgetCookie(deps, response);
      }
      return done('That session has ended.');
    },
  }),
  defineRoute({
    method: 'post',
    path: '/api/session/confirm',
    access: 'member',
    body: confirmPasswordBodySchema,
    handle: async ({ actor, body, deps, request }) => {
      await confirmPassword(deps.db, signedIn(actor).id, body.password, '/password');
      request.session.confirmedAt = Date.now();
      await saveSession(request);
      return done('Confirmed for the next ten minutes.');
    },
  }),
];

function forgetCookie({ config }: Deps, response: Response): void {
  response.clearCookie(sessionCookieName(config), sessionCookieOptions(config));
}
