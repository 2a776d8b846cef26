import { z } from 'zod';
import { CHANGE_IDS } from '../vocabulary/changes.ts';
import { TROUBLE_IDS } from '../vocabulary/troubles.ts';
import { noteRowSchema } from './note-rows.ts';

const interval = z.object({ low: z.number(), high: z.number() });

/** One change tried next (or null: no change named), within one trouble and start class. */
export const whatHelpedRowSchema = z.object({
  change: z.enum(CHANGE_IDS).nullable(),
  firings: z.number(),
  members: z.number(),
  gone: z.number(),
  /** gone ÷ firings with its 95 % interval (Wilson, effective n). */
  share: z.number().nullable(),
  interval: interval.nullable(),
  /** Difference from the follow-ons with no change named, at level 1 − 0.05/m. */
  difference: z.object({ share: z.number(), low: z.number(), high: z.number() }).nullable(),
  verdict: z.enum(['better', 'worse', 'cannot-be-told', 'too-few', 'reference']),
  alone: z.object({ gone: z.number(), firings: z.number() }),
  /** The share if every missing follow-on had failed. */
  shareIfMissingFailed: z.number().nullable(),
  caution: z.string().nullable(),
  noteIds: z.array(z.number()),
});
export type WhatHelpedRow = z.infer<typeof whatHelpedRowSchema>;

export const whatHelpedSchema = z.object({
  trouble: z.enum(TROUBLE_IDS),
  tables: z.array(
    z.object({
      startClass: z.enum(['cold', 'hot']),
      /** Read off records, or named by authors: never pooled. */
      source: z.enum(['measured', 'named']),
      ranked: z.array(whatHelpedRowSchema),
      tooFew: z.array(whatHelpedRowSchema),
      pairs: z.number(),
      leftOut: z.array(z.object({ reason: z.string(), count: z.number() })),
    }),
  ),
  duringTheFiring: z.array(
    z.object({
      change: z.string(),
      startClass: z.enum(['cold', 'hot']),
      firings: z.number(),
      members: z.number(),
      wentOn: z.number(),
      share: z.number().nullable(),
      interval: interval.nullable(),
      caution: z.string().nullable(),
      noteIds: z.array(z.number()),
    }),
  ),
  /** Published notes whose finding of this trouble is disputed: in none of the figures. */
  disputed: z.number(),
  notes: z.record(z.string(), z.object({ id: z.number(), slug: z.string(), title: z.string() })),
});
export type WhatHelped = z.infer<typeof whatHelpedSchema>;

export const troubleSharesSchema = z.object({
  notes: z.number(),
  members: z.number(),
  /** `disputed`: notes whose finding of it is disputed, which are not among `notes`. */
  troubles: z.array(
    z.object({ trouble: z.enum(TROUBLE_IDS), notes: z.number(), disputed: z.number() }),
  ),
});
export type TroubleShares = z.infer<typeof troubleSharesSchema>;

export const frontSchema = z.object({
  shares: troubleSharesSchema,
  newest: z.array(noteRowSchema),
  /** Pooled figures in one sentence each, made from counts; may be empty. */
  sentences: z.array(z.object({ text: z.string(), trouble: z.enum(TROUBLE_IDS).nullable() })),
});
export type FrontData = z.infer<typeof frontSchema>;
