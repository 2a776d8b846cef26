import type { SimulatedFiring } from './simulate-firing.ts';

/** A good small fibre kiln of 85 litres: reaches 1010 °C in about 25 min when all is right. */
const GOOD: SimulatedFiring = {
  seed: 1,
  burnerKw: 30,
  volumeLitres: 85,
  lossFactor: 0.1,
  startCelsius: 15,
  targetCelsius: 1010,
  holdMinutes: 4,
  coolMinutes: 5,
};

/** The kinds of firing that tests and demonstrations need; spread one and alter what matters. */
export const FIRING_KINDS = {
  plain: GOOD,
  fast: { ...GOOD, burnerKw: 45, lossFactor: 0.08 },
  gentle: { ...GOOD, fastestPerMinute: 18 },
  slow: { ...GOOD, burnerKw: 15.5, lossFactor: 0.1, holdMinutes: 3 },
  'drying-soak': { ...GOOD, soaks: [{ celsius: 180, minutes: 12 }] },
  'pause-at-540': { ...GOOD, soaks: [{ celsius: 540, minutes: 10 }] },
  'stalled-then-off': { ...GOOD, burnerKw: 18, lossFactor: 0.222, giveUpMinute: 80 },
  'stalled-then-mended': {
    ...GOOD,
    burnerKw: 18,
    lossFactor: 0.1,
    floorLoss: 1.22,
    events: [{ minute: 70, mark: 'floor-changed', lossShare: 0.8 }],
  },
  'sagging-in-wind': {
    ...GOOD,
    burnerKw: 24,
    lossFactor: 0.12,
    fastestPerMinute: 22,
    events: [{ minute: 34, mark: 'gust', gust: { minutes: 7, lossShare: 2.7 } }],
  },
  gusty: {
    ...GOOD,
    events: Array.from({ length: 14 }, (_, i) => ({
      minute: 5 + 3 * i,
      gust: { minutes: 1, lossShare: 1.6 },
    })),
    noiseCelsius: 1.5,
  },
  overshoot: { ...GOOD, overshootCelsius: 35, holdMinutes: 0 },
  'hot-start': { ...GOOD, startCelsius: 420, holdMinutes: 3 },
} satisfies Record<string, SimulatedFiring>;
export type FiringKind = keyof typeof FIRING_KINDS;
