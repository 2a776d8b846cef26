import { leadingNumber } from './parse-number.ts';

/** How a record's time column is written. Clock times pass midnight by themselves. */
export const TIME_FORMATS = [
  'minutes',
  'seconds',
  'milliseconds',
  'hours',
  'days',
  'h:mm:ss',
  'h:mm',
  'm:ss',
  'timestamp',
  'timestamp-dmy',
  'timestamp-mdy',
] as const;
export type TimeFormat = (typeof TIME_FORMATS)[number];

const MINUTES_IN: Partial<Record<TimeFormat, number>> = {
  minutes: 1,
  seconds: 1 / 60,
  milliseconds: 1 / 60_000,
  hours: 60,
  days: 1440,
};

const TIME_WORDS: Record<string, TimeFormat> = {
  s: 'seconds',
  sec: 'seconds',
  secs: 'seconds',
  second: 'seconds',
  seconds: 'seconds',
  sek: 'seconds',
  ms: 'milliseconds',
  msec: 'milliseconds',
  milliseconds: 'milliseconds',
  min: 'minutes',
  mins: 'minutes',
  minute: 'minutes',
  minutes: 'minutes',
  m: 'minutes',
  h: 'hours',
  hr: 'hours',
  hrs: 'hours',
  hour: 'hours',
  hours: 'hours',
  std: 'hours',
  d: 'days',
  day: 'days',
  days: 'days',
};

/** The time unit a word stands for; null for none. */
export function timeUnit(word: string): TimeFormat | null {
  const key = word.toLowerCase();
  return Object.hasOwn(TIME_WORDS, key) ? (TIME_WORDS[key] ?? null) : null;
}

/** Farther than this no time of a record lies, minutes: the year 9999, counted from 1970, with room. */
const FARTHEST = 1e10;

/** Minutes of a time cell, since zero, midnight or 1970 as its format has it; null if unreadable. */
export function parseTime(cell: string, format: TimeFormat, decimal: '.' | ','): number | null {
  const minutes = minutesOf(cell, format, decimal);
  return minutes !== null && Math.abs(minutes) <= FARTHEST ? minutes : null;
}

function minutesOf(cell: string, format: TimeFormat, decimal: '.' | ','): number | null {
  const perUnit = MINUTES_IN[format];
  if (perUnit !== undefined) {
    const number = leadingNumber(cell, decimal);
    if (number === null) return null;
    if (number.rest !== '' && timeUnit(number.rest) !== format) return null;
    return number.value * perUnit;
  }
  if (format === 'h:mm:ss' || format === 'h:mm' || format === 'm:ss') {
    return clockMinutes(cell, format === 'm:ss');
  }
  return timestampMinutes(cell, format);
}

/** Whether a format counts from midnight and so begins again after 24 hours. */
export function isClock(format: TimeFormat): boolean {
  return format === 'h:mm:ss' || format === 'h:mm';
}

/** "1:02:03", "0:12" (hours and minutes, or minutes and seconds), "1:02:03.5", "2:15 pm". */
function clockMinutes(cell: string, isMinuteFirst: boolean): number | null {
  let text = cell.trim().toLowerCase();
  let half: 'am' | 'pm' | null = null;
  if (text.endsWith('am') || text.endsWith('pm')) {
    half = text.endsWith('am') ? 'am' : 'pm';
    text = text.slice(0, -2).trim();
  }
  const isNegative = text.startsWith('-') || text.startsWith('−');
  if (isNegative) text = text.slice(1);
  const parts = text.split(':', 4).map((part) => unsigned(part));
  if (parts.length < 2 || parts.length > 3 || parts.some((part) => part === null)) return null;
  const [first = 0, second = 0, third = 0] = parts.map((part) => part ?? 0);
  if (second >= 60 || third >= 60) return null;
  const isMinuteSecond = isMinuteFirst && parts.length === 2;
  let hour = first;
  if (half !== null) {
    if (hour < 1 || hour > 12) return null;
    hour = (hour % 12) + (half === 'pm' ? 12 : 0);
  }
  const minutes = isMinuteSecond ? first + second / 60 : hour * 60 + second + third / 60;
  return isNegative ? -minutes : minutes;
}

function unsigned(text: string): number | null {
  const first = text.charCodeAt(0);
  if (!(first >= 48 && first <= 57)) return null;
  const number = leadingNumber(text, text.includes(',') ? ',' : '.');
  return number === null || number.rest !== '' ? null : number.value;
}

/** ISO and local timestamps: a date by "-", "/" or ".", a time behind "T" or a space, an offset. */
function timestampMinutes(cell: string, format: TimeFormat): number | null {
  const text = cell.trim().replace('T', ' ');
  const space = text.indexOf(' ');
  const datePart = space < 0 ? text : text.slice(0, space);
  const separator = ['-', '/', '.'].find((char) => datePart.includes(char));
  if (separator === undefined) return null;
  const numbers = datePart.split(separator, 4).map((part) => unsigned(part));
  if (numbers.length !== 3) return null;
  const [a, b, c] = numbers;
  if (a == null || b == null || c == null) return null;
  const isYearFirst = a > 31;
  if (format === 'timestamp' && !isYearFirst) return null;
  const isDayFirst = !isYearFirst && format === 'timestamp-dmy';
  const year = isYearFirst ? a : c < 100 ? 2000 + c : c;
  const month = isYearFirst ? b : isDayFirst ? b : a;
  const day = isYearFirst ? c : isDayFirst ? a : b;
  if (![year, month, day].every(Number.isInteger) || year > 9999) return null;
  if (month < 1 || month > 12 || day < 1 || day > 31) return null;
  const time = space < 0 ? 0 : timeWithOffset(text.slice(space + 1));
  return time === null ? null : daysSince1970(year, month, day) * 1440 + time;
}

function timeWithOffset(text: string): number | null {
  let time = text.trim();
  let offset = 0;
  if (time.toLowerCase().endsWith('z')) time = time.slice(0, -1);
  const sign = Math.max(time.lastIndexOf('+'), time.lastIndexOf('-'));
  if (sign > 0) {
    const hours = time.slice(sign + 1);
    const ahead = hours.includes(':') ? clockMinutes(hours, false) : wholeOffset(hours);
    if (ahead === null) return null;
    offset = time.charAt(sign) === '-' ? -ahead : ahead;
    time = time.slice(0, sign);
  }
  const minutes = clockMinutes(time, false);
  return minutes === null || minutes >= 1441 ? null : minutes - offset;
}

function wholeOffset(text: string): number | null {
  const value = unsigned(text);
  if (value === null) return null;
  return text.length <= 2 ? value * 60 : Math.floor(value / 100) * 60 + (value % 100);
}

/** Days from 1 January 1970 in the Gregorian calendar, leap years by counting from March. */
function daysSince1970(year: number, month: number, day: number): number {
  const y = month <= 2 ? year - 1 : year;
  const era = Math.floor(y / 400);
  const yearOfEra = y - era * 400;
  const dayOfYear = Math.floor((153 * (month + (month > 2 ? -3 : 9)) + 2) / 5) + day - 1;
  const dayOfEra =
    yearOfEra * 365 + Math.floor(yearOfEra / 4) - Math.floor(yearOfEra / 100) + dayOfYear;
  return era * 146097 + dayOfEra - 719468;
}
