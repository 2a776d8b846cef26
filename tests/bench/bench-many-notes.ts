import { readQuestion } from '#shared/question/read-question.ts';
import { loadManyNotes } from '../../seeds/many/load-many.ts';
import { createTextMaker } from '../../seeds/many/told-text.ts';
import { seededRandom } from '../../seeds/simulation/seeded-random.ts';
import { plainSearch } from '../../server/search/plain-search.ts';
import { reindex } from '../../server/search/reindex.ts';
import { benchSearch, QUESTIONS } from './bench-search.ts';
import { get, type BenchStack } from './bench-stack.ts';
import { milliseconds, print, timeEach } from './measure.ts';

const ROUNDS = 40;

const perSecond = (count: number, from: number): string => {
  const seconds = (performance.now() - from) / 1000;
  return `${seconds.toFixed(1)} s, ${(count / seconds).toFixed(0)} per s`;
};

/** Full searches: the questions alone and with facets ticked. */
function searchUrls(): string[] {
  return QUESTIONS.flatMap((question, at) => {
    const query = new URLSearchParams({ q: question });
    const ticked = new URLSearchParams({
      q: question,
      fuel: 'propane',
      ...(at % 2 === 0 ? { kilnSize: 'small,medium' } : { weather: 'dry,rain' }),
    });
    return [`/api/search?${query.toString()}`, `/api/search?${ticked.toString()}`];
  });
}

/** What is typed on the way to two words, letter by letter. */
function typedUrls(): string[] {
  const text = createTextMaker(seededRandom(5));
  return Array.from({ length: 40 }, (_, at) => {
    const typed = at % 5 === 0 ? text.word().slice(0, 1 + (at % 3)) : text.words(2).slice(0, 9);
    return `/api/suggestions?q=${encodeURIComponent(typed)}`;
  });
}

/** Makes the index anew while readers ask: how fast, and how long they wait. */
async function benchReindex({ deps }: BenchStack, port: number, count: number): Promise<void> {
  let isDone = false;
  const waits: number[] = [];
  const asking = (async () => {
    while (!isDone) {
      const from = performance.now();
      await get(port, '/api/front');
      waits.push(performance.now() - from);
      await new Promise((resolve) => setTimeout(resolve, 20));
    }
  })();
  const from = performance.now();
  try {
    await reindex(deps);
    print('many notes: index made anew', perSecond(count, from), 'aim ≥ 2000 per s');
  } finally {
    isDone = true;
  }
  await asking;
  print('many notes: front page meanwhile', milliseconds(waits));
}

/** The whole product with many made-up notes: search, type-ahead, plain search, index made anew. */
export async function benchManyNotes(stack: BenchStack, count: number): Promise<void> {
  const { deps, serve } = stack;
  const from = performance.now();
  await loadManyNotes(deps.db, count);
  print(`many notes: ${String(count)} loaded`, perSecond(count, from));
  const port = await serve();
  await benchReindex(stack, port, count);
  await benchSearch(deps, port, searchUrls(), 'many notes: search', 'aim p95 ≤ 60 ms');
  await benchSearch(deps, port, typedUrls(), 'many notes: type-ahead', 'aim p95 ≤ 30 ms');
  const plain = await timeEach(ROUNDS, (round) =>
    plainSearch(deps.db, readQuestion(QUESTIONS[round % QUESTIONS.length] ?? '')),
  );
  print('many notes: plain search', milliseconds(plain), 'aim p95 ≤ 300 ms');
}
