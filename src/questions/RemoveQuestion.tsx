import { useState } from 'react';
import type { NoteQuestion } from '#shared/api/questions.ts';
import { Button } from '../ui/Button.tsx';
import { Dialog } from '../ui/Dialog.tsx';
import { useMessages } from '../ui/useMessages.ts';
import type { OfNote } from './useNoteQuestions.ts';

interface Props {
  readonly question: NoteQuestion;
  readonly ofNote: OfNote;
}

/** For whoever asked, and for moderators. Its answers go with it, so it is asked about first. */
export function RemoveQuestion({ question, ofNote: { remove } }: Props) {
  const [open, setOpen] = useState(false);
  const tell = useMessages();
  const failed = remove.isError && remove.variables === question.id;
  return (
    <>
      <Button
        kind="quiet"
        icon="remove"
        label={`Remove: ${question.text.slice(0, 80)}`}
        onClick={() => setOpen(true)}
      >
        Remove
      </Button>
      <Dialog
        open={open}
        onClose={() => setOpen(false)}
        title="Remove this question?"
        actions={
          <Button
            kind="danger"
            busy={remove.isPending}
            onClick={() =>
              remove.mutate(question.id, {
                onSuccess: () => {
                  setOpen(false);
                  tell({ kind: 'done', text: 'The question is removed.' });
                  // Its row is gone: reading goes on at the head of the others.
                  document.getElementById('questions')?.focus();
                },
              })
            }
          >
            Remove it
          </Button>
        }
      >
        <p className="break-words whitespace-pre-line">{question.text}</p>
        <p className="text-soot-2">
          {question.answers.length > 0 ? 'Its answers go with it. ' : ''}This cannot be undone.
        </p>
        {failed && (
          <p role="alert" className="text-caution">
            {remove.error.message}
          </p>
        )}
      </Dialog>
    </>
  );
}
