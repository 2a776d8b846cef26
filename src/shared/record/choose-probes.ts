import type { TableColumn } from './describe-columns.ts';
import { isCounter } from './describe-columns.ts';

/**
 * What speaks for a column as the kiln's probe, and against it. A named temperature that climbs wins;
 * a cold junction, an alarm or a probe that is not connected is taken only where there is nothing else.
 */
const POINTS = {
  namedTemperature: 4,
  namedKiln: 3,
  hasTemperatureUnit: 4,
  /** For a column that climbs half as much as the one that climbs most, or more. */
  climbs: 5,
  reference: -7,
  statistic: -5,
  average: -2,
  quantity: -3,
  /** Evenly rising without a name: rather another way of writing the time. */
  ramp: -4,
  /** Times the share of cells in which nothing is connected, beyond what a loose plug costs. */
  unconnected: -8,
} as const;

/** So much of a column's cells at what an open probe gives: it was not connected. */
export const UNCONNECTED_SHARE = 0.8;
/** No sensor for a kiln gives more or less, in any unit. */
const LEAST_VALUE = -460;
const MOST_VALUE = 4000;

/** So much of a column lost now and then says nothing against its probe: the first named stays first. */
const LOOSE_SHARE = 0.1;

export interface RankedProbe {
  readonly column: TableColumn;
  readonly score: number;
  /** May stand beside the first as a second probe. */
  readonly isSecond: boolean;
}

/** Columns that may be temperatures, the likeliest first; in the order of the file where they are equal. */
export function rankProbes(columns: readonly TableColumn[], isNamed: boolean): RankedProbe[] {
  const candidates = columns.filter((column) => mayBeProbe(column));
  const climbs = candidates.map((column) => (isRamp(column) && isNamed ? 0 : climbOf(column)));
  const most = Math.max(1e-9, ...climbs);
  return candidates
    .map((column) => {
      const { meanings } = column.name;
      const share = climbOf(column) / most;
      let score = POINTS.climbs * Math.min(1, 2 * share);
      if (meanings.has('temperature')) score += POINTS.namedTemperature;
      if (meanings.has('kiln')) score += POINTS.namedKiln;
      if (hasUnit(column)) score += POINTS.hasTemperatureUnit;
      if (meanings.has('reference')) score += POINTS.reference;
      if (meanings.has('statistic')) score += POINTS.statistic;
      if (meanings.has('average')) score += POINTS.average;
      if (meanings.has('quantity')) score += POINTS.quantity;
      if (!isTemperatureByName(column) && isRamp(column)) score += POINTS.ramp;
      score += POINTS.unconnected * Math.max(0, column.faultShare - LOOSE_SHARE);
      const isOddOne = ['reference', 'statistic', 'average', 'quantity'] as const;
      const isSecond =
        (isTemperatureByName(column) || !isNamed) &&
        !isOddOne.some((meaning) => meanings.has(meaning)) &&
        column.faultShare < UNCONNECTED_SHARE &&
        share >= 0.2 &&
        (isTemperatureByName(column) || !isRamp(column));
      return { column, score, isSecond };
    })
    .sort((a, b) => b.score - a.score || a.column.index - b.column.index);
}

/** Whether a column's name or cells say that it is a temperature, of whatever. */
export function isTemperatureByName(column: TableColumn): boolean {
  const { meanings } = column.name;
  return meanings.has('temperature') || meanings.has('kiln') || hasUnit(column);
}

function hasUnit(column: TableColumn): boolean {
  return column.cellUnit !== null || column.name.temperatureUnit !== null;
}

function climbOf(column: TableColumn): number {
  return Math.max(0, column.high - column.low);
}

/** Numbers a probe may give, under a name that does not say that it is something else. */
function mayBeProbe(column: TableColumn): boolean {
  const { meanings, hasOtherUnit } = column.name;
  // A set-point looks like the kiln, only better: it is never taken for it.
  if (meanings.has('set-point') || hasOtherUnit) return false;
  if (meanings.has('change') && !hasUnit(column)) return false;
  const isTemperature = isTemperatureByName(column);
  const isElse = ['time', 'date', 'counter', 'quantity'] as const;
  if (!isTemperature && isElse.some((meaning) => meanings.has(meaning))) return false;
  if (column.timeShare > 0.3 || column.numberShare + column.faultShare < 0.5) return false;
  if (column.numberShare === 0) return isTemperature;
  if (!isTemperature && isCounter(column) && column.values.length > 10) return false;
  return column.low >= LEAST_VALUE && column.high <= MOST_VALUE;
}

/** Rises by one and the same step, all the way. */
function isRamp(column: TableColumn): boolean {
  const { values } = column;
  if (values.length < 4) return false;
  const step = (values[1] ?? 0) - (values[0] ?? 0);
  if (step <= 0) return false;
  for (let i = 1; i < values.length - 1; i += 1) {
    const own = (values[i] ?? NaN) - (values[i - 1] ?? NaN);
    if (!(Math.abs(own - step) <= 0.01 * step)) return false;
  }
  return true;
}
