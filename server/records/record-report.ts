import type { FiringInput, FiringReading, LevelStretch } from '#shared/firing/types.ts';
import { readFiring } from '#shared/firing/read-firing.ts';
import { findingText, findingsOf } from '#shared/firing/findings.ts';
import { openChecks, type Check } from '#shared/note/checks/check.ts';
import { rangeChecks } from '#shared/note/checks/range-checks.ts';
import { recordChecks } from '#shared/note/checks/record-checks.ts';
import { emptyNoteFields } from '#shared/note/note-fields.ts';
import { decodeRecordBytes } from '#shared/record/decode-record-bytes.ts';
import type { TemperatureUnit } from '#shared/record/parse-number.ts';
import { readAnyRecord } from '#shared/record/read-any-record.ts';
import { readTable } from '#shared/record/read-table.ts';
import { RecordError } from '#shared/record/record-error.ts';
import { METRIC_UNITS } from '#shared/units/units.ts';

/** What is known of a firing beside its file. */
export type ReportOptions = Omit<FiringInput, 'readings' | 'secondProbe'> & {
  /** Read the temperatures in this unit, whatever the file seems to say. */
  readonly unit?: TemperatureUnit | null;
};

/** A firing read off a logger's file, as scripts take it: every temperature °C, every time a minute. */
export type RecordReport = ReturnType<typeof reportOf>;
export interface ReportError {
  readonly error: { readonly message: string; readonly line: number | null };
}

/**
 * Reads one logger's file and the firing off it.
 * @returns the error, with its line, of a file that cannot be read
 */
export function recordReport(
  bytes: Uint8Array,
  options: ReportOptions,
): RecordReport | ReportError {
  try {
    const { unit, ...firing } = options;
    const proposed = readAnyRecord(bytes, options.targetCelsius ?? null);
    const choice = { ...proposed.choice, unit: unit ?? proposed.choice.unit };
    const { readings, secondProbe, assumed } =
      choice.unit === proposed.unit ? proposed : readTable(decodeRecordBytes(bytes), choice);
    const reading = readFiring({ ...firing, readings, secondProbe });
    if (reading === null) {
      return failure(`Only ${String(readings.length)} readings: at least three are needed.`);
    }
    const said = [...new Set([...assumed, ...reading.assumed])];
    return reportOf(reading, firing, choice.unit, said);
  } catch (error) {
    if (!(error instanceof RecordError)) throw error;
    return failure(error.message, error.line);
  }
}

export function failure(message: string, line: number | null = null): ReportError {
  return { error: { message, line } };
}

function reportOf(
  reading: FiringReading,
  firing: Omit<FiringInput, 'readings'>,
  unit: TemperatureUnit,
  assumed: readonly string[],
) {
  const levels = reading.levels.map(levelOf);
  const { hold, levellingOff } = reading;
  return {
    readings: reading.count,
    unit,
    span_min: rounded(reading.spanMinutes),
    start: { min: rounded(reading.start.minute), inferred: reading.start.inferred },
    peak: { c: rounded(reading.peak.celsius), min: rounded(reading.peak.minute) },
    reached_min: maybe(reading.reachedMinute),
    time_to_temperature_min: maybe(reading.timeToTemperatureMinutes),
    pace_c_per_min: maybe(reading.paceCelsiusPerMinute),
    climb: {
      average_c_per_min: maybe(reading.climb.averagePerMinute),
      steepest_c_per_min: maybe(reading.climb.steepestPerMinute),
      shape: reading.climb.shape,
    },
    quartz_crossings: reading.quartzCrossings.map((one) => ({
      from_min: rounded(one.fromMinute),
      to_min: rounded(one.toMinute),
      minutes: rounded(one.minutes),
      rate_c_per_min: rounded(one.ratePerMinute),
      confidence: one.confidence,
    })),
    levels,
    stalls: levels.filter((level) => level.kind === 'stall'),
    sags: reading.sags.map((sag) => ({
      from_min: rounded(sag.fromMinute),
      to_min: rounded(sag.toMinute),
      drop_c: rounded(sag.dropCelsius),
      confidence: sag.confidence,
    })),
    hold: hold && {
      from_min: rounded(hold.fromMinute),
      to_min: rounded(hold.toMinute),
      minutes: rounded(hold.minutes),
      level_c: rounded(hold.levelCelsius),
      off_aim_c: maybe(hold.offAimCelsius),
      sd_c: rounded(hold.sdCelsius),
      confidence: hold.confidence,
    },
    levelling_off: levellingOff && {
      c: rounded(levellingOff.celsius),
      low_c: rounded(levellingOff.lowCelsius),
      high_c: rounded(levellingOff.highCelsius),
    },
    shut_off: { min: rounded(reading.shutOff.minute), inferred: reading.shutOff.inferred },
    findings: findingsOf(reading).map((finding) => findingText(finding, METRIC_UNITS)),
    assumed,
    checks: checksOf(reading, firing).map(({ code, kind, text }) => ({ code, kind, text })),
  };
}

function levelOf(level: LevelStretch) {
  return {
    kind: level.kind,
    from_min: rounded(level.fromMinute),
    to_min: rounded(level.toMinute),
    minutes: rounded(level.minutes),
    level_c: rounded(level.levelCelsius),
    confidence: level.confidence,
  };
}

/** The checks of a note that says nothing but this record and its target. */
function checksOf(reading: FiringReading, firing: Omit<FiringInput, 'readings'>): Check[] {
  const empty = emptyNoteFields();
  const fields = {
    ...empty,
    plan: { ...empty.plan, targetCelsius: firing.targetCelsius ?? null },
  };
  const context = {
    fields,
    kiln: null,
    reading,
    hasRecord: true,
    earlier: null,
    today: new Date().toISOString().slice(0, 10),
  };
  return openChecks([...rangeChecks(context), ...recordChecks(context)], []);
}

function rounded(value: number): number {
  return Math.round(value * 100) / 100;
}

function maybe(value: number | null): number | null {
  return value === null ? null : rounded(value);
}
