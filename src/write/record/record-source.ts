import type { FiringRecord } from '#shared/api/records.ts';
import type { Reading } from '#shared/firing/types.ts';
import { decodeRecord, decodeRecordBytes } from '#shared/record/decode-record-bytes.ts';
import { detectTable } from '#shared/record/detect-table.ts';
import { parsePastedRows } from '#shared/record/parse-pasted-rows.ts';
import type { SkippedLine } from '#shared/record/read-table.ts';
import type { RecordChoice } from '#shared/record/record-choice.ts';
import { RecordError } from '#shared/record/record-error.ts';
import { whyTooLarge } from '#shared/upload-limits.ts';
import { formatTemperature } from '#shared/units/temperature.ts';
import type { TemperatureUnit } from '#shared/units/temperature.ts';

/** A table that stands in this browser, before it is sent: its text and how to read it. */
export interface RecordSource {
  readonly text: string;
  /** The file as it was chosen, to be sent byte for byte; null once its text was changed here. */
  readonly file: Blob | null;
  readonly fileName: string;
  readonly source: 'file' | 'pasted';
  readonly choice: RecordChoice;
  readonly assumed: readonly string[];
  /** Why the layout could not be found out; then it is chosen by hand. */
  readonly undetected: string | null;
  /** Lines taken out by hand, as the editor counts them. */
  readonly leftOut: readonly number[];
}

const BY_HAND: RecordChoice = {
  delimiter: ',',
  decimal: '.',
  headerLine: null,
  timeColumn: 0,
  timeFormat: 'minutes',
  temperatureColumn: 1,
  secondColumn: null,
  unit: 'C',
};

/** A table's text with what was found out about its layout, or why nothing was. */
export function sourceOf(
  text: string,
  fileName: string,
  source: RecordSource['source'],
  file: Blob | null = null,
  targetCelsius: number | null = null,
): RecordSource {
  const shared = { text, file, fileName, source, leftOut: [] };
  try {
    const { choice, assumed } = detectTable(text, targetCelsius);
    return { ...shared, choice, assumed, undetected: null };
  } catch (error) {
    if (!(error instanceof RecordError)) throw error;
    return { ...shared, choice: BY_HAND, assumed: [], undetected: error.message };
  }
}

/**
 * Reads a chosen file in this browser.
 * @param targetCelsius tells a unit that the file does not name, where it is known
 * @throws RecordError for what is no table of text at all
 */
export async function sourceOfFile(
  file: File,
  targetCelsius: number | null = null,
): Promise<RecordSource> {
  if (file.size === 0) throw new RecordError('This file is empty.');
  const tooLarge = whyTooLarge('record', file.size);
  if (tooLarge !== null) throw new RecordError(tooLarge);
  const bytes = new Uint8Array(await file.arrayBuffer());
  const { text, assumed } = decodeRecord(bytes);
  const source = sourceOf(text, file.name || 'record.csv', 'file', file, targetCelsius);
  return { ...source, assumed: [...assumed, ...source.assumed] };
}

/**
 * The table of a stored record as it was sent, to be read by another choice. It starts from the one
 * it is read by now.
 * @throws RecordError for what is no text
 */
export function sourceOfKept(
  bytes: Uint8Array,
  record: { readonly fileName: string; readonly source: FiringRecord['source'] },
  choice: RecordChoice,
): RecordSource {
  return {
    text: decodeRecordBytes(bytes),
    file: null,
    fileName: record.fileName,
    source: record.source === 'file' ? 'file' : 'pasted',
    choice,
    assumed: [],
    undetected: null,
    leftOut: [],
  };
}

/** Readings that are too many to be typed rows, as a table of our own. */
export function sourceOfReadings(readings: readonly Reading[]): RecordSource {
  const lines = readings.map(({ minute, celsius }) => `${minute},${celsius}`);
  return {
    text: `minute,celsius\n${lines.join('\n')}\n`,
    file: null,
    fileName: 'pasted.csv',
    source: 'pasted',
    choice: { ...BY_HAND, headerLine: 1 },
    assumed: [],
    undetected: null,
    leftOut: [],
  };
}

/** The source without one line: it is made a comment, so the file still says what stood there. */
export function leaveOut(source: RecordSource, line: number): RecordSource {
  let at = 0;
  for (let passed = 1; passed < line; passed += 1) {
    const end = lineEnd(source.text, at);
    if (end >= source.text.length) return source;
    at = source.text.startsWith('\r\n', end) ? end + 2 : end + 1;
  }
  return {
    ...source,
    text: `${source.text.slice(0, at)}# left out: ${source.text.slice(at)}`,
    file: null,
    leftOut: [...source.leftOut, line],
  };
}

/** What stands on a line, shortened for showing. */
export function lineAt(text: string, line: number): string {
  let at = 0;
  for (let passed = 1; passed < line; passed += 1) {
    const end = lineEnd(text, at);
    if (end >= text.length) return '';
    at = text.startsWith('\r\n', end) ? end + 2 : end + 1;
  }
  const words = text.slice(at, lineEnd(text, at));
  return words.length > 120 ? `${words.slice(0, 120)}…` : words;
}

function lineEnd(text: string, from: number): number {
  for (let at = from; at < text.length; at += 1) {
    const code = text.charCodeAt(at);
    if (code === 10 || code === 13) return at;
  }
  return text.length;
}

/** "18 °C to 1012 °C", in words for a preview. */
export function spanWords(readings: readonly Reading[], unit: TemperatureUnit): string {
  let low = Infinity;
  let high = -Infinity;
  for (const { celsius } of readings) {
    low = Math.min(low, celsius);
    high = Math.max(high, celsius);
  }
  return `${formatTemperature(low, unit)} to ${formatTemperature(high, unit)}`;
}

export type PastedText =
  | {
      readonly kind: 'rows';
      readonly readings: readonly Reading[];
      readonly skipped: readonly SkippedLine[];
    }
  | { readonly kind: 'table'; readonly source: RecordSource }
  | { readonly kind: 'unreadable'; readonly because: string };

/** Of lines that say nothing clear, a tenth may be skipped before the text is taken for a table. */
const SKIPPED_SHARE = 0.1;

/**
 * Pasted text as rows of a minute and a temperature; else as a table whose layout is to be
 * confirmed. Words above the first reading are column names, and name units: then it is a table.
 */
export function readPasted(text: string, unit: TemperatureUnit): PastedText {
  try {
    const { readings, skipped } = parsePastedRows(text, unit);
    const isNamed = skipped[0]?.line === 1;
    const few = skipped.length <= Math.max(1, readings.length * SKIPPED_SHARE);
    if (readings.length > 0 && few && !isNamed) return { kind: 'rows', readings, skipped };
    const source = sourceOf(text, 'pasted.csv', 'pasted');
    if (source.undetected === null) return { kind: 'table', source };
    if (readings.length > 0) return { kind: 'rows', readings, skipped };
    const first = skipped[0];
    return {
      kind: 'unreadable',
      because: first ? `Line ${first.line}: ${first.reason}.` : source.undetected,
    };
  } catch (error) {
    if (!(error instanceof RecordError)) throw error;
    return { kind: 'unreadable', because: error.message };
  }
}
