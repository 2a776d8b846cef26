import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useNavigate } from 'react-router-dom';
import type { Draft } from '#shared/api/notes.ts';
import { paths } from '#shared/paths.ts';
import { noteQueries } from '../notes/note-queries.ts';
import { useMessages } from '../ui/useMessages.ts';
import { handIn, removeNote, restoreNote, revise, takeBack } from './draft-mutations.ts';
import type { DraftKeeper } from './draft-keeper.ts';

/** What an author does with a note as a whole. Each tells how it went and can be tried again. */
export function useDraftActs(keeper: DraftKeeper, noteId: number) {
  const tell = useMessages();
  const client = useQueryClient();
  const navigate = useNavigate();
  /** Lists and pages that show the note are asked for again; the keeper holds the draft itself. */
  const refresh = () =>
    client.invalidateQueries({
      queryKey: noteQueries.all,
      predicate: ({ queryKey }) => queryKey[1] !== 'draft' && queryKey[1] !== 'record',
    });
  const done = (text: string) => async (draft: Draft) => {
    keeper.accept(draft);
    tell({ kind: 'done', text });
    window.scrollTo({ top: 0 });
    await refresh();
  };
  /** Goes on after this page has gone: the message with the way back outlives it. */
  const bringBack = async (): Promise<void> => {
    try {
      const draft = await restoreNote(noteId);
      client.setQueryData(noteQueries.draft(noteId).queryKey, draft);
      tell({ kind: 'done', text: 'The note is back.' });
      await navigate(paths.write(noteId));
      await refresh();
    } catch (error) {
      tell({
        kind: 'error',
        text: `The note did not come back: ${error instanceof Error ? error.message : 'try again.'}`,
        action: { label: 'Try again', onClick: () => void bringBack() },
      });
    }
  };
  return {
    handIn: useMutation({
      mutationFn: async () => {
        await keeper.flush();
        if (keeper.hasUnsent) {
          throw new Error('The last changes are not saved yet, so there is nothing to hand in.');
        }
        return handIn(noteId, keeper.current().draft.version);
      },
      onSuccess: done('Handed in. A moderator reads it; you hear of the decision.'),
    }),
    takeBack: useMutation({
      mutationFn: () => takeBack(noteId),
      onSuccess: done('Taken back. It is your draft again.'),
    }),
    revise: useMutation({
      mutationFn: () => revise(noteId),
      onSuccess: done('Open for a new revision. What is published stays up meanwhile.'),
    }),
    remove: useMutation({
      mutationFn: async () => {
        // What was typed last goes along, so that it comes back with the note.
        await keeper.flush();
        return removeNote(noteId);
      },
      onSuccess: async (answer) => {
        keeper.abandon();
        tell({
          kind: 'done',
          text: answer.message,
          action: { label: 'Undo', onClick: () => void bringBack() },
        });
        await navigate(paths.notebook);
        await refresh();
      },
    }),
  };
}
export type DraftActs = ReturnType<typeof useDraftActs>;
