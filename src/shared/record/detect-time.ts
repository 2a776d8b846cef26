import { parseNumber } from './parse-number.ts';
import type { TimeFormat } from './parse-time.ts';
import { parseTime } from './parse-time.ts';

/** Steeper than this, °C a unit of time, over ten readings: the unit is no second. */
const TOO_STEEP_FOR_SECONDS = 2;
const FORMATS: readonly TimeFormat[] = ['timestamp', 'timestamp-dmy', 'timestamp-mdy', 'h:mm:ss'];

export interface DetectedTime {
  readonly format: TimeFormat;
  readonly assumed: string | null;
}

/**
 * The format of a time column from its cells, its named unit and, for bare numbers, how fast the
 * temperature beside it would climb. `null` when the cells are no times.
 */
export function detectTime(
  cells: readonly string[],
  named: TimeFormat | null,
  celsius: readonly (number | null)[],
  decimal: '.' | ',',
): DetectedTime | null {
  const filled = cells.filter((cell) => cell !== '');
  if (filled.length === 0) return null;
  const isReadAs = (format: TimeFormat) =>
    filled.filter((cell) => parseTime(cell, format, decimal) !== null).length >=
    0.9 * filled.length;
  const numbers = cells.map((cell) => parseNumber(cell, decimal));
  if (numbers.filter((value) => value !== null).length >= 0.9 * filled.length) {
    if (named !== null) return { format: named, assumed: null };
    return guessUnit(numbers, celsius);
  }
  if (named !== null && isReadAs(named)) return { format: named, assumed: null };
  for (const unit of ['minutes', 'seconds', 'hours'] as const) {
    if (isReadAs(unit)) return { format: unit, assumed: null };
  }
  const readable = FORMATS.filter((format) => isReadAs(format));
  if (readable.includes('timestamp')) return { format: 'timestamp', assumed: null };
  if (readable.includes('timestamp-dmy') && readable.includes('timestamp-mdy')) {
    return isMonthFirst(filled, decimal)
      ? {
          format: 'timestamp-mdy',
          assumed:
            'The dates are read as month, day, year: read the other way the record would jump.',
        }
      : { format: 'timestamp-dmy', assumed: 'The dates are read as day, month, year.' };
  }
  const format = readable[0];
  if (format === undefined) return null;
  return format === 'h:mm:ss' ? detectClock(filled) : { format, assumed: null };
}

function isMonthFirst(cells: readonly string[], decimal: '.' | ','): boolean {
  const longest = (format: TimeFormat): number => {
    let most = 0;
    let before: number | null = null;
    for (const cell of cells) {
      const at = parseTime(cell, format, decimal);
      if (at !== null && before !== null) most = Math.max(most, Math.abs(at - before));
      before = at ?? before;
    }
    return most;
  };
  return longest('timestamp-mdy') < longest('timestamp-dmy');
}

function detectClock(cells: readonly string[]): DetectedTime {
  if (cells.some((cell) => cell.split(':', 3).length === 3))
    return { format: 'h:mm:ss', assumed: null };
  const isBeyondDay = cells.some((cell) => (parseTime(cell, 'h:mm', '.') ?? 0) >= 24 * 60);
  return isBeyondDay
    ? { format: 'm:ss', assumed: 'Times such as 35:20 are read as minutes and seconds.' }
    : { format: 'h:mm', assumed: 'Times such as 0:12 are read as hours and minutes.' };
}

function guessUnit(
  times: readonly (number | null)[],
  celsius: readonly (number | null)[],
): DetectedTime {
  const steepest: number[] = [];
  const apart = Math.max(1, Math.min(10, Math.floor(times.length / 4)));
  for (let i = apart; i < times.length; i += 1) {
    const t0 = times[i - apart];
    const t1 = times[i];
    const y0 = celsius[i - apart];
    const y1 = celsius[i];
    if (t0 == null || t1 == null || y0 == null || y1 == null || t1 <= t0) continue;
    steepest.push((y1 - y0) / (t1 - t0));
  }
  steepest.sort((a, b) => a - b);
  const steep = steepest[Math.floor(0.9 * (steepest.length - 1))] ?? Infinity;
  const first = times.find((value) => value !== null) ?? 0;
  const last = times.findLast((value) => value !== null) ?? 0;
  const isLong = last - first > 100;
  return isLong && steep < TOO_STEEP_FOR_SECONDS
    ? {
        format: 'seconds',
        assumed:
          'The time column names no unit; it is taken as seconds, by how fast the temperature climbs.',
      }
    : { format: 'minutes', assumed: 'The time column names no unit; it is taken as minutes.' };
}
