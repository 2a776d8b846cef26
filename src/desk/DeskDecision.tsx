import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { DESK_CHECKLIST, type DeskNote } from '#shared/api/desk.ts';
import { paths } from '#shared/paths.ts';
import { Button } from '../ui/Button.tsx';
import { CheckField } from '../ui/CheckField.tsx';
import { Dialog } from '../ui/Dialog.tsx';
import { Notice } from '../ui/Notice.tsx';
import { TextArea } from '../ui/TextArea.tsx';
import { useMessages } from '../ui/useMessages.ts';
import { NOTHING_TYPED, type KeptDeskText } from './kept-desk-text.ts';
import type { AtTheDesk, Decision } from './useDeskNote.ts';

interface Props {
  readonly desk: AtTheDesk;
  readonly data: DeskNote;
  readonly typed: KeptDeskText;
  readonly onTyped: (part: Partial<KeptDeskText>) => void;
  /** The note to go on with. */
  readonly next: number | null;
}

const QUESTIONS = Object.entries(DESK_CHECKLIST);
const WHY_CROSS = 'cross-all';

/** The short checklist, the reason, and the decision; then on to the next note. */
export function DeskDecision({ desk, data, typed, onTyped, next }: Props) {
  const navigate = useNavigate();
  const tell = useMessages();
  const [declining, setDeclining] = useState(false);
  const { decide, claim, note } = desk;
  const mayDecide = data.abilities.decide;
  const allCrossed = QUESTIONS.every(([key]) => typed.crossed.includes(key));
  const hasReason = typed.reason.trim() !== '';

  const send = (decision: Decision['decision']): void => {
    decide.mutate(
      {
        decision,
        revisionId: data.revisionId,
        reason: typed.reason,
        checklist: typed.crossed,
      },
      {
        onSuccess: (done) => {
          onTyped(NOTHING_TYPED);
          tell({ kind: 'done', text: done.message });
          void navigate(next === null ? paths.desk : paths.deskNote(next));
        },
        onSettled: () => setDeclining(false),
      },
    );
  };

  if (!mayDecide && !decide.isError && typed.reason === '' && typed.crossed.length === 0) {
    return null;
  }
  return (
    <section aria-labelledby="decide" className="space-y-3">
      <h2 id="decide" className="text-section">
        Decide
      </h2>
      <ul className="border-t border-soot-2 text-small">
        {QUESTIONS.map(([key, question]) => (
          <li key={key} className="border-b border-line">
            <CheckField
              label={question}
              checked={typed.crossed.includes(key)}
              onChecked={(crossed) =>
                onTyped({
                  crossed: crossed
                    ? [...typed.crossed, key]
                    : typed.crossed.filter((other) => other !== key),
                })
              }
            />
          </li>
        ))}
      </ul>
      <div className="@container">
        <TextArea
          label="Why, for the author"
          hint="Needed to send it back or to decline. It goes into the mail, with the remarks."
          value={typed.reason}
          onValue={(reason) => onTyped({ reason })}
          maxLength={2000}
          rows={4}
        />
      </div>
      {decide.isError && (
        <Notice
          kind="error"
          heading="This was not decided"
          appeared
          action={
            <>
              <Button
                busy={claim.isPending}
                onClick={() => claim.mutate(undefined, { onSuccess: () => decide.reset() })}
              >
                Take it again
              </Button>
              <Button busy={note.isFetching} onClick={() => void note.refetch()}>
                Look how it stands now
              </Button>
            </>
          }
        >
          {decide.error.message} What you typed is still here, and is kept in this browser.
        </Notice>
      )}
      {mayDecide ? (
        <div className="space-y-2">
          <div className="flex flex-wrap gap-3">
            <Button
              kind="main"
              busy={decide.isPending && decide.variables.decision === 'publish'}
              disabled={!allCrossed}
              describedBy={WHY_CROSS}
              onClick={() => send('publish')}
            >
              Publish
            </Button>
            <Button
              busy={decide.isPending && decide.variables.decision === 'send-back'}
              disabled={!hasReason}
              describedBy={WHY_CROSS}
              onClick={() => send('send-back')}
            >
              Send back
            </Button>
            <Button
              kind="danger"
              disabled={!hasReason}
              describedBy={WHY_CROSS}
              onClick={() => setDeclining(true)}
            >
              Decline
            </Button>
          </div>
          <p id={WHY_CROSS} className="text-note text-soot-2">
            {allCrossed ? '' : 'Cross all five to publish. '}
            {hasReason ? '' : 'Say why to send back or decline.'}
          </p>
        </div>
      ) : (
        <p className="text-small text-soot-2">
          It is not on your desk, so nothing can be decided. Your words stay here.
        </p>
      )}
      <Dialog
        open={declining}
        onClose={() => setDeclining(false)}
        title="Decline this note?"
        actions={
          <Button kind="danger" busy={decide.isPending} onClick={() => send('decline')}>
            Decline it
          </Button>
        }
      >
        <p>
          A declined note is not published, and its author is told why. To ask for changes instead,
          send it back.
        </p>
      </Dialog>
    </section>
  );
}
