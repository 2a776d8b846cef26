import { useState } from 'react';
import { keepDeskText, keptDeskText, type KeptDeskText } from './kept-desk-text.ts';

/** What is typed at a note's desk, and the way to change part of it. */
export function useKeptDeskText(memberId: number, noteId: number) {
  const [typed, setTyped] = useState(() => keptDeskText(memberId, noteId));
  const change = (part: Partial<KeptDeskText>): void => {
    const next = { ...typed, ...part };
    keepDeskText(memberId, noteId, next);
    setTyped(next);
  };
  return [typed, change] as const;
}
