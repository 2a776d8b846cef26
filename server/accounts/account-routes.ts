import type { Request } from 'express';
import {
  changeEmailBodySchema,
  changePasswordBodySchema,
  type Done,
  forgotPasswordBodySchema,
  joinBodySchema,
  profileBodySchema,
  resetPasswordBodySchema,
  settingsBodySchema,
  verifyEmailBodySchema,
} from '#shared/api/accounts.ts';
import type { Deps } from '../deps.ts';
import { defineRoute, reply, type Route } from '../http/define-route.ts';
import { beginSession } from './begin-session.ts';
import { join } from './join.ts';
import {
  confirmAddress,
  requestPasswordReset,
  sendVerificationAgain,
  usePasswordReset,
} from './mail-links.ts';
import { emailKeyOf } from './normal-forms.ts';
import { changeEmail, changePassword, changeProfile, changeSettings } from './own-account.ts';
import { sessionHash } from './session-store.ts';
import { signedIn } from './signed-in.ts';
import { clientOf, takeTry, type ThrottleRule, THROTTLES } from './throttle.ts';

/** Nothing about accounts is kept by a browser or a proxy. */
const done = (message: string) =>
  reply(200, { message } satisfies Done, { 'Cache-Control': 'no-store' });

/** Counts a request that leads to a mail: for whoever asks, and for the address it would go to. */
async function takeMailTry(
  { db, log }: Deps,
  rule: ThrottleRule,
  request: Request,
  email: string | null,
): Promise<void> {
  try {
    await takeTry(db, rule, clientOf(request.ip));
    if (email !== null) await takeTry(db, rule, `to ${emailKeyOf(email) ?? email}`);
  } catch (error) {
    log.warn({ requestId: request.requestId, event: rule.name, result: 'throttled' }, rule.name);
    throw error;
  }
}

const note = ({ log }: Deps, request: Request, event: string, memberId: number | null): void => {
  log.info({ requestId: request.requestId, event, memberId, result: 'done' }, event);
};

export const accountRoutes: readonly Route[] = [
  defineRoute({
    method: 'post',
    path: '/api/members',
    access: 'anyone',
    body: joinBodySchema,
    handle: async ({ deps, body, request }) => {
      await takeMailTry(deps, THROTTLES.joining, request, body.email);
      await join(deps.db, body);
      note(deps, request, 'join', null);
      return done('Look into your mail: a link there confirms your address.');
    },
  }),
  defineRoute({
    method: 'post',
    path: '/api/email-verifications',
    access: 'anyone',
    body: verifyEmailBodySchema,
    handle: async ({ db, deps, body, request }) => {
      await confirmAddress(db, body.token);
      note(deps, request, 'address-confirmed', null);
      return done('Your address is confirmed.');
    },
  }),
  defineRoute({
    method: 'post',
    path: '/api/email-verifications/again',
    access: 'member',
    handle: async ({ db, deps, request, actor }) => {
      const { id } = signedIn(actor);
      await takeTry(db, THROTTLES.verification, String(id));
      await sendVerificationAgain(db, id);
      note(deps, request, 'verification-again', id);
      return done('Another mail is on its way.');
    },
  }),
  defineRoute({
    method: 'post',
    path: '/api/password-resets',
    access: 'anyone',
    body: forgotPasswordBodySchema,
    handle: async ({ db, deps, body, request }) => {
      await takeMailTry(deps, THROTTLES.passwordReset, request, body.email);
      await requestPasswordReset(db, body.email);
      note(deps, request, 'password-reset-asked', null);
      return done('If there is an account with this address, a mail with a link is on its way.');
    },
  }),
  defineRoute({
    method: 'post',
    path: '/api/password-resets/use',
    access: 'anyone',
    body: resetPasswordBodySchema,
    handle: async ({ db, deps, body, request }) => {
      await takeTry(db, THROTTLES.linkUse, clientOf(request.ip));
      await usePasswordReset(db, body.token, body.password);
      note(deps, request, 'password-reset', null);
      return done('Your new password is set. Sign in with it.');
    },
  }),
  defineRoute({
    method: 'put',
    path: '/api/me/password',
    access: 'member',
    body: changePasswordBodySchema,
    handle: async ({ db, deps, body, actor, request }) => {
      const member = signedIn(actor);
      await changePassword(db, member, body, sessionHash(request.sessionID));
      await beginSession(request, member);
      note(deps, request, 'password-changed', member.id);
      return done('Your password is changed.');
    },
  }),
  defineRoute({
    method: 'put',
    path: '/api/me/email',
    access: 'member',
    body: changeEmailBodySchema,
    handle: async ({ db, deps, body, actor, request }) => {
      const member = signedIn(actor);
      await takeTry(db, THROTTLES.verification, String(member.id));
      await changeEmail(db, member, body);
      note(deps, request, 'email-change-asked', member.id);
      return done('A mail with a link is on its way to the new address.');
    },
  }),
  defineRoute({
    method: 'put',
    path: '/api/me/profile',
    access: 'member',
    body: profileBodySchema,
    handle: ({ db, body, actor }) => changeProfile(db, signedIn(actor), body),
  }),
  defineRoute({
    method: 'put',
    path: '/api/me/settings',
    access: 'member',
    body: settingsBodySchema,
    handle: ({ db, body, actor }) => changeSettings(db, signedIn(actor), body),
  }),
];
