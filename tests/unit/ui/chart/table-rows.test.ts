import { describe, expect, it } from 'vitest';
import { tableRows } from '../../../../src/ui/chart/table-rows.ts';

type Point = readonly [number, number];
const none = { secondProbe: null, overlay: null, thinned: false };
const LONG = Array.from({ length: 3001 }, (_, index): Point => [
  index / 10,
  index === 1234 ? 1111 : Math.min(1000, index / 3),
]);

describe('tableRows', () => {
  it('has every reading of a short record', () => {
    const points: Point[] = [
      [0, 20],
      [7, 300],
      [11, 500],
    ];
    const { rows, stepMinutes } = tableRows({ ...none, points }, { from: 0, to: 11 });
    expect(stepMinutes).toBeNull();
    expect(rows.map(({ minute, celsius }) => [minute, celsius])).toEqual(points);
  });

  it('has even minutes of a long one, both ends, and its highest reading between them', () => {
    const { rows, stepMinutes } = tableRows({ ...none, points: LONG }, { from: 0, to: 300 });
    expect(stepMinutes).toBe(5);
    expect(rows).toHaveLength(62);
    expect(rows[0]?.minute).toBe(0);
    expect(rows.at(-1)?.minute).toBe(300);
    expect(rows.filter(({ highest }) => highest)).toMatchObject([{ minute: 123.4, celsius: 1111 }]);
    expect(rows.every(({ minute }, index) => minute > (rows[index - 1]?.minute ?? -1))).toBe(true);
  });

  it('follows what the chart shows, every reading once there are few', () => {
    const { rows } = tableRows({ ...none, points: LONG }, { from: 120, to: 125 });
    expect(rows).toHaveLength(51);
    const thinned = tableRows({ ...none, points: LONG, thinned: true }, { from: 120, to: 125 });
    expect(thinned.stepMinutes).toBe(0.1);
  });

  it('tells the second probe and the record compared with at the same minutes', () => {
    const points: Point[] = [
      [0, 20],
      [10, 120],
    ];
    const secondProbe: Point[] = [
      [0, 10],
      [5, 60],
    ];
    const { rows } = tableRows(
      { ...none, points, secondProbe, overlay: points },
      { from: 0, to: 10 },
    );
    expect(rows.map(({ second, overlay }) => [second, overlay])).toEqual([
      [10, 20],
      [null, 120],
    ]);
  });
});
