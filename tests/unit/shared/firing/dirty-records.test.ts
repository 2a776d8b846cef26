import fc from 'fast-check';
import { describe, expect, it, vi } from 'vitest';
import { findingsOf, findingText, measuredTroubles } from '#shared/firing/findings.ts';
import { readFiring } from '#shared/firing/read-firing.ts';
import { stripSignature } from '#shared/firing/strip.ts';
import { stripWords } from '#shared/firing/strip-words.ts';
import type { FiringInput, Reading } from '#shared/firing/types.ts';
import { METRIC_UNITS } from '#shared/units/units.ts';
import { DRAWN_BECAUSE, FUELS, PROBES } from '#shared/vocabulary/kiln.ts';
import { MARK_IDS } from '#shared/vocabulary/marks.ts';
import { normalNumber, seededRandom } from '../../../../seeds/simulation/seeded-random.ts';
import { read, straightLines } from './made-up-firing.ts';

// Much is tried here, on machines that may be busy.
vi.setConfig({ testTimeout: 60_000 });

const STALLED = [
  [0, 15],
  [31, 712],
  [47, 712],
  [62, 1010],
  [66, 1010],
  [75, 700],
] as const;

/** Every number anywhere in a value. */
function numbersIn(value: unknown): number[] {
  if (typeof value === 'number') return [value];
  if (value === null || typeof value !== 'object') return [];
  return Object.values(value).flatMap(numbersIn);
}

function expectSound(input: FiringInput): void {
  const reading = readFiring(input);
  if (reading === null) return;
  expect(numbersIn(reading).every(Number.isFinite)).toBe(true);
  const findings = findingsOf(reading);
  for (const finding of findings)
    expect(findingText(finding, METRIC_UNITS)).not.toMatch(/NaN|undefined|Infinity|–/);
  expect(stripWords(reading, METRIC_UNITS)).not.toMatch(/NaN|undefined/);
  expect(numbersIn(stripSignature(input.readings)).every(Number.isFinite)).toBe(true);
}

const number = fc.oneof(
  fc.double({ min: -100, max: 1500, noNaN: true }),
  fc.integer({ min: 0, max: 1100 }),
  fc.constantFrom(0, NaN, Infinity, -Infinity, 1e300, 9999),
);
const anyInput = fc.record({
  readings: fc.array(
    fc.record({ minute: fc.oneof(fc.integer({ min: 0, max: 90 }), number), celsius: number }),
    { maxLength: 80 },
  ),
  secondProbe: fc.option(
    fc.array(fc.record({ minute: fc.integer({ min: 0, max: 90 }), celsius: number }), {
      maxLength: 20,
    }),
  ),
  marks: fc.array(fc.record({ minute: number, kind: fc.constantFrom(...MARK_IDS) }), {
    maxLength: 6,
  }),
  targetCelsius: fc.option(number),
  fuel: fc.option(fc.constantFrom(...(Object.keys(FUELS) as (keyof typeof FUELS)[]))),
  startClass: fc.option(fc.constantFrom('cold' as const, 'hot' as const)),
  drawnBecause: fc.option(
    fc.constantFrom(...(Object.keys(DRAWN_BECAUSE) as (keyof typeof DRAWN_BECAUSE)[])),
  ),
  probe: fc.option(fc.constantFrom(...(Object.keys(PROBES) as (keyof typeof PROBES)[]))),
});

describe('whatever is given', () => {
  it('the reader never throws and never says a number that is none', () => {
    fc.assert(
      fc.property(anyInput, (input) => expectSound(input)),
      { numRuns: 400, seed: 7 },
    );
  });

  it('walks of a plausible record are read soundly too', () => {
    const walk = fc
      .array(
        fc.tuple(
          fc.double({ min: 0.02, max: 6, noNaN: true }),
          fc.double({ min: -40, max: 60, noNaN: true }),
        ),
        { minLength: 3, maxLength: 120 },
      )
      .map((steps) => {
        let minute = 0;
        let celsius = 20;
        return steps.map(([time, change]): Reading => {
          minute += time;
          celsius = Math.min(1200, Math.max(0, celsius + change));
          return { minute, celsius };
        });
      });
    fc.assert(
      fc.property(walk, (readings) =>
        expectSound({
          readings,
          targetCelsius: 1010,
          fuel: 'propane',
          startClass: 'cold',
          drawnBecause: 'temperature',
          probe: 'K',
        }),
      ),
      { numRuns: 300, seed: 11 },
    );
  });

  it.each([
    ['constant readings', Array.from({ length: 50 }, (_, i) => ({ minute: i, celsius: 20 }))],
    [
      'readings all at one moment',
      Array.from({ length: 9 }, (_, i) => ({ minute: 4, celsius: i })),
    ],
    [
      'three readings',
      [
        { minute: 0, celsius: 20 },
        { minute: 20, celsius: 500 },
        { minute: 45, celsius: 1000 },
      ],
    ],
    ['only cooling', Array.from({ length: 60 }, (_, i) => ({ minute: i, celsius: 1000 - 10 * i }))],
    [
      'two clusters a day apart',
      [0, 1, 2, 1440, 1441, 1442].map((minute) => ({ minute, celsius: 20 + minute / 10 })),
    ],
  ])('%s are read soundly', (_, readings) => {
    for (const targetCelsius of [null, 20, 1010]) expectSound({ readings, targetCelsius });
  });
});

describe('a record is read the same', () => {
  const clean = read(STALLED);
  it('when its clock is shifted', () => {
    fc.assert(
      fc.property(fc.integer({ min: -5000, max: 100_000 }), (shift) => {
        const moved = read(STALLED.map(([minute, celsius]) => [minute + shift, celsius] as const));
        expect(moved.levels.map((level) => level.kind)).toEqual(
          clean.levels.map((level) => level.kind),
        );
        expect(moved.reachedMinute! - shift).toBeCloseTo(clean.reachedMinute!, 4);
        expect(moved.peak.celsius).toBeCloseTo(clean.peak.celsius, 4);
        expect(moved.levels[0]!.minutes).toBeCloseTo(clean.levels[0]!.minutes, 4);
      }),
      { numRuns: 30, seed: 5 },
    );
  });

  it('when its readings come in any order, or some twice', () => {
    const readings = straightLines(STALLED);
    const reading = readFiring({ readings: [...readings].reverse(), targetCelsius: 1010 })!;
    expect(reading.reachedMinute).toBeCloseTo(clean.reachedMinute!, 6);
    expect(reading.assumed.join(' ')).toContain('put in order');
    const doubled = readFiring({
      readings: readings.flatMap((one) => [one, one]),
      targetCelsius: 1010,
    })!;
    expect(doubled.reachedMinute).toBeCloseTo(clean.reachedMinute!, 6);
    expect(doubled.count).toBe(readings.length);
  });

  it('when single wild readings stand in it, and says how many it set aside', () => {
    const readings = straightLines(STALLED).map((one, i) =>
      i % 23 === 11 ? { ...one, celsius: i % 2 === 0 ? 1370 : 20 } : one,
    );
    const reading = readFiring({ readings, targetCelsius: 1010 })!;
    expect(reading.setAsideCount).toBeGreaterThan(3);
    expect(reading.peak.celsius).toBeCloseTo(1010, 0);
    expect(reading.levels.filter((level) => level.kind === 'stall')).toHaveLength(1);
    expect(reading.sags).toEqual([]);
    expect(reading.reachedMinute).toBeCloseTo(clean.reachedMinute!, 0);
  });

  it('when readings outside −40 to 1400 °C stand in it', () => {
    const readings = [
      ...straightLines(STALLED),
      { minute: 12.3, celsius: 2000 },
      { minute: 30.1, celsius: -99 },
    ];
    const reading = readFiring({ readings, targetCelsius: 1010 })!;
    expect(reading.setAsideCount).toBe(2);
    expect(reading.peak.celsius).toBeCloseTo(1010, 1);
  });

  it('a true peak noted by hand every few minutes is not taken for a wild reading', () => {
    const readings = [
      [0, 20],
      [10, 300],
      [20, 620],
      [30, 900],
      [34, 1010],
      [38, 860],
      [45, 600],
    ].map(([minute = 0, celsius = 0]) => ({ minute, celsius }));
    const reading = readFiring({ readings, targetCelsius: 1010 })!;
    expect(reading.setAsideCount).toBe(0);
    expect(reading.peak.celsius).toBeCloseTo(1010, 0);
    expect(reading.peak.minute).toBe(34);
    expect(reading.shutOff.minute).toBe(34);
  });
});

describe('noise', () => {
  it.each([1, 2, 4, 6])('of %i °C at one reading a second moves no finding far', (noise) => {
    for (let seed = 1; seed <= 6; seed += 1) {
      const random = seededRandom(seed * 100 + noise);
      const readings = straightLines(STALLED, 1 / 60).map((one) => ({
        ...one,
        celsius: one.celsius + noise * normalNumber(random),
      }));
      const reading = readFiring({
        readings,
        targetCelsius: 1010,
        fuel: 'propane',
        startClass: 'cold',
        drawnBecause: 'temperature',
      })!;
      const stalls = reading.levels.filter((level) => level.kind === 'stall');
      expect(stalls).toHaveLength(1);
      expect(Math.abs(stalls[0]!.levelCelsius - 712)).toBeLessThan(3);
      expect(Math.abs(stalls[0]!.fromMinute - 31)).toBeLessThan(1.5);
      expect(Math.abs(stalls[0]!.minutes - 16)).toBeLessThan(2);
      expect(reading.sags).toEqual([]);
      expect(Math.abs(reading.reachedMinute! - 61.75)).toBeLessThan(0.6);
      expect(Math.abs(reading.peak.celsius - 1010)).toBeLessThan(6);
      expect(Math.abs(reading.hold!.minutes - 4)).toBeLessThan(1.5);
      expect(Math.abs(reading.shutOff.minute - 66)).toBeLessThan(1);
      expect(Math.abs(reading.start.minute)).toBeLessThan(1);
      expect(measuredTroubles(reading)).toContain('stall');
    }
  });

  it('of 6 °C on a plain firing read every 30 s invents no trouble', () => {
    for (let seed = 1; seed <= 20; seed += 1) {
      const random = seededRandom(seed);
      const readings = straightLines([
        [0, 15],
        [40, 1010],
        [45, 1010],
        [52, 800],
      ]).map((one) => ({
        ...one,
        celsius: one.celsius + 6 * normalNumber(random),
      }));
      const reading = readFiring({
        readings,
        targetCelsius: 1010,
        fuel: 'propane',
        startClass: 'cold',
        drawnBecause: 'temperature',
      })!;
      expect(measuredTroubles(reading)).toEqual([]);
    }
  });

  it('whole degrees shown each second are no steps', () => {
    const readings = straightLines(
      [
        [0, 15],
        [50, 1010],
        [54, 1010],
      ],
      1 / 60,
    ).map((one) => ({
      ...one,
      celsius: Math.round(one.celsius),
    }));
    const reading = readFiring({ readings, targetCelsius: 1010 })!;
    expect(reading.levels.map((level) => level.kind).filter((kind) => kind !== 'hold')).toEqual([]);
    expect(reading.climb.steepestPerMinute!).toBeLessThan(22);
  });

  it('regular swings of stoking with wood are no sags', () => {
    const readings = straightLines([
      [0, 15],
      [90, 1000],
      [100, 1000],
    ]).map((one) => ({
      ...one,
      celsius: one.celsius + (one.minute > 5 ? 22 * Math.sin((2 * Math.PI * one.minute) / 7) : 0),
    }));
    const reading = readFiring({ readings, targetCelsius: 1010, fuel: 'wood' })!;
    expect(reading.sags).toEqual([]);
    expect(reading.levels.filter((level) => level.kind === 'stall')).toEqual([]);
    expect(reading.assumed.join(' ')).toContain('swings');
  });
});

describe('speed', () => {
  const long = (count: number): Reading[] =>
    Array.from({ length: count }, (_, i) => {
      const minute = (75 * i) / count;
      const part = STALLED.findIndex(([at]) => at >= minute);
      const [t1, y1] = STALLED[Math.max(1, part)]!;
      const [t0, y0] = STALLED[Math.max(1, part) - 1]!;
      return {
        minute,
        celsius: y0 + ((y1 - y0) * (minute - t0)) / (t1 - t0) + 3 * Math.sin(i * 12.9898),
      };
    });
  /** Processor time of the best of several runs: what the work costs, whatever else runs. */
  const milliseconds = (readings: Reading[], runs: number) => {
    let best = Infinity;
    for (let i = 0; i < runs; i += 1) {
      const from = process.cpuUsage();
      readFiring({ readings, targetCelsius: 1010, fuel: 'propane', startClass: 'cold' });
      const used = process.cpuUsage(from);
      best = Math.min(best, (used.user + used.system) / 1000);
    }
    return best;
  };
  // How long it takes is for the bench to say; here, that it does not grow faster than the record.
  it('four times as many readings take at most six times as long', () => {
    milliseconds(long(500), 40);
    const fifty = milliseconds(long(50_000), 6);
    expect(milliseconds(long(200_000), 4)).toBeLessThan(6 * fifty);
    expect(fifty).toBeLessThan(100 * milliseconds(long(500), 20));
  });
});
