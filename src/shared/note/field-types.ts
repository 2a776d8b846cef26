import { z } from 'zod';

/**
 * The building blocks of a note's fields.
 *
 * A draft must never lose work, so it stores what was typed even when it is out of range: ranges
 * are declared here as metadata and asked about by the checks (`must mend`), not enforced by
 * parsing. The form reads its hints from the same metadata.
 */
export interface MeasureMeta {
  readonly range: readonly [number, number];
  /** Canonical stored unit, e.g. `mm`, `°C`; '' for plain numbers. */
  readonly unit: string;
}

/** No number of this domain comes near this; it only keeps the stored document sane. */
const SANE = 1e7;

/** A number in its canonical unit with its asked-for range, or blank (null). Zero is not blank. */
export function measure(low: number, high: number, unit: string) {
  return z
    .number()
    .min(-SANE)
    .max(SANE)
    .nullable()
    .default(null)
    .meta({ range: [low, high], unit } satisfies MeasureMeta);
}

/** A whole number with its asked-for range, or blank. */
export function count(low: number, high: number) {
  return z
    .number()
    .int()
    .min(-SANE)
    .max(SANE)
    .nullable()
    .default(null)
    .meta({ range: [low, high], unit: '' } satisfies MeasureMeta);
}

/** One of a closed list, or not said. */
export function choice<Id extends string>(terms: Readonly<Record<Id, string>>) {
  return z
    .enum(Object.keys(terms) as [Id, ...Id[]])
    .nullable()
    .default(null);
}

/** Yes, no, or not said. */
export const yesNo = z.boolean().nullable().default(null);

// Control characters other than tab and line feed, and lone surrogates, have no place in text.
const hasForbidden = (text: string): boolean => {
  for (const character of text) {
    const code = character.codePointAt(0) ?? 0;
    if ((code < 32 && code !== 9 && code !== 10) || code === 127) return true;
    if (code >= 0xd800 && code <= 0xdfff) return true;
  }
  return false;
};

/** Text of at most `max` code points, NFC, without control characters; '' when blank. */
export function text(max: number) {
  return z
    .string()
    .max(max * 2)
    .refine((value) => !hasForbidden(value), 'This text has a character that cannot be kept.')
    .transform((value) => value.normalize('NFC'))
    .refine((value) => [...value].length <= max, `At most ${String(max)} characters.`);
}

/** Optional text: absent is ''. */
export const optionalText = (max: number) => text(max).default('');

/** A calendar day, `YYYY-MM-DD`, or blank. */
export const day = z.iso.date().nullable().default(null);

/** A wall-clock time, `HH:MM`, or blank. */
export const clock = z
  .string()
  .regex(/^([01]\d|2[0-3]):[0-5]\d$/)
  .nullable()
  .default(null);
