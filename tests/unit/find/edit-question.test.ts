import { describe, expect, it } from 'vitest';
import { METRIC_UNITS } from '#shared/units/units.ts';
import {
  partOf,
  typedWords,
  windowOf,
  withTemperature,
  withWords,
} from '../../../src/find/edit-question.ts';

const IN_F = { ...METRIC_UNITS, temperature: 'F' } as const;

/** What the changed question is read as, °C; asks for the part as the page does. */
function readAfter(
  q: string,
  wanted: { min: number | null; max: number | null },
  units = METRIC_UNITS,
) {
  const part = partOf(q, 'temperature', units);
  if (!part) throw new Error(`no temperature in ${q}`);
  const next = withTemperature(q, part, wanted, units);
  const read = next === null ? null : partOf(next, 'temperature', units);
  return { next, window: read?.kind === 'temperature' ? windowOf(read.value) : null };
}

describe('a question with another temperature', () => {
  it.each([
    'stalled at 700',
    'stalled at 700 °C',
    'stuck between 700 and 740 °C in the rain',
    'flat plate stuck near 700 C, what now',
  ])('reads as just the window asked for: %s', (q) => {
    const { next, window } = readAfter(q, { min: 710, max: 770 });
    expect(window).toEqual({ min: 710, max: 770 });
    expect(next).toMatch(/^(stalled|stuck|flat plate)/);
    // Everything else is still asked.
    if (q.includes('rain')) expect(next).toContain('in the rain');
  });

  it('says a plain number where that is read as the same window', () => {
    expect(readAfter('stalled at 700', { min: 780, max: 820 }).next).toBe('stalled at 800 °C');
  });

  it('keeps a range open at one end', () => {
    const { next, window } = readAfter('stall above 700 °C', { min: 800, max: null });
    expect(next).toBe('stall above 800 °C');
    expect(window).toEqual({ min: 800, max: null });
  });

  it('is put in the reader’s unit', () => {
    const { next, window } = readAfter('stalled at 1300 °F', { min: 690, max: 750 }, IN_F);
    expect(next).toContain('°F');
    expect(Math.abs((window?.min ?? 0) - 690)).toBeLessThanOrEqual(1.2);
    expect(Math.abs((window?.max ?? 0) - 750)).toBeLessThanOrEqual(1.2);
  });
});

describe('a question with other words for a part', () => {
  it('keeps what stands around them', () => {
    const q = 'took over 40 minutes with wood';
    const part = partOf(q, 'minutes', METRIC_UNITS);
    if (!part) throw new Error('no minutes');
    const words = typedWords(q, part);
    expect(words).toContain('40');
    expect(withWords(q, part, words.replace('40', '60'))).toBe('took over 60 minutes with wood');
  });
});
