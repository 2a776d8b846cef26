import type { TableColumn } from './describe-columns.ts';
import { isCounter } from './describe-columns.ts';
import { parseTime, type TimeFormat } from './parse-time.ts';
import { formatOf, isTimeUnit, type FoundFormat } from './time-format.ts';
import { isHalfDay, timeText } from './time-text.ts';

/** Where the times of a table stand and how they are written. */
export interface ChosenTime {
  readonly column: TableColumn;
  /** A date in a column of its own; null where there is none. */
  readonly date: TableColumn | null;
  readonly format: TimeFormat;
  readonly assumed: readonly string[];
}

interface Candidate extends ChosenTime {
  readonly score: number;
  readonly minutes: readonly (number | null)[];
}

/**
 * What speaks for a column as the time, and against it; the highest sum is taken, if it is above zero.
 * A name outweighs the look of the cells, cells that run on evenly outweigh a place at the left.
 */
const POINTS = {
  namedTime: 5,
  namedDate: 2,
  namedCounter: -5,
  namedOther: -6,
  hasTimeUnit: 4,
  isClockOrDate: 4,
  hasOwnDate: 2,
  runsOn: 2,
  runsBack: -3,
  isEven: 1,
  isFirst: 1,
  isCounter: -1.5,
  repeats: -4,
} as const;

/**
 * The column of times, with a date's beside it; null when no column runs on like time.
 * @param celsiusBeside the temperatures if this column is the time; null if none would be left
 */
export function chooseTime(
  columns: readonly TableColumn[],
  celsiusBeside: (time: TableColumn) => readonly (number | null)[] | null,
  decimal: '.' | ',',
): ChosenTime | null {
  const dates = columns.filter((column) => isDateOnly(column, decimal));
  let best: Candidate | null = null;
  for (const column of columns) {
    const celsius = dates.includes(column) ? null : celsiusBeside(column);
    if (celsius === null) continue;
    const date = nearest(dates, column);
    for (const candidate of candidatesOf(column, date, columns, celsius, decimal)) {
      if (candidate.score > (best?.score ?? 0)) best = candidate;
    }
  }
  return best;
}

/** Cells that are all dates, without a time of day. */
function isDateOnly(column: TableColumn, decimal: '.' | ','): boolean {
  const filled = column.cells.filter((cell) => cell !== '').slice(0, 40);
  if (filled.length === 0 || filled.some((cell) => cell.includes(':'))) return false;
  const isNamed = column.name.meanings.has('date') && !column.name.meanings.has('time');
  const orders = ['timestamp', 'timestamp-dmy', 'timestamp-mdy', 'timestamp-ymd'] as const;
  return orders.some((format) =>
    filled.every((cell) => {
      const minutes = parseTime(cell, format, decimal);
      return minutes !== null && (isNamed || minutes % 1440 === 0);
    }),
  );
}

function nearest(dates: readonly TableColumn[], column: TableColumn): TableColumn | null {
  return dates.reduce<TableColumn | null>(
    (found, date) =>
      found === null || Math.abs(date.index - column.index) < Math.abs(found.index - column.index)
        ? date
        : found,
    null,
  );
}

function candidatesOf(
  column: TableColumn,
  date: TableColumn | null,
  columns: readonly TableColumn[],
  celsius: readonly (number | null)[],
  decimal: '.' | ',',
): Candidate[] {
  const { name } = column;
  const isTemperature =
    column.cellUnit !== null || name.temperatureUnit !== null || name.hasOtherUnit;
  if (isTemperature) return [];
  const half = columns[column.index + 1];
  const halves =
    half !== undefined && half.cells.every((cell) => cell === '' || isHalfDay(cell)) ? half : null;
  const text = (own: TableColumn | null) =>
    column.cells.map((cell, i) =>
      cell === '' ? '' : timeText(own?.cells[i] ?? '', cell, halves?.cells[i] ?? ''),
    );
  const withDate = date === null ? null : formatOf(text(date), column, celsius, decimal, true);
  if (withDate !== null && withDate.format.startsWith('timestamp')) {
    return [scored(column, date, withDate, text(date), decimal)];
  }
  const alone = formatOf(text(null), column, celsius, decimal, false);
  return alone === null ? [] : [scored(column, null, alone, text(null), decimal)];
}

function scored(
  column: TableColumn,
  date: TableColumn | null,
  found: FoundFormat,
  cells: readonly string[],
  decimal: '.' | ',',
): Candidate {
  const { name } = column;
  const { meanings } = name;
  const minutes = cells.map((cell) => parseTime(cell, found.format, decimal));
  const known = minutes.filter((value) => value !== null);
  let forward = 0;
  let same = 0;
  const steps = new Map<number, number>();
  for (let i = 1; i < known.length; i += 1) {
    const step = (known[i] ?? 0) - (known[i - 1] ?? 0);
    if (step >= 0) forward += 1;
    if (step === 0) same += 1;
    const rounded = Math.round(step * 6000) / 6000;
    steps.set(rounded, (steps.get(rounded) ?? 0) + 1);
  }
  const count = Math.max(1, known.length - 1);
  const isBare =
    isTimeUnit(found.format) &&
    column.cells.some(
      (cell) =>
        parseTime(cell, 'seconds', decimal) !== null &&
        parseTime(cell, 'minutes', decimal) !== null,
    );
  const isBackwards = known.length > 2 && forward - same < 0.05 * count;
  const runsOn = forward >= 0.97 * count || isBackwards;
  let score = 0;
  if (meanings.has('time')) score += POINTS.namedTime;
  else if (meanings.has('date')) score += POINTS.namedDate;
  if (meanings.has('counter')) score += POINTS.namedCounter;
  const isOther = ['quantity', 'change', 'set-point', 'temperature', 'reference', 'kiln'] as const;
  if (isOther.some((meaning) => meanings.has(meaning)) && !meanings.has('time'))
    score += POINTS.namedOther;
  if (name.timeFormat !== null) score += POINTS.hasTimeUnit;
  if (!isBare) score += POINTS.isClockOrDate;
  if (date !== null) score += POINTS.hasOwnDate;
  score += runsOn ? POINTS.runsOn : isBare ? POINTS.runsBack : 0;
  const mostEven = Math.max(0, ...steps.values());
  if (mostEven >= 0.8 * count && same < count) score += POINTS.isEven;
  if (column.index === 0) score += POINTS.isFirst;
  if (isBare && isCounter(column)) score += POINTS.isCounter;
  if (same > 0.3 * count && known.length > 3) score += POINTS.repeats;
  // Numbers without a name that fall and rise are no time, whatever else speaks for them.
  if (isBare && !runsOn && !meanings.has('time') && name.timeFormat === null) score = -1;
  if (isBare && meanings.has('counter') && !meanings.has('time') && name.timeFormat === null)
    score = -1;
  return { column, date, ...found, score, minutes };
}
