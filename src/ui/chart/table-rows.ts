import { celsiusAt, type HeatPoint } from '#shared/heat/heat-stops.ts';
import { firstIndexFrom } from '#shared/record/thin-to-columns.ts';
import type { MinuteWindow } from './minute-window.ts';

const MOST_ROWS = 120;
const STEPS = [0.1, 0.25, 0.5, 1, 2, 5, 10, 15, 30, 60, 120, 240];

type Line = readonly HeatPoint[];

export interface TableSources {
  readonly points: Line;
  readonly secondProbe: Line | null;
  readonly overlay: Line | null;
  /** Not every reading is at hand: rows are even minutes of the course, however few there are. */
  readonly thinned: boolean;
}

export interface TableRow {
  readonly minute: number;
  /** °C; null where the record has not begun or has ended. */
  readonly celsius: number | null;
  readonly second: number | null;
  readonly overlay: number | null;
  readonly highest: boolean;
}

/**
 * The rows of the table beside a chart: every reading in the window when there are few, else values
 * at even minutes with the highest reading between them, so that no peak is lost.
 */
export function tableRows(
  { points, secondProbe, overlay, thinned }: TableSources,
  window: MinuteWindow,
): { readonly rows: readonly TableRow[]; readonly stepMinutes: number | null } {
  const own = points.slice(
    firstIndexFrom(points, window.from),
    firstIndexFrom(points, window.to + 1e-9),
  );
  const row = (minute: number, celsius: number | null, highest = false): TableRow => ({
    minute,
    celsius,
    second: secondProbe && celsiusAt(secondProbe, minute),
    overlay: overlay && celsiusAt(overlay, minute),
    highest,
  });
  if (!thinned && own.length <= MOST_ROWS) {
    return { rows: own.map(([minute, celsius]) => row(minute, celsius)), stepMinutes: null };
  }
  const span = window.to - window.from;
  const step = STEPS.find((minutes) => span / minutes <= MOST_ROWS) ?? span / MOST_ROWS;
  let top: HeatPoint | null = null;
  for (const point of own) if (!top || point[1] > top[1]) top = point;
  const rows: TableRow[] = [];
  for (let index = 0; ; index += 1) {
    const minute = Math.min(window.to, Math.ceil(window.from / step - 1e-9) * step + index * step);
    const before = rows[rows.length - 1]?.minute ?? -Infinity;
    if (top && top[0] > before && top[0] < minute) rows.push(row(top[0], top[1], true));
    const isTop = top !== null && Math.abs(minute - top[0]) < 1e-9;
    rows.push(row(minute, celsiusAt(points, minute), isTop));
    if (minute >= window.to) break;
  }
  return { rows, stepMinutes: step };
}
