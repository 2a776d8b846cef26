import { describe, expect, it } from 'vitest';
import {
  findingSchema,
  findingsOf,
  findingText,
  measuredTroubles,
} from '#shared/firing/findings.ts';
import { IMPERIAL_UNITS, METRIC_UNITS } from '#shared/units/units.ts';
import { read } from './made-up-firing.ts';

const plain = (text: string) => text.replaceAll('\u00a0', ' ');
const STALLED = read(
  [
    [0, 10],
    [31, 712],
    [45, 712],
    [50, 500],
  ],
  {
    marks: [
      { minute: 0, kind: 'lit' },
      { minute: 45, kind: 'shut-off' },
    ],
  },
);

describe('findings', () => {
  it('a stall is told in a plain sentence, in the reader’s units', () => {
    const stall = findingsOf(STALLED).find((finding) => finding.code === 'stall')!;
    expect(stall.trouble).toBe('stall');
    expect(plain(findingText(stall, METRIC_UNITS))).toBe(
      'Levelled off at 712 °C for 14 min, from 31 min, then shut off.',
    );
    expect(plain(findingText(stall, IMPERIAL_UNITS))).toBe(
      'Levelled off at 1314 °F for 14 min, from 31 min, then shut off.',
    );
  });

  it('are plain data: stored and read back they are the same', () => {
    const findings = findingsOf(STALLED);
    expect(findings.length).toBeGreaterThan(3);
    const stored: unknown = JSON.parse(JSON.stringify(findings));
    expect(findingSchema.array().parse(stored)).toEqual(findings);
  });

  it('differences are shown as differences in °F', () => {
    const reading = read([
      [0, 10],
      [40, 1035],
      [45, 900],
    ]);
    const overshoot = findingsOf(reading).find((finding) => finding.code === 'overshoot')!;
    expect(plain(findingText(overshoot, IMPERIAL_UNITS))).toBe(
      'Overshot the target by 45 °F: the peak was 1895 °F.',
    );
  });

  it('what helped is asked of troubles only: a plain firing has none', () => {
    const reading = read([
      [0, 10],
      [40, 1010],
      [44, 1010],
      [50, 800],
    ]);
    expect(measuredTroubles(reading)).toEqual([]);
    expect(findingsOf(reading).every((finding) => finding.trouble === null)).toBe(true);
    const hold = findingsOf(reading).find((finding) => finding.code === 'hold')!;
    expect(plain(findingText(hold, METRIC_UNITS))).toBe('Held at 1010 °C for 4 min.');
  });

  it('troubles are each told once, in the order of the list', () => {
    const reading = read([
      [0, 10],
      [31, 712],
      [40, 712],
      [46, 680],
      [60, 900],
      [70, 900],
      [80, 1040],
      [85, 900],
    ]);
    expect(measuredTroubles(reading)).toEqual(['stall', 'sag', 'slow-climb', 'overshoot']);
  });
});
