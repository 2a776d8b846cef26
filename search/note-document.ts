import { z } from 'zod';
import { CHANGE_IDS } from '#shared/vocabulary/changes.ts';
import { FUEL_IDS, WEATHERS, WINDS } from '#shared/vocabulary/kiln.ts';
import { idsOf } from '#shared/vocabulary/terms.ts';
import { CAUSE_IDS, TROUBLE_IDS } from '#shared/vocabulary/troubles.ts';
import { FORM_FAMILY_IDS } from '#shared/vocabulary/ware.ts';
import { GLAZES_ASKED } from '#shared/question/reading-types.ts';

/** Inside volume from which a kiln is called medium, then large; litres. */
const MEDIUM_FROM_LITRES = 40;
const LARGE_FROM_LITRES = 100;
export const KILN_SIZES = {
  small: 'Under 40 L',
  medium: '40 to 100 L',
  large: '100 L and more',
} as const;
export type KilnSize = keyof typeof KILN_SIZES;

export function kilnSizeOf(litres: number | null): KilnSize | null {
  if (litres === null) return null;
  if (litres < MEDIUM_FROM_LITRES) return 'small';
  return litres < LARGE_FROM_LITRES ? 'medium' : 'large';
}

/** Index names: the one that is searched, and the one a rebuild fills before the two are swapped. */
export const NOTES_INDEX = 'notes';
export const NOTES_REBUILD_INDEX = 'notes_new';

const celsius = z.number().min(-50).max(1500);
const celsiusList = z.array(celsius);

/**
 * A published note as the engine holds it. Only what a search needs; a page is built from the
 * database. Arrays lose the pairing of their elements (the second stall's level says nothing of the
 * first one's length), so no filter may join two arrays as if they were one thing.
 */
export const noteDocumentSchema = z.strictObject({
  /** The note's id as text: the engine's key. */
  id: z.string().regex(/^[A-Za-z0-9_-]{1,64}$/),
  noteId: z.number().int().positive(),

  title: z.string(),
  /** One paragraph that stands above the story. */
  inShort: z.string(),
  /** The story's plain text, degrees written "700 °C". */
  story: z.string(),
  /** What was remarked on single pieces. */
  pieceRemarks: z.string(),

  /** All troubles, measured or named by the author, ids. */
  troubles: z.array(z.enum(TROUBLE_IDS)),
  measuredTroubles: z.array(z.enum(TROUBLE_IDS)),
  namedTroubles: z.array(z.enum(TROUBLE_IDS)),
  /** The troubles and causes in words, so that a search by words meets them. */
  troubleWords: z.array(z.string()),
  causeWords: z.array(z.string()),
  causes: z.array(z.enum(CAUSE_IDS)),

  /** Changes this note names, against the earlier firing. */
  changes: z.array(z.enum(CHANGE_IDS)),
  /** Changes of the published follow-on: what was tried next. */
  nextChanges: z.array(z.enum(CHANGE_IDS)),
  /** 3 gone in the follow-on, 2 a change tried and open, 1 a record and no follow-on, 0 none. */
  outcome: z.union([z.literal(0), z.literal(1), z.literal(2), z.literal(3)]),

  forms: z.array(z.enum(FORM_FAMILY_IDS)),
  /** Clay bodies as the author named them. */
  clays: z.array(z.string()),
  /** Glaze families, and the routes people speak of as glazes. */
  glazes: z.array(z.enum(idsOf(GLAZES_ASKED))),
  /** Glaze names as the author wrote them. */
  glazeNames: z.array(z.string()),
  fuel: z.enum(FUEL_IDS).nullable(),
  kilnSize: z.enum(idsOf(KILN_SIZES)).nullable(),

  /** Levels of the stalls: the server's findings first, the author's words where there are none. */
  stallC: celsiusList,
  /** Tops from which it fell. */
  sagC: celsiusList,
  /** Temperatures at which something else happened: slow stretches, cracks, what the author says. */
  eventC: celsiusList,
  peakC: celsius.nullable(),
  aimC: celsius.nullable(),
  minutesToPeak: z.number().nonnegative().nullable(),
  holdMinutes: z.number().nonnegative().nullable(),
  /** Mean rate through 550 to 600 °C by the pyrometer. */
  crossingRatePerMin: z.number().nullable(),
  cracks: z.number().int().nonnegative(),
  widestCm: z.number().nonnegative().nullable(),
  wind: z.enum(idsOf(WINDS)).nullable(),
  weather: z.enum(idsOf(WEATHERS)).nullable(),

  authorName: z.string(),
  kilnName: z.string(),
  /** Days since 1970-01-01. */
  firedOn: z.number().int(),
  /** Seconds since 1970-01-01. */
  publishedAt: z.number().int(),
});
export type NoteDocument = z.infer<typeof noteDocumentSchema>;
