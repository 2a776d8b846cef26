import { queryOptions } from '@tanstack/react-query';
import { savedSearchesSchema } from '#shared/api/saved-searches.ts';
import { send } from '../http/client.ts';

/** A member's saved searches. */
export const savedSearchQueries = {
  all: ['saved-searches'] as const,
  list: () =>
    queryOptions({
      queryKey: [...savedSearchQueries.all, 'list'],
      queryFn: ({ signal }) =>
        send({ path: SAVED_SEARCHES_PATH, answer: savedSearchesSchema, signal }),
    }),
};

export const SAVED_SEARCHES_PATH = '/api/saved-searches';
