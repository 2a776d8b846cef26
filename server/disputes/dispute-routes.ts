import { z } from 'zod';
import { disputeAnswerBodySchema, disputeBodySchema } from '#shared/api/disputes.ts';
import { defineRoute, memberOf, type Route } from '../http/define-route.ts';
import { versionFromIfMatch } from '../http/entity-version.ts';
import { idParams, idSchema } from '../http/ids.ts';
import { RATES } from '../http/rates.ts';
import { presentNotePage } from '../notes/note-presenter.ts';
import { readNotePage } from '../notes/note-service.ts';
import { answerDispute, listDisputedFindings } from './answer-dispute.ts';
import { disputeFinding, withdrawDispute } from './dispute-service.ts';

export const disputeRoutes: readonly Route[] = [
  defineRoute({
    method: 'put',
    path: '/api/notes/:id/disputes',
    access: 'member',
    params: idParams,
    body: disputeBodySchema,
    rate: RATES.disputes,
    async handle({ db, actor, params, body }) {
      await disputeFinding(db, memberOf(actor), params.id, body);
      return presentNotePage(db, actor, await readNotePage(db, actor, params.id));
    },
  }),
  defineRoute({
    method: 'delete',
    path: '/api/notes/:id/disputes/:disputeId',
    access: 'member',
    params: z.object({ id: idSchema, disputeId: idSchema }),
    async handle({ db, actor, params, request }) {
      const version = versionFromIfMatch(request);
      await withdrawDispute(db, memberOf(actor), params.id, params.disputeId, version);
      return presentNotePage(db, actor, await readNotePage(db, actor, params.id));
    },
  }),
  defineRoute({
    method: 'get',
    path: '/api/desk/disputes',
    access: 'moderator',
    handle: ({ db, actor }) => listDisputedFindings(db, memberOf(actor)),
  }),
  defineRoute({
    method: 'put',
    path: '/api/desk/disputes/:id',
    access: 'moderator',
    params: idParams,
    body: disputeAnswerBodySchema,
    async handle({ db, actor, params, body, request }) {
      const version = versionFromIfMatch(request);
      await answerDispute(db, memberOf(actor), params.id, version, body);
      return listDisputedFindings(db, memberOf(actor));
    },
  }),
];
