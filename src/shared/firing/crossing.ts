import { PACE_BAND, PACE_FROM, QUARTZ_FROM, QUARTZ_TO } from './constants.ts';
import { confidenceOf } from './confidence.ts';
import type { Course } from './course.ts';
import type { Curve } from './curve.ts';
import { firstAtOrAbove, valueAt } from './curve.ts';
import { quantile } from '../statistics/quantile.ts';
import type { QuartzCrossing } from './types.ts';

/**
 * Every climb through the quartz inversion by the pyrometer: from the last upward crossing of
 * 550 °C before 600 °C to 600 °C. A record that begins above 550 °C shows none.
 */
export function quartzCrossings(course: Course): QuartzCrossing[] {
  const { fine } = course;
  const crossings: QuartzCrossing[] = [];
  let from: number | null = null;
  for (let i = 1; i < fine.minutes.length; i += 1) {
    const before = fine.celsius[i - 1] ?? 0;
    const now = fine.celsius[i] ?? 0;
    if (before < QUARTZ_FROM && now >= QUARTZ_FROM) from = crossingMinute(fine, i, QUARTZ_FROM);
    if (from !== null && before < QUARTZ_TO && now >= QUARTZ_TO) {
      const to = crossingMinute(fine, i, QUARTZ_TO);
      const minutes = to - from;
      if (minutes > 0) {
        crossings.push({
          fromMinute: from,
          toMinute: to,
          minutes,
          ratePerMinute: (QUARTZ_TO - QUARTZ_FROM) / minutes,
          confidence: confidenceOf(course, from, to, QUARTZ_TO - QUARTZ_FROM),
        });
      }
      from = null;
    }
  }
  return crossings;
}

function crossingMinute(curve: Curve, i: number, level: number): number {
  const t0 = curve.minutes[i - 1] ?? 0;
  const t1 = curve.minutes[i] ?? t0;
  const y0 = curve.celsius[i - 1] ?? 0;
  const y1 = curve.celsius[i] ?? y0;
  return y1 === y0 ? t1 : t0 + ((level - y0) / (y1 - y0)) * (t1 - t0);
}

/** Minutes from the first crossing of a level to that of a higher one; null unless both are climbed through. */
export function minutesBetween(fine: Curve, fromCelsius: number, toCelsius: number): number | null {
  if ((fine.celsius[0] ?? 0) > fromCelsius) return null;
  const from = firstAtOrAbove(fine, fromCelsius);
  const to = firstAtOrAbove(fine, toCelsius);
  return from === null || to === null || to <= from ? null : to - from;
}

/**
 * Pace, °C/min: the median, over the 25 °C bands from 150 °C (or the start, if hotter) to
 * peak − 25 °C, of 25 ÷ the minutes to climb the band the first time. Null without a whole band.
 */
export function paceOf(fine: Curve, peakCelsius: number): number | null {
  const first = fine.celsius[0] ?? 0;
  const from = Math.max(PACE_FROM, first);
  const rates: number[] = [];
  let before = firstAtOrAbove(fine, from);
  for (let low = from; low + PACE_BAND <= peakCelsius - PACE_BAND + 1e-9; low += PACE_BAND) {
    const next = firstAtOrAbove(fine, low + PACE_BAND, before ?? -Infinity);
    if (before === null || next === null) break;
    if (next > before) rates.push(PACE_BAND / (next - before));
    before = next;
  }
  return quantile(rates, 0.5);
}

/** Minutes taken for each whole hundred degrees climbed the first time, up to the peak. */
export function hundredsOf(
  fine: Curve,
  peakCelsius: number,
): { fromCelsius: number; minutes: number }[] {
  const hundreds: { fromCelsius: number; minutes: number }[] = [];
  const lowest = Math.ceil((fine.celsius[0] ?? 0) / 100) * 100;
  for (let low = lowest; low + 100 <= peakCelsius; low += 100) {
    const minutes = minutesBetween(fine, low, low + 100);
    if (minutes !== null) hundreds.push({ fromCelsius: low, minutes });
  }
  return hundreds;
}

/** Minutes the curve spends at or above a level. */
export function minutesAtOrAbove(curve: Curve, celsius: number, untilMinute = Infinity): number {
  let minutes = 0;
  for (let i = 1; i < curve.minutes.length; i += 1) {
    const t0 = curve.minutes[i - 1] ?? 0;
    const t1 = Math.min(curve.minutes[i] ?? t0, untilMinute);
    if (t1 <= t0) break;
    const y0 = curve.celsius[i - 1] ?? 0;
    const y1 = valueAt(curve, t1);
    if (y0 >= celsius && y1 >= celsius) minutes += t1 - t0;
    else if (y0 < celsius !== y1 < celsius) {
      minutes += (t1 - t0) * ((Math.max(y0, y1) - celsius) / Math.abs(y1 - y0));
    }
  }
  return minutes;
}
