import { isDegreeSign, temperatureUnit } from './record-words.ts';

const ZERO = 48;
const NINE = 57;

/** A number at the beginning of a cell, and what stands behind it. */
export interface LeadingNumber {
  readonly value: number;
  readonly rest: string;
}

function isDigit(code: number): boolean {
  return code >= ZERO && code <= NINE;
}

/**
 * Reads the number a cell begins with, one character at a time. Thousands may be set apart by the
 * other separator, an apostrophe or a blank, in groups of three. `null` for no number.
 */
export function leadingNumber(cell: string, decimal: '.' | ','): LeadingNumber | null {
  const plain = plainNumber(cell, decimal);
  if (plain !== null) return { value: plain, rest: '' };
  const text = cell.trim();
  const thousands = decimal === '.' ? ',' : '.';
  let at = 0;
  let digits = '';
  const sign = text.charAt(0);
  if (sign === '-' || sign === '−' || sign === '+') {
    digits = sign === '+' ? '' : '-';
    at = 1;
  }
  const first = at;
  let whole = 0;
  for (;;) {
    const char = text.charAt(at);
    if (isDigit(text.charCodeAt(at))) {
      digits += char;
      whole += 1;
      at += 1;
    } else if (
      (char === thousands || isThousandsSign(char)) &&
      whole > 0 &&
      isGroup(text, at + 1, first)
    ) {
      at += 1;
    } else break;
  }
  let fraction = 0;
  if (text.charAt(at) === decimal) {
    let next = at + 1;
    let part = '';
    while (isDigit(text.charCodeAt(next))) {
      part += text.charAt(next);
      next += 1;
    }
    fraction = part.length;
    if (whole + fraction > 0) {
      digits += `${whole === 0 ? '0' : ''}.${part}`;
      at = next;
    }
  }
  if (whole + fraction === 0) return null;
  const exponent = exponentAt(text, at);
  digits += exponent;
  at += exponent.length;
  const value = Number(digits.endsWith('.') ? digits.slice(0, -1) : digits);
  return Number.isFinite(value) ? { value, rest: text.slice(at).trim() } : null;
}

/** Apostrophes and blanks of every width; a plain blank too, since a table's cells are parted before. */
function isThousandsSign(char: string): boolean {
  return char !== '' && "'’ \u00a0\u202f\u2009".includes(char);
}

/** The usual number, digits with one decimal sign at most: most of a file, so it is read fast. */
function plainNumber(cell: string, decimal: '.' | ','): number | null {
  const { length } = cell;
  if (length === 0 || length > 15) return null;
  let at = cell.charCodeAt(0) === 45 ? 1 : 0;
  let whole = 0;
  let digits = 0;
  let scale = 0;
  for (; at < length; at += 1) {
    const code = cell.charCodeAt(at);
    if (isDigit(code)) {
      whole = whole * 10 + (code - ZERO);
      digits += 1;
      scale *= 10;
    } else if (scale === 0 && cell.charAt(at) === decimal) scale = 1;
    else return null;
  }
  if (digits === 0) return null;
  const value = scale > 1 ? whole / scale : whole;
  return cell.charCodeAt(0) === 45 ? 0 - value : value;
}

/** Three digits and then no fourth: a group of thousands; the first group has at most three. */
function isGroup(text: string, at: number, first: number): boolean {
  const isThree = [0, 1, 2].every((i) => isDigit(text.charCodeAt(at + i)));
  const before = at - 1 - first;
  const isFirst = before <= 3 && text.charCodeAt(first) !== ZERO;
  const isLater = before > 3 && !isDigit(text.charCodeAt(at - 5));
  return isThree && !isDigit(text.charCodeAt(at + 3)) && (isFirst || isLater);
}

function exponentAt(text: string, at: number): string {
  const letter = text.charAt(at);
  if (letter !== 'e' && letter !== 'E') return '';
  let next = at + 1;
  const sign = text.charAt(next);
  if (sign === '+' || sign === '-') next += 1;
  const digitsFrom = next;
  while (isDigit(text.charCodeAt(next)) && next - digitsFrom < 4) next += 1;
  return next > digitsFrom ? text.slice(at, next) : '';
}

/** A cell that is a number and nothing else; null otherwise. */
export function parseNumber(cell: string, decimal: '.' | ','): number | null {
  const number = leadingNumber(cell, decimal);
  return number === null || number.rest !== '' ? null : number.value;
}

export type TemperatureUnit = 'C' | 'F' | 'K';

/** A cell with a temperature: a number, alone or with its unit or a degree sign behind it. */
export function parseTemperature(
  cell: string,
  decimal: '.' | ',',
): { value: number; unit: TemperatureUnit | null } | null {
  const number = leadingNumber(cell, decimal);
  if (number === null) return null;
  if (number.rest === '' || (number.rest.length === 1 && isDegreeSign(number.rest)))
    return { value: number.value, unit: null };
  const unit = temperatureUnit(number.rest);
  return unit === null ? null : { value: number.value, unit };
}
