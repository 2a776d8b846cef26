import type { FiringReading } from '../../firing/types.ts';
import type { KilnFields } from '../kiln-fields.ts';
import type { NoteFields } from '../note-fields.ts';

/** *Must mend* stops handing in; *look again* may be answered with a sentence. */
export type CheckKind = 'must-mend' | 'look-again';

/** A correction the author can take with one press. `value` is a field's value, stored form. */
export interface Offer {
  readonly pointer: string;
  readonly value: number | string | boolean | null | readonly string[];
  readonly label: string;
}

/** A finding that asks the author. Plain data: it is stored and sent as it is. */
export interface Check {
  /** Kebab-case; with the pointer it names the check, and an answer to it. */
  readonly code: string;
  readonly kind: CheckKind;
  /** JSON pointer into the note's fields. */
  readonly pointer: string;
  readonly text: string;
  readonly offer?: Offer;
  /** Shown on the desk only; the author is neither shown nor asked it. */
  readonly forModerators?: true;
}

export interface CheckContext {
  readonly fields: NoteFields;
  readonly kiln: KilnFields | null;
  /** What was read off the record; null without one, or when it was too short to read. */
  readonly reading: FiringReading | null;
  /** True when readings were typed or a stored record belongs to the note. */
  readonly hasRecord: boolean;
  /** The earlier written-up firing of this kiln. */
  readonly earlier: { readonly fields: NoteFields; readonly kiln: KilnFields | null } | null;
  /** Today in the kiln's time zone, `YYYY-MM-DD`. */
  readonly today: string;
}

export const mustMend = (code: string, pointer: string, text: string, offer?: Offer): Check => ({
  code,
  kind: 'must-mend',
  pointer,
  text,
  ...(offer ? { offer } : {}),
});
export const lookAgain = (code: string, pointer: string, text: string, offer?: Offer): Check => ({
  code,
  kind: 'look-again',
  pointer,
  text,
  ...(offer ? { offer } : {}),
});

type Answer = NoteFields['checkAnswers'][number];

/** The author's answer to a check, or null when there is none or a blank one. */
export function answerTo(check: Check, answers: readonly Answer[]): string | null {
  const given = answers.find(
    ({ code, pointer, answer }) =>
      code === check.code && pointer === check.pointer && answer.trim() !== '',
  );
  return given ? given.answer.trim() : null;
}

/** What still asks the author: every *must mend*, and each *look again* without an answer. */
export function openChecks(checks: readonly Check[], answers: readonly Answer[]): Check[] {
  return checks.filter(
    (check) =>
      check.forModerators !== true &&
      (check.kind === 'must-mend' || answerTo(check, answers) === null),
  );
}

/** A note can be handed in when nothing asks its author any more. */
export function canHandIn(checks: readonly Check[], answers: readonly Answer[]): boolean {
  return openChecks(checks, answers).length === 0;
}
