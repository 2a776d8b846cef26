import type { ReactNode } from 'react';
import type { FieldIssue } from './field-issue.ts';
import { IssueList } from './IssueList.tsx';

interface Props {
  readonly legend: string;
  /** What the group is for. */
  readonly lead?: ReactNode;
  /** Checks about the group as a whole. */
  readonly issues?: readonly FieldIssue[];
  readonly id?: string;
  readonly children: ReactNode;
}

/** A group of fields under a heavy rule. It is the container its fields measure themselves by. */
export function Fieldset({ legend, lead, issues = [], id, children }: Props) {
  return (
    <fieldset id={id} className="@container min-w-0 border-t-2 border-soot pt-3">
      <legend className="float-left w-full text-section font-[650] tracking-[-0.012em]">
        {legend}
      </legend>
      <div className="clear-both pb-2">
        {lead && <p className="max-w-measure text-small text-soot-2">{lead}</p>}
        {issues.length > 0 && (
          <div className="mt-2">
            <IssueList issues={issues} />
          </div>
        )}
      </div>
      {children}
    </fieldset>
  );
}
