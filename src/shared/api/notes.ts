import { z } from 'zod';
import { noteFieldsSchema } from '../note/note-fields.ts';
import { kilnFieldsSchema } from '../note/kiln-fields.ts';
import { CHANGE_IDS } from '../vocabulary/changes.ts';
import { NOTE_STATUS_IDS } from '../vocabulary/statuses.ts';
import { findingSchema } from '../firing/findings.ts';
import { findingDisputeSchema } from './disputes.ts';
import { checkSchema, noteSummarySchema, proposedChangeSchema } from './findings.ts';
import { followOnSchema, noteRowSchema, stripPointsSchema } from './note-rows.ts';
import { pictureSchema } from './pictures.ts';
import { recordSchema } from './records.ts';

const personSchema = z.object({ id: z.number(), name: z.string() });

export const noteAbilitiesSchema = z.object({
  edit: z.boolean(),
  handIn: z.boolean(),
  takeBack: z.boolean(),
  revise: z.boolean(),
  remove: z.boolean(),
  claim: z.boolean(),
  takeDown: z.boolean(),
  /** May disagree with what is read off the published note. */
  dispute: z.boolean(),
  tryIt: z.boolean(),
});

/** The earlier or next firing of the same kiln, with what was changed between. */
export const neighbourSchema = z.object({
  noteId: z.number(),
  slug: z.string(),
  title: z.string(),
  firedOn: z.iso.date(),
  status: z.enum(NOTE_STATUS_IDS),
  strip: stripPointsSchema.nullable(),
  stripWords: z.string(),
  peakCelsius: z.number().nullable(),
  timeToTemperatureMinutes: z.number().nullable(),
  changes: z.array(z.enum(CHANGE_IDS)),
});
export type Neighbour = z.infer<typeof neighbourSchema>;

/** The note's page. `fields.story` is not sent: readers get the sanitised HTML only. */
export const notePageSchema = z.object({
  id: z.number(),
  slug: z.string(),
  status: z.enum(NOTE_STATUS_IDS),
  revision: z.number(),
  author: personSchema.nullable(),
  kiln: z.object({
    id: z.number(),
    version: z.number(),
    removed: z.boolean(),
    fields: kilnFieldsSchema,
    volumeLitres: z.number().nullable(),
  }),
  fields: noteFieldsSchema.omit({
    story: true,
    checkAnswers: true,
    findingDisputes: true,
    record: true,
  }),
  marks: noteFieldsSchema.shape.record.unwrap().shape.marks.unwrap(),
  row: noteRowSchema,
  findings: z.array(findingSchema),
  /** What the author disputes of them, each about a finding that is there. */
  disputes: z.array(findingDisputeSchema),
  /** The author’s answers to level stretches. */
  levelAnswers: noteFieldsSchema.shape.record.unwrap().shape.levelAnswers.unwrap(),
  summary: noteSummarySchema,
  storyHtml: z.string(),
  pictures: z.array(pictureSchema),
  hasRecord: z.boolean(),
  publishedAt: z.iso.datetime().nullable(),
  revisedAt: z.iso.datetime().nullable(),
  /** A newer revision of this note waits at the desk or is being written (author and staff). */
  revisionWaiting: z.boolean(),
  earlier: neighbourSchema.nullable(),
  next: neighbourSchema.nullable(),
  followOn: followOnSchema.nullable(),
  triedNote: z.object({ id: z.number(), slug: z.string(), title: z.string() }).nullable(),
  triedBy: z.array(noteRowSchema),
  abilities: noteAbilitiesSchema,
});
export type NotePageData = z.infer<typeof notePageSchema>;

export const remarkSchema = z.object({
  id: z.number(),
  /** JSON pointer of the field it is pinned to, or '' for the note as a whole. */
  pointer: z.string(),
  text: z.string(),
  by: personSchema.nullable(),
  at: z.iso.datetime(),
  mended: z.boolean(),
});
export type Remark = z.infer<typeof remarkSchema>;

/** The author's working copy. `version` is the ETag of a save. */
export const draftSchema = z.object({
  id: z.number(),
  version: z.number(),
  status: z.enum(NOTE_STATUS_IDS),
  /** Set while a published revision stays up beside this draft. */
  publishedRevision: z.number().nullable(),
  savedAt: z.iso.datetime(),
  fields: noteFieldsSchema,
  record: recordSchema.nullable(),
  pictures: z.array(pictureSchema),
  findings: z.array(findingSchema),
  checks: z.array(checkSchema),
  proposedChanges: z.array(proposedChangeSchema),
  earlier: neighbourSchema.nullable(),
  remarks: z.array(remarkSchema),
  /** The last decision's words, when it was sent back, declined or taken down. */
  decision: z
    .object({ reason: z.string(), by: personSchema.nullable(), at: z.iso.datetime() })
    .nullable(),
  abilities: noteAbilitiesSchema,
});
export type Draft = z.infer<typeof draftSchema>;

export const newNoteBodySchema = z.strictObject({
  kilnId: z.number().int().positive().nullable(),
  triedNoteId: z.number().int().positive().nullable(),
});
export const saveDraftBodySchema = z.strictObject({ fields: noteFieldsSchema });

/** One's own notes by kiln along a time line. */
export const notebookSchema = z.object({
  notes: z.array(
    z.object({
      id: z.number(),
      slug: z.string(),
      title: z.string(),
      status: z.enum(NOTE_STATUS_IDS),
      published: z.boolean(),
      revising: z.boolean(),
      kiln: z.object({ id: z.number(), name: z.string() }).nullable(),
      firedOn: z.iso.date().nullable(),
      savedAt: z.iso.datetime(),
      strip: stripPointsSchema.nullable(),
      stripWords: z.string(),
      openChecks: z.number(),
      openRemarks: z.number(),
      peakCelsius: z.number().nullable(),
      timeToTemperatureMinutes: z.number().nullable(),
      changes: z.array(z.enum(CHANGE_IDS)),
      decisionReason: z.string().nullable(),
    }),
  ),
});
export type Notebook = z.infer<typeof notebookSchema>;
