import { useEffect } from 'react';

/** The title of the tab; the server has set the same one for a first visit. */
export function usePageTitle(title: string | null): void {
  useEffect(() => {
    if (title !== null) document.title = `${title} · Spyhole`;
  }, [title]);
}
