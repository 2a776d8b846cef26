import type { Mark, Reading } from '#shared/firing/types.ts';
import type { MarkKind } from '#shared/vocabulary/marks.ts';
import { normalNumber, seededRandom } from './seeded-random.ts';

/** What happens at a moment of the firing: a mark, and what it does to the fire. */
export interface FireEvent {
  readonly minute: number;
  readonly mark?: MarkKind;
  readonly percent?: number;
  /** From now on the burner gives this share of its full heat. */
  readonly burnerShare?: number;
  /** From now on the kiln loses this many times its first losses (a floor insulated: below 1). */
  readonly lossShare?: number;
  /** For so many minutes the wind multiplies the losses. */
  readonly gust?: { readonly minutes: number; readonly lossShare: number };
}

/** A small gas kiln and how it was fired. */
export interface SimulatedFiring {
  readonly seed: number;
  /** Heat the burner puts into the chamber, kW. */
  readonly burnerKw: number;
  readonly volumeLitres: number;
  /** W lost per K above the air through walls and flue, for each litre of chamber. */
  readonly lossFactor: number;
  /** Share by which a cold or bare floor adds to the losses. */
  readonly floorLoss?: number;
  readonly airCelsius?: number;
  readonly startCelsius: number;
  readonly targetCelsius: number;
  /** Minutes the fire is turned down to keep the target; 0 shuts off as soon as it is reached. */
  readonly holdMinutes: number;
  /** Levels at which the fire is turned down on the way, °C and minutes: a drying soak, a pause. */
  readonly soaks?: readonly { readonly celsius: number; readonly minutes: number }[];
  /** The fastest climb the potter allows, °C/min. */
  readonly fastestPerMinute?: number;
  /** Goes on to full fire past the target by so much before turning down or off. */
  readonly overshootCelsius?: number;
  readonly events?: readonly FireEvent[];
  /** Minute at which the potter gives up, reached or not. */
  readonly giveUpMinute?: number;
  /** Minutes of cooling recorded after shut-off. */
  readonly coolMinutes: number;
  /** Minutes of record before the burner is lit. */
  readonly waitMinutes?: number;
  /** Deviation of a reading, °C. */
  readonly noiseCelsius?: number;
  /** Seconds between readings; or readings noted by hand every few minutes, unevenly, in whole degrees. */
  readonly stepSeconds?: number;
  readonly handNotedMinutes?: number;
  /** False leaves the marks of lighting and shutting off out, as a forgetful potter would. */
  readonly marksFire?: boolean;
}

export interface SimulatedRecord {
  readonly readings: Reading[];
  readonly marks: Mark[];
  /** The noise-free course at the same moments. */
  readonly truth: Reading[];
  readonly shutOffMinute: number;
  readonly reachedTarget: boolean;
}

const STEP_MINUTES = 1 / 60;
/** Heat taken up by a litre of chamber with its lining, shelf and ware, kJ/K: a fast fibre kiln. */
const KILOJOULES_PER_LITRE_KELVIN = 0.4;
/** Losses grow with temperature as radiation does: this many times more at 1000 °C than when cold. */
const HOT_LOSS = 0.5;
const LONGEST_MINUTES = 600;

/**
 * Fires a kiln on paper: one lump of heat, a burner, losses that grow with temperature and wind.
 * Pure; the same inputs give the same record.
 */
export function simulateFiring(firing: SimulatedFiring): SimulatedRecord {
  const air = firing.airCelsius ?? 15;
  const wait = firing.waitMinutes ?? 0;
  const capacity = firing.volumeLitres * KILOJOULES_PER_LITRE_KELVIN;
  const events = [...(firing.events ?? [])].sort((a, b) => a.minute - b.minute);
  const marks: Mark[] = [];
  if (firing.marksFire !== false) marks.push({ minute: wait, kind: 'lit' });
  for (const event of events) {
    if (event.mark === undefined) continue;
    marks.push({
      minute: event.minute,
      kind: event.mark,
      ...(event.percent === undefined ? {} : { percent: event.percent }),
    });
  }

  const course: Reading[] = [];
  const soaks = [...(firing.soaks ?? [])];
  const top = firing.targetCelsius + (firing.overshootCelsius ?? 0);
  let celsius = firing.startCelsius;
  let burnerShare = 1;
  let lossShare = 1 + (firing.floorLoss ?? 0);
  let gustUntil = -1;
  let gustShare = 1;
  let next = 0;
  let keep: { celsius: number; until: number } | null = null;
  let reachedTarget = false;
  let shutOffMinute: number | null = null;

  for (let step = 0; step <= LONGEST_MINUTES / STEP_MINUTES; step += 1) {
    const minute = step * STEP_MINUTES;
    course.push({ minute, celsius });
    if (shutOffMinute !== null && minute >= shutOffMinute + firing.coolMinutes - 1e-9) break;
    for (; next < events.length && (events[next]?.minute ?? 0) <= minute; next += 1) {
      const event = events[next];
      burnerShare = event?.burnerShare ?? burnerShare;
      lossShare = event?.lossShare ?? lossShare;
      if (event?.gust !== undefined) {
        gustUntil = minute + event.gust.minutes;
        gustShare = event.gust.lossShare;
      }
    }
    const isLit = minute >= wait && shutOffMinute === null;
    if (isLit) {
      if (keep !== null && minute >= keep.until - 1e-9) {
        keep = null;
        if (reachedTarget) shutOffMinute = minute;
      } else if (keep === null) {
        const soak = soaks[0];
        if (soak !== undefined && celsius >= soak.celsius) {
          keep = { celsius: soak.celsius, until: minute + soak.minutes };
          soaks.shift();
        } else if (celsius >= top) {
          reachedTarget = true;
          if (firing.holdMinutes <= 0) shutOffMinute = minute;
          else keep = { celsius: top, until: minute + firing.holdMinutes };
        }
      }
      if (shutOffMinute === null && minute >= (firing.giveUpMinute ?? Infinity)) {
        shutOffMinute = minute;
      }
    }
    const wind = minute < gustUntil ? gustShare : 1;
    const lossKw =
      (firing.lossFactor *
        firing.volumeLitres *
        lossShare *
        wind *
        (celsius - air) *
        (1 + (HOT_LOSS * celsius) / 1000)) /
      1000;
    const fullKw = isLit && shutOffMinute === null ? firing.burnerKw * burnerShare : 0;
    let perMinute = ((fullKw - lossKw) * 60) / capacity;
    if (fullKw > 0 && firing.fastestPerMinute !== undefined) {
      perMinute = Math.min(perMinute, firing.fastestPerMinute);
    }
    if (fullKw > 0 && keep !== null) {
      perMinute = Math.max(-20, Math.min(perMinute, (keep.celsius - celsius) / (2 * STEP_MINUTES)));
    }
    celsius += perMinute * STEP_MINUTES;
  }
  const end = shutOffMinute ?? LONGEST_MINUTES;
  if (firing.marksFire !== false && shutOffMinute !== null) {
    marks.push({ minute: end, kind: 'shut-off' });
  }
  const truth = sampled(course, firing, shutOffMinute);
  const random = seededRandom(firing.seed + 1);
  const noise = firing.noiseCelsius ?? 0;
  const readings = truth.map((reading) => {
    const shown = reading.celsius + noise * normalNumber(random);
    const celsiusShown =
      firing.handNotedMinutes === undefined ? Math.round(shown * 100) / 100 : Math.round(shown);
    return { minute: reading.minute, celsius: celsiusShown };
  });
  marks.sort((a, b) => a.minute - b.minute);
  return { readings, marks, truth, shutOffMinute: end, reachedTarget };
}

/** Readings as a logger takes them, or as a potter with a pencil does, who also notes the shut-off. */
function sampled(
  course: readonly Reading[],
  firing: SimulatedFiring,
  shutOffMinute: number | null,
): Reading[] {
  const random = seededRandom(firing.seed);
  const { handNotedMinutes } = firing;
  const stepsApart = (): number =>
    handNotedMinutes === undefined
      ? Math.max(1, Math.round((firing.stepSeconds ?? 30) / (60 * STEP_MINUTES)))
      : Math.max(1, Math.round(handNotedMinutes * (0.6 + 0.8 * random()))) / STEP_MINUTES;
  const steps = new Set<number>();
  for (let i = 0; i < course.length; i += stepsApart()) steps.add(Math.round(i));
  if (handNotedMinutes !== undefined && shutOffMinute !== null) {
    steps.add(Math.round(shutOffMinute / STEP_MINUTES));
  }
  return [...steps]
    .sort((a, b) => a - b)
    .flatMap((step) => {
      const reading = course[step];
      return reading === undefined
        ? []
        : [{ minute: Math.round(reading.minute * 1e6) / 1e6, celsius: reading.celsius }];
    });
}
