import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { doneSchema } from '#shared/api/accounts.ts';
import { send } from '../http/client.ts';
import { noteQueries } from '../notes/note-queries.ts';
import { Button } from '../ui/Button.tsx';
import { Dialog } from '../ui/Dialog.tsx';
import { TextArea } from '../ui/TextArea.tsx';
import { useMessages } from '../ui/useMessages.ts';

/** For moderators: takes a published note down, with a reason the author is told. */
export function TakeDownButton({ noteId }: { readonly noteId: number }) {
  const [open, setOpen] = useState(false);
  const [reason, setReason] = useState('');
  const tell = useMessages();
  const client = useQueryClient();
  const takeDown = useMutation({
    mutationFn: () =>
      send({
        method: 'POST',
        path: `/api/notes/${String(noteId)}/take-down`,
        body: { reason },
        answer: doneSchema,
      }),
    onSuccess: (done) => {
      tell({ kind: 'done', text: done.message });
      setOpen(false);
      return client.invalidateQueries({ queryKey: noteQueries.all });
    },
  });
  return (
    <>
      <Button kind="danger" onClick={() => setOpen(true)}>
        Take down
      </Button>
      <Dialog
        open={open}
        onClose={() => setOpen(false)}
        title="Take this note down?"
        actions={
          <Button
            kind="danger"
            busy={takeDown.isPending}
            disabled={reason.trim() === ''}
            onClick={() => takeDown.mutate()}
          >
            Take down
          </Button>
        }
      >
        <p className="pb-3">
          It leaves the pages, the search and the figures at once. The author is told why.
        </p>
        <TextArea label="Why" value={reason} onValue={setReason} />
        {takeDown.isError && <p className="pt-2 text-caution">{takeDown.error.message}</p>}
      </Dialog>
    </>
  );
}
