import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useEffect } from 'react';
import { doneSchema } from '#shared/api/accounts.ts';
import { deskNoteSchema, type DeskNote } from '#shared/api/desk.ts';
import { send } from '../http/client.ts';
import { noteQueries } from '../notes/note-queries.ts';
import { deskPath, deskQueries } from './desk-queries.ts';

/** A claim lasts 20 minutes; it is renewed well before that while the note is open. */
const RENEW_EVERY_MS = 4 * 60_000;

export interface Decision {
  readonly decision: 'publish' | 'send-back' | 'decline';
  readonly revisionId: number;
  readonly reason: string;
  readonly checklist: readonly string[];
}

/** A note at the desk with everything that can be done to it there. */
export function useDeskNote(noteId: number) {
  const client = useQueryClient();
  const note = useQuery(deskQueries.note(noteId));
  const show = (next: DeskNote): void => {
    client.setQueryData(deskQueries.note(noteId).queryKey, next);
  };

  const claim = useMutation({
    mutationFn: () =>
      send({ method: 'PUT', path: deskPath(noteId, '/claim'), answer: deskNoteSchema }),
    onSuccess: show,
  });
  const giveUp = useMutation({
    mutationFn: () =>
      send({ method: 'DELETE', path: deskPath(noteId, '/claim'), answer: doneSchema }),
    onSuccess: () => client.invalidateQueries({ queryKey: deskQueries.all }),
  });
  const addRemark = useMutation({
    mutationFn: (remark: { pointer: string; text: string; key: string }) =>
      send({
        method: 'POST',
        path: deskPath(noteId, '/remarks'),
        body: { pointer: remark.pointer, text: remark.text },
        headers: { 'Idempotency-Key': remark.key },
        answer: deskNoteSchema,
      }),
    onSuccess: show,
  });
  const removeRemark = useMutation({
    mutationFn: (remarkId: number) =>
      send({
        method: 'DELETE',
        path: deskPath(noteId, `/remarks/${String(remarkId)}`),
        answer: deskNoteSchema,
      }),
    onSuccess: show,
  });
  const decide = useMutation({
    mutationFn: (decision: Decision) =>
      send({
        method: 'POST',
        path: deskPath(noteId, '/decision'),
        body: decision,
        answer: doneSchema,
      }),
    // The note itself is gone from the desk: asking for it again would only tell that.
    onSuccess: () =>
      Promise.all([
        client.invalidateQueries({ queryKey: deskQueries.queue().queryKey }),
        client.invalidateQueries({ queryKey: noteQueries.all }),
      ]),
  });

  // Renewed quietly: only a refusal is told, and nothing is lost by it.
  const isMine = note.data?.claim?.mine === true;
  const { mutate: renew } = claim;
  useEffect(() => {
    if (!isMine) return;
    const timer = setInterval(() => renew(), RENEW_EVERY_MS);
    return () => clearInterval(timer);
  }, [isMine, renew]);

  return { note, claim, giveUp, addRemark, removeRemark, decide };
}
export type AtTheDesk = ReturnType<typeof useDeskNote>;
