/**
 * The firing is compared over at most three hours: a gas raku climb is over long before, and a
 * signature stays small. What comes later is not compared.
 */
export const MOST_MINUTES = 180;

/** A firing shorter than this has no climb to compare, minutes. */
export const FEWEST_MINUTES = 5;

/**
 * How far a moment of one firing may be matched before or after the same minute of the other, so
 * that a lull of a few minutes or a start read a little late does not part two alike climbs.
 * Five per cent of a long climb and a tenth of a usual one; common practice for banded warping
 * (Sakoe and Chiba 1978 bound the path the same way), no source for raku.
 */
export const BAND_MINUTES = 4;

/**
 * What each minute that only one of the two firings has costs, °C, beside its distance from where
 * the shorter one ended: without it a stay of 20 min and one of an hour would be the same. From
 * trials with simulated firings, no source.
 */
export const MISSING_MINUTE_CELSIUS = 20;

/** Climbs farther apart than this are not called alike, °C. From trials, no source. */
export const ALIKE_WITHIN_CELSIUS = 80;
