import { z } from 'zod';
import { CHANGE_IDS } from '../vocabulary/changes.ts';
import { TROUBLE_IDS } from '../vocabulary/troubles.ts';
import { noteRowSchema } from './note-rows.ts';

export const MAX_QUESTION = 300;
export const FIND_SORTS = {
  best: 'Best first',
  newest: 'Newest first',
  nearest: 'Nearest temperature',
  improvement: 'Largest improvement',
} as const;
export type FindSort = keyof typeof FIND_SORTS;

/** Facet filters a reader may set beside the question; each may be given several times, comma-joined. */
export const FIND_FACETS = [
  'troubles',
  'forms',
  'glazes',
  'fuel',
  'kilnSize',
  'causes',
  'weather',
] as const;
export type FindFacet = (typeof FIND_FACETS)[number];
const commaList = z.string().max(400).optional();

/**
 * Measures a reader may narrow the notes by: levels of stalls and peak in °C, time to temperature and
 * hold in minutes, the mean rate through 550 to 600 °C in °C a minute. Stored units, whatever is shown.
 */
export const FIND_RANGES = ['stall', 'peak', 'climb', 'hold', 'crossing'] as const;
export type FindRange = (typeof FIND_RANGES)[number];
/** "690..740", both ends included; one of them may be left out. */
const range = z
  .string()
  .regex(/^(\d{1,5}(\.\d{1,2})?\.\.(\d{1,5}(\.\d{1,2})?)?|\.\.\d{1,5}(\.\d{1,2})?)$/)
  .optional();

export const findQuerySchema = z.strictObject({
  q: z.string().max(MAX_QUESTION).default(''),
  /** Keys of read-as parts that are switched off. */
  off: commaList,
  sort: z.enum(['best', 'newest', 'nearest', 'improvement']).default('best'),
  page: z.coerce.number().int().min(1).max(50).default(1),
  troubles: commaList,
  forms: commaList,
  glazes: commaList,
  fuel: commaList,
  kilnSize: commaList,
  causes: commaList,
  weather: commaList,
  stall: range,
  peak: range,
  climb: range,
  hold: range,
  crossing: range,
});
export type FindQuery = z.output<typeof findQuerySchema>;

/** A passage that matched: text in pieces, so that nobody ever joins markup. */
export const passageSchema = z.array(z.object({ text: z.string(), hit: z.boolean() }));

export const hitSchema = z.object({
  note: noteRowSchema,
  tier: z.enum(['close', 'same-trouble', 'by-words']),
  why: z.string(),
  passage: passageSchema.nullable(),
});
export type Hit = z.infer<typeof hitSchema>;

/** The read-as part, as `src/shared/question` makes it. */
export const partSchema = z.object({
  key: z.string(),
  kind: z.string(),
  label: z.string(),
  off: z.boolean(),
});

export const pooledAnswerSchema = z.object({
  trouble: z.enum(TROUBLE_IDS),
  startClass: z.enum(['cold', 'hot']),
  source: z.enum(['measured', 'named']),
  pairs: z.number(),
  rows: z.array(
    z.object({
      change: z.enum(CHANGE_IDS).nullable(),
      gone: z.number(),
      firings: z.number(),
      members: z.number(),
      verdict: z.enum(['better', 'worse', 'cannot-be-told', 'too-few', 'reference']),
      caution: z.string().nullable(),
    }),
  ),
});

/** How many of the notes asked about lie where: `counts[i]` from `from + i * step`, as wide as a step. */
export const histogramSchema = z.object({
  range: z.enum(FIND_RANGES),
  from: z.number(),
  step: z.number(),
  counts: z.array(z.number()),
});
export type Histogram = z.infer<typeof histogramSchema>;

export const findAnswerSchema = z.object({
  parts: z.array(partSchema),
  hits: z.array(hitSchema),
  total: z.number(),
  page: z.number(),
  pages: z.number(),
  facets: z.record(z.string(), z.array(z.object({ value: z.string(), count: z.number() }))),
  /** One for every measure that the notes have; the range set on a measure does not narrow its own. */
  histograms: z.array(histogramSchema).default([]),
  pooled: pooledAnswerSchema.nullable(),
  /** Nothing found: which part to loosen, and how many notes that would give. */
  loosen: z.array(z.object({ key: z.string(), label: z.string(), count: z.number() })),
  /** True when the engine was away and MariaDB answered. */
  plain: z.boolean(),
});
export type FindAnswer = z.infer<typeof findAnswerSchema>;

export const suggestQuerySchema = z.strictObject({ q: z.string().max(MAX_QUESTION).default('') });
export const suggestAnswerSchema = z.object({
  suggestions: z.array(
    z.object({
      kind: z.enum(['trouble', 'note']),
      text: z.string(),
      noteId: z.number().nullable(),
    }),
  ),
});
export type SuggestAnswer = z.infer<typeof suggestAnswerSchema>;
