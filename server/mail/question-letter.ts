import type { Knex } from 'knex';
import type { MailJob } from '../outbox/outbox.ts';
import { answersTo, findQuestion } from '../questions/question-repository.ts';
import { publishedRows } from '../notes/published-repository.ts';
import type { Letter } from './letter.ts';
import { questionAnsweredMail } from './messages/question-answered.ts';
import { questionAskedMail } from './messages/question-asked.ts';

type QuestionJob = Extract<MailJob, { kind: 'question-asked' | 'question-answered' }>;

/**
 * The letter about a question as things are now; null when the question is removed, the answer gone
 * with its writer, or the note no longer published.
 */
export async function questionLetter(
  db: Knex,
  job: QuestionJob,
  name: string,
  link: string,
): Promise<Letter | null> {
  const [note] = await publishedRows(db, [job.noteId]);
  const question = await findQuestion(db, job.noteId, job.questionId);
  if (!note || !question) return null;
  const title = note.title.replace(/\s+/gu, ' ').trim() || 'Untitled';
  const about = { title, link, question: question.text };
  if (job.kind === 'question-asked') return questionAskedMail(name, question.askerName, about);
  const answers = await answersTo(db, [question.id]);
  const answer = answers.find(({ memberId }) => memberId === job.byMemberId);
  return answer
    ? questionAnsweredMail(name, answer.memberName, { ...about, answer: answer.text })
    : null;
}
