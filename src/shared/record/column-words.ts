import type { TemperatureUnit } from './parse-number.ts';
import { temperatureUnit } from './parse-number.ts';
import type { TimeFormat } from './parse-time.ts';
import { timeUnit } from './parse-time.ts';

/** Words of a column's name, lower case, parted at anything but letters and digits. */
export function wordsOfName(name: string): string[] {
  const words: string[] = [];
  let word = '';
  for (const char of name.toLowerCase()) {
    const isPart = (char >= 'a' && char <= 'z') || (char >= '0' && char <= '9') || char > '\u00bf';
    if (isPart) word += char;
    else if (word !== '') {
      words.push(word);
      word = '';
    }
  }
  if (word !== '') words.push(word);
  return words;
}

const TIME_NAMES = [
  'time',
  'elapsed',
  'timestamp',
  'datetime',
  'zeit',
  'heure',
  'clock',
  'minute',
  'minutes',
  'seconds',
  'min',
  'sec',
];
const DATE_NAMES = ['date', 'datum', 'day'];
const TEMPERATURE_NAMES = [
  'temperature',
  'temp',
  'temperatur',
  'température',
  'tc',
  'thermocouple',
  'pyrometer',
  'kiln',
  'probe',
  'celsius',
  'fahrenheit',
  'degc',
  'degf',
  'chamber',
  'top',
  'bottom',
];
/** Names of what stands in a logger's file and is no kiln temperature. */
const OTHER_NAMES = [
  'mass',
  'weight',
  'hrr',
  'heat',
  'setpoint',
  'set',
  'sp',
  'target',
  'programme',
  'program',
  'power',
  'output',
  'humidity',
  'rh',
  'pressure',
  'flow',
  'voltage',
  'volt',
  'volts',
  'mv',
  'battery',
  'ambient',
  'junction',
  'cj',
  'internal',
  'rate',
  'index',
  'no',
  'nr',
  'record',
  'sample',
  'status',
  'error',
  'event',
  'gas',
  'oxygen',
  'co2',
  'dew',
];

function hasAny(words: readonly string[], names: readonly string[]): boolean {
  return words.some((word) => names.includes(word));
}

/** What a column's name says it holds; null when it says nothing we know. */
export function roleOfName(
  name: string,
  unit: string | null,
): 'time' | 'date' | 'temperature' | 'other' | null {
  const words = wordsOfName(name);
  const hasTemperatureUnit = unit !== null && temperatureUnit(unit) !== null;
  if (
    hasAny(words, OTHER_NAMES) &&
    !(
      hasAny(words, ['temperature', 'temp']) &&
      !hasAny(words, [
        'set',
        'setpoint',
        'target',
        'sp',
        'ambient',
        'junction',
        'cj',
        'internal',
        'dew',
      ])
    )
  ) {
    return 'other';
  }
  if (hasTemperatureUnit || hasAny(words, TEMPERATURE_NAMES)) return 'temperature';
  if (words.some((word) => numberedTemperature(word))) return 'temperature';
  if (hasAny(words, TIME_NAMES)) return 'time';
  if (hasAny(words, DATE_NAMES)) return 'date';
  return null;
}

/** "t1", "tc2", "temp3", "ch1". */
function numberedTemperature(word: string): boolean {
  let end = word.length;
  while (end > 0 && word.charAt(end - 1) >= '0' && word.charAt(end - 1) <= '9') end -= 1;
  return (
    end < word.length && ['t', 'tc', 'temp', 'ch', 'channel', 'probe'].includes(word.slice(0, end))
  );
}

/** The unit a column's name carries in brackets or as its last word: "Temperature (K)", "Temp C". */
export function unitInName(name: string): string | null {
  const opens = [name.lastIndexOf('('), name.lastIndexOf('[')];
  const open = Math.max(...opens);
  if (open >= 0) {
    const close = Math.max(name.indexOf(')', open), name.indexOf(']', open));
    const inside = name.slice(open + 1, close < 0 ? name.length : close).trim();
    if (inside !== '') return inside;
  }
  const degree = name.search(/[°º]/);
  if (degree >= 0) return name.slice(degree).trim();
  const last =
    name
      .trim()
      .split(/[\s,_/]/)
      .pop() ?? '';
  return isUnit(last) && last !== name.trim() ? last : null;
}

/** Whether a cell is a unit and nothing else: "[s]", "°C", "(g)". */
export function isUnitCell(cell: string): boolean {
  if (cell === '') return false;
  const isBracketed =
    (cell.startsWith('[') && cell.endsWith(']')) || (cell.startsWith('(') && cell.endsWith(')'));
  return isBracketed || isUnit(cell);
}

function isUnit(word: string): boolean {
  return (
    temperatureUnit(word) !== null ||
    timeUnit(bare(word)) !== null ||
    ['%', 'g', 'kg', 'mg', 'W', 'kW', 'mV', 'V'].includes(word)
  );
}

/** A unit without its brackets. */
export function bare(unit: string): string {
  let text = '';
  for (const char of unit) if (!'[]().'.includes(char)) text += char;
  return text.trim();
}

/** Time unit named by a column's unit or, failing that, by a word of its name. */
export function timeUnitOf(name: string, unit: string | null): TimeFormat | null {
  const named = unit === null ? null : timeUnit(bare(unit));
  if (named !== null) return named;
  for (const word of wordsOfName(name)) {
    if (word.length > 2 && timeUnit(word) !== null) return timeUnit(word);
  }
  return null;
}

/** Temperature unit named by a column's unit or by a word of its name ("Celsius"). */
export function temperatureUnitOf(name: string, unit: string | null): TemperatureUnit | null {
  const named = unit === null ? null : temperatureUnit(unit);
  if (named !== null) return named;
  for (const word of wordsOfName(name)) {
    if (word.length > 1 && temperatureUnit(word) !== null) return temperatureUnit(word);
  }
  return null;
}
