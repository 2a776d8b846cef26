import { queryOptions } from '@tanstack/react-query';
import { deskNoteSchema, deskQueueSchema } from '#shared/api/desk.ts';
import { send } from '../http/client.ts';

/** How often the pile is looked at again while it is open. */
const QUEUE_EVERY_MS = 60_000;

/** Where a note at the desk is asked for and changed. */
export const deskPath = (noteId: number, rest = ''): string =>
  `/api/desk/notes/${String(noteId)}${rest}`;

/** Reads of the desk. */
export const deskQueries = {
  all: ['desk'] as const,
  queue: () =>
    queryOptions({
      queryKey: [...deskQueries.all, 'queue'],
      queryFn: ({ signal }) => send({ path: '/api/desk', answer: deskQueueSchema, signal }),
      refetchInterval: QUEUE_EVERY_MS,
      staleTime: 0,
    }),
  note: (noteId: number) =>
    queryOptions({
      queryKey: [...deskQueries.all, 'note', noteId],
      queryFn: ({ signal }) => send({ path: deskPath(noteId), answer: deskNoteSchema, signal }),
      staleTime: 0,
    }),
};
