import { describe, expect, it } from 'vitest';
import { measuredTroubles } from '#shared/firing/findings.ts';
import type { FiringInput } from '#shared/firing/types.ts';
import { read } from './made-up-firing.ts';

type Corners = readonly (readonly [number, number])[];
const kinds = (corners: Corners, more: Partial<FiringInput> & { stepMinutes?: number } = {}) =>
  read(corners, more).levels.map((level) => level.kind);

/** Climbs at 22.6 °C/min to 712 °C, stays, then what follows. */
const stuck = (minutes: number, ...after: [number, number][]): Corners => [
  [0, 10],
  [31, 712],
  [31 + minutes, 712],
  ...after,
];

describe('a level stretch', () => {
  it('below the aim is a stall, with its level, start and length, and what came after', () => {
    const reading = read(stuck(14, [46, 690], [50, 500]), {
      marks: [{ minute: 45, kind: 'shut-off' }],
    });
    expect(reading.levels).toHaveLength(1);
    const [stall] = reading.levels;
    expect(stall?.kind).toBe('stall');
    expect(stall?.levelCelsius).toBeCloseTo(712, 3);
    expect(stall?.fromMinute).toBeCloseTo(31, 1);
    expect(stall?.minutes).toBeCloseTo(14, 1);
    expect(stall?.then).toBe('shut-off');
    expect(measuredTroubles(reading)).toEqual(['stall']);
  });

  it('that was climbed on from says so', () => {
    expect(read(stuck(10, [60, 1010], [62, 1010])).levels[0]?.then).toBe('climbed');
  });

  it('shorter than 5 min is none', () => {
    expect(kinds(stuck(4.4, [60, 1010]))).toEqual([]);
    expect(kinds(stuck(5.5, [60, 1010]))).toEqual(['stall']);
  });

  it('must last 20 °C ÷ pace where the kiln is slow, and stay under a quarter of the pace', () => {
    // Pace 2 °C/min: a stretch must last 10 min and keep under 0.5 °C/min.
    const slow = (minutes: number): Corners => [
      [0, 10],
      [250, 510],
      [250 + minutes, 510],
      [450 + minutes, 910],
    ];
    expect(kinds(slow(8), { targetCelsius: 950 })).not.toContain('pause');
    expect(kinds(slow(12), { targetCelsius: 950 })).toContain('pause');
    const creeping: Corners = [
      [0, 10],
      [250, 510],
      [270, 525],
      [450, 910],
    ];
    expect(kinds(creeping, { targetCelsius: 950 })).not.toContain('pause');
  });

  it('needs three readings in it', () => {
    expect(
      kinds(
        [
          [0, 10],
          [32, 712],
          [40, 712],
          [56, 1010],
        ],
        { stepMinutes: 8 },
      ),
    ).toEqual([]);
    expect(
      kinds(
        [
          [0, 10],
          [32, 712],
          [48, 712],
          [64, 1010],
        ],
        { stepMinutes: 8 },
      ),
    ).toEqual(['stall']);
  });

  it('less than 2 min and 10 °C from another is one with it', () => {
    expect(
      kinds([
        [0, 10],
        [31, 712],
        [35, 712],
        [36, 718],
        [40, 718],
        [55, 1010],
      ]),
    ).toEqual(['stall']);
    expect(
      kinds([
        [0, 10],
        [31, 712],
        [37, 712],
        [39.5, 732],
        [46, 732],
        [60, 1010],
      ]),
    ).toEqual(['stall', 'stall']);
  });

  it('whose end lies 15 °C below its beginning is a sag only', () => {
    const reading = read([
      [0, 10],
      [31, 712],
      [43, 692],
      [60, 1010],
    ]);
    expect(reading.levels).toEqual([]);
    expect(reading.sags).toHaveLength(1);
  });
});

describe('the names of a level stretch', () => {
  it('at the aim is a hold', () => {
    expect(
      kinds([
        [0, 10],
        [40, 1010],
        [50, 1010],
      ]),
    ).toEqual(['hold']);
  });
  it('from which the aim is reached within 2 min is an approach', () => {
    expect(
      kinds([
        [0, 10],
        [38, 980],
        [46, 980],
        [47.5, 1010],
      ]),
    ).toEqual(['approach']);
    expect(
      kinds([
        [0, 10],
        [38, 980],
        [46, 980],
        [50, 1010],
      ]),
    ).toEqual(['stall']);
  });
  it('that ends within 15 °C of an aim never reached is just short, and no trouble', () => {
    const reading = read([
      [0, 10],
      [40, 997],
      [50, 997],
    ]);
    expect(reading.levels.map((level) => level.kind)).toEqual(['just-short']);
    expect(measuredTroubles(reading)).toEqual([]);
    // IEC 60584-2, class 2 type K: 0.75 % of 997 °C.
    expect(reading.probeToleranceCelsius).toBeCloseTo(7.48, 2);
  });
  it('under 350 °C is a warm-up', () => {
    expect(
      kinds([
        [0, 10],
        [10, 180],
        [20, 180],
        [60, 1010],
      ]),
    ).toEqual(['warm-up']);
  });
  it('under 600 °C and climbed past by 50 °C later is a pause, else a stall', () => {
    expect(
      kinds([
        [0, 10],
        [25, 540],
        [35, 540],
        [60, 1010],
      ]),
    ).toEqual(['pause']);
    expect(
      kinds([
        [0, 10],
        [25, 540],
        [35, 540],
      ]),
    ).toEqual(['stall']);
    expect(
      kinds([
        [0, 10],
        [25, 610],
        [35, 610],
        [60, 1010],
      ]),
    ).toEqual(['stall']);
  });
  it('a stay at the top without a target is no stall unless the author gave up', () => {
    expect(
      kinds(
        [
          [0, 10],
          [31, 712],
          [45, 712],
        ],
        { targetCelsius: null },
      ),
    ).toEqual(['hold']);
    expect(
      kinds(
        [
          [0, 10],
          [31, 712],
          [45, 712],
        ],
        { targetCelsius: null, drawnBecause: 'gave-up' },
      ),
    ).toEqual(['stall']);
  });
  it('the author’s answer moves a stretch between pause and stall, matched within 3 min', () => {
    const pause: Corners = [
      [0, 10],
      [25, 540],
      [35, 540],
      [60, 1010],
    ];
    expect(kinds(pause, { answers: [{ fromMinute: 27, answer: 'stuck' }] })).toEqual(['stall']);
    expect(kinds(pause, { answers: [{ fromMinute: 29, answer: 'stuck' }] })).toEqual(['pause']);
    expect(
      kinds(stuck(10, [60, 1010]), { answers: [{ fromMinute: 31, answer: 'meant' }] }),
    ).toEqual(['pause']);
    const warmUp: Corners = [
      [0, 10],
      [10, 180],
      [20, 180],
      [60, 1010],
    ];
    expect(kinds(warmUp, { answers: [{ fromMinute: 10, answer: 'stuck' }] })).toEqual(['warm-up']);
  });
});
