import type { TimeUnit } from './parse-time.ts';

/** How fast a record climbs and how long it is, in whatever unit its times are. */
export interface Climb {
  /** °C a unit of time, from a fifth to four fifths of the way up to the peak (or down from it). */
  readonly rate: number | null;
  readonly span: number;
}

/** Measures the climb to the peak; the way down where the record only cools. */
export function climbOf(
  times: readonly (number | null)[],
  celsius: readonly (number | null)[],
): Climb {
  const points: { t: number; y: number }[] = [];
  times.forEach((t, i) => {
    const y = celsius[i];
    if (t !== null && y != null && Number.isFinite(y)) points.push({ t, y });
  });
  const first = points[0];
  const last = points[points.length - 1];
  if (first === undefined || last === undefined) return { rate: null, span: 0 };
  const span = Math.abs(last.t - first.t);
  let peak = 0;
  points.forEach((point, i) => {
    if (point.y > (points[peak]?.y ?? -Infinity)) peak = i;
  });
  const flank =
    peak >= 2 || points.length < 4 ? points.slice(0, peak + 1).reverse() : points.slice(peak);
  const high = flank[0];
  const low = flank.reduce((least, point) => Math.min(least, point.y), Infinity);
  if (high === undefined || !(high.y - low > 20)) return { rate: null, span };
  const at = (share: number) =>
    flank.find((point) => point.y <= low + share * (high.y - low)) ?? high;
  const upper = at(0.8);
  const lower = at(0.2);
  const apart = Math.abs(upper.t - lower.t);
  return { rate: apart > 0 ? (upper.y - lower.y) / apart : null, span };
}

/** Serial days of spreadsheets: 1 is 1 January 1900; these are 1990 to 2064. */
const SERIAL_DAYS = [32_874, 60_000] as const;
/** Seconds since 1970, 1990 to 2064. */
const UNIX_SECONDS = [6.3e8, 2.97e9] as const;

/**
 * Between units, °C a unit of time: raku climbs 8 to 75 °C a minute (0.13 to 1.25 a second), a bisque
 * firing 60 to 200 an hour. Common practice, no source.
 */
const SLOWER_IS_MILLISECONDS = 0.004;
const SLOWER_IS_SECONDS = 1.2;
const FASTER_IS_HOURS = 130;
/** A record is not longer than this, minutes: two days and a half. */
const LONGEST_MINUTES = 3600;

export interface GuessedTimeUnit {
  readonly unit: TimeUnit;
  readonly because: string;
}

/** The unit of bare numbers in a time column, with the reason in words. */
export function guessTimeUnit(times: readonly (number | null)[], climb: Climb): GuessedTimeUnit {
  const known = times.filter((value) => value !== null);
  const first = known[0] ?? 0;
  if (known.every((value) => value >= UNIX_SECONDS[0] && value <= UNIX_SECONDS[1])) {
    return { unit: 'seconds', because: 'as seconds since 1970, by their size' };
  }
  if (known.every((value) => value >= UNIX_SECONDS[0] * 1000 && value <= UNIX_SECONDS[1] * 1000)) {
    return { unit: 'milliseconds', because: 'as milliseconds since 1970, by their size' };
  }
  const isSerial = known.every((value) => value >= SERIAL_DAYS[0] && value <= SERIAL_DAYS[1]);
  if (isSerial && climb.span < 5 && known.some((value) => !Number.isInteger(value))) {
    return {
      unit: 'days',
      because: 'as days since 1900 as a spreadsheet counts them, by their size',
    };
  }
  const { rate, span } = climb;
  // Parts of a day from midnight on: a spreadsheet's time of day without its date.
  if (rate !== null && rate > 6000 && span < 1.5) {
    return { unit: 'days', because: 'as parts of a day, by how fast the temperature climbs' };
  }
  if (rate === null) return bySpan(known, span, first);
  const byClimb = 'by how fast the temperature climbs';
  if (rate < SLOWER_IS_MILLISECONDS && span > 60_000) {
    return { unit: 'milliseconds', because: `as milliseconds, ${byClimb}` };
  }
  if (rate < SLOWER_IS_SECONDS || span > LONGEST_MINUTES) {
    return { unit: 'seconds', because: `as seconds, ${byClimb}` };
  }
  return rate > FASTER_IS_HOURS && span <= 72 && known.some((value) => !Number.isInteger(value))
    ? { unit: 'hours', because: `as hours, ${byClimb}` }
    : { unit: 'minutes', because: `as minutes, ${byClimb}` };
}

/** Without a climb to judge by: many rows at an even step are a logger's seconds. */
function bySpan(known: readonly number[], span: number, first: number): GuessedTimeUnit {
  const step = span / Math.max(1, known.length - 1);
  if (span > LONGEST_MINUTES || (known.length > 100 && span > 600 && first < 1e6 && step >= 1)) {
    return { unit: 'seconds', because: 'as seconds, by the length of the record' };
  }
  return { unit: 'minutes', because: 'as minutes' };
}
