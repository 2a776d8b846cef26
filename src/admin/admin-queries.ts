import { queryOptions } from '@tanstack/react-query';
import {
  adminMembersSchema,
  auditSchema,
  caughtMailsSchema,
  outboxStateSchema,
  reindexStateSchema,
} from '#shared/api/admin.ts';
import { send } from '../http/client.ts';

/** Rows the server gives at a time, of members and of the log. */
export const ADMIN_PAGE_SIZE = 50;

/** Reads of the people who run the site. */
export const adminQueries = {
  all: ['admin'] as const,
  allMembers: ['admin', 'members'] as const,
  members: (question: string, page: number) =>
    queryOptions({
      queryKey: [...adminQueries.allMembers, question, page],
      queryFn: ({ signal }) => {
        const query = new URLSearchParams({ page: String(page) });
        if (question !== '') query.set('q', question);
        return send({
          path: `/api/admin/members?${query.toString()}`,
          answer: adminMembersSchema,
          signal,
        });
      },
    }),
  outbox: () =>
    queryOptions({
      queryKey: [...adminQueries.all, 'outbox'],
      queryFn: ({ signal }) =>
        send({ path: '/api/admin/outbox', answer: outboxStateSchema, signal }),
      refetchInterval: 5_000,
    }),
  reindex: () =>
    queryOptions({
      queryKey: [...adminQueries.all, 'reindex'],
      queryFn: ({ signal }) =>
        send({ path: '/api/admin/reindex', answer: reindexStateSchema, signal }),
      refetchInterval: ({ state }) => (state.data?.running ? 700 : 5_000),
    }),
  mail: () =>
    queryOptions({
      queryKey: [...adminQueries.all, 'mail'],
      queryFn: ({ signal }) => send({ path: '/api/admin/mail', answer: caughtMailsSchema, signal }),
      refetchInterval: 10_000,
    }),
  audit: (page: number) =>
    queryOptions({
      queryKey: [...adminQueries.all, 'audit', page],
      queryFn: ({ signal }) =>
        send({ path: `/api/admin/audit?page=${String(page)}`, answer: auditSchema, signal }),
      staleTime: 0,
    }),
};
