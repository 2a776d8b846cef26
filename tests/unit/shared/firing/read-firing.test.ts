import { describe, expect, it } from 'vitest';
import { measuredTroubles } from '#shared/firing/findings.ts';
import { readFiring } from '#shared/firing/read-firing.ts';
import { read, straightLines } from './made-up-firing.ts';

/** Climbs at 25 °C/min to 1010 °C, holds 5 min, is shut off and cools. */
const PLAIN = [
  [0, 10],
  [40, 1010],
  [45, 1010],
  [55, 810],
] as const;

describe('start and end of a firing', () => {
  it('the start is the lit mark, even before the first reading', () => {
    const reading = read(PLAIN, { marks: [{ minute: -3, kind: 'lit' }] });
    expect(reading.start).toEqual({ minute: -3, inferred: false });
    expect(reading.timeToTemperatureMinutes).toBeCloseTo(39.8 + 3, 2);
  });

  it('without a mark the start is the beginning of the first climb of 3 °C/min for 2 min', () => {
    const reading = read([
      [0, 12],
      [10, 14],
      [50, 1010],
      [52, 1010],
    ]);
    expect(reading.start.inferred).toBe(true);
    expect(reading.start.minute).toBeCloseTo(10, 0);
  });

  it('a record that never climbs so fast starts with its first reading', () => {
    expect(
      read([
        [5, 300],
        [60, 350],
      ]).start,
    ).toEqual({ minute: 5, inferred: true });
  });

  it('without a mark the end is the last reading before a lasting steep fall after the peak', () => {
    const reading = read(PLAIN);
    expect(reading.shutOff.inferred).toBe(true);
    expect(reading.shutOff.minute).toBeCloseTo(45, 1);
    expect(reading.assumed.some((sentence) => sentence.includes('shut off'))).toBe(true);
  });

  it('a hold that sinks a little is not cut at its top: the end is where the steep fall begins', () => {
    const reading = read([
      [0, 10],
      [40, 1012],
      [46, 1005],
      [66, 505],
    ]);
    expect(reading.shutOff.inferred).toBe(true);
    expect(reading.shutOff.minute).toBeCloseTo(46, 0);
    expect(reading.hold?.minutes).toBeGreaterThan(5.5);
  });

  it('no peak is higher than what was read, though the lines on both sides of a gap meet above it', () => {
    const readings = straightLines(PLAIN).filter(({ minute }) => minute < 37 || minute > 48);
    const highest = Math.max(...readings.map(({ celsius }) => celsius));
    const reading = readFiring({ readings, targetCelsius: 930 });
    expect(reading?.peak.celsius).toBeLessThanOrEqual(highest);
    expect(reading?.overshootCelsius).toBeNull();
  });

  it('a slow fall to the record’s end is cooling too, and no sag', () => {
    const reading = read([
      [0, 10],
      [40, 850],
      [100, 550],
    ]);
    expect(reading.shutOff.minute).toBeCloseTo(40, 1);
    expect(reading.sags).toEqual([]);
  });

  it('without any fall the end is the last reading', () => {
    expect(
      read([
        [0, 10],
        [40, 1010],
        [45, 1012],
      ]).shutOff,
    ).toEqual({ minute: 45, inferred: true });
  });

  it('a shut-off mark followed by lighting again is no end', () => {
    const reading = read(
      [
        [0, 10],
        [20, 500],
        [25, 400],
        [60, 1010],
        [62, 1010],
        [70, 800],
      ],
      {
        marks: [
          { minute: 0, kind: 'lit' },
          { minute: 20, kind: 'shut-off' },
          { minute: 25, kind: 'relit' },
        ],
      },
    );
    expect(reading.shutOff.inferred).toBe(true);
    expect(reading.shutOff.minute).toBeCloseTo(62, 1);
  });

  it('a hot kiln that is emptied first is read from its new climb', () => {
    const reading = read(
      [
        [0, 1000],
        [5, 400],
        [30, 900],
        [33, 900],
        [40, 700],
      ],
      {
        startClass: 'hot',
        targetCelsius: 900,
      },
    );
    expect(reading.start.minute).toBeCloseTo(5, 0);
    expect(reading.peak.celsius).toBeCloseTo(900, 0);
    expect(reading.shutOff.minute).toBeCloseTo(33, 0);
  });
});

describe('aim, reached and peak', () => {
  it('reached is the first crossing of aim − 5, between readings', () => {
    const reading = read(PLAIN);
    expect(reading.aimCelsius).toBe(1010);
    expect(reading.reachedMinute).toBeCloseTo(39.8, 3);
    expect(reading.peak.celsius).toBeCloseTo(1010, 3);
  });

  it('drawn by melt or cone, the aim is the lower of target and peak', () => {
    const lower = read(
      [
        [0, 10],
        [40, 960],
        [43, 960],
      ],
      { drawnBecause: 'melt' },
    );
    expect(lower.aimCelsius).toBeCloseTo(960, 3);
    expect(lower.reachedMinute).not.toBeNull();
    const higher = read(
      [
        [0, 10],
        [40, 1050],
        [43, 1050],
      ],
      { drawnBecause: 'cone' },
    );
    expect(higher.aimCelsius).toBe(1010);
  });

  it('without a target nothing is said of reaching it, and the top is no stall', () => {
    const reading = read(
      [
        [0, 10],
        [40, 960],
        [55, 960],
      ],
      { targetCelsius: null },
    );
    expect(reading.aimCelsius).toBeNull();
    expect(reading.reachedMinute).toBeNull();
    expect(measuredTroubles(reading)).toEqual([]);
  });

  it('overshoot begins at target + 20', () => {
    expect(
      read([
        [0, 10],
        [40, 1030],
        [45, 900],
      ]).overshootCelsius,
    ).toBeCloseTo(20, 3);
    expect(
      read([
        [0, 10],
        [40, 1029],
        [45, 900],
      ]).overshootCelsius,
    ).toBeNull();
  });

  it('fewer than three usable readings are no record', () => {
    expect(readFiring({ readings: [] })).toBeNull();
    expect(
      readFiring({
        readings: [
          { minute: 0, celsius: 20 },
          { minute: 5, celsius: 9999 },
          { minute: 9, celsius: 300 },
        ],
      }),
    ).toBeNull();
  });
});

describe('pace and climb', () => {
  it('pace is the median over 25 °C bands, so that a pause does not slow it', () => {
    const reading = read([
      [0, 10],
      [20, 510],
      [40, 510],
      [60, 1010],
      [62, 1010],
    ]);
    expect(reading.paceCelsiusPerMinute).toBeCloseTo(25, 1);
    expect(reading.climb.shape).toBe('stepped');
  });

  it('hundreds tell the minutes of each hundred degrees', () => {
    const reading = read(PLAIN);
    expect(reading.hundreds.map((one) => one.fromCelsius)).toEqual([
      100, 200, 300, 400, 500, 600, 700, 800, 900,
    ]);
    for (const one of reading.hundreds) expect(one.minutes).toBeCloseTo(4, 3);
    expect(reading.rate400To700).toBeCloseTo(25, 3);
  });

  it('a climb that slows to less than half is racing, then creeping', () => {
    expect(
      read([
        [0, 10],
        [12, 510],
        [55, 1010],
      ]).climb.shape,
    ).toBe('racing-then-creeping');
    expect(read(PLAIN).climb.shape).toBe('steady');
  });

  it('slow climb: gas, cold, over an hour to temperature less warm-ups and pauses', () => {
    const slow = [
      [0, 10],
      [70, 1010],
      [72, 1010],
    ] as const;
    expect(read(slow).slowClimbMinutes).toBeCloseTo(69.65, 1);
    expect(read(slow, { fuel: 'wood' }).slowClimbMinutes).toBeNull();
    expect(read(slow, { fuel: 'electric' }).slowClimbMinutes).toBeNull();
    expect(read(slow, { fuel: null }).slowClimbMinutes).toBeNull();
    expect(read(slow, { startClass: 'hot' }).slowClimbMinutes).toBeNull();
    const paused = [
      [0, 10],
      [10, 200],
      [35, 200],
      [75, 1010],
      [77, 1010],
    ] as const;
    expect(read(paused).levels.map((level) => level.kind)[0]).toBe('warm-up');
    expect(read(paused).slowClimbMinutes).toBeNull();
  });
});

describe('quartz crossing', () => {
  it('runs from the last crossing of 550 °C to 600 °C, the inversion at 573 °C between them', () => {
    const [crossing] = read(PLAIN).quartzCrossings;
    expect(crossing?.fromMinute).toBeCloseTo(21.6, 3);
    expect(crossing?.minutes).toBeCloseTo(2, 3);
    expect(crossing?.ratePerMinute).toBeCloseTo(25, 2);
  });

  it('a fall back below 550 °C starts it afresh, and a second climb is a second crossing', () => {
    const once = read([
      [0, 10],
      [20, 560],
      [25, 540],
      [45, 1010],
    ]);
    expect(once.quartzCrossings).toHaveLength(1);
    expect(once.quartzCrossings[0]?.fromMinute).toBeGreaterThan(25);
    const twice = read([
      [0, 10],
      [20, 700],
      [30, 500],
      [50, 1010],
    ]);
    expect(twice.quartzCrossings).toHaveLength(2);
  });

  it('a record that begins above shows none', () => {
    expect(
      read([
        [0, 580],
        [20, 1010],
      ]).quartzCrossings,
    ).toEqual([]);
  });
});

describe('uneven heat', () => {
  const second = (apart: number, minutes: number) =>
    straightLines([
      [0, 10],
      [40, 1010 - 0.001],
      [40.001, 1010],
      [45, 1010],
    ]).map((one) => ({
      minute: one.minute,
      celsius: one.celsius - (one.minute >= 30 && one.minute <= 30 + minutes ? apart : 0),
    }));
  it('is found when two probes stand more than 40 °C apart for 5 min above 600 °C', () => {
    const reading = read(PLAIN, { secondProbe: second(60, 6) });
    expect(reading.unevenHeat?.fromMinute).toBeCloseTo(30, 0);
    expect(reading.unevenHeat?.largestCelsius).toBeCloseTo(60, 0);
  });
  it('is not found for less, for shorter, or for one probe', () => {
    expect(read(PLAIN, { secondProbe: second(35, 10) }).unevenHeat).toBeNull();
    expect(read(PLAIN, { secondProbe: second(60, 3) }).unevenHeat).toBeNull();
    expect(read(PLAIN).unevenHeat).toBeNull();
  });
});

describe('after the end', () => {
  it('cooling to the draw runs from shut-off to the first piece drawn', () => {
    const reading = read(PLAIN, {
      marks: [
        { minute: 45, kind: 'shut-off' },
        { minute: 48, kind: 'drawn' },
        { minute: 50, kind: 'drawn' },
      ],
    });
    expect(reading.coolingToDraw?.minutes).toBeCloseTo(3, 6);
    expect(reading.coolingToDraw?.dropCelsius).toBeCloseTo(60, 0);
    expect(reading.minutesAboveAimLess50).toBeCloseTo(2 + 5 + 2.5, 1);
  });
});
