import { useQuery } from '@tanstack/react-query';
import { paths } from '#shared/paths.ts';
import { ProblemPage } from '../http/ProblemPage.tsx';
import { EmptyState } from '../ui/EmptyState.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { usePageTitle } from '../ui/usePageTitle.ts';
import { figureQueries } from './figure-queries.ts';
import { TroubleRail } from './TroubleRail.tsx';

/** The troubles, each leading to what was tried next for it. */
export function WhatHelpedPage() {
  usePageTitle('What helped');
  const shares = useQuery(figureQueries.shares());
  return (
    <div className="space-y-10">
      <div className="space-y-3">
        <h1 className="text-title sm:text-face">What helped</h1>
        <p className="max-w-measure text-lead text-soot-2">
          For each trouble: what was changed for the next firing of the same kiln, and how often the
          trouble was then gone.
        </p>
      </div>
      {shares.isPending && <Skeleton words="The troubles are being fetched" shape="sheet" />}
      {shares.isError && !shares.data && (
        <ProblemPage error={shares.error} onRetry={() => void shares.refetch()} />
      )}
      {shares.data && shares.data.troubles.length === 0 && (
        <EmptyState title="No trouble is written up yet">
          This fills as notes are published.
        </EmptyState>
      )}
      {shares.data && shares.data.troubles.length > 0 && (
        <TroubleRail shares={shares.data} toTrouble={paths.whatHelpedWith} />
      )}
    </div>
  );
}
