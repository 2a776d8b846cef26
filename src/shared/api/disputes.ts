import { z } from 'zod';
import { findingSchema } from '../firing/findings.ts';
import {
  DISPUTE_SENTENCE,
  DISPUTE_STATES,
  findingKeySchema,
  reasonSchema,
} from '../note/finding-disputes.ts';
import { text } from '../note/field-types.ts';

const personSchema = z.object({ id: z.number(), name: z.string() });

/** A disagreement as readers see it beside its finding, with the moderators' answer. */
export const findingDisputeSchema = findingKeySchema.extend({
  /** Null while the revision that makes it is not published. */
  id: z.number().nullable(),
  version: z.number(),
  sentence: z.string(),
  state: z.enum(DISPUTE_STATES),
  at: z.iso.datetime(),
  /** What a moderator said to it; the sentence may be blank where it is left out of the figures. */
  answer: z
    .object({ sentence: z.string(), by: personSchema.nullable(), at: z.iso.datetime() })
    .nullable(),
});
export type FindingDispute = z.infer<typeof findingDisputeSchema>;

/** An author disagrees with a finding of the own published note. */
export const disputeBodySchema = findingKeySchema.extend({ sentence: reasonSchema });

/** A moderator restores the finding to the figures, saying why, or leaves it out. */
export const disputeAnswerBodySchema = z.discriminatedUnion('decision', [
  z.strictObject({ decision: z.literal('restore'), sentence: reasonSchema }),
  z.strictObject({
    decision: z.literal('leave'),
    sentence: text(DISPUTE_SENTENCE.most).transform((value) => value.trim()),
  }),
]);
export type DisputeAnswerBody = z.output<typeof disputeAnswerBodySchema>;

/** The desk's list of disputed findings of published notes: the unanswered first. */
export const disputedFindingsSchema = z.object({
  disputes: z.array(
    z.object({
      note: z.object({ id: z.number(), slug: z.string(), title: z.string() }),
      author: personSchema.nullable(),
      finding: findingSchema,
      dispute: findingDisputeSchema.extend({ id: z.number() }),
      /** Nobody decides on a note of the own. */
      own: z.boolean(),
    }),
  ),
});
export type DisputedFindings = z.infer<typeof disputedFindingsSchema>;
