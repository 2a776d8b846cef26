import type { IncomingMessage } from 'node:http';

/** A whole request, body included, must have arrived by then. */
export const REQUEST_MILLISECONDS = 60_000;

/** Pictures and records come from phones at the kiln's side: they may take longer. */
export const UPLOAD_MILLISECONDS = 120_000;

/**
 * Node knows one time limit for all requests, which must be the uploads' one. This cuts off anything
 * else whose body is still dripping in at the shorter one.
 */
export function limitRequestTime(
  request: IncomingMessage,
  milliseconds: number = REQUEST_MILLISECONDS,
): void {
  if (request.headers['content-type']?.startsWith('multipart/')) return;
  const cut = setTimeout(() => {
    if (!request.complete) request.destroy();
  }, milliseconds);
  cut.unref();
  for (const event of ['end', 'close', 'error']) request.once(event, () => clearTimeout(cut));
}
