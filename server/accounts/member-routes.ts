import { defineRoute, type Route } from '../http/define-route.ts';
import { idParams } from '../http/ids.ts';
import { AppError } from '../http/problem.ts';
import { findMemberPage } from './member-page.ts';

export const memberRoutes: readonly Route[] = [
  defineRoute({
    method: 'get',
    path: '/api/members/:id',
    access: 'anyone',
    params: idParams,
    handle: async ({ db, params }) => {
      const page = await findMemberPage(db, params.id);
      if (!page) throw new AppError('not-found');
      return page;
    },
  }),
];
