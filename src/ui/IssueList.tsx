import type { FieldIssue } from './field-issue.ts';
import { Icon } from './Icon.tsx';

const WORDS: Readonly<Record<FieldIssue['kind'], string>> = {
  'must-mend': 'Must mend',
  'look-again': 'Look again',
};

function look({ kind, settled }: FieldIssue): string {
  if (settled) return 'border-line text-soot-2';
  return `border-caution text-caution ${kind === 'must-mend' ? '' : 'border-dotted'}`;
}

interface Props {
  readonly id?: string | undefined;
  readonly issues: readonly FieldIssue[];
}

/** Checks as they stand in the margin of a form: a shape, a word in weight, a sentence. */
export function IssueList({ id, issues }: Props) {
  if (issues.length === 0) return null;
  return (
    <ul id={id} className="space-y-2 text-small">
      {issues.map((issue, index) => (
        <li key={index} className={`flex gap-2 border-l-2 pl-2.5 ${look(issue)}`}>
          <Icon name={issue.settled ? 'done' : issue.kind} className="mt-0.5 size-4.5" />
          <div className="min-w-0 grow">
            <strong className="font-[650]">
              {issue.settled ? 'Answered' : WORDS[issue.kind]}.
            </strong>{' '}
            {issue.text}
            {issue.action}
          </div>
        </li>
      ))}
    </ul>
  );
}
