import type { Knex } from 'knex';
import type { DisputeAnswerBody, DisputedFindings } from '#shared/api/disputes.ts';
import { findingMeant } from '#shared/note/finding-disputes.ts';
import { addToAuditLog } from '../audit/audit-log.ts';
import type { SignedIn } from '../authorization/actor.ts';
import { canOnNote } from '../authorization/rules.ts';
import { inTransaction } from '../database/transaction.ts';
import { AppError } from '../http/problem.ts';
import { lockNote } from '../notes/note-repository.ts';
import { noteSubject } from '../notes/note-subject.ts';
import { projectNote } from '../notes/projection.ts';
import { publishedRows } from '../notes/published-repository.ts';
import { publishedFindings } from '../notes/revision-repository.ts';
import { nudgeOutbox } from '../outbox/nudge.ts';
import { enqueue } from '../outbox/outbox.ts';
import {
  answerDisputeRow,
  findDispute,
  presentDispute,
  standingOnPublished,
} from './dispute-repository.ts';

const MOST_SHOWN = 200;

/** What members dispute in published notes, for the desk: the unanswered first. */
export async function listDisputedFindings(db: Knex, actor: SignedIn): Promise<DisputedFindings> {
  const disputes = await standingOnPublished(db, MOST_SHOWN);
  const noteIds = [...new Set(disputes.map(({ noteId }) => noteId))];
  const [rows, findings] = await Promise.all([
    publishedRows(db, noteIds),
    publishedFindings(db, noteIds),
  ]);
  const byId = new Map(rows.map((row) => [row.id, row]));
  return {
    disputes: disputes.flatMap((dispute) => {
      const { state } = dispute;
      const row = byId.get(dispute.noteId);
      const finding = findingMeant(findings.get(dispute.noteId) ?? [], dispute);
      if (!row || !finding || state === 'withdrawn') return [];
      return [
        {
          note: { id: row.id, slug: row.slug, title: row.title },
          author: row.author,
          finding,
          dispute: presentDispute({ ...dispute, state }),
          own: row.author?.id === actor.id,
        },
      ];
    }),
  };
}

/**
 * Restores a disputed finding to the figures, saying why, or leaves it out; another answer may be
 * given later. State, projection, audit entry, index job and the mail to the author change together.
 */
export async function answerDispute(
  db: Knex,
  actor: SignedIn,
  disputeId: number,
  fromVersion: number,
  { decision, sentence }: DisputeAnswerBody,
): Promise<void> {
  const known = await findDispute(db, disputeId);
  if (!known) throw new AppError('not-found');
  const { noteId } = known;
  await inTransaction(db, async (trx) => {
    const note = await lockNote(trx, noteId);
    if (!note || note.publishedRevisionId === null) throw new AppError('not-found');
    if (!canOnNote(actor, 'answer-dispute', noteSubject(note))) {
      throw new AppError('not-allowed', 'Nobody decides on a note of their own.');
    }
    const row = await findDispute(trx, disputeId);
    if (!row) throw new AppError('not-found');
    if (row.state === 'withdrawn') {
      throw new AppError('wrong-status', 'The author has taken this back; there is nothing to do.');
    }
    const state = decision === 'restore' ? 'restored' : 'left';
    const answered =
      row.version === fromVersion &&
      (await answerDisputeRow(trx, row, { state, sentence, moderatorId: actor.id }));
    if (!answered) {
      throw new AppError('stale', {
        detail: `${row.answeredBy?.name ?? 'Somebody'} was quicker. Read what was said first.`,
        current: { version: row.version, state: row.state, answer: row.answer },
      });
    }
    await projectNote(trx, noteId);
    await addToAuditLog(trx, {
      actorId: actor.id,
      act: decision === 'restore' ? 'finding-restored' : 'dispute-left',
      targetKind: 'note',
      targetId: noteId,
      before: { state: row.state, sentence: row.sentence },
      after: { disputeId, state, code: row.code, minute: row.minute },
      reason: sentence,
    });
    if (note.authorId !== null) {
      await enqueue(trx, 'mail', `dispute:${String(disputeId)}:${String(row.version + 1)}`, {
        kind: 'dispute-answered',
        memberId: note.authorId,
        noteId,
        disputeId,
      });
    }
  });
  nudgeOutbox();
}
