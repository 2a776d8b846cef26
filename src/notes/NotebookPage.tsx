import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { stripScaleMinutes } from '#shared/heat/strip-scale.ts';
import { paths } from '#shared/paths.ts';
import { useSession } from '../accounts/useSession.ts';
import { ProblemPage } from '../http/ProblemPage.tsx';
import { EmptyState } from '../ui/EmptyState.tsx';
import { HeatLegend } from '../ui/HeatLegend.tsx';
import { LinkButton } from '../ui/LinkButton.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { usePageTitle } from '../ui/usePageTitle.ts';
import { noteQueries } from './note-queries.ts';
import { gapWords, isInWork, notesByKiln, type KilnNotes } from './notebook-groups.ts';
import { NotebookEntry } from './NotebookEntry.tsx';

/** One's own notes by kiln along a time line: what is in work, and what the desk said. */
export function NotebookPage() {
  usePageTitle('Notebook');
  const { units, abilities } = useSession();
  const notebook = useQuery(noteQueries.notebook());
  if (notebook.isPending) {
    return <Skeleton words="Your notes are being fetched" shape="rows" count={5} />;
  }
  if (notebook.isError) {
    return <ProblemPage error={notebook.error} onRetry={() => void notebook.refetch()} />;
  }
  const { notes } = notebook.data;
  if (notes.length === 0) {
    return (
      <EmptyState
        headingLevel={1}
        title="Your notebook is empty"
        action={
          abilities.write && (
            <LinkButton to={paths.newNote()} kind="main">
              Write your first note
            </LinkButton>
          )
        }
      >
        A note is one firing. Written up, it tells you what to change next, and spares others the
        same loss.
      </EmptyState>
    );
  }
  const inWork = notes.filter(isInWork).length;
  const scaleMinutes = stripScaleMinutes(
    notes.flatMap(({ strip }) => {
      const first = strip?.[0];
      const last = strip?.at(-1);
      return first && last ? [last[0] - first[0]] : [];
    }),
  );
  return (
    <div className="space-y-10">
      <header className="flex flex-wrap items-end justify-between gap-x-8 gap-y-4">
        <div className="space-y-1">
          <h1 className="text-title">Notebook</h1>
          <p className="text-soot-2">
            {notes.length === 1 ? 'One note' : `${String(notes.length)} notes`}
            {inWork > 0 && `, ${inWork === 1 ? 'one' : String(inWork)} waiting for you`}
          </p>
        </div>
        {abilities.write && (
          <LinkButton to={paths.newNote()} kind="main">
            Write a note
          </LinkButton>
        )}
      </header>
      {notesByKiln(notes).map((group) => (
        <KilnLine key={group.kiln?.id ?? 'none'} group={group} scaleMinutes={scaleMinutes} />
      ))}
      <HeatLegend unit={units.temperature} withSentence />
    </div>
  );
}

function KilnLine(props: { readonly group: KilnNotes; readonly scaleMinutes: number }) {
  const { kiln, notes } = props.group;
  const { units } = useSession();
  return (
    <div className="space-y-3">
      <div className="flex flex-wrap items-baseline justify-between gap-x-6">
        <h2 className="text-section">
          {kiln ? (
            <Link className="link" to={paths.kiln(kiln.id)}>
              {kiln.name}
            </Link>
          ) : (
            'No kiln chosen yet'
          )}
        </h2>
        {kiln && (
          <Link className="link text-small" to={paths.newNote({ kilnId: kiln.id })}>
            Write up another firing of it
          </Link>
        )}
      </div>
      <ol className="border-t border-soot">
        {notes.map((note, index) => (
          <NotebookEntry
            key={note.id}
            note={note}
            units={units}
            scaleMinutes={props.scaleMinutes}
            gap={gapWords(notes[index + 1]?.firedOn ?? null, note.firedOn)}
          />
        ))}
      </ol>
    </div>
  );
}
