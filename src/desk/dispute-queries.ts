import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { disputedFindingsSchema, type DisputeAnswerBody } from '#shared/api/disputes.ts';
import { figureQueries } from '../figures/figure-queries.ts';
import { findQueries } from '../find/find-queries.ts';
import { ProblemError, send } from '../http/client.ts';
import { noteQueries } from '../notes/note-queries.ts';
import { useMessages } from '../ui/useMessages.ts';
import { deskQueries } from './desk-queries.ts';

/** Disputed findings of published notes. */
export const disputeQueries = {
  list: () =>
    queryOptions({
      queryKey: [...deskQueries.all, 'disputes'],
      queryFn: ({ signal }) =>
        send({ path: '/api/desk/disputes', answer: disputedFindingsSchema, signal }),
      staleTime: 0,
    }),
};

export interface GivenAnswer {
  readonly id: number;
  readonly version: number;
  readonly body: DisputeAnswerBody;
}

/** Restores a finding to the figures, or leaves it out. Whoever comes second sees what was said. */
export function useAnswerDispute() {
  const client = useQueryClient();
  const tell = useMessages();
  const { queryKey } = disputeQueries.list();
  return useMutation({
    mutationFn: ({ id, version, body }: GivenAnswer) =>
      send({
        method: 'PUT',
        path: `/api/desk/disputes/${String(id)}`,
        body,
        headers: { 'If-Match': `"v${String(version)}"` },
        answer: disputedFindingsSchema,
      }),
    // The row moves to those looked at and its form is gone: what is told is told from here.
    onSuccess: async (list, { body }) => {
      client.setQueryData(queryKey, list);
      tell({
        kind: 'done',
        text:
          body.decision === 'restore'
            ? 'The finding counts again. The author is told by mail.'
            : 'It stays out of the figures. The author is told by mail.',
      });
      await Promise.all([
        client.invalidateQueries({
          queryKey: noteQueries.all,
          predicate: (query) => query.queryKey[1] !== 'record',
        }),
        client.invalidateQueries({ queryKey: figureQueries.all }),
        client.invalidateQueries({ queryKey: findQueries.all }),
      ]);
    },
    onError: (error) =>
      error instanceof ProblemError ? client.invalidateQueries({ queryKey }) : undefined,
  });
}
