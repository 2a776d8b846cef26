import type { Draft } from '#shared/api/notes.ts';
import { labelOf } from '#shared/note/field-labels.ts';
import { momentWords } from '../notes/note-words.ts';
import { Button } from '../ui/Button.tsx';
import { Notice } from '../ui/Notice.tsx';
import { goToField } from './go-to-field.ts';
import { RemarkNote, RemarkWords } from './FieldMargin.tsx';

const DECIDED: Readonly<Partial<Record<Draft['status'], string>>> = {
  'sent-back': 'Sent back to you',
  declined: 'Declined',
  'taken-down': 'Taken down',
};

/** What the desk said: its decision with the reason, and its remarks with what they are pinned to. */
export function DeskWords({ draft }: { readonly draft: Draft }) {
  const { decision, remarks, status } = draft;
  const left = remarks.filter(({ mended }) => !mended).length;
  if (!decision && remarks.length === 0) return null;
  return (
    <div className="space-y-4">
      {decision && (
        <Notice kind="caution" heading={DECIDED[status] ?? 'From the desk'}>
          <p className="whitespace-pre-line">{decision.reason || 'No reason was written.'}</p>
          <p className="text-soot-2">
            {decision.by ? `${decision.by.name}, ` : ''}
            {momentWords(decision.at)}
          </p>
        </Notice>
      )}
      {remarks.length > 0 && (
        <section aria-labelledby="remarks" className="space-y-2">
          <h2 id="remarks" className="text-section">
            Remarks from the desk
          </h2>
          <p className="text-small text-soot-2">
            {left === 0
              ? 'All are mended.'
              : `${String(left)} of ${String(remarks.length)} to mend.`}
          </p>
          <ul className="max-w-measure space-y-3">
            {remarks.map((remark) => (
              <li key={remark.id}>
                {draft.abilities.edit && remark.pointer !== '' && (
                  <span className="-ml-1">
                    <Button
                      kind="quiet"
                      label={`Go to the field: ${labelOf(remark.pointer)}`}
                      onClick={() => goToField(remark.pointer)}
                    >
                      {labelOf(remark.pointer)}
                    </Button>
                  </span>
                )}
                {draft.abilities.edit ? (
                  <RemarkNote remark={remark} />
                ) : (
                  <RemarkWords remark={remark} mended={remark.mended} />
                )}
              </li>
            ))}
          </ul>
        </section>
      )}
    </div>
  );
}
