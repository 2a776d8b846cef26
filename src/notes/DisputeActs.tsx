import { useRef, useState } from 'react';
import type { FindingDispute } from '#shared/api/disputes.ts';
import { findingText, type Finding } from '#shared/firing/findings.ts';
import { DISPUTE_SENTENCE, isReason } from '#shared/note/finding-disputes.ts';
import type { Units } from '#shared/units/units.ts';
import { Button } from '../ui/Button.tsx';
import { Dialog } from '../ui/Dialog.tsx';
import { Notice } from '../ui/Notice.tsx';
import { TextArea } from '../ui/TextArea.tsx';
import { useMessages } from '../ui/useMessages.ts';
import { useDisputes } from './dispute-mutations.ts';

interface Props {
  readonly noteId: number;
  readonly finding: Finding;
  readonly dispute: FindingDispute | null;
  readonly units: Units;
}

/** For the author of a published note: disagree with a finding, or take that back. */
export function DisputeActs({ noteId, finding, dispute, units }: Props) {
  const [open, setOpen] = useState(false);
  const [sentence, setSentence] = useState('');
  const [asked, setAsked] = useState(false);
  const button = useRef<HTMLButtonElement>(null);
  const tell = useMessages();
  const { disagree, takeBack } = useDisputes(noteId);
  const said = findingText(finding, units);
  /** The button pressed is another one now; the focus stays where it was. */
  const done = (text: string): void => {
    tell({ kind: 'done', text });
    button.current?.focus();
  };
  const submit = (): void => {
    setAsked(true);
    if (!isReason(sentence)) return;
    disagree.mutate(
      { finding, sentence: sentence.trim() },
      {
        onSuccess: () => {
          setOpen(false);
          setSentence('');
          setAsked(false);
          done('Your disagreement stands beside the finding.');
        },
      },
    );
  };
  const undo = (id: number, version: number): void =>
    takeBack.mutate(
      { id, version },
      {
        onSuccess: () => done('Taken back. The finding counts again.'),
        onError: (error) =>
          tell({
            kind: 'error',
            text: error.message,
            action: { label: 'Try again', onClick: () => undo(id, version) },
          }),
      },
    );
  // A moderator’s word is the last one.
  const isSettled = dispute !== null && (dispute.state === 'restored' || dispute.id === null);
  return (
    <div className="not-in-print">
      {dispute === null && (
        <Button
          ref={button}
          kind="quiet"
          label={`I disagree: ${said}`}
          onClick={() => setOpen(true)}
        >
          I disagree
        </Button>
      )}
      {dispute !== null && !isSettled && (
        <Button
          ref={button}
          kind="quiet"
          label={`Take it back: ${said}`}
          busy={takeBack.isPending}
          onClick={() => undo(dispute.id ?? 0, dispute.version)}
        >
          Take it back
        </Button>
      )}
      <Dialog
        open={open}
        onClose={() => setOpen(false)}
        title="Disagree with this finding"
        actions={
          <>
            <Button kind="main" busy={disagree.isPending} onClick={submit}>
              Disagree
            </Button>
            <Button onClick={() => setOpen(false)}>Cancel</Button>
          </>
        }
      >
        <p className="font-[600]">{said}</p>
        <p className="text-small">
          Your sentence stands beside it, for everybody to read. The finding leaves the figures, the
          lists and the search at once. A moderator looks, and may restore it.
        </p>
        <div className="@container">
          <TextArea
            label="Why it is not so"
            hint={`In a sentence: ${String(DISPUTE_SENTENCE.fewest)} to ${String(DISPUTE_SENTENCE.most)} characters.`}
            value={sentence}
            onValue={setSentence}
            rows={3}
            maxLength={DISPUTE_SENTENCE.most}
            issues={
              asked && !isReason(sentence)
                ? [{ kind: 'must-mend', text: 'Say why in a sentence.' }]
                : undefined
            }
          />
        </div>
        {disagree.isError && (
          <Notice kind="error" appeared>
            {disagree.error.message} What you wrote is still here.
          </Notice>
        )}
      </Dialog>
    </div>
  );
}
