import { fToC, kToC } from '../units/temperature.ts';
import type { TemperatureUnit } from './parse-number.ts';

/** °C of a number in a unit. */
export function celsiusIn(value: number, unit: TemperatureUnit): number {
  return unit === 'F' ? fToC(value) : unit === 'K' ? kToC(value) : value;
}

const UNITS: readonly TemperatureUnit[] = ['C', 'F', 'K'];

/**
 * How common a unit is in loggers' files that name none. Common practice, no source: kelvin is a
 * laboratory's unit and its files usually say so.
 */
const COMMON: Readonly<Record<TemperatureUnit, number>> = { C: 1, F: 1, K: 0.5 };

function bell(value: number, middle: number, width: number): number {
  const off = (value - middle) / width;
  return Math.exp(-0.5 * off * off);
}

/** How likely a record begins at so many °C: at the air's temperature, or hot from the last firing. */
function startLikelihood(celsius: number): number {
  const fromAir = celsius < 7 ? 7 - celsius : Math.max(0, celsius - 40);
  const fromWarm = celsius < 100 ? 100 - celsius : Math.max(0, celsius - 240);
  const fromHot = celsius < 100 ? 100 - celsius : Math.max(0, celsius - 500);
  return (
    bell(fromAir, 0, 3.5) +
    0.2 * bell(celsius, 200, 30) +
    0.03 * bell(fromWarm, 0, 30) +
    0.0003 * bell(fromHot, 0, 30) +
    1e-7
  );
}

/** How likely a record's peak is so many °C: raku's 850 to 1050, else anything from 330 to 1200. */
function peakLikelihood(celsius: number): number {
  const outside = celsius < 330 ? 330 - celsius : Math.max(0, celsius - 1200);
  return bell(celsius, 960, 70) + 0.15 * bell(outside, 0, 50) + 1e-9;
}

/**
 * How likely a firing with this target peaks at so many °C: near it, often; short of it, when the kiln
 * levelled off; above it by more than an overshoot, hardly ever. Common practice, no source.
 */
function targetLikelihood(celsius: number, targetCelsius: number): number {
  const off = celsius - targetCelsius;
  const besides = off < 0 ? 0.03 * bell(off, 0, 150) : 0.02 * bell(off, 0, 100);
  return bell(off, 0, 30) + besides + 1e-9;
}

export interface GuessedUnit {
  readonly unit: TemperatureUnit;
  /** How much likelier it is than the next. */
  readonly odds: number;
  readonly next: TemperatureUnit;
}

/**
 * The unit of temperatures that name none, from where the record begins, its lowest and its highest
 * reading: in one unit only they are a room and a kiln, and a kiln that was to reach its target.
 */
export function guessUnit(
  start: number,
  low: number,
  high: number,
  targetCelsius: number | null = null,
): GuessedUnit {
  const weighed = UNITS.map((unit) => {
    const isPossible = celsiusIn(low, unit) > -45;
    const peak = celsiusIn(high, unit);
    const likelihood =
      COMMON[unit] *
      startLikelihood(celsiusIn(start, unit)) *
      (targetCelsius === null ? peakLikelihood(peak) : targetLikelihood(peak, targetCelsius));
    return { unit, weight: isPossible ? likelihood : 0 };
  }).sort((a, b) => b.weight - a.weight);
  const [first, second] = weighed;
  return {
    unit: first?.unit ?? 'C',
    odds: (first?.weight ?? 0) / Math.max(second?.weight ?? 0, 1e-300),
    next: second?.unit ?? 'F',
  };
}

/** The unit of the air's temperature, from its middle: a cold junction, a shed; null if it may be any. */
export function unitOfAir(middle: number): TemperatureUnit | null {
  if (middle >= 5 && middle <= 42) return 'C';
  if (middle >= 50 && middle <= 110) return 'F';
  return middle >= 265 && middle <= 318 ? 'K' : null;
}
