import { BAND_MINUTES, MISSING_MINUTE_CELSIUS } from '#shared/look-alike/constants.ts';

/**
 * The distance by its definition, with the whole table kept and nothing left early: the symmetric
 * form of Sakoe and Chiba (1978), weights 1, 2, 1, from memory of the paper's equation.
 */
export function fullDistance(one: Int16Array, other: Int16Array): number {
  const n = Math.max(one.length, other.length);
  const at = (signature: Int16Array, minute: number) =>
    signature[Math.min(minute, signature.length - 1)] ?? 0;
  const table = Array.from({ length: n }, () => new Array<number>(n).fill(Infinity));
  const cell = (i: number, j: number) => table[i]?.[j] ?? Infinity;
  for (let i = 0; i < n; i += 1) {
    for (let j = 0; j < n; j += 1) {
      if (Math.abs(i - j) > BAND_MINUTES) continue;
      const cost = (at(one, i) - at(other, j)) ** 2;
      const row = table[i];
      if (row === undefined) continue;
      row[j] =
        i === 0 && j === 0
          ? 2 * cost
          : Math.min(cell(i - 1, j) + cost, cell(i, j - 1) + cost, cell(i - 1, j - 1) + 2 * cost);
    }
  }
  const missing = 2 * Math.abs(one.length - other.length) * MISSING_MINUTE_CELSIUS ** 2;
  return Math.sqrt((cell(n - 1, n - 1) + missing) / (2 * n));
}
