import { useQuery } from '@tanstack/react-query';
import { useEffect } from 'react';
import { Link, useLocation, useParams } from 'react-router-dom';
import type { WhatHelped } from '#shared/api/figures.ts';
import { CAUTIONS_IN_BRIEF } from '#shared/cautions.ts';
import { paths } from '#shared/paths.ts';
import { TROUBLE_IDS, TROUBLE_SHORT, TROUBLES, type Trouble } from '#shared/vocabulary/troubles.ts';
import { useSession } from '../accounts/useSession.ts';
import { NotFoundPage } from '../http/NotFoundPage.tsx';
import { ProblemPage } from '../http/ProblemPage.tsx';
import { FACT_SEPARATOR } from '../ui/fact-separator.ts';
import { CautionNote } from '../ui/CautionNote.tsx';
import { EmptyState } from '../ui/EmptyState.tsx';
import { LinkButton } from '../ui/LinkButton.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { usePageTitle } from '../ui/usePageTitle.ts';
import { DuringTheFiring } from './DuringTheFiring.tsx';
import { figureQueries } from './figure-queries.ts';
import { inReadingOrder } from './helped-words.ts';
import { HelpedTableSection } from './HelpedTableSection.tsx';
import { HowComputed } from './HowComputed.tsx';

const isTrouble = (id: string | undefined): id is Trouble =>
  TROUBLE_IDS.some((trouble) => trouble === id);

/** What was tried next for one trouble. */
export function WhatHelpedTroublePage() {
  const { trouble } = useParams();
  return isTrouble(trouble) ? <Helped key={trouble} trouble={trouble} /> : <NotFoundPage />;
}

function Helped({ trouble }: { readonly trouble: Trouble }) {
  const helped = useQuery(figureQueries.whatHelped(trouble));
  const { hash } = useLocation();
  usePageTitle(`What helped: ${TROUBLE_SHORT[trouble]}`);
  // The part asked for is there only after the figures have come.
  const isThere = helped.data !== undefined;
  useEffect(() => {
    if (!isThere || hash === '') return;
    const part = document.getElementById(hash.slice(1));
    part?.scrollIntoView();
    part?.focus({ preventScroll: true });
  }, [isThere, hash]);
  return (
    <div className="space-y-12">
      <div className="space-y-3">
        <p className="text-small">
          <Link to={paths.whatHelped} className="link inline-flex min-h-8 items-center">
            What helped
          </Link>
        </p>
        <h1 className="text-title sm:text-face">{TROUBLES[trouble]}</h1>
        <p className="max-w-measure text-lead text-soot-2">
          What was changed for the kiln’s next firing, and how often it was then gone.
        </p>
        <p className="max-w-measure border-l-2 border-soot pl-4">
          What members report, not proof. Several changes made at once cannot be told apart.
        </p>
        <p className="text-small">
          <Link to={paths.find(TROUBLE_SHORT[trouble])} className="link">
            Notes with “{TROUBLE_SHORT[trouble]}”
          </Link>
          {trouble === 'stall' && (
            <>
              {FACT_SEPARATOR}
              <a href="#during" className="link">
                Stuck right now? What others did during the firing
              </a>
            </>
          )}
        </p>
      </div>
      {helped.isPending && <Skeleton words="The figures are being worked out" shape="rows" />}
      {helped.isError && !helped.data && (
        <ProblemPage error={helped.error} onRetry={() => void helped.refetch()} />
      )}
      {helped.data && <Figures helped={helped.data} />}
    </div>
  );
}

function Figures({ helped }: { readonly helped: WhatHelped }) {
  const { units } = useSession();
  const tables = inReadingOrder(helped.tables);
  const shown = Math.max(0, ...tables.map(({ ranked }) => ranked.length - 1));
  return (
    <>
      {tables.length === 0 && (
        <EmptyState
          title="Nothing to compare yet"
          action={
            <LinkButton to={paths.find(TROUBLE_SHORT[helped.trouble])}>Notes with it</LinkButton>
          }
        >
          No published firing with this trouble has a next firing in the same kiln.
        </EmptyState>
      )}
      {tables.map((table) => (
        <HelpedTableSection
          key={`${table.startClass}${table.source}`}
          helped={helped}
          table={table}
        />
      ))}
      {helped.disputed > 0 && (
        <p className="max-w-measure text-small">
          {helped.disputed === 1 ? 'One note' : `${String(helped.disputed)} notes`} disputed: the
          author disagrees that the record shows it. {helped.disputed === 1 ? 'It is' : 'They are'}{' '}
          in none of these figures.
        </p>
      )}
      <DuringTheFiring helped={helped} units={units} />
      {tables.length > 0 && <HowComputed changesShown={shown} />}
      <CautionNote>
        <p>{CAUTIONS_IN_BRIEF}</p>
        <p>
          <Link to={paths.cautions} className="link">
            All cautions
          </Link>
        </p>
      </CautionNote>
    </>
  );
}
