import { createServer, type IncomingMessage, type Server, type ServerResponse } from 'node:http';
import type { Engine } from './engine.ts';
import { EngineError, errorBody, statusOf, toEngineError } from './errors.ts';
import { readBody } from './http-body.ts';
import { matchRoute, type Route, type RouteAnswer } from './http-route.ts';
import { identify, invalidApiKey, mayDo, mayUseIndex } from './keys.ts';

/** Longest time to wait for the whole of a request; stops slow senders from holding on. */
const REQUEST_TIMEOUT_MS = 60_000;

async function answer(
  engine: Engine,
  routes: readonly Route[],
  request: IncomingMessage,
): Promise<RouteAnswer> {
  const [path = '/', ...queryParts] = (request.url ?? '/').split('?');
  const query = new URLSearchParams(queryParts.join('?'));
  const match = matchRoute(routes, request.method ?? 'GET', path);
  if (match.kind === 'unknown') return { status: 404 };
  if (match.kind === 'wrong-method') return { status: 405 };
  const { route, params } = match;
  // The key comes before anything about the request itself, so that nothing leaks without one.
  const access =
    route.action === null
      ? { master: false, key: null }
      : identify(request.headers.authorization, engine.masterKey, engine.state.keys.values());
  if (route.action !== null && !mayDo(access, route.action)) throw invalidApiKey();
  const indexUid = params['indexUid'];
  if (indexUid !== undefined && !mayUseIndex(access, indexUid)) throw invalidApiKey();
  const body =
    request.method === 'GET' ? undefined : await readBody(request, route.largeBody ?? false);
  return route.handle({ engine, access, params, query, body });
}

function send(response: ServerResponse, { status, body }: RouteAnswer): void {
  response.statusCode = status;
  if (body === undefined) {
    response.end();
    return;
  }
  // As text, head and body leave in one piece.
  const text = JSON.stringify(body);
  response.setHeader('Content-Type', 'application/json');
  response.setHeader('Content-Length', Buffer.byteLength(text));
  response.end(text);
}

/** The HTTP side of the engine. Every failure of a request ends as an answer, never as a crash. */
export function createHttpServer(engine: Engine, routes: readonly Route[]): Server {
  const server = createServer((request, response) => {
    answer(engine, routes, request)
      .catch((error: unknown): RouteAnswer => {
        if (!(error instanceof EngineError)) console.error('A request failed:', error);
        const known = toEngineError(error);
        if (known.code === 'payload_too_large') response.setHeader('Connection', 'close');
        return { status: statusOf(known.code), body: errorBody(known) };
      })
      .then((result) => {
        send(response, result);
      })
      .catch((error: unknown) => {
        console.error('An answer could not be sent:', error);
        response.destroy();
      });
  });
  server.requestTimeout = REQUEST_TIMEOUT_MS;
  return server;
}
