import { useMutation } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import type { Remark } from '#shared/api/notes.ts';
import { findingText, type Finding } from '#shared/firing/findings.ts';
import { disputeAbout } from '#shared/note/finding-disputes.ts';
import { momentWords } from '../notes/note-words.ts';
import { CheckField } from '../ui/CheckField.tsx';
import { useMessages } from '../ui/useMessages.ts';
import { tickRemark } from './draft-mutations.ts';
import { useWriteForm } from './form-context.ts';

/** A remark from the desk with the author's tick that it is mended. */
export function RemarkNote({ remark }: { readonly remark: Remark }) {
  const { draft, keeper } = useWriteForm();
  const tell = useMessages();
  const tick = useMutation({
    mutationFn: (mended: boolean) => tickRemark(draft.id, remark.id, mended),
    onSuccess: (answer) => keeper.accept(answer),
    onError: (error, mended) =>
      tell({
        kind: 'error',
        text: error.message,
        action: { label: 'Try again', onClick: () => tick.mutate(mended) },
      }),
  });
  const mended = tick.isPending ? tick.variables : remark.mended;
  return (
    <RemarkWords remark={remark} mended={mended}>
      <div className="-mb-2 text-body">
        <CheckField label="Mended" checked={mended} onChecked={(checked) => tick.mutate(checked)} />
      </div>
    </RemarkWords>
  );
}

/** A remark as words alone: where the note cannot be edited there is nothing to tick. */
export function RemarkWords({
  remark,
  mended,
  children,
}: {
  readonly remark: Remark;
  readonly mended: boolean;
  readonly children?: ReactNode;
}) {
  return (
    <div className="border-l-4 border-verdigris bg-verdigris-tint px-3 pt-2 text-small text-verdigris-ink">
      <p className="text-note">
        From the desk{remark.by ? `, ${remark.by.name}` : ''}, {momentWords(remark.at)}
      </p>
      <p className={`whitespace-pre-line ${mended ? 'line-through' : ''}`}>{remark.text}</p>
      {children}
    </div>
  );
}

interface Props {
  readonly findings: readonly Finding[];
  readonly remarks: readonly Remark[];
}

/** Under the checks in the margin: what was read off the record about this field, and the desk's words. */
export function FieldMargin({ findings, remarks }: Props) {
  const { units, fields, reading } = useWriteForm();
  return (
    <div className="space-y-2 pt-1">
      {findings.length > 0 && (
        <ul className="space-y-1 border-l border-soot-2 pl-2.5 text-small">
          {findings.map((finding) => (
            <li key={`${finding.code}-${String(finding.fromMinute)}`}>
              <span className="text-soot-2">Read off: </span>
              {findingText(finding, units)}
              {disputeAbout(finding, reading.findings, fields.findingDisputes) && (
                <span className="text-soot-2"> You disagree.</span>
              )}
            </li>
          ))}
        </ul>
      )}
      {remarks.map((remark) => (
        <RemarkNote key={remark.id} remark={remark} />
      ))}
    </div>
  );
}
