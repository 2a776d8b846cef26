import type { ErrorRequestHandler } from 'express';
import type { Logger } from 'pino';
import type { Problem } from '#shared/api/problem.ts';
import { isUnreachable } from '../database/constraint-errors.ts';

/** Every way a request can be refused: code → status and title. */
const CATALOGUE = {
  'bad-request': [400, 'This request could not be read'],
  'bad-query': [400, 'This address has a part that cannot be read'],
  'idempotency-key-missing': [400, 'This request needs an Idempotency-Key'],
  'sign-in-needed': [401, 'Sign in first'],
  'wrong-credentials': [401, 'The address or the password is wrong'],
  'token-refused': [403, 'This page is out of date'],
  'foreign-origin': [403, 'This request did not come from Spyhole'],
  'not-allowed': [403, 'You may not do this'],
  'verify-email-first': [403, 'Confirm your e-mail address first'],
  'confirm-password': [403, 'Type your password again first'],
  suspended: [403, 'This account is suspended'],
  'not-found': [404, 'There is nothing here'],
  'method-not-allowed': [405, 'This cannot be done here'],
  conflict: [409, 'Somebody was quicker'],
  'already-claimed': [409, 'Another moderator has this note on the desk'],
  'stale-revision': [409, 'The note has changed since you read it'],
  'wrong-status': [409, 'The note is no longer where it was'],
  'in-use': [409, 'This is in use'],
  'same-name': [409, 'Another member has this name'],
  stale: [412, 'A newer version was saved elsewhere'],
  'too-large': [413, 'This is too large'],
  'wrong-type': [415, 'This type of content is not read here'],
  'bad-input': [422, 'Some of this cannot be kept'],
  'checks-open': [422, 'Some checks are still open'],
  'key-reused': [422, 'This Idempotency-Key was used for another request'],
  'link-used': [422, 'This link has been used or is out of date'],
  'bad-picture': [422, 'This picture cannot be read'],
  'bad-record': [422, 'This record cannot be read'],
  'version-missing': [428, 'This save needs the version it started from'],
  'too-many': [429, 'Too many tries'],
  internal: [500, 'Something broke here'],
  busy: [503, 'Too busy just now'],
  away: [503, 'A part of Spyhole is away'],
  'no-space': [507, 'There is no room left'],
} as const satisfies Record<string, readonly [number, string]>;
export type ProblemCode = keyof typeof CATALOGUE;

export interface ProblemDetails {
  detail?: string;
  errors?: { pointer: string; detail: string }[];
  retryAfter?: number;
  current?: unknown;
}

/** A refusal meant for a person. Services throw it; the one error middleware answers it. */
export class AppError extends Error {
  readonly code: ProblemCode;
  readonly details: ProblemDetails;

  constructor(code: ProblemCode, details: ProblemDetails | string = {}) {
    const asDetails = typeof details === 'string' ? { detail: details } : details;
    super(asDetails.detail ?? CATALOGUE[code][1]);
    this.code = code;
    this.details = asDetails;
  }

  get status(): number {
    return CATALOGUE[this.code][0];
  }
}

/** The body of an error as RFC 9457 has it. */
export function toProblem(error: AppError, base: string, instance: string | undefined): Problem {
  const [status, title] = CATALOGUE[error.code];
  return {
    type: `${base}/problems/${error.code}`,
    code: error.code,
    title,
    status,
    detail: error.details.detail ?? title,
    ...(instance === undefined ? {} : { instance }),
    ...(error.details.errors ? { errors: error.details.errors } : {}),
    ...(error.details.retryAfter === undefined ? {} : { retryAfter: error.details.retryAfter }),
    ...(error.details.current === undefined ? {} : { current: error.details.current }),
  };
}

interface KnownShape {
  code?: unknown;
  errno?: unknown;
  type?: unknown;
  status?: unknown;
  expose?: unknown;
  message?: unknown;
  name?: unknown;
}

/** What an error of a library means to the asker; unknown ones stay unknown (500). */
export function asAppError(error: unknown): AppError {
  if (error instanceof AppError) return error;
  const shape: KnownShape = typeof error === 'object' && error !== null ? error : {};
  if (shape.type === 'entity.too.large') {
    return new AppError('too-large', 'This is larger than 256 kB, the most that is read here.');
  }
  if (shape.type === 'encoding.unsupported' || shape.type === 'charset.unsupported') {
    return new AppError('wrong-type');
  }
  if (shape.expose === true && typeof shape.status === 'number' && shape.status < 500) {
    return new AppError('bad-request', 'The body is not what its type says.');
  }
  if (error instanceof URIError) return new AppError('not-found');
  if (shape.code === 'ENOSPC' || shape.code === 'EDQUOT') return new AppError('no-space');
  if (shape.name === 'DatabaseBusyError') return new AppError('busy', { retryAfter: 2 });
  if (isUnreachable(error)) return new AppError('away', { retryAfter: 5 });
  return new AppError('internal');
}

/** The only place where an error becomes an answer. */
export function answerProblems(base: string, log: Logger): ErrorRequestHandler {
  return (error: unknown, request, response, _next) => {
    const problem = asAppError(error);
    if (problem.status >= 500) {
      log.error({ requestId: request.requestId, err: error }, 'request failed');
    }
    if (response.headersSent) {
      response.destroy();
      return;
    }
    // A refused upload is not read to its end.
    if (!request.complete && problem.status >= 400) response.set('Connection', 'close');
    if (problem.details.retryAfter !== undefined) {
      response.set('Retry-After', String(Math.ceil(problem.details.retryAfter)));
    }
    response
      .status(problem.status)
      .set('Cache-Control', 'no-store')
      .type('application/problem+json')
      .send(JSON.stringify(toProblem(problem, base, request.requestId)));
  };
}
