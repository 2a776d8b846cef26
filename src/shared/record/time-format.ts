import type { TableColumn } from './describe-columns.ts';
import { bareNumbers, columnWords } from './describe-columns.ts';
import { climbOf, guessTimeUnit } from './guess-time-unit.ts';
import { isClock, parseTime, type TimeFormat } from './parse-time.ts';

/** The year that dates without one are given. */
function isInYear2000(cell: string): boolean {
  const days = (parseTime(cell, 'timestamp', '.') ?? 0) / 1440;
  return days >= 10_957 && days < 11_323;
}

/** Nine of ten, or all but one where there are few: a slip on one line is refused there, with its line. */
function isMost(count: number, all: number): boolean {
  return count >= 1 && count >= all - Math.max(all >= 3 ? 1 : 0, 0.1 * all);
}

export interface FoundFormat {
  readonly format: TimeFormat;
  readonly assumed: readonly string[];
}

/**
 * How the cells of a time column are written; null if they are no times.
 * @param cells with a date's and half of the day's from their own columns
 * @param isDated the date is from a column of its own
 */
export function formatOf(
  cells: readonly string[],
  column: TableColumn,
  celsius: readonly (number | null)[],
  decimal: '.' | ',',
  isDated: boolean,
): FoundFormat | null {
  const filled = cells.filter((cell) => cell !== '');
  if (filled.length === 0) return null;
  const named = column.name.timeFormat;
  const isReadAs = (format: TimeFormat) =>
    isMost(
      filled.filter((cell) => parseTime(cell, format, decimal) !== null).length,
      filled.length,
    );
  const numbers = bareNumbers(column, decimal);
  if (!isDated && isMost(numbers.filter((value) => value !== null).length, filled.length)) {
    if (isReadAs('timestamp')) return { format: 'timestamp', assumed: [] };
    if (named !== null && isReadAs(named) && isTimeUnit(named))
      return { format: named, assumed: [] };
    const { unit, because } = guessTimeUnit(numbers, climbOf(numbers, celsius));
    return {
      format: unit,
      assumed: [`${columnWords(column)} names no unit of time; it is taken ${because}.`],
    };
  }
  if (named !== null && isReadAs(named)) return { format: named, assumed: [] };
  for (const unit of ['minutes', 'seconds', 'hours', 'milliseconds'] as const) {
    if (isReadAs(unit)) return { format: unit, assumed: [] };
  }
  if (isReadAs('timestamp')) {
    const isYearless = !filled.some((cell) => /\d{4}/.test(cell)) && isInYear2000(filled[0] ?? '');
    return {
      format: 'timestamp',
      assumed: isYearless ? ['The dates name no year; any is as good.'] : [],
    };
  }
  return (
    dateOrder(filled, isReadAs, decimal) ??
    (isReadAs('h:mm:ss') || isReadAs('m:ss') ? clockOf(filled, cells, celsius) : null)
  );
}

/** Whether a format is a bare number in a unit. */
export function isTimeUnit(format: TimeFormat): boolean {
  return !isClock(format) && format !== 'm:ss' && !format.startsWith('timestamp');
}

const ORDER_WORDS = {
  'timestamp-dmy': 'day, month, year',
  'timestamp-mdy': 'month, day, year',
  'timestamp-ymd': 'year, month, day',
} as const;
type OrderFormat = keyof typeof ORDER_WORDS;

/** The order of dates in figures: the one that every line allows and that makes the record shortest. */
function dateOrder(
  cells: readonly string[],
  isReadAs: (format: TimeFormat) => boolean,
  decimal: '.' | ',',
): FoundFormat | null {
  const isAmerican = cells.some((cell) => /[ap]\.?m\b/i.test(cell) && cell.includes('/'));
  const usual: OrderFormat[] = isAmerican
    ? ['timestamp-mdy', 'timestamp-dmy', 'timestamp-ymd']
    : ['timestamp-dmy', 'timestamp-mdy', 'timestamp-ymd'];
  const readable = usual.filter((format) => isReadAs(format));
  const lengths = readable.map((format) => {
    let total = 0;
    let before: number | null = null;
    for (const cell of cells) {
      const at = parseTime(cell, format, decimal);
      if (at !== null && before !== null) total += Math.abs(at - before);
      before = at ?? before;
    }
    return { format, total };
  });
  const least = Math.min(...lengths.map((one) => one.total));
  const chosen = lengths.find((one) => one.total <= least + 1e-6);
  if (chosen === undefined) return null;
  const { format } = chosen;
  if (lengths.length === 1) return { format, assumed: [] };
  const isSure = lengths.every((one) => one === chosen || one.total > least + 1e-6);
  return {
    format,
    assumed: [
      isSure
        ? `The dates are read as ${ORDER_WORDS[format]}: read the other way the record would jump.`
        : `The dates may be in another order; they are read as ${ORDER_WORDS[format]}, which changes nothing in the minutes of this record.`,
    ],
  };
}

/** Faster than this no kiln climbs, °C a minute: then the times are hours and minutes. */
const TOO_FAST = 150;
/** Slower than this no firing climbs, °C a minute: then the times are minutes and seconds. */
const TOO_SLOW = 1;

/** Times of two parts are hours and minutes or minutes and seconds; of three, all of them. */
function clockOf(
  filled: readonly string[],
  cells: readonly string[],
  celsius: readonly (number | null)[],
): FoundFormat {
  const isWhole = filled.some((cell) => cell.split(':', 3).length === 3 || !cell.includes(':'));
  if (isWhole) return { format: 'h:mm:ss', assumed: [] };
  if (filled.some((cell) => /[ap]\.?m?\.?$/i.test(cell))) return { format: 'h:mm', assumed: [] };
  const minuteSecond: FoundFormat = {
    format: 'm:ss',
    assumed: ['Times such as 35:20 are read as minutes and seconds.'],
  };
  const isBeyondDay = filled.some((cell) => (parseTime(cell, 'h:mm', '.') ?? 0) >= 24 * 60);
  if (isBeyondDay || filled.some((cell) => /[.,]\d+$/.test(cell))) return minuteSecond;
  const { rate } = climbOf(
    cells.map((cell) => parseTime(cell, 'm:ss', '.')),
    celsius,
  );
  const isSlow = rate !== null && rate / 60 < TOO_SLOW && rate < TOO_FAST;
  return isSlow
    ? minuteSecond
    : { format: 'h:mm', assumed: ['Times such as 0:12 are read as hours and minutes.'] };
}
