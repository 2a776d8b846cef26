import { paths } from '#shared/paths.ts';
import { EmptyState } from '../ui/EmptyState.tsx';
import { LinkButton } from '../ui/LinkButton.tsx';
import { usePageTitle } from '../ui/usePageTitle.ts';

/** 404: no such page, or nothing this reader may see. */
export function NotFoundPage() {
  usePageTitle('Nothing here');
  return (
    <EmptyState
      headingLevel={1}
      title="There is nothing here"
      action={
        <>
          <LinkButton to={paths.find()} kind="main">
            Find notes
          </LinkButton>
          <LinkButton to={paths.front}>Front page</LinkButton>
        </>
      }
    >
      The address may be mistyped, or the note was taken down or is not published yet.
    </EmptyState>
  );
}
