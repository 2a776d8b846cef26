import type { Cause, Trouble } from '../vocabulary/troubles.ts';
import { CAUSES } from '../vocabulary/troubles.ts';
import { CONE_TOLERANCE, coneTargetCelsius } from './cone-targets.ts';
import type { QuestionReading } from './reading-types.ts';
import { typedTexts } from './typed-texts.ts';

/** Fields of an indexed note that a request may filter by. */
export type FilterField =
  | 'troubles'
  | 'forms'
  | 'glazes'
  | 'causes'
  | 'changes'
  | 'nextChanges'
  | 'fuel'
  | 'kilnSize'
  | 'wind'
  | 'weather'
  | 'stallC'
  | 'sagC'
  | 'peakC'
  | 'eventC'
  | 'aimC'
  | 'minutesToPeak'
  | 'holdMinutes'
  | 'widestCm'
  | 'noteId';

/** A filter in no engine's language; `search/filters.ts` puts it into the engine's. */
export type Filter =
  | { readonly kind: 'all'; readonly of: readonly Filter[] }
  | { readonly kind: 'any'; readonly of: readonly Filter[] }
  | { readonly kind: 'in'; readonly field: FilterField; readonly values: readonly string[] }
  | { readonly kind: 'not-in'; readonly field: FilterField; readonly values: readonly string[] }
  /** Both ends included; null leaves an end open. */
  | {
      readonly kind: 'between';
      readonly field: FilterField;
      readonly min: number | null;
      readonly max: number | null;
    }
  | { readonly kind: 'empty'; readonly field: FilterField };

export type Tier = 'close' | 'same-trouble' | 'by-words';
export type WordsStrategy = 'last' | 'frequency' | 'all';

export interface TierRequest {
  readonly tier: Tier;
  /** Null filters nothing. */
  readonly filter: Filter | null;
  /** Notes that also pass this come first within the tier. */
  readonly first?: Filter;
  /**
   * Searched one after the other under the same filter, results joined without repeats. The engine
   * insists on the first word of a text, so a last empty text lists what the filter alone allows.
   */
  readonly texts: readonly string[];
  readonly strategy: WordsStrategy;
}

/** The three queries of one search; null where the question gives nothing to ask. */
export interface Tiers {
  readonly close: TierRequest | null;
  readonly sameTrouble: TierRequest | null;
  readonly byWords: TierRequest | null;
}

/** Facets are counted over the second tier: everything with the trouble asked about. */
export const TIER_FACETS = [
  'troubles',
  'forms',
  'glazes',
  'causes',
  'fuel',
  'kilnSize',
  'weather',
] as const;

/** A piece of about the size asked for: its widest span within this share of it. */
const SIZE_SHARE = 0.3;
/** A plain "in 30 minutes" allows this share more or less. */
const MINUTES_SHARE = 0.2;

/** Where in a note the temperature of each trouble stands. Troubles not listed: any of the three. */
const TEMPERATURE_FIELDS: Readonly<Partial<Record<Trouble, readonly FilterField[]>>> = {
  stall: ['stallC', 'eventC'],
  sag: ['sagC', 'eventC'],
  'slow-climb': ['eventC', 'stallC', 'peakC'],
  overshoot: ['peakC'],
  'dull-glaze': ['peakC', 'eventC'],
  'weak-reduction': ['peakC', 'eventC'],
  'stuck-to-shelf': ['peakC', 'eventC'],
};
const ANY_TEMPERATURE: readonly FilterField[] = ['peakC', 'eventC', 'stallC', 'sagC'];

function all(filters: readonly (Filter | null)[]): Filter | null {
  const of = filters.filter((filter) => filter !== null);
  return of.length > 1 ? { kind: 'all', of } : (of[0] ?? null);
}

function any(filters: readonly Filter[]): Filter | null {
  return filters.length > 1 ? { kind: 'any', of: filters } : (filters[0] ?? null);
}

/** °C from and to; a centre becomes its window, a stated range is taken as it stands. */
export function windowOfReading(
  reading: QuestionReading,
): { readonly min: number | null; readonly max: number | null } | null {
  const { tempC, toleranceC, tempMinC, tempMaxC } = reading;
  if (tempC !== null) return { min: tempC - (toleranceC ?? 0), max: tempC + (toleranceC ?? 0) };
  if (tempMinC !== null || tempMaxC !== null) return { min: tempMinC, max: tempMaxC };
  return null;
}

/**
 * A stall is sought at its own level, never at the peak of a firing that stalled lower down; only a
 * note without a known level may match by its peak. A fall matches by its top.
 */
function temperatureFilter(reading: QuestionReading): Filter | null {
  const window = windowOfReading(reading);
  if (window === null) return null;
  const named = reading.trouble.flatMap(
    (trouble) => TEMPERATURE_FIELDS[trouble] ?? ANY_TEMPERATURE,
  );
  const fields = [...new Set(named.length > 0 ? named : ANY_TEMPERATURE)];
  const within: Filter[] = fields.map((field) => ({ kind: 'between', field, ...window }));
  const levels: FilterField[] = fields.filter((field) => field === 'stallC' || field === 'sagC');
  if (levels.length > 0 && !fields.includes('peakC')) {
    const unknown = levels.map((field): Filter => ({ kind: 'empty', field }));
    const byPeak = all([...unknown, { kind: 'between', field: 'peakC', ...window }]);
    if (byPeak !== null) within.push(byPeak);
  }
  return any(within);
}

function coneFilter(cone: string | null): Filter | null {
  const target = cone === null ? null : coneTargetCelsius(cone);
  if (target === null) return null;
  const window = { min: target - CONE_TOLERANCE, max: target + CONE_TOLERANCE };
  return any([
    { kind: 'between', field: 'aimC', ...window },
    { kind: 'between', field: 'peakC', ...window },
  ]);
}

function minutesFilter(reading: QuestionReading): Filter | null {
  const { minutes, minutesOp } = reading;
  const part = reading.parts.find(({ kind }) => kind === 'minutes');
  const of = part?.kind === 'minutes' ? part.value.of : 'climb';
  if (minutes === null || of === 'other') return null;
  const field: FilterField = of === 'hold' ? 'holdMinutes' : 'minutesToPeak';
  if (minutesOp === '>') return { kind: 'between', field, min: minutes, max: null };
  if (minutesOp === '<') return { kind: 'between', field, min: null, max: minutes };
  // A time said in passing ("stalled after 40 minutes") is not the length of the climb.
  if (of === 'climb' && reading.trouble.some((trouble) => trouble !== 'slow-climb')) return null;
  return {
    kind: 'between',
    field,
    min: minutes * (1 - MINUTES_SHARE),
    max: minutes * (1 + MINUTES_SHARE),
  };
}

/** A note shows a cause if its author suspected it, or if its weather was of that kind. */
function causesFilter(causes: readonly Cause[]): Filter | null {
  if (causes.length === 0) return null;
  const shown: Filter[] = [{ kind: 'in', field: 'causes', values: causes }];
  if (causes.includes('wind'))
    shown.push({ kind: 'in', field: 'wind', values: ['gusty', 'strong'] });
  if (causes.includes('rain')) shown.push({ kind: 'in', field: 'weather', values: ['rain'] });
  return any(shown);
}

function inField(field: FilterField, values: readonly (string | null)[]): Filter | null {
  const known = values.filter((value) => value !== null);
  return known.length === 0 ? null : { kind: 'in', field, values: known };
}

/** First with what was typed, then with the words alone, then without any. */
function textsOf(words: string, typed = ''): string[] {
  const both = [typed, words].filter((text) => text !== '').join(' ');
  return [...new Set([both, words, ''])];
}

function causeWords(causes: readonly Cause[]): string {
  return causes.map((cause) => CAUSES[cause].toLowerCase()).join(' ');
}

/** Heated so differently from gas that their notes stand apart. */
const SET_APART: ReadonlySet<string | null> = new Set(['electric', 'wood']);
/**
 * What makes a note the better answer beyond its filter: with a trouble, that the change asked about
 * was made there or next; without one, that the firing went well. A glaze that stayed dull because
 * the firing stalled is a matter of the stall.
 */
function firstFilter({ trouble, changes, causes }: QuestionReading): Filter | null {
  if (trouble.length === 0) {
    return causes.length === 0 ? { kind: 'empty', field: 'troubles' } : null;
  }
  if (changes.length > 0) {
    const of = (['changes', 'nextChanges'] as const).map((field): Filter => ({
      kind: 'in',
      field,
      values: changes,
    }));
    return { kind: 'any', of };
  }
  return trouble.includes('dull-glaze') && !trouble.includes('stall')
    ? { kind: 'not-in', field: 'troubles', values: ['stall'] }
    : null;
}

/**
 * The three queries of a search, shown in this order without repeats.
 *
 * close: the trouble at the temperature, with form, glaze, size and time as asked. Causes select
 * here only where no temperature does, for an author may have suspected something else.
 * same trouble: the trouble (and form) alone; facets are counted over it. A question that asks for a
 * faster firing without naming a trouble finds the cures of slow climbs here.
 * by words: the whole question as text, no filter.
 */
export function tiersFor(reading: QuestionReading): Tiers {
  const { trouble, notTrouble, form, glaze, sizeCm, causes } = reading;
  const without: Filter | null =
    notTrouble.length === 0 ? null : { kind: 'not-in', field: 'troubles', values: notTrouble };
  const temperature = temperatureFilter(reading);
  const size: Filter | null =
    sizeCm === null
      ? null
      : {
          kind: 'between',
          field: 'widestCm',
          min: Math.round(sizeCm * (1 - SIZE_SHARE) * 10) / 10,
          max: Math.round(sizeCm * (1 + SIZE_SHARE) * 10) / 10,
        };
  const { changes } = reading;
  // How something is done, and not what went wrong: the change itself is what is sought.
  const wantsFaster = trouble.length === 0 && reading.minutesOp === '<';
  const onlyChanges = trouble.length === 0 && changes.length > 0 && !wantsFaster;
  const closely = all([
    onlyChanges ? inField('changes', changes) : null,
    SET_APART.has(reading.fuel) ? inField('fuel', [reading.fuel]) : null,
    inField('troubles', trouble),
    without,
    temperature,
    coneFilter(reading.cone),
    inField('forms', [form]),
    inField('glazes', [glaze]),
    size,
    minutesFilter(reading),
    temperature === null ? causesFilter(causes) : null,
  ]);
  const typed = typedTexts(reading);
  const first = firstFilter(reading);
  const sameTrouble = wantsFaster ? (['slow-climb'] as const) : trouble;
  const broadly =
    sameTrouble.length === 0
      ? onlyChanges
        ? inField('nextChanges', changes)
        : null
      : all([inField('troubles', sameTrouble), without, inField('forms', [form])]);
  const broadWords = [reading.words, causeWords(causes)].filter((text) => text !== '').join(' ');
  return {
    close:
      closely === null
        ? null
        : {
            tier: 'close',
            filter: closely,
            ...(first === null ? {} : { first }),
            texts: textsOf(reading.words, typed),
            strategy: 'last',
          },
    sameTrouble:
      broadly === null
        ? null
        : {
            tier: 'same-trouble',
            filter: broadly,
            ...(first === null || onlyChanges ? {} : { first }),
            texts: textsOf(broadWords, typed),
            strategy: 'last',
          },
    byWords:
      reading.allWords === ''
        ? null
        : { tier: 'by-words', filter: null, texts: [reading.allWords], strategy: 'frequency' },
  };
}
