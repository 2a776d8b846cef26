import { useLocation } from 'react-router-dom';
import { paths } from '#shared/paths.ts';
import { OfflineError, ProblemError } from './client.ts';
import { Button } from '../ui/Button.tsx';
import { EmptyState } from '../ui/EmptyState.tsx';
import { LinkButton } from '../ui/LinkButton.tsx';
import { NotFoundPage } from './NotFoundPage.tsx';

interface Props {
  readonly error: unknown;
  readonly onRetry: () => void;
}

/** A page for each way in which a page can fail: nothing here, sign in first, not allowed, away. */
export function ProblemPage({ error, onRetry }: Props) {
  const { pathname, search } = useLocation();
  const retry = (
    <Button kind="main" onClick={onRetry}>
      Try again
    </Button>
  );
  if (error instanceof OfflineError) {
    return (
      <EmptyState headingLevel={1} title="Spyhole cannot be reached" action={retry}>
        Perhaps the network is gone, or Spyhole is being restarted. What you wrote is still in this
        browser.
      </EmptyState>
    );
  }
  if (error instanceof ProblemError) {
    const { status, title, detail } = error.problem;
    if (status === 404) return <NotFoundPage />;
    if (status === 401) {
      return (
        <EmptyState
          headingLevel={1}
          title="Sign in to see this"
          action={
            <LinkButton to={paths.signIn(`${pathname}${search}`)} kind="main">
              Sign in
            </LinkButton>
          }
        >
          This page is for members.
        </EmptyState>
      );
    }
    if (status === 403) {
      return (
        <EmptyState
          headingLevel={1}
          title="You may not see this"
          action={<LinkButton to={paths.front}>Front page</LinkButton>}
        >
          {detail === title
            ? 'Your account does not open this page. If you think it should, ask whoever looks after Spyhole.'
            : detail}
        </EmptyState>
      );
    }
    return (
      <EmptyState headingLevel={1} title={title} action={retry}>
        {detail === title
          ? 'It is not your doing, and it has been noted down. Try again in a moment.'
          : detail}
        {error.problem.instance && (
          <span className="mt-2 block text-note">
            If you tell us, name {error.problem.instance}.
          </span>
        )}
      </EmptyState>
    );
  }
  return (
    <EmptyState headingLevel={1} title="A part of this page broke" action={retry}>
      The rest of Spyhole goes on working. Load the page again; if it breaks again, tell us what you
      did.
    </EmptyState>
  );
}
