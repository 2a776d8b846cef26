import { useRef, useState } from 'react';
import { keepDeskText, keptDeskText, type KeptDeskText } from './kept-desk-text.ts';

/**
 * What is typed at a note's desk, and the way to change part of it. A part is laid over what stands
 * there at that moment: an answer that comes in late must not take back what was typed meanwhile.
 */
export function useKeptDeskText(memberId: number, noteId: number) {
  const [typed, setTyped] = useState(() => keptDeskText(memberId, noteId));
  const latest = useRef(typed);
  const change = (part: Partial<KeptDeskText>): void => {
    const next = { ...latest.current, ...part };
    latest.current = next;
    keepDeskText(memberId, noteId, next);
    setTyped(next);
  };
  return [typed, change] as const;
}
