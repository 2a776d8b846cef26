import type { NoteDocument } from '../../search/note-document.ts';
import { FIND_RANGES, type FindQuery, type FindRange, type Histogram } from '#shared/api/search.ts';

/** Where in the index each measure stands. */
const FIELDS = {
  stall: 'stallC',
  peak: 'peakC',
  climb: 'minutesToPeak',
  hold: 'holdMinutes',
  crossing: 'crossingRatePerMin',
} as const satisfies Record<FindRange, keyof NoteDocument>;

export const MEASURED_FIELDS = Object.values(FIELDS);
export type Measured = Pick<NoteDocument, (typeof MEASURED_FIELDS)[number]>;

/** Histograms are of the best notes when there are more: as many as the engine gives at once. */
export const MOST_MEASURED = 1000;

/** Both ends included; null leaves one open. */
export interface Ends {
  readonly min: number | null;
  readonly max: number | null;
}
export type ChosenRanges = Partial<Record<FindRange, Ends>>;

const endOf = (text: string | undefined): number | null =>
  text === undefined || text === '' ? null : Number(text);

/** The ranges a reader has set; the query's schema has seen to their form. */
export function chosenRanges(query: Pick<FindQuery, FindRange>): ChosenRanges {
  const chosen: ChosenRanges = {};
  for (const range of FIND_RANGES) {
    const [min, max] = query[range]?.split('..') ?? [];
    if (min !== undefined) chosen[range] = { min: endOf(min), max: endOf(max) };
  }
  return chosen;
}

/** Two filters in the engine's language that must both hold; an empty one filters nothing. */
export function bothTexts(first: string, second: string): string {
  return [first, second].filter((text) => text !== '').join(' AND ');
}

/**
 * The ranges in the engine's language. Both ends in one "TO": a note with several stalls must have
 * one that lies between them.
 */
export function rangesText(ranges: ChosenRanges): string {
  return FIND_RANGES.flatMap((range): string[] => {
    const { min, max } = ranges[range] ?? { min: null, max: null };
    const field = FIELDS[range];
    if (min !== null && max !== null) return [`${field} ${String(min)} TO ${String(max)}`];
    if (min !== null) return [`${field} >= ${String(min)}`];
    return max === null ? [] : [`${field} <= ${String(max)}`];
  }).join(' AND ');
}

function valuesOf(note: Partial<Measured>, range: FindRange): readonly number[] {
  const value = note[FIELDS[range]] ?? null;
  return value === null ? [] : typeof value === 'number' ? [value] : value;
}

function lies(note: Partial<Measured>, range: FindRange, { min, max }: Ends): boolean {
  return valuesOf(note, range).some(
    (value) => value >= (min ?? -Infinity) && value <= (max ?? Infinity),
  );
}

/** The bars of a histogram are at most so many. */
const MOST_BARS = 16;
const STEPS = [1, 2, 5, 10, 20, 25, 50, 100, 200, 500, 1000];

/** Bars of a round width over all the values; null without any. */
function histogramOf(range: FindRange, values: readonly number[]): Histogram | null {
  if (values.length === 0) return null;
  const least = values.reduce((a, b) => Math.min(a, b));
  const most = values.reduce((a, b) => Math.max(a, b));
  const barsOf = (step: number) => Math.floor(most / step) - Math.floor(least / step) + 1;
  const step = STEPS.find((width) => barsOf(width) <= MOST_BARS) ?? Math.ceil(most / MOST_BARS);
  const from = Math.floor(least / step) * step;
  const counts = Array.from({ length: barsOf(step) }, () => 0);
  for (const value of values) {
    const bar = Math.floor((value - from) / step);
    counts[bar] = (counts[bar] ?? 0) + 1;
  }
  return { range, from, step, counts };
}

/** A histogram of each measure, over the notes within the ranges set on the other measures. */
export function histogramsOf(
  notes: readonly Partial<Measured>[],
  ranges: ChosenRanges,
): Histogram[] {
  const set = FIND_RANGES.flatMap((range) => {
    const ends = ranges[range];
    return ends ? [{ range, ends }] : [];
  });
  return FIND_RANGES.flatMap((range) => {
    const others = set.filter((one) => one.range !== range);
    const values = notes
      .filter((note) => others.every((other) => lies(note, other.range, other.ends)))
      .flatMap((note) => valuesOf(note, range));
    return histogramOf(range, values) ?? [];
  });
}
