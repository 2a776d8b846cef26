import { useEffect, type RefObject } from 'react';
import { rangesIn } from './passage-ranges.ts';
import './unsafe-highlight.css';

const NAME = 'unsafe-words';

/**
 * Marks passages where they stand, without touching the note's markup. A browser that cannot do
 * this still has the passages in the list beside the note.
 */
export function useUnsafeHighlights(
  root: RefObject<Element | null>,
  passages: readonly string[],
): void {
  const key = passages.join('\n');
  useEffect(() => {
    if (!root.current || typeof Highlight === 'undefined') return;
    CSS.highlights.set(NAME, new Highlight(...rangesIn(root.current, key.split('\n'))));
    return () => {
      CSS.highlights.delete(NAME);
    };
  }, [root, key]);
}
