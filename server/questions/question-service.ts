import type { Knex } from 'knex';
import type { NoteQuestions } from '#shared/api/questions.ts';
import { addToAuditLog } from '../audit/audit-log.ts';
import type { Actor, SignedIn } from '../authorization/actor.ts';
import { canOnNote, canOnQuestion, type NoteSubject } from '../authorization/rules.ts';
import { inTransaction } from '../database/transaction.ts';
import { AppError } from '../http/problem.ts';
import { findNote, lockNote, type NoteRecord } from '../notes/note-repository.ts';
import { noteSubject } from '../notes/note-subject.ts';
import { nudgeOutbox } from '../outbox/nudge.ts';
import { enqueue } from '../outbox/outbox.ts';
import {
  answersTo,
  countQuestions,
  deleteQuestion,
  findQuestion,
  insertQuestion,
  putAnswer,
  questionsOf,
  type StoredQuestion,
} from './question-repository.ts';

/** As many as a note takes: they stand on its page, all of them. */
const MOST_OF_A_NOTE = 100;

const person = (id: number | null, name: string | null) =>
  id !== null && name !== null ? { id, name } : null;

/**
 * The questions about a note and what this reader may do with them. None of a note that is not
 * published, also to its author: they come back with it.
 */
export async function readQuestions(
  db: Knex,
  actor: Actor,
  noteId: number,
): Promise<NoteQuestions> {
  const note = await findNote(db, noteId);
  if (!note || !canOnNote(actor, 'read', noteSubject(note))) throw new AppError('not-found');
  const subject = noteSubject(note);
  const asked = subject.hasPublished ? await questionsOf(db, noteId) : [];
  const answers = await answersTo(
    db,
    asked.map(({ id }) => id),
  );
  return {
    questions: asked.map((question) => ({
      id: question.id,
      text: question.text,
      by: person(question.askerId, question.askerName),
      at: question.askedAt.toISOString(),
      answers: answers
        .filter(({ questionId }) => questionId === question.id)
        .map((answer) => ({
          id: answer.id,
          text: answer.text,
          by: person(answer.memberId, answer.memberName),
          byAuthor: answer.memberId !== null && answer.memberId === note.authorId,
          at: answer.answeredAt.toISOString(),
          changed: answer.changedAt !== null,
          mine: actor.kind === 'member' && answer.memberId === actor.id,
        })),
      abilities: {
        answer: canOnQuestion(actor, 'answer', subject, question),
        remove: canOnQuestion(actor, 'remove', subject, question),
      },
    })),
    abilities: { ask: canOnNote(actor, 'ask', subject) },
  };
}

/** A note that readers see now, locked: what is taken down takes no word in the same moment. */
async function lockPublished(
  trx: Knex,
  actor: SignedIn,
  noteId: number,
): Promise<{ note: NoteRecord; subject: NoteSubject }> {
  const note = await lockNote(trx, noteId);
  const subject = note && noteSubject(note);
  if (!note || !subject || !canOnNote(actor, 'read', subject)) throw new AppError('not-found');
  if (!subject.hasPublished) {
    throw new AppError('wrong-status', 'Questions are for published notes.');
  }
  return { note, subject };
}

async function requireQuestion(
  trx: Knex,
  noteId: number,
  questionId: number,
): Promise<StoredQuestion> {
  const question = await findQuestion(trx, noteId, questionId);
  if (!question) throw new AppError('not-found', 'This question is gone.');
  return question;
}

/** Asks, and promises the author a mail. */
export async function askQuestion(
  db: Knex,
  actor: SignedIn,
  noteId: number,
  text: string,
): Promise<void> {
  await inTransaction(db, async (trx) => {
    const { note, subject } = await lockPublished(trx, actor, noteId);
    if (!canOnNote(actor, 'ask', subject)) {
      if (note.authorId === actor.id) {
        throw new AppError('not-allowed', 'Questions about a note of your own are for others.');
      }
      throw new AppError('verify-email-first', 'Confirm your e-mail address, then ask.');
    }
    if ((await countQuestions(trx, noteId)) >= MOST_OF_A_NOTE) {
      throw new AppError('conflict', 'This note has all the questions it takes.');
    }
    const questionId = await insertQuestion(trx, { noteId, askerId: actor.id, text });
    if (note.authorId !== null) {
      await enqueue(trx, 'mail', `question:${String(questionId)}`, {
        kind: 'question-asked',
        memberId: note.authorId,
        noteId,
        questionId,
      });
    }
  });
  nudgeOutbox();
}

/** Gives one's answer or changes it. The asker is told of a new one, not of its changes. */
export async function answerQuestion(
  db: Knex,
  actor: SignedIn,
  noteId: number,
  questionId: number,
  text: string,
): Promise<void> {
  await inTransaction(db, async (trx) => {
    const { subject } = await lockPublished(trx, actor, noteId);
    const question = await requireQuestion(trx, noteId, questionId);
    if (!canOnQuestion(actor, 'answer', subject, question)) {
      throw new AppError('not-allowed', 'The author of the note answers, or a moderator.');
    }
    const isNew = await putAnswer(trx, { questionId, memberId: actor.id, text });
    if (isNew && question.askerId !== null && question.askerId !== actor.id) {
      await enqueue(trx, 'mail', `answer:${String(questionId)}:${String(actor.id)}`, {
        kind: 'question-answered',
        memberId: question.askerId,
        noteId,
        questionId,
        byMemberId: actor.id,
      });
    }
  });
  nudgeOutbox();
}

/** Removes a question with its answers; a moderator's removal is written down. */
export async function removeQuestion(
  db: Knex,
  actor: SignedIn,
  noteId: number,
  questionId: number,
): Promise<void> {
  await inTransaction(db, async (trx) => {
    const { subject } = await lockPublished(trx, actor, noteId);
    const question = await requireQuestion(trx, noteId, questionId);
    if (!canOnQuestion(actor, 'remove', subject, question)) {
      throw new AppError('not-allowed', 'Whoever asked removes a question, or a moderator.');
    }
    if (!(await deleteQuestion(trx, questionId))) return;
    if (question.askerId !== actor.id) {
      await addToAuditLog(trx, {
        actorId: actor.id,
        act: 'question-removed',
        targetKind: 'note',
        targetId: noteId,
        before: { questionId, askerId: question.askerId },
      });
    }
  });
}
