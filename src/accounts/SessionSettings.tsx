import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { Me } from '#shared/api/accounts.ts';
import { momentWords } from '../notes/note-words.ts';
import { FACT_SEPARATOR } from '../ui/fact-separator.ts';
import { Button } from '../ui/Button.tsx';
import { Notice } from '../ui/Notice.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { useMessages } from '../ui/useMessages.ts';
import { endSession } from './account-mutations.ts';
import { sessionQueries } from './session-queries.ts';
import { SettingsSection } from './SettingsSection.tsx';
import { SignOutButtons } from './SignOutButtons.tsx';

/** Where the member is signed in, and ways to end it. */
export function SessionSettings({ me }: { readonly me: Me }) {
  const client = useQueryClient();
  const tell = useMessages();
  const list = useQuery(sessionQueries.list());
  const ending = useMutation({
    mutationFn: endSession,
    networkMode: 'always',
    onSuccess: ({ message }) => {
      tell({ kind: 'done', text: message });
      return client.invalidateQueries({ queryKey: sessionQueries.list().queryKey });
    },
    onError: (error, id) =>
      tell({
        kind: 'error',
        text: `It has not ended: ${error.message}`,
        action: { label: 'Try again', onClick: () => ending.mutate(id) },
      }),
  });
  return (
    <SettingsSection
      id="sessions"
      heading="Where you are signed in"
      lead="End what you do not know, and change your password then."
    >
      {list.isPending && (
        <Skeleton words="Your sessions are being fetched" shape="sheet" count={2} />
      )}
      {list.isError && (
        <Notice
          kind="error"
          action={<Button onClick={() => void list.refetch()}>Try again</Button>}
        >
          The list could not be fetched: {list.error.message}
        </Notice>
      )}
      {list.data && (
        <ul className="border-t border-line">
          {list.data.sessions.map((session) => (
            <li
              key={session.id}
              className="flex flex-wrap items-center justify-between gap-x-6 gap-y-1 border-b border-line py-2 text-small"
            >
              <span className="min-w-0">
                <span className="font-[600]">{session.browser}</span>
                {session.current && `${FACT_SEPARATOR}this one`}
                <span className="block text-note text-soot-2">
                  since {momentWords(session.startedAt)}, last seen{' '}
                  {momentWords(session.lastSeenAt)}
                </span>
              </span>
              {!session.current && (
                <Button
                  busy={ending.isPending && ending.variables === session.id}
                  label={`End ${session.browser}, since ${momentWords(session.startedAt)}`}
                  onClick={() => {
                    if (!ending.isPending) ending.mutate(session.id);
                  }}
                >
                  End
                </Button>
              )}
            </li>
          ))}
        </ul>
      )}
      <SignOutButtons me={me} />
    </SettingsSection>
  );
}
