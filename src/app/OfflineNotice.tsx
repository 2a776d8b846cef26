import { useSyncExternalStore } from 'react';
import { Notice } from '../ui/Notice.tsx';

function subscribe(changed: () => void): () => void {
  window.addEventListener('online', changed);
  window.addEventListener('offline', changed);
  return () => {
    window.removeEventListener('online', changed);
    window.removeEventListener('offline', changed);
  };
}

/** Says that there is no network, and what goes on working without it. */
export function OfflineNotice() {
  const online = useSyncExternalStore(
    subscribe,
    () => navigator.onLine,
    () => true,
  );
  if (online) return null;
  return (
    <div className="pt-4">
      <Notice kind="info" heading="No network">
        What you write stays in this browser and is sent when the network is back.
      </Notice>
    </div>
  );
}
