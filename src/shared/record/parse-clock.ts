import { leadingNumber } from './parse-number.ts';
import { timeUnit } from './record-words.ts';
import type { TimeUnit } from './parse-time.ts';

const MINUTES_IN_UNIT: Readonly<Record<TimeUnit, number>> = {
  milliseconds: 1 / 60_000,
  seconds: 1 / 60,
  minutes: 1,
  hours: 60,
  days: 1440,
};

/** A number without a sign, by point or comma; null for anything else. */
function unsigned(text: string): number | null {
  const first = text.charCodeAt(0);
  if (!(first >= 48 && first <= 57)) return null;
  const number = leadingNumber(text, text.includes(',') ? ',' : '.');
  return number === null || number.rest !== '' ? null : number.value;
}

/** "am", "a.m.", "AM", "p" behind a time: taken off, with what is left before it. */
function withoutHalf(text: string): { text: string; half: 'am' | 'pm' | null } {
  const match = /^(.*?\d) ?([ap])(?:\.? ?m\.?)?$/.exec(text);
  if (match === null) return { text, half: null };
  return { text: match[1] ?? '', half: match[2] === 'a' ? 'am' : 'pm' };
}

/**
 * Minutes of "1:02:03", "0:12" (hours and minutes, or minutes and seconds), "1:02:03.5", "1:02:03:500",
 * "2:15 pm", "3 days 01:02:03", "1.01:02:03", "1d 2h 3m 4s", "PT1H2M"; null for anything else.
 * @param isMinuteFirst two parts are minutes and seconds
 */
export function clockMinutes(cell: string, isMinuteFirst: boolean): number | null {
  if (cell.length > 40) return null;
  const trimmed = cell.trim().toLowerCase();
  const isNegative = trimmed.startsWith('-') || trimmed.startsWith('−');
  const signless = isNegative || trimmed.startsWith('+') ? trimmed.slice(1) : trimmed;
  const { text, half } = withoutHalf(signless);
  const minutes = text.includes(':')
    ? colonMinutes(text, half, isMinuteFirst)
    : half === null
      ? spelledMinutes(text)
      : null;
  return minutes === null ? null : isNegative ? -minutes : minutes;
}

function colonMinutes(
  whole: string,
  half: 'am' | 'pm' | null,
  isMinuteFirst: boolean,
): number | null {
  let text = whole;
  let days = 0;
  const dayed = /^(\d{1,5})(?:\.| ?d(?:ays?)?,? ?| )(\d{1,2}:.*)$/.exec(text);
  if (dayed !== null) {
    days = Number(dayed[1]);
    text = dayed[2] ?? '';
  }
  const words = text.split(':', 5);
  const last = words[words.length - 1] ?? '';
  if (words.length === 4) {
    // Three digits behind a third colon are milliseconds; else the first part counts days.
    if (last.length === 3) words.splice(2, 2, `${words[2] ?? ''}.${last}`);
    else {
      const day = unsigned(words.shift() ?? '');
      if (day === null || dayed !== null) return null;
      days = day;
    }
  }
  if (words.length < 2 || words.length > 3) return null;
  const [first, second, third = 0] = words.map((part) => unsigned(part));
  if (first == null || second == null || third == null) return null;
  if (second >= 60 || third >= 60) return null;
  if (isMinuteFirst && words.length === 2) return days * 1440 + first + second / 60;
  let hour = first;
  if (half !== null) {
    // "13:05 PM" is written by some loggers; the half then adds nothing.
    if (hour > 23) return null;
    if (hour <= 12) hour = (hour % 12) + (half === 'pm' ? 12 : 0);
  }
  return days * 1440 + hour * 60 + second + third / 60;
}

/** "1h 02m 03s", "90 min 30 s", "PT1H2M3.5S"; a single number with its unit is no clock. */
function spelledMinutes(text: string): number | null {
  let rest = text.startsWith('pt') ? text.slice(2) : text;
  let minutes = 0;
  let parts = 0;
  while (rest !== '') {
    const match = /^(\d{1,9}(?:[.,]\d{1,9})?) ?([a-z]{1,12}) ?/.exec(rest);
    const unit = match === null ? null : timeUnit(match[2] ?? '');
    if (match === null || unit === null) return null;
    minutes += (unsigned(match[1] ?? '') ?? 0) * MINUTES_IN_UNIT[unit];
    rest = rest.slice(match[0].length);
    parts += 1;
  }
  return parts > 1 || (parts === 1 && text.startsWith('pt')) ? minutes : null;
}
