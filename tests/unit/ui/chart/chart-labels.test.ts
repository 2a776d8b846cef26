import { describe, expect, it } from 'vitest';
import { chartLabels, holdWords } from '../../../../src/ui/chart/chart-labels.ts';

const marks = [0, 10, 20, 60].map((minute) => ({ minute, label: `gas up ${minute}` }));
const WHOLE = { from: 0, to: 60 };

describe('chartLabels', () => {
  it('names marks where there is room and numbers them where there is not', () => {
    expect(chartLabels({ marks }, WHOLE, 900).numbered).toBe(false);
    const narrow = chartLabels({ marks }, WHOLE, 360);
    expect(narrow.numbered).toBe(true);
    expect([...narrow.texts.values()]).toEqual(['1', '2', '3', '4']);
  });

  it('leaves out what is not in sight and keeps the numbers of the rest', () => {
    const { texts } = chartLabels({ marks }, { from: 8, to: 25 }, 360);
    expect([...texts.values()]).toEqual(['2', '3']);
  });

  it('cuts the bracket of a stretch at the edges of what is shown', () => {
    const stretches = [{ fromMinute: 5, toMinute: 50, label: 'stall 700\u00a0°C, 45\u00a0min' }];
    const { placed } = chartLabels({ stretches }, { from: 10, to: 20 }, 800);
    expect(placed[0]?.x).toBe(58);
    expect(placed[0]?.spanToX).toBe(792);
  });

  it('says a hold in half minutes', () => {
    expect(holdWords({ fromMinute: 58, toMinute: 63.4 })).toBe('hold 5.5\u00a0min');
  });
});
