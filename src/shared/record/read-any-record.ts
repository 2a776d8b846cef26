import type { Reading } from '../firing/types.ts';
import { decodeRecord } from './decode-record-bytes.ts';
import { detectTable } from './detect-table.ts';
import type { TemperatureUnit } from './parse-number.ts';
import { RecordError } from './record-error.ts';
import type { SkippedLine } from './read-table.ts';
import { readTable } from './read-table.ts';
import type { RecordChoice } from './record-choice.ts';

/** A record as it is proposed: what nobody has confirmed yet. */
export interface ProposedRecord {
  /** Of the proposed probe; minutes from its first reading, °C. */
  readonly readings: readonly Reading[];
  readonly secondProbe: readonly Reading[] | null;
  /** In which the file has its temperatures. */
  readonly unit: TemperatureUnit;
  /** Everything taken for granted, as plain sentences. */
  readonly assumed: readonly string[];
  readonly skipped: readonly SkippedLine[];
  readonly rowCount: number;
  /** How the file was read; changed in any part it reads the same file otherwise. */
  readonly choice: RecordChoice;
}

/**
 * Reads a logger's file that nobody has said anything about, but perhaps what the firing was to reach.
 * @throws RecordError with the line, where there is one, for what cannot be read
 */
export function readAnyRecord(
  bytes: Uint8Array,
  targetCelsius: number | null = null,
): ProposedRecord {
  const { text, assumed } = decodeRecord(bytes);
  if (text.trim() === '') throw new RecordError('This file is empty.');
  const table = detectTable(text, targetCelsius);
  const read = readTable(text, table.choice);
  return {
    readings: read.readings,
    secondProbe: read.secondProbe,
    unit: table.choice.unit,
    assumed: [...assumed, ...table.assumed, ...read.assumed],
    skipped: read.skipped,
    rowCount: read.rowCount,
    choice: table.choice,
  };
}
