import type { Reading } from '../firing/types.ts';
import { faultsIn } from './fault-values.ts';
import { celsiusIn } from './guess-unit.ts';
import type { TemperatureUnit } from './parse-number.ts';
import { parseTemperature } from './parse-number.ts';
import { parseTime } from './parse-time.ts';
import type { RecordChoice } from './record-choice.ts';
import { RecordError } from './record-error.ts';
import { RECORD_LIMITS } from './record-limits.ts';
import { isComment, scanRows } from './scan-rows.ts';
import { settleTimes } from './settle-times.ts';
import { timeText } from './time-text.ts';

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

/** No thermocouple for a kiln reads beyond these, °C: what loggers write for a probe that is not connected. */
const NO_PROBE_ABOVE = 2000;
const NO_PROBE_BELOW = -100;
/** Lines below the last reading that may be a summary. */
const FOOTER_LINES = 40;

/** A probe's cells, row by row: the number as written, and in °C. */
interface ProbeCells {
  readonly values: (number | null)[];
  readonly celsius: (number | null)[];
}
interface Rows {
  readonly times: number[];
  readonly lines: number[];
  readonly first: ProbeCells;
  readonly second: ProbeCells;
  /** What stands in the cells without a temperature, by row. */
  readonly blanks: Map<number, string>;
  rowCount: number;
}

/**
 * Reads the readings of a table. Blank lines, comments and lines without a reading are skipped and
 * listed; so are a summary below the last reading, and what a probe gives that is not connected.
 * @throws RecordError with the line for a time that cannot be read beside a temperature, for more
 * than 200,000 rows, 50 columns, 1 kB in a cell or 10 MiB, and when no reading is left
 */
export function readTable(text: string, choice: RecordChoice): TableReadings {
  if (text.length > RECORD_LIMITS.bytes) {
    throw new RecordError('The record is larger than 10 MiB, the most a record may be.');
  }
  const skipped: SkippedLine[] = [];
  const rows = collectRows(text, choice, skipped);
  const settled = settleTimes(Float64Array.from(rows.times), rows.lines, choice.timeFormat);
  const count = rows.times.length;
  const rowAt = (i: number): number => (settled.isReversed ? count - 1 - i : i);
  const faults = faultsIn(rows.first.values);
  const secondFaults = faultsIn(rows.second.values);
  const readings: Reading[] = [];
  const second: Reading[] = [];
  let zero: number | null = null;
  let disconnected = 0;
  for (let i = 0; i < count; i += 1) {
    const row = rowAt(i);
    const line = rows.lines[row] ?? 0;
    const celsius = connected(rows.first, faults, row);
    const other = connected(rows.second, secondFaults, row);
    const now = settled.minutes[i] ?? 0;
    if (celsius !== null || other !== null) zero ??= now;
    const minute = Math.round((now - (zero ?? now)) * 1e6) / 1e6;
    if (other !== null) second.push({ minute, celsius: other });
    if (celsius !== null) {
      readings.push({ minute, celsius });
      continue;
    }
    const value = rows.first.values[row];
    if (value == null) {
      const cell = rows.blanks.get(row) ?? '';
      skipped.push({
        line,
        reason: cell === '' ? 'no temperature' : `${shown(cell)} is no temperature`,
      });
    } else {
      disconnected += 1;
      const reason = `${shown(String(value))}: no probe reads this, it was probably not connected`;
      skipped.push({ line, reason });
    }
  }
  refuseEmpty(readings, disconnected, choice);
  skipped.sort((a, b) => a.line - b.line);
  return {
    readings,
    secondProbe: choice.secondColumn === null || second.length === 0 ? null : second,
    rowCount: rows.rowCount,
    skipped,
    assumed: [...leftOutWords(rows, readings.length, disconnected), ...settled.assumed],
  };
}

function collectRows(text: string, choice: RecordChoice, skipped: SkippedLine[]): Rows {
  const rows: Rows = {
    times: [],
    lines: [],
    first: { values: [], celsius: [] },
    second: { values: [], celsius: [] },
    blanks: new Map(),
    rowCount: 0,
  };
  const widest = Math.max(choice.timeColumn, choice.temperatureColumn);
  const dateColumn = choice.dateColumn ?? null;
  /** Lines whose time cannot be read: a summary if no reading follows, else refused. */
  let unread: { line: number; error: RecordError }[] = [];
  const skip = (line: number, reason: string): true => {
    skipped.push({ line, reason });
    return true;
  };
  scanRows(text, choice.delimiter, (cells, line) => {
    if (choice.headerLine !== null && line <= choice.headerLine) return true;
    if (cells.every((cell) => cell === '')) return true;
    if (isComment(cells)) return skip(line, 'a comment');
    const own = cells[choice.timeColumn] ?? '';
    const half =
      choice.timeColumn + 1 === choice.temperatureColumn
        ? ''
        : (cells[choice.timeColumn + 1] ?? '');
    const date = dateColumn === null ? '' : (cells[dateColumn] ?? '');
    const timeCell = own === '' ? '' : timeText(date, own, half);
    const cell = cells[choice.temperatureColumn] ?? '';
    const minute = parseTime(timeCell, choice.timeFormat, choice.decimal);
    const temperature = parseTemperature(cell, choice.decimal);
    if (minute === null && (temperature === null || rows.rowCount === 0)) {
      if (rows.rowCount === 0 || cells.length <= widest)
        return skip(line, 'no reading on this line');
    }
    rows.rowCount += 1;
    if (rows.rowCount > RECORD_LIMITS.rows) {
      throw new RecordError('The record has more than 200,000 rows, the most it may have.', line);
    }
    if (minute === null) {
      if (temperature === null) return skip(line, `no time and no temperature: ${shown(timeCell)}`);
      unread.push({ line, error: unreadableTime(timeCell, choice, line) });
      if (unread.length > FOOTER_LINES) throw firstOf(unread);
      return true;
    }
    if (unread.length > 0) throw firstOf(unread);
    if (temperature === null) rows.blanks.set(rows.times.length, cell);
    rows.times.push(minute);
    rows.lines.push(line);
    push(rows.first, temperature, choice.unit);
    const other = choice.secondColumn === null ? '' : (cells[choice.secondColumn] ?? '');
    push(rows.second, other === '' ? null : parseTemperature(other, choice.decimal), choice.unit);
    return true;
  });
  for (const { line } of unread) {
    rows.rowCount -= 1;
    skip(line, 'no time that can be read, below the last reading');
  }
  unread = [];
  return rows;
}

function firstOf(unread: readonly { error: RecordError }[]): RecordError {
  return unread[0]?.error ?? new RecordError('A time cannot be read.');
}

function unreadableTime(cell: string, choice: RecordChoice, line: number): RecordError {
  const message =
    cell === ''
      ? `Line ${line} has a temperature, but no time.`
      : `Line ${line}: ${shown(cell)} cannot be read as a time (${choice.timeFormat}).`;
  return new RecordError(message, line, choice.timeColumn + 1);
}

function push(
  probe: ProbeCells,
  temperature: { value: number; unit: TemperatureUnit | null } | null,
  unit: TemperatureUnit,
): void {
  probe.values.push(temperature?.value ?? null);
  probe.celsius.push(
    temperature === null ? null : toCelsius(temperature.value, temperature.unit ?? unit),
  );
}

function connected(probe: ProbeCells, faults: Uint8Array, row: number): number | null {
  const celsius = probe.celsius[row] ?? null;
  if (celsius === null || faults[row] === 1) return null;
  return celsius >= NO_PROBE_BELOW && celsius <= NO_PROBE_ABOVE ? celsius : null;
}

function refuseEmpty(
  readings: readonly Reading[],
  disconnected: number,
  choice: RecordChoice,
): void {
  const isAllZero =
    readings.length > 1 &&
    choice.unit !== 'K' &&
    readings.every(({ celsius }) => celsius === toCelsius(0, choice.unit));
  if (readings.length > 0 && !isAllZero) return;
  const why =
    disconnected > 0 || isAllZero
      ? 'the chosen column reads as a probe that was not connected'
      : 'no line below the header holds a time and a temperature';
  throw new RecordError(`No reading was found: ${why}.`, null, choice.temperatureColumn + 1);
}

function leftOutWords(rows: Rows, kept: number, disconnected: number): string[] {
  const words: string[] = [];
  if (disconnected > 0) {
    words.push(
      `${disconnected} of ${rows.rowCount} rows hold what a probe shows when it is not connected (such as 0 K); they are left out.`,
    );
  }
  const wordless = rows.times.length - kept - disconnected;
  if (wordless > 0) {
    words.push(`${wordless} of ${rows.rowCount} rows hold no temperature; they are left out.`);
  }
  return words;
}

function shown(cell: string): string {
  return `“${cell.length > 40 ? `${cell.slice(0, 40)}…` : cell}”`;
}

/** °C without the dust of conversion: finer than any logger writes. */
function toCelsius(value: number, unit: TemperatureUnit): number {
  return Math.round(celsiusIn(value, unit) * 10_000) / 10_000;
}
