/** Percentile of sorted or unsorted times, nearest rank. */
export function percentile(times: readonly number[], share: number): number {
  const sorted = [...times].sort((a, b) => a - b);
  return sorted[Math.min(sorted.length - 1, Math.floor(share * sorted.length))] ?? Number.NaN;
}

/** Milliseconds of each of `rounds` runs, one after the other, after `warmUp` that do not count. */
export async function timeEach(
  rounds: number,
  work: (round: number) => unknown,
  warmUp = Math.ceil(rounds / 5),
): Promise<number[]> {
  for (let round = 0; round < warmUp; round += 1) await work(round);
  const times: number[] = [];
  for (let round = 0; round < rounds; round += 1) {
    const from = performance.now();
    await work(round);
    times.push(performance.now() - from);
  }
  return times;
}

/** Answers a second of a handler under `atOnce` requests, for about `seconds`. */
export async function throughput(
  ask: () => Promise<unknown>,
  atOnce: number,
  seconds: number,
): Promise<number> {
  let answered = 0;
  const until = performance.now() + seconds * 1000;
  const from = performance.now();
  await Promise.all(
    Array.from({ length: atOnce }, async () => {
      while (performance.now() < until) {
        await ask();
        answered += 1;
      }
    }),
  );
  return answered / ((performance.now() - from) / 1000);
}

/** One line of the printed table. */
export function print(what: string, values: string, aim = ''): void {
  process.stdout.write(`${what.padEnd(44)} ${values.padEnd(52)} ${aim}\n`);
}

export const milliseconds = (times: readonly number[]): string =>
  `p50 ${percentile(times, 0.5).toFixed(2)} ms, p95 ${percentile(times, 0.95).toFixed(2)} ms`;
