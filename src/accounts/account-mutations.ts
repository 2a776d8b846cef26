import { z } from 'zod';
import {
  changeEmailBodySchema,
  changePasswordBodySchema,
  confirmPasswordBodySchema,
  doneSchema,
  emailSchema,
  forgotPasswordBodySchema,
  joinBodySchema,
  meSchema,
  profileBodySchema,
  resetPasswordBodySchema,
  sessionAnswerSchema,
  settingsBodySchema,
  signInBodySchema,
  verifyEmailBodySchema,
  type Done,
  type Me,
  type SessionAnswer,
} from '#shared/api/accounts.ts';
import { send } from '../http/client.ts';

/**
 * Every write on one's own account. Bodies are judged here by the contract's schema first, so that a
 * ZodError says beside each field what the server would have said.
 */
type Body<Schema extends z.ZodType> = z.input<Schema>;

const post = (path: string, body?: unknown): Promise<Done> =>
  send({ method: 'POST', path, body, answer: doneSchema });

export async function join(
  values: Omit<Body<typeof joinBodySchema>, 'agreed'> & { agreed: boolean },
): Promise<Done> {
  return post('/api/members', joinBodySchema.parse(values));
}

/** A blank is no try: it is not sent, and does not count as one. */
const filledSignIn = signInBodySchema.extend({
  email: z.string().trim().min(1, 'Your address is needed.'),
  password: z.string().min(1, 'Your password is needed.'),
});
const filledForgotten = forgotPasswordBodySchema.extend({ email: emailSchema });

export async function signIn(values: Body<typeof signInBodySchema>): Promise<SessionAnswer> {
  const body = filledSignIn.parse(values);
  return send({ method: 'POST', path: '/api/session', body, answer: sessionAnswerSchema });
}

export function signOut(): Promise<SessionAnswer> {
  return send({ method: 'DELETE', path: '/api/session', answer: sessionAnswerSchema });
}

export function signOutEverywhere(): Promise<Done> {
  return send({ method: 'DELETE', path: '/api/sessions', answer: doneSchema });
}

export function endSession(id: string): Promise<Done> {
  return send({ method: 'DELETE', path: `/api/sessions/${id}`, answer: doneSchema });
}

export async function askForNewPassword(
  values: Body<typeof forgotPasswordBodySchema>,
): Promise<Done> {
  return post('/api/password-resets', filledForgotten.parse(values));
}

export async function setNewPassword(values: Body<typeof resetPasswordBodySchema>): Promise<Done> {
  return post('/api/password-resets/use', resetPasswordBodySchema.parse(values));
}

export async function confirmAddress(values: Body<typeof verifyEmailBodySchema>): Promise<Done> {
  return post('/api/email-verifications', verifyEmailBodySchema.parse(values));
}

export function sendVerificationAgain(): Promise<Done> {
  return post('/api/email-verifications/again');
}

export async function confirmPassword(
  values: Body<typeof confirmPasswordBodySchema>,
): Promise<Done> {
  return post('/api/session/confirm', confirmPasswordBodySchema.parse(values));
}

export async function changePassword(values: Body<typeof changePasswordBodySchema>): Promise<Done> {
  const body = changePasswordBodySchema.parse(values);
  return send({ method: 'PUT', path: '/api/me/password', body, answer: doneSchema });
}

export async function changeEmail(values: Body<typeof changeEmailBodySchema>): Promise<Done> {
  const body = changeEmailBodySchema.parse(values);
  return send({ method: 'PUT', path: '/api/me/email', body, answer: doneSchema });
}

export async function changeProfile(values: Body<typeof profileBodySchema>): Promise<Me> {
  const body = profileBodySchema.parse(values);
  return send({ method: 'PUT', path: '/api/me/profile', body, answer: meSchema });
}

export async function changeSettings(values: Body<typeof settingsBodySchema>): Promise<Me> {
  const body = settingsBodySchema.parse(values);
  return send({ method: 'PUT', path: '/api/me/settings', body, answer: meSchema });
}
