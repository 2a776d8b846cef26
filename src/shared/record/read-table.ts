import type { Reading } from '../firing/types.ts';
import { fToC, kToC } from '../units/temperature.ts';
import type { TemperatureUnit } from './parse-number.ts';
import { parseTemperature } from './parse-number.ts';
import { isClock, parseTime } from './parse-time.ts';
import type { RecordChoice } from './record-choice.ts';
import { RecordError } from './record-error.ts';
import { RECORD_LIMITS } from './record-limits.ts';
import { scanRows } from './scan-rows.ts';

export interface SkippedLine {
  readonly line: number;
  readonly reason: string;
}
export interface TableReadings {
  /** In the order of the file; minutes from its first reading, °C. */
  readonly readings: Reading[];
  readonly secondProbe: Reading[] | null;
  /** Lines below the header that hold data, readable or not. */
  readonly rowCount: number;
  readonly skipped: SkippedLine[];
  readonly assumed: string[];
}

const MINUTES_A_DAY = 1440;
/** No thermocouple reads this, °C: what loggers write for a probe that is not connected. */
const NO_PROBE_ABOVE = 2500;
const NO_PROBE_BELOW = -200;

/**
 * Reads the readings of a table. Blank lines, comments (#) and lines without a reading are skipped
 * and listed.
 * @throws RecordError with the line for a time that cannot be read beside a temperature, for more
 * than 200,000 rows, 50 columns, 1 kB in a cell or 10 MiB, and when no reading is left
 */
export function readTable(text: string, choice: RecordChoice): TableReadings {
  if (text.length > RECORD_LIMITS.bytes) {
    throw new RecordError('The record is larger than 10 MiB, the most a record may be.');
  }
  const skipped: SkippedLine[] = [];
  const readings: Reading[] = [];
  const second: Reading[] = [];
  const widest = Math.max(choice.timeColumn, choice.temperatureColumn);
  let rowCount = 0;
  let zero: number | null = null;
  let previous: number | null = null;
  let days = 0;
  let backwardsLine: number | null = null;
  let disconnected = 0;
  const skip = (line: number, reason: string): true => {
    skipped.push({ line, reason });
    return true;
  };

  scanRows(text, choice.delimiter, (cells, line) => {
    if (choice.headerLine !== null && line <= choice.headerLine) return true;
    if (cells.every((cell) => cell === '')) return true;
    if (cells[0]?.startsWith('#')) return skip(line, 'a comment');
    const timeCell = cells[choice.timeColumn] ?? '';
    const cell = cells[choice.temperatureColumn] ?? '';
    const minute = parseTime(timeCell, choice.timeFormat, choice.decimal);
    const temperature = parseTemperature(cell, choice.decimal);
    if (minute === null && (temperature === null || rowCount === 0)) {
      if (rowCount === 0 || cells.length <= widest) return skip(line, 'no reading on this line');
    }
    rowCount += 1;
    if (rowCount > RECORD_LIMITS.rows) {
      throw new RecordError('The record has more than 200,000 rows, the most it may have.', line);
    }
    if (minute === null) {
      if (temperature === null) return skip(line, `no time and no temperature: ${shown(timeCell)}`);
      throw new RecordError(
        `Line ${line}: ${shown(timeCell)} cannot be read as a time (${choice.timeFormat}).`,
        line,
        choice.timeColumn + 1,
      );
    }
    let at = minute + days * MINUTES_A_DAY;
    if (previous !== null && isClock(choice.timeFormat) && previous - at > MINUTES_A_DAY / 2) {
      days += 1;
      at += MINUTES_A_DAY;
    }
    if (previous !== null && at < previous) backwardsLine ??= line;
    previous = at;
    const other = choice.secondColumn === null ? null : cells[choice.secondColumn];
    const otherCelsius = other === null || other === undefined ? null : celsiusOf(other, choice);
    const celsius =
      temperature === null ? null : toCelsius(temperature.value, temperature.unit ?? choice.unit);
    const hasSecond = otherCelsius !== null && isConnected(otherCelsius);
    const hasFirst = celsius !== null && isConnected(celsius);
    if (hasFirst || hasSecond) zero ??= at;
    const relative = Math.round((at - (zero ?? at)) * 1e9) / 1e9;
    if (hasSecond) second.push({ minute: relative, celsius: otherCelsius });
    if (celsius === null) {
      return skip(line, cell === '' ? 'no temperature' : `${shown(cell)} is no temperature`);
    }
    if (!hasFirst) {
      disconnected += 1;
      return skip(line, `${shown(cell)}: no probe reads this, it was probably not connected`);
    }
    readings.push({ minute: relative, celsius });
    return true;
  });

  if (readings.length === 0) {
    const why =
      disconnected > 0
        ? 'the chosen column reads as a probe that was not connected'
        : 'no line below the header holds a time and a temperature';
    throw new RecordError(`No reading was found: ${why}.`, null, choice.temperatureColumn + 1);
  }
  const assumed: string[] = [];
  if (disconnected > 0) {
    assumed.push(
      `${disconnected} of ${rowCount} rows hold what a probe shows when it is not connected (such as 0 K); they are left out.`,
    );
  }
  if (days > 0) assumed.push('The clock begins again during the record: it went on past midnight.');
  if (backwardsLine !== null)
    assumed.push(`The time runs backwards at line ${String(backwardsLine)}.`);
  return {
    readings,
    secondProbe: choice.secondColumn === null || second.length === 0 ? null : second,
    rowCount,
    skipped,
    assumed,
  };
}

function shown(cell: string): string {
  return `“${cell.length > 40 ? `${cell.slice(0, 40)}…` : cell}”`;
}

function isConnected(celsius: number): boolean {
  return celsius >= NO_PROBE_BELOW && celsius <= NO_PROBE_ABOVE;
}

function celsiusOf(cell: string, choice: RecordChoice): number | null {
  const temperature = parseTemperature(cell, choice.decimal);
  return temperature === null
    ? null
    : toCelsius(temperature.value, temperature.unit ?? choice.unit);
}

/** °C without the dust of conversion: finer than any logger writes. */
function toCelsius(value: number, unit: TemperatureUnit): number {
  const celsius = unit === 'F' ? fToC(value) : unit === 'K' ? kToC(value) : value;
  return Math.round(celsius * 10_000) / 10_000;
}
