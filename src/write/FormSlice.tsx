import { memo, type ReactNode } from 'react';
import { WriteFormContext, type WriteForm } from './form-context.ts';

interface Props {
  readonly form: WriteForm;
  /** What the part shows, compared by identity: members of the fields, the firing as read. */
  readonly reads: readonly unknown[];
  /** What is said beside its fields, compared as text. */
  readonly said: string;
  readonly children: ReactNode;
}

/**
 * A part of the form that is drawn anew only when what it shows has changed: a key typed in one
 * section must not draw the other ten, nor a record's chart. What it reads of the fields beyond
 * `reads` may be older; changes always start from the newest.
 */
export const FormSlice = memo(
  function FormSlice({ form, children }: Props) {
    return <WriteFormContext value={form}>{children}</WriteFormContext>;
  },
  (before, after) =>
    before.said === after.said &&
    before.reads.length === after.reads.length &&
    before.reads.every((value, index) => value === after.reads[index]) &&
    before.form.draft === after.form.draft &&
    before.form.kiln === after.form.kiln &&
    before.form.kilns === after.form.kilns &&
    before.form.units === after.form.units,
);
