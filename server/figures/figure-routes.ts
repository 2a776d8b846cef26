import { z } from 'zod';
import { topicQuerySchema } from '#shared/api/figure-topics.ts';
import { FIGURE_TOPIC_IDS } from '#shared/vocabulary/figures.ts';
import { TROUBLE_IDS } from '#shared/vocabulary/troubles.ts';
import { defineRoute, type Route } from '../http/define-route.ts';
import { readFront, readTroubleShares, readWhatHelped } from './figure-service.ts';
import { readTopic, readTopicCsv } from './topic-service.ts';

const topicParams = z.object({ topic: z.enum(FIGURE_TOPIC_IDS) });

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
  defineRoute({
    method: 'get',
    path: '/api/figures/:topic',
    access: 'anyone',
    params: topicParams,
    query: topicQuerySchema,
    handle: ({ db, params, query }) => readTopic(db, params.topic, query),
  }),
  defineRoute({
    method: 'get',
    path: '/api/figures/:topic/rows.csv',
    access: 'anyone',
    params: topicParams,
    query: topicQuerySchema,
    async handle({ db, params, query, response }) {
      const csv = await readTopicCsv(db, params.topic, query);
      response.type('text/csv; charset=utf-8').attachment(`spyhole-${params.topic}.csv`).send(csv);
      return undefined;
    },
  }),
];
