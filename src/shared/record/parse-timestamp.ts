import { clockMinutes } from './parse-clock.ts';
import { monthOfName, ZONE_MINUTES } from './record-words.ts';

/** In which order a date of figures is written; a four-figure year or a month's name shows itself. */
export type DateOrder = 'own' | 'dmy' | 'mdy' | 'ymd';

/** Longer than any date with time, zone and weekday. */
const LONGEST = 90;

/** Minutes since 1970 of a date with a time; of a date alone, its midnight. Null if unreadable. */
export function timestampMinutes(cell: string, order: DateOrder): number | null {
  if (cell.length < 6 || cell.length > LONGEST) return null;
  if (cell.length >= 19) {
    const plain = plainMinutes(cell, order);
    if (plain !== null) return plain;
  }
  const compact =
    /^(\d{4})(\d{2})(\d{2})(?:[T _-]?(\d{2})(\d{2})(\d{2})?(?:[.,]\d{1,9})?(Z)?)?$/.exec(cell);
  if (compact !== null) {
    const [, year, month, day, hour = '0', minute = '0', second = '0'] = compact;
    const time = clockMinutes(`${hour}:${minute}:${second}`, false);
    const days = dayNumber(Number(year), Number(month), Number(day));
    const isYear = Number(year) >= 1970 && Number(year) < 2100;
    return days === null || time === null || !isYear || time >= 1440 ? null : days * 1440 + time;
  }
  const { date, time, zone } = parted(cell);
  const days = dateDays(date, order);
  if (days === null) return null;
  if (time === '') return zone === '' ? days * 1440 : null;
  const minutes = clockMinutes(time, false);
  const ahead = zoneMinutes(zone);
  if (minutes === null || minutes < 0 || minutes >= 1441 || ahead === null) return null;
  return days * 1440 + minutes - ahead;
}

/** The two figures at a place; NaN for what is none. */
function twoAt(text: string, at: number): number {
  return isDigitAt(text, at) && isDigitAt(text, at + 1)
    ? (text.charCodeAt(at) - 48) * 10 + text.charCodeAt(at + 1) - 48
    : NaN;
}

/**
 * The usual timestamps, "2026-12-01T14:03:22", ".5" and "Z" behind it or not, and "01/12/2026 14:03:22":
 * most files have nothing else, and two hundred thousand of them are read fast. Null for any other.
 */
function plainMinutes(cell: string, order: DateOrder): number | null {
  const isYearFirst = !isSeparatorAt(cell, 2);
  if (!isYearFirst && (order === 'own' || order === 'ymd')) return null;
  const [one, two] = isYearFirst ? [4, 7] : [2, 5];
  if (!isSeparatorAt(cell, one) || cell.charCodeAt(two) !== cell.charCodeAt(one)) return null;
  const gap = cell.charAt(10);
  if ((gap !== 'T' && gap !== ' ') || cell.charAt(13) !== ':' || cell.charAt(16) !== ':')
    return null;
  const yearAt = isYearFirst ? 0 : 6;
  const year = twoAt(cell, yearAt) * 100 + twoAt(cell, yearAt + 2);
  const [early, late] = isYearFirst ? [5, 8] : [0, 3];
  const isDayLate = isYearFirst || order === 'mdy';
  const month = twoAt(cell, isDayLate ? early : late);
  const day = twoAt(cell, isDayLate ? late : early);
  const [hour, minute] = [twoAt(cell, 11), twoAt(cell, 14)];
  let second = twoAt(cell, 17);
  let end = cell.length;
  if (cell.charAt(end - 1) === 'Z') end -= 1;
  if (end > 19) {
    if (cell.charAt(19) !== '.' || end === 20) return null;
    let scale = 1;
    for (let i = 20; i < end; i += 1) {
      if (!isDigitAt(cell, i)) return null;
      scale /= 10;
      second += (cell.charCodeAt(i) - 48) * scale;
    }
  }
  const days = dayNumber(year, month, day);
  const isTime = hour < 24 && minute < 60 && second < 60;
  return days === null || !isTime ? null : days * 1440 + hour * 60 + minute + second / 60;
}

function isSeparatorAt(text: string, at: number): boolean {
  const char = text.charAt(at);
  return char === '-' || char === '/' || char === '.';
}

/** The date, the time and the zone of a timestamp, the time being what has a colon in it. */
function parted(cell: string): { date: string; time: string; zone: string } {
  const text = cell.trim().toLowerCase();
  const colon = text.indexOf(':');
  if (colon < 0) {
    // "01.12.2026 14.03.22": points between the figures of a time too; "14h03" likewise.
    const dotted = /^(.{6,30}?)[ t,]+(\d{1,2})[.h](\d{2})(?:[.m](\d{2}))?s?$/.exec(text);
    if (dotted === null) return { date: text, time: '', zone: '' };
    const [, date = '', hour = '', minute = '', second = '0'] = dotted;
    return { date, time: `${hour}:${minute}:${second}`, zone: '' };
  }
  let from = colon;
  while (from > 0 && isDigitAt(text, from - 1) && colon - from < 2) from -= 1;
  const before = text.slice(0, from);
  const behind = text.slice(from);
  const match = /^(\d{1,2}:\d{1,2}(?::\d{1,2})?(?:[.,:]\d{1,9})?(?: ?[ap]\.? ?m\b\.?)?)(.*)$/.exec(
    behind,
  );
  if (match === null) return { date: '', time: '', zone: '' };
  const time = match[1] ?? '';
  const rest = (match[2] ?? '').trim();
  const date = before.replace(/[t,_@;: -]+$/, '');
  // The time may stand first: "14:03:22 01/12/2026".
  return date.trim() === '' ? { date: rest, time, zone: '' } : { date, time, zone: rest };
}

function isDigitAt(text: string, at: number): boolean {
  const code = text.charCodeAt(at);
  return code >= 48 && code <= 57;
}

/** Minutes ahead of UTC of "Z", "+01:00", "-0500", "+2", "CEST", "utc+1", a name in brackets after one. */
function zoneMinutes(zone: string): number | null {
  const bracket = zone.search(/[[(]/);
  const text = (bracket < 0 ? zone : zone.slice(0, bracket)).trim();
  if (text === '' || text === 'z') return 0;
  const named = ZONE_MINUTES.get(text);
  if (named !== undefined) return named;
  const match = /^(?:utc|gmt|z)? ?([+−-])(\d{1,2}):?(\d{2})?$/.exec(text);
  if (match === null) {
    // Another zone's name: the same on every line, or else its lines would not be in order.
    return /^[a-z][a-z/_ ]{1,30}$/.test(text) ? 0 : null;
  }
  const minutes = Number(match[2]) * 60 + Number(match[3] ?? 0);
  return match[1] === '+' ? minutes : -minutes;
}

const WEEKDAYS =
  /^(?:mon|tue|wed|thu|fri|sat|sun|mo|di|mi|do|fr|sa|so|lun|mar|mer|jeu|ven|sam|dim)[a-zé]{0,8}\.?,? +(?=[0-9a-z])/;
/** For a month's name without a year: which one does not matter to minutes within it. */
const SOME_YEAR = 2000;

function dateDays(date: string, order: DateOrder): number | null {
  let text = date.trim();
  if (text.length < 5 || text.length > 40) return null;
  const figures = /^(\d{1,4})([-/. ])(\d{1,2})\2 ?(\d{1,4})\.?$/.exec(text);
  if (figures !== null) {
    return figureDays(figures[1] ?? '', figures[3] ?? '', figures[4] ?? '', order);
  }
  // A weekday in front, unless it is a month ("Mar 1" is March).
  const weekday = WEEKDAYS.exec(text);
  if (weekday !== null) {
    const rest = text.slice(weekday[0].length);
    if (!/^\d{1,2},? ?\d{0,4}$/.test(rest)) {
      if (/^[\d/. -]+$/.test(rest)) return dateDays(rest, order);
      text = rest;
    }
  }
  const dayFirst =
    /^(\d{1,4})(?:st|nd|rd|th|\.)?[-/. ]*([^\d\s\-/.,]{3,10})\.?[-/. ,]*(\d{0,4})$/.exec(text);
  if (dayFirst !== null) {
    const month = monthOfName(dayFirst[2] ?? '');
    const first = dayFirst[1] ?? '';
    const last = dayFirst[3] ?? '';
    if (month === null) return null;
    if (first.length === 4) return dayNumber(Number(first), month, Number(last));
    return dayNumber(last === '' ? SOME_YEAR : fullYear(last), month, Number(first));
  }
  const monthFirst =
    /^([^\d\s\-/.,]{3,10})\.?[-/. ]*(\d{1,2})(?:st|nd|rd|th)?[-/. ,]*(\d{4}|\d{2})?$/.exec(text);
  if (monthFirst === null) return null;
  const month = monthOfName(monthFirst[1] ?? '');
  const year = monthFirst[3];
  return month === null
    ? null
    : dayNumber(year === undefined ? SOME_YEAR : fullYear(year), month, Number(monthFirst[2]));
}

function figureDays(a: string, b: string, c: string, order: DateOrder): number | null {
  if (a.length >= 3) return dayNumber(Number(a), Number(b), Number(c));
  if (order === 'own') return null;
  if (order === 'ymd') {
    return a.length === 2 && c.length <= 2 ? dayNumber(fullYear(a), Number(b), Number(c)) : null;
  }
  if (c.length === 3 || c.length === 1) return null;
  const [day, month] = order === 'dmy' ? [a, b] : [b, a];
  return dayNumber(fullYear(c), Number(month), Number(day));
}

function fullYear(text: string): number {
  return text.length > 2 ? Number(text) : 2000 + Number(text);
}

const DAYS_IN_MONTH = [31, 29, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];

/** Days from 1 January 1970 in the Gregorian calendar, leap years by counting from March; null for no day. */
function dayNumber(year: number, month: number, day: number): number | null {
  if (!(year >= 1 && year <= 9999 && month >= 1 && month <= 12 && day >= 1)) return null;
  if (day > (DAYS_IN_MONTH[month - 1] ?? 0)) return null;
  const isLeap = year % 4 === 0 && (year % 100 !== 0 || year % 400 === 0);
  if (month === 2 && day === 29 && !isLeap) return null;
  const y = month <= 2 ? year - 1 : year;
  const era = Math.floor(y / 400);
  const yearOfEra = y - era * 400;
  const dayOfYear = Math.floor((153 * (month + (month > 2 ? -3 : 9)) + 2) / 5) + day - 1;
  const dayOfEra =
    yearOfEra * 365 + Math.floor(yearOfEra / 4) - Math.floor(yearOfEra / 100) + dayOfYear;
  return era * 146097 + dayOfEra - 719468;
}
