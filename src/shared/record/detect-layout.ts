import { isUnitCell, readColumnName } from './column-name.ts';
import { parseNumber, parseTemperature } from './parse-number.ts';
import { parseTime } from './parse-time.ts';
import { isFaultWord } from './record-words.ts';
import { RecordError } from './record-error.ts';
import type { Delimiter } from './scan-rows.ts';
import { isComment, scanRows } from './scan-rows.ts';

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
  /** What stands above the header. */
  readonly preamble: readonly TableRow[];
  /** The first rows of readings. */
  readonly data: readonly TableRow[];
}

const LINES = 300;
/** Enough for 300 long lines; what is longer is not looked at. */
const CHARACTERS = 256 * 1024;

/**
 * Delimiters in the order in which they are believed when they fit equally well, and how much a row
 * so parted counts: blanks also part a date from its time and a number from its unit.
 */
const DELIMITERS: readonly { delimiter: Delimiter; weight: number }[] = [
  { delimiter: '\t', weight: 1 },
  { delimiter: ';', weight: 1 },
  { delimiter: '|', weight: 1 },
  { delimiter: ',', weight: 1 },
  { delimiter: '  ', weight: 0.55 },
  { delimiter: ' ', weight: 0.5 },
];

/** Lays out the first lines by every delimiter and decimal sign, and keeps what fits best. */
export function detectLayout(text: string): TableLayout {
  let best: TableLayout | null = null;
  let bestScore = 0;
  let failure: RecordError | null = null;
  const head = text.slice(0, CHARACTERS);
  for (const { delimiter, weight } of DELIMITERS) {
    try {
      const rows: TableRow[] = [];
      scanRows(head, delimiter, (cells, line) => {
        rows.push({ line, cells });
        return rows.length < LINES;
      });
      for (const decimal of ['.', ','] as const) {
        const scored = rows.map((row) => ({ row, score: rowScore(row, delimiter, decimal) }));
        const score = weight * scored.reduce((sum, one) => sum + Math.max(0, one.score), 0);
        if (score <= bestScore) continue;
        bestScore = score;
        best = layoutOf(scored, delimiter, decimal);
      }
    } catch (error) {
      if (!(error instanceof RecordError)) throw error;
      failure ??= error;
    }
  }
  if (best === null) {
    throw (
      failure ??
      new RecordError(
        'No table was found: no line holds a time and a temperature side by side.',
        firstLine(text),
      )
    );
  }
  refuseSplitDecimals(best);
  return best;
}

/** Line of the first that is not blank; null for an empty text. */
function firstLine(text: string): number | null {
  const at = text.search(/\S/);
  if (at < 0) return null;
  return text.slice(0, at).split(/\r\n|\r|\n/).length;
}

interface ScoredRow {
  readonly row: TableRow;
  readonly score: number;
}

function layoutOf(
  scored: readonly ScoredRow[],
  delimiter: Delimiter,
  decimal: '.' | ',',
): TableLayout {
  const counts = new Map<number, number>();
  for (const { row, score } of scored) {
    if (score > 0) counts.set(row.cells.length, (counts.get(row.cells.length) ?? 0) + 1);
  }
  const width = [...counts].sort((a, b) => b[1] - a[1] || b[0] - a[0])[0]?.[0] ?? 0;
  const data = scored
    .filter(({ row, score }) => score > 0 && row.cells.length === width)
    .map(({ row }) => row);
  const begins = data[0]?.line ?? Infinity;
  const above = scored
    .map(({ row }) => row)
    .filter((row) => row.line < begins && row.cells.some((cell) => cell !== ''));
  let units: TableRow | null = null;
  let header = above.pop() ?? null;
  while (header !== null && isRuler(header)) header = above.pop() ?? null;
  if (header !== null && isUnitRow(header)) {
    units = header;
    header = above.pop() ?? null;
  }
  const named = header === null ? null : asNames(header, width);
  if (header !== null && named === null) above.push(header);
  // Units alone, without names above them, are names enough.
  return named === null && units !== null
    ? { delimiter, decimal, header: units, units: null, preamble: above, data }
    : { delimiter, decimal, header: named, units, preamble: above, data };
}

/** A line of dashes under the names, as in printed tables. */
function isRuler(row: TableRow): boolean {
  return row.cells.every((cell) => /^[-=+_|:]*$/.test(cell));
}

/** The row as names of so many columns; null if it holds none. A comment may be a row of names too. */
function asNames(row: TableRow, width: number): TableRow | null {
  const isNote = isComment(row.cells);
  let cells: readonly string[] = row.cells;
  if (isNote) {
    const first = (cells[0] ?? '').replace(/^(?:#+|\/\/|;+|%+|!+)\s*/, '');
    cells = first === '' ? cells.slice(1) : [first, ...cells.slice(1)];
  }
  const filled = cells.filter((cell) => cell !== '');
  const isNarrow = filled.length < Math.min(2, width) || (isNote && cells.length !== width);
  if (isNarrow || filled.length === 0) return null;
  const numbers = filled.filter((cell) => parseNumber(cell, '.') !== null);
  const first = readColumnName(filled[0] ?? '', '').meanings;
  const isLed = first.has('time') || first.has('date') || first.has('counter');
  if (numbers.length > 0 && !isLed) return null;
  return { line: row.line, cells };
}

/** Names for fewer columns than there are: a decimal comma was taken for the mark between columns. */
function refuseSplitDecimals(layout: TableLayout): void {
  const { header, data, delimiter } = layout;
  const first = data[0];
  if (delimiter !== ',' || header === null || first === undefined) return;
  const names = header.cells.length;
  if (names < 2 || !data.every((row) => row.cells.filter((cell) => cell !== '').length > names))
    return;
  throw new RecordError(
    `Line ${first.line} has ${first.cells.length} cells under ${names} names: commas part the columns and seem to be decimal signs too, which cannot be told apart. Save the table with semicolons, or with decimal points.`,
    first.line,
  );
}

/**
 * How well a line reads as readings: one for each value, a number or a time, less for words and for
 * a thousands sign that may be a delimiter. A row of readings has two values at least (or one and the
 * word for an open probe), and no more words than values.
 */
function rowScore(row: TableRow, delimiter: Delimiter, decimal: '.' | ','): number {
  if (isComment(row.cells)) return 0;
  let values = 0;
  let others = 0;
  let faults = 0;
  let doubtful = 0;
  const foreign = decimal === '.' ? ',' : '.';
  for (const cell of row.cells) {
    if (cell === '') continue;
    if (isValue(cell, decimal)) {
      values += 1;
      if (parseNumber(cell, decimal) === null) continue;
      if (cell.includes(foreign)) doubtful += 1;
      else if (delimiter === ',' && cell.includes(' ')) doubtful += 3;
    } else if (isFaultWord(cell)) faults += 1;
    else others += 1;
  }
  if (values + Math.min(1, faults) < 2 || values < others) return 0;
  const perWord = delimiter === ' ' ? 3 : 1.5;
  return Math.max(0.1, values + 0.5 * Math.min(1, faults) - perWord * others) - 0.5 * doubtful;
}

/** A value is a number, a temperature or a time. */
function isValue(cell: string, decimal: '.' | ','): boolean {
  return parseTemperature(cell, decimal) !== null || isTimeCell(cell, decimal);
}

/** Whether a cell reads as a clock, a date or a number with a unit of time. */
export function isTimeCell(cell: string, decimal: '.' | ','): boolean {
  const code = cell.charCodeAt(0);
  const isWord = !(code >= 48 && code <= 57) && !'-−+.pP'.includes(cell.charAt(0));
  if (isWord && !/\d/.test(cell)) return false;
  return (
    parseTime(cell, 'h:mm:ss', decimal) !== null ||
    parseTime(cell, 'm:ss', decimal) !== null ||
    parseTime(cell, 'timestamp-dmy', decimal) !== null ||
    parseTime(cell, 'timestamp-mdy', decimal) !== null ||
    parseTime(cell, 'timestamp-ymd', decimal) !== null ||
    parseTime(cell, 'seconds', decimal) !== null ||
    parseTime(cell, 'minutes', decimal) !== null ||
    parseTime(cell, 'hours', decimal) !== null ||
    parseTime(cell, 'milliseconds', decimal) !== null
  );
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
