import { formatDuration } from '../units/duration.ts';
import { formatNumber } from '../units/number.ts';
import {
  formatDifference,
  formatRate,
  formatTemperature,
  fromCelsius,
  toCelsius,
  type TemperatureUnit,
} from '../units/temperature.ts';
import type { Units } from '../units/units.ts';
import type { ClimbTraits } from './climb-traits.ts';

/** What is called the same of two firings: levels within so many °C. */
const SAME_LEVEL = 25;
/** Two rates are about the same when the larger is at most so many times the smaller. */
const SAME_RATE = 1.25;
/** Two times are about the same within this share of the longer, or within four minutes. */
const SAME_TIME_SHARE = 0.15;
const SAME_TIME_MINUTES = 4;
const MOST_SENTENCES = 2;

type Level = ClimbTraits['levels'][number];

/**
 * Why two climbs are alike, in at most two plain sentences from what was read off both, the most
 * telling first. Only what is true of both is said; nothing, when nothing read off them agrees.
 */
export function whyAlike(one: ClimbTraits, other: ClimbTraits, units: Units): string[] {
  const unit = units.temperature;
  const stall = levelsAlike(one, other, ['stall', 'just-short'], 'level off', unit);
  const stay = stall ?? staysAlike(one, other, unit);
  return [
    stay,
    sagsAlike(one, other, unit),
    levelsAlike(one, other, ['pause'], 'wait', unit),
    // Where both stay at one level, that says more than the top does.
    stay === null ? topsAlike(one, other, unit) : null,
    holdsAlike(one, other, unit),
    levelsAlike(one, other, ['warm-up'], 'warm up', unit),
    ratesAlike(one, other, unit),
    stall !== null && isRacing(one, other) ? null : shapesAlike(one, other),
  ]
    .filter((sentence) => sentence !== null)
    .slice(0, MOST_SENTENCES);
}

const isRacing = (one: ClimbTraits, other: ClimbTraits): boolean =>
  one.shape === 'racing-then-creeping' && other.shape === 'racing-then-creeping';

/** "within 10 °C of 710 °C": a round level and how far the farther of two is from it. */
function nearWords(a: number, b: number, unit: TemperatureUnit): string {
  const [x, y] = [fromCelsius(a, unit), fromCelsius(b, unit)];
  const middle = Math.round((x + y) / 20) * 10;
  const off = Math.max(Math.abs(x - middle), Math.abs(y - middle));
  const within = Math.max(5, Math.ceil(off / 5 - 1e-9) * 5);
  return `within ${formatNumber(within)} °${unit} of ${formatTemperature(toCelsius(middle, unit), unit)}`;
}

const both = (a: number, b: number): string =>
  formatDuration(a) === formatDuration(b)
    ? formatDuration(a)
    : `${formatDuration(a)} and ${formatDuration(b)}`;

function levelsAlike(
  one: ClimbTraits,
  other: ClimbTraits,
  kinds: readonly Level['kind'][],
  verb: string,
  unit: TemperatureUnit,
  may: (a: Level, b: Level) => boolean = () => true,
): string | null {
  const of = (traits: ClimbTraits) => traits.levels.filter(({ kind }) => kinds.includes(kind));
  let best: { a: Level; b: Level; apart: number } | null = null;
  for (const a of of(one)) {
    for (const b of of(other)) {
      const apart = Math.abs(a.levelCelsius - b.levelCelsius);
      if (may(a, b) && apart <= SAME_LEVEL && apart < (best?.apart ?? Infinity))
        best = { a, b, apart };
    }
  }
  if (best === null) return null;
  const { a, b } = best;
  const start = verb === 'level off' && isRacing(one, other) ? ' after a fast start' : '';
  const stay = `, for ${both(a.minutes, b.minutes)}`;
  const end = a.then === 'shut-off' && b.then === 'shut-off' ? ', and are shut off there' : '';
  return `Both ${verb} ${nearWords(a.levelCelsius, b.levelCelsius, unit)}${start}${stay}${end}.`;
}

/** A stay that is a hold in one and a stall in the other is still a stay in both. */
function staysAlike(one: ClimbTraits, other: ClimbTraits, unit: TemperatureUnit): string | null {
  return levelsAlike(
    one,
    other,
    ['stall', 'just-short', 'hold', 'approach', 'pause'],
    'stay',
    unit,
    (a, b) => a.kind !== b.kind,
  );
}

function sagsAlike(one: ClimbTraits, other: ClimbTraits, unit: TemperatureUnit): string | null {
  for (const a of one.sags) {
    for (const b of other.sags) {
      if (Math.abs(a.topCelsius - b.topCelsius) > 2 * SAME_LEVEL) continue;
      const near = nearWords(a.topCelsius, b.topCelsius, unit);
      const drops = [a, b].map(({ dropCelsius }) => formatDifference(dropCelsius, unit));
      return `Both sag from ${near}, by ${[...new Set(drops)].join(' and ')}.`;
    }
  }
  return null;
}

function holdsAlike(one: ClimbTraits, other: ClimbTraits, unit: TemperatureUnit): string | null {
  if (one.hold === null || other.hold === null) return null;
  const apart = Math.abs(one.hold.levelCelsius - other.hold.levelCelsius);
  if (apart > SAME_LEVEL || !isSameTime(one.hold.minutes, other.hold.minutes)) return null;
  const near = nearWords(one.hold.levelCelsius, other.hold.levelCelsius, unit);
  return `Both hold ${near} for ${both(one.hold.minutes, other.hold.minutes)}.`;
}

const isSameTime = (a: number, b: number): boolean =>
  Math.abs(a - b) <= Math.max(SAME_TIME_MINUTES, SAME_TIME_SHARE * Math.max(a, b));

function topsAlike(one: ClimbTraits, other: ClimbTraits, unit: TemperatureUnit): string | null {
  if (Math.abs(one.peakCelsius - other.peakCelsius) > SAME_LEVEL) return null;
  const near = nearWords(one.peakCelsius, other.peakCelsius, unit);
  if (!isSameTime(one.peakMinute, other.peakMinute)) return `Both peak ${near}.`;
  return `Both peak ${near}, after ${both(one.peakMinute, other.peakMinute)}.`;
}

function ratesAlike(one: ClimbTraits, other: ClimbTraits, unit: TemperatureUnit): string | null {
  const [a, b] = [one.rate400To700, other.rate400To700];
  if (a === null || b === null || !(Math.min(a, b) > 0)) return null;
  if (Math.max(a, b) > SAME_RATE * Math.min(a, b)) return null;
  const rates = [...new Set([formatRate(a, unit), formatRate(b, unit)])].join(' and ');
  return `Both climb from ${formatTemperature(400, unit)} to ${formatTemperature(700, unit)} at ${rates}.`;
}

function shapesAlike(one: ClimbTraits, other: ClimbTraits): string | null {
  if (one.shape === null || one.shape !== other.shape) return null;
  switch (one.shape) {
    case 'racing-then-creeping':
      return 'Both race at first and then creep.';
    case 'stepped':
      return 'Both climb in steps.';
    case 'steady':
      return 'Both climb steadily.';
  }
}
