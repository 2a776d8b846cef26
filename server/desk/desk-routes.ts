import { z } from 'zod';
import { decisionBodySchema, remarkBodySchema, takeDownBodySchema } from '#shared/api/desk.ts';
import { defineRoute, memberOf, type Route } from '../http/define-route.ts';
import { idParams, idSchema } from '../http/ids.ts';
import { presentDeskNote, presentQueue } from './desk-presenter.ts';
import { claimNote, decide, giveUpClaim, takeDown } from './desk-service.ts';
import { addRemark, removeRemark } from './remark-service.ts';

export const deskRoutes: readonly Route[] = [
  defineRoute({
    method: 'get',
    path: '/api/desk',
    access: 'moderator',
    handle: ({ db, actor }) => presentQueue(db, memberOf(actor)),
  }),
  defineRoute({
    method: 'get',
    path: '/api/desk/notes/:id',
    access: 'moderator',
    params: idParams,
    handle: ({ db, actor, params }) => presentDeskNote(db, memberOf(actor), params.id),
  }),
  defineRoute({
    method: 'put',
    path: '/api/desk/notes/:id/claim',
    access: 'moderator',
    params: idParams,
    async handle({ db, actor, params }) {
      await claimNote(db, memberOf(actor), params.id);
      return presentDeskNote(db, memberOf(actor), params.id);
    },
  }),
  defineRoute({
    method: 'delete',
    path: '/api/desk/notes/:id/claim',
    access: 'moderator',
    params: idParams,
    async handle({ db, actor, params }) {
      await giveUpClaim(db, memberOf(actor), params.id);
      return { message: 'The note is back on the pile.' };
    },
  }),
  defineRoute({
    method: 'post',
    path: '/api/desk/notes/:id/remarks',
    access: 'moderator',
    params: idParams,
    body: remarkBodySchema,
    idempotent: true,
    async handle({ db, actor, params, body }) {
      await addRemark(db, memberOf(actor), params.id, body);
      return presentDeskNote(db, memberOf(actor), params.id);
    },
  }),
  defineRoute({
    method: 'delete',
    path: '/api/desk/notes/:id/remarks/:remarkId',
    access: 'moderator',
    params: z.object({ id: idSchema, remarkId: idSchema }),
    async handle({ db, actor, params }) {
      await removeRemark(db, memberOf(actor), params.id, params.remarkId);
      return presentDeskNote(db, memberOf(actor), params.id);
    },
  }),
  defineRoute({
    method: 'post',
    path: '/api/desk/notes/:id/decision',
    access: 'moderator',
    params: idParams,
    body: decisionBodySchema,
    async handle({ db, actor, params, body }) {
      await decide(db, memberOf(actor), params.id, body);
      return { message: 'Decided. The author is told by mail.' };
    },
  }),
  defineRoute({
    method: 'post',
    path: '/api/notes/:id/take-down',
    access: 'moderator',
    params: idParams,
    body: takeDownBodySchema,
    async handle({ db, actor, params, body }) {
      await takeDown(db, memberOf(actor), params.id, body.reason);
      return { message: 'Taken down. The author is told by mail.' };
    },
  }),
];
