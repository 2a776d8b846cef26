import { courseOf } from '#shared/firing/course.ts';
import { climbSignature, type ClimbSignature } from '#shared/look-alike/climb-signature.ts';
import { emptyClimbStore, putClimb } from '#shared/look-alike/climb-store.ts';
import { ALIKE_WITHIN_CELSIUS, MOST_MINUTES } from '#shared/look-alike/constants.ts';
import { nearestClimbs, searchClimbs } from '#shared/look-alike/nearest-climbs.ts';
import { signatureDistance } from '#shared/look-alike/signature-distance.ts';
import { FIRING_KINDS } from '../../seeds/simulation/firing-kinds.ts';
import { normalNumber, seededRandom } from '../../seeds/simulation/seeded-random.ts';
import { simulateFiring, type SimulatedFiring } from '../../seeds/simulation/simulate-firing.ts';
import { milliseconds, percentile, print, timeEach } from './measure.ts';

const SEEDS_A_KIND = 6;
/** What a page asks for. */
const ASKED = { count: 12, withinCelsius: ALIKE_WITHIN_CELSIUS };
const QUERIES = 60;

/** Climbs of simulated firings of every kind, read as published ones are. */
function simulatedClimbs(): ClimbSignature[] {
  const climbs: ClimbSignature[] = [];
  for (const kind of Object.values<SimulatedFiring>(FIRING_KINDS)) {
    for (let seed = 1; seed <= SEEDS_A_KIND; seed += 1) {
      const record = simulateFiring({
        ...kind,
        seed,
        burnerKw: kind.burnerKw * (0.85 + 0.06 * seed),
      });
      const course = courseOf({ readings: record.readings, marks: record.marks });
      const climb = course && climbSignature(course);
      if (climb) climbs.push(climb);
    }
  }
  return climbs;
}

/** Another firing like one of them: drawn out or in, hotter or less hot, and wavering. */
function variation(climbs: readonly ClimbSignature[], random: () => number): ClimbSignature {
  const climb = climbs[Math.floor(random() * climbs.length)] ?? new Int16Array(1);
  const stretch = 0.75 + 0.7 * random();
  const scale = 0.9 + 0.15 * random();
  let drift = 0;
  const samples = Math.min(MOST_MINUTES, Math.max(6, Math.round(climb.length * stretch)));
  return Int16Array.from({ length: samples }, (_value, minute) => {
    drift = 0.9 * drift + 6 * normalNumber(random);
    const at = Math.min(climb.length - 1, minute / stretch);
    const low = climb[Math.floor(at)] ?? 0;
    const high = climb[Math.ceil(at)] ?? low;
    return Math.round((low + (high - low) * (at % 1)) * scale + drift);
  });
}

/** The exact nearest of many climbs, against the aim of 50 ms among 20,000 on one thread. */
export async function benchLookAlikes(): Promise<void> {
  const climbs = simulatedClimbs();
  const random = seededRandom(20_000);
  for (const size of [20_000, 100_000]) {
    const store = emptyClimbStore(size);
    const all = Array.from({ length: size }, () => variation(climbs, random));
    all.forEach((climb, index) => putClimb(store, index + 1, climb));
    const queries = Array.from({ length: QUERIES }, () => variation(climbs, random));
    const queryAt = (round: number) => queries[round % QUERIES] ?? new Int16Array(1);
    const times = await timeEach(QUERIES, (round) => nearestClimbs(store, queryAt(round), ASKED));
    print(
      `look-alikes, exact ${String(ASKED.count)} of ${size.toLocaleString('en')}`,
      `${milliseconds(times)}, worst ${Math.max(...times).toFixed(1)} ms`,
      size === 20_000 ? 'aim ≤ 50 ms' : '',
    );
    print('  the same, longest piece without a pause', longestPiece(store, queries), 'aim ≤ 10 ms');
    if (size > 20_000) continue;
    const everyOne = await timeEach(
      3,
      (round) => all.map((climb) => signatureDistance(queryAt(round), climb)),
      1,
    );
    print('  measuring every one instead', milliseconds(everyOne));
    const unlike = Int16Array.from({ length: 90 }, (_value, minute) =>
      Math.round(500 + 480 * Math.sin(minute / 4)),
    );
    const farthest = await timeEach(10, () => nearestClimbs(store, unlike, ASKED));
    print('  a climb like none of them', milliseconds(farthest));
  }
}

function longestPiece(
  store: ReturnType<typeof emptyClimbStore>,
  queries: readonly ClimbSignature[],
): string {
  const longest = queries.map((query) => {
    const search = searchClimbs(store, query, ASKED);
    let most = 0;
    for (;;) {
      const from = performance.now();
      const step = search.next();
      most = Math.max(most, performance.now() - from);
      if (step.done === true) return most;
    }
  });
  return `p50 ${percentile(longest, 0.5).toFixed(2)} ms, worst ${Math.max(...longest).toFixed(2)} ms`;
}
