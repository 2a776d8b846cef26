import { useCallback, useState } from 'react';

/**
 * The width of an element in px, kept up to date. Before the first measurement (and where there is
 * no ResizeObserver) it is `fallback`, so that a drawing is never empty.
 */
export function useWidth<T extends Element>(fallback = 720) {
  const [width, setWidth] = useState(fallback);
  const ref = useCallback((element: T | null) => {
    if (!element || typeof ResizeObserver === 'undefined') return;
    const observer = new ResizeObserver(([entry]) => {
      const measured = Math.round(entry?.contentRect.width ?? 0);
      if (measured > 0) setWidth(measured);
    });
    observer.observe(element);
    return () => observer.disconnect();
  }, []);
  return [ref, width] as const;
}
