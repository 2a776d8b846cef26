import { useState, type SyntheticEvent } from 'react';
import type { Kiln } from '#shared/api/kilns.ts';
import { ProblemError } from '../http/client.ts';
import { Button } from '../ui/Button.tsx';
import { IconButton } from '../ui/IconButton.tsx';
import { TextField } from '../ui/TextField.tsx';
import { useMessages } from '../ui/useMessages.ts';
import { useLendKiln } from './kiln-mutations.ts';

/** Lends a kiln to members by their names; they can then write up firings in it. */
export function KilnLoans({ kiln }: { readonly kiln: Kiln }) {
  const [name, setName] = useState('');
  const tell = useMessages();
  const lend = useLendKiln(kiln.id);
  const names = kiln.lentTo.map((member) => member.name);
  const refusal =
    lend.error instanceof ProblemError
      ? (lend.error.problem.errors?.[0]?.detail ?? lend.error.message)
      : lend.error?.message;
  const put = (members: readonly string[], said: string): void => {
    lend.mutate(members, {
      onSuccess: () => {
        setName('');
        tell({ kind: 'done', text: said });
      },
    });
  };
  const submit = (event: SyntheticEvent): void => {
    event.preventDefault();
    const wanted = name.trim();
    if (wanted !== '' && !lend.isPending) put([...names, wanted], `Lent to ${wanted}.`);
  };
  return (
    <section aria-labelledby="loans" className="max-w-measure space-y-3">
      <h2 id="loans" className="border-t-2 border-soot pt-3 text-section">
        Lent to
      </h2>
      <p className="text-small text-soot-2">
        Members it is lent to see this kiln among their own and write up firings in it.
      </p>
      {names.length > 0 && (
        <ul className="border-t border-line">
          {kiln.lentTo.map((member) => (
            <li
              key={member.id}
              className="flex items-center justify-between gap-4 border-b border-line py-1"
            >
              {member.name}
              <IconButton
                icon="remove"
                label={`Lend no longer to ${member.name}`}
                disabled={lend.isPending}
                onClick={() =>
                  put(
                    names.filter((other) => other !== member.name),
                    `No longer lent to ${member.name}.`,
                  )
                }
              />
            </li>
          ))}
        </ul>
      )}
      <form onSubmit={submit} className="@container space-y-2">
        <TextField
          label="Name of a member"
          hint="As it is shown beside their notes."
          value={name}
          onValue={setName}
          maxLength={60}
          autoComplete="off"
          issues={refusal === undefined ? [] : [{ kind: 'must-mend', text: refusal }]}
        />
        <Button type="submit" busy={lend.isPending} disabled={name.trim() === ''}>
          Lend
        </Button>
      </form>
    </section>
  );
}
