import type { Reading } from '../firing/types.ts';
import { fToC, kToC } from '../units/temperature.ts';
import type { TemperatureUnit } from './parse-number.ts';
import { parseTemperature } from './parse-number.ts';
import { parseTime } from './parse-time.ts';
import { temperatureUnit, timeUnit } from './record-words.ts';
import type { SkippedLine } from './read-table.ts';
import { RecordError } from './record-error.ts';
import { RECORD_LIMITS } from './record-limits.ts';

export interface PastedReadings {
  /** Minutes as typed, °C. */
  readonly readings: Reading[];
  readonly skipped: SkippedLine[];
}

/** A slip of the keyboard, no temperature in any unit. */
const HOTTEST = 100_000;

/**
 * Reads rows as a person types them: "12 310", "0:12, 310" (hours and minutes), "12 min 310 °C",
 * "12,5; 310,4". A row that says nothing clear is skipped with its reason, never guessed.
 * @param unit of temperatures that name none
 * @throws RecordError over the limits of a record
 */
export function parsePastedRows(text: string, unit: TemperatureUnit = 'C'): PastedReadings {
  if (text.length > RECORD_LIMITS.bytes) {
    throw new RecordError('The record is larger than 10 MiB, the most a record may be.');
  }
  const readings: Reading[] = [];
  const skipped: SkippedLine[] = [];
  let line = 0;
  for (let from = 0; from <= text.length;) {
    const end = text.indexOf('\n', from);
    const to = end < 0 ? text.length : end;
    line += 1;
    if (to - from > RECORD_LIMITS.cellCharacters) {
      throw new RecordError(`Line ${line} is longer than 1 kB, the most a typed row may be.`, line);
    }
    const row = text.slice(from, to).trim();
    from = to + 1;
    if (row === '' || row.startsWith('#')) continue;
    const reading = readRow(row, unit);
    if (typeof reading === 'string') skipped.push({ line, reason: reading });
    else readings.push(reading);
    if (readings.length > RECORD_LIMITS.rows) {
      throw new RecordError('The record has more than 200,000 rows, the most it may have.', line);
    }
  }
  return { readings, skipped };
}

function readRow(row: string, unit: TemperatureUnit): Reading | string {
  const words = wordsOf(row);
  const [timeWord, ...rest] = words;
  if (timeWord === undefined || rest.length === 0) return 'a row needs a time and a temperature';
  const named = timeUnit(rest[0] ?? '');
  const others = named === null ? rest : rest.slice(1);
  const minute = timeWord.includes(':')
    ? parseTime(timeWord, 'h:mm:ss', '.')
    : parseTime(timeWord, named ?? 'minutes', timeWord.includes(',') ? ',' : '.');
  if (minute === null) return `“${timeWord.slice(0, 40)}” cannot be read as a time`;
  const [valueWord = '', unitWord, ...more] = others;
  const temperature = parseTemperature(valueWord, valueWord.includes(',') ? ',' : '.');
  if (temperature === null || Math.abs(temperature.value) > HOTTEST) {
    return `“${valueWord.slice(0, 40)}” cannot be read as a temperature`;
  }
  const behind = unitWord === undefined ? null : temperatureUnit(unitWord);
  if (more.length > 0 || (unitWord !== undefined && behind === null)) {
    return 'a row holds one time and one temperature';
  }
  const used = temperature.unit ?? behind ?? unit;
  const { value } = temperature;
  const celsius = used === 'F' ? fToC(value) : used === 'K' ? kToC(value) : value;
  return { minute, celsius: Math.round(celsius * 100) / 100 };
}

/** Words parted by blanks or semicolons; by commas only where there is nothing else to part them. */
function wordsOf(row: string): string[] {
  const words: string[] = [];
  let word = '';
  const isParted = [...row].some((char) => char === ' ' || char === '\t' || char === ';');
  const push = () => {
    const trimmed = word.endsWith(',') ? word.slice(0, -1) : word;
    if (trimmed !== '') words.push(trimmed);
    word = '';
  };
  for (const char of row) {
    const parts =
      char === ' ' ||
      char === '\t' ||
      char === '\r' ||
      char === ';' ||
      char === '\u00a0' ||
      (char === ',' && !isParted);
    if (parts) push();
    else word += char;
  }
  push();
  return words;
}
