import { useQuery } from '@tanstack/react-query';
import { useEffect, useMemo } from 'react';
import { Link, useSearchParams } from 'react-router-dom';
import { paths } from '#shared/paths.ts';
import { useSession } from '../accounts/useSession.ts';
import { ProblemPage } from '../http/ProblemPage.tsx';
import { LiveRegion } from '../ui/LiveRegion.tsx';
import { Notice } from '../ui/Notice.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { usePageTitle } from '../ui/usePageTitle.ts';
import { AskedNothing } from './AskedNothing.tsx';
import {
  readFindAddress,
  searchOf,
  withPartToggled,
  writeFindAddress,
  type FindAddress,
} from './find-address.ts';
import { findQueries } from './find-queries.ts';
import { PooledAnswer } from './PooledAnswer.tsx';
import { QuestionField } from './QuestionField.tsx';
import { asksAboutStall, readAs } from './read-as.ts';
import { ReadAs } from './ReadAs.tsx';
import { rememberQuestion } from './recent-questions.ts';
import { Results } from './Results.tsx';
import { noteCount } from './note-count.ts';

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
          onAsk={(q) => go({ q, off: [], sort: 'best', page: 1, facets: {}, ranges: {} }, false)}
        />
        {isAsked && (
          <ReadAs
            q={address.q}
            units={units}
            parts={parts}
            onToggle={(key) => go(withPartToggled(address, key))}
            onChanged={(q) => go({ ...address, q, page: 1 })}
          />
        )}
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
