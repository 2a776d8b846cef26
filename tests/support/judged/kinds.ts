import type { Fuel } from '#shared/vocabulary/kiln.ts';
import type { DrawnBecause } from '#shared/vocabulary/kiln.ts';
import type { Kiln, Step } from './kiln.ts';

export interface JudgedPlan {
  readonly kiln: Kiln;
  readonly plan: readonly Step[];
  readonly targetCelsius: number;
  readonly fuel: Fuel;
  readonly drawnBecause?: DrawnBecause;
  /** Half width, minutes, over which the truth of a swinging course is taken. */
  readonly smoothMinutes?: number;
  /** Marks that explain what the temperature does. */
  readonly lidLifted?: number;
}
type Random = () => number;

const between = (random: Random, low: number, high: number): number =>
  low + random() * (high - low);

/** The losses with which this kiln's burner is balanced at a level. */
function lossFor(power: number, levelCelsius: number, air: number): number {
  return power / ((levelCelsius - air) * (1 + levelCelsius / 2000));
}

function gas(random: Random, more: Partial<Kiln> = {}): Kiln {
  const airCelsius = between(random, 2, 28);
  const power = between(random, 38, 62);
  return {
    power,
    loss: lossFor(power, between(random, 1500, 2200), airCelsius),
    airCelsius,
    startCelsius: airCelsius,
    ...more,
  };
}
/** A kiln whose fire cannot bring it over a level. */
function settling(random: Random, levelCelsius: number): Kiln {
  const airCelsius = between(random, 2, 28);
  const power = between(random, 38, 60);
  const loss = lossFor(power, levelCelsius, airCelsius);
  return { power, loss, airCelsius, startCelsius: airCelsius };
}
const target = (random: Random): number => 10 * Math.round(between(random, 85, 104));
const cooling = (random: Random): Step => ({
  kind: 'off',
  minutes: random() < 0.6 ? between(random, 3, 15) : 0,
});
const topped = (random: Random, toCelsius: number): Step[] => [
  { kind: 'burn', toCelsius, atMostMinutes: 200 },
  { kind: 'keep', minutes: random() < 0.3 ? 0 : between(random, 2.5, 9) },
  cooling(random),
];

/** Every kind of firing that the reading is judged by. */
export const JUDGED_KINDS = {
  plain: (random: Random): JudgedPlan => {
    const targetCelsius = target(random);
    return {
      kiln: gas(random),
      plan: topped(random, targetCelsius),
      targetCelsius,
      fuel: 'propane',
    };
  },
  hot: (random: Random): JudgedPlan => {
    const targetCelsius = target(random);
    const kiln = gas(random, { startCelsius: between(random, 150, 500) });
    return { kiln, plan: topped(random, targetCelsius), targetCelsius, fuel: 'propane' };
  },
  fast: (random: Random): JudgedPlan => {
    const targetCelsius = target(random);
    const power = between(random, 75, 120);
    const kiln = gas(random, { power, loss: lossFor(power, 2000, 15) });
    return { kiln, plan: topped(random, targetCelsius), targetCelsius, fuel: 'propane' };
  },
  gentle: (random: Random): JudgedPlan => {
    const targetCelsius = target(random);
    const capPerMinute = between(random, 10, 20);
    const [, ...rest] = topped(random, targetCelsius);
    return {
      kiln: gas(random),
      plan: [{ kind: 'burn', toCelsius: targetCelsius, capPerMinute }, ...rest],
      targetCelsius,
      fuel: 'natural-gas',
    };
  },
  slow: (random: Random): JudgedPlan => {
    const targetCelsius = target(random);
    const power = between(random, 22, 28);
    const kiln = gas(random, {
      power,
      loss: lossFor(power, targetCelsius + between(random, 250, 400), 15),
    });
    return { kiln, plan: topped(random, targetCelsius), targetCelsius, fuel: 'propane' };
  },
  'drying-soak': (random: Random): JudgedPlan => {
    const targetCelsius = target(random);
    return {
      kiln: gas(random),
      plan: [
        { kind: 'burn', toCelsius: between(random, 120, 250), share: 0.6 },
        { kind: 'keep', minutes: between(random, 8, 20) },
        ...topped(random, targetCelsius),
      ],
      targetCelsius,
      fuel: 'propane',
    };
  },
  paused: (random: Random): JudgedPlan => {
    const targetCelsius = target(random);
    return {
      kiln: gas(random),
      plan: [
        { kind: 'burn', toCelsius: between(random, 500, 560) },
        { kind: 'keep', minutes: between(random, 7, 15) },
        ...topped(random, targetCelsius),
      ],
      targetCelsius,
      fuel: 'propane',
    };
  },
  electric: (random: Random): JudgedPlan => {
    const targetCelsius = target(random);
    const airCelsius = between(random, 15, 25);
    const rate = between(random, 80, 160) / 60;
    return {
      kiln: {
        power: 12,
        loss: lossFor(12, 1600, airCelsius),
        airCelsius,
        startCelsius: airCelsius,
      },
      plan: [
        { kind: 'burn', toCelsius: targetCelsius, capPerMinute: rate },
        { kind: 'keep', minutes: between(random, 5, 20) },
        { kind: 'off', minutes: between(random, 0, 30) },
      ],
      targetCelsius,
      fuel: 'electric',
    };
  },
  wood: (random: Random): JudgedPlan => {
    const targetCelsius = target(random);
    const airCelsius = between(random, 5, 25);
    const power = between(random, 14, 20);
    const everyMinutes = between(random, 6, 10);
    return {
      kiln: {
        power,
        loss: lossFor(power, targetCelsius + 400, airCelsius),
        airCelsius,
        startCelsius: airCelsius,
      },
      plan: [
        { kind: 'stoked', everyMinutes, swing: between(random, 0.7, 1.1) },
        { kind: 'burn', toCelsius: targetCelsius },
        { kind: 'off', minutes: between(random, 0, 15) },
      ],
      targetCelsius,
      fuel: 'wood',
      smoothMinutes: everyMinutes,
    };
  },
  'just-short': (random: Random): JudgedPlan => {
    const targetCelsius = target(random);
    return {
      kiln: settling(random, targetCelsius - between(random, 8, 12)),
      plan: [
        { kind: 'burn', toCelsius: 2000, atMostMinutes: between(random, 75, 110) },
        cooling(random),
      ],
      targetCelsius,
      fuel: 'propane',
    };
  },
  'stalled-then-off': (random: Random): JudgedPlan => {
    const targetCelsius = target(random);
    return {
      kiln: settling(random, between(random, 620, targetCelsius - 50)),
      plan: [
        { kind: 'burn', toCelsius: 2000, atMostMinutes: between(random, 60, 110) },
        cooling(random),
      ],
      targetCelsius,
      fuel: 'propane',
      drawnBecause: 'gave-up',
    };
  },
  'stalled-then-mended': (random: Random): JudgedPlan => {
    const targetCelsius = target(random);
    return {
      kiln: settling(random, between(random, 620, targetCelsius - 70)),
      plan: [
        { kind: 'burn', toCelsius: 2000, atMostMinutes: between(random, 55, 90) },
        { kind: 'losses', share: between(random, 0.3, 0.5) },
        ...topped(random, targetCelsius),
      ],
      targetCelsius,
      fuel: 'butane',
    };
  },
  sagging: (random: Random): JudgedPlan => {
    const targetCelsius = target(random);
    const at = between(random, 480, targetCelsius - 80);
    return {
      kiln: gas(random),
      plan: [
        { kind: 'burn', toCelsius: at },
        ...(random() < 0.3
          ? [{ kind: 'spell' as const, minutes: between(random, 4.5, 9), share: 0.2, lossShare: 1 }]
          : [
              {
                kind: 'fall' as const,
                minutes: between(random, 4.5, 10),
                perMinute: between(random, 3, 9),
              },
            ]),
        ...topped(random, targetCelsius),
      ],
      targetCelsius,
      fuel: 'propane',
    };
  },
  gusty: (random: Random): JudgedPlan => {
    const targetCelsius = target(random);
    return {
      kiln: gas(random),
      plan: [
        {
          kind: 'gusts',
          everyMinutes: between(random, 2, 4),
          lossShare: between(random, 1.4, 2.2),
        },
        ...topped(random, targetCelsius),
      ],
      targetCelsius,
      fuel: 'propane',
      smoothMinutes: 2.5,
    };
  },
  'two loads': (random: Random): JudgedPlan => {
    const targetCelsius = target(random);
    return {
      kiln: gas(random),
      plan: [
        { kind: 'burn', toCelsius: targetCelsius },
        { kind: 'keep', minutes: between(random, 3, 6) },
        { kind: 'off', minutes: 60, untilCelsius: between(random, 250, 450) },
        ...topped(random, targetCelsius),
      ],
      targetCelsius,
      fuel: 'propane',
    };
  },
  'lid peek': (random: Random): JudgedPlan => {
    const targetCelsius = target(random);
    return {
      kiln: gas(random),
      plan: [
        { kind: 'burn', toCelsius: between(random, 500, targetCelsius - 60) },
        {
          kind: 'spell',
          minutes: between(random, 0.4, 1),
          share: 0,
          lossShare: between(random, 2, 5),
        },
        ...topped(random, targetCelsius),
      ],
      targetCelsius,
      fuel: 'propane',
    };
  },
  horsehair: (random: Random): JudgedPlan => {
    const targetCelsius = 10 * Math.round(between(random, 68, 74));
    return {
      kiln: gas(random),
      plan: topped(random, targetCelsius),
      targetCelsius,
      fuel: 'propane',
    };
  },
  'drawn by eye': (random: Random): JudgedPlan => {
    const targetCelsius = target(random);
    return {
      kiln: gas(random),
      plan: topped(random, targetCelsius + between(random, -30, 15)),
      targetCelsius,
      fuel: 'propane',
      drawnBecause: 'melt',
    };
  },
} satisfies Record<string, (random: Random) => JudgedPlan>;
export type JudgedKind = keyof typeof JUDGED_KINDS;
