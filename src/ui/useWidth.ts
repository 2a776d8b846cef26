import { useCallback, useState } from 'react';
import { flushSync } from 'react-dom';

/** What a page of A4 has between its margins, in px: the narrower of the usual papers. */
const PAPER_PX = 688;

/**
 * The width of an element in px, kept up to date. Before the first measurement (and where there is
 * no ResizeObserver) it is `fallback`, so that a drawing is never empty. For printing it is drawn
 * anew at the width of the paper, so that its letters keep their size.
 */
export function useWidth<T extends Element>(fallback = 720) {
  const [width, setWidth] = useState(fallback);
  const [onPaper, setOnPaper] = useState(false);
  const ref = useCallback((element: T | null) => {
    if (!element || typeof ResizeObserver === 'undefined') return;
    let onScreen: number | null = null;
    let printing = false;
    const observer = new ResizeObserver(([entry]) => {
      const measured = Math.round(entry?.contentRect.width ?? 0);
      if (measured <= 0 || printing) return;
      onScreen = measured;
      setWidth(measured);
    });
    const toPaper = (): void => {
      printing = true;
      flushSync(() => {
        setWidth(PAPER_PX);
        setOnPaper(true);
      });
    };
    const toScreen = (): void => {
      printing = false;
      setOnPaper(false);
      if (onScreen !== null) setWidth(onScreen);
    };
    observer.observe(element);
    window.addEventListener('beforeprint', toPaper);
    window.addEventListener('afterprint', toScreen);
    return () => {
      observer.disconnect();
      window.removeEventListener('beforeprint', toPaper);
      window.removeEventListener('afterprint', toScreen);
    };
  }, []);
  return [ref, width, onPaper] as const;
}
