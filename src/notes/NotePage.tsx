import { useQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import { paths } from '#shared/paths.ts';
import { useSession } from '../accounts/useSession.ts';
import { TakeDownButton } from '../desk/TakeDownButton.tsx';
import { ProblemPage } from '../http/ProblemPage.tsx';
import { LookAlikesOfNote } from '../look-alikes/LookAlikesOfNote.tsx';
import { NoteQuestions } from '../questions/NoteQuestions.tsx';
import { LinkButton } from '../ui/LinkButton.tsx';
import { Notice } from '../ui/Notice.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { usePageTitle } from '../ui/usePageTitle.ts';
import { NoteView } from './NoteView.tsx';
import { noteQueries } from './note-queries.ts';

/** A published note; its author also sees it while it waits at the desk. */
export function NotePage() {
  const { id } = useParams();
  const noteId = Number(id);
  const { units } = useSession();
  const note = useQuery(noteQueries.page(noteId));
  usePageTitle(note.data?.row.title ?? null);
  if (note.isPending) {
    return (
      <div className="space-y-8">
        <Skeleton words="The note is being fetched" shape="text" count={2} />
        <Skeleton words="Its strip is being fetched" shape="strip" />
        <Skeleton words="Its sheet is being fetched" shape="sheet" count={8} />
      </div>
    );
  }
  if (note.isError) return <ProblemPage error={note.error} onRetry={() => void note.refetch()} />;
  const page = note.data;
  const { abilities } = page;
  const mayWork = abilities.edit || abilities.revise || abilities.tryIt || abilities.takeDown;
  return (
    <NoteView
      page={page}
      units={units}
      recordOf={page.publishedAt === null ? 'handed-in' : 'published'}
      questions={page.publishedAt !== null && <NoteQuestions noteId={page.id} />}
      after={
        page.publishedAt !== null &&
        page.hasRecord && (
          <LookAlikesOfNote noteId={page.id} revision={page.revision} units={units} />
        )
      }
      aside={
        <div className="not-in-print space-y-3">
          {page.publishedAt === null && (
            <Notice kind="info">
              This note is not published yet. Only you and the moderators see this page.
            </Notice>
          )}
          {page.revisionWaiting && (
            <Notice kind="info">A newer revision of this note is under way.</Notice>
          )}
          {mayWork && (
            <div className="flex flex-wrap gap-3">
              {abilities.edit && <LinkButton to={paths.write(page.id)}>Go on writing</LinkButton>}
              {abilities.revise && <LinkButton to={paths.write(page.id)}>Revise</LinkButton>}
              {abilities.tryIt && (
                <LinkButton to={paths.newNote({ tried: page.id })}>I tried this</LinkButton>
              )}
              {abilities.takeDown && <TakeDownButton noteId={page.id} />}
            </div>
          )}
        </div>
      }
    />
  );
}
