import { parseNumber, parseTemperature } from './parse-number.ts';
import { parseTime } from './parse-time.ts';
import type { Delimiter } from './scan-rows.ts';
import { scanRows } from './scan-rows.ts';
import { RecordError } from './record-error.ts';
import { isUnitCell } from './column-words.ts';

export interface TableRow {
  readonly line: number;
  readonly cells: readonly string[];
}
/** How the first lines of a table are laid out. */
export interface TableLayout {
  readonly delimiter: Delimiter;
  readonly decimal: '.' | ',';
  readonly header: TableRow | null;
  readonly units: TableRow | null;
  readonly data: readonly TableRow[];
}

const LINES = 200;
/** Enough for 200 long lines; what is longer is not looked at. */
const CHARACTERS = 256 * 1024;
/** In the order in which they are believed when they fit equally well. */
const DELIMITERS: readonly Delimiter[] = ['\t', ';', ',', ' '];

/** Lays out the first 200 lines by every delimiter and decimal sign, and keeps what fits best. */
export function detectLayout(text: string): TableLayout {
  let best: TableLayout | null = null;
  let bestScore = 0;
  let failure: RecordError | null = null;
  const head = text.slice(0, CHARACTERS);
  for (const delimiter of DELIMITERS) {
    for (const decimal of delimiter === ',' ? (['.'] as const) : (['.', ','] as const)) {
      try {
        const { layout, score } = layoutBy(head, delimiter, decimal);
        if (score > bestScore) {
          best = layout;
          bestScore = score;
        }
      } catch (error) {
        if (!(error instanceof RecordError)) throw error;
        failure ??= error;
      }
    }
  }
  if (best !== null) return best;
  throw (
    failure ??
    new RecordError('No table was found: no line holds a time and a temperature side by side.')
  );
}

function layoutBy(
  text: string,
  delimiter: Delimiter,
  decimal: '.' | ',',
): { layout: TableLayout; score: number } {
  const rows: TableRow[] = [];
  scanRows(text, delimiter, (cells, line) => {
    rows.push({ line, cells });
    return rows.length < LINES;
  });
  const counts = new Map<number, number>();
  for (const row of rows) {
    if (isDataRow(row, decimal))
      counts.set(row.cells.length, (counts.get(row.cells.length) ?? 0) + 1);
  }
  const width = [...counts].sort((a, b) => b[1] - a[1] || b[0] - a[0])[0]?.[0] ?? 0;
  const data = rows.filter((row) => row.cells.length === width && isDataRow(row, decimal));
  const firstLine = data[0]?.line ?? Infinity;
  const above = rows.filter((row) => row.line < firstLine && row.cells.some((cell) => cell !== ''));
  let units: TableRow | null = null;
  let header = above.pop() ?? null;
  if (header !== null && isUnitRow(header)) {
    units = header;
    header = above.pop() ?? null;
  }
  const isName =
    header !== null &&
    !header.cells[0]?.startsWith('#') &&
    header.cells.length >= Math.min(2, width);
  const layout = { delimiter, decimal, header: isName ? header : null, units, data };
  // A space also parts a date from its time and a number from its unit: it is believed less.
  const weight = delimiter === ' ' ? 0.5 : 1;
  return { layout, score: weight * data.reduce((sum, row) => sum + rowScore(row, decimal), 0) };
}

/** A value is a number, a temperature or a time. */
function isValue(cell: string, decimal: '.' | ','): boolean {
  return (
    parseTemperature(cell, decimal) !== null ||
    parseTime(cell, 'h:mm:ss', decimal) !== null ||
    parseTime(cell, 'timestamp', decimal) !== null ||
    parseTime(cell, 'timestamp-dmy', decimal) !== null ||
    parseTime(cell, 'timestamp-mdy', decimal) !== null
  );
}

/**
 * Two values or more, the first two-thirds of its filled cells at least: a line cut in the wrong
 * place has a rest that is no value. A thousands sign inside a number counts against the cut.
 */
function isDataRow(row: TableRow, decimal: '.' | ','): boolean {
  return rowScore(row, decimal) > 0;
}

function rowScore(row: TableRow, decimal: '.' | ','): number {
  let values = 0;
  let others = 0;
  let doubtful = 0;
  for (const cell of row.cells) {
    if (cell === '') continue;
    if (!isValue(cell, decimal)) others += 1;
    else {
      values += 1;
      const foreign = decimal === '.' ? ',' : '.';
      if (cell.includes(foreign) && parseNumber(cell, decimal) !== null) doubtful += 1;
    }
  }
  return values >= 2 && values >= others ? values - 1.5 * others - 0.5 * doubtful : 0;
}

function isUnitRow(row: TableRow): boolean {
  const filled = row.cells.filter((cell) => cell !== '');
  const units = filled.filter((cell) => isUnitCell(cell));
  return (
    filled.length > 0 &&
    units.length * 2 >= filled.length &&
    units.length >= Math.min(2, filled.length)
  );
}
