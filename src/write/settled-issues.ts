import { answerTo, type Check } from '#shared/note/checks/check.ts';
import type { NoteFields } from '#shared/note/note-fields.ts';
import { isDueBeside } from './begun-parts.ts';

/** The checks at a pointer, in their order, with whether the author has answered each. */
export function settledIssues(
  checks: readonly Check[],
  fields: NoteFields,
  pointer: string,
  /** Blanks too, though their part of the note was not begun: once handing in was looked at. */
  withAllBlanks: boolean,
): { readonly check: Check; readonly settled: boolean }[] {
  return checks
    .filter((check) => check.pointer === pointer && (withAllBlanks || isDueBeside(check, fields)))
    .map((check) => ({
      check,
      settled: check.kind === 'look-again' && answerTo(check, fields.checkAnswers) !== null,
    }));
}
