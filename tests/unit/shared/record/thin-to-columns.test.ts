import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { firstIndexFrom, thinToColumns } from '#shared/record/thin-to-columns.ts';

type Point = readonly [number, number];

/** Records in order of time, some moments twice, as loggers write them. */
const record = fc
  .array(
    fc.tuple(
      fc.integer({ min: 0, max: 40 }).map((steps) => steps / 8),
      fc.integer({ min: -20, max: 1250 }),
    ),
    { maxLength: 400 },
  )
  .map((steps) => {
    let minute = -10;
    return steps.map(([step, celsius]): Point => [(minute += step), celsius]);
  });
const span = fc.tuple(
  fc.integer({ min: -30, max: 600 }),
  fc.integer({ min: 1, max: 500 }),
  fc.integer({ min: 1, max: 60 }),
);
const cases = fc.tuple(record, span);

const inside = (points: readonly Point[], from: number, to: number) =>
  points.filter(([minute]) => minute >= from && minute <= to);
const columnOf = (minute: number, from: number, to: number, columns: number) =>
  Math.min(columns - 1, Math.floor((minute - from) / ((to - from) / columns)));
function byColumn(points: readonly Point[], from: number, to: number, columns: number) {
  const groups = new Map<number, Point[]>();
  for (const point of inside(points, from, to)) {
    const column = columnOf(point[0], from, to, columns);
    groups.set(column, [...(groups.get(column) ?? []), point]);
  }
  return groups;
}

describe('thinToColumns', () => {
  it('keeps the lowest, the highest, the first and the last reading of every column', () => {
    fc.assert(
      fc.property(cases, ([points, [from, length, columns]]) => {
        const to = from + length;
        const thinned = byColumn(thinToColumns(points, from, to, columns), from, to, columns);
        const whole = byColumn(points, from, to, columns);
        expect([...thinned.keys()]).toEqual([...whole.keys()]);
        for (const [column, all] of whole) {
          const kept = thinned.get(column) ?? [];
          const degrees = (list: readonly Point[]) => list.map(([, celsius]) => celsius);
          expect(Math.max(...degrees(kept))).toBe(Math.max(...degrees(all)));
          expect(Math.min(...degrees(kept))).toBe(Math.min(...degrees(all)));
          expect(kept[0]).toBe(all[0]);
          expect(kept.at(-1)).toBe(all.at(-1));
        }
      }),
    );
  });

  it('keeps the order, invents nothing and keeps nothing twice', () => {
    fc.assert(
      fc.property(cases, ([points, [from, length, columns]]) => {
        const thinned = thinToColumns(points, from, from + length, columns);
        const places = thinned.map((point) => points.indexOf(point));
        expect(places.every((place, index) => place > (places[index - 1] ?? -1))).toBe(true);
      }),
    );
  });

  it('never leaves more than four readings a column and one beyond each edge', () => {
    fc.assert(
      fc.property(cases, ([points, [from, length, columns]]) => {
        const to = from + length;
        const thinned = thinToColumns(points, from, to, columns);
        for (const kept of byColumn(thinned, from, to, columns).values()) {
          expect(kept.length).toBeLessThanOrEqual(4);
        }
        const beyond = thinned.filter(([minute]) => minute < from || minute > to);
        expect(beyond).toEqual(
          [
            points.filter(([minute]) => minute < from).at(-1),
            points.find(([minute]) => minute > to),
          ].filter((point) => point !== undefined),
        );
      }),
    );
  });

  it('shows one wild second among fifty thousand', () => {
    const points = Array.from({ length: 50_000 }, (_, second): Point => [second / 60, 700]);
    points[31_415] = [31_415 / 60, 968];
    points[31_416] = [31_416 / 60, 212];
    const thinned = thinToColumns(points, 0, 50_000 / 60, 300);
    expect(thinned.map(([, celsius]) => celsius)).toEqual(expect.arrayContaining([968, 212]));
    expect(thinned.length).toBeLessThanOrEqual(1202);
  });

  it('returns nothing of nothing, and the neighbours of a span without readings', () => {
    expect(thinToColumns([], 0, 10, 5)).toEqual([]);
    const points: Point[] = [
      [0, 20],
      [60, 900],
    ];
    expect(thinToColumns(points, 20, 30, 5)).toEqual(points);
  });
});

describe('firstIndexFrom', () => {
  it('finds the first reading at or after a minute', () => {
    fc.assert(
      fc.property(record, fc.integer({ min: -20, max: 500 }), (points, minute) => {
        const found = points.findIndex(([at]) => at >= minute);
        expect(firstIndexFrom(points, minute)).toBe(found < 0 ? points.length : found);
      }),
    );
  });
});
