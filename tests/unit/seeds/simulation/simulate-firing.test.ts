import { describe, expect, it } from 'vitest';
import { measuredTroubles } from '#shared/firing/findings.ts';
import { readFiring } from '#shared/firing/read-firing.ts';
import type { FiringReading } from '#shared/firing/types.ts';
import { fToC } from '#shared/units/temperature.ts';
import { FIRING_KINDS } from '../../../../seeds/simulation/firing-kinds.ts';
import type { FiringKind } from '../../../../seeds/simulation/firing-kinds.ts';
import type { SimulatedFiring } from '../../../../seeds/simulation/simulate-firing.ts';
import { simulateFiring } from '../../../../seeds/simulation/simulate-firing.ts';

function fired(firing: SimulatedFiring): {
  reading: FiringReading;
  record: ReturnType<typeof simulateFiring>;
} {
  const record = simulateFiring(firing);
  const reading = readFiring({
    readings: record.readings,
    marks: record.marks,
    targetCelsius: firing.targetCelsius,
    fuel: 'propane',
    startClass: firing.startCelsius < 100 ? 'cold' : 'hot',
    drawnBecause: 'temperature',
    probe: 'K',
  })!;
  return { reading, record };
}

/** The troubles and the level stretches, by kind, that each kind of firing was made to show. */
const SHOWN: Record<FiringKind, { troubles: string[]; levels: string[] }> = {
  plain: { troubles: [], levels: [] },
  fast: { troubles: [], levels: [] },
  gentle: { troubles: [], levels: [] },
  slow: { troubles: ['slow-climb'], levels: [] },
  'drying-soak': { troubles: [], levels: ['warm-up'] },
  'pause-at-540': { troubles: [], levels: ['pause'] },
  'stalled-then-off': { troubles: ['stall'], levels: ['stall'] },
  'stalled-then-mended': { troubles: ['stall', 'slow-climb'], levels: ['stall'] },
  'sagging-in-wind': { troubles: ['sag'], levels: [] },
  gusty: { troubles: [], levels: [] },
  overshoot: { troubles: ['overshoot'], levels: [] },
  'hot-start': { troubles: [], levels: [] },
};
const KINDS = Object.entries(FIRING_KINDS) as [FiringKind, SimulatedFiring][];
const samplings: [string, Partial<SimulatedFiring>][] = [
  ['clean, every 30 s', {}],
  [
    'every second with 5 °C of noise and no marks of lighting or shutting off',
    { stepSeconds: 1, noiseCelsius: 5, marksFire: false },
  ],
  ['noted by hand every 2 to 4 min', { handNotedMinutes: 2.5 }],
];

describe.each(samplings)('a firing %s', (_, sampling) => {
  it.each(KINDS)(
    'of the kind %s shows what it was made to show, and nothing else',
    (kind, firing) => {
      const { reading } = fired({ ...firing, ...sampling });
      const levels = reading.levels.map((level) => level.kind).filter((one) => one !== 'hold');
      expect({ troubles: measuredTroubles(reading), levels }).toEqual(SHOWN[kind]);
    },
  );
});

describe('the simulation', () => {
  it('gives the same record for the same inputs and another noise for another seed', () => {
    const noisy = { ...FIRING_KINDS.gusty, noiseCelsius: 2 };
    expect(simulateFiring(noisy)).toEqual(simulateFiring(noisy));
    expect(simulateFiring({ ...noisy, seed: 99 }).readings).not.toEqual(
      simulateFiring(noisy).readings,
    );
  });

  it('noise has the deviation it was given, and the truth none', () => {
    const { readings, truth } = simulateFiring({
      ...FIRING_KINDS.gentle,
      stepSeconds: 1,
      noiseCelsius: 4,
    });
    const squares = readings.map((one, i) => (one.celsius - truth[i]!.celsius) ** 2);
    expect(Math.sqrt(squares.reduce((a, b) => a + b, 0) / squares.length)).toBeCloseTo(4, 0);
  });

  it('a stalled kiln levels off where its losses equal its burner', () => {
    const firing = FIRING_KINDS['stalled-then-off'];
    const { reading } = fired(firing);
    // burner = lossFactor · litres · (T − 15) · (1 + T/2000), in W: solved for T.
    const share = (firing.burnerKw * 1000) / (firing.lossFactor * firing.volumeLitres);
    let balance = 0;
    while ((balance - 15) * (1 + balance / 2000) < share) balance += 0.1;
    expect(reading.levellingOff!.celsius).toBeGreaterThan(balance - 8);
    expect(reading.levellingOff!.celsius).toBeLessThan(balance + 8);
    expect(reading.peak.celsius).toBeLessThan(balance);
  });

  it('hand-noted records are uneven and in whole degrees', () => {
    const { readings } = simulateFiring({ ...FIRING_KINDS.gentle, handNotedMinutes: 4 });
    const steps = new Set(
      readings.slice(1).map((one, i) => Math.round(one.minute - readings[i]!.minute)),
    );
    expect(steps.size).toBeGreaterThan(1);
    expect(readings.every((one) => Number.isInteger(one.celsius))).toBe(true);
  });
});

// Common practice in the trade, no source: example records, not rules.
describe('firings as the trade knows them', () => {
  it('a well set-up small fibre kiln reaches 1850 °F, which is 1010 °C, in about 25 min', () => {
    const { reading } = fired({ ...FIRING_KINDS.plain, targetCelsius: fToC(1850) });
    expect(reading.aimCelsius).toBeCloseTo(1010, 9);
    expect(reading.timeToTemperatureMinutes!).toBeGreaterThan(20);
    expect(reading.timeToTemperatureMinutes!).toBeLessThan(30);
    expect(reading.hold!.minutes).toBeLessThanOrEqual(5);
  });
  it('a badly set-up one levels off near 700 °C', () => {
    const { reading } = fired(FIRING_KINDS['stalled-then-off']);
    expect(Math.abs(reading.levels[0]!.levelCelsius - 700)).toBeLessThan(25);
    expect(reading.levels[0]!.then).toBe('shut-off');
  });
  it('a first firing from cold, gently, takes 35 to 60 min', () => {
    const { reading } = fired(FIRING_KINDS.gentle);
    expect(reading.timeToTemperatureMinutes!).toBeGreaterThan(35);
    expect(reading.timeToTemperatureMinutes!).toBeLessThan(60);
    expect(reading.slowClimbMinutes).toBeNull();
  });
  it.each([
    ['slip-resist', 870],
    ['horsehair', 700],
    ['raku', 960],
  ])('a %s firing to %i °C reaches its own aim and is no stall', (_, targetCelsius) => {
    const { reading } = fired({ ...FIRING_KINDS.plain, targetCelsius, holdMinutes: 8 });
    expect(reading.reachedMinute).not.toBeNull();
    expect(measuredTroubles(reading)).toEqual([]);
  });
});
