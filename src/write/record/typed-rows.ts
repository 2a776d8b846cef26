import type { Reading } from '#shared/firing/types.ts';
import { MAX_TYPED_ROWS, type RecordFields } from '#shared/note/plan.ts';

export type TypedRow = RecordFields['typedRows'][number];
type Rows = readonly TypedRow[];

/** The rows with one cell changed; the row after the last comes into being by being typed in. */
export function setCell(
  rows: Rows,
  index: number,
  column: keyof TypedRow,
  value: number | null,
): TypedRow[] {
  if (index < rows.length) {
    return rows.map((row, at) => (at === index ? { ...row, [column]: value } : row));
  }
  if (value === null || rows.length >= MAX_TYPED_ROWS) return [...rows];
  return [...rows, { minute: null, celsius: null, [column]: value }];
}

export function isBlank(row: TypedRow): boolean {
  return row.minute === null && row.celsius === null;
}

/** The rows with readings put in at one; a blank row there is written over. */
export function withReadings(rows: Rows, index: number, readings: readonly Reading[]): TypedRow[] {
  const here = rows[index];
  const rest = rows.slice(here && isBlank(here) ? index + 1 : index);
  return [
    ...rows.slice(0, index),
    ...readings.map(({ minute, celsius }) => ({ minute, celsius })),
    ...rest,
  ];
}

/** Whether no minute is less than one above it. */
export function isInOrder(rows: Rows): boolean {
  let latest = -Infinity;
  return rows.every(({ minute }) => {
    if (minute === null) return true;
    const fits = minute >= latest;
    latest = minute;
    return fits;
  });
}

/** By minute; a row without one stays behind the row it was written under. */
export function sortedByMinute(rows: Rows): TypedRow[] {
  let latest = -Infinity;
  return rows
    .map((row) => ({ row, at: (latest = row.minute ?? latest) }))
    .sort((a, b) => a.at - b.at)
    .map(({ row }) => row);
}

/** The complete rows, as readings. */
export function completeReadings(rows: Rows): Reading[] {
  return rows.flatMap(({ minute, celsius }) =>
    minute === null || celsius === null ? [] : [{ minute, celsius }],
  );
}

/** So late a first reading was read off a clock, not counted from the lighting. */
const CLOCK_MINUTES = 180;

/** The minute the rows start at, where they were plainly read off a clock; else null. */
export function clockStart(rows: Rows): number | null {
  const first = rows.find(({ minute }) => minute !== null)?.minute ?? null;
  return first !== null && first >= CLOCK_MINUTES ? first : null;
}

/** The same rows counted from another minute, as 0; marks are moved the same way. */
export function countedFrom<Row extends { readonly minute: number | null }>(
  rows: readonly Row[],
  start: number,
): Row[] {
  return rows.map((row) =>
    row.minute === null ? row : { ...row, minute: Math.round((row.minute - start) * 1e4) / 1e4 },
  );
}
