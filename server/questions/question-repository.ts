import type { Knex } from 'knex';
import { isDuplicate } from '../database/constraint-errors.ts';

/** One question with the names of whoever is still here. */
export interface StoredQuestion {
  readonly id: number;
  readonly noteId: number;
  readonly askerId: number | null;
  readonly askerName: string | null;
  readonly text: string;
  readonly askedAt: Date;
}
export interface StoredAnswer {
  readonly id: number;
  readonly questionId: number;
  readonly memberId: number | null;
  readonly memberName: string | null;
  readonly text: string;
  readonly answeredAt: Date;
  readonly changedAt: Date | null;
}

const selectQuestions = (db: Knex) =>
  db('note_questions')
    .leftJoin('members', 'members.id', 'note_questions.asker_id')
    .select<StoredQuestion[]>(
      'note_questions.id',
      'note_questions.note_id AS noteId',
      'note_questions.asker_id AS askerId',
      'members.name AS askerName',
      'note_questions.text',
      'note_questions.asked_at AS askedAt',
    );

/** Oldest first. */
export async function questionsOf(db: Knex, noteId: number): Promise<StoredQuestion[]> {
  return selectQuestions(db).where('note_questions.note_id', noteId).orderBy('note_questions.id');
}

/** A question about this very note; another note's is not there. */
export async function findQuestion(
  db: Knex,
  noteId: number,
  questionId: number,
): Promise<StoredQuestion | null> {
  const [row] = await selectQuestions(db).where({
    'note_questions.id': questionId,
    'note_questions.note_id': noteId,
  });
  return row ?? null;
}

export async function countQuestions(db: Knex, noteId: number): Promise<number> {
  const [row] = await db('note_questions')
    .where('note_questions.note_id', noteId)
    .select<{ n: number }[]>(db.raw('COUNT(*) AS n'));
  return row?.n ?? 0;
}

export async function insertQuestion(
  trx: Knex,
  question: { noteId: number; askerId: number; text: string },
): Promise<number> {
  const [id] = await trx('note_questions').insert({
    note_id: question.noteId,
    asker_id: question.askerId,
    text: question.text,
  });
  if (id === undefined) throw new Error('MariaDB gave no id.');
  return id;
}

/** With its answers. False when it is gone already. */
export async function deleteQuestion(trx: Knex, questionId: number): Promise<boolean> {
  return (await trx('note_questions').where({ id: questionId }).delete()) === 1;
}

export async function answersTo(db: Knex, questionIds: readonly number[]): Promise<StoredAnswer[]> {
  if (questionIds.length === 0) return [];
  return db('question_answers')
    .leftJoin('members', 'members.id', 'question_answers.member_id')
    .whereIn('question_answers.question_id', [...questionIds])
    .orderBy('question_answers.id')
    .select<StoredAnswer[]>(
      'question_answers.id',
      'question_answers.question_id AS questionId',
      'question_answers.member_id AS memberId',
      'members.name AS memberName',
      'question_answers.text',
      'question_answers.answered_at AS answeredAt',
      'question_answers.changed_at AS changedAt',
    );
}

/** A member's one answer: new, or in the place of the one before. @returns whether it is new */
export async function putAnswer(
  trx: Knex,
  answer: { questionId: number; memberId: number; text: string },
): Promise<boolean> {
  const at = { question_id: answer.questionId, member_id: answer.memberId };
  try {
    await trx('question_answers').insert({ ...at, text: answer.text });
    return true;
  } catch (error) {
    if (!isDuplicate(error, 'question_answers_member_unique')) throw error;
    await trx('question_answers')
      .where(at)
      .whereNot('text', answer.text)
      .update({ text: answer.text, changed_at: trx.fn.now(3) });
    return false;
  }
}
