import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { Link, useSearchParams } from 'react-router-dom';
import { topicRowsUrl, type TopicFigures } from '#shared/api/figure-topics.ts';
import { paths } from '#shared/paths.ts';
import { FIGURE_DIMENSIONS, FIGURE_TOPICS } from '#shared/vocabulary/figures.ts';
import { useSession } from '../accounts/useSession.ts';
import { ProblemPage } from '../http/ProblemPage.tsx';
import { EmptyState } from '../ui/EmptyState.tsx';
import { LiveRegion } from '../ui/LiveRegion.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { usePageTitle } from '../ui/usePageTitle.ts';
import { figureQueries } from './figure-queries.ts';
import { FigureFilters } from './FigureFilters.tsx';
import { readFiguresAddress, writeFiguresAddress, type FiguresAddress } from './figures-address.ts';
import { HowFiguresComputed } from './HowFiguresComputed.tsx';
import { StartSection } from './StartSection.tsx';
import { LeftOut } from './LeftOut.tsx';

/** What the published firings show together, as plots with their points, intervals and counts. */
export function FiguresPage() {
  const [params, setParams] = useSearchParams();
  const address = readFiguresAddress(params);
  const { topic, query } = address;
  const figures = useQuery({
    ...figureQueries.topic(topic, query),
    placeholderData: keepPreviousData,
  });
  const title = `${FIGURE_TOPICS[topic]} by ${FIGURE_DIMENSIONS[query.by].toLowerCase()}`;
  usePageTitle(`Figures: ${title.toLowerCase()}`);
  const go = (next: FiguresAddress): void =>
    setParams(writeFiguresAddress(next), { preventScrollReset: true, flushSync: true });
  const shown = figures.data;
  const isSettled = shown !== undefined && !figures.isPlaceholderData;
  return (
    <div className="space-y-10">
      <header className="max-w-measure space-y-3">
        <h1 className="text-title sm:text-face">Figures</h1>
        <p className="text-lead text-soot-2">
          What the published firings show together: every point, its interval, and of how many
          firings and members. For what was changed next, see{' '}
          <Link to={paths.whatHelped} className="link">
            what helped
          </Link>
          .
        </p>
      </header>
      <FigureFilters address={address} figures={shown ?? null} onAddress={go} />
      <LiveRegion text={isSettled ? `${title} is shown.` : ''} />
      {figures.isPending && <Skeleton words="The figures are being worked out" shape="rows" />}
      {figures.isError && !shown && (
        <ProblemPage error={figures.error} onRetry={() => void figures.refetch()} />
      )}
      {shown && <Shown figures={shown} address={address} />}
    </div>
  );
}

interface ShownProps {
  readonly figures: TopicFigures;
  readonly address: FiguresAddress;
}

function Shown({ figures, address }: ShownProps) {
  const { units } = useSession();
  return (
    <>
      {figures.tables.length === 0 && (
        <EmptyState title="Nothing to draw yet">
          No published firing tells enough for this. Choose another figure, or all kilns and all
          ware.
        </EmptyState>
      )}
      {figures.tables.map((table) => (
        <StartSection key={table.startClass} figures={figures} table={table} units={units} />
      ))}
      <div>
        <LeftOut reasons={figures.leftOut} />
        <HowFiguresComputed topic={figures.topic} units={units} />
        {figures.tables.length > 0 && (
          <p className="mt-4 text-small">
            <a href={topicRowsUrl(address.topic, address.query)} download className="link">
              The rows as CSV
            </a>{' '}
            <span className="text-soot-2">in °C, mm, minutes and kg</span>
          </p>
        )}
      </div>
    </>
  );
}
