import { describe, expect, it } from 'vitest';
import { IMPERIAL_UNITS, METRIC_UNITS } from '#shared/units/units.ts';
import { asksAboutStall, readAs } from '../../../src/find/read-as.ts';

describe('how a question is shown to be read', () => {
  it('names its parts in the reader’s units', () => {
    const labels = (units: typeof METRIC_UNITS) =>
      readAs('stalled at 700 °C', [], units).map(({ label }) => label);
    expect(labels(METRIC_UNITS)).toEqual(['stall', 'near 700\u00a0°C ± 20']);
    // 700 °C = 1292 °F; 20 °C of difference are 36 °F.
    expect(labels(IMPERIAL_UNITS)).toEqual(['stall', 'near 1292\u00a0°F ± 36']);
  });

  it('keeps a part that is switched off, marked as off', () => {
    const parts = readAs('stalled at 700 °C', ['temperature'], METRIC_UNITS);
    expect(parts.map(({ key, off }) => [key, off])).toEqual([
      ['trouble:stall', false],
      ['temperature', true],
    ]);
  });

  it('asks about a stall only while that part is in force', () => {
    expect(asksAboutStall(readAs('stalled at 700', [], METRIC_UNITS))).toBe(true);
    expect(asksAboutStall(readAs('stalled at 700', ['trouble:stall'], METRIC_UNITS))).toBe(false);
    expect(asksAboutStall(readAs('cracked plate', [], METRIC_UNITS))).toBe(false);
  });
});
