import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import type { Kiln } from '#shared/api/kilns.ts';
import { paths } from '#shared/paths.ts';
import { Button } from '../ui/Button.tsx';
import { Dialog } from '../ui/Dialog.tsx';
import { useMessages } from '../ui/useMessages.ts';
import { useRemoveKiln } from './kiln-mutations.ts';

/** Takes a kiln out of use. What was fired in it stays. */
export function RemoveKiln({ kiln }: { readonly kiln: Kiln }) {
  const [open, setOpen] = useState(false);
  const navigate = useNavigate();
  const tell = useMessages();
  const remove = useRemoveKiln(kiln.id);
  return (
    <section aria-labelledby="remove" className="max-w-measure space-y-3">
      <h2 id="remove" className="border-t-2 border-soot pt-3 text-section">
        Out of use
      </h2>
      <p className="text-small text-soot-2">
        A kiln that is gone takes no new firings. Its notes stay, and its page with them.
      </p>
      <Button kind="danger" onClick={() => setOpen(true)}>
        Take it out of use
      </Button>
      <Dialog
        open={open}
        onClose={() => setOpen(false)}
        title={`Take ${kiln.fields.name} out of use?`}
        actions={
          <Button
            kind="danger"
            busy={remove.isPending}
            onClick={() =>
              remove.mutate(undefined, {
                onSuccess: (done) => {
                  tell({ kind: 'done', text: done.message });
                  void navigate(paths.kilns);
                },
              })
            }
          >
            Take it out of use
          </Button>
        }
      >
        <p>This cannot be undone. Nobody will be able to begin a note of a firing in it.</p>
        {remove.isError && (
          <p role="alert" className="text-caution">
            {remove.error.message}
          </p>
        )}
      </Dialog>
    </section>
  );
}
