import { useQuery } from '@tanstack/react-query';
import { useEffect } from 'react';
import { Link, useNavigate } from 'react-router-dom';
import type { FrontData } from '#shared/api/figures.ts';
import { paths } from '#shared/paths.ts';
import { TROUBLE_SHORT } from '#shared/vocabulary/troubles.ts';
import { useSession } from '../accounts/useSession.ts';
import { QuestionField } from '../find/QuestionField.tsx';
import { figureQueries } from '../figures/figure-queries.ts';
import { TroubleRail } from '../figures/TroubleRail.tsx';
import { NoteRows } from '../notes/NoteRows.tsx';
import { EmptyState } from '../ui/EmptyState.tsx';
import { LinkButton } from '../ui/LinkButton.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { ProblemPage } from '../http/ProblemPage.tsx';

/** One line of what this is, the question, the troubles, the newest notes, and what they say. */
export function FrontPage() {
  const { abilities, units } = useSession();
  const navigate = useNavigate();
  const front = useQuery(figureQueries.front());
  useEffect(() => {
    document.title = 'Spyhole, a shared notebook of raku firings';
  }, []);

  return (
    <div className="space-y-14">
      <div className="space-y-6">
        <h1 className="max-w-[20ch] text-title sm:text-face">
          How other firings went, and what was changed next
        </h1>
        <p className="max-w-measure text-lead text-soot-2">
          A shared notebook of raku firings: what was set up, measured, changed and got.
        </p>
        <QuestionField
          large
          onAsk={(question) => {
            void navigate(paths.find(question));
          }}
        />
      </div>
      {front.isPending && <Skeleton words="The newest notes are being fetched" shape="rows" />}
      {front.isError && <ProblemPage error={front.error} onRetry={() => void front.refetch()} />}
      {front.data?.shares.notes === 0 && (
        <EmptyState
          title="No notes yet"
          action={
            abilities.write ? (
              <LinkButton to={paths.newNote()} kind="main">
                Write the first note
              </LinkButton>
            ) : (
              <LinkButton to={paths.join} kind="main">
                Join, and write the first
              </LinkButton>
            )
          }
        >
          This notebook is empty. It fills with the firings of its members.
        </EmptyState>
      )}
      {front.data && front.data.shares.notes > 0 && (
        <>
          <TroubleRail
            shares={front.data.shares}
            toTrouble={(trouble) => paths.find(TROUBLE_SHORT[trouble])}
          />
          <Sentences sentences={front.data.sentences} />
          <section aria-labelledby="newest" className="space-y-4">
            <div className="flex flex-wrap items-baseline justify-between gap-x-6">
              <h2 id="newest" className="text-section">
                Newest notes
              </h2>
              <Link to={paths.newest} className="link text-small">
                All {front.data.shares.notes} notes
              </Link>
            </div>
            <NoteRows rows={front.data.newest} units={units} />
          </section>
        </>
      )}
    </div>
  );
}

/** The pooled figures that are strong enough to be said, one sentence each. */
function Sentences({ sentences }: { readonly sentences: FrontData['sentences'] }) {
  if (sentences.length === 0) return null;
  return (
    <section aria-labelledby="together" className="space-y-3">
      <h2 id="together" className="text-section">
        What the notes say together
      </h2>
      <ul className="max-w-measure">
        {sentences.map(({ text, trouble }) => (
          <li key={text} className="border-b border-line py-2.5">
            {text}{' '}
            {trouble !== null && (
              <Link
                to={paths.whatHelpedWith(trouble)}
                className="link whitespace-nowrap text-small"
              >
                The notes behind it
              </Link>
            )}
          </li>
        ))}
      </ul>
      <p className="max-w-measure text-small text-soot-2">
        What members report, not proof: several changes made at once cannot be told apart.
      </p>
    </section>
  );
}
