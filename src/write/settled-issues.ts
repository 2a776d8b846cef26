import { answerTo, type Check } from '#shared/note/checks/check.ts';
import type { NoteFields } from '#shared/note/note-fields.ts';

/** The checks at a pointer, in their order, with whether the author has answered each. */
export function settledIssues(
  checks: readonly Check[],
  answers: NoteFields['checkAnswers'],
  pointer: string,
): { readonly check: Check; readonly settled: boolean }[] {
  return checks
    .filter((check) => check.pointer === pointer)
    .map((check) => ({
      check,
      settled: check.kind === 'look-again' && answerTo(check, answers) !== null,
    }));
}
