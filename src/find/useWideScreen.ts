import { useSyncExternalStore } from 'react';

const WIDE = '(min-width: 64rem)';

const subscribe = (changed: () => void): (() => void) => {
  const query = window.matchMedia(WIDE);
  query.addEventListener('change', changed);
  return () => query.removeEventListener('change', changed);
};

/** True where there is room for filters beside the rows; kept up to date. */
export function useWideScreen(): boolean {
  return useSyncExternalStore(subscribe, () => window.matchMedia(WIDE).matches);
}
