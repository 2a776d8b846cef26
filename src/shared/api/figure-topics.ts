import { z } from 'zod';
import {
  FIGURE_DIMENSION_IDS,
  FIGURE_QUANTITIES,
  FIGURE_TOPIC_IDS,
  type FigureTopic,
} from '../vocabulary/figures.ts';
import { FORM_FAMILY_IDS } from '../vocabulary/ware.ts';

const id = z.coerce.number().int().positive().max(Number.MAX_SAFE_INTEGER);
const groupId = z.string().min(1).max(80);

/** What the address of a plot asks for; everything may be left out. */
export const topicQuerySchema = z.object({
  by: z.enum(FIGURE_DIMENSION_IDS).optional(),
  kiln: id.optional(),
  ware: z.enum(FORM_FAMILY_IDS).optional(),
  /** The two groups to hold against each other. */
  a: groupId.optional(),
  b: groupId.optional(),
});
export type TopicQuery = z.output<typeof topicQuerySchema>;

const interval = z.object({ low: z.number(), high: z.number() });

/** Every value, ascending; where they are too many to draw, how many fall into equal bins. */
export const spreadSchema = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('points'), values: z.array(z.number()) }),
  z.object({
    kind: z.literal('bins'),
    low: z.number(),
    high: z.number(),
    counts: z.array(z.number()),
  }),
]);
export type Spread = z.infer<typeof spreadSchema>;

export const figureGroupSchema = z.object({
  id: z.string(),
  /** Pieces of a share, firings of a number, stalls of their level. */
  cases: z.number(),
  firings: z.number(),
  members: z.number(),
  /** Five firings and three members or more: less is too few to say. */
  enough: z.boolean(),
  share: z
    .object({
      count: z.number(),
      of: z.number(),
      /** How many the pieces count as, being clustered by member. */
      effective: z.number(),
      share: z.number().nullable(),
      /** 95 %, Wilson, of the effective number. */
      interval: interval.nullable(),
      /** Each member's own pieces, in no order that tells whose. */
      byMember: z.array(z.object({ count: z.number(), of: z.number() })),
    })
    .nullable(),
  numbers: z
    .object({
      /** Quartiles of type 7; null when too few to say. */
      q1: z.number().nullable(),
      median: z.number().nullable(),
      q3: z.number().nullable(),
      /** 95 % of the median, bootstrap by member; null under eight members. */
      interval: interval.nullable(),
      spread: spreadSchema,
    })
    .nullable(),
});
export type FigureGroup = z.infer<typeof figureGroupSchema>;

/** Group `a` minus group `b`, Newcombe's interval at 95 % of the effective numbers. */
export const figureComparisonSchema = z.object({
  a: z.string(),
  b: z.string(),
  /** Null when either is too few to say. */
  difference: z.object({ share: z.number(), low: z.number(), high: z.number() }).nullable(),
});
export type FigureComparison = z.infer<typeof figureComparisonSchema>;

export const topicFiguresSchema = z.object({
  topic: z.enum(FIGURE_TOPIC_IDS),
  by: z.enum(FIGURE_DIMENSION_IDS),
  kiln: z.number().nullable(),
  ware: z.enum(FORM_FAMILY_IDS).nullable(),
  /** In the order of the plot. A range begins with `from` and ends before `to`. */
  groups: z.array(
    z.object({
      id: z.string(),
      label: z.string(),
      range: z.object({ from: z.number().nullable(), to: z.number().nullable() }).nullable(),
    }),
  ),
  /** Of the ranges of the groups. */
  groupQuantity: z.enum(FIGURE_QUANTITIES).nullable(),
  /** Of the numbers; null for shares. */
  quantity: z.enum(FIGURE_QUANTITIES).nullable(),
  /** Cold and hot starts, never pooled. */
  tables: z.array(
    z.object({
      startClass: z.enum(['cold', 'hot']),
      cases: z.number(),
      firings: z.number(),
      members: z.number(),
      groups: z.array(figureGroupSchema),
      /** For shares by a number: that number of each piece, those counted and the others. */
      along: z.object({ yes: spreadSchema, no: spreadSchema }).nullable(),
      comparison: figureComparisonSchema.nullable(),
    }),
  ),
  /** The least and the greatest of the numbers drawn. */
  domain: z.object({ low: z.number(), high: z.number() }).nullable(),
  leftOut: z.array(z.object({ reason: z.string(), count: z.number() })),
  /** Kilns with published firings, most first. */
  kilns: z.array(z.object({ id: z.number(), name: z.string(), firings: z.number() })),
});
export type TopicFigures = z.infer<typeof topicFiguresSchema>;

const searchText = (query: TopicQuery): string => {
  const text = Object.entries(query)
    .flatMap(([name, value]) =>
      value === undefined ? [] : [`${name}=${encodeURIComponent(String(value))}`],
    )
    .join('&');
  return text === '' ? '' : `?${text}`;
};

export const topicFiguresUrl = (topic: FigureTopic, query: TopicQuery): string =>
  `/api/figures/${topic}${searchText(query)}`;

/** The rows behind a plot as CSV. */
export const topicRowsUrl = (topic: FigureTopic, query: TopicQuery): string =>
  `/api/figures/${topic}/rows.csv${searchText(query)}`;
