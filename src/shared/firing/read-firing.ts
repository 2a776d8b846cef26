import { GAS_FUELS } from '../vocabulary/kiln.ts';
import { assumptionsOf } from './assumptions.ts';
import { climbOf, fastestChange, longestGap, steepestBetween, waveringOf } from './climb.ts';
import { OVERSHOOT, REACHED_BELOW_AIM, SLOW_MINUTES } from './constants.ts';
import type { Course } from './course.ts';
import { courseOf } from './course.ts';
import {
  hundredsOf,
  minutesAtOrAbove,
  minutesBetween,
  paceOf,
  quartzCrossings,
} from './crossing.ts';
import { firstAtOrAbove, valueAt } from './curve.ts';
import { holdOf } from './hold.ts';
import { levellingOff } from './levelling-off.ts';
import { levelStretches } from './levels.ts';
import { probeTolerance } from './probe-tolerance.ts';
import { sagsOf } from './sags.ts';
import type { CoolingToDraw, FiringInput, FiringReading, LevelStretch } from './types.ts';
import { unevenHeat } from './uneven-heat.ts';

/**
 * Reads a firing off its record: pure, linear in the number of readings but for sorting them. All
 * temperatures °C, all times minutes of the record.
 * @returns null when fewer than three usable readings are left
 */
export function readFiring(input: FiringInput): FiringReading | null {
  const course = courseOf(input);
  if (course === null) return null;
  const { record, fine, shutOff, start } = course;
  const lastMinute = record.minutes[record.minutes.length - 1] ?? 0;
  const target = finiteOrNull(input.targetCelsius);
  const peak = peakOf(course);
  const aim = aimOf(input, target, peak.celsius);
  // Without a target a stay at the top is taken as meant, unless the author gave up.
  const nameAim = aim ?? (input.drawnBecause === 'gave-up' ? Infinity : peak.celsius);
  const firingPeak = fine.celsius.reduce((most, value) => Math.max(most, value), -Infinity);
  const pace = paceOf(fine, firingPeak);
  const reachedMinute = aim === null ? null : reachedAt(course, aim - REACHED_BELOW_AIM);
  const timeToTemperature = reachedMinute === null ? null : reachedMinute - start.minute;
  const levels = levelStretches(course, nameAim, pace, input.answers ?? []);
  const span400To700 = minutesBetween(fine, 400, 700);
  const topMinute = Math.min(reachedMinute ?? peak.minute, shutOff.minute);
  const overshoot = target === null ? 0 : peak.celsius - target;

  return {
    count: record.minutes.length,
    spanMinutes: lastMinute - (record.minutes[0] ?? 0),
    lastMinute,
    start,
    shutOff,
    aimCelsius: aim,
    peak,
    reachedMinute,
    timeToTemperatureMinutes: timeToTemperature,
    paceCelsiusPerMinute: pace,
    climb: climbOf(course, topMinute, levels),
    hundreds: hundredsOf(fine, firingPeak),
    quartzCrossings: quartzCrossings(course),
    rate400To700: span400To700 === null ? null : 300 / span400To700,
    levels,
    sags: sagsOf(course, nameAim),
    hold: Number.isFinite(nameAim) ? holdOf(course, nameAim, aim !== null) : null,
    overshootCelsius: overshoot >= OVERSHOOT - 1e-6 ? overshoot : null,
    slowClimbMinutes: slowClimb(input, timeToTemperature, reachedMinute, levels),
    unevenHeat: unevenHeat(course, input.secondProbe),
    // Where the fire is going is no question any more once it has been there.
    levellingOff:
      reachedMinute !== null
        ? null
        : levellingOff(
            record.minutes.subarray(0, course.to),
            record.celsius.subarray(0, course.to),
            course.marks,
            aim,
          ),
    minutesAboveAimLess50: aim === null ? null : timeAbove(course, aim - 50),
    waveringCelsius: waveringOf(course),
    probeToleranceCelsius: probeTolerance(input.probe, peak.celsius),
    coolingToDraw: coolingToDraw(course),
    celsiusAtShutOff: levelAt(course, shutOff.minute),
    steepest450To700: steepestBetween(course, 450, 700, topMinute),
    fastestPerMinute: fastestChange(course),
    longestGapMinutes: longestGap(course),
    setAsideCount: record.outsideCount + record.wildCount,
    assumed: assumptionsOf(course, input, aim),
  };
}

function finiteOrNull(value: number | null | undefined): number | null {
  return value != null && Number.isFinite(value) ? value : null;
}

/** Aim: the target; drawn by melt or cone, the lower of target and peak. */
function aimOf(input: FiringInput, target: number | null, peakCelsius: number): number | null {
  const isDrawnByEye = input.drawnBecause === 'melt' || input.drawnBecause === 'cone';
  if (!isDrawnByEye) return target;
  return target === null ? peakCelsius : Math.min(target, peakCelsius);
}

/**
 * Highest point of the curve from the start on, cooling included. Lines drawn on through a gap may
 * meet above every reading: no peak is higher than what was read.
 */
function peakOf(course: Course): { celsius: number; minute: number } {
  let celsius = -Infinity;
  let minute = 0;
  for (const curve of [course.fine, course.after]) {
    if (curve === null) continue;
    for (let i = 0; i < curve.minutes.length; i += 1) {
      const value = curve.celsius[i] ?? -Infinity;
      if (value > celsius) {
        celsius = value;
        minute = curve.minutes[i] ?? 0;
      }
    }
  }
  const highest = course.record.celsius.reduce((most, value) => Math.max(most, value), -Infinity);
  return { celsius: Math.min(celsius, highest), minute };
}

function reachedAt(course: Course, level: number): number | null {
  const inFiring = firstAtOrAbove(course.fine, level);
  if (inFiring !== null || course.after === null) return inFiring;
  return firstAtOrAbove(course.after, level);
}

function slowClimb(
  input: FiringInput,
  timeToTemperature: number | null,
  reachedMinute: number | null,
  levels: readonly LevelStretch[],
): number | null {
  const isAsked =
    input.fuel != null && GAS_FUELS.includes(input.fuel) && input.startClass === 'cold';
  if (!isAsked || timeToTemperature === null || reachedMinute === null) return null;
  const waited = levels
    .filter((level) => level.kind === 'warm-up' || level.kind === 'pause')
    .filter((level) => level.toMinute <= reachedMinute)
    .reduce((sum, level) => sum + level.minutes, 0);
  const minutes = timeToTemperature - waited;
  return minutes > SLOW_MINUTES ? minutes : null;
}

function firstDrawn(course: Course): number | null {
  const drawn = course.marks.filter((mark) => mark.kind === 'drawn').map((mark) => mark.minute);
  return drawn.length === 0 ? null : Math.min(...drawn);
}

/** Until the first piece is drawn, else to the record's end. */
function timeAbove(course: Course, level: number): number {
  const until = firstDrawn(course) ?? Infinity;
  return (
    minutesAtOrAbove(course.fine, level, until) +
    (course.after === null ? 0 : minutesAtOrAbove(course.after, level, until))
  );
}

function levelAt(course: Course, minute: number): number {
  const end = course.fine.minutes[course.fine.minutes.length - 1] ?? minute;
  return minute > end && course.after !== null
    ? valueAt(course.after, minute)
    : valueAt(course.fine, minute);
}

function coolingToDraw(course: Course): CoolingToDraw | null {
  const drawn = firstDrawn(course);
  const last = course.record.minutes[course.record.minutes.length - 1] ?? 0;
  if (drawn === null || drawn < course.shutOff.minute || drawn > last) return null;
  return {
    minutes: drawn - course.shutOff.minute,
    dropCelsius: levelAt(course, course.shutOff.minute) - levelAt(course, drawn),
  };
}
