import type { Spread } from '#shared/api/figure-topics.ts';

export interface DrawnBox {
  readonly q1: number;
  readonly median: number;
  readonly q3: number;
  readonly interval: { readonly low: number; readonly high: number } | null;
}

interface Mark {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

const POINT_PX = 3;
const COLUMN_PX = 4;

/**
 * The marks of a row, above a rule at `height` px: a square for each value, those that would lie on
 * each other stacked (flatter where the stack is too high, so that none is lost); or the columns of
 * bins, by their counts.
 */
export function spreadMarks(
  spread: Spread,
  xOf: (value: number) => number,
  height: number,
): Mark[] {
  if (spread.kind === 'bins') {
    const most = Math.max(1, ...spread.counts);
    const step = (spread.high - spread.low) / spread.counts.length;
    return spread.counts.flatMap((count, at) => {
      if (count === 0) return [];
      const x = xOf(spread.low + at * step);
      const tall = (count / most) * height;
      const wide = Math.max(1, xOf(spread.low + (at + 1) * step) - x - 1);
      return { x, y: height - tall, width: wide, height: tall };
    });
  }
  const columns = new Map<number, number>();
  const placed = spread.values.map((value) => {
    const column = Math.round(xOf(value) / COLUMN_PX);
    const level = columns.get(column) ?? 0;
    columns.set(column, level + 1);
    return { column, level };
  });
  const step = Math.min(COLUMN_PX, height / Math.max(1, ...columns.values()));
  return placed.map(({ column, level }) => ({
    x: column * COLUMN_PX - POINT_PX / 2,
    y: height - (level + 1) * step,
    width: POINT_PX,
    height: Math.max(0.5, step - 1),
  }));
}
