import { useQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import { paths } from '#shared/paths.ts';
import { useSession } from '../accounts/useSession.ts';
import { ProblemPage } from '../http/ProblemPage.tsx';
import { NoteView } from '../notes/NoteView.tsx';
import { noteQueries } from '../notes/note-queries.ts';
import { LinkButton } from '../ui/LinkButton.tsx';
import { Notice } from '../ui/Notice.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { usePageTitle } from '../ui/usePageTitle.ts';

/** The working copy as readers would see it. */
export function PreviewPage() {
  const { id } = useParams();
  const noteId = Number(id);
  const { units } = useSession();
  const page = useQuery(noteQueries.preview(noteId));
  usePageTitle(page.data ? `Preview: ${page.data.row.title || 'Untitled'}` : 'Preview');
  if (page.isPending) {
    return (
      <div className="space-y-8">
        <Skeleton words="The preview is being made" shape="strip" />
        <Skeleton words="Its sheet is being made" shape="sheet" count={8} />
      </div>
    );
  }
  if (page.isError) return <ProblemPage error={page.error} onRetry={() => void page.refetch()} />;
  return (
    <NoteView
      page={page.data}
      units={units}
      recordOf="draft"
      aside={
        <Notice
          kind="info"
          heading="A preview"
          action={
            <LinkButton to={paths.write(noteId)} icon="back">
              Back to writing
            </LinkButton>
          }
        >
          So readers would see your note as it was last saved. Only you see this page.
        </Notice>
      }
    />
  );
}
