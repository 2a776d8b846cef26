import { z } from 'zod';
import { CHANGE_IDS } from '../vocabulary/changes.ts';
import { TROUBLE_IDS } from '../vocabulary/troubles.ts';
import { noteRowSchema } from './note-rows.ts';

export const MAX_QUESTION = 300;
export const FIND_SORTS = {
  best: 'Best first',
  newest: 'Newest first',
  nearest: 'Nearest temperature',
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

export const findQuerySchema = z.strictObject({
  q: z.string().max(MAX_QUESTION).default(''),
  /** Keys of read-as parts that are switched off. */
  off: commaList,
  sort: z.enum(['best', 'newest', 'nearest']).default('best'),
  page: z.coerce.number().int().min(1).max(50).default(1),
  troubles: commaList,
  forms: commaList,
  glazes: commaList,
  fuel: commaList,
  kilnSize: commaList,
  causes: commaList,
  weather: commaList,
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

export const findAnswerSchema = z.object({
  parts: z.array(partSchema),
  hits: z.array(hitSchema),
  total: z.number(),
  page: z.number(),
  pages: z.number(),
  facets: z.record(z.string(), z.array(z.object({ value: z.string(), count: z.number() }))),
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
