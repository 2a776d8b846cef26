import { queryOptions } from '@tanstack/react-query';
import { topicFiguresSchema, topicFiguresUrl, type TopicQuery } from '#shared/api/figure-topics.ts';
import { frontSchema, troubleSharesSchema, whatHelpedSchema } from '#shared/api/figures.ts';
import type { FigureTopic } from '#shared/vocabulary/figures.ts';
import type { Trouble } from '#shared/vocabulary/troubles.ts';
import { send } from '../http/client.ts';

/** Reads of pooled figures. */
export const figureQueries = {
  all: ['figures'] as const,
  front: () =>
    queryOptions({
      queryKey: [...figureQueries.all, 'front'],
      queryFn: ({ signal }) => send({ path: '/api/front', answer: frontSchema, signal }),
    }),
  shares: () =>
    queryOptions({
      queryKey: [...figureQueries.all, 'shares'],
      queryFn: ({ signal }) =>
        send({ path: '/api/what-helped', answer: troubleSharesSchema, signal }),
    }),
  topic: (topic: FigureTopic, query: TopicQuery) =>
    queryOptions({
      queryKey: [...figureQueries.all, 'topic', topic, query],
      queryFn: ({ signal }) =>
        send({ path: topicFiguresUrl(topic, query), answer: topicFiguresSchema, signal }),
    }),
  whatHelped: (trouble: Trouble) =>
    queryOptions({
      queryKey: [...figureQueries.all, 'what-helped', trouble],
      queryFn: ({ signal }) =>
        send({ path: `/api/what-helped/${trouble}`, answer: whatHelpedSchema, signal }),
    }),
};
