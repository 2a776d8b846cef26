import { z } from 'zod';
import { defineRoute, memberOf, reply, type Route } from '../http/define-route.ts';
import { idParams } from '../http/ids.ts';
import { presentNotePage } from './note-presenter.ts';
import { readNotebook, readNotePage } from './note-service.ts';
import { countPublished, newestRows } from './published-repository.ts';

const ROWS_A_PAGE = 20;

export const noteRoutes: readonly Route[] = [
  defineRoute({
    method: 'get',
    path: '/api/notes',
    access: 'anyone',
    query: z.strictObject({ page: z.coerce.number().int().min(1).max(1000).default(1) }),
    async handle({ db, query }) {
      const [{ notes: total }, notes] = await Promise.all([
        countPublished(db),
        newestRows(db, ROWS_A_PAGE, (query.page - 1) * ROWS_A_PAGE),
      ]);
      return { notes, total, page: query.page, pages: Math.max(1, Math.ceil(total / ROWS_A_PAGE)) };
    },
  }),
  defineRoute({
    method: 'get',
    path: '/api/notes/:id',
    access: 'anyone',
    params: idParams,
    async handle({ db, actor, params }) {
      return presentNotePage(db, actor, await readNotePage(db, actor, params.id));
    },
  }),
  defineRoute({
    method: 'get',
    path: '/api/notebook',
    access: 'member',
    async handle({ db, actor }) {
      return reply(200, await readNotebook(db, memberOf(actor)));
    },
  }),
];
