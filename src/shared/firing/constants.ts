/**
 * Every number the reading of a firing rests on: its value, why, and where it comes from. "Our
 * definition" means that we drew the line ourselves, so that two readers of one record agree; such
 * numbers are no statements about how to fire.
 */

/** Readings outside are no kiln temperatures: a cold yard and the limit of type K wire (our definition). */
export const LOWEST_CELSIUS = -40;
export const HIGHEST_CELSIUS = 1400;

/** Minutes further from the record's zero than this (190 years) are no times of a firing (our definition). */
export const FARTHEST_MINUTE = 1e8;
/** Readings closer together than this, minutes, are of one moment: a sixth of a millisecond (our definition). */
export const SAME_MOMENT = 1e-6;

/** Fewer readings than this show no course at all (our definition). */
export const FEWEST_READINGS = 3;

/** Half width of the straight-line regression behind rates: long enough for a rate, short enough for a stall (our definition). */
export const WIDE_HALF_MINUTES = 2.5;

/** A jump both in and out faster than this, °C/min, is a wild reading, no kiln: a small kiln's own climb stays well below (our definition). */
export const WILD_RATE = 100;
export const WILD_CELSIUS = 25;
/** A probe is back in its place within so many minutes; one that shows a single value may be dead for longer (our definition). */
export const WILD_MINUTES = 5;
export const STUCK_MINUTES = 60;
/** Meanwhile the kiln itself went on by no more than this, °C/min (our definition). */
export const COURSE_RATE = 40;

/** The fire is burning once the curve rises this fast for so long: slower drifts are weather (our definition). */
export const START_RATE = 3;
export const START_MINUTES = 2;

/** The aim counts as reached 5 °C below it: half of what one class 2 type K probe may be off near 1000 °C (IEC 60584) is more than this. */
export const REACHED_BELOW_AIM = 5;

/** Bands of the pace: 25 °C from 150 °C up; below, drying slows the kiln (our definition). */
export const PACE_BAND = 25;
export const PACE_FROM = 150;

/** A level stretch: rate at most min(2, pace ÷ 4) °C/min for at least max(5 min, 20 °C ÷ pace) (our definition). */
export const LEVEL_RATE = 2;
export const LEVEL_PACE_SHARE = 4;
export const LEVEL_MINUTES = 5;
export const LEVEL_PACE_CELSIUS = 20;
export const LEVEL_FEWEST_READINGS = 3;
/** Stretches less far apart than this are one (our definition). */
export const LEVEL_GAP_MINUTES = 2;
export const LEVEL_GAP_CELSIUS = 10;
/** A stretch that ends this much below its beginning is a sag only (our definition). */
export const LEVEL_FALL = 15;
/** Minutes after a stretch within which the aim may still be reached for it to be an approach (our definition). */
export const APPROACH_MINUTES = 2;
/** Within this of the aim a stretch is only just short: two honest class 2 type K probes can differ by 15 °C near 1000 °C (IEC 60584-2: ±7.5 °C each). */
export const JUST_SHORT = 15;
/** Below this a level stretch is drying and warming up (our definition; water leaves clay well below 350 °C). */
export const WARM_UP_BELOW = 350;
/** Below this a stretch that was later climbed past may have been meant, before the quartz inversion at 573 °C (our definition). */
export const PAUSE_BELOW = 600;
export const PASSED_BY = 50;
/** An author's answer belongs to the stretch that starts within so many minutes of it (our definition). */
export const ANSWER_MINUTES = 3;

/** A sag: a fall of at least 15 °C lasting at least 3 min at no more than 10 °C/min, from 350 °C or more (our definition). */
export const SAG_DROP = 15;
export const SAG_MINUTES = 3;
export const SAG_RATE = 10;
export const SAG_FROM = 350;
/** A fall begun within so many minutes after gas down, flue opened, lid lifted or loaded explains itself (our definition). */
export const SAG_EXPLAINED_MINUTES = 2;

/** A hold: at least 2 min within ±10 °C of its own median, that within ±15 °C of the aim (our definition). */
export const HOLD_MINUTES = 2;
export const HOLD_BAND = 10;
export const HOLD_OFF_AIM = 15;
/** Its ends lie apart by no more than max(3 °C, 0.5 °C a minute) (our definition). */
export const HOLD_ENDS = 3;
export const HOLD_ENDS_PER_MINUTE = 0.5;

/** Quartz inverts at 573 °C (Dodd and Murfin, Dictionary of Ceramics, 3rd ed., 1994). */
export const QUARTZ_INVERSION = 573;
/** The pyrometer span in which ware passes it (our definition: the ware lags the pyrometer). */
export const QUARTZ_FROM = 550;
export const QUARTZ_TO = 600;

/** Overshoot: a peak of target + 20 °C or more (our definition). */
export const OVERSHOOT = 20;
/** Slow: more than an hour of burning to temperature, from cold, with gas (common practice, no source). */
export const SLOW_MINUTES = 60;
/** Uneven: two probes more than 40 °C apart for 5 min above 600 °C: more than two class 2 probes can differ (IEC 60584-2), and lasting (our definition). */
export const UNEVEN_CELSIUS = 40;
export const UNEVEN_MINUTES = 5;
export const UNEVEN_ABOVE = 600;

/** Scatter above this, °C, is more than the reading of a steady probe: the smallest class 2 tolerance of type K is ±2.5 °C (IEC 60584-2). */
export const WAVERING_CELSIUS = 2.5;

/** A stretch is well shown where readings stand within a sixth of it, badly where over half of it lies between two (our definition). */
export const CLOSE_READINGS = 1 / 6;
export const FAR_READINGS = 1 / 2;
/** Scatter of half the size of what is told makes it less sure (our definition). */
export const MUCH_SCATTER = 1 / 2;

/** Forecast of the levelling-off: 30-s means of the last 20 min, none under 15 min (our definition). */
export const FORECAST_MEAN_MINUTES = 0.5;
export const FORECAST_MINUTES = 20;
export const FORECAST_FEWEST_MINUTES = 15;
/** Said only when its 95 % interval is narrower than this (our definition). */
export const FORECAST_WIDEST = 80;
/** Time constants a small kiln can have, minutes: outside, a curve of 15 min cannot be told from a line (our definition). */
export const SHORTEST_TIME_CONSTANT = 1;
export const LONGEST_TIME_CONSTANT = 90;

/** A fall is steep when it loses more than 10 °C/min over 3 min: sags are slower (our definition). */
export const STEEP_RATE = 10;
export const STEEP_MINUTES = 3;
/** A slower fall from the peak to the record's end is the end of the firing once it has lost 100 °C (our definition). */
export const COOLED_BY = 100;
