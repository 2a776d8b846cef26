import { chooseTime } from './choose-time.ts';
import { isTemperatureByName, rankProbes, UNCONNECTED_SHARE } from './choose-probes.ts';
import { chooseUnit } from './choose-unit.ts';
import type { TableColumn } from './describe-columns.ts';
import { columnWords, describeColumns } from './describe-columns.ts';
import { detectLayout } from './detect-layout.ts';
import type { TableLayout } from './detect-layout.ts';
import { celsiusIn } from './guess-unit.ts';
import type { TimeFormat } from './parse-time.ts';
import type { RecordChoice } from './record-choice.ts';
import { RecordError } from './record-error.ts';
import { sampleRows } from './sample-rows.ts';
import type { Delimiter } from './scan-rows.ts';

export interface DetectedColumn {
  readonly index: number;
  readonly name: string;
  readonly role: 'time' | 'date' | 'temperature' | 'other';
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

/**
 * Finds out how a logger's table is written: delimiter, decimal sign and header from its first lines;
 * the time, the probes and their unit from rows spread over the whole of it. A known target helps to
 * tell a unit that nothing names.
 * @throws RecordError when no table, no time or no temperature is found
 */
export function detectTable(text: string, targetCelsius: number | null = null): DetectedTable {
  const layout = detectLayout(text);
  const firstLine = layout.data[0]?.line ?? 1;
  const rows = sampleRows(text, layout.delimiter, firstLine - 1);
  const columns = describeColumns(layout, rows);
  const isNamed = layout.header !== null;
  const others = (time: TableColumn, date: TableColumn | null) =>
    columns.filter((column) => column.index !== time.index && column.index !== date?.index);
  const time = chooseTime(
    columns,
    (column) => {
      const probe = rankProbes(others(column, null), isNamed)[0]?.column;
      if (probe === undefined) return null;
      const { unit } = chooseUnit(probe, others(column, null), layout.preamble, targetCelsius);
      return probe.values.map((value) => (value === null ? null : celsiusIn(value, unit)));
    },
    layout.decimal,
  );
  if (time === null) throw noTime(columns, isNamed, firstLine);
  const left = others(time.column, time.date);
  const ranked = rankProbes(left, isNamed);
  const probe = ranked[0]?.column;
  if (probe === undefined) {
    throw new RecordError('No column of this table can be read as a temperature.', firstLine);
  }
  const { unit, assumed: unitAssumed } = chooseUnit(probe, left, layout.preamble, targetCelsius);
  const second = ranked.slice(1).find((one) => one.isSecond)?.column ?? null;
  const choice: RecordChoice = {
    delimiter: layout.delimiter,
    decimal: layout.decimal,
    headerLine: layout.header?.line ?? null,
    timeColumn: time.column.index,
    timeFormat: time.format,
    temperatureColumn: probe.index,
    secondColumn: second?.index ?? null,
    unit,
    ...(time.date === null ? {} : { dateColumn: time.date.index }),
  };
  const temperatures = ranked.map((one) => one.column);
  return {
    delimiter: layout.delimiter,
    decimal: layout.decimal,
    headerLine: layout.header?.line ?? null,
    columns: columns.map((column) => ({
      index: column.index,
      name: column.name.text,
      role: roleOf(column, time.column, time.date, temperatures),
      unit: column.name.unit ?? (column.index === probe.index ? unit : null),
      sample: column.cells.slice(0, SAMPLE),
    })),
    time: { column: time.column.index, format: time.format },
    assumed: [
      ...layoutWords(layout),
      ...time.assumed,
      ...unitAssumed,
      ...probeWords(temperatures, probe, second),
    ],
    choice,
  };
}

function roleOf(
  column: TableColumn,
  time: TableColumn,
  date: TableColumn | null,
  temperatures: readonly TableColumn[],
): DetectedColumn['role'] {
  if (column.index === time.index) return 'time';
  if (column.index === date?.index) return 'date';
  return temperatures.some((one) => one.index === column.index) ? 'temperature' : 'other';
}

function noTime(columns: readonly TableColumn[], isNamed: boolean, line: number): RecordError {
  const counter = columns.find((column) => column.name.meanings.has('counter'));
  const untimed = columns.filter((column) => column.name.timeFormat === null);
  if (rankProbes(untimed, isNamed).length === 0) {
    return new RecordError('No column of this table can be read as a temperature.', line);
  }
  return new RecordError(
    counter === undefined
      ? 'No column of this table can be read as a time. A column of times, or of minutes or seconds, is needed.'
      : `No column of this table can be read as a time: ${columnWords(counter)} only counts the rows, and the step between them is not known. A column of times, or of minutes or seconds, is needed.`,
    line,
  );
}

/** A comma as the decimal sign is told, since it changes every number. */
function layoutWords(layout: TableLayout): string[] {
  return layout.decimal === ',' && layout.delimiter !== ';' && layout.delimiter !== '\t'
    ? ['The comma is read as the decimal sign.']
    : [];
}

/** Which of several temperatures is proposed, and which probes were not connected. */
function probeWords(
  temperatures: readonly TableColumn[],
  probe: TableColumn,
  second: TableColumn | null,
): string[] {
  const words: string[] = [];
  for (const column of temperatures) {
    if (column.faultShare < UNCONNECTED_SHARE || column.cells.length < 5) continue;
    const sample = column.cells.find((cell) => cell !== '') ?? '';
    words.push(
      `${columnWords(column)} reads ${sample.slice(0, 20)} almost all the time: its probe was probably not connected.`,
    );
  }
  if (temperatures.length > 1 || !isTemperatureByName(probe)) {
    words.push(
      second === null
        ? `${columnWords(probe)} is taken as the temperature.`
        : `${columnWords(probe)} is taken as the temperature and ${columnWords(second)} as the second probe.`,
    );
  }
  return words;
}
