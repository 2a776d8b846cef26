import type { TemperatureUnit } from './parse-number.ts';
import type { TimeFormat } from './parse-time.ts';
import type { WordMeaning } from './record-words.ts';
import {
  isDegreeSign,
  isOtherUnit,
  meaningOfWord,
  temperatureUnit,
  timeUnit,
} from './record-words.ts';

/** What a column's name, and the cell of a units line below it, say of the column. */
export interface ColumnName {
  readonly text: string;
  /** The unit as the file writes it. */
  readonly unit: string | null;
  readonly meanings: ReadonlySet<WordMeaning>;
  readonly temperatureUnit: TemperatureUnit | null;
  /** The temperature's unit is a single letter at the name's end: it may be a label or a type. */
  readonly isUnitALetter: boolean;
  readonly timeFormat: TimeFormat | null;
  /** A unit, but of no time and no temperature. */
  readonly hasOtherUnit: boolean;
}

/** Reads a column's name. @param unitCell what a line of units has below the name; "" for nothing */
export function readColumnName(text: string, unitCell: string): ColumnName {
  const words = wordsOf(text);
  const inName = unitInName(text);
  const isTypeLetter = words.some((word) => word === 'type' || word === 'typ');
  const isLetter = unitCell === '' && inName !== null && inName.isLetter;
  const unit =
    unitCell !== '' ? bare(unitCell) : isLetter && isTypeLetter ? null : (inName?.unit ?? null);
  const ownUnit = unit === null ? null : temperatureUnit(unit);
  const wordUnit = words.reduce<TemperatureUnit | null>(
    (found, word) => found ?? (word.length > 2 ? temperatureUnit(word) : null),
    null,
  );
  const timeHint = unit === null ? null : (timeUnit(unit) ?? patternOf(unit));
  const meanings = new Set<WordMeaning>();
  for (const word of words) for (const meaning of meaningsOf(word)) meanings.add(meaning);
  // "t" counts time, "T" is a temperature, in physics as in many loggers.
  if (text.trim() === 't') meanings.add('time');
  if (text.trim() === 'T') meanings.add('temperature');
  if (text.trim() === '#') meanings.add('counter');
  return {
    text,
    unit,
    meanings,
    temperatureUnit: ownUnit ?? wordUnit,
    isUnitALetter: isLetter && ownUnit !== null,
    timeFormat: timeHint ?? timeWord(words),
    hasOtherUnit: unit !== null && ownUnit === null && timeHint === null && isOtherQuantity(unit),
  };
}

/** Words of a name in lower case, parted at what is no letter and no digit; then at inner capitals. */
function wordsOf(text: string): string[] {
  const words: string[] = [];
  const short = text.slice(0, 200);
  for (const raw of short.split(/[^\p{L}\p{N}%#]+/u)) {
    if (raw === '') continue;
    words.push(raw.toLowerCase());
    const parts = raw.split(/(?<=\p{Ll})(?=\p{Lu})/u);
    if (parts.length > 1) words.push(...parts.map((part) => part.toLowerCase()));
  }
  return words;
}

const COMPOUND_ENDS = ['temperature', 'temperatur', 'temperatuur', 'temp', 'time', 'zeit', 'wert'];

/** A word's meaning; of a compound ("Ofentemperatur", "setpointtemp") those of both parts. */
function meaningsOf(word: string): WordMeaning[] {
  const own = meaningOfWord(word);
  if (own !== null) return [own];
  let end = word.length;
  while (end > 0 && word.charCodeAt(end - 1) >= 48 && word.charCodeAt(end - 1) <= 57) end -= 1;
  const stem = word.slice(0, end);
  for (const tail of COMPOUND_ENDS) {
    if (!stem.endsWith(tail) || stem.length <= tail.length) continue;
    const head = meaningOfWord(stem.slice(0, -tail.length));
    const last = meaningOfWord(tail);
    return [head, last].filter((meaning) => meaning !== null);
  }
  if (stem.length === 5 && stem.startsWith('temp')) return ['temperature'];
  return [];
}

/** The unit a name carries: in brackets, behind "/" or "in", from a degree sign on, as its last word. */
function unitInName(name: string): { unit: string; isLetter: boolean } | null {
  const text = name.trim().slice(0, 200);
  const open = Math.max(text.lastIndexOf('('), text.lastIndexOf('['), text.lastIndexOf('{'));
  if (open >= 0) {
    const closes = [')', ']', '}'].map((sign) => text.indexOf(sign, open)).filter((at) => at > 0);
    const inside = text.slice(open + 1, closes[0] ?? text.length).trim();
    if (isUnit(inside) || /^[^\d\s]{1,6}$/.test(inside)) return { unit: inside, isLetter: false };
    const outside = unitInName(text.slice(0, open));
    if (outside !== null) return outside;
    return inside === '' ? null : { unit: inside, isLetter: false };
  }
  if (isUnit(text)) return { unit: text, isLetter: false };
  const degree = [...text].findIndex((char) => isDegreeSign(char));
  if (degree >= 0) {
    const behind =
      [...text]
        .slice(degree)
        .join('')
        .split(/[\s,;]/, 1)[0] ?? '';
    if (temperatureUnit(behind) !== null || isOtherUnit(behind))
      return { unit: behind, isLetter: false };
  }
  const glyph = /[\u2103\u2109]/.exec(text);
  if (glyph !== null) return { unit: glyph[0], isLetter: false };
  const slash = text.lastIndexOf('/');
  if (slash > 0 && isUnit(text.slice(slash + 1).trim())) {
    const unit = text.slice(slash + 1).trim();
    return { unit, isLetter: unit.length === 1 };
  }
  const parts = text.split(/[\s,_\-:.]+/);
  const last = parts[parts.length - 1] ?? '';
  const lastTwo = parts.slice(-2).join(' ');
  if (parts.length > 2 && temperatureUnit(lastTwo) !== null)
    return { unit: lastTwo, isLetter: false };
  const isLetter = last.length === 1;
  // A single letter may number the probes ("Probe A"): only those of temperatures and times are units.
  const mayBe = !isLetter || last === '%' || temperatureUnit(last) !== null || 'shm'.includes(last);
  if (parts.length > 1 && isUnit(last) && mayBe) return { unit: last, isLetter };
  const glued = /^(?:.*\p{Ll}|temp)(C|F|K|DegC|DegF|c|f)$/u.exec(text);
  const isTemp =
    glued !== null && /temp(?:erature)?\d{0,2}$/i.test(text.slice(0, -(glued[1] ?? '').length));
  if (glued !== null && isTemp) return { unit: glued[1] ?? '', isLetter: true };
  return null;
}

/** Whether a cell of a units line is a unit and nothing else: "[s]", "°C", "(g)", "hh:mm:ss". */
export function isUnitCell(cell: string): boolean {
  if (cell === '' || cell.length > 24) return false;
  const isBracketed =
    (cell.startsWith('[') && cell.endsWith(']')) || (cell.startsWith('(') && cell.endsWith(')'));
  return isBracketed || isUnit(cell);
}

function isUnit(word: string): boolean {
  return (
    temperatureUnit(word) !== null ||
    timeUnit(bare(word)) !== null ||
    patternOf(word) !== null ||
    isOtherUnit(word)
  );
}

/** A unit of something else: one we know, or a short word that is no word of a temperature's name. */
function isOtherQuantity(unit: string): boolean {
  if (isOtherUnit(unit)) return true;
  const isShort = unit.length <= 10 && !/\d{2}/.test(unit);
  return (
    isShort &&
    wordsOf(unit).every((word) => {
      const meaning = meaningOfWord(word);
      return meaning === null || meaning === 'quantity' || meaning === 'change';
    }) &&
    /[/²^%]|^(?:k|m)?(?:Pa|W|V|A|g)\b/.test(unit)
  );
}

/** A unit without its brackets and points. */
function bare(unit: string): string {
  let text = '';
  for (const char of unit) if (!'[](){}.'.includes(char)) text += char;
  return text.trim();
}

/** How times are written by a pattern of letters: "hh:mm:ss", "mm:ss", "dd.mm.yyyy hh:mm". */
function patternOf(unit: string): TimeFormat | null {
  const text = unit.toLowerCase().trim();
  if (text.length < 3 || text.length > 24) return null;
  if (/^m{1,3}:s{1,2}$|^min:sec?$|^minutes?:seconds?$/.test(text)) return 'm:ss';
  if (/^h{1,3}:m{1,2}$|^hr?:min$|^hours?:minutes?$/.test(text)) return 'h:mm';
  if (/^h{1,3}:m{1,2}:s{1,2}|^hr?:min:sec?$/.test(text)) return 'h:mm:ss';
  if (/^[dt]{1,2}[-/. ]m{1,3}[-/. ][yj]{2,4}/.test(text)) return 'timestamp-dmy';
  if (/^m{1,3}[-/. ]d{1,2}[-/. ]y{2,4}/.test(text)) return 'timestamp-mdy';
  if (/^[yj]{4}[-/. ]m{1,3}[-/. ][dt]{1,2}/.test(text)) return 'timestamp';
  return /^[yj]{2}[-/. ]m{1,2}[-/. ][dt]{1,2}/.test(text) ? 'timestamp-ymd' : null;
}

/** A time's unit spelled out in a name: "Elapsed seconds". */
function timeWord(words: readonly string[]): TimeFormat | null {
  for (const word of words) {
    const unit = word.length > 2 || word === 'ms' ? timeUnit(word) : null;
    if (unit !== null && word !== 'day' && word !== 'tage') return unit;
  }
  return null;
}
