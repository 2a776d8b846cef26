import { queryOptions } from '@tanstack/react-query';
import { kilnListSchema, kilnPageSchema } from '#shared/api/kilns.ts';
import { send } from '../http/client.ts';

export const kilnPath = (kilnId: number, rest = ''): string =>
  `/api/kilns/${String(kilnId)}${rest}`;

/** Reads of kilns. Keys begin with `kilns`. */
export const kilnQueries = {
  all: ['kilns'] as const,
  /** Those one keeps and those lent to one. */
  mine: () =>
    queryOptions({
      queryKey: [...kilnQueries.all, 'mine'],
      queryFn: ({ signal }) => send({ path: '/api/kilns', answer: kilnListSchema, signal }),
    }),
  page: (kilnId: number) =>
    queryOptions({
      queryKey: [...kilnQueries.all, 'page', kilnId],
      queryFn: ({ signal }) => send({ path: kilnPath(kilnId), answer: kilnPageSchema, signal }),
    }),
};
