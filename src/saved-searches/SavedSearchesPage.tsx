import { Link } from 'react-router-dom';
import type { SavedSearch } from '#shared/api/saved-searches.ts';
import { paths } from '#shared/paths.ts';
import { AccountPage } from '../accounts/AccountPage.tsx';
import { useSession } from '../accounts/useSession.ts';
import { ProblemPage } from '../http/ProblemPage.tsx';
import { EmptyState } from '../ui/EmptyState.tsx';
import { LinkButton } from '../ui/LinkButton.tsx';
import { Notice } from '../ui/Notice.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { useMessages } from '../ui/useMessages.ts';
import { SavedSearchRow } from './SavedSearchRow.tsx';
import { useSavedSearches } from './useSavedSearches.ts';

/** A member's saved searches, and which of them are mailed. */
export function SavedSearchesPage() {
  const { me, units } = useSession();
  // Refused to visitors, and its refusal is the page they get.
  const { list, save, change, remove } = useSavedSearches({ always: true });
  const tell = useMessages();
  if (list.isLoadingError) {
    return <ProblemPage error={list.error} onRetry={() => void list.refetch()} />;
  }
  const failed = (again: () => void) => (error: Error) =>
    tell({ kind: 'error', text: error.message, action: { label: 'Try again', onClick: again } });
  const putBack = ({ name, search }: SavedSearch): void =>
    save.mutate(
      { name, search },
      { onError: failed(() => putBack({ name, search } as SavedSearch)) },
    );
  const removeIt = (search: SavedSearch): void =>
    remove.mutate(search.id, {
      onSuccess: () =>
        tell({
          kind: 'done',
          text: `“${search.name}” is removed.`,
          action: { label: 'Put it back', onClick: () => putBack(search) },
        }),
      onError: failed(() => removeIt(search)),
    });
  const changeIt = (
    id: number,
    changed: { name: string; mails: boolean },
    done: () => void,
  ): void =>
    change.mutate(
      { id, ...changed },
      {
        onSuccess: () => {
          done();
          tell({ kind: 'done', text: `“${changed.name.trim()}” is saved.` });
        },
        onError: failed(() => changeIt(id, changed, done)),
      },
    );
  return (
    <AccountPage
      title="Saved searches"
      lead="Once a note is published that fits one of these closely, it is mailed to you: at most one mail a day for all of them, every note once, none of your own."
    >
      {me && !me.settings.mails.savedSearches && (
        <Notice kind="info">
          Mails about saved searches are switched off.{' '}
          <Link to={`${paths.settings}#reading`} className="link">
            Switch them on in your settings
          </Link>
        </Notice>
      )}
      {me && !me.emailVerified && (
        <Notice kind="info">Nothing is mailed until you have confirmed your address.</Notice>
      )}
      {list.isPending && (
        <Skeleton words="Your saved searches are being fetched" shape="rows" count={3} />
      )}
      {list.data?.searches.length === 0 && (
        <EmptyState
          title="No search is saved yet"
          action={
            <LinkButton to={paths.find()} kind="main">
              Find
            </LinkButton>
          }
        >
          Ask something, narrow it as you like, and choose “Save this search” above the notes.
        </EmptyState>
      )}
      {list.data && list.data.searches.length > 0 && (
        <ul className="border-y border-soot">
          {list.data.searches.map((search) => (
            <SavedSearchRow
              key={search.id}
              search={search}
              units={units}
              busy={change.isPending && change.variables.id === search.id}
              onChange={(changed, done) => changeIt(search.id, changed, done)}
              onRemove={() => removeIt(search)}
            />
          ))}
        </ul>
      )}
    </AccountPage>
  );
}
