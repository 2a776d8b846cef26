import { useQuery } from '@tanstack/react-query';
import { Link, useParams } from 'react-router-dom';
import { paths } from '#shared/paths.ts';
import { formatChamber } from '#shared/units/volume.ts';
import { ROLES } from '#shared/vocabulary/statuses.ts';
import { ProblemPage } from '../http/ProblemPage.tsx';
import { NoteRows } from '../notes/NoteRows.tsx';
import { dayWords } from '../notes/note-words.ts';
import { FACT_SEPARATOR } from '../ui/fact-separator.ts';
import { Reading } from '../ui/Reading.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { usePageTitle } from '../ui/usePageTitle.ts';
import { memberQueries } from './member-queries.ts';
import { useSession } from './useSession.ts';

/** What everybody sees of a member: who they are, their kilns and their notes. */
export function MemberPage() {
  const { id } = useParams();
  const { me, units } = useSession();
  const page = useQuery(memberQueries.page(Number(id)));
  usePageTitle(page.data?.name ?? null);
  if (page.isPending) return <Skeleton words="The page is being fetched" shape="rows" />;
  if (page.isError) return <ProblemPage error={page.error} onRetry={() => void page.refetch()} />;
  const member = page.data;
  return (
    <div className="space-y-10">
      <header className="space-y-3">
        <h1 className="text-title break-words">{member.name}</h1>
        <p className="text-small text-soot-2">
          {[
            member.role === 'member' ? null : ROLES[member.role],
            member.place || null,
            `here since ${dayWords(member.joinedOn)}`,
          ]
            .filter((part) => part !== null)
            .join(FACT_SEPARATOR)}
        </p>
        {member.about && (
          <p className="max-w-measure font-story text-story whitespace-pre-line">{member.about}</p>
        )}
        {me?.id === member.id && (
          <Link to={paths.settings} className="link text-small">
            Change this in your settings
          </Link>
        )}
      </header>
      {member.kilns.length > 0 && (
        <section aria-labelledby="kilns" className="space-y-2">
          <h2 id="kilns" className="text-section">
            Kilns
          </h2>
          <ul className="max-w-measure border-t border-soot">
            {member.kilns.map((kiln) => (
              <li
                key={kiln.id}
                className="flex items-baseline justify-between gap-6 border-b border-line py-2"
              >
                <Link to={paths.kiln(kiln.id)} className="link min-w-0 break-words">
                  {kiln.name}
                </Link>
                {kiln.volumeLitres !== null && (
                  <span className="text-small text-soot-2">
                    <Reading>{formatChamber(kiln.volumeLitres, units)}</Reading>
                  </span>
                )}
              </li>
            ))}
          </ul>
        </section>
      )}
      <section aria-labelledby="notes" className="space-y-2">
        <h2 id="notes" className="text-section">
          Notes
        </h2>
        {member.notes.length > 0 ? (
          <NoteRows rows={member.notes} units={units} />
        ) : (
          <p className="border-t border-soot pt-3 text-small text-soot-2">
            {me?.id === member.id
              ? 'You have not published a note yet.'
              : 'No published notes yet.'}
          </p>
        )}
      </section>
    </div>
  );
}
