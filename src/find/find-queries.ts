import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import { findAnswerSchema, suggestAnswerSchema, type FindAnswer } from '#shared/api/search.ts';
import { send } from '../http/client.ts';

const questionIn = (search: string | undefined): string | null =>
  search === undefined ? null : (new URLSearchParams(search).get('q') ?? '');

/** Searches; the address of the page is the whole question. */
export const findQueries = {
  all: ['find'] as const,
  answer: (search: string) =>
    queryOptions({
      queryKey: [...findQueries.all, 'answer', search],
      queryFn: ({ signal }) =>
        send({ path: `/api/search?${search}`, answer: findAnswerSchema, signal }),
      // The rows stay while a changed filter is being answered, but never those of another question.
      placeholderData: (previous: FindAnswer | undefined, query) =>
        questionIn(query?.queryKey[2]) === questionIn(search) ? previous : undefined,
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
