import { describe, expect, it } from 'vitest';
import { chartPoints, stripSignature } from '#shared/firing/strip.ts';
import { stripWords } from '#shared/firing/strip-words.ts';
import { IMPERIAL_UNITS, METRIC_UNITS } from '#shared/units/units.ts';
import { read, straightLines } from './made-up-firing.ts';

const plain = (text: string) => text.replaceAll('\u00a0', ' ');

describe('chartPoints', () => {
  const readings = straightLines(
    [
      [0, 15],
      [40, 1010],
      [45, 1010],
      [60, 400],
    ],
    1 / 60,
  ).map((one, i) =>
    i === 777 ? { ...one, celsius: 1333 } : i === 2000 ? { ...one, celsius: -5 } : one,
  );
  it('keeps the first, the last and every extreme, in order, within its limit', () => {
    for (const max of [10, 60, 240, 241, 999]) {
      const points = chartPoints(readings, max);
      expect(points.length).toBeLessThanOrEqual(max);
      expect(points[0]).toEqual(readings[0]);
      expect(points[points.length - 1]).toEqual(readings[readings.length - 1]);
      const celsius = points.map((point) => point.celsius);
      expect(Math.max(...celsius)).toBe(1333);
      expect(Math.min(...celsius)).toBe(-5);
      const minutes = points.map((point) => point.minute);
      expect(minutes).toEqual([...minutes].sort((a, b) => a - b));
    }
  });
  it('returns a short record as it is', () => {
    expect(chartPoints(readings.slice(0, 50), 240)).toEqual(readings.slice(0, 50));
    expect(chartPoints([], 240)).toEqual([]);
  });
});

describe('stripSignature', () => {
  it('has at most 240 points, in order of time, without wild readings', () => {
    const readings = straightLines(
      [
        [0, 15],
        [40, 1010],
        [60, 400],
      ],
      1 / 60,
    );
    const strip = stripSignature([...readings].reverse().concat({ minute: 5, celsius: 5000 }));
    expect(strip.length).toBeLessThanOrEqual(240);
    expect(strip.length).toBeGreaterThan(100);
    expect(strip[0]).toEqual([0, 15]);
    expect(Math.max(...strip.map(([, celsius]) => celsius))).toBe(1010);
  });
});

describe('stripWords', () => {
  it('tells the climb, the stay and the end', () => {
    const reading = read(
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
    expect(plain(stripWords(reading, METRIC_UNITS))).toBe(
      'climbs to 712 °C in 31 min, stays there 14 min, shut off',
    );
    expect(plain(stripWords(reading, IMPERIAL_UNITS))).toContain('climbs to 1314 °F in 31 min');
  });
  it('tells a sag and the climb on', () => {
    const reading = read([
      [0, 10],
      [31, 760],
      [37, 720],
      [52, 1010],
      [55, 1010],
      [60, 800],
    ]);
    expect(plain(stripWords(reading, METRIC_UNITS))).toBe(
      'climbs to 760 °C in 31 min, falls back to 720 °C in 6 min, climbs on to 1010 °C in 15 min, stays there 3 min, shut off',
    );
  });
  it('says where the record only ends', () => {
    expect(
      plain(
        stripWords(
          read([
            [0, 10],
            [31, 712],
          ]),
          METRIC_UNITS,
        ),
      ),
    ).toBe('climbs to 712 °C in 31 min, the record ends');
  });
});
