import { fToC, kToC } from '../units/temperature.ts';
import { roleOfName, temperatureUnitOf, timeUnitOf, unitInName } from './column-words.ts';
import { detectLayout } from './detect-layout.ts';
import type { TableLayout } from './detect-layout.ts';
import { detectTime } from './detect-time.ts';
import type { DetectedTime } from './detect-time.ts';
import type { TemperatureUnit } from './parse-number.ts';
import { parseTemperature } from './parse-number.ts';
import { isClock } from './parse-time.ts';
import type { TimeFormat } from './parse-time.ts';
import type { RecordChoice } from './record-choice.ts';
import { RecordError } from './record-error.ts';
import type { Delimiter } from './scan-rows.ts';

export interface DetectedColumn {
  readonly index: number;
  readonly name: string;
  readonly role: 'time' | 'temperature' | 'other';
  /** As the file names it, or the temperature unit it is taken for. */
  readonly unit: string | null;
  /** The first few cells. */
  readonly sample: string[];
}
export interface DetectedTable {
  readonly delimiter: Delimiter;
  readonly decimal: '.' | ',';
  readonly headerLine: number | null;
  readonly columns: DetectedColumn[];
  readonly time: { readonly column: number; readonly format: TimeFormat };
  /** Plain sentences to be shown for confirmation. */
  readonly assumed: string[];
  /** What to read the table with, if all this is confirmed. */
  readonly choice: RecordChoice;
}

const SAMPLE = 5;
/** Above this no kiln is in °C. */
const HOTTEST_CELSIUS = 1400;
/** So many of a column's cells at exactly zero: nothing was connected. */
const STUCK_SHARE = 0.8;

interface Column {
  readonly index: number;
  readonly name: string;
  readonly unit: string | null;
  readonly cells: readonly string[];
  readonly values: readonly (number | null)[];
  readonly cellUnit: TemperatureUnit | null;
}

/**
 * Finds out how a logger's table is written from its first 200 lines: delimiter, decimal sign,
 * header, units, the time and the temperatures.
 * @throws RecordError when no table, no time or no temperature is found
 */
export function detectTable(text: string): DetectedTable {
  const layout = detectLayout(text);
  const columns = columnsOf(layout);
  const assumed: string[] = [];
  const temperatures = temperatureColumns(columns);
  const found = findTime(columns, layout, temperatures);
  if (found === null) throw new RecordError('No column of this table can be read as a time.');
  if (found.time.assumed !== null) assumed.push(found.time.assumed);
  const usable = temperatures.filter((column) => column.index !== found.column.index);
  const connected = usable.filter((column) => !isStuck(column));
  for (const column of usable) {
    if (isStuck(column)) {
      assumed.push(
        `${nameOf(column)} reads 0 almost all the time: its probe was probably not connected.`,
      );
    }
  }
  const chosen = [...connected, ...usable][0];
  if (chosen === undefined)
    throw new RecordError('No column of this table can be read as a temperature.');
  const unit = unitOf(chosen, assumed);
  const second = connected.find((column) => column.index !== chosen.index) ?? null;
  if (usable.length > 1) {
    assumed.push(
      second === null
        ? `${nameOf(chosen)} is taken as the temperature.`
        : `${nameOf(chosen)} is taken as the temperature and ${nameOf(second)} as the second probe.`,
    );
  }
  const choice: RecordChoice = {
    delimiter: layout.delimiter,
    decimal: layout.decimal,
    headerLine: layout.header?.line ?? null,
    timeColumn: found.column.index,
    timeFormat: found.time.format,
    temperatureColumn: chosen.index,
    secondColumn: second?.index ?? null,
    unit,
  };
  return {
    delimiter: layout.delimiter,
    decimal: layout.decimal,
    headerLine: choice.headerLine,
    columns: columns.map((column) => ({
      index: column.index,
      name: column.name,
      role: roleOf(column, found.column, usable),
      unit: column.unit ?? (column.index === chosen.index ? unit : null),
      sample: column.cells.slice(0, SAMPLE),
    })),
    time: { column: found.column.index, format: found.time.format },
    assumed,
    choice,
  };
}

function roleOf(
  column: Column,
  time: Column,
  temperatures: readonly Column[],
): DetectedColumn['role'] {
  if (column.index === time.index) return 'time';
  return temperatures.some((one) => one.index === column.index) ? 'temperature' : 'other';
}

function nameOf(column: Column): string {
  return `Column ${column.index + 1}${column.name === '' ? '' : ` (${column.name})`}`;
}

function columnsOf(layout: TableLayout): Column[] {
  const width = layout.data[0]?.cells.length ?? 0;
  return Array.from({ length: width }, (_, index) => {
    const name = layout.header?.cells[index] ?? '';
    const cells = layout.data.map((row) => row.cells[index] ?? '');
    const parsed = cells.map((cell) => parseTemperature(cell, layout.decimal));
    const unitCell = layout.units?.cells[index] ?? '';
    return {
      index,
      name,
      unit: unitCell === '' ? unitInName(name) : unitCell,
      cells,
      values: parsed.map((one) => one?.value ?? null),
      cellUnit: parsed.find((one) => one?.unit != null)?.unit ?? null,
    };
  });
}

/** Columns named as temperatures; where no name says so, those of numbers a kiln may show. */
function temperatureColumns(columns: readonly Column[]): Column[] {
  const numeric = columns.filter(
    (column) => column.values.filter((value) => value !== null).length * 2 >= column.values.length,
  );
  const named = numeric.filter(
    (column) => column.cellUnit !== null || roleOfName(column.name, column.unit) === 'temperature',
  );
  if (named.length > 0) return named;
  return numeric.filter((column) => {
    if (roleOfName(column.name, column.unit) !== null || isCounter(column)) return false;
    return column.values.every((value) => value === null || (value >= -460 && value <= 3000));
  });
}

/** A running number: always one more than the line before. */
function isCounter(column: Column): boolean {
  const { values } = column;
  return (
    values.length >= 3 &&
    values.every((value, i) => i === 0 || (value !== null && value === (values[i - 1] ?? 0) + 1))
  );
}

function isStuck(column: Column): boolean {
  const zeros = column.values.filter((value) => value === 0).length;
  return zeros >= STUCK_SHARE * column.values.length && column.values.length >= 5;
}

interface FoundTime {
  readonly column: Column;
  readonly time: DetectedTime;
}

/** A column named as a time, else the first whose values never fall; a clock is kept before a date. */
function findTime(
  columns: readonly Column[],
  layout: TableLayout,
  temperatures: readonly Column[],
): FoundTime | null {
  const named = columns.filter((column) => roleOfName(column.name, column.unit) === 'time');
  const dated = columns.filter((column) => roleOfName(column.name, column.unit) === 'date');
  const others = columns.filter(
    (column) => !named.includes(column) && !dated.includes(column) && isRising(column),
  );
  const isTaken = (column: Column) =>
    temperatures.length > 1 || temperatures[0]?.index !== column.index;
  let counted: FoundTime | null = null;
  for (const column of [...named, ...dated, ...others]) {
    const beside = temperatures.find((one) => one.index !== column.index);
    if (beside === undefined || !isTaken(column)) continue;
    const celsius = beside.values.map((value) =>
      inCelsius(value, temperatureUnitOf(beside.name, beside.unit) ?? 'C'),
    );
    const time = detectTime(
      column.cells,
      timeUnitOf(column.name, column.unit),
      celsius,
      layout.decimal,
    );
    if (time === null) continue;
    // A date without a time beside it is no time where there is a better column.
    if (time.format.startsWith('timestamp') && !column.cells.some((cell) => cell.includes(':'))) {
      counted ??= { column, time };
      continue;
    }
    const isBare = !isClock(time.format) && column.values.every((value) => value !== null);
    if (named.includes(column) || !isBare || column.name !== '') return { column, time };
    counted ??= { column, time };
  }
  return counted;
}

/** Never falls, or begins again at midnight: clocks and timestamps are no numbers and pass too. */
function isRising(column: Column): boolean {
  const { values } = column;
  return values.every(
    (value, i) => i === 0 || value === null || value >= (values[i - 1] ?? -Infinity),
  );
}

function inCelsius(value: number | null, unit: TemperatureUnit): number | null {
  if (value === null) return null;
  return unit === 'F' ? fToC(value) : unit === 'K' ? kToC(value) : value;
}

function unitOf(column: Column, assumed: string[]): TemperatureUnit {
  const named = column.cellUnit ?? temperatureUnitOf(column.name, column.unit);
  if (named !== null) return named;
  const hottest = column.values.reduce<number>(
    (most, value) => Math.max(most, value ?? most),
    -Infinity,
  );
  if (hottest > HOTTEST_CELSIUS) {
    assumed.push(
      `${nameOf(column)} names no unit; it is taken as °F, because ${hottest} is above what a kiln shows in °C.`,
    );
    return 'F';
  }
  assumed.push(`${nameOf(column)} names no unit; it is taken as °C.`);
  return 'C';
}
