import { RecordError } from './record-error.ts';
import type { Delimiter } from './scan-rows.ts';
import { isComment, scanRows } from './scan-rows.ts';

/** At most so many rows are kept, spread evenly over the whole file. */
const MOST = 1024;

/**
 * Rows spread over a whole table, its first and last among them: what a column holds shows only at the
 * peak, and in which order a date is written only after the twelfth. Kept sparser by half whenever they
 * are too many, so time grows with the file's length only. What cannot be scanned is left to the
 * reading, which says so with its line.
 * @param afterLine the last line above the readings
 */
export function sampleRows(
  text: string,
  delimiter: Delimiter,
  afterLine: number,
): readonly (readonly string[])[] {
  let rows: string[][] = [];
  let every = 1;
  let count = 0;
  let last: string[] | null = null;
  try {
    scanRows(text, delimiter, (cells, line) => {
      if (line <= afterLine || isBare(cells) || isComment(cells)) return true;
      last = cells;
      if (count % every === 0) {
        rows.push(cells);
        last = null;
      }
      count += 1;
      if (rows.length >= MOST) {
        rows = rows.filter((_, i) => i % 2 === 0);
        every *= 2;
      }
      return true;
    });
  } catch (error) {
    if (!(error instanceof RecordError)) throw error;
  }
  if (last !== null) rows.push(last);
  return rows;
}

/** Fewer than two cells with anything in them: no reading, but a footer or a title. */
function isBare(cells: readonly string[]): boolean {
  let filled = 0;
  for (const cell of cells) if (cell !== '') filled += 1;
  return filled < 2;
}
