import { useState, type FormEvent } from 'react';
import { Link, useLocation } from 'react-router-dom';
import { MAX_SAVED_NAME } from '#shared/api/saved-searches.ts';
import { paths } from '#shared/paths.ts';
import { FormProblem } from '../accounts/FormProblem.tsx';
import { useSession } from '../accounts/useSession.ts';
import type { FindAddress } from '../find/find-address.ts';
import { Button } from '../ui/Button.tsx';
import { Dialog } from '../ui/Dialog.tsx';
import { TextField } from '../ui/TextField.tsx';
import { useMessages } from '../ui/useMessages.ts';
import { askedOf, sameSearch } from './asked-address.ts';
import { askedWords } from './asked-words.ts';
import { useSavedSearches } from './useSavedSearches.ts';

/** Keeps this search under a name, to be written to when a new note fits it. */
export function SaveSearch({ address }: { readonly address: FindAddress }) {
  const { me, known, units } = useSession();
  const { pathname, search } = useLocation();
  const { list, save } = useSavedSearches();
  const tell = useMessages();
  const [name, setName] = useState<string | null>(null);
  if (!known) return null;
  if (!me) {
    return (
      <Link to={paths.signIn(pathname + search)} className="link text-small">
        Sign in to save this search
      </Link>
    );
  }
  if (!list.data) return null;
  const kept = sameSearch(list.data.searches, address);
  if (kept) {
    return (
      <Link to={paths.savedSearches} className="link text-small">
        Saved as “{kept.name}”
      </Link>
    );
  }
  const close = (): void => {
    save.reset();
    setName(null);
  };
  const keep = (): void => {
    if (name === null || save.isPending) return;
    save.mutate(
      { name, search: askedOf(address) },
      {
        onSuccess: () => {
          setName(null);
          tell({
            kind: 'done',
            text: me.settings.mails.savedSearches
              ? `“${name.trim()}” is saved. New notes that fit it closely are mailed, at most once a day.`
              : `“${name.trim()}” is saved. Mails about saved searches are switched off in your settings.`,
          });
        },
      },
    );
  };
  return (
    <>
      <Button
        kind="quiet"
        icon="add"
        onClick={() => setName(askedWords(askedOf(address), units).slice(0, MAX_SAVED_NAME))}
      >
        Save this search
      </Button>
      <Dialog open={name !== null} onClose={close} title="Save this search">
        <form
          className="@container space-y-4"
          onSubmit={(event: FormEvent) => {
            event.preventDefault();
            keep();
          }}
        >
          <FormProblem error={save.error} fields={[]} />
          <TextField
            label="Name"
            value={name ?? ''}
            onValue={setName}
            maxLength={MAX_SAVED_NAME}
            hint="Its question and filters are kept; order and page are not."
          />
          <div className="flex flex-wrap gap-3">
            <Button type="submit" kind="main" busy={save.isPending}>
              Save it
            </Button>
            <Button kind="quiet" onClick={close}>
              Do not
            </Button>
          </div>
        </form>
      </Dialog>
    </>
  );
}
