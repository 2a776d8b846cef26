import { describe, expect, it } from 'vitest';
import { measuredTroubles } from '#shared/firing/findings.ts';
import type { FiringInput } from '#shared/firing/types.ts';
import { read } from './made-up-firing.ts';

/** Climbs to a top, falls by so much in so many minutes, then climbs on to 1010 °C. */
const sag = (top: number, drop: number, minutes: number, more: Partial<FiringInput> = {}) => {
  const at = Math.round(top / 5.5) / 4;
  const bottom = at + minutes;
  const up = bottom + (1010 - top + drop) / 22;
  return read(
    [
      [0, 0],
      [at, top],
      [bottom, top - drop],
      [up, 1010],
      [up + 2, 1010],
    ],
    { stepMinutes: 0.25, ...more },
  );
};

describe('a sag', () => {
  it('is told with its top, bottom and length, and what followed', () => {
    const reading = sag(760, 40, 6);
    expect(reading.sags).toHaveLength(1);
    const [found] = reading.sags;
    expect(found?.topCelsius).toBeCloseTo(760, 0);
    expect(found?.bottomCelsius).toBeCloseTo(720, 0);
    expect((found?.toMinute ?? 0) - (found?.fromMinute ?? 0)).toBeCloseTo(6, 0);
    expect(found?.then).toBe('regained');
    expect(measuredTroubles(reading)).toContain('sag');
  });

  it('falls at least 15 °C over at least 3 min at no more than 10 °C/min', () => {
    expect(sag(700, 13, 5).sags).toEqual([]);
    expect(sag(700, 17, 2).sags).toEqual([]);
    expect(sag(700, 60, 4).sags).toEqual([]);
    expect(sag(700, 17, 4).sags).toHaveLength(1);
  });

  it('begins at 350 °C or more and below aim − 15', () => {
    expect(sag(330, 30, 5).sags).toEqual([]);
    expect(sag(360, 30, 5).sags).toHaveLength(1);
    const atTop = read([
      [0, 10],
      [40, 1000],
      [46, 970],
      [50, 1010],
      [52, 1010],
    ]);
    expect(atTop.sags).toEqual([]);
  });

  it('is none when it began within 2 min after a mark that explains it', () => {
    for (const kind of ['gas-down', 'flue-opened', 'lid-lifted', 'loaded'] as const) {
      expect(sag(704, 30, 5, { marks: [{ minute: 31, kind }] }).sags).toEqual([]);
    }
    expect(sag(704, 30, 5, { marks: [{ minute: 27, kind: 'gas-down' }] }).sags).toHaveLength(1);
    expect(sag(704, 30, 5, { marks: [{ minute: 31, kind: 'gust' }] }).sags).toHaveLength(1);
  });

  it('not regained is held, or drawn when the firing ends with it', () => {
    const held = read(
      [
        [0, 10],
        [31, 720],
        [37, 690],
        [50, 690],
        [55, 400],
      ],
      { marks: [{ minute: 50, kind: 'shut-off' }] },
    );
    expect(held.sags.map((one) => one.then)).toEqual(['held']);
    const drawn = read(
      [
        [0, 10],
        [31, 720],
        [37, 690],
        [42, 400],
      ],
      { marks: [{ minute: 37, kind: 'shut-off' }] },
    );
    expect(drawn.sags.map((one) => one.then)).toEqual(['drawn']);
  });

  it('cooling after shut-off is none', () => {
    const cooling = read(
      [
        [0, 10],
        [31, 720],
        [60, 560],
      ],
      { marks: [{ minute: 31, kind: 'shut-off' }] },
    );
    expect(cooling.sags).toEqual([]);
  });
});
