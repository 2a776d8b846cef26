import { randomUUID } from 'node:crypto';
import type { RequestHandler } from 'express';
import type { Logger } from 'pino';
import { VISITOR } from '../authorization/actor.ts';

/** Gives each request its id and a visitor's rights, and logs one line when it has been answered. */
export function beginRequest(log: Logger): RequestHandler {
  return (request, response, next) => {
    const startedAt = performance.now();
    request.requestId = randomUUID();
    request.actor = VISITOR;
    response.set('X-Request-Id', request.requestId);
    response.on('finish', () => {
      log.info(
        {
          requestId: request.requestId,
          method: request.method,
          // The path only: a question may hold anything, a link's token never comes here.
          path: request.path,
          status: response.statusCode,
          memberId: request.actor.kind === 'member' ? request.actor.id : null,
          ms: Math.round(performance.now() - startedAt),
        },
        'request',
      );
    });
    next();
  };
}
