import { draftSchema, type Draft } from '#shared/api/notes.ts';
import type { NoteFields } from '#shared/note/note-fields.ts';
import { newIdempotencyKey, send } from '../http/client.ts';
import { doneSchema } from '#shared/api/accounts.ts';

const ifMatch = (version: number) => ({ 'If-Match': `"v${String(version)}"` });
const address = (noteId: number, act: string): string => `/api/notes/${String(noteId)}/${act}`;

/** Writes on a note's working copy. Each answers with the copy as the server has it then. */
export function startNote(start: {
  kilnId: number | null;
  triedNoteId: number | null;
  key?: string;
}): Promise<Draft> {
  const { key = newIdempotencyKey(), ...body } = start;
  return send({
    method: 'POST',
    path: '/api/notes',
    body,
    headers: { 'Idempotency-Key': key },
    answer: draftSchema,
  });
}

export function saveDraft(noteId: number, version: number, fields: NoteFields): Promise<Draft> {
  return send({
    method: 'PUT',
    path: address(noteId, 'draft'),
    body: { fields },
    headers: ifMatch(version),
    answer: draftSchema,
  });
}

export function handIn(noteId: number, version: number): Promise<Draft> {
  return send({
    method: 'POST',
    path: address(noteId, 'hand-in'),
    headers: ifMatch(version),
    answer: draftSchema,
  });
}

export function takeBack(noteId: number): Promise<Draft> {
  return send({ method: 'POST', path: address(noteId, 'take-back'), answer: draftSchema });
}

export function revise(noteId: number): Promise<Draft> {
  return send({ method: 'POST', path: address(noteId, 'revise'), answer: draftSchema });
}

export function tickRemark(noteId: number, remarkId: number, mended: boolean): Promise<Draft> {
  return send({
    method: 'PUT',
    path: address(noteId, `remarks/${String(remarkId)}/mended`),
    body: { mended },
    answer: draftSchema,
  });
}

/** Deletes a picture that stands in no story. */
export function removePicture(noteId: number, name: string) {
  return send({
    method: 'DELETE',
    path: address(noteId, `pictures/${name}`),
    answer: doneSchema,
  });
}

/** Brings a removed note back as it was. */
export function restoreNote(noteId: number): Promise<Draft> {
  return send({ method: 'POST', path: address(noteId, 'restore'), answer: draftSchema });
}

export function removeNote(noteId: number) {
  return send({ method: 'DELETE', path: `/api/notes/${String(noteId)}`, answer: doneSchema });
}
