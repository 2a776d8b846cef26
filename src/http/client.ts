import type { z } from 'zod';
import { problemSchema, type Problem } from '#shared/api/problem.ts';
import { tokenAnswerSchema } from '#shared/api/accounts.ts';

/** A refusal by the server, with everything it said. */
export class ProblemError extends Error {
  readonly problem: Problem;
  constructor(problem: Problem) {
    super(problem.detail);
    this.name = 'ProblemError';
    this.problem = problem;
  }
}

/** The server could not be reached at all: no network, or it is being restarted. */
export class OfflineError extends Error {
  constructor() {
    super('Spyhole cannot be reached just now. Nothing is lost; try again.');
    this.name = 'OfflineError';
  }
}

/** The token of this session, sent back with every change; fetched when first needed. */
let token: string | null = null;
export function rememberToken(next: string | null): void {
  token = next;
}

export interface Sending<Schema extends z.ZodType> {
  readonly method?: 'GET' | 'POST' | 'PUT' | 'DELETE';
  readonly path: string;
  readonly body?: unknown;
  /** What the answer must look like; anything else is an error of ours, not of the reader. */
  readonly answer: Schema;
  readonly signal?: AbortSignal | undefined;
  readonly headers?: Readonly<Record<string, string>>;
}

async function ownToken(): Promise<string> {
  if (token !== null) return token;
  const response = await reach('/api/session/token', {
    method: 'POST',
    headers: { Accept: 'application/json' },
  });
  if (!response.ok) throw new ProblemError(await problemOf(response));
  token = tokenAnswerSchema.parse(await response.json()).token;
  return token;
}

async function reach(path: string, init: RequestInit): Promise<Response> {
  try {
    return await fetch(path, { credentials: 'same-origin', ...init });
  } catch (error) {
    if (error instanceof DOMException && error.name === 'AbortError') throw error;
    throw new OfflineError();
  }
}

/** The problem document of a refused answer; a plain one when a proxy answered instead. */
export async function problemOf(response: Response): Promise<Problem> {
  const body: unknown = await response.json().catch(() => null);
  const parsed = problemSchema.safeParse(body);
  if (parsed.success) return parsed.data;
  return {
    type: 'about:blank',
    code: 'internal',
    title: 'Something broke',
    status: response.status,
    detail: 'The server gave no readable answer. Try again in a moment.',
  };
}

/** After signing in elsewhere the token is another one: the next change fetches it anew. */
export function forgetToken(): void {
  token = null;
}

/** The headers every change needs. */
export async function changeHeaders(): Promise<Record<string, string>> {
  return { 'X-Spyhole-Token': await ownToken() };
}

/**
 * The only fetch of the application: sends, and parses the answer with its schema.
 *
 * @throws ProblemError for a refusal, OfflineError when nothing answered
 */
export async function send<Schema extends z.ZodType>(
  sending: Sending<Schema>,
): Promise<z.output<Schema>> {
  const response = await sendOnce(sending);
  if (response.status === 403 && sending.method !== undefined && sending.method !== 'GET') {
    const problem = await problemOf(response.clone());
    if (problem.code === 'token-refused') {
      forgetToken();
      return readAnswer(await sendOnce(sending), sending.answer);
    }
  }
  return readAnswer(response, sending.answer);
}

/**
 * The bytes of a file.
 *
 * @throws ProblemError for a refusal, OfflineError when nothing answered
 */
export async function fetchBytes(path: string, signal?: AbortSignal): Promise<ArrayBuffer> {
  const response = await reach(path, signal ? { signal } : {});
  if (!response.ok) throw new ProblemError(await problemOf(response));
  try {
    return await response.arrayBuffer();
  } catch (error) {
    if (error instanceof DOMException && error.name === 'AbortError') throw error;
    throw new OfflineError();
  }
}

async function sendOnce({ method = 'GET', path, body, signal, headers }: Sending<z.ZodType>) {
  return reach(path, {
    method,
    ...(signal ? { signal } : {}),
    headers: {
      Accept: 'application/json',
      ...(body === undefined ? {} : { 'Content-Type': 'application/json' }),
      ...(method === 'GET' ? {} : await changeHeaders()),
      ...headers,
    },
    ...(body === undefined ? {} : { body: JSON.stringify(body) }),
  });
}

async function readAnswer<Schema extends z.ZodType>(
  response: Response,
  schema: Schema,
): Promise<z.output<Schema>> {
  if (!response.ok) throw new ProblemError(await problemOf(response));
  return schema.parse(response.status === 204 ? null : await response.json());
}

/** A key under which a create may be sent again without being done twice. */
export function newIdempotencyKey(): string {
  return crypto.randomUUID();
}
