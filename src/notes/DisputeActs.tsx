import { useState } from 'react';
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
  const tell = useMessages();
  const { disagree, takeBack } = useDisputes(noteId);
  const said = findingText(finding, units);
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
          tell({ kind: 'done', text: 'Your disagreement stands beside the finding.' });
        },
      },
    );
  };
  const undo = (id: number, version: number): void =>
    takeBack.mutate(
      { id, version },
      {
        onSuccess: () => tell({ kind: 'done', text: 'Taken back. The finding counts again.' }),
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
    <div className="not-in-print -mx-1 -my-1">
      {/* One button for both, so that the focus stays on it. */}
      {!isSettled && (
        <Button
          kind="quiet"
          label={`${dispute ? 'Take it back' : 'I disagree'}: ${said}`}
          busy={takeBack.isPending}
          onClick={() => (dispute ? undo(dispute.id ?? 0, dispute.version) : setOpen(true))}
        >
          {dispute ? 'Take it back' : 'I disagree'}
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
