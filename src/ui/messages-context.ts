import { createContext } from 'react';

export interface Message {
  readonly kind: 'done' | 'error' | 'info';
  readonly text: string;
  /** One thing that can be done about it: "Undo", "Try again". */
  readonly action?: { readonly label: string; readonly onClick: () => void };
}

/** Tells how a piece of work went. */
export type Tell = (message: Message) => void;

export const MessagesContext = createContext<Tell | null>(null);
