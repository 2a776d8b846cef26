import { queryOptions } from '@tanstack/react-query';
import { sessionAnswerSchema, sessionListSchema } from '#shared/api/accounts.ts';
import { rememberToken, send } from '../http/client.ts';

/** Who reads: the same answer feeds the frame, the rights and the units. */
export const sessionQueries = {
  all: ['session'] as const,
  current: () =>
    queryOptions({
      queryKey: [...sessionQueries.all, 'current'],
      queryFn: async ({ signal }) => {
        const session = await send({ path: '/api/session', answer: sessionAnswerSchema, signal });
        if (session.token !== null) rememberToken(session.token);
        return session;
      },
      staleTime: 60_000,
    }),
  list: () =>
    queryOptions({
      queryKey: [...sessionQueries.all, 'list'],
      queryFn: ({ signal }) => send({ path: '/api/sessions', answer: sessionListSchema, signal }),
    }),
};
