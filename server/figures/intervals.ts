import { normalQuantile } from './normal-quantile.ts';

export interface Interval {
  readonly lower: number;
  readonly upper: number;
}

export const LEVEL_95 = 0.95;

const twoSidedZ = (level: number): number => normalQuantile(1 - (1 - level) / 2);

/**
 * Wilson's score interval for one proportion (method 3 of Newcombe, Statistics in Medicine 17, 1998,
 * 857-872). `successes` and `n` need not be whole: effective sizes are allowed.
 * @returns null for n = 0, where nothing is known
 */
export function wilson(successes: number, n: number, level = LEVEL_95): Interval | null {
  if (!(n > 0)) return null;
  const z = twoSidedZ(level);
  const failures = n - successes;
  const middle = 2 * successes + z * z;
  const half = z * Math.sqrt(z * z + (4 * successes * failures) / n);
  const below = 2 * (n + z * z);
  return {
    lower: successes <= 0 ? 0 : Math.max(0, (middle - half) / below),
    upper: failures <= 0 ? 1 : Math.min(1, (middle + half) / below),
  };
}

export interface Proportion {
  readonly successes: number;
  readonly n: number;
}

/**
 * Newcombe's hybrid score interval for the difference of two independent proportions, first minus
 * second (method 10 of Statistics in Medicine 17, 1998, 873-890).
 * @returns null when either has n = 0
 */
export function newcombe(
  first: Proportion,
  second: Proportion,
  level = LEVEL_95,
): (Interval & { readonly difference: number }) | null {
  const one = wilson(first.successes, first.n, level);
  const two = wilson(second.successes, second.n, level);
  if (!one || !two) return null;
  const p1 = first.successes / first.n;
  const p2 = second.successes / second.n;
  const difference = p1 - p2;
  return {
    difference,
    lower: Math.max(-1, difference - Math.hypot(p1 - one.lower, two.upper - p2)),
    upper: Math.min(1, difference + Math.hypot(one.upper - p1, p2 - two.lower)),
  };
}

/**
 * Correlation assumed between the firings of one member (our own choice, not a measured value): one
 * potter's firings are alike, so ten of them tell less than ten potters' one each.
 */
export const WITHIN_MEMBER_CORRELATION = 0.2;

/**
 * Effective number of firings: n ÷ (1 + 0.2·(k − 1)) with k = Σ nⱼ² ÷ n over members j. It is n when
 * every member counts once.
 */
export function effectiveSize(firingsByMember: readonly number[]): number {
  const n = firingsByMember.reduce((sum, firings) => sum + firings, 0);
  if (n === 0) return 0;
  const k = firingsByMember.reduce((sum, firings) => sum + firings * firings, 0) / n;
  return n / (1 + WITHIN_MEMBER_CORRELATION * (k - 1));
}

/** How many of the ids belong to each member. */
export function firingsPerMember(memberIds: readonly number[]): number[] {
  const counts = new Map<number, number>();
  for (const id of memberIds) counts.set(id, (counts.get(id) ?? 0) + 1);
  return [...counts.values()];
}

/** A share over firings of members, reduced to its effective size: r = p·n_eff. */
export function effectiveProportion(successes: number, memberIds: readonly number[]): Proportion {
  const n = memberIds.length;
  const size = effectiveSize(firingsPerMember(memberIds));
  return { successes: n === 0 ? 0 : (successes / n) * size, n: size };
}
