import type { ReactNode } from 'react';
import { CrossedBox } from './ChoiceCell.tsx';
import type { FieldProps } from './field-issue.ts';
import { IssueList } from './IssueList.tsx';
import { useFieldIds } from './useFieldIds.ts';

interface Props extends Omit<FieldProps, 'label' | 'labelHidden'> {
  /** Words beside the box; may hold links. */
  readonly label: ReactNode;
  readonly checked: boolean;
  readonly onChecked: (checked: boolean) => void;
}

/** A single yes. */
export function CheckField({ label, checked, onChecked, ...field }: Props) {
  const ids = useFieldIds({ ...field, label: '' });
  return (
    <div className="space-y-1 py-1.5">
      <label className="relative inline-flex min-h-8 items-start gap-3 py-1 touch:min-h-11 has-focus-visible:outline-2 has-focus-visible:outline-offset-2 has-focus-visible:outline-verdigris has-disabled:text-soot-2">
        <input
          {...ids.control}
          type="checkbox"
          className="absolute left-0 top-0 size-8 opacity-0"
          checked={checked}
          onChange={(event) => onChecked(event.currentTarget.checked)}
          disabled={field.disabled}
        />
        <span className="mt-1.5 leading-none">
          <CrossedBox crossed={checked} />
        </span>
        <span>{label}</span>
      </label>
      {field.hint && (
        <p id={ids.hintId} className="pl-6.5 text-note text-soot-2">
          {field.hint}
        </p>
      )}
      <IssueList id={ids.issuesId} issues={field.issues ?? []} />
      {field.margin}
    </div>
  );
}
