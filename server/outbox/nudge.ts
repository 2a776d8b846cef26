import { EventEmitter } from 'node:events';

const bell = new EventEmitter();

/**
 * Tells this process's worker that there is work, after the transaction that holds it has committed.
 * Only for speed: the worker also looks by itself every second.
 */
export function nudgeOutbox(): void {
  bell.emit('work');
}

/** @returns a function that stops listening */
export function onNudge(listener: () => void): () => void {
  bell.on('work', listener);
  return () => bell.off('work', listener);
}
