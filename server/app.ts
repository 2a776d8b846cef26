import path from 'node:path';
import express, { type Express } from 'express';
import { identify } from './accounts/identify.ts';
import type { Deps } from './deps.ts';
import { answerProblems, AppError } from './http/problem.ts';
import { beginRequest } from './http/request-log.ts';
import { permissionsPolicy, securityHeaders } from './http/security-headers.ts';
import { servePages } from './pages/serve-pages.ts';
import { healthRouter } from './health/health-router.ts';
import { ROUTES } from './routes.ts';

/** The built client. */
const DIST = path.resolve(import.meta.dirname, '../dist');

/**
 * The whole web application. Order: request id, headers, health, built files, who asks, the API
 * and media routes, pages, and at the end the one place that answers problems.
 */
export function createApp(deps: Deps, dist: string = DIST): Express {
  const { config, log } = deps;
  const app = express();
  app.disable('x-powered-by');
  app.set('trust proxy', config.trustProxy);
  app.set('etag', 'strong');
  app.use(beginRequest(log));
  app.use(securityHeaders(config.publicUrl), permissionsPolicy);
  app.use(healthRouter(deps));
  app.use(
    '/assets',
    express.static(path.join(dist, 'assets'), { immutable: true, maxAge: '1y', index: false }),
  );

  const api = express.Router();
  api.use(['/api', '/media'], ...identify(deps));
  api.use('/api', (request, response, next) => {
    // A signed-in reader's answers are nobody else's; a visitor's may be re-validated.
    response.set('Cache-Control', request.actor.kind === 'member' ? 'no-store' : 'no-cache');
    response.vary('Cookie');
    next();
  });
  for (const route of ROUTES) route.mount(api, deps);
  api.use(['/api', '/media'], () => {
    throw new AppError('not-found');
  });
  app.use(api);
  app.use(servePages(deps, dist));
  app.use(answerProblems(config.publicUrl, log));
  return app;
}
