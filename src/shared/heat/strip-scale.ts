/** Small strips are never drawn on a scale shorter than this, minutes. */
export const SHORTEST_STRIP_SCALE_MINUTES = 60;

/**
 * The one scale of minutes for the small strips shown together: 0 to the 90th percentile of their
 * lengths (type 7 quantile, Hyndman and Fan 1996), at least 60 min, rounded up to whole minutes.
 * Longer strips end torn. Lengths that are not positive numbers are left out.
 */
export function stripScaleMinutes(lengthsMinutes: readonly number[]): number {
  const sorted = lengthsMinutes
    .filter((length) => Number.isFinite(length) && length > 0)
    .sort((one, other) => one - other);
  const position = (sorted.length - 1) * 0.9;
  const below = sorted[Math.floor(position)];
  const above = sorted[Math.ceil(position)];
  if (below === undefined || above === undefined) return SHORTEST_STRIP_SCALE_MINUTES;
  const percentile = below + (above - below) * (position - Math.floor(position));
  return Math.max(SHORTEST_STRIP_SCALE_MINUTES, Math.ceil(percentile));
}
