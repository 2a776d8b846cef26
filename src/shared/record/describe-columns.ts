import { readColumnName, type ColumnName } from './column-name.ts';
import type { TableLayout } from './detect-layout.ts';
import { isTimeCell } from './detect-layout.ts';
import { parseNumber, parseTemperature, type TemperatureUnit } from './parse-number.ts';
import { faultsIn } from './fault-values.ts';
import { isFaultWord } from './record-words.ts';

/** A column of a table and what its cells, sampled over the whole file, say of it. */
export interface TableColumn {
  readonly index: number;
  readonly name: ColumnName;
  readonly cells: readonly string[];
  /** The cells as numbers, units taken off; null for what is none. */
  readonly values: readonly (number | null)[];
  /** The same without what loggers write for a probe that is not connected. */
  readonly connected: readonly number[];
  readonly cellUnit: TemperatureUnit | null;
  /** Of the filled cells, how many are numbers, times, faults; shares from 0 to 1. */
  readonly numberShare: number;
  readonly timeShare: number;
  readonly faultShare: number;
  /** Lowest and highest connected reading; a single leap is not believed. */
  readonly low: number;
  readonly high: number;
}

/** Describes every column by its name and its cells. */
export function describeColumns(
  layout: TableLayout,
  rows: readonly (readonly string[])[],
): TableColumn[] {
  const width = layout.data[0]?.cells.length ?? 0;
  const names = withoutLabels(
    Array.from({ length: width }, (_, index) =>
      readColumnName(layout.header?.cells[index] ?? '', unitAt(layout, index)),
    ),
  );
  return names.map((name, index) => {
    const cells = rows.map((row) => row[index] ?? '');
    const parsed = cells.map((cell) => parseTemperature(cell, layout.decimal));
    const values = parsed.map((one) => one?.value ?? null);
    const filled = Math.max(1, cells.filter((cell) => cell !== '').length);
    const numbers = values.filter((value) => value !== null).length;
    const isUntimed = numbers >= 0.9 * filled;
    const times = isUntimed ? 0 : cells.filter((cell) => isTimeCell(cell, layout.decimal)).length;
    const isFault = faultsIn(values);
    const connected = values.filter(
      (value, i): value is number => value !== null && isFault[i] === 0,
    );
    const faults = cells.filter((cell) => isFaultWord(cell)).length + numbers - connected.length;
    const sorted = Float64Array.from(connected).sort();
    return {
      index,
      name,
      cells,
      values,
      connected,
      cellUnit: parsed.find((one) => one?.unit != null)?.unit ?? null,
      numberShare: numbers / filled,
      timeShare: times / filled,
      faultShare: faults / filled,
      low: sorted[Math.min(2, Math.floor(sorted.length / 50))] ?? 0,
      high: sorted[sorted.length - 1 - Math.min(2, Math.floor(sorted.length / 50))] ?? 0,
    };
  });
}

function unitAt(layout: TableLayout, index: number): string {
  return layout.units?.cells[index] ?? '';
}

/** Names without the units that are labels: beside "Probe A" a "Probe C" is no probe in °C. */
function withoutLabels(names: readonly ColumnName[]): readonly ColumnName[] {
  const stems = new Set<string>();
  for (const { text } of names) {
    const letter = /[\s_-][abde]$/i.exec(text.trim());
    if (letter !== null) stems.add(text.trim().slice(0, -1));
  }
  if (stems.size === 0) return names;
  return names.map((name) =>
    name.isUnitALetter && stems.has(name.text.trim().slice(0, -1))
      ? { ...name, unit: null, temperatureUnit: null, isUnitALetter: false }
      : name,
  );
}

/** The column's cells as bare numbers; null for what is none. */
export function bareNumbers(column: TableColumn, decimal: '.' | ','): (number | null)[] {
  return column.cells.map((cell) => parseNumber(cell, decimal));
}

/** A running number: always one more than the row before, or by the same step where rows were left out. */
export function isCounter(column: TableColumn): boolean {
  const { values } = column;
  if (values.length < 3) return false;
  const step = (values[1] ?? 0) - (values[0] ?? 0);
  return (
    Number.isInteger(step) &&
    step >= 1 &&
    Math.log2(step) % 1 === 0 &&
    values.every(
      (value, i) =>
        i === 0 ||
        i === values.length - 1 ||
        (value !== null && value === (values[i - 1] ?? 0) + step),
    )
  );
}

/** "Column 2 (Kiln)", as sentences name it. */
export function columnWords(column: TableColumn): string {
  const { text } = column.name;
  return `Column ${column.index + 1}${text === '' ? '' : ` (${text.slice(0, 60)})`}`;
}
