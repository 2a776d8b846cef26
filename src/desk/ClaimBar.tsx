import { useNavigate } from 'react-router-dom';
import type { DeskNote } from '#shared/api/desk.ts';
import { paths } from '#shared/paths.ts';
import { Button } from '../ui/Button.tsx';
import { Notice } from '../ui/Notice.tsx';
import { useMessages } from '../ui/useMessages.ts';
import { clockWords, waitingWords } from './desk-words.ts';
import type { AtTheDesk } from './useDeskNote.ts';

interface Props {
  readonly desk: AtTheDesk;
  readonly data: DeskNote;
  readonly isOwn: boolean;
}

/** Whose desk the note is on, and the way to take it or put it back. */
export function ClaimBar({ desk, data, isOwn }: Props) {
  const navigate = useNavigate();
  const tell = useMessages();
  const { claim, giveUp, note } = desk;
  const waits = waitingWords(data.handedInAt, new Date(note.dataUpdatedAt));
  const take = (
    <Button kind="main" busy={claim.isPending} onClick={() => claim.mutate()}>
      Take it onto my desk
    </Button>
  );
  if (isOwn) {
    return (
      <Notice kind="info" heading="Your own note">
        Nobody decides on a note of their own. You can read it here as another moderator will.
      </Notice>
    );
  }
  if (note.isRefetchError) {
    return (
      <Notice kind="caution" heading="This note is no longer as you see it" appeared>
        {note.error.message} What you typed is kept in this browser.
      </Notice>
    );
  }
  if (claim.isError) {
    return (
      <Notice
        kind="caution"
        heading="It is not on your desk"
        appeared
        action={
          <Button busy={claim.isPending} onClick={() => claim.mutate()}>
            Try again
          </Button>
        }
      >
        {claim.error.message} What you typed is kept in this browser.
      </Notice>
    );
  }
  if (data.claim?.mine) {
    return (
      <Notice
        kind="done"
        heading={`On your desk until ${clockWords(data.claim.until)}`}
        action={
          <Button
            busy={giveUp.isPending}
            onClick={() =>
              giveUp.mutate(undefined, {
                onSuccess: (done) => {
                  tell({ kind: 'done', text: done.message });
                  void navigate(paths.desk);
                },
                onError: (error) => tell({ kind: 'error', text: error.message }),
              })
            }
          >
            Put it back
          </Button>
        }
      >
        Renewed by itself while this page is open. It has been {waits}.
      </Notice>
    );
  }
  if (data.claim) {
    return (
      <Notice kind="info" heading={`${data.claim.by.name} has this note on the desk`}>
        Until {clockWords(data.claim.until)}, unless it is renewed. You can read along.
      </Notice>
    );
  }
  return (
    <Notice kind="info" heading="Nobody has it yet" action={data.page.abilities.claim && take}>
      It has been {waits}. Take it to remark and decide; it is then yours for 20 minutes, renewed
      while the page is open.
    </Notice>
  );
}
