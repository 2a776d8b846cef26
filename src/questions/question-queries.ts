import { queryOptions } from '@tanstack/react-query';
import { noteQuestionsSchema } from '#shared/api/questions.ts';
import { send } from '../http/client.ts';

/** Questions about notes. Keys begin with `questions`; nobody writes one elsewhere. */
export const questionQueries = {
  all: ['questions'] as const,
  ofNote: (noteId: number) =>
    queryOptions({
      queryKey: [...questionQueries.all, noteId],
      queryFn: ({ signal }) =>
        send({ path: questionPath(noteId), answer: noteQuestionsSchema, signal }),
    }),
};

export const questionPath = (noteId: number, tail = ''): string =>
  `/api/notes/${String(noteId)}/questions${tail}`;
