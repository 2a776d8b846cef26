import type { Knex } from 'knex';
import type { z } from 'zod';
import type { disputeBodySchema } from '#shared/api/disputes.ts';
import type { Finding } from '#shared/firing/findings.ts';
import { findingMeant, disputeAbout, withDispute } from '#shared/note/finding-disputes.ts';
import { addToAuditLog } from '../audit/audit-log.ts';
import type { SignedIn } from '../authorization/actor.ts';
import { canOnNote } from '../authorization/rules.ts';
import { inTransaction } from '../database/transaction.ts';
import { AppError } from '../http/problem.ts';
import { lockNote, rewriteDraft, type NoteRecord } from '../notes/note-repository.ts';
import { noteSubject } from '../notes/note-subject.ts';
import { projectNote } from '../notes/projection.ts';
import { findRevision } from '../notes/revision-repository.ts';
import { nudgeOutbox } from '../outbox/nudge.ts';
import { disputesOfNote, insertDispute, sayDispute } from './dispute-repository.ts';

type Body = z.output<typeof disputeBodySchema>;

/** The author's published note, locked, with the findings that readers see. */
async function lockedPublished(
  trx: Knex,
  actor: SignedIn,
  noteId: number,
): Promise<{ note: NoteRecord; findings: readonly Finding[] }> {
  const note = await lockNote(trx, noteId);
  if (!note || !canOnNote(actor, 'read', noteSubject(note))) throw new AppError('not-found');
  if (!canOnNote(actor, 'dispute', noteSubject(note))) {
    throw note.authorId === actor.id
      ? new AppError('wrong-status', 'This note is not published; disagree while you write it.')
      : new AppError('not-allowed', 'Only its author may disagree with what is read off a note.');
  }
  const revision =
    note.publishedRevisionId === null ? null : await findRevision(trx, note.publishedRevisionId);
  if (!revision) throw new AppError('not-found');
  return { note, findings: revision.findings };
}

/**
 * The working copy says the same as the page, so that the next revision does not undo it. Its
 * version goes up: a tab that is writing is told, and shows both.
 */
async function sayInDraft(
  trx: Knex,
  note: NoteRecord,
  findings: readonly Finding[],
  finding: Finding,
  sentence: string | null,
): Promise<void> {
  const findingDisputes = withDispute(findings, note.draft.findingDisputes, finding, sentence);
  await rewriteDraft(trx, note.id, { ...note.draft, findingDisputes });
}

const KEPT = 'A moderator has looked at this and keeps the finding.';

/**
 * Disagrees with a finding of one's own published note. It leaves the lists, the search and every
 * figure in the same transaction. Saying the same once more changes nothing.
 */
export async function disputeFinding(
  db: Knex,
  actor: SignedIn,
  noteId: number,
  body: Body,
): Promise<void> {
  await inTransaction(db, async (trx) => {
    const { note, findings } = await lockedPublished(trx, actor, noteId);
    const finding = findingMeant(findings, body);
    if (!finding) {
      throw new AppError('stale-revision', 'The note no longer has this finding. Load it again.');
    }
    const { sentence } = body;
    const row = disputeAbout(finding, findings, await disputesOfNote(trx, noteId));
    if (row && row.state !== 'withdrawn') {
      if (row.state === 'restored') throw new AppError('wrong-status', KEPT);
      if (row.sentence === sentence) return;
      throw new AppError('conflict', {
        detail: 'You disagree with this finding already. Take that back first to say it anew.',
        current: { sentence: row.sentence },
      });
    }
    const disputeId = row
      ? row.id
      : await insertDispute(trx, {
          noteId,
          code: finding.code,
          minute: finding.fromMinute,
          sentence,
        });
    if (row && !(await sayDispute(trx, row, { state: 'disputed', sentence }))) {
      throw new AppError('conflict');
    }
    await sayInDraft(trx, note, findings, finding, sentence);
    await addToAuditLog(trx, {
      actorId: actor.id,
      act: 'finding-disputed',
      targetKind: 'note',
      targetId: noteId,
      before: row ? { state: row.state, sentence: row.sentence } : null,
      after: { disputeId, code: finding.code, minute: finding.fromMinute },
      reason: sentence,
    });
    await projectNote(trx, noteId);
  });
  nudgeOutbox();
}

/** Takes a disagreement back: the finding counts again at once. */
export async function withdrawDispute(
  db: Knex,
  actor: SignedIn,
  noteId: number,
  disputeId: number,
  fromVersion: number,
): Promise<void> {
  await inTransaction(db, async (trx) => {
    const { note, findings } = await lockedPublished(trx, actor, noteId);
    const row = (await disputesOfNote(trx, noteId)).find(({ id }) => id === disputeId);
    if (!row) throw new AppError('not-found');
    if (row.state === 'restored') throw new AppError('wrong-status', KEPT);
    if (row.state === 'withdrawn') {
      throw new AppError('wrong-status', 'You have taken this back already.');
    }
    const taken =
      row.version === fromVersion && (await sayDispute(trx, row, { state: 'withdrawn' }));
    if (!taken) {
      throw new AppError('stale', {
        detail: 'A moderator has answered meanwhile. Read that first.',
        current: { version: row.version, state: row.state },
      });
    }
    const finding = findingMeant(findings, row);
    if (finding) await sayInDraft(trx, note, findings, finding, null);
    await addToAuditLog(trx, {
      actorId: actor.id,
      act: 'dispute-withdrawn',
      targetKind: 'note',
      targetId: noteId,
      before: { state: row.state, sentence: row.sentence },
      after: { disputeId, code: row.code, minute: row.minute },
    });
    await projectNote(trx, noteId);
  });
  nudgeOutbox();
}
