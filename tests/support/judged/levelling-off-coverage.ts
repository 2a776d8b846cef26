import { levellingOff } from '#shared/firing/levelling-off.ts';
import { normalNumber, seededRandom } from '../../../seeds/simulation/seeded-random.ts';

/** A fire that settles towards a level while the wind moves the reading for about a minute at a time. */
export interface Settling {
  readonly secondsBetween: number;
  /** Standard deviation of what the wind does, °C, its memory one minute. */
  readonly windCelsius: number;
  readonly noiseCelsius: number;
  readonly timeConstantMinutes: number;
  readonly stillToClimb: number;
}

const LEVEL = 730;
const MINUTES = 20;
const WIND_MEMORY = 1;

/** Of so many seeded records: for how many a level was told, and in how many the truth lay within. */
export function levellingOffCoverage(
  settling: Settling,
  records: number,
): { told: number; share: number } {
  let told = 0;
  let within = 0;
  for (let seed = 1; seed <= records; seed += 1) {
    const { minutes, celsius } = settlingRecord(settling, seed * 31 + 7);
    const read = levellingOff(minutes, celsius, [], 1010);
    if (read === null) continue;
    told += 1;
    if (read.lowCelsius <= LEVEL && read.highCelsius >= LEVEL) within += 1;
  }
  return { told, share: within / told };
}

function settlingRecord(settling: Settling, seed: number) {
  const random = seededRandom(seed);
  const step = settling.secondsBetween / 60;
  const count = Math.round(MINUTES / step) + 1;
  const stays = Math.exp(-step / WIND_MEMORY);
  const minutes = new Float64Array(count);
  const celsius = new Float64Array(count);
  let wind = settling.windCelsius * normalNumber(random);
  for (let i = 0; i < count; i += 1) {
    minutes[i] = i * step;
    wind = stays * wind + Math.sqrt(1 - stays ** 2) * settling.windCelsius * normalNumber(random);
    celsius[i] =
      LEVEL -
      settling.stillToClimb * Math.exp((-i * step) / settling.timeConstantMinutes) +
      wind +
      settling.noiseCelsius * normalNumber(random);
  }
  return { minutes, celsius };
}
