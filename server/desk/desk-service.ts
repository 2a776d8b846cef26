import type { Knex } from 'knex';
import type { z } from 'zod';
import { CLAIM_MINUTES, type decisionBodySchema } from '#shared/api/desk.ts';
import type { NoteStatus } from '#shared/vocabulary/statuses.ts';
import { addToAuditLog } from '../audit/audit-log.ts';
import type { SignedIn } from '../authorization/actor.ts';
import { canOnNote, isWaiting } from '../authorization/rules.ts';
import { inTransaction } from '../database/transaction.ts';
import { takeOverDisputes } from '../disputes/take-over-disputes.ts';
import { AppError } from '../http/problem.ts';
import { lockNote, moveNote, type NoteChange, type NoteRecord } from '../notes/note-repository.ts';
import { noteSubject } from '../notes/note-subject.ts';
import { statusAfter, type NoteAct } from '../notes/note-status.ts';
import { projectNote } from '../notes/projection.ts';
import { findRevision, wasHandedIn } from '../notes/revision-repository.ts';
import { nudgeOutbox } from '../outbox/nudge.ts';
import { enqueue, type MailJob } from '../outbox/outbox.ts';
import { decisionsOf, sendRemarks } from './remark-repository.ts';

type Decision = z.output<typeof decisionBodySchema>;
type HandedIn = NoteRecord & { readonly handedInRevisionId: number };

const ACTS = {
  publish: { act: 'publish', audit: 'published', mail: 'note-published' },
  'send-back': { act: 'send-back', audit: 'sent-back', mail: 'note-sent-back' },
  decline: { act: 'decline', audit: 'declined', mail: 'note-declined' },
} as const satisfies Record<
  Decision['decision'],
  { act: NoteAct; audit: 'published' | 'sent-back' | 'declined'; mail: MailJob['kind'] }
>;

/** Says who decided what, to the moderator who came second. */
async function tooLate(trx: Knex, note: NoteRecord): Promise<AppError> {
  const [last] = (await decisionsOf(trx, note.id)).slice(-1);
  if (last && !isWaiting(note.status)) {
    return new AppError('wrong-status', {
      detail: `${last.by?.name ?? 'Somebody'} has decided on this note already: ${last.act.replace(/-/g, ' ')}.`,
      current: { status: note.status, by: last.by, act: last.act, at: last.at },
    });
  }
  return new AppError('wrong-status', `This note is ${note.status.replace(/-/g, ' ')} now.`);
}

async function lockForStaff(trx: Knex, actor: SignedIn, noteId: number): Promise<NoteRecord> {
  const note = await lockNote(trx, noteId);
  if (!note) throw new AppError('not-found');
  if (note.status === 'draft') {
    // A draft that never was at the desk is its author's secret; of one that was, staff know.
    if (!(await wasHandedIn(trx, noteId))) throw new AppError('not-found');
    throw new AppError('wrong-status', 'The author has taken this note back to go on with it.');
  }
  if (note.authorId === actor.id) {
    throw new AppError(
      'not-allowed',
      'Nobody decides on a note of their own; leave it to another moderator.',
    );
  }
  if (!isWaiting(note.status)) throw await tooLate(trx, note);
  return note;
}

function heldByAnother(note: NoteRecord): AppError {
  return new AppError('already-claimed', {
    detail: `${note.claimedByName ?? 'Another moderator'} has this note on the desk.`,
    current: { by: note.claimedByName, until: note.claimedUntil?.toISOString() ?? null },
  });
}

/** The note locked for an act that needs the claim. */
export async function lockedClaim(trx: Knex, actor: SignedIn, noteId: number): Promise<HandedIn> {
  const note = await lockForStaff(trx, actor, noteId);
  if (!canOnNote(actor, 'decide', noteSubject(note))) {
    if (note.claimedBy !== null && note.claimedBy !== actor.id && !note.claimLapsed) {
      throw heldByAnother(note);
    }
    throw new AppError(
      'wrong-status',
      note.claimedBy === actor.id
        ? 'Your claim on this note has lapsed. Take it again; your remarks are kept.'
        : 'Take this note onto your desk first.',
    );
  }
  if (note.handedInRevisionId === null) throw await tooLate(trx, note);
  return { ...note, handedInRevisionId: note.handedInRevisionId };
}

/** Takes the note onto one's desk for 20 minutes, or renews that. */
export async function claimNote(db: Knex, actor: SignedIn, noteId: number): Promise<void> {
  await inTransaction(db, async (trx) => {
    const note = await lockForStaff(trx, actor, noteId);
    if (!canOnNote(actor, 'claim', noteSubject(note))) throw heldByAnother(note);
    const renewed = note.claimedBy === actor.id && !note.claimLapsed;
    await moveNote(trx, noteId, 'claim', 'on-the-desk', {
      claimed_by: actor.id,
      claimed_until: trx.raw('CURRENT_TIMESTAMP(3) + INTERVAL ? MINUTE', [CLAIM_MINUTES]),
    });
    if (!renewed) {
      await addToAuditLog(trx, {
        actorId: actor.id,
        act: 'claimed',
        targetKind: 'note',
        targetId: noteId,
        after: { revisionId: note.handedInRevisionId },
      });
    }
  });
}

/** Puts the note back on the pile. */
export async function giveUpClaim(db: Knex, actor: SignedIn, noteId: number): Promise<void> {
  await inTransaction(db, async (trx) => {
    await lockedClaim(trx, actor, noteId);
    await moveNote(trx, noteId, 'give-up-claim', 'handed-in', {
      claimed_by: null,
      claimed_until: null,
    });
    await addToAuditLog(trx, {
      actorId: actor.id,
      act: 'claim-given-up',
      targetKind: 'note',
      targetId: noteId,
    });
  });
}

/**
 * Decides on the revision that was read. Status, projection, audit entry, index job and the mail to
 * the author change together or not at all.
 */
export async function decide(
  db: Knex,
  actor: SignedIn,
  noteId: number,
  decision: Decision,
): Promise<void> {
  if (decision.decision !== 'publish' && decision.reason.trim() === '') {
    throw new AppError('bad-input', {
      detail: 'Say why, in a sentence the author can use.',
      errors: [{ pointer: '/reason', detail: 'Say why, in a sentence the author can use.' }],
    });
  }
  await inTransaction(db, async (trx) => {
    const note = await lockedClaim(trx, actor, noteId);
    if (note.handedInRevisionId !== decision.revisionId) {
      throw new AppError(
        'stale-revision',
        'The author handed in a newer revision. Read that one first.',
      );
    }
    const { act, audit, mail } = ACTS[decision.decision];
    const to = statusAfter(act, note.status);
    const change = changeFor(trx, decision.decision, note);
    if (to === null || !(await moveNote(trx, noteId, act, to, change)))
      throw await tooLate(trx, note);
    const remarks = await sendRemarks(trx, noteId);
    if (decision.decision === 'publish') await published(trx, note);
    await addToAuditLog(trx, {
      actorId: actor.id,
      act: audit,
      targetKind: 'note',
      targetId: noteId,
      before: { status: note.status },
      after: {
        status: to,
        revisionId: decision.revisionId,
        remarks,
        checklist: decision.checklist,
      },
      reason: decision.reason,
    });
    if (note.authorId !== null) {
      await enqueue(trx, 'mail', `${mail}:${String(decision.revisionId)}`, {
        kind: mail,
        memberId: note.authorId,
        noteId,
        auditReason: decision.reason,
      });
    }
  });
  nudgeOutbox();
}

function changeFor(trx: Knex, decision: Decision['decision'], note: HandedIn): NoteChange {
  const cleared = {
    handed_in_revision_id: null,
    handed_in_at: null,
    claimed_by: null,
    claimed_until: null,
  };
  if (decision !== 'publish') return cleared;
  const now = trx.raw('CURRENT_TIMESTAMP(3)');
  return {
    ...cleared,
    published_revision_id: note.handedInRevisionId,
    ...(note.publishedAt === null ? { published_at: now } : { revised_at: now }),
  };
}

/** What follows from publishing: the projection, and word to whoever's change was tried. */
async function published(trx: Knex, note: HandedIn): Promise<void> {
  const revision = await findRevision(trx, note.handedInRevisionId);
  if (revision) await takeOverDisputes(trx, revision, note.authorId);
  await projectNote(trx, note.id);
  const triedNoteId = revision?.fields.triedNoteId ?? null;
  if (triedNoteId === null || note.publishedAt !== null) return;
  const tried = await trx('published_firings')
    .where('published_firings.note_id', triedNoteId)
    .first<{ author_id: number | null } | undefined>('published_firings.author_id');
  if (tried?.author_id && tried.author_id !== note.authorId) {
    await enqueue(trx, 'mail', `tried:${String(triedNoteId)}:${String(note.id)}`, {
      kind: 'note-tried',
      memberId: tried.author_id,
      noteId: triedNoteId,
      byNoteId: note.id,
    });
  }
}

/** Takes a published note down: from readers, figures and index at once. */
export async function takeDown(
  db: Knex,
  actor: SignedIn,
  noteId: number,
  reason: string,
): Promise<void> {
  await inTransaction(db, async (trx) => {
    const note = await lockNote(trx, noteId);
    if (!note || note.publishedRevisionId === null) throw new AppError('not-found');
    if (!canOnNote(actor, 'take-down', noteSubject(note))) {
      throw new AppError('not-allowed', 'Nobody decides on a note of their own.');
    }
    // A revision that waits at the desk goes on waiting; the published one is gone all the same.
    const to: NoteStatus = isWaiting(note.status) ? note.status : 'taken-down';
    await moveNote(trx, noteId, 'take-down', to, { published_revision_id: null });
    await projectNote(trx, noteId);
    await addToAuditLog(trx, {
      actorId: actor.id,
      act: 'taken-down',
      targetKind: 'note',
      targetId: noteId,
      before: { status: note.status, revisionId: note.publishedRevisionId },
      after: { status: to },
      reason,
    });
    if (note.authorId !== null) {
      await enqueue(trx, 'mail', `taken-down:${String(noteId)}:${String(note.version)}`, {
        kind: 'note-taken-down',
        memberId: note.authorId,
        noteId,
        auditReason: reason,
      });
    }
  });
  nudgeOutbox();
}
