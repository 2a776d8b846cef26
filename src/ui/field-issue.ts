import type { ReactNode } from 'react';

/** A check beside a field: one stops handing in, the other may be answered with a sentence. */
export interface FieldIssue {
  readonly kind: 'must-mend' | 'look-again';
  readonly text: string;
  /** Answered by the author: still said, no longer asked. */
  readonly settled?: boolean | undefined;
  /** What can be done about it on the spot: a correction to take, an answer to write. */
  readonly action?: ReactNode;
}

/** What every field takes. */
export interface FieldProps {
  readonly label: string;
  /** A sentence under the field: what is meant, in which range. */
  readonly hint?: string | undefined;
  readonly issues?: readonly FieldIssue[] | undefined;
  /** Needed for handing in; said in words, not by a star alone. */
  readonly required?: boolean | undefined;
  readonly disabled?: boolean | undefined;
  /** The label is for screen readers only, because a table's heading says it. */
  readonly labelHidden?: boolean | undefined;
  /** Stands in the margin under the checks: what was read off, what the desk remarked. */
  readonly margin?: ReactNode;
}
