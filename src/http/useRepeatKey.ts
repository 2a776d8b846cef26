import { useRef } from 'react';
import { newIdempotencyKey } from './client.ts';

/**
 * The Idempotency-Key of a create: the same body sent again bears the same key, so that a repeat
 * after a lost answer is done once; another body gets another key.
 */
export function useRepeatKey(): (body: unknown) => string {
  const last = useRef<{ text: string; key: string } | null>(null);
  return (body) => {
    const text = JSON.stringify(body);
    if (last.current?.text !== text) last.current = { text, key: newIdempotencyKey() };
    return last.current.key;
  };
}
