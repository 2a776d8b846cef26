import { describe, expect, it } from 'vitest';
import { readFiring } from '#shared/firing/read-firing.ts';
import type { FiringReading, Reading } from '#shared/firing/types.ts';
import { cToF, fToC } from '#shared/units/temperature.ts';
import { straightLines } from './made-up-firing.ts';

/** One firing, written down otherwise: what is read off it may move by no more than this (our bounds). */
const RESAMPLED = { minutes: 0.5, celsius: 1.5 } as const;
/** A record read in whole °F is off by up to 0.28 °C. */
const WHOLE_FAHRENHEIT = { minutes: 0.4, celsius: 0.6 } as const;

const FIRINGS = {
  plain: [
    [0, 15],
    [38, 985],
    [45, 987],
    [60, 640],
  ],
  'stalled, then mended': [
    [0, 15],
    [35, 715],
    [50, 722],
    [66, 985],
    [70, 985],
    [85, 640],
  ],
  'stalled to the end': [
    [0, 15],
    [36, 700],
    [62, 706],
    [70, 420],
  ],
  sagged: [
    [0, 15],
    [35, 790],
    [42, 745],
    [57, 985],
    [61, 984],
    [75, 640],
  ],
  'fast, without a hold': [
    [0, 15],
    [14, 985],
    [24, 420],
  ],
  'warm-up and pause': [
    [0, 15],
    [12, 205],
    [30, 212],
    [46, 548],
    [58, 550],
    [76, 985],
    [79, 985],
  ],
} as const;

/** Read every five seconds, with a scatter of about 1 °C that is the same every time. */
function dense(corners: readonly (readonly [number, number])[]): Reading[] {
  let state = 12_345;
  const chance = () => {
    state = (state * 1_103_515_245 + 12_345) % 2_147_483_648;
    return state / 2_147_483_648;
  };
  return straightLines(corners, 1 / 12).map(({ minute, celsius }) => ({
    minute,
    celsius: celsius + (chance() + chance() + chance() - 1.5) * 2,
  }));
}

function readOff(readings: readonly Reading[]): FiringReading {
  const reading = readFiring({
    readings,
    targetCelsius: 985,
    fuel: 'propane',
    startClass: 'cold',
    drawnBecause: 'temperature',
    probe: 'K',
  });
  expect(reading).not.toBeNull();
  return reading!;
}

interface Named {
  readonly name: string;
  readonly value: number;
  readonly of: 'minutes' | 'celsius';
}

/** Everything that is told of a firing, by name, in order. */
function told(reading: FiringReading): Named[] {
  const minute = (name: string, value: number | null | undefined): Named[] =>
    value == null ? [] : [{ name, value, of: 'minutes' }];
  const celsius = (name: string, value: number | null | undefined): Named[] =>
    value == null ? [] : [{ name, value, of: 'celsius' }];
  return [
    ...minute('start', reading.start.minute),
    ...minute('shut off', reading.shutOff.minute),
    ...celsius('peak', reading.peak.celsius),
    ...minute('time to temperature', reading.timeToTemperatureMinutes),
    ...reading.levels.flatMap((level) => [
      ...minute(`${level.kind} from`, level.fromMinute),
      ...minute(`${level.kind} to`, level.toMinute),
      ...celsius(`${level.kind} level`, level.levelCelsius),
    ]),
    ...reading.sags.flatMap((sag) => [
      ...minute('sag from', sag.fromMinute),
      ...minute('sag to', sag.toMinute),
      ...celsius('sag by', sag.dropCelsius),
    ]),
    ...minute('hold', reading.hold?.minutes),
    ...celsius('hold level', reading.hold?.levelCelsius),
    ...reading.quartzCrossings.flatMap((one) => minute('crossing', one.minutes)),
  ];
}

function expectSame(
  one: FiringReading,
  other: FiringReading,
  bounds: Readonly<Record<Named['of'], number>>,
): void {
  const [a, b] = [told(one), told(other)];
  expect(b.map(({ name }) => name)).toEqual(a.map(({ name }) => name));
  const moved = a.flatMap(({ name, value, of }, i) => {
    const now = b[i]?.value ?? NaN;
    return Math.abs(now - value) <= bounds[of] ? [] : [`${name}: ${value} became ${now}`];
  });
  expect(moved).toEqual([]);
}

describe.each(Object.entries(FIRINGS))('one firing written down otherwise: %s', (name, corners) => {
  const readings = dense(corners);
  const reading = readOff(readings);

  it('tells what it is made of', () => {
    expect(reading.levels.some(({ kind }) => kind === 'stall')).toBe(name.startsWith('stalled'));
    expect(reading.sags.length > 0).toBe(name === 'sagged');
  });

  it('through °F and back nothing moves', () => {
    const back = readings.map(({ minute, celsius }) => ({
      minute,
      celsius: fToC(cToF(celsius)),
    }));
    expectSame(reading, readOff(back), { minutes: 1e-3, celsius: 1e-3 });
  });

  it('shown in whole °F findings move by less than half a minute and 0.6 °C', () => {
    const whole = readings.map(({ minute, celsius }) => ({
      minute,
      celsius: fToC(Math.round(cToF(celsius))),
    }));
    expectSame(reading, readOff(whole), WHOLE_FAHRENHEIT);
  });

  it.each([
    [2, 0],
    [2, 1],
    [3, 0],
    [6, 0],
  ])(
    'by one reading in %i (from the %i-th on) findings stay, and move by half a minute and 1.5 °C at most',
    (every, offset) => {
      const fewer = readings.filter((_, i) => i % every === offset);
      expectSame(reading, readOff(fewer), RESAMPLED);
    },
  );
});
