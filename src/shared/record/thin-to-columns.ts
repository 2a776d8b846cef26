/** A reading as drawn: minutes, degrees Celsius. */
type Point = readonly [minute: number, celsius: number];

/**
 * Thins a record for drawing between two minutes in so many columns of even width: of each column
 * the first, the lowest, the highest and the last reading, so that a line through them covers the
 * same pixels as a line through all. With them the nearest reading on either side of the span, so
 * that the line runs on to its edges.
 *
 * @param points in order of time
 * @param fromMinute start of the span, included
 * @param toMinute end of the span, included, after its start
 * @param columns at least 1; one a pixel draws the same as everything
 * @returns readings in their own order, at most four a column and one beyond each edge
 */
export function thinToColumns<P extends Point>(
  points: readonly P[],
  fromMinute: number,
  toMinute: number,
  columns: number,
): P[] {
  const count = Math.max(1, Math.floor(columns));
  const width = (toMinute - fromMinute) / count;
  const start = firstIndexFrom(points, fromMinute);
  const kept: P[] = [];
  const keep = (index: number): void => {
    const point = points[index];
    if (point) kept.push(point);
  };
  keep(start - 1);
  let column = -1;
  let first = start;
  let low = start;
  let high = start;
  const flush = (last: number): void => {
    if (column < 0) return;
    const [one, other] = low < high ? [low, high] : [high, low];
    keep(first);
    if (one > first) keep(one);
    if (other > one && other > first) keep(other);
    if (last > other && last > first) keep(last);
  };
  let index = start;
  for (; index < points.length; index += 1) {
    const point = points[index] as P;
    if (point[0] > toMinute) break;
    const own = width > 0 ? Math.min(count - 1, Math.floor((point[0] - fromMinute) / width)) : 0;
    if (own !== column) {
      flush(index - 1);
      column = own;
      first = index;
      low = index;
      high = index;
      continue;
    }
    if (point[1] < (points[low] as P)[1]) low = index;
    if (point[1] > (points[high] as P)[1]) high = index;
  }
  flush(index - 1);
  keep(index);
  return kept;
}

/** Index of the first point at or after a minute; their number when there is none. */
export function firstIndexFrom(points: readonly Point[], minute: number): number {
  let low = 0;
  let high = points.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((points[middle] as Point)[0] < minute) low = middle + 1;
    else high = middle;
  }
  return low;
}
