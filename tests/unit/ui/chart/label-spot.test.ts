import { describe, expect, it } from 'vitest';
import { chartFrame } from '../../../../src/ui/chart/chart-frame.ts';
import { labelSpot } from '../../../../src/ui/chart/label-spot.ts';

const frame = chartFrame({
  window: { from: 0, to: 60 },
  degrees: { low: 0, high: 1200 },
  unit: 'C',
  width: 900,
  lanes: 0,
});
const MAIN = [
  [0, 20],
  [60, 1000],
] as const;

describe('labelSpot', () => {
  it('stands above a line that runs above the other, below one that runs below', () => {
    const above = [
      [0, 220],
      [50, 1050],
    ] as const;
    const below = [
      [0, 20],
      [60, 600],
    ] as const;
    expect(labelSpot(above, [MAIN], frame, 120)?.anchor).toBe('end');
    expect(labelSpot(below, [MAIN], frame, 120)?.anchor).toBe('start');
  });

  it('stays inside the plot', () => {
    const spot = labelSpot(MAIN, [], frame, 200);
    expect(spot).not.toBeNull();
    const end = (spot?.x ?? 0) + (spot?.anchor === 'start' ? 200 : 0);
    const start = (spot?.x ?? 0) - (spot?.anchor === 'end' ? 200 : 0);
    expect(start).toBeGreaterThan(frame.plot.left);
    expect(end).toBeLessThan(frame.plot.right);
  });

  it('is nowhere for a line out of sight', () => {
    expect(
      labelSpot(
        [
          [70, 500],
          [80, 600],
        ],
        [MAIN],
        frame,
        100,
      ),
    ).toBeNull();
  });
});
