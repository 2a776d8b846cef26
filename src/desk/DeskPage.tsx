import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import type { DeskQueue } from '#shared/api/desk.ts';
import { stripScaleMinutes } from '#shared/heat/strip-scale.ts';
import { paths } from '#shared/paths.ts';
import { useSession } from '../accounts/useSession.ts';
import { ProblemPage } from '../http/ProblemPage.tsx';
import { FACT_SEPARATOR } from '../ui/fact-separator.ts';
import { EmptyState } from '../ui/EmptyState.tsx';
import { HeatLegend } from '../ui/HeatLegend.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { SmallGlowStrip } from '../ui/SmallGlowStrip.tsx';
import { usePageTitle } from '../ui/usePageTitle.ts';
import { deskQueries } from './desk-queries.ts';
import { clockWords, waitingWords } from './desk-words.ts';
import { DisputedFindings } from './DisputedFindings.tsx';

type Row = DeskQueue['waiting'][number];

/** The pile of notes handed in, the longest waiting first. */
export function DeskPage() {
  usePageTitle('Desk');
  const { units } = useSession();
  const queue = useQuery(deskQueries.queue());
  const waiting = queue.data?.waiting ?? [];
  const scaleMinutes = stripScaleMinutes(
    waiting.flatMap(({ strip }) => {
      const first = strip?.[0];
      const last = strip?.at(-1);
      return first && last ? [last[0] - first[0]] : [];
    }),
  );
  const now = new Date(queue.dataUpdatedAt);
  return (
    <div className="space-y-6">
      <div className="space-y-2">
        <h1 className="text-title">Desk</h1>
        {queue.data && waiting.length > 0 && (
          <p className="text-soot-2">
            {waiting.length === 1 ? 'One note waits' : `${String(waiting.length)} notes wait`}, the
            longest waiting first.
          </p>
        )}
      </div>
      {queue.isPending && <Skeleton words="The pile is being fetched" shape="rows" />}
      {queue.isError && !queue.data && (
        <ProblemPage error={queue.error} onRetry={() => void queue.refetch()} />
      )}
      {queue.data && waiting.length === 0 && (
        <EmptyState title="The desk is clear">
          No note waits to be read. New ones appear here by themselves.
        </EmptyState>
      )}
      {waiting.length > 0 && (
        <>
          <ul className="border-t border-soot">
            {waiting.map((row) => (
              <QueueRow key={row.noteId} row={row} scaleMinutes={scaleMinutes} now={now} />
            ))}
          </ul>
          <HeatLegend unit={units.temperature} withSentence />
        </>
      )}
      {queue.data && (
        <div className="pt-8">
          <DisputedFindings units={units} />
        </div>
      )}
    </div>
  );
}

interface QueueRowProps {
  readonly row: Row;
  readonly scaleMinutes: number;
  readonly now: Date;
}

function QueueRow({ row, scaleMinutes, now }: QueueRowProps) {
  const facts = [
    row.firstRevision ? 'first time' : 'a later revision',
    row.answeredChecks > 0 &&
      `${String(row.answeredChecks)} ${row.answeredChecks === 1 ? 'check' : 'checks'} answered`,
  ].filter((fact) => fact !== false);
  return (
    <li className="grid gap-x-8 gap-y-2 border-b border-line py-4 sm:grid-cols-[minmax(0,17rem)_minmax(0,1fr)_9rem]">
      {row.strip && row.strip.length > 1 ? (
        <SmallGlowStrip points={row.strip} scaleMinutes={scaleMinutes} alt={row.stripWords} />
      ) : (
        <p className="self-start border-y border-dashed border-line py-2 text-note text-soot-2">
          No record kept
        </p>
      )}
      <div className="min-w-0 space-y-1">
        <h2 className="text-lead">
          <Link
            to={paths.deskNote(row.noteId)}
            className="text-soot underline decoration-line decoration-1 underline-offset-4 hover:decoration-verdigris hover:decoration-2"
          >
            {row.title || 'Untitled'}
          </Link>
        </h2>
        <p className="text-small text-soot-2">
          {[row.author?.name ?? 'A former member', row.kilnName, ...facts].join(FACT_SEPARATOR)}
        </p>
        {row.unsafeWords > 0 && (
          <p className="text-small font-[650] text-caution">
            {row.unsafeWords === 1
              ? 'One passage may tell of something unsafe'
              : `${String(row.unsafeWords)} passages may tell of something unsafe`}
          </p>
        )}
      </div>
      <div className="text-small sm:text-right">
        <p className="font-[600]">{waitingWords(row.handedInAt, now)}</p>
        {row.own && <p className="text-soot-2">your own: another moderator decides</p>}
        {row.claim && (
          <p className="text-soot-2">
            {row.claim.mine ? 'on your desk' : `with ${row.claim.by.name}`} until{' '}
            {clockWords(row.claim.until)}
          </p>
        )}
      </div>
    </li>
  );
}
