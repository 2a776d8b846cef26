import { cleanReadings } from './clean-readings.ts';
import { FEWEST_READINGS, UNEVEN_ABOVE, UNEVEN_CELSIUS, UNEVEN_MINUTES } from './constants.ts';
import type { Course } from './course.ts';
import { curveAlong, valueAt } from './curve.ts';
import { pointsOf } from './points.ts';
import { scatterOf } from './scatter.ts';
import { cornersOf } from './straight-stretches.ts';
import type { ProbeSpread, Reading } from './types.ts';

/** The second probe says nothing across a silence longer than this, minutes. */
const LONGEST_SILENCE = 10;

/**
 * The longest time during the firing for which two probes stood more than 40 °C apart while the
 * hotter was above 600 °C; null unless it lasted at least 5 min.
 */
export function unevenHeat(
  course: Course,
  secondProbe: readonly Reading[] | null | undefined,
): ProbeSpread | null {
  if (secondProbe == null) return null;
  const record = cleanReadings(secondProbe);
  const n = record.minutes.length;
  if (n < FEWEST_READINGS) return null;
  const corners = cornersOf(pointsOf(record, scatterOf(record.minutes, record.celsius)));
  const second = curveAlong(
    corners,
    record.minutes[0] ?? 0,
    record.minutes[n - 1] ?? 0,
    course.fine.stepMinutes,
  );
  const { minutes, celsius } = course.fine;
  let best: ProbeSpread | null = null;
  let from: number | null = null;
  let largest = 0;
  let next = 0;
  for (let i = 0; i <= minutes.length; i += 1) {
    const at = minutes[i] ?? Infinity;
    while (next < n && (record.minutes[next] ?? 0) < at) next += 1;
    const before = record.minutes[Math.max(0, next - 1)] ?? 0;
    const isHeard =
      next < n && before <= at + 1e-9 && (record.minutes[next] ?? 0) - before <= LONGEST_SILENCE;
    const other = isHeard ? valueAt(second, at) : 0;
    const own = celsius[i] ?? 0;
    const apart = Math.abs(own - other);
    if (isHeard && apart > UNEVEN_CELSIUS && Math.max(own, other) > UNEVEN_ABOVE) {
      from ??= at;
      largest = Math.max(largest, apart);
      continue;
    }
    const to = minutes[i - 1] ?? 0;
    if (from !== null && to - from >= UNEVEN_MINUTES - 1e-6) {
      if (best === null || to - from > best.toMinute - best.fromMinute) {
        best = { fromMinute: from, toMinute: to, largestCelsius: largest };
      }
    }
    from = null;
    largest = 0;
  }
  return best;
}
