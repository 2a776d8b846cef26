/**
 * A kiln of one lump of heat, fired by a plan: C·dT/dt = burner − losses, the losses growing with
 * temperature as radiation does. Times in minutes, temperatures °C, powers as the climb in °C/min
 * that they would give a kiln without losses.
 */
export interface Kiln {
  /** Full burner, °C/min. */
  readonly power: number;
  /** Losses, °C/min for each °C above the air, when cold. */
  readonly loss: number;
  readonly airCelsius: number;
  readonly startCelsius: number;
}

export type Step =
  /** Burns at this share of the burner until a temperature, or until it has burnt so long. */
  | {
      readonly kind: 'burn';
      readonly toCelsius: number;
      readonly share?: number;
      readonly capPerMinute?: number;
      readonly atMostMinutes?: number;
    }
  /** Turned down to stay where it is. */
  | { readonly kind: 'keep'; readonly minutes: number; readonly driftPerMinute?: number }
  /** From now on the losses are this many times the first ones. */
  | { readonly kind: 'losses'; readonly share: number }
  /** Losses are multiplied for a time, the burner at this share: a wind, an open lid. */
  | {
      readonly kind: 'spell';
      readonly minutes: number;
      readonly share: number;
      readonly lossShare: number;
    }
  /** Falls back by so much a minute, as in a steady wind. */
  | { readonly kind: 'fall'; readonly minutes: number; readonly perMinute: number }
  /** The wind comes and goes for the rest of the firing: gusts of about a minute. */
  | { readonly kind: 'gusts'; readonly everyMinutes: number; readonly lossShare: number }
  /** Stoked by hand: the heat swings with this period from now on. */
  | { readonly kind: 'stoked'; readonly everyMinutes: number; readonly swing: number }
  /** Nothing burns. */
  | { readonly kind: 'off'; readonly minutes: number; readonly untilCelsius?: number };

export interface Course {
  /** Noise-free temperature every STEP_MINUTES from the record's zero. */
  readonly celsius: Float64Array;
  readonly litMinute: number;
  readonly shutOffMinute: number;
  /** Intervals in which nothing burnt, between lighting and the last shut-off. */
  readonly outs: readonly { readonly from: number; readonly to: number }[];
}

export const STEP_MINUTES = 1 / 60;
const LONGEST_STEPS = 60 * 60 * 14;

/** Fires a plan. `random` decides when gusts come. */
export function fire(kiln: Kiln, plan: readonly Step[], random: () => number): Course {
  const celsius: number[] = [];
  const outs: { from: number; to: number }[] = [];
  let now = kiln.startCelsius;
  let lossShare = 1;
  let gusts: { everyMinutes: number; lossShare: number } | null = null;
  let gustUntil = -1;
  let nextGust = Infinity;
  let stoked: { everyMinutes: number; swing: number; since: number } | null = null;
  let litMinute: number | null = null;
  let shutOffMinute = 0;
  const minute = () => celsius.length * STEP_MINUTES;

  const wind = (): number => {
    if (gusts === null) return 1;
    const at = minute();
    if (at >= nextGust) {
      gustUntil = at + 0.6 + 0.8 * random();
      nextGust = at + gusts.everyMinutes * (0.4 + 1.2 * random());
    }
    return at < gustUntil ? gusts.lossShare : 1;
  };
  const step = (heat: number, losses: number, cap = Infinity): void => {
    celsius.push(now);
    const swing =
      stoked === null || heat === 0
        ? 1
        : 1 +
          stoked.swing * Math.sin((2 * Math.PI * (minute() - stoked.since)) / stoked.everyMinutes);
    const lost = kiln.loss * lossShare * losses * (now - kiln.airCelsius) * (1 + now / 2000);
    now += Math.min(cap, heat * swing - lost) * STEP_MINUTES;
  };

  for (const one of plan) {
    const begun = minute();
    const isLit = one.kind === 'burn' || one.kind === 'keep';
    if (isLit) litMinute ??= begun;
    if (one.kind === 'losses') lossShare = one.share;
    if (one.kind === 'gusts') {
      gusts = one;
      nextGust = begun + one.everyMinutes * random();
    }
    if (one.kind === 'stoked') stoked = { ...one, since: begun };
    if (one.kind === 'burn') {
      const until = begun + (one.atMostMinutes ?? Infinity);
      while (now < one.toCelsius && minute() < until && celsius.length < LONGEST_STEPS) {
        step(kiln.power * (one.share ?? 1), wind(), one.capPerMinute);
      }
    }
    if (one.kind === 'keep') {
      const level = now;
      while (minute() < begun + one.minutes) {
        celsius.push(now);
        const aim = level + (one.driftPerMinute ?? 0) * (minute() - begun);
        const back = (aim - now) / 0.5;
        now += (back - (wind() - 1) * 4) * STEP_MINUTES;
      }
    }
    if (one.kind === 'fall') {
      while (minute() < begun + one.minutes) {
        celsius.push(now);
        now -= one.perMinute * STEP_MINUTES;
      }
    }
    if (one.kind === 'spell') {
      while (minute() < begun + one.minutes) step(kiln.power * one.share, one.lossShare);
    }
    if (one.kind === 'off') {
      if (litMinute !== null) {
        shutOffMinute = begun;
        outs.push({ from: begun, to: Infinity });
      }
      const floor = one.untilCelsius ?? -Infinity;
      while (minute() < begun + one.minutes && now > floor) step(0, 1);
      const last = outs[outs.length - 1];
      if (last !== undefined) last.to = minute();
    }
  }
  celsius.push(now);
  const isOffAtEnd = plan[plan.length - 1]?.kind === 'off' && litMinute !== null;
  return {
    celsius: Float64Array.from(celsius),
    litMinute: litMinute ?? 0,
    shutOffMinute: isOffAtEnd ? shutOffMinute : minute(),
    outs: isOffAtEnd ? outs.slice(0, -1) : outs,
  };
}
