import { describe, expect, it } from 'vitest';
import { chartFrame, chartLabels } from '../../../src/ui/chart-frame.ts';
import type { RecordChartProps } from '../../../src/ui/record-chart-props.ts';

const props: RecordChartProps = {
  alt: 'A climb.',
  points: [
    [0, 20],
    [60, 990],
  ],
  targetCelsius: 1005,
  marks: [0, 10, 20, 60].map((minute) => ({ minute, label: 'gas up' })),
};

describe('chartFrame', () => {
  it('holds the curve, the target and the ends of the minutes', () => {
    const frame = chartFrame(props, 800, 1);
    expect(frame.highDegrees).toBe(1100);
    expect(frame.yOf(1005)).toBeGreaterThan(frame.plot.top);
    expect(frame.yOf(0)).toBe(frame.plot.bottom);
    expect(frame.xOf(0)).toBe(frame.plot.left);
    expect(frame.xOf(60)).toBe(frame.plot.right);
  });

  it('is ruled in round °F for those who read °F', () => {
    const frame = chartFrame({ ...props, unit: 'F' }, 800, 1);
    expect(frame.highDegrees).toBe(2000);
    expect(frame.lowDegrees).toBe(0);
  });

  it('widens for a longer record laid over it and deepens for frost', () => {
    const frame = chartFrame(
      {
        ...props,
        overlay: {
          label: 'before',
          points: [
            [-5, -12],
            [90, 700],
          ],
        },
      },
      800,
      1,
    );
    expect([frame.startMinute, frame.endMinute]).toEqual([-5, 90]);
    expect(frame.lowDegrees).toBe(-100);
  });
});

describe('chartLabels', () => {
  it('names marks where there is room and numbers them where there is not', () => {
    expect(chartLabels(props, 900).numbered).toBe(false);
    const narrow = chartLabels(props, 360);
    expect(narrow.numbered).toBe(true);
    expect([...narrow.texts.values()]).toEqual(['1', '2', '3', '4']);
  });
});
