import type { Deps } from '../../server/deps.ts';
import { get } from './bench-stack.ts';
import { milliseconds, percentile, print, timeEach } from './measure.ts';

export const QUESTIONS = [
  'stalled at 700 °C',
  'stuck at 1300F',
  'cracked flat plate',
  'copper matt no colour',
] as const;

type Asked = Parameters<typeof fetch>;

/** The requests that the application makes to the engine while `work` runs. */
async function requestsMadeBy(work: () => Promise<unknown>): Promise<Asked[]> {
  const made: Asked[] = [];
  const { fetch: unwatched } = globalThis;
  globalThis.fetch = (url, init) => {
    made.push([url, { ...init, signal: null }]);
    return unwatched(url, init);
  };
  try {
    await work();
  } finally {
    globalThis.fetch = unwatched;
  }
  return made;
}

async function askAgain(requests: readonly Asked[]): Promise<void> {
  for (const request of requests) JSON.parse(await (await fetch(...request)).text());
}

const searchUrl = (question: string): string => `/api/search?q=${encodeURIComponent(question)}`;

/** Searches of a visitor, who may ask only so often: the count of it is cleared between portions. */
async function timeSearches(
  deps: Deps,
  port: number,
  urls: readonly string[],
  portions: number,
): Promise<number[]> {
  const times: number[] = [];
  for (let portion = 0; portion < portions; portion += 1) {
    await deps.db('throttles').delete();
    const url = (round: number): string => urls[round % urls.length] ?? '';
    times.push(...(await timeEach(40, (round) => get(port, url(round)), 4)));
  }
  return times;
}

/**
 * The whole way of a search against the engine's own part of it: the very requests that the
 * application makes for these questions, asked of the engine by themselves. Both by turns, so that
 * a busy moment falls on both.
 */
export async function benchSearch(
  deps: Deps,
  port: number,
  urls: readonly string[] = QUESTIONS.map(searchUrl),
  name = 'search',
  aim = '',
): Promise<void> {
  const requests: Asked[][] = [];
  await deps.db('throttles').delete();
  for (const url of urls) requests.push(await requestsMadeBy(() => get(port, url)));
  const whole: number[] = [];
  const engine: number[] = [];
  await timeSearches(deps, port, urls, 1);
  for (let turn = 0; turn < 6; turn += 1) {
    whole.push(...(await timeSearches(deps, port, urls, 1)));
    engine.push(
      ...(await timeEach(40, (round) => askAgain(requests[round % urls.length] ?? []), 4)),
    );
  }
  const ratio = (share: number): string =>
    (percentile(whole, share) / percentile(engine, share)).toFixed(2);
  print(`${name}, whole stack`, milliseconds(whole), aim);
  print(`${name}, engine alone (same requests)`, milliseconds(engine));
  print(`${name}, whole / engine`, `p50 ${ratio(0.5)}, p95 ${ratio(0.95)}`, 'aim ≤ 1.5');
}
