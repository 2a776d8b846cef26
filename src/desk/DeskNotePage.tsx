import { useQuery } from '@tanstack/react-query';
import { useRef } from 'react';
import { Link, useParams } from 'react-router-dom';
import { paths } from '#shared/paths.ts';
import { useSession } from '../accounts/useSession.ts';
import { ProblemPage } from '../http/ProblemPage.tsx';
import { NoteView } from '../notes/NoteView.tsx';
import { LinkButton } from '../ui/LinkButton.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { usePageTitle } from '../ui/usePageTitle.ts';
import { ClaimBar } from './ClaimBar.tsx';
import { deskQueries } from './desk-queries.ts';
import { DeskDecision } from './DeskDecision.tsx';
import { DeskDifferences } from './DeskDifferences.tsx';
import { DeskRemarks } from './DeskRemarks.tsx';
import { nextNoteId } from './next-note.ts';
import { useDeskNote } from './useDeskNote.ts';
import { useKeptDeskText } from './useKeptDeskText.ts';
import { useUnsafeHighlights } from './useUnsafeHighlights.ts';
import { WhatToLookAt } from './WhatToLookAt.tsx';

/** A note at the desk: another note is another page, with nothing left over from the last. */
export function DeskNotePage() {
  const noteId = Number(useParams()['id']);
  const { me, known } = useSession();
  if (!known) return <Skeleton words="The note is being fetched" shape="text" />;
  return <DeskNote key={noteId} noteId={noteId} memberId={me?.id ?? 0} />;
}

interface Props {
  readonly noteId: number;
  readonly memberId: number;
}

function DeskNote({ noteId, memberId }: Props) {
  const { units } = useSession();
  const desk = useDeskNote(noteId);
  const queue = useQuery(deskQueries.queue());
  const [typed, change] = useKeptDeskText(memberId, noteId);
  const noteRef = useRef<HTMLDivElement>(null);
  const remarkRef = useRef<HTMLDivElement>(null);
  const { data } = desk.note;
  usePageTitle(data ? `Desk: ${data.page.row.title}` : null);
  useUnsafeHighlights(noteRef, data?.unsafe.map(({ passage }) => passage) ?? []);

  if (desk.note.isPending) {
    return (
      <div className="space-y-8">
        <Skeleton words="The note is being fetched" shape="text" count={2} />
        <Skeleton words="Its sheet is being fetched" shape="sheet" count={8} />
      </div>
    );
  }
  if (!data) {
    return <ProblemPage error={desk.note.error} onRetry={() => void desk.note.refetch()} />;
  }
  const next = nextNoteId(queue.data?.waiting ?? [], noteId);
  const remarkOn = (pointer: string): void => {
    change({ pointer });
    remarkRef.current?.querySelector('textarea')?.focus();
    remarkRef.current?.scrollIntoView({ block: 'center' });
  };
  return (
    <div className="space-y-6">
      <div className="flex flex-wrap items-center justify-between gap-x-6 gap-y-2">
        <Link to={paths.desk} className="link inline-flex min-h-11 items-center text-small">
          The whole pile
        </Link>
        <a href="#look-at" className="link inline-flex min-h-11 items-center text-small lg:hidden">
          What to look at, remarks, decision
        </a>
        {next !== null && <LinkButton to={paths.deskNote(next)}>Next note</LinkButton>}
      </div>
      <ClaimBar desk={desk} data={data} isOwn={data.page.author?.id === memberId} />
      <div className="grid gap-x-10 gap-y-12 lg:grid-cols-[minmax(0,1fr)_20rem]">
        <div ref={noteRef} className="min-w-0">
          <NoteView page={data.page} units={units} recordOf="handed-in" />
        </div>
        <div className="min-w-0 space-y-10 lg:sticky lg:top-2 lg:-m-2 lg:max-h-[calc(100dvh-1rem)] lg:self-start lg:overflow-y-auto lg:p-2">
          <WhatToLookAt
            data={data}
            units={units}
            noteRef={noteRef}
            onRemark={data.abilities.remark ? remarkOn : null}
          />
          <DeskDifferences data={data} />
          <div ref={remarkRef}>
            <DeskRemarks desk={desk} data={data} typed={typed} onTyped={change} />
          </div>
          <DeskDecision desk={desk} data={data} typed={typed} onTyped={change} next={next} />
        </div>
      </div>
    </div>
  );
}
