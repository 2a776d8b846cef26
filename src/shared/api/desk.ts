import { z } from 'zod';
import { text } from '../note/field-types.ts';
import { NOTE_STATUS_IDS } from '../vocabulary/statuses.ts';
import { findingSchema } from '../firing/findings.ts';
import { checkSchema } from './findings.ts';
import { notePageSchema, remarkSchema } from './notes.ts';
import { stripPointsSchema } from './note-rows.ts';

/** A claim lasts this long and is renewed while the note is open. */
export const CLAIM_MINUTES = 20;

const personSchema = z.object({ id: z.number(), name: z.string() });

export const claimSchema = z.object({
  by: personSchema,
  until: z.iso.datetime(),
  mine: z.boolean(),
});

export const deskRowSchema = z.object({
  noteId: z.number(),
  revisionId: z.number(),
  title: z.string(),
  author: personSchema.nullable(),
  kilnName: z.string(),
  handedInAt: z.iso.datetime(),
  firstRevision: z.boolean(),
  strip: stripPointsSchema.nullable(),
  stripWords: z.string(),
  answeredChecks: z.number(),
  unsafeWords: z.number(),
  claim: claimSchema.nullable(),
  own: z.boolean(),
});
export const deskQueueSchema = z.object({ waiting: z.array(deskRowSchema) });
export type DeskQueue = z.infer<typeof deskQueueSchema>;

export const DESK_CHECKLIST = {
  complete: 'A reader could follow what was set up, done and got.',
  consistent: 'The fields, the record and the story agree, or the author says why not.',
  kind: 'It is kind to everyone named or meant.',
  safe: 'Nothing in it leads a reader into danger without a caution.',
  theirs: 'Words and pictures look like the author’s own.',
} as const;
export type DeskQuestion = keyof typeof DESK_CHECKLIST;
export const DESK_QUESTIONS = Object.keys(DESK_CHECKLIST) as [DeskQuestion, ...DeskQuestion[]];

/** A note at the desk: the revision handed in, as a page, with everything the decision needs. */
export const deskNoteSchema = z.object({
  page: notePageSchema,
  revisionId: z.number(),
  status: z.enum(NOTE_STATUS_IDS),
  handedInAt: z.iso.datetime(),
  claim: claimSchema.nullable(),
  checks: z.array(checkSchema),
  findings: z.array(findingSchema),
  /** What differs from the last published revision, as label, before and after; null the first time. */
  differences: z
    .array(
      z.object({ pointer: z.string(), label: z.string(), before: z.string(), after: z.string() }),
    )
    .nullable(),
  storyBefore: z.string().nullable(),
  unsafe: z.array(z.object({ passage: z.string(), reason: z.string() })),
  remarks: z.array(remarkSchema),
  earlierDecisions: z.array(
    z.object({
      act: z.string(),
      reason: z.string(),
      by: personSchema.nullable(),
      at: z.iso.datetime(),
    }),
  ),
  abilities: z.object({ decide: z.boolean(), remark: z.boolean() }),
});
export type DeskNote = z.infer<typeof deskNoteSchema>;

export const remarkBodySchema = z.strictObject({
  pointer: z.string().max(120),
  text: text(1000).refine((value) => value.trim() !== '', 'Write the remark first.'),
});
export const decisionBodySchema = z
  .strictObject({
    decision: z.enum(['publish', 'send-back', 'decline']),
    /** The revision that was read: a decision on another one is refused (409). */
    revisionId: z.number().int().positive(),
    reason: text(2000),
    /** What was asked and found so. To publish, every question must have been. */
    checklist: z.array(z.enum(DESK_QUESTIONS)).max(DESK_QUESTIONS.length),
  })
  .refine(
    ({ decision, checklist }) =>
      decision !== 'publish' || DESK_QUESTIONS.every((question) => checklist.includes(question)),
    { path: ['checklist'], message: 'Cross every question of the checklist to publish.' },
  );
export const takeDownBodySchema = z.strictObject({
  reason: text(2000).refine((value) => value.trim() !== '', 'Say why.'),
});
