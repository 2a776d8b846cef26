import { useState } from 'react';
import { Button } from '../ui/Button.tsx';
import { Dialog } from '../ui/Dialog.tsx';
import type { DraftActs } from './useDraftActs.ts';

/** Removes the note after asking once more. */
export function RemoveNoteButton({ remove }: { readonly remove: DraftActs['remove'] }) {
  const [asking, setAsking] = useState(false);
  return (
    <>
      <Button kind="danger" onClick={() => setAsking(true)}>
        Remove this note
      </Button>
      <Dialog
        open={asking}
        onClose={() => setAsking(false)}
        title="Remove this note?"
        actions={
          <>
            <Button kind="danger" busy={remove.isPending} onClick={() => remove.mutate()}>
              Remove it
            </Button>
            <Button onClick={() => setAsking(false)}>Keep it</Button>
          </>
        }
      >
        <p>It leaves your notebook with its record and pictures. You can undo it right after.</p>
        {remove.isError && (
          <p role="alert" className="text-caution">
            {remove.error.message}
          </p>
        )}
      </Dialog>
    </>
  );
}
