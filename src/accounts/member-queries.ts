import { queryOptions } from '@tanstack/react-query';
import { memberPageSchema } from '#shared/api/accounts.ts';
import { send } from '../http/client.ts';

/** Reads of members' own pages. */
export const memberQueries = {
  all: ['members'] as const,
  page: (memberId: number) =>
    queryOptions({
      queryKey: [...memberQueries.all, 'page', memberId],
      queryFn: ({ signal }) =>
        send({ path: `/api/members/${String(memberId)}`, answer: memberPageSchema, signal }),
    }),
};
