import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import { findAnswerSchema, suggestAnswerSchema } from '#shared/api/search.ts';
import { send } from '../http/client.ts';

/** Searches; the address of the page is the whole question. */
export const findQueries = {
  all: ['find'] as const,
  answer: (search: string) =>
    queryOptions({
      queryKey: [...findQueries.all, 'answer', search],
      queryFn: ({ signal }) =>
        send({ path: `/api/search?${search}`, answer: findAnswerSchema, signal }),
      // The rows stay while a changed filter is being answered.
      placeholderData: keepPreviousData,
    }),
  suggestions: (text: string) =>
    queryOptions({
      queryKey: [...findQueries.all, 'suggestions', text],
      queryFn: ({ signal }) =>
        send({
          path: `/api/suggestions?q=${encodeURIComponent(text)}`,
          answer: suggestAnswerSchema,
          signal,
        }),
      enabled: text.trim().length > 1,
      placeholderData: keepPreviousData,
    }),
};
