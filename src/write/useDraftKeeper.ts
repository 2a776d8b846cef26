import { useEffect, useState, useSyncExternalStore } from 'react';
import type { Draft } from '#shared/api/notes.ts';
import { DraftKeeper } from './draft-keeper.ts';
import type { KeptDraft } from './save-state.ts';

/** The keeper of one draft for as long as the page is open. Leaving with unsent work asks first. */
export function useDraftKeeper(memberId: number, draft: Draft): [KeptDraft, DraftKeeper] {
  const [keeper] = useState(() => new DraftKeeper(memberId, draft));
  const kept = useSyncExternalStore(keeper.subscribe, keeper.current);
  useEffect(() => {
    keeper.start();
    const ask = (event: BeforeUnloadEvent): void => {
      if (keeper.hasUnsent) event.preventDefault();
    };
    const online = (): void => void keeper.flush();
    window.addEventListener('beforeunload', ask);
    window.addEventListener('online', online);
    return () => {
      window.removeEventListener('beforeunload', ask);
      window.removeEventListener('online', online);
      void keeper.flush().finally(() => keeper.close());
    };
  }, [keeper]);
  return [kept, keeper];
}
