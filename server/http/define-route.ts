import { createHash } from 'node:crypto';
import express, { type Request, type RequestHandler, type Response, type Router } from 'express';
import type { Knex } from 'knex';
import type { z } from 'zod';
import { clientOf, takeTry, type ThrottleRule } from '../accounts/throttle.ts';
import type { Actor, SignedIn } from '../authorization/actor.ts';
import type { Deps } from '../deps.ts';
import { inTransaction } from '../database/transaction.ts';
import { checkOwnOrigin } from './own-origin.ts';
import { recallOrRemember } from './idempotency.ts';
import { AppError } from './problem.ts';

/** Who may even try. Finer rules are asked by the service, on loaded data. */
export type Access = 'anyone' | 'member' | 'moderator' | 'admin';
export type Method = 'get' | 'post' | 'put' | 'delete';

type Parsed<Schema> = Schema extends z.ZodType ? z.output<Schema> : undefined;

export interface Context<Params, Query, Body> {
  readonly params: Params;
  readonly query: Query;
  readonly body: Body;
  readonly actor: Actor;
  /** An open transaction for idempotent routes, else the pool. */
  readonly db: Knex;
  readonly deps: Deps;
  readonly request: Request;
  readonly response: Response;
}

/** A handler returns the JSON to answer with, a `reply`, or undefined after answering itself. */
export type Answer = object | Reply | undefined;
export interface Reply {
  readonly status: number;
  readonly body: object | null;
  readonly headers?: Readonly<Record<string, string>>;
  readonly isReply: true;
}
/** An answer with a status or headers of its own. */
export function reply(
  status: number,
  body: object | null,
  headers: Readonly<Record<string, string>> = {},
): Reply {
  return { status, body, headers, isReply: true };
}
const isReply = (answer: object): answer is Reply => 'isReply' in answer;

export interface RouteSpec<
  Params extends z.ZodType | undefined = undefined,
  Query extends z.ZodType | undefined = undefined,
  Body extends z.ZodType | undefined = undefined,
> {
  readonly method: Method;
  readonly path: string;
  readonly access: Access;
  readonly params?: Params;
  readonly query?: Query;
  /** JSON body. Multipart routes leave it out and put their parser into `before`. */
  readonly body?: Body;
  /** A create: the same Idempotency-Key gives the first answer again (members only). */
  readonly idempotent?: boolean;
  /**
   * A change that programs make which are no page of ours: neither own origin nor token is asked for,
   * and a form will do. What is in its address must then be the whole right.
   */
  readonly fromAnywhere?: boolean;
  /** How often one member, or one client address of visitors, may ask. */
  readonly rate?: ThrottleRule;
  /** Handlers between the access check and the parsing, e.g. an upload. */
  readonly before?: (deps: Deps) => RequestHandler[];
  /** Public answers may be kept by the browser for re-validation; all else is `no-store`. */
  readonly handle: (
    context: Context<Parsed<Params>, Parsed<Query>, Parsed<Body>>,
  ) => Promise<Answer> | Answer;
}

/** A declared route, ready to be put into a router and to be listed by a test. */
export interface Route {
  readonly method: Method;
  readonly path: string;
  readonly access: Access;
  readonly mount: (router: Router, deps: Deps) => void;
}

const RANK: Record<Access, number> = { anyone: 0, member: 1, moderator: 2, admin: 3 };

/** Throws unless the actor reaches the access level: 401 to visitors, 403 to members. */
export function requireAccess(actor: Actor, access: Access): void {
  if (access === 'anyone') return;
  if (actor.kind === 'visitor') throw new AppError('sign-in-needed');
  if (RANK[actor.role] < RANK[access]) throw new AppError('not-allowed');
}

/** The signed-in member behind a request that has passed an access check above `anyone`. */
export function memberOf(actor: Actor): SignedIn {
  if (actor.kind === 'visitor') throw new AppError('sign-in-needed');
  return actor;
}

/** Zod's issues as JSON pointers into the body. */
export function pointersOf(error: z.ZodError): { pointer: string; detail: string }[] {
  return error.issues.slice(0, 50).map((issue) => ({
    pointer: `/${issue.path.map((part) => String(part).replace(/~/g, '~0').replace(/\//g, '~1')).join('/')}`,
    detail: issue.message,
  }));
}

function parse(
  schema: z.ZodType | undefined,
  value: unknown,
  code: 'bad-query' | 'bad-input' | 'not-found',
) {
  if (!schema) return undefined;
  const result = schema.safeParse(value);
  if (result.success) return result.data;
  throw new AppError(
    code,
    code === 'not-found'
      ? {}
      : { detail: 'See what is said beside each field.', errors: pointersOf(result.error) },
  );
}

const jsonBody = express.json({ limit: '256kb', strict: true });
/** A body of another type is refused, also where none is read: forms of other sites send such. */
const requireJson: RequestHandler = (request, _response, next) => {
  const isEmpty = request.get('Content-Length') === '0' && !request.get('Transfer-Encoding');
  if (!isEmpty && request.is('application/json') === false) {
    throw new AppError('wrong-type', 'Send JSON.');
  }
  next();
};

const whoAsks = (request: Request): string =>
  request.actor.kind === 'member' ? `member ${String(request.actor.id)}` : clientOf(request.ip);

const isUnsafe = (method: Method): boolean => method !== 'get';

/**
 * Declares a route. Order of every request: access, own origin and token (for changes), body,
 * schemas, then the handler with one typed input. Nothing is written back to the request.
 */
export function defineRoute<
  Params extends z.ZodType | undefined = undefined,
  Query extends z.ZodType | undefined = undefined,
  Body extends z.ZodType | undefined = undefined,
>(spec: RouteSpec<Params, Query, Body>): Route {
  const mount = (router: Router, deps: Deps): void => {
    const admit: RequestHandler = async (request, _response, next) => {
      requireAccess(request.actor, spec.access);
      if (isUnsafe(spec.method) && !spec.fromAnywhere)
        checkOwnOrigin(request, deps.config.publicUrl);
      // A create is counted when it is one: its repeats only ask for the first answer again.
      if (spec.rate && !spec.idempotent) await takeTry(deps.db, spec.rate, whoAsks(request));
      next();
    };
    const run: RequestHandler = async (request, response) => {
      const params = parse(spec.params, request.params, 'not-found') as Parsed<Params>;
      const query = parse(spec.query, request.query, 'bad-query') as Parsed<Query>;
      const body = parse(spec.body, request.body, 'bad-input') as Parsed<Body>;
      const handle = (db: Knex): Promise<Answer> | Answer =>
        spec.handle({ params, query, body, actor: request.actor, db, deps, request, response });
      const { actor } = request;
      const answer =
        spec.idempotent && actor.kind === 'member'
          ? await inTransaction(deps.db, (trx) =>
              recallOrRemember(
                trx,
                {
                  memberId: actor.id,
                  key: request.get('Idempotency-Key'),
                  route: `${spec.method} ${request.path}`,
                  bodyHash: createHash('sha256')
                    .update(JSON.stringify(request.body ?? null))
                    .digest('hex'),
                },
                async () => {
                  if (spec.rate) await takeTry(trx, spec.rate, whoAsks(request));
                  const fresh = await handle(trx);
                  return fresh === undefined
                    ? reply(204, null)
                    : isReply(fresh)
                      ? fresh
                      : reply(200, fresh);
                },
              ),
            )
          : await handle(deps.db);
      send(response, answer);
    };
    const before =
      spec.before?.(deps) ??
      (spec.body
        ? [requireJson, jsonBody]
        : isUnsafe(spec.method) && !spec.fromAnywhere
          ? [requireJson]
          : []);
    router[spec.method](spec.path, admit, ...before, run);
  };
  return { method: spec.method, path: spec.path, access: spec.access, mount };
}

function send(response: Response, answer: Answer): void {
  if (answer === undefined) return;
  const { status, body, headers } = isReply(answer) ? answer : reply(200, answer);
  response.status(status);
  for (const [name, value] of Object.entries(headers ?? {})) response.set(name, value);
  if (body === null) response.end();
  else response.json(body);
}
