/** Rounds half away from zero, to so many decimals, without a minus zero. */
export function roundTo(value: number, decimals = 0): number {
  const scale = 10 ** decimals;
  const rounded = (Math.sign(value) * Math.round(Math.abs(value) * scale + 1e-9)) / scale;
  return rounded === 0 ? 0 : rounded;
}

/**
 * A number as it is shown: at most so many decimals, trailing noughts dropped, a true minus sign.
 * What is no number is shown as a dash, never as "NaN".
 */
export function formatNumber(value: number, decimals = 0): string {
  if (!Number.isFinite(value)) return '–';
  const rounded = roundTo(value, decimals);
  const digits = String(Math.abs(rounded));
  return rounded < 0 ? `−${digits}` : digits;
}
