import express from 'express';
import type { Route } from './define-route.ts';

/**
 * Browsers report breaches of the content policy here. They send their own content type and no
 * token, so this is mounted by hand: it changes nothing, reads at most 8 kB and only logs.
 */
export const reportRoutes: readonly Route[] = [
  {
    method: 'post',
    path: '/api/csp-reports',
    access: 'anyone',
    mount(router, deps) {
      const body = express.json({
        limit: '8kb',
        type: ['application/csp-report', 'application/reports+json', 'application/json'],
      });
      router.post('/api/csp-reports', body, (request, response) => {
        deps.log.warn(
          { requestId: request.requestId, report: request.body as unknown },
          'csp report',
        );
        response.status(204).end();
      });
    },
  },
];
