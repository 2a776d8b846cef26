import { queryOptions } from '@tanstack/react-query';
import { lookAlikesSchema, type LookAlikesBody } from '#shared/api/look-alikes.ts';
import { send } from '../http/client.ts';

/** Published firings that climbed alike. A question is a read: it may be asked again at will. */
export const lookAlikeQueries = {
  all: ['look-alikes'] as const,
  ofRecord: (body: LookAlikesBody) =>
    queryOptions({
      queryKey: [...lookAlikeQueries.all, 'record', body],
      queryFn: ({ signal }) =>
        send({ method: 'POST', path: '/api/look-alikes', body, answer: lookAlikesSchema, signal }),
    }),
  ofNote: (noteId: number, revision: number) =>
    queryOptions({
      queryKey: [...lookAlikeQueries.all, 'note', noteId, revision],
      queryFn: ({ signal }) =>
        send({
          path: `/api/notes/${String(noteId)}/look-alikes`,
          answer: lookAlikesSchema,
          signal,
        }),
    }),
  /** `saved` is what of the draft decides how its record is read, as the server has it. */
  ofDraft: (noteId: number, saved: string) =>
    queryOptions({
      queryKey: [...lookAlikeQueries.all, 'draft', noteId, saved],
      queryFn: ({ signal }) =>
        send({
          path: `/api/notes/${String(noteId)}/look-alikes?of=draft`,
          answer: lookAlikesSchema,
          signal,
        }),
    }),
};
