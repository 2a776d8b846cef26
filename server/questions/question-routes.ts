import { z } from 'zod';
import { answerBodySchema, askBodySchema } from '#shared/api/questions.ts';
import { defineRoute, memberOf, reply, type Route } from '../http/define-route.ts';
import { idParams, idSchema } from '../http/ids.ts';
import { RATES } from '../http/rates.ts';
import { answerQuestion, askQuestion, readQuestions, removeQuestion } from './question-service.ts';

const questionParams = z.object({ id: idSchema, questionId: idSchema });

/** Questions about a published note. Each change is answered with all of them as they are then. */
export const questionRoutes: readonly Route[] = [
  defineRoute({
    method: 'get',
    path: '/api/notes/:id/questions',
    access: 'anyone',
    params: idParams,
    handle: ({ db, actor, params }) => readQuestions(db, actor, params.id),
  }),
  defineRoute({
    method: 'post',
    path: '/api/notes/:id/questions',
    access: 'member',
    params: idParams,
    body: askBodySchema,
    idempotent: true,
    rate: RATES.questions,
    async handle({ db, actor, params, body }) {
      await askQuestion(db, memberOf(actor), params.id, body.text);
      return reply(201, await readQuestions(db, actor, params.id));
    },
  }),
  defineRoute({
    method: 'put',
    path: '/api/notes/:id/questions/:questionId/answer',
    access: 'member',
    params: questionParams,
    body: answerBodySchema,
    rate: RATES.answers,
    async handle({ db, actor, params, body }) {
      await answerQuestion(db, memberOf(actor), params.id, params.questionId, body.text);
      return readQuestions(db, actor, params.id);
    },
  }),
  defineRoute({
    method: 'delete',
    path: '/api/notes/:id/questions/:questionId',
    access: 'member',
    params: questionParams,
    async handle({ db, actor, params }) {
      await removeQuestion(db, memberOf(actor), params.id, params.questionId);
      return readQuestions(db, actor, params.id);
    },
  }),
];
