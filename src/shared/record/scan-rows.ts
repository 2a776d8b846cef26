import { RecordError } from './record-error.ts';
import { RECORD_LIMITS } from './record-limits.ts';

/** Between cells; one space stands for any run of spaces and tabs, two for a run of two or more. */
export const DELIMITERS = [',', ';', '\t', '|', ' ', '  '] as const;
export type Delimiter = (typeof DELIMITERS)[number];

/** Signs a line of remarks begins with. */
const REMARKS = ['#', '//', '%', '!'];

/** Whether a row is a remark and no data. A semicolon begins one only where it is no delimiter. */
export function isComment(cells: readonly string[]): boolean {
  const first = cells[0] ?? '';
  if (first === '') return false;
  return REMARKS.some((sign) => first.startsWith(sign)) || first.startsWith(';');
}

/**
 * Walks the rows of a text once, character by character: cells trimmed, quotes as in RFC 4180 (a
 * quote opens only at a cell's beginning, two inside are one), lines ended by CR, LF or both. Blank
 * lines give one empty cell.
 * @param onRow gets the cells and the line the row begins on; false stops
 * @throws RecordError for more than 50 columns or a cell over 1 kB
 */
export function scanRows(
  text: string,
  delimiter: Delimiter,
  onRow: (cells: string[], line: number) => boolean,
): void {
  let line = 1;
  let at = text.charCodeAt(0) === 0xfeff ? 1 : 0;
  while (at < text.length) {
    const rowLine = line;
    const cells: string[] = [];
    for (;;) {
      const cell = readCell(text, at, delimiter, rowLine, cells.length + 1);
      line += cell.newlines;
      at = cell.next;
      cells.push(cell.value);
      if (cells.length > RECORD_LIMITS.columns) {
        const most = RECORD_LIMITS.columns;
        throw new RecordError(
          `Line ${rowLine} has more than ${most} columns, the most a record may have.`,
          rowLine,
        );
      }
      if (at >= text.length || isLineEnd(text.charCodeAt(at))) break;
      at += 1;
      if (delimiter === ' ' || delimiter === '  ') {
        at = skipBlanks(text, at);
        if (at >= text.length || isLineEnd(text.charCodeAt(at))) break;
      }
    }
    if (text.charCodeAt(at) === 13 && text.charCodeAt(at + 1) === 10) at += 1;
    at += 1;
    line += 1;
    if (!onRow(cells, rowLine)) return;
  }
}

interface Cell {
  readonly value: string;
  /** Index of the delimiter, line end or end of text behind the cell. */
  readonly next: number;
  readonly newlines: number;
}

function isLineEnd(code: number): boolean {
  return code === 10 || code === 13;
}
function isBlank(code: number): boolean {
  return code === 32 || code === 9 || code === 0xa0;
}
function isDelimiterAt(text: string, at: number, delimiter: Delimiter): boolean {
  const code = text.charCodeAt(at);
  if (delimiter === ' ') return code === 32 || code === 9;
  if (delimiter === '  ') return code === 9 || (code === 32 && isBlank(text.charCodeAt(at + 1)));
  return code === delimiter.charCodeAt(0);
}

function skipBlanks(text: string, at: number): number {
  let i = at;
  while (i < text.length && isBlank(text.charCodeAt(i))) i += 1;
  return i;
}

function readCell(
  text: string,
  from: number,
  delimiter: Delimiter,
  line: number,
  column: number,
): Cell {
  let at = from;
  while (
    at < text.length &&
    isBlank(text.charCodeAt(at)) &&
    (delimiter === ' ' || delimiter === '  ' || !isDelimiterAt(text, at, delimiter))
  ) {
    at += 1;
  }
  if (text.charCodeAt(at) === 34) return readQuoted(text, at + 1, delimiter, line, column);
  const start = at;
  while (at < text.length) {
    const code = text.charCodeAt(at);
    if (isLineEnd(code) || isDelimiterAt(text, at, delimiter)) break;
    at += 1;
    if (at - start > RECORD_LIMITS.cellCharacters) throw tooLong(line, column);
  }
  return { value: withoutWrapping(text.slice(start, at).trim()), next: at, newlines: 0 };
}

/** A cell wrapped in single quotes, or as a spreadsheet's formula of a text: '20' and ="20". */
function withoutWrapping(value: string): string {
  const first = value.charCodeAt(0);
  if (first !== 39 && first !== 61) return value;
  const isWrapped = value.length >= 2 && value.endsWith("'");
  if (first === 39) return isWrapped ? value.slice(1, -1).trim() : value;
  return value.length >= 3 && value.startsWith('="') && value.endsWith('"')
    ? value.slice(2, -1).trim()
    : value;
}

function readQuoted(
  text: string,
  from: number,
  delimiter: Delimiter,
  line: number,
  column: number,
): Cell {
  const parts: string[] = [];
  let at = from;
  let start = from;
  let newlines = 0;
  for (; at < text.length; at += 1) {
    if (at - from > RECORD_LIMITS.cellCharacters) throw tooLong(line, column);
    const code = text.charCodeAt(at);
    if (code === 10 || (code === 13 && text.charCodeAt(at + 1) !== 10)) newlines += 1;
    if (code !== 34) continue;
    parts.push(text.slice(start, at));
    if (text.charCodeAt(at + 1) !== 34) break;
    parts.push('"');
    at += 1;
    start = at + 1;
  }
  if (at >= text.length) {
    throw new RecordError(`A quotation mark opened on line ${line} is never closed.`, line, column);
  }
  at += 1;
  const rest = at;
  while (at < text.length) {
    const code = text.charCodeAt(at);
    if (isLineEnd(code) || isDelimiterAt(text, at, delimiter)) break;
    at += 1;
    if (at - rest > RECORD_LIMITS.cellCharacters) throw tooLong(line, column);
  }
  return { value: (parts.join('') + text.slice(rest, at)).trim(), next: at, newlines };
}

function tooLong(line: number, column: number): RecordError {
  return new RecordError(
    `Line ${line}, column ${column}: a cell is longer than 1 kB, the most a record may have (is a quotation mark missing?).`,
    line,
    column,
  );
}
