import type { ReactNode } from 'react';
import type { FieldProps } from './field-issue.ts';
import { IssueList } from './IssueList.tsx';
import type { FieldIds } from './useFieldIds.ts';

interface Props {
  readonly field: FieldProps;
  readonly ids: FieldIds;
  /** A group of controls is named by its label's id, a single control by `for`. */
  readonly group?: boolean;
  readonly children: ReactNode;
}

/**
 * One line of the sheet: label, control, and the fixed margin where checks appear, so that nothing
 * moves as they come and go. The three stand in columns where the form is wide enough, else below
 * each other. The form (or Fieldset) around it is the `@container`.
 */
export function FieldFrame({ field, ids, group = false, children }: Props) {
  const label = (
    <>
      {field.label}
      {field.required && <span className="text-soot-2"> (needed)</span>}
    </>
  );
  const labelClass = field.labelHidden
    ? 'sr-only'
    : 'text-small font-[550] text-soot @2xl:pt-2 @2xl:text-soot-2 @2xl:font-[450]';
  return (
    <div
      className={
        field.labelHidden
          ? 'space-y-1.5'
          : 'grid gap-x-5 gap-y-1 py-2 @2xl:grid-cols-[10.5rem_minmax(0,1fr)] @4xl:grid-cols-[10.5rem_minmax(0,1fr)_17rem]'
      }
    >
      {group ? (
        <span id={ids.labelId} className={labelClass}>
          {label}
        </span>
      ) : (
        <label htmlFor={ids.id} className={labelClass}>
          {label}
        </label>
      )}
      <div className="min-w-0">
        {children}
        {field.hint && (
          <p id={ids.hintId} className="mt-1 max-w-measure text-note text-soot-2">
            {field.hint}
          </p>
        )}
      </div>
      <div
        className={
          field.labelHidden
            ? ''
            : 'mt-1 empty:mt-0 @2xl:col-start-2 @4xl:col-start-3 @4xl:mt-0 @4xl:pt-2'
        }
      >
        <IssueList id={ids.issuesId} issues={field.issues ?? []} />
        {field.margin}
      </div>
    </div>
  );
}
