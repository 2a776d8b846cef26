import { readFiring } from '#shared/firing/read-firing.ts';
import type { Reading } from '#shared/firing/types.ts';
import { FIRING_KINDS } from '../../seeds/simulation/firing-kinds.ts';
import { simulateFiring } from '../../seeds/simulation/simulate-firing.ts';
import { judgeAll, judgedLines } from '../support/judged/judge.ts';
import { levellingOffCoverage } from '../support/judged/levelling-off-coverage.ts';
import { milliseconds, print, timeEach } from './measure.ts';

/** How long a reading takes, and how right it is on made-up records of every kind. */
export async function benchReader(): Promise<void> {
  for (const [count, rounds, aim] of [
    [500, 200, 'aim ≤ 3 ms'],
    [50_000, 20, 'aim ≤ 150 ms'],
    [200_000, 8, 'linear'],
  ] as const) {
    const { readings, marks } = stalledRecord(count);
    const times = await timeEach(rounds, () =>
      readFiring({ readings, marks, targetCelsius: 1010, fuel: 'propane', startClass: 'cold' }),
    );
    print(`reading one note (${String(count)} points)`, milliseconds(times), aim);
  }
  const seeds = Array.from({ length: 30 }, (_, i) => 1001 + i);
  for (const { what, value, aim } of judgedLines(judgeAll(seeds))) print(what, value, aim);
  for (const secondsBetween of [1, 10]) {
    const { told, share } = levellingOffCoverage(
      {
        secondsBetween,
        windCelsius: 2,
        noiseCelsius: 1.5,
        timeConstantMinutes: 8,
        stillToClimb: 150,
      },
      600,
    );
    print(
      `levelling-off, readings every ${String(secondsBetween)} s, gusty`,
      `truth within in ${(100 * share).toFixed(1)} % of ${String(told)} told`,
      'aim 90 to 97 %',
    );
  }
}

/** A noisy firing that stalls and is mended, at so many even steps. */
function stalledRecord(count: number): {
  readings: Reading[];
  marks: ReturnType<typeof simulateFiring>['marks'];
} {
  const record = simulateFiring({
    ...FIRING_KINDS['stalled-then-mended'],
    stepSeconds: 1,
    noiseCelsius: 2,
  });
  const last = record.readings[record.readings.length - 1]?.minute ?? 0;
  const readings = Array.from({ length: count }, (_, i) => {
    const minute = (i / count) * last;
    const celsius = record.readings[Math.round(minute * 60)]?.celsius ?? 0;
    return { minute, celsius };
  });
  return { readings, marks: record.marks };
}
