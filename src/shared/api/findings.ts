import { z } from 'zod';
import { pieceSchema } from '../note/pieces.ts';
import { idsOf } from '../vocabulary/terms.ts';
import { CRACK_PLACES, FORM_IDS } from '../vocabulary/ware.ts';
import { CHANGE_IDS } from '../vocabulary/changes.ts';

/** A check as stored with a revision, with the author's answer where one was given. */
export const checkSchema = z.object({
  code: z.string(),
  kind: z.enum(['must-mend', 'look-again']),
  pointer: z.string(),
  text: z.string(),
  forModerators: z.boolean().optional(),
  offer: z
    .object({
      pointer: z.string(),
      value: z.union([
        z.number(),
        z.string(),
        z.boolean(),
        z.null(),
        z.array(z.string()).readonly(),
      ]),
      label: z.string(),
    })
    .optional(),
  answer: z.string().optional(),
});
export const proposedChangeSchema = z.object({ change: z.enum(CHANGE_IDS), text: z.string() });

/** What the sentences "in short" are made of, so that each reader gets them in their own units. */
export const noteSummarySchema = z.object({
  peakCelsius: z.number().nullable(),
  targetCelsius: z.number().nullable(),
  reached: z.boolean().nullable(),
  aimCelsius: z.number().nullable(),
  timeToTemperatureMinutes: z.number().nullable(),
  holdMinutes: z.number().nullable(),
  levels: z
    .array(
      z.object({
        levelCelsius: z.number(),
        atMinute: z.number().nullable(),
        minutes: z.number(),
      }),
    )
    .readonly(),
  sags: z.array(z.object({ topCelsius: z.number(), dropCelsius: z.number() })).readonly(),
  pieces: z
    .array(
      z.object({
        form: z.enum(FORM_IDS).nullable(),
        count: z.number(),
        whole: z.boolean().nullable(),
        melt: pieceSchema.shape.melt.unwrap(),
        cracked: z.boolean(),
        crackPlace: z.enum(idsOf(CRACK_PLACES)).nullable(),
      }),
    )
    .readonly(),
  changes: z.array(z.enum(CHANGE_IDS)).readonly().nullable(),
});
