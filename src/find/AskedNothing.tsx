import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import { paths } from '#shared/paths.ts';
import { TROUBLE_SHORT } from '#shared/vocabulary/troubles.ts';
import { figureQueries } from '../figures/figure-queries.ts';
import { TroubleRail } from '../figures/TroubleRail.tsx';
import { Button } from '../ui/Button.tsx';
import { clearRecentQuestions, recentQuestions } from './recent-questions.ts';

/** No question yet: those asked before in this browser, and the troubles to begin from. */
export function AskedNothing() {
  const [recent, setRecent] = useState(recentQuestions);
  const shares = useQuery(figureQueries.shares());
  return (
    <>
      <p className="max-w-measure">
        Have a temperature record?{' '}
        <Link to={paths.lookAlikes} className="link">
          Find firings that climbed like it
        </Link>
      </p>
      {recent.length > 0 && (
        <section aria-labelledby="recent" className="space-y-2">
          <h2 id="recent" className="text-small font-[650]">
            Asked before in this browser
          </h2>
          <ul className="flex flex-wrap gap-x-5 gap-y-1">
            {recent.map((question) => (
              <li key={question}>
                <Link
                  to={paths.find(question)}
                  className="link inline-flex min-h-8 items-center touch:min-h-11"
                >
                  {question}
                </Link>
              </li>
            ))}
          </ul>
          <Button
            kind="quiet"
            onClick={() => {
              clearRecentQuestions();
              setRecent([]);
            }}
          >
            Forget these
          </Button>
        </section>
      )}
      {shares.data && shares.data.notes > 0 && (
        <TroubleRail
          shares={shares.data}
          toTrouble={(trouble) => paths.find(TROUBLE_SHORT[trouble])}
        />
      )}
    </>
  );
}
