import { z } from 'zod';
import { TROUBLE_IDS } from '../vocabulary/troubles.ts';
import { CHANGE_IDS } from '../vocabulary/changes.ts';

/** A finding as stored with a revision: plain data; its sentence is made by `findingText`. */
export const findingSchema = z.object({
  code: z.string(),
  trouble: z.enum(TROUBLE_IDS).nullable(),
  fromMinute: z.number().nullable(),
  toMinute: z.number().nullable(),
  numbers: z.record(z.string(), z.number()),
  words: z.record(z.string(), z.string()).optional(),
});

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
