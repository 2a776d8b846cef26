import { describe, expect, it } from 'vitest';
import { levellingOff } from '#shared/firing/levelling-off.ts';
import type { Mark } from '#shared/firing/types.ts';
import { levellingOffCoverage } from '../../../support/judged/levelling-off-coverage.ts';
import { normalNumber, seededRandom } from '../../../../seeds/simulation/seeded-random.ts';

const forecast = (
  end: number,
  tau: number,
  minutes: number,
  noise = 1,
  marks: readonly Mark[] = [],
  aim: number | null = 1010,
  seed = 3,
) => {
  const random = seededRandom(seed);
  const t = Float64Array.from({ length: minutes * 4 + 1 }, (_, i) => i / 4);
  const y = t.map(
    (minute) => end - (end - 300) * Math.exp(-minute / tau) + noise * normalNumber(random),
  );
  return levellingOff(t, y, marks, aim);
};

describe('the levelling-off', () => {
  it('finds the level the fire is going to, with an interval around it', () => {
    const found = forecast(730, 10, 30)!;
    expect(found.celsius).toBeGreaterThan(722);
    expect(found.celsius).toBeLessThan(738);
    expect(found.lowCelsius).toBeLessThanOrEqual(found.celsius);
    expect(found.highCelsius).toBeGreaterThanOrEqual(found.celsius);
    expect(found.reachesAim).toBeNull();
  });

  it('its 95 % interval holds the true level about as often as it says', () => {
    let said = 0;
    let inside = 0;
    for (let seed = 1; seed <= 200; seed += 1) {
      const found = forecast(730, 12, 28, 2, [], 1010, seed);
      if (found === null) continue;
      said += 1;
      if (found.lowCelsius <= 730 && found.highCelsius >= 730) inside += 1;
    }
    expect(said).toBeGreaterThan(150);
    expect(inside / said).toBeGreaterThan(0.88);
  });

  it.each([1, 10])(
    'the interval allows for wind that lasts a minute, at one reading every %i s',
    (secondsBetween) => {
      const { told, share } = levellingOffCoverage(
        {
          secondsBetween,
          windCelsius: 2,
          noiseCelsius: 1.5,
          timeConstantMinutes: 8,
          stillToClimb: 150,
        },
        300,
      );
      expect(told).toBeGreaterThan(250);
      expect(share).toBeGreaterThan(0.89);
      expect(share).toBeLessThan(0.98);
    },
  );

  it('says when the aim will be reached', () => {
    const found = forecast(1100, 15, 30, 0.5)!;
    // 1100 − 800·exp(−t/15) = 1010 at t = 32.8 min, 2.8 min after the last reading.
    expect(found.reachesAim?.lowMinutes).toBeLessThanOrEqual(2.9);
    expect(found.reachesAim?.highMinutes).toBeGreaterThanOrEqual(2.7);
    expect(found.reachesAim?.highMinutes).toBeLessThan(5);
  });

  it('says nothing under 15 min, nor within 15 min of a mark that changes the fire', () => {
    expect(forecast(730, 10, 14)).toBeNull();
    expect(forecast(730, 10, 30, 1, [{ minute: 18, kind: 'gas-up' }])).toBeNull();
    expect(forecast(730, 10, 30, 1, [{ minute: 18, kind: 'gust' }])).not.toBeNull();
    expect(forecast(730, 10, 30, 1, [{ minute: 10, kind: 'gas-up' }])).not.toBeNull();
  });

  it('says nothing of a straight climb, whose level could be anything', () => {
    const t = Float64Array.from({ length: 81 }, (_, i) => i / 4);
    expect(
      levellingOff(
        t,
        t.map((minute) => 100 + 20 * minute),
        [],
        1010,
      ),
    ).toBeNull();
  });
});
