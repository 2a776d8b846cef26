import type { Reading } from '#shared/firing/types.ts';
import type { NoteFields } from '#shared/note/note-fields.ts';
import { MARKS } from '#shared/vocabulary/marks.ts';
import type { RecordContent } from './record-content.ts';

type Mark = NoteFields['record']['marks'][number];

interface Row {
  readonly minute: number;
  celsius?: number;
  second?: number;
  mark?: string;
}

/**
 * A record as CSV, whole: minute and °C, a column for the second probe where there is one, and one
 * for the marks where there are any, each on a line of its own. Numbers and words of a closed list
 * only, so no cell can be taken for a formula. Spyhole reads the table back as it was.
 */
export function recordCsv(content: RecordContent, marks: readonly Mark[]): string {
  const { readings, secondProbe } = content;
  const rows = rowsOf(readings, secondProbe ?? []);
  for (const mark of marks) rows.push({ minute: mark.minute, mark: wordsOf(mark) });
  // Alone, the readings stay in the order of their file.
  if (secondProbe || marks.length > 0) rows.sort((one, other) => one.minute - other.minute);
  const cells = (row: Row): string[] => [
    numberCell(row.minute),
    numberCell(row.celsius),
    ...(secondProbe ? [numberCell(row.second)] : []),
    ...(marks.length > 0 ? [row.mark ?? ''] : []),
  ];
  const names = [
    'minute',
    ...(secondProbe ? ['probe 1 celsius', 'probe 2 celsius'] : ['celsius']),
    ...(marks.length > 0 ? ['mark'] : []),
  ];
  return `${[names, ...rows.map(cells)].map((row) => row.join(',')).join('\r\n')}\r\n`;
}

/** One row for both probes where they were read in the same minute, else a row each. */
function rowsOf(readings: readonly Reading[], secondProbe: readonly Reading[]): Row[] {
  const rows: Row[] = readings.map(({ minute, celsius }) => ({ minute, celsius }));
  const free = new Map<number, Row[]>();
  for (const row of [...rows].reverse()) {
    const same = free.get(row.minute);
    if (same) same.push(row);
    else free.set(row.minute, [row]);
  }
  for (const { minute, celsius } of secondProbe) {
    const row = free.get(minute)?.pop();
    if (row) row.second = celsius;
    else rows.push({ minute, second: celsius });
  }
  return rows;
}

/** Finer than any logger writes. */
const numberCell = (value: number | undefined): string =>
  value === undefined ? '' : String(Math.round(value * 1e4) / 1e4);

/** What was done, in the words of the page; what the author wrote beside it stays there. */
const wordsOf = ({ kind, percent }: Mark): string =>
  percent === null ? MARKS[kind] : `${MARKS[kind]} ${String(percent)} %`;
