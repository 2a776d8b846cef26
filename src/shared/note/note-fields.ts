import { z } from 'zod';
import { CHANGE_IDS } from '../vocabulary/changes.ts';
import { START_CLASSES } from '../vocabulary/kiln.ts';
import { CAUSE_IDS, TROUBLE_IDS } from '../vocabulary/troubles.ts';
import { choice, clock, count, day, measure, optionalText } from './field-types.ts';
import { draftDisputeSchema, MAX_DISPUTES } from './finding-disputes.ts';
import { MAX_PIECES, pieceSchema, recipeSchema } from './pieces.ts';
import { planSchema, recordFieldsSchema } from './plan.ts';
import { setUpSchema } from './set-up.ts';
import { EMPTY_STORY, storySchema } from './story.ts';

export const whenSchema = z
  .strictObject({
    date: day,
    startTime: clock,
    /** IANA name of the kiln's time zone. */
    timeZone: optionalText(60),
    /** Firings of this kiln since the last one written up that nobody wrote up. */
    unreportedFirings: count(0, 200),
    startClass: choice(START_CLASSES),
    startCelsius: measure(-30, 1150, '°C'),
  })
  .prefault({});

export const resultSchema = z
  .strictObject({
    troubles: z.array(z.enum(TROUBLE_IDS)).max(TROUBLE_IDS.length).default([]),
    causes: z.array(z.enum(CAUSE_IDS)).max(CAUSE_IDS.length).default([]),
    surprised: optionalText(1000),
    nextTime: optionalText(1000),
  })
  .prefault({});

export const changeRowSchema = z.strictObject({
  change: z.enum(CHANGE_IDS),
  /** What it was for, in the author's words. */
  purpose: optionalText(200),
});

/** An answer to a *look again* check, by the check's code and the field it points at. */
export const checkAnswerSchema = z.strictObject({
  code: z.string().max(60),
  pointer: z.string().max(120),
  answer: optionalText(500),
});

/**
 * All that a note holds (one schema for browser and server). Everything has a blank form, so
 * `noteFieldsSchema.parse({})` is the empty note; what handing in requires is asked by the checks.
 */
export const noteFieldsSchema = z.strictObject({
  title: optionalText(120),
  kilnId: z.number().int().positive().nullable().default(null),
  when: whenSchema,
  setUp: setUpSchema,
  plan: planSchema,
  record: recordFieldsSchema,
  pieces: z.array(pieceSchema).max(MAX_PIECES).default([]),
  /** The shared reduction recipe; a piece may have its own. */
  reduction: recipeSchema.prefault({}),
  result: resultSchema,
  changes: z.array(changeRowSchema).max(20).default([]),
  /** Proposed from the differences, and answered "not on purpose". */
  changesNotMeant: z.array(z.enum(CHANGE_IDS)).max(CHANGE_IDS.length).default([]),
  /** The published note whose change this firing tried, if any. */
  triedNoteId: z.number().int().positive().nullable().default(null),
  story: storySchema.default(EMPTY_STORY),
  cautionsRead: z.boolean().default(false),
  checkAnswers: z.array(checkAnswerSchema).max(60).default([]),
  /** Findings the author disagrees with, each with a sentence. */
  findingDisputes: z.array(draftDisputeSchema).max(MAX_DISPUTES).default([]),
});
export type NoteFields = z.output<typeof noteFieldsSchema>;
export type NoteFieldsInput = z.input<typeof noteFieldsSchema>;

/** The blank note. */
export function emptyNoteFields(): NoteFields {
  return noteFieldsSchema.parse({});
}
