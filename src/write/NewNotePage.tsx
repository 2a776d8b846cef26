import { useMutation, useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Link, useNavigate, useSearchParams } from 'react-router-dom';
import { paths } from '#shared/paths.ts';
import { useRepeatKey } from '../http/useRepeatKey.ts';
import { ProblemPage } from '../http/ProblemPage.tsx';
import { noteQueries } from '../notes/note-queries.ts';
import { Button } from '../ui/Button.tsx';
import { ChoiceField } from '../ui/ChoiceField.tsx';
import { Notice } from '../ui/Notice.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { usePageTitle } from '../ui/usePageTitle.ts';
import { DescribeKiln } from './DescribeKiln.tsx';
import { startNote } from './draft-mutations.ts';
import { kilnQueries } from '../kilns/kiln-queries.ts';

const idIn = (text: string | null): number | null =>
  text !== null && /^[1-9]\d{0,14}$/.test(text) ? Number(text) : null;

/** The start of a note: which kiln was fired, and whose change was tried. */
export function NewNotePage() {
  usePageTitle('Write a note');
  const [search] = useSearchParams();
  const navigate = useNavigate();
  const kilns = useQuery(kilnQueries.mine());
  const askedKiln = idIn(search.get('kiln'));
  const triedNoteId = idIn(search.get('tried'));
  const tried = useQuery({ ...noteQueries.page(triedNoteId ?? 0), enabled: triedNoteId !== null });
  const [chosen, setChosen] = useState<number | null>(null);
  const [describing, setDescribing] = useState(false);
  const keyFor = useRepeatKey();
  const start = useMutation({
    mutationFn: (kilnId: number | null) => {
      const body = { kilnId, triedNoteId };
      return startNote({ ...body, key: keyFor(body) });
    },
    onSuccess: (draft) => navigate(paths.write(draft.id), { replace: true }),
  });
  if (kilns.isPending) return <Skeleton words="Your kilns are being fetched" shape="text" />;
  if (kilns.isError) {
    return <ProblemPage error={kilns.error} onRetry={() => void kilns.refetch()} />;
  }
  const mine = kilns.data.kilns.filter(({ abilities }) => abilities.fire);
  const kilnId =
    chosen ??
    mine.find(({ id }) => id === askedKiln)?.id ??
    (mine.length === 1 ? mine[0]?.id : null);
  return (
    <div className="@container space-y-8">
      <header className="space-y-3">
        <h1 className="text-title">Write a note</h1>
        <p className="max-w-measure text-soot-2">
          One note is one firing: what was set up, measured, changed and got. It is saved as you
          write, and nobody else sees it until you hand it in.
        </p>
        {triedNoteId !== null && tried.data && (
          <p className="max-w-measure">
            You tried a change from{' '}
            <Link className="link" to={paths.note(triedNoteId, tried.data.slug)}>
              {tried.data.row.title}
            </Link>
            ; the two notes will point to each other.
          </p>
        )}
        {tried.isError && (
          <Notice kind="caution">
            The note whose change you tried cannot be found. You can write yours all the same.
          </Notice>
        )}
      </header>
      {mine.length > 0 && !describing && (
        <ChoiceField
          label="Fired in"
          value={kilnId === null || kilnId === undefined ? null : String(kilnId)}
          onValue={(value) => setChosen(value === null ? null : Number(value))}
          options={mine.map((kiln) => ({ value: String(kiln.id), label: kiln.fields.name }))}
          required
        />
      )}
      {mine.length === 0 && !describing && (
        <p className="max-w-measure">
          No kiln of yours is described yet. Describe it once; every firing in it then belongs
          together.
        </p>
      )}
      {describing && (
        <DescribeKiln
          onMade={(kiln) => {
            setDescribing(false);
            setChosen(kiln.id);
          }}
          onCancel={() => setDescribing(false)}
        />
      )}
      {start.isError && (
        <Notice kind="error" heading="The note was not started" appeared>
          {start.error.message}
        </Notice>
      )}
      {!describing && (
        <div className="flex flex-wrap gap-3">
          {mine.length > 0 && (
            <Button
              kind="main"
              busy={start.isPending}
              disabled={kilnId === null || kilnId === undefined}
              onClick={() => start.mutate(kilnId ?? null)}
            >
              Start the note
            </Button>
          )}
          <Button
            icon="add"
            kind={mine.length === 0 ? 'main' : 'plain'}
            onClick={() => setDescribing(true)}
          >
            Describe a new kiln
          </Button>
          <Button kind="quiet" busy={start.isPending} onClick={() => start.mutate(null)}>
            Start without a kiln, and choose it later
          </Button>
        </div>
      )}
    </div>
  );
}
