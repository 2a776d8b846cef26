import { useState, type FormEvent } from 'react';
import { Link } from 'react-router-dom';
import { MAX_SAVED_NAME, type SavedSearch } from '#shared/api/saved-searches.ts';
import { paths } from '#shared/paths.ts';
import type { Units } from '#shared/units/units.ts';
import { writeFindAddress } from '../find/find-address.ts';
import { Button } from '../ui/Button.tsx';
import { CheckField } from '../ui/CheckField.tsx';
import { TextField } from '../ui/TextField.tsx';
import { addressOf } from './asked-address.ts';
import { filterWords, leftOutWords } from './asked-words.ts';

interface Props {
  readonly search: SavedSearch;
  readonly units: Units;
  readonly busy: boolean;
  readonly onChange: (changed: { name: string; mails: boolean }, done: () => void) => void;
  readonly onRemove: () => void;
}

const day = new Intl.DateTimeFormat('en-GB', { dateStyle: 'long' });

/** One saved search: what it asks, whether it is mailed, another name, and its end. */
export function SavedSearchRow({ search, units, busy, onChange, onRemove }: Props) {
  const { name, mails } = search;
  const [newName, setNewName] = useState<string | null>(null);
  const details = [...leftOutWords(search.search, units), ...filterWords(search.search, units)];
  return (
    <li className="@container space-y-2 border-t border-line py-4 first:border-t-0">
      <div className="space-y-1">
        <h2 className="text-lead break-words">
          <Link
            className="link"
            to={`${paths.find()}?${writeFindAddress(addressOf(search.search))}`}
          >
            {name}
          </Link>
        </h2>
        <p className="text-small">
          {search.search.q === '' ? 'Any question' : `“${search.search.q}”`}
          {details.length > 0 && `; ${details.join('; ')}`}
        </p>
        <p className="text-note text-soot-2">
          Saved {day.format(new Date(search.savedAt))}
          {search.mailedAt && `; last mailed ${day.format(new Date(search.mailedAt))}`}
        </p>
      </div>
      {newName !== null && (
        <form
          className="space-y-2"
          onSubmit={(event: FormEvent) => {
            event.preventDefault();
            if (newName.trim() !== '') onChange({ name: newName, mails }, () => setNewName(null));
          }}
        >
          <TextField
            label="Another name"
            value={newName}
            onValue={setNewName}
            maxLength={MAX_SAVED_NAME}
            issues={newName.trim() === '' ? [{ kind: 'must-mend', text: 'Give it a name.' }] : []}
          />
          <div className="flex flex-wrap gap-3">
            <Button type="submit" busy={busy}>
              Call it so
            </Button>
            <Button kind="quiet" onClick={() => setNewName(null)}>
              Leave it
            </Button>
          </div>
        </form>
      )}
      <div className="flex flex-wrap items-center gap-x-6 gap-y-1">
        <CheckField
          label={`Mail me new notes: ${name}`}
          checked={mails}
          disabled={busy}
          onChecked={(next) => onChange({ name, mails: next }, () => undefined)}
        />
        <Button kind="quiet" label={`Another name for ${name}`} onClick={() => setNewName(name)}>
          Another name
        </Button>
        <Button kind="quiet" icon="close" label={`Remove ${name}`} onClick={onRemove}>
          Remove
        </Button>
      </div>
    </li>
  );
}
