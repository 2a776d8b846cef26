import { z } from 'zod';
import { TROUBLE_IDS } from '#shared/vocabulary/troubles.ts';
import { defineRoute, type Route } from '../http/define-route.ts';
import { readFront, readTroubleShares, readWhatHelped } from './figure-service.ts';

export const figureRoutes: readonly Route[] = [
  defineRoute({
    method: 'get',
    path: '/api/front',
    access: 'anyone',
    handle: ({ db }) => readFront(db),
  }),
  defineRoute({
    method: 'get',
    path: '/api/what-helped',
    access: 'anyone',
    handle: ({ db }) => readTroubleShares(db),
  }),
  defineRoute({
    method: 'get',
    path: '/api/what-helped/:trouble',
    access: 'anyone',
    params: z.object({ trouble: z.enum(TROUBLE_IDS) }),
    handle: ({ db, params }) => readWhatHelped(db, params.trouble),
  }),
];
