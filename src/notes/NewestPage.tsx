import { useQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import { paths } from '#shared/paths.ts';
import { useSession } from '../accounts/useSession.ts';
import { ProblemPage } from '../http/ProblemPage.tsx';
import { Pager } from '../ui/Pager.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { usePageTitle } from '../ui/usePageTitle.ts';
import { NoteRows } from './NoteRows.tsx';
import { noteQueries } from './note-queries.ts';

const A_PAGE = 20;

/** Every published note, newest first. */
export function NewestPage() {
  usePageTitle('Newest notes');
  const { units } = useSession();
  const [params] = useSearchParams();
  const page = Math.max(1, Math.floor(Number(params.get('page') ?? 1)) || 1);
  const notes = useQuery(noteQueries.newest(page));
  return (
    <div className="space-y-6">
      <h1 className="text-title">Newest notes</h1>
      {notes.isPending && <Skeleton words="Notes are being fetched" shape="rows" count={6} />}
      {notes.isError && <ProblemPage error={notes.error} onRetry={() => void notes.refetch()} />}
      {notes.data && (
        <>
          <NoteRows rows={notes.data.notes} units={units} headingLevel={2} />
          <Pager
            page={page}
            pageSize={A_PAGE}
            total={notes.data.total}
            toPage={(to) => `${paths.newest}?page=${String(to)}`}
            what="notes"
          />
        </>
      )}
    </div>
  );
}
