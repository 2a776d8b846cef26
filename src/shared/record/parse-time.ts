import { clockMinutes } from './parse-clock.ts';
import { leadingNumber } from './parse-number.ts';
import { timestampMinutes } from './parse-timestamp.ts';
import { timeUnit } from './record-words.ts';

/** Units a bare number of a time column may be in. Since 1970 or 1900 they count as well as since zero. */
export const TIME_UNITS = ['minutes', 'seconds', 'milliseconds', 'hours', 'days'] as const;
export type TimeUnit = (typeof TIME_UNITS)[number];

/** How a record's time column is written. Clock times pass midnight by themselves. */
export const TIME_FORMATS = [
  ...TIME_UNITS,
  'h:mm:ss',
  'h:mm',
  'm:ss',
  'timestamp',
  'timestamp-dmy',
  'timestamp-mdy',
  'timestamp-ymd',
] as const;
export type TimeFormat = (typeof TIME_FORMATS)[number];

/** Farther than this no time of a record lies, minutes: the year 9999, counted from 1970, with room. */
const FARTHEST = 1e10;

/** Minutes of a time cell, since zero, midnight or 1970 as its format has it; null if unreadable. */
export function parseTime(cell: string, format: TimeFormat, decimal: '.' | ','): number | null {
  const minutes = minutesOf(cell, format, decimal);
  return minutes !== null && Math.abs(minutes) <= FARTHEST ? minutes : null;
}

function minutesOf(cell: string, format: TimeFormat, decimal: '.' | ','): number | null {
  switch (format) {
    case 'minutes':
      return counted(cell, format, decimal, 1);
    case 'seconds':
      return counted(cell, format, decimal, 1 / 60);
    case 'milliseconds':
      return counted(cell, format, decimal, 1 / 60_000);
    case 'hours':
      return counted(cell, format, decimal, 60);
    case 'days':
      return counted(cell, format, decimal, 1440);
    case 'h:mm:ss':
    case 'h:mm':
      return clockMinutes(cell, false);
    case 'm:ss':
      return clockMinutes(cell, true);
    case 'timestamp':
      return timestampMinutes(cell, 'own');
    case 'timestamp-dmy':
      return timestampMinutes(cell, 'dmy');
    case 'timestamp-mdy':
      return timestampMinutes(cell, 'mdy');
    case 'timestamp-ymd':
      return timestampMinutes(cell, 'ymd');
  }
}

function counted(cell: string, unit: TimeUnit, decimal: '.' | ',', perUnit: number): number | null {
  const number = leadingNumber(cell, decimal);
  if (number === null) return null;
  if (number.rest !== '' && timeUnit(number.rest) !== unit) return null;
  return number.value * perUnit;
}

/** Whether a format is a date with its time. */
export function isTimestamp(format: TimeFormat): boolean {
  return format.startsWith('timestamp');
}

/** Whether a format counts from midnight and so begins again after 24 hours. */
export function isClock(format: TimeFormat): boolean {
  return format === 'h:mm:ss' || format === 'h:mm';
}
