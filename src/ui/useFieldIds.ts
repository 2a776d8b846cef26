import { useId } from 'react';
import type { FieldProps } from './field-issue.ts';

/** The ids that tie a field to its label, its hint and its checks, and the ARIA they amount to. */
export function useFieldIds({ hint, issues = [], required }: FieldProps) {
  const id = useId();
  const hintId = hint ? `${id}-hint` : undefined;
  const issuesId = issues.length > 0 ? `${id}-issues` : undefined;
  const describedBy = [issuesId, hintId].filter(Boolean).join(' ') || undefined;
  return {
    id,
    labelId: `${id}-label`,
    hintId,
    issuesId,
    control: {
      id,
      'aria-describedby': describedBy,
      'aria-invalid': issues.some((issue) => issue.kind === 'must-mend') || undefined,
      'aria-required': required || undefined,
    },
  } as const;
}
export type FieldIds = ReturnType<typeof useFieldIds>;
