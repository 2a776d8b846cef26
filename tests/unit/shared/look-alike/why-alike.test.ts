import { describe, expect, test } from 'vitest';
import {
  climbTraits,
  climbTraitsSchema,
  type ClimbTraits,
} from '#shared/look-alike/climb-traits.ts';
import { readFiring } from '#shared/firing/read-firing.ts';
import { whyAlike } from '#shared/look-alike/why-alike.ts';
import { METRIC_UNITS } from '#shared/units/units.ts';
import { FIRING_KINDS } from '../../../../seeds/simulation/firing-kinds.ts';
import { simulateFiring } from '../../../../seeds/simulation/simulate-firing.ts';

const NONE: ClimbTraits = {
  minutes: 40,
  peakCelsius: 700,
  peakMinute: 40,
  aimCelsius: null,
  reachedMinute: null,
  shape: null,
  rate400To700: null,
  levels: [],
  sags: [],
  hold: null,
};
const stall = (levelCelsius: number, minutes: number) => ({
  kind: 'stall' as const,
  atMinute: 25,
  minutes,
  levelCelsius,
  then: null,
});
/** Spaces that do not break are read as spaces here. */
const why = (one: ClimbTraits, other: ClimbTraits, units = METRIC_UNITS) =>
  whyAlike(one, other, units).map((sentence) => sentence.replaceAll('\u00a0', ' '));
const far = { ...NONE, peakCelsius: 1000 };

describe('why two climbs are alike', () => {
  test('names the level both stop at, with how far they are from it and how long they stay', () => {
    const one = { ...NONE, levels: [stall(704, 14)] };
    const other = { ...NONE, levels: [stall(719, 31)] };
    expect(why(one, other)).toEqual([
      'Both level off within 10 °C of 710 °C, for 14 min and 31 min.',
    ]);
    expect(why(other, one)).toEqual([
      'Both level off within 10 °C of 710 °C, for 31 min and 14 min.',
    ]);
    const fahrenheit = { ...METRIC_UNITS, temperature: 'F' as const };
    // 704 °C is 1299.2 °F and 719 °C is 1326.2 °F: 16.2 °F from 1310 °F at most.
    expect(why(one, other, fahrenheit)[0]).toMatch(/^Both level off within 20 °F of 1310 °F/);
  });

  test('says a fast start and a shut-off only when both had them', () => {
    const racing = (shape: ClimbTraits['shape'], then: 'shut-off' | 'climbed') => ({
      ...NONE,
      shape,
      levels: [{ ...stall(710, 14), then }],
    });
    const fast = racing('racing-then-creeping', 'shut-off');
    expect(why(fast, fast)[0]).toBe(
      'Both level off within 5 °C of 710 °C after a fast start, for 14 min, and are shut off there.',
    );
    const steady = why(fast, racing('steady', 'climbed'));
    expect(steady[0]).toBe('Both level off within 5 °C of 710 °C, for 14 min.');
    expect(steady).toHaveLength(1);
  });

  test('says nothing of a level, sag, hold, peak or rate that only one has, or that lie apart', () => {
    const one: ClimbTraits = {
      ...NONE,
      shape: 'steady',
      rate400To700: 30,
      levels: [stall(700, 14)],
      sags: [{ atMinute: 20, topCelsius: 800, dropCelsius: 30 }],
      hold: { minutes: 4, levelCelsius: 700 },
    };
    expect(why(one, far)).toEqual([]);
    expect(why(far, one)).toEqual([]);
    const apart: ClimbTraits = {
      ...one,
      peakCelsius: 1000,
      shape: 'stepped',
      rate400To700: 12,
      levels: [stall(760, 14)],
      sags: [{ atMinute: 20, topCelsius: 950, dropCelsius: 30 }],
      hold: { minutes: 4, levelCelsius: 1000 },
    };
    expect(why(one, apart)).toEqual([]);
  });

  test('calls what is a hold in one and a stall in the other a stay in both', () => {
    const held = { ...far, levels: [{ ...stall(712, 12), kind: 'hold' as const }] };
    const stuck = { ...NONE, levels: [stall(708, 16)] };
    expect(why(held, stuck)).toEqual(['Both stay within 5 °C of 710 °C, for 12 min and 16 min.']);
  });

  test('tells at most two things, the most telling first', () => {
    const full: ClimbTraits = {
      ...NONE,
      peakCelsius: 1004,
      peakMinute: 31,
      shape: 'steady',
      rate400To700: 32,
      hold: { minutes: 4, levelCelsius: 1003 },
      sags: [{ atMinute: 20, topCelsius: 800, dropCelsius: 30 }],
    };
    expect(why(full, { ...full, peakMinute: 33 })).toEqual([
      'Both sag from within 5 °C of 800 °C, by 30 °C.',
      'Both peak within 5 °C of 1000 °C, after 31 min and 33 min.',
    ]);
    // Times that lie far apart are left out of the sentence.
    const slow = { ...full, sags: [], peakMinute: 58 };
    expect(why({ ...full, sags: [] }, slow)[0]).toBe('Both peak within 5 °C of 1000 °C.');
  });

  test('never says of a record that just ends that the kiln was shut off', () => {
    const readings = Array.from({ length: 60 }, (_, minute) => ({
      minute,
      celsius: Math.min(700, 20 + 27 * minute),
    }));
    const traitsWith = (marks: { minute: number; kind: 'shut-off' }[]) => {
      const reading = readFiring({ readings, marks, targetCelsius: 1000 });
      if (reading === null) throw new Error('It can be read.');
      return climbTraits(reading);
    };
    const ended = traitsWith([]);
    const off = traitsWith([{ minute: 59, kind: 'shut-off' }]);
    expect(why(off, off)[0]).toMatch(/and are shut off there/);
    expect(why(ended, off)[0]).toMatch(/^Both level off within 5 °C of 700 °C, for \d+ min/);
    expect(why(ended, off)[0]).not.toMatch(/shut off/);
  });

  test('of a simulated stall and its like speaks of the stall, from what was read off each', () => {
    const traitsOf = (seed: number) => {
      const { readings, marks } = simulateFiring({ ...FIRING_KINDS['stalled-then-off'], seed });
      const reading = readFiring({ readings, marks, targetCelsius: 1010, drawnBecause: 'gave-up' });
      if (reading === null) throw new Error('A simulated firing can be read.');
      return climbTraitsSchema.parse(climbTraits(reading));
    };
    const [one, other] = [traitsOf(1), traitsOf(2)];
    expect(one.levels.map(({ kind }) => kind)).toContain('stall');
    expect(why(one, other)[0]).toMatch(/^Both level off within \d+ °C of \d{3} °C/);
  });
});
