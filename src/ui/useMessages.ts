import { useContext } from 'react';
import { MessagesContext } from './messages-context.ts';
import type { Tell } from './messages-context.ts';

/** `tell({ kind, text, action? })`; needs a MessagesProvider above. */
export function useMessages(): Tell {
  const tell = useContext(MessagesContext);
  if (!tell) throw new Error('useMessages needs a MessagesProvider above it.');
  return tell;
}
