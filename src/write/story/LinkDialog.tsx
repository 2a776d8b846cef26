import { useState } from 'react';
import { isSafeLink } from '#shared/note/story.ts';
import { Button } from '../../ui/Button.tsx';
import { Dialog } from '../../ui/Dialog.tsx';
import { TextField } from '../../ui/TextField.tsx';
import { completeAddress } from './complete-address.ts';

interface Props {
  /** The address the words have now, '' for none; null while the dialog is shut. */
  readonly address: string | null;
  readonly onClose: () => void;
  readonly onAddress: (address: string | null) => void;
}

/** Asks where a link leads. */
export function LinkDialog({ address, ...on }: Props) {
  return (
    <Dialog open={address !== null} onClose={on.onClose} title="Link">
      {address !== null && <LinkForm key={address} address={address} {...on} />}
    </Dialog>
  );
}

function LinkForm({ address, onClose, onAddress }: Props & { readonly address: string }) {
  const [typed, setTyped] = useState(address);
  const [asked, setAsked] = useState(false);
  const complete = completeAddress(typed);
  const fits = isSafeLink(complete);
  return (
    <form
      className="@container space-y-4"
      onSubmit={(event) => {
        event.preventDefault();
        // The page's own form must not hear of it.
        event.stopPropagation();
        setAsked(true);
        if (fits) onAddress(complete);
      }}
    >
      <TextField
        label="Address"
        hint="Of a web page (https://…) or a mail address (mailto:…)."
        value={typed}
        onValue={setTyped}
        maxLength={2000}
        spellCheck={false}
        issues={
          asked && !fits
            ? [
                {
                  kind: 'must-mend',
                  text: 'Write a web address such as https://example.org/glaze.',
                },
              ]
            : []
        }
      />
      <div className="flex flex-wrap gap-3">
        <Button kind="main" type="submit">
          Set the link
        </Button>
        {address !== '' && (
          <Button icon="remove" onClick={() => onAddress(null)}>
            Take the link off
          </Button>
        )}
        <Button onClick={onClose}>Leave it</Button>
      </div>
    </form>
  );
}
