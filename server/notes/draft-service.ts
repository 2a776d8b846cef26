import type { Knex } from 'knex';
import { emptyNoteFields, type NoteFields } from '#shared/note/note-fields.ts';
import { addToAuditLog } from '../audit/audit-log.ts';
import type { Actor, SignedIn } from '../authorization/actor.ts';
import { canOnKiln, canOnNote, type NoteAction } from '../authorization/rules.ts';
import { inTransaction } from '../database/transaction.ts';
import { AppError } from '../http/problem.ts';
import { findKiln } from '../kilns/kiln-repository.ts';
import { kilnSubject } from '../kilns/kiln-service.ts';
import { findRecord } from '../records/record-repository.ts';
import {
  findNote,
  insertNote,
  lockNote,
  lockRemovedNote,
  markNoteRemoved,
  markNoteRestored,
  moveNote,
  type NoteRecord,
  saveDraft,
} from './note-repository.ts';
import { noteSubject } from './note-subject.ts';
import { projectNote } from './projection.ts';
import { statusAfter, type NoteAct } from './note-status.ts';

/** The author's note, for an act on its working copy. To everybody else there is nothing here. */
export async function ownNote(db: Knex, actor: Actor, noteId: number): Promise<NoteRecord> {
  const note = await findNote(db, noteId);
  if (!note || !canOnNote(actor, 'read-draft', noteSubject(note))) throw new AppError('not-found');
  return note;
}

/** The same with the row locked, and the act allowed by the rules. */
export async function lockedOwnNote(
  trx: Knex,
  actor: Actor,
  noteId: number,
  action: NoteAction,
): Promise<NoteRecord> {
  const note = await lockNote(trx, noteId);
  if (!note || !canOnNote(actor, 'read-draft', noteSubject(note))) throw new AppError('not-found');
  if (!canOnNote(actor, action, noteSubject(note))) throw refusal(actor, action, note);
  return note;
}

function refusal(actor: Actor, action: NoteAction, note: NoteRecord): AppError {
  if (action === 'hand-in' && actor.kind === 'member' && !actor.emailVerified) {
    return new AppError(
      'verify-email-first',
      'Open the link in the mail we sent you, then hand the note in. It is saved meanwhile.',
    );
  }
  return new AppError('wrong-status', `This note is ${note.status.replace(/-/g, ' ')} now.`);
}

/** A kiln the actor may fire and a record of this very note: all a draft may point at. */
async function checkReferences(
  db: Knex,
  actor: Actor,
  noteId: number | null,
  fields: NoteFields,
): Promise<void> {
  const errors: { pointer: string; detail: string }[] = [];
  if (fields.kilnId !== null) {
    const kiln = await findKiln(db, fields.kilnId);
    if (!kiln || !canOnKiln(actor, 'fire', kilnSubject(kiln))) {
      errors.push({
        pointer: '/fields/kilnId',
        detail: 'Choose one of your kilns, or one lent to you.',
      });
    }
  }
  const { recordId } = fields.record;
  if (recordId !== null && (noteId === null || !(await findRecord(db, noteId, recordId)))) {
    errors.push({ pointer: '/fields/record/recordId', detail: 'This record is not of this note.' });
  }
  if (errors.length > 0) throw new AppError('bad-input', { errors });
}

export async function startNote(
  db: Knex,
  actor: SignedIn,
  start: { kilnId: number | null; triedNoteId: number | null; timeZone: string },
): Promise<number> {
  const blank = emptyNoteFields();
  const fields: NoteFields = {
    ...blank,
    kilnId: start.kilnId,
    triedNoteId: start.triedNoteId,
    when: { ...blank.when, timeZone: start.timeZone },
  };
  return inTransaction(db, async (trx) => {
    await checkReferences(trx, actor, null, fields);
    return insertNote(trx, actor.id, fields);
  });
}

/** Saves the working copy, or refuses with what the server holds when another tab was quicker. */
export async function saveNote(
  db: Knex,
  actor: Actor,
  noteId: number,
  fromVersion: number,
  fields: NoteFields,
): Promise<void> {
  const note = await ownNote(db, actor, noteId);
  if (!canOnNote(actor, 'edit', noteSubject(note))) throw refusal(actor, 'edit', note);
  // A kiln lent no longer, or removed since, stays with the draft that already names it.
  if (
    fields.kilnId !== note.draft.kilnId ||
    fields.record.recordId !== note.draft.record.recordId
  ) {
    await checkReferences(db, actor, noteId, fields);
  }
  if (await saveDraft(db, noteId, fromVersion, fields)) return;
  const now = await ownNote(db, actor, noteId);
  if (!canOnNote(actor, 'edit', noteSubject(now))) throw refusal(actor, 'edit', now);
  throw new AppError('stale', {
    detail: 'This note was saved in another tab or on another device since you opened it here.',
    current: { version: now.version, savedAt: now.draftSavedAt.toISOString(), fields: now.draft },
  });
}

async function moveOwn(
  db: Knex,
  actor: SignedIn,
  noteId: number,
  action: NoteAction,
  act: NoteAct,
  change: Parameters<typeof moveNote>[4],
  audited: boolean,
): Promise<void> {
  await inTransaction(db, async (trx) => {
    const note = await lockedOwnNote(trx, actor, noteId, action);
    const to = statusAfter(act, note.status);
    if (to === null || !(await moveNote(trx, noteId, act, to, change))) {
      throw refusal(actor, action, note);
    }
    if (audited) {
      await addToAuditLog(trx, {
        actorId: actor.id,
        act: 'taken-back',
        targetKind: 'note',
        targetId: noteId,
        before: { status: note.status },
        after: { status: to },
      });
    }
  });
}

/** Back from the desk's pile to the author, before a decision. */
export async function takeBack(db: Knex, actor: SignedIn, noteId: number): Promise<void> {
  await moveOwn(
    db,
    actor,
    noteId,
    'take-back',
    'take-back',
    { handed_in_revision_id: null, handed_in_at: null, claimed_by: null, claimed_until: null },
    true,
  );
}

/** Opens a published, declined or taken-down note for a new revision; what is up stays up. */
export async function reviseNote(db: Knex, actor: SignedIn, noteId: number): Promise<void> {
  await moveOwn(db, actor, noteId, 'revise', 'revise', {}, false);
}

/** Removes a note that was never published, or withdrawn; it can be brought back for a while. */
export async function removeNote(db: Knex, actor: SignedIn, noteId: number): Promise<void> {
  await inTransaction(db, async (trx) => {
    const note = await lockedOwnNote(trx, actor, noteId, 'remove');
    await markNoteRemoved(trx, noteId);
    await projectNote(trx, noteId);
    await addToAuditLog(trx, {
      actorId: actor.id,
      act: 'removed',
      targetKind: 'note',
      targetId: noteId,
      before: { status: note.status },
    });
  });
}

/** Brings back a note its author removed, as it was. Asked for twice, it is done once. */
export async function restoreNote(db: Knex, actor: SignedIn, noteId: number): Promise<void> {
  await inTransaction(db, async (trx) => {
    const note = await lockRemovedNote(trx, noteId);
    if (!note) {
      await ownNote(trx, actor, noteId);
      return;
    }
    if (!canOnNote(actor, 'restore', noteSubject(note, true))) throw new AppError('not-found');
    await markNoteRestored(trx, noteId);
    await addToAuditLog(trx, {
      actorId: actor.id,
      act: 'brought-back',
      targetKind: 'note',
      targetId: noteId,
      after: { status: note.status },
    });
  });
}
