import { useQuery } from '@tanstack/react-query';
import type { Draft } from '#shared/api/notes.ts';
import { paths } from '#shared/paths.ts';
import type { Units } from '#shared/units/units.ts';
import { NoteView } from '../notes/NoteView.tsx';
import { noteQueries } from '../notes/note-queries.ts';
import { Button } from '../ui/Button.tsx';
import { LinkButton } from '../ui/LinkButton.tsx';
import { Notice } from '../ui/Notice.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { DeskWords } from './DeskWords.tsx';
import { RemoveNoteButton } from './RemoveNoteButton.tsx';
import type { DraftActs } from './useDraftActs.ts';

const WORDS: Readonly<Record<Draft['status'], { heading: string; text: string }>> = {
  draft: { heading: 'A draft', text: 'It cannot be edited just now.' },
  'sent-back': { heading: 'Sent back to you', text: 'It cannot be edited just now.' },
  'handed-in': {
    heading: 'Handed in',
    text: 'It waits at the desk for a moderator. To change something, take it back first.',
  },
  'on-the-desk': {
    heading: 'On the desk',
    text: 'A moderator is reading it. You can still take it back; then it is read anew later.',
  },
  published: {
    heading: 'Published',
    text: 'To change it, open a new revision. What is published stays up until that one is.',
  },
  declined: {
    heading: 'Declined',
    text: 'It is not published. You can revise it and hand it in again.',
  },
  'taken-down': {
    heading: 'Taken down',
    text: 'It is no longer shown to readers. You can revise it and hand it in again.',
  },
};

interface Props {
  readonly draft: Draft;
  readonly units: Units;
  readonly acts: DraftActs;
}

/** A note that cannot be edited now: how it stands, what can be done, and the note itself. */
export function ReadOnlyDraft({ draft, units, acts }: Props) {
  const { abilities, status, fields } = draft;
  const failed = [acts.takeBack, acts.revise].find(({ isError }) => isError);
  const page = useQuery({
    ...noteQueries.preview(draft.id),
    enabled: fields.kilnId !== null,
  });
  return (
    <div className="space-y-8">
      <Notice
        kind="info"
        heading={WORDS[status].heading}
        action={
          <>
            {abilities.takeBack && (
              <Button
                kind="main"
                busy={acts.takeBack.isPending}
                onClick={() => acts.takeBack.mutate()}
              >
                Take it back
              </Button>
            )}
            {abilities.revise && (
              <Button kind="main" busy={acts.revise.isPending} onClick={() => acts.revise.mutate()}>
                Revise it
              </Button>
            )}
            {draft.publishedRevision !== null && (
              <LinkButton to={paths.note(draft.id, '')}>The published note</LinkButton>
            )}
            <LinkButton to={paths.notebook}>Notebook</LinkButton>
            {abilities.remove && <RemoveNoteButton remove={acts.remove} />}
          </>
        }
      >
        {WORDS[status].text}
      </Notice>
      {failed?.error && (
        <Notice kind="error" heading="That did not work" appeared>
          {failed.error.message}
        </Notice>
      )}
      <DeskWords draft={draft} />
      {page.isPending && fields.kilnId !== null && (
        <Skeleton words="The note is being fetched" shape="sheet" count={8} />
      )}
      {page.isError && (
        <Notice
          kind="error"
          heading="The note cannot be shown just now"
          action={<Button onClick={() => void page.refetch()}>Try again</Button>}
        >
          {page.error.message}
        </Notice>
      )}
      {page.data ? (
        <NoteView page={page.data} units={units} recordOf="draft" />
      ) : (
        <h1 className="text-title">{fields.title || 'Untitled note'}</h1>
      )}
    </div>
  );
}
