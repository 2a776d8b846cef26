import type { Engine } from './engine.ts';
import type { Json } from './json.ts';
import type { Access, Action } from './keys.ts';

/** One request that has passed the key check. `body` is undefined when none was sent. */
export type RouteRequest = {
  engine: Engine;
  access: Access;
  params: Record<string, string>;
  query: URLSearchParams;
  body: Json | undefined;
};

export type RouteAnswer = { status: number; body?: Json };

export type Route = {
  method: 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';
  /** Segments that begin with `:` are parameters; `:uid` after `indexes` is checked with the key. */
  path: string;
  /** What the key must allow; null only where no key is asked for. */
  action: Action | null;
  /** Documents may be long; everything else is kept short. */
  largeBody?: boolean;
  handle: (request: RouteRequest) => RouteAnswer | Promise<RouteAnswer>;
};

export type RouteMatch =
  | { kind: 'found'; route: Route; params: Record<string, string> }
  | { kind: 'wrong-method' }
  | { kind: 'unknown' };

function decode(segment: string): string {
  try {
    return decodeURIComponent(segment);
  } catch {
    return segment;
  }
}

/** Finds the route of a path, given without its query string. */
export function matchRoute(routes: readonly Route[], method: string, path: string): RouteMatch {
  const segments = path
    .split('/')
    .filter((segment) => segment !== '')
    .map(decode);
  let pathKnown = false;
  for (const route of routes) {
    const pattern = route.path.split('/').filter((segment) => segment !== '');
    if (pattern.length !== segments.length) continue;
    const params: Record<string, string> = {};
    const matches = pattern.every((part, at) => {
      const segment = segments[at] ?? '';
      if (!part.startsWith(':')) return part === segment;
      params[part.slice(1)] = segment;
      return true;
    });
    if (!matches) continue;
    pathKnown = true;
    if (route.method === method) return { kind: 'found', route, params };
  }
  return pathKnown ? { kind: 'wrong-method' } : { kind: 'unknown' };
}
