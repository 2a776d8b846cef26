import { useState } from 'react';
import type { Kiln } from '#shared/api/kilns.ts';
import { Button } from '../ui/Button.tsx';
import { Dialog } from '../ui/Dialog.tsx';
import { useMessages } from '../ui/useMessages.ts';
import { useRemoveKilnPicture } from './kiln-mutations.ts';

/** Deletes the kiln's picture after asking once more. */
export function RemoveKilnPicture({ kiln }: { readonly kiln: Kiln }) {
  const [asking, setAsking] = useState(false);
  const tell = useMessages();
  const remove = useRemoveKilnPicture(kiln.id);
  const close = (): void => {
    setAsking(false);
    remove.reset();
  };
  return (
    <>
      <Button kind="danger" onClick={() => setAsking(true)}>
        Delete the picture
      </Button>
      <Dialog
        open={asking}
        onClose={close}
        title={`Delete the picture of ${kiln.fields.name}?`}
        actions={
          <>
            <Button
              kind="danger"
              busy={remove.isPending}
              onClick={() =>
                remove.mutate(undefined, {
                  onSuccess: ({ message }) => tell({ kind: 'done', text: message }),
                })
              }
            >
              Delete it
            </Button>
            <Button onClick={close}>Keep it</Button>
          </>
        }
      >
        <p>This cannot be undone.</p>
        {remove.isError && (
          <p role="alert" className="text-caution">
            {remove.error.message}
          </p>
        )}
      </Dialog>
    </>
  );
}
