import { formatDuration } from '../../units/duration.ts';
import { formatDifference, formatRate, formatTemperature } from '../../units/temperature.ts';
import { roundTo } from '../../units/number.ts';
import type { FiringReading } from '../../firing/types.ts';
import { FAMILY_OF_FORM } from '../../vocabulary/ware.ts';
import type { NoteFields } from '../note-fields.ts';
import { lookAgain, mustMend } from './check.ts';
import type { Check, CheckContext } from './check.ts';

/** What a pyrometer can show of a firing outdoors; beyond it the probe or the typing is wrong. */
export const READING_RANGE = [-40, 1400] as const;
/** How far a declared value may lie from the record's before it is asked about (our own bounds). */
export const PEAK_TOLERANCE_CELSIUS = 15;
export const TIME_TOLERANCE = { minutes: 3, share: 0.1 } as const;
export const HOLD_TOLERANCE = { minutes: 2, share: 0.3 } as const;
/** No kiln changes so fast over half a minute; a probe pulled, wet or loose does. */
export const PROBE_RATE_PER_MINUTE = 200;
/** Faster than this between 450 and 700 °C, flat and large ware is prone to crack (common practice). */
export const FAST_CROSSING_PER_MINUTE = 40;
/** A piece wider than this counts as large. */
export const LARGE_SPAN_MM = 250;
/** A gap worth a question: the longer of ten minutes and a tenth of the climb. */
export const GAP = { minutes: 10, shareOfClimb: 0.1 } as const;
/** A peak this much later and higher than at shut-off cannot be the kiln's. */
export const AFTER_SHUT_OFF = { minutes: 3, celsius: 15 } as const;

const LISTED = 3;
function rowsSaid(rows: readonly number[]): string {
  const shown = rows.slice(0, LISTED).map((row) => String(row + 1));
  const more = rows.length - shown.length;
  return `${rows.length === 1 ? 'Row' : 'Rows'} ${shown.join(', ')}${more > 0 ? ` and ${String(more)} more` : ''}`;
}

function typedRowChecks({ record: { typedRows }, plan: { typedIn } }: NoteFields): Check[] {
  const backwards: number[] = [];
  const outside: number[] = [];
  const timeless: number[] = [];
  let latest: number | null = null;
  typedRows.forEach(({ minute, celsius }, row) => {
    if (minute !== null) {
      if (latest !== null && minute < latest) backwards.push(row);
      else latest = minute;
    } else if (celsius !== null) timeless.push(row);
    if (celsius !== null && (celsius < READING_RANGE[0] || celsius > READING_RANGE[1])) {
      outside.push(row);
    }
  });
  const checks: Check[] = [];
  const at = (rows: readonly number[], field: 'minute' | 'celsius'): string =>
    `/record/typedRows/${String(rows[0] ?? 0)}/${field}`;
  if (backwards.length > 0) {
    checks.push(
      mustMend(
        'time-backwards',
        at(backwards, 'minute'),
        `${rowsSaid(backwards)} of the readings: the time runs backwards. Correct the minute, or take the row out.`,
      ),
    );
  }
  if (outside.length > 0) {
    const bounds = READING_RANGE.map((bound) => formatTemperature(bound, typedIn)).join(' to ');
    checks.push(
      mustMend(
        'reading-outside',
        at(outside, 'celsius'),
        `${rowsSaid(outside)} of the readings: outside ${bounds}. Correct it, or leave the temperature blank to set the row aside.`,
      ),
    );
  }
  if (timeless.length > 0) {
    checks.push(
      lookAgain(
        'reading-without-minute',
        at(timeless, 'minute'),
        `${rowsSaid(timeless)} of the readings: a temperature without its minute is not used. Put in the minute if you know it.`,
      ),
    );
  }
  return checks;
}

function declaredChecks({ plan }: NoteFields, reading: FiringReading): Check[] {
  const { typedIn } = plan;
  const checks: Check[] = [];
  const declaredPeak = plan.peakBy === 'temperature' ? plan.peakCelsius : null;
  const measuredPeak = reading.peak.celsius;
  if (declaredPeak !== null && Math.abs(declaredPeak - measuredPeak) > PEAK_TOLERANCE_CELSIUS) {
    checks.push(
      lookAgain(
        'peak-disagrees',
        '/plan/peakCelsius',
        `You give a peak of ${formatTemperature(declaredPeak, typedIn)}; the record’s highest is ${formatTemperature(measuredPeak, typedIn)}. Take the record’s, or say why they differ.`,
        {
          pointer: '/plan/peakCelsius',
          value: roundTo(measuredPeak),
          label: `Take ${formatTemperature(measuredPeak, typedIn)}`,
        },
      ),
    );
  }
  const declaredTime = plan.timeToTemperatureMinutes;
  const measuredTime = reading.timeToTemperatureMinutes;
  if (
    declaredTime !== null &&
    measuredTime !== null &&
    Math.abs(declaredTime - measuredTime) >
      Math.max(TIME_TOLERANCE.minutes, TIME_TOLERANCE.share * measuredTime)
  ) {
    checks.push(
      lookAgain(
        'time-disagrees',
        '/plan/timeToTemperatureMinutes',
        `You give ${formatDuration(declaredTime)} to temperature; by the record it was ${formatDuration(measuredTime)}. Take the record’s, or say why they differ.`,
        {
          pointer: '/plan/timeToTemperatureMinutes',
          value: roundTo(measuredTime),
          label: `Take ${formatDuration(roundTo(measuredTime))}`,
        },
      ),
    );
  }
  checks.push(...holdCheck(plan, reading));
  return checks;
}

/** Without an aim a hold cannot be looked for; without one found, it is compared with none. */
function holdCheck(plan: NoteFields['plan'], reading: FiringReading): Check[] {
  const declared = plan.noHold ? 0 : plan.holdKeptMinutes;
  if (declared === null || reading.aimCelsius === null) return [];
  const measured = reading.hold?.minutes ?? 0;
  const allowed = Math.max(HOLD_TOLERANCE.minutes, HOLD_TOLERANCE.share * measured);
  if (Math.abs(declared - measured) <= allowed) return [];
  const said = declared === 0 ? 'no hold' : `a hold of ${formatDuration(declared)}`;
  const read = measured === 0 ? 'none' : formatDuration(measured);
  const text = `You give ${said}; the record shows ${read} near the aim. Correct it, or say why they differ.`;
  return [
    measured === 0 || plan.noHold
      ? lookAgain('hold-disagrees', '/plan/holdKeptMinutes', text)
      : lookAgain('hold-disagrees', '/plan/holdKeptMinutes', text, {
          pointer: '/plan/holdKeptMinutes',
          value: roundTo(measured, 1),
          label: `Take ${formatDuration(measured)}`,
        }),
  ];
}

/** The first row of flat or large ware, or -1. */
function raceableRow(fields: NoteFields): number {
  return fields.pieces.findIndex(
    ({ form, spanMm }) =>
      (form !== null && FAMILY_OF_FORM[form] === 'plate') ||
      (spanMm !== null && spanMm > LARGE_SPAN_MM),
  );
}

function curveChecks(fields: NoteFields, reading: FiringReading): Check[] {
  const { typedIn } = fields.plan;
  const checks: Check[] = [];
  if (Math.abs(reading.fastestPerMinute) > PROBE_RATE_PER_MINUTE) {
    checks.push(
      lookAgain(
        'too-fast-for-a-kiln',
        '/record',
        `The record changes by ${formatRate(Math.abs(reading.fastestPerMinute), typedIn)} for half a minute. Was the probe moved, wet or loose?`,
      ),
    );
  }
  const crossing = reading.steepest450To700;
  const row = raceableRow(fields);
  if (crossing !== null && crossing > FAST_CROSSING_PER_MINUTE && row >= 0) {
    checks.push(
      lookAgain(
        'fast-through-quartz',
        `/pieces/${String(row)}`,
        `The climb between ${formatTemperature(450, typedIn)} and ${formatTemperature(700, typedIn)} came to ${formatRate(crossing, typedIn)}. Flat or wide ware (piece row ${String(row + 1)}) is prone to crack at that pace. Is the record right, and did the piece stay whole?`,
      ),
    );
  }
  const climbMinutes = Math.max(0, reading.peak.minute - reading.start.minute);
  if (reading.longestGapMinutes > Math.max(GAP.minutes, GAP.shareOfClimb * climbMinutes)) {
    checks.push(
      lookAgain(
        'gap-in-record',
        '/record',
        `There is no reading for ${formatDuration(reading.longestGapMinutes)}. Add what you know, or say what happened then.`,
      ),
    );
  }
  checks.push(...afterShutOff(reading, typedIn));
  return checks;
}

function afterShutOff(reading: FiringReading, typedIn: 'C' | 'F'): Check[] {
  const { shutOff, peak, celsiusAtShutOff } = reading;
  const minutes = peak.minute - shutOff.minute;
  const celsius = peak.celsius - celsiusAtShutOff;
  if (shutOff.inferred || minutes <= AFTER_SHUT_OFF.minutes || celsius <= AFTER_SHUT_OFF.celsius) {
    return [];
  }
  return [
    lookAgain(
      'peak-after-shut-off',
      '/record/marks',
      `The peak comes ${formatDuration(minutes)} after the mark “shut off”, and ${formatDifference(celsius, typedIn)} higher. Is the mark at the right minute?`,
    ),
  ];
}

/** What the record says against itself, and against what the author declared. */
export function recordChecks({ fields, reading, hasRecord }: CheckContext): Check[] {
  const checks = typedRowChecks(fields);
  if (hasRecord && !reading) {
    checks.push(
      lookAgain(
        'record-not-read',
        '/record',
        'There are too few readings to read the firing off them. Add more if you have them.',
      ),
    );
  }
  if (reading) checks.push(...declaredChecks(fields, reading), ...curveChecks(fields, reading));
  return checks;
}
