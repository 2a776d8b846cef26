import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import type { Me } from '#shared/api/accounts.ts';
import { paths } from '#shared/paths.ts';
import { momentWords } from '../notes/note-words.ts';
import { Button } from '../ui/Button.tsx';
import { Dialog } from '../ui/Dialog.tsx';
import { useMessages } from '../ui/useMessages.ts';
import { allUnsent } from '../write/unsent-work.ts';
import { signOut, signOutEverywhere } from './account-mutations.ts';
import { isProblem } from './form-faults.ts';
import { leaveSession } from './session-cache.ts';
import { unsentFileName, unsentFileText } from './unsent-file.ts';

type Extent = 'here' | 'everywhere';
type Unsent = ReturnType<typeof allUnsent>;

async function end(extent: Extent): Promise<void> {
  try {
    await (extent === 'here' ? signOut() : signOutEverywhere());
  } catch (error) {
    // Ended already, by the clock or from elsewhere: this browser has still to forget it.
    if (!isProblem(error, 'sign-in-needed')) throw error;
  }
}

/** Signs out; work that the server does not have is offered as a file first, then cleared. */
export function SignOutButtons({ me }: { readonly me: Me }) {
  const client = useQueryClient();
  const navigate = useNavigate();
  const tell = useMessages();
  const [asked, setAsked] = useState<{ extent: Extent; unsent: Unsent } | null>(null);
  const leaving = useMutation({
    mutationFn: end,
    networkMode: 'always',
    onSuccess: async (_nothing, extent) => {
      setAsked(null);
      await leaveSession(client, () => navigate(paths.front, { replace: true }));
      tell({
        kind: 'done',
        text: extent === 'here' ? 'You are signed out.' : 'You are signed out everywhere.',
      });
    },
    onError: (error, extent) =>
      tell({
        kind: 'error',
        text: `You are still signed in: ${error.message}`,
        action: { label: 'Try again', onClick: () => leaving.mutate(extent) },
      }),
  });
  const start = (extent: Extent): void => {
    if (leaving.isPending) return;
    const unsent = allUnsent(me.id);
    if (unsent.length > 0) setAsked({ extent, unsent });
    else leaving.mutate(extent);
  };
  const busy = (extent: Extent): boolean => leaving.isPending && leaving.variables === extent;
  return (
    <>
      <div className="flex flex-wrap gap-3 pt-2">
        <Button kind="main" busy={busy('here')} onClick={() => start('here')}>
          Sign out
        </Button>
        <Button busy={busy('everywhere')} onClick={() => start('everywhere')}>
          Sign out everywhere
        </Button>
      </div>
      <Dialog
        open={asked !== null}
        onClose={() => setAsked(null)}
        title="Some of your work has not been sent"
        actions={
          asked && (
            <>
              <Button kind="main" onClick={() => download(me, asked.unsent)}>
                Download it
              </Button>
              <Button
                kind="danger"
                busy={leaving.isPending}
                onClick={() => {
                  if (!leaving.isPending) leaving.mutate(asked.extent);
                }}
              >
                Clear it and sign out
              </Button>
              <Button onClick={() => setAsked(null)}>Stay signed in</Button>
            </>
          )
        }
      >
        {asked && <UnsentList unsent={asked.unsent} />}
      </Dialog>
    </>
  );
}

function UnsentList({ unsent }: { readonly unsent: Unsent }) {
  return (
    <>
      <p>
        This browser holds changes that Spyhole does not have yet. Signing out clears them from it.
        Opening the note sends them; or download them as a file.
      </p>
      <ul className="border-t border-line">
        {unsent.map(({ noteId, work }) => (
          <li key={noteId} className="border-b border-line py-1.5 text-small">
            {work.fields.title || `A note without a title (${String(noteId)})`}
            <span className="block text-note text-soot-2">written {momentWords(work.at)}</span>
          </li>
        ))}
      </ul>
    </>
  );
}

function download(me: Me, unsent: Unsent): void {
  const file = new Blob([unsentFileText(me, unsent)], { type: 'application/json' });
  const address = URL.createObjectURL(file);
  const link = document.createElement('a');
  link.href = address;
  link.download = unsentFileName(new Date());
  link.click();
  // The browser has begun to read by then.
  setTimeout(() => URL.revokeObjectURL(address), 10_000);
}
