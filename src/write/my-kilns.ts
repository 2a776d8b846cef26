import { queryOptions } from '@tanstack/react-query';
import { kilnListSchema, kilnPageSchema } from '#shared/api/kilns.ts';
import { send } from '../http/client.ts';

/** Kilns as the form needs them: one's own and lent ones, and one that a draft already names. */
export const formKilnQueries = {
  mine: () =>
    queryOptions({
      queryKey: ['kilns', 'mine'] as const,
      queryFn: ({ signal }) => send({ path: '/api/kilns', answer: kilnListSchema, signal }),
    }),
  one: (kilnId: number) =>
    queryOptions({
      queryKey: ['kilns', 'named', kilnId] as const,
      queryFn: ({ signal }) =>
        send({ path: `/api/kilns/${String(kilnId)}`, answer: kilnPageSchema, signal }),
    }),
};
