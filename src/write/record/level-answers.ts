import { ANSWER_MINUTES } from '#shared/firing/constants.ts';
import type { RecordFields } from '#shared/note/plan.ts';

type Answers = RecordFields['levelAnswers'];
export type LevelAnswer = Answers[number]['answer'];

/** What was answered of the stretch that begins at a minute. */
export function answerAt(answers: Answers, fromMinute: number): LevelAnswer | null {
  return (
    answers.findLast((one) => Math.abs(one.fromMinute - fromMinute) <= ANSWER_MINUTES)?.answer ??
    null
  );
}

/** The answers with one given, changed, or taken back. */
export function withAnswer(
  answers: Answers,
  fromMinute: number,
  answer: LevelAnswer | null,
): Answers {
  const others = answers.filter((one) => Math.abs(one.fromMinute - fromMinute) > ANSWER_MINUTES);
  return answer === null ? others : [...others, { fromMinute, answer }];
}
