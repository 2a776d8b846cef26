import { AppError } from './problem.ts';

/**
 * Lets only so many pieces of heavy work run at once and so many wait; more are told to come back
 * (503), so that no load can exhaust the machine.
 *
 * @returns a function that runs work in its turn; it throws AppError 'busy' when too many wait
 */
export function turnstile(atOnce: number, mayWait: number) {
  let running = 0;
  const waiting: (() => void)[] = [];
  return async function inTurn<T>(work: () => Promise<T>): Promise<T> {
    if (running >= atOnce) {
      if (waiting.length >= mayWait) throw new AppError('busy', { retryAfter: 3 });
      await new Promise<void>((resolve) => waiting.push(resolve));
    } else {
      running += 1;
    }
    try {
      return await work();
    } finally {
      // The place is handed on, not freed, so nobody slips in between.
      const next = waiting.shift();
      if (next) next();
      else running -= 1;
    }
  };
}
