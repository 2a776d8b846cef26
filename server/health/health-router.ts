import { Router } from 'express';
import type { Deps } from '../deps.ts';

/** Alive: the process answers. Ready: the database answers too, and no stop is under way. */
export function healthRouter(deps: Deps): Router {
  const router = Router();
  router.get('/health/live', (_request, response) => {
    response.json({ status: 'alive' });
  });
  router.get('/health/ready', async (_request, response) => {
    try {
      if (deps.stopping?.()) throw new Error('stopping');
      await deps.db.raw('SELECT 1').timeout(2000);
      response.json({ status: 'ready' });
    } catch {
      response.status(503).json({ status: 'not ready' });
    }
  });
  return router;
}
