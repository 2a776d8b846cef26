import { cleanReadings } from './clean-readings.ts';
import type { Reading } from './types.ts';

/** One point of a drawn record: [minute, °C]. */
export type StripPoint = [minute: number, celsius: number];

const STRIP_POINTS = 240;

/**
 * A record thinned for the glow strip and for lists: in order of time, wild and repeated readings
 * out, peaks and troughs kept, minutes to a hundredth and degrees to a tenth.
 */
export function stripSignature(
  readings: readonly Reading[],
  maxPoints: number = STRIP_POINTS,
): StripPoint[] {
  const record = cleanReadings(readings);
  const points = Array.from(record.minutes, (minute, i) => ({
    minute,
    celsius: record.celsius[i] ?? 0,
  }));
  return chartPoints(points, maxPoints).map(({ minute, celsius }) => [
    Math.round(minute * 100) / 100,
    Math.round(celsius * 10) / 10,
  ]);
}

/**
 * Thins a record for drawing without losing its extremes: the lowest and the highest reading of
 * each of even spans of time, in order of time, with the first and the last. Never more than `max`
 * points (at least 4); a record that short is returned as it is.
 */
export function chartPoints(readings: readonly Reading[], max: number): Reading[] {
  const most = Math.max(4, Math.floor(max));
  if (readings.length <= most) return [...readings];
  const first = readings[0];
  const last = readings[readings.length - 1];
  if (first === undefined || last === undefined) return [];
  const spans = Math.floor((most - 2) / 2);
  const width = (last.minute - first.minute) / spans;
  const out: Reading[] = [first];
  let span = -1;
  let low: number | null = null;
  let high: number | null = null;
  const flush = () => {
    if (low === null || high === null) return;
    for (const index of low === high ? [low] : [Math.min(low, high), Math.max(low, high)]) {
      const reading = readings[index];
      if (reading !== undefined) out.push(reading);
    }
  };
  for (let i = 1; i < readings.length - 1; i += 1) {
    const reading = readings[i];
    if (reading === undefined) continue;
    const at = width > 0 ? Math.floor((reading.minute - first.minute) / width) : 0;
    const own = Math.max(0, Math.min(spans - 1, at));
    if (own !== span) {
      flush();
      span = own;
      low = i;
      high = i;
      continue;
    }
    if (low === null || reading.celsius < (readings[low]?.celsius ?? Infinity)) low = i;
    if (high === null || reading.celsius > (readings[high]?.celsius ?? -Infinity)) high = i;
  }
  flush();
  out.push(last);
  return out;
}
