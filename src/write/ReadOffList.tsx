import { findingText, type Finding } from '#shared/firing/findings.ts';
import { DISPUTE_SENTENCE, disputeAbout, withDispute } from '#shared/note/finding-disputes.ts';
import { Button } from '../ui/Button.tsx';
import { IssueList } from '../ui/IssueList.tsx';
import { TextArea } from '../ui/TextArea.tsx';
import { useMessages } from '../ui/useMessages.ts';
import { useWriteForm } from './form-context.ts';
import { PinnedField } from './PinnedField.tsx';

/** All that was read off the record, in sentences, while it is typed; each may be disagreed with. */
export function ReadOffList() {
  const { reading, issuesAt } = useWriteForm();
  if (reading.findings.length === 0) return null;
  return (
    <PinnedField pointer="/findingDisputes">
      <div className="max-w-measure pt-6">
        <h3 className="text-body">What is read off it</h3>
        <IssueList issues={issuesAt('/findingDisputes')} />
        <ul className="text-small">
          {reading.findings.map((finding) => (
            <ReadOff key={`${finding.code}-${String(finding.fromMinute)}`} finding={finding} />
          ))}
        </ul>
      </div>
    </PinnedField>
  );
}

function ReadOff({ finding }: { readonly finding: Finding }) {
  const { fields, reading, change, units, editable } = useWriteForm();
  const tell = useMessages();
  const { findings } = reading;
  const dispute = disputeAbout(finding, findings, fields.findingDisputes);
  const said = findingText(finding, units);
  const put = (sentence: string | null): void =>
    change((before) => ({
      ...before,
      findingDisputes: withDispute(findings, before.findingDisputes, finding, sentence),
    }));
  const takeBack = (): void => {
    const sentence = dispute?.sentence ?? '';
    put(null);
    tell({
      kind: 'done',
      text: 'You no longer disagree with this finding.',
      ...(sentence === '' ? {} : { action: { label: 'Undo', onClick: () => put(sentence) } }),
    });
  };
  return (
    <li className="@container border-b border-line py-1.5">
      <div className="grid items-start gap-x-6 sm:grid-cols-[minmax(0,1fr)_auto]">
        <p className={`min-w-0 ${finding.trouble && !dispute ? 'font-[600]' : ''}`}>{said}</p>
        {editable && (
          <div className="-mx-1 -my-1">
            <Button
              kind="quiet"
              label={dispute ? `Take it back: ${said}` : `I disagree: ${said}`}
              onClick={dispute ? takeBack : () => put('')}
            >
              {dispute ? 'Take it back' : 'I disagree'}
            </Button>
          </div>
        )}
      </div>
      {dispute && (
        <div className="mt-1 mb-2 border-l-2 border-soot-2 pl-3">
          <TextArea
            label="You disagree, because"
            hint={`In a sentence of ${String(DISPUTE_SENTENCE.fewest)} to ${String(DISPUTE_SENTENCE.most)} characters. Readers see it beside the finding, which counts in no figure until a moderator restores it.`}
            value={dispute.sentence}
            onValue={put}
            rows={2}
            maxLength={DISPUTE_SENTENCE.most}
            disabled={!editable}
          />
        </div>
      )}
    </li>
  );
}
