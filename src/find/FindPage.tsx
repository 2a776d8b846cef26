import { useQuery } from '@tanstack/react-query';
import { useEffect, useMemo } from 'react';
import { Link, useSearchParams } from 'react-router-dom';
import { FIND_SORTS, type FindAnswer } from '#shared/api/search.ts';
import { paths } from '#shared/paths.ts';
import { useSession } from '../accounts/useSession.ts';
import { ProblemPage } from '../http/ProblemPage.tsx';
import { BusyMark } from '../ui/BusyMark.tsx';
import { LiveRegion } from '../ui/LiveRegion.tsx';
import { Notice } from '../ui/Notice.tsx';
import { optionsOf } from '../ui/options.ts';
import { Pager } from '../ui/Pager.tsx';
import { SelectField } from '../ui/SelectField.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { usePageTitle } from '../ui/usePageTitle.ts';
import { AskedNothing } from './AskedNothing.tsx';
import {
  readFindAddress,
  searchOf,
  tickedCount,
  withFacetToggled,
  withPartToggled,
  withoutFacets,
  writeFindAddress,
  type FindAddress,
} from './find-address.ts';
import { findQueries } from './find-queries.ts';
import { FilterPanel } from './FilterPanel.tsx';
import { FoundRows } from './FoundRows.tsx';
import { NothingFound } from './NothingFound.tsx';
import { PooledAnswer } from './PooledAnswer.tsx';
import { QuestionField } from './QuestionField.tsx';
import { asksAboutStall, readAs } from './read-as.ts';
import { ReadAs } from './ReadAs.tsx';
import { rememberQuestion } from './recent-questions.ts';
import { useWideScreen } from './useWideScreen.ts';

const A_PAGE = 20;

const noteCount = (total: number): string =>
  total === 1 ? '1 note' : total === 0 ? 'No notes' : `${String(total)} notes`;

/** The question, how it was read, what the notes say together, and the notes themselves. */
export function FindPage() {
  const [params, setParams] = useSearchParams();
  const { units } = useSession();
  const address = useMemo(() => readFindAddress(params), [params]);
  const isAsked = address.q !== '';
  usePageTitle(isAsked ? address.q : 'Find');
  const answer = useQuery(findQueries.answer(searchOf(address)));
  const found = answer.data;
  const isSettled = found !== undefined && !answer.isPlaceholderData;

  useEffect(() => {
    if (isSettled) rememberQuestion(address.q);
  }, [isSettled, address.q]);

  // Read at once in the browser; the server reads the same way, and its parts count.
  const read = useMemo(() => readAs(address.q, address.off, units), [address, units]);
  const parts = isSettled ? found.parts : read;
  const go = (next: FindAddress, keepPlace = true): void => {
    setParams(new URLSearchParams(writeFindAddress(next)), {
      preventScrollReset: keepPlace,
      // A tick or a chip changes under the finger, not when the browser finds the time.
      flushSync: true,
    });
  };

  return (
    <div className="space-y-7">
      <div className="space-y-5">
        <h1 className={isAsked ? 'sr-only' : 'text-title'}>
          {isAsked ? `Find: ${address.q}` : 'Find a firing like yours'}
        </h1>
        <QuestionField
          initial={address.q}
          onAsk={(q) => go({ q, off: [], sort: 'best', page: 1, facets: {} }, false)}
        />
        {isAsked && <ReadAs parts={parts} onToggle={(key) => go(withPartToggled(address, key))} />}
      </div>
      <LiveRegion text={isSettled ? `${noteCount(found.total)} found` : ''} quietMs={400} />
      {answer.isPending && <Skeleton words="Notes are being looked for" shape="rows" count={6} />}
      {answer.isError && <ProblemPage error={answer.error} onRetry={() => void answer.refetch()} />}
      {found && !answer.isError && (
        <>
          {found.plain && (
            <Notice kind="info">
              The search engine is away just now. These notes were found by their words alone,
              without filters, nearness or counts.
            </Notice>
          )}
          {found.pooled && <PooledAnswer pooled={found.pooled} />}
          {asksAboutStall(parts) && <StuckNow />}
          {!isAsked && <AskedNothing />}
          <Results
            found={found}
            address={address}
            isSettled={isSettled}
            hasTemperature={parts.some(({ kind, off }) => kind === 'temperature' && !off)}
            go={go}
          />
        </>
      )}
    </div>
  );
}

/** For whoever stands at the kiln while asking. */
function StuckNow() {
  return (
    <p>
      <strong className="font-[650]">Stuck right now?</strong>{' '}
      <Link to={`${paths.whatHelpedWith('stall')}#during`} className="link">
        What others did during the firing
      </Link>
    </p>
  );
}

interface ResultsProps {
  readonly found: FindAnswer;
  readonly address: FindAddress;
  readonly isSettled: boolean;
  readonly hasTemperature: boolean;
  readonly go: (next: FindAddress) => void;
}

function Results({ found, address, isSettled, hasTemperature, go }: ResultsProps) {
  const { units } = useSession();
  const isWide = useWideScreen();
  const isAsked = address.q !== '';
  const ticked = tickedCount(address);
  const filters = (
    <FilterPanel
      address={address}
      facets={found.facets}
      units={units}
      onToggle={(facet, value) => go(withFacetToggled(address, facet, value))}
      onClear={() => go(withoutFacets(address))}
    />
  );
  const hasFilters = ticked > 0 || Object.values(found.facets).some((values) => values.length > 0);
  const sorts = optionsOf(FIND_SORTS).filter(
    ({ value }) => value !== 'nearest' || hasTemperature || address.sort === 'nearest',
  );
  // What to do about it is the one heading then.
  const isNothing = found.total === 0 && (isAsked || ticked > 0);
  return (
    <section aria-label="Notes" className="space-y-4">
      <div className="flex flex-wrap items-end justify-between gap-x-6 gap-y-2">
        {!isNothing && (
          <h2 className="text-section">
            {isAsked || ticked > 0 ? `${noteCount(found.total)} found` : 'Newest notes'}
          </h2>
        )}
        {!isSettled && <BusyMark words="Looking again" />}
        {isAsked && !found.plain && found.total > 1 && (
          <SelectField
            label="Order of the notes"
            labelHidden
            blank={null}
            options={sorts}
            value={address.sort}
            onValue={(sort) => go({ ...address, sort: sort ?? 'best', page: 1 })}
          />
        )}
      </div>
      <div className={hasFilters ? 'grid gap-x-10 gap-y-4 lg:grid-cols-[minmax(0,1fr)_13rem]' : ''}>
        {hasFilters &&
          (isWide ? (
            <div role="group" aria-label="Filters" className="order-2">
              {filters}
            </div>
          ) : (
            <details className="border-y border-line py-1">
              <summary className="flex min-h-11 items-center text-verdigris underline underline-offset-4">
                Filters{ticked > 0 ? ` (${String(ticked)})` : ''}
              </summary>
              <div className="pb-3 pt-2">{filters}</div>
            </details>
          ))}
        <div
          className={`min-w-0 space-y-6 ${isSettled ? '' : 'opacity-60'}`}
          aria-busy={!isSettled}
        >
          {found.hits.length > 0 && <FoundRows hits={found.hits} units={units} />}
          {isNothing && (
            <NothingFound
              address={address}
              partCount={found.parts.filter(({ off }) => !off).length}
              loosen={found.loosen}
              onLeaveOut={(key) => go(withPartToggled(address, key))}
              onClearFilters={() => go(withoutFacets(address))}
            />
          )}
          {found.total === 0 && !isNothing && <p>No notes are published yet.</p>}
          {found.total > 0 && found.hits.length === 0 && (
            <p>
              There is no page {address.page} of these.{' '}
              <Link
                className="link"
                to={`${paths.find()}?${writeFindAddress({ ...address, page: 1 })}`}
              >
                To the first
              </Link>
            </p>
          )}
          <Pager
            page={address.page}
            pageSize={A_PAGE}
            total={found.total}
            toPage={(page) => `${paths.find()}?${writeFindAddress({ ...address, page })}`}
            what="notes"
          />
        </div>
      </div>
    </section>
  );
}
