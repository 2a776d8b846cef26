import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { noteQuestionsSchema, type NoteQuestions } from '#shared/api/questions.ts';
import { send } from '../http/client.ts';
import { questionPath, questionQueries } from './question-queries.ts';

/** The questions about a note with everything that can be done to them. */
export function useNoteQuestions(noteId: number) {
  const client = useQueryClient();
  const list = useQuery(questionQueries.ofNote(noteId));
  const show = (next: NoteQuestions): void => {
    client.setQueryData(questionQueries.ofNote(noteId).queryKey, next);
  };
  const ask = useMutation({
    networkMode: 'always',
    mutationFn: ({ text, key }: { text: string; key: string }) =>
      send({
        method: 'POST',
        path: questionPath(noteId),
        body: { text },
        headers: { 'Idempotency-Key': key },
        answer: noteQuestionsSchema,
      }),
    onSuccess: show,
  });
  const answer = useMutation({
    networkMode: 'always',
    mutationFn: ({ questionId, text }: { questionId: number; text: string }) =>
      send({
        method: 'PUT',
        path: questionPath(noteId, `/${String(questionId)}/answer`),
        body: { text },
        answer: noteQuestionsSchema,
      }),
    onSuccess: show,
  });
  const remove = useMutation({
    networkMode: 'always',
    mutationFn: (questionId: number) =>
      send({
        method: 'DELETE',
        path: questionPath(noteId, `/${String(questionId)}`),
        answer: noteQuestionsSchema,
      }),
    onSuccess: show,
  });
  return { list, ask, answer, remove };
}
export type OfNote = ReturnType<typeof useNoteQuestions>;
