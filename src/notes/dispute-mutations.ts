import { useMutation, useQueryClient } from '@tanstack/react-query';
import { notePageSchema, type NotePageData } from '#shared/api/notes.ts';
import type { Finding } from '#shared/firing/findings.ts';
import { figureQueries } from '../figures/figure-queries.ts';
import { findQueries } from '../find/find-queries.ts';
import { send } from '../http/client.ts';
import { noteQueries } from './note-queries.ts';

const disputesPath = (noteId: number): string => `/api/notes/${String(noteId)}/disputes`;

/** Disagreeing with findings of the own published note, and taking that back. */
export function useDisputes(noteId: number) {
  const client = useQueryClient();
  /** The page is here already; all else that shows or counts the note is asked for again. */
  const show = async (page: NotePageData): Promise<void> => {
    const { queryKey } = noteQueries.page(noteId);
    client.setQueryData(queryKey, page);
    await Promise.all([
      client.invalidateQueries({
        queryKey: noteQueries.all,
        predicate: (query) => query.queryKey[1] !== 'record' && query.queryKey[1] !== 'page',
      }),
      client.invalidateQueries({ queryKey: figureQueries.all }),
      client.invalidateQueries({ queryKey: findQueries.all }),
    ]);
  };
  const disagree = useMutation({
    mutationFn: ({ finding, sentence }: { finding: Finding; sentence: string }) =>
      send({
        method: 'PUT',
        path: disputesPath(noteId),
        body: { code: finding.code, minute: finding.fromMinute, sentence },
        answer: notePageSchema,
      }),
    onSuccess: show,
  });
  const takeBack = useMutation({
    mutationFn: ({ id, version }: { id: number; version: number }) =>
      send({
        method: 'DELETE',
        path: `${disputesPath(noteId)}/${String(id)}`,
        headers: { 'If-Match': `"v${String(version)}"` },
        answer: notePageSchema,
      }),
    onSuccess: show,
    // Somebody answered meanwhile: the page shows what.
    onError: () => client.invalidateQueries({ queryKey: noteQueries.page(noteId).queryKey }),
  });
  return { disagree, takeBack };
}
