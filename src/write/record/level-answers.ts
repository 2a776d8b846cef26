import type { RecordFields } from '#shared/note/plan.ts';

type Answers = RecordFields['levelAnswers'];
export type LevelAnswer = Answers[number]['answer'];

/** An answer belongs to the stretch that begins within so many minutes of it. */
const NEAR_MINUTES = 3;

/** What was answered of the stretch that begins at a minute. */
export function answerAt(answers: Answers, fromMinute: number): LevelAnswer | null {
  return (
    answers.findLast((one) => Math.abs(one.fromMinute - fromMinute) <= NEAR_MINUTES)?.answer ?? null
  );
}

/** The answers with one given, changed, or taken back. */
export function withAnswer(
  answers: Answers,
  fromMinute: number,
  answer: LevelAnswer | null,
): Answers {
  const others = answers.filter((one) => Math.abs(one.fromMinute - fromMinute) > NEAR_MINUTES);
  return answer === null ? others : [...others, { fromMinute, answer }];
}
