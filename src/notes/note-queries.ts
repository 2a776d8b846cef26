import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import { noteListSchema } from '#shared/api/note-rows.ts';
import { draftSchema, notebookSchema, notePageSchema } from '#shared/api/notes.ts';
import { recordPointsSchema } from '#shared/api/records.ts';
import { send } from '../http/client.ts';
import type { MinuteWindow } from '../ui/chart/minute-window.ts';

export type RecordOf = 'published' | 'handed-in' | 'draft';

/** Reads of notes. Keys begin with `notes`; nobody writes one elsewhere. */
export const noteQueries = {
  all: ['notes'] as const,
  newest: (page: number) =>
    queryOptions({
      queryKey: [...noteQueries.all, 'newest', page],
      queryFn: ({ signal }) =>
        send({ path: `/api/notes?page=${String(page)}`, answer: noteListSchema, signal }),
    }),
  page: (noteId: number) =>
    queryOptions({
      queryKey: [...noteQueries.all, 'page', noteId],
      queryFn: ({ signal }) =>
        send({ path: `/api/notes/${String(noteId)}`, answer: notePageSchema, signal }),
    }),
  preview: (noteId: number) =>
    queryOptions({
      queryKey: [...noteQueries.all, 'preview', noteId],
      queryFn: ({ signal }) =>
        send({ path: `/api/notes/${String(noteId)}/preview`, answer: notePageSchema, signal }),
      staleTime: 0,
    }),
  record: (noteId: number, of: RecordOf, revision: number) =>
    queryOptions({
      queryKey: [...noteQueries.all, 'record', noteId, of, revision],
      queryFn: ({ signal }) =>
        send({
          path: `/api/notes/${String(noteId)}/record?of=${of}`,
          answer: recordPointsSchema,
          signal,
        }),
      staleTime: Infinity,
    }),
  /** A part of it with all readings a screen can show; meanwhile the part before. */
  recordPart: (noteId: number, of: RecordOf, revision: number, part: MinuteWindow) =>
    queryOptions({
      queryKey: [...noteQueries.all, 'record', noteId, of, revision, part],
      queryFn: async ({ signal }) => {
        const ends = `from=${part.from.toFixed(4)}&to=${part.to.toFixed(4)}`;
        const path = `/api/notes/${String(noteId)}/record?of=${of}&${ends}`;
        return { part, ...(await send({ path, answer: recordPointsSchema, signal })) };
      },
      staleTime: Infinity,
      placeholderData: keepPreviousData,
    }),
  draft: (noteId: number) =>
    queryOptions({
      queryKey: [...noteQueries.all, 'draft', noteId],
      queryFn: ({ signal }) =>
        send({ path: `/api/notes/${String(noteId)}/draft`, answer: draftSchema, signal }),
      staleTime: 0,
    }),
  notebook: () =>
    queryOptions({
      queryKey: [...noteQueries.all, 'notebook'],
      queryFn: ({ signal }) => send({ path: '/api/notebook', answer: notebookSchema, signal }),
      staleTime: 0,
    }),
};
