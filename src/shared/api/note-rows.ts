import { z } from 'zod';
import { CHANGE_IDS } from '../vocabulary/changes.ts';
import { TROUBLE_IDS } from '../vocabulary/troubles.ts';

/** [minute, °C], downsampled keeping extremes: what a glow strip needs. */
export const stripPointsSchema = z.array(z.tuple([z.number(), z.number()]));
export type StripPoints = z.infer<typeof stripPointsSchema>;

/** What came of a note: told on rows, the note page and in search. */
export const followOnSchema = z.object({
  noteId: z.number(),
  title: z.string(),
  firedOn: z.iso.date(),
  changes: z.array(z.enum(CHANGE_IDS)),
  peakCelsius: z.number().nullable(),
  timeToTemperatureMinutes: z.number().nullable(),
  /** Per trouble of the earlier note: was it gone? */
  outcomes: z.array(
    z.object({ trouble: z.enum(TROUBLE_IDS), outcome: z.enum(['gone', 'not-gone', 'cannot-say']) }),
  ),
});
export type FollowOn = z.infer<typeof followOnSchema>;

/** A published note as a row: lists, results, the kiln page. */
export const noteRowSchema = z.object({
  id: z.number(),
  slug: z.string(),
  title: z.string(),
  author: z.object({ id: z.number(), name: z.string() }).nullable(),
  kiln: z.object({ id: z.number(), name: z.string(), volumeLitres: z.number().nullable() }),
  firedOn: z.iso.date(),
  publishedAt: z.iso.datetime(),
  strip: stripPointsSchema.nullable(),
  stripWords: z.string(),
  troubles: z.array(z.enum(TROUBLE_IDS)),
  measuredTroubles: z.array(z.enum(TROUBLE_IDS)),
  /** Shown by disputed findings only: among the troubles they are not. Absent: none. */
  disputedTroubles: z.array(z.enum(TROUBLE_IDS)).optional(),
  targetCelsius: z.number().nullable(),
  peakCelsius: z.number().nullable(),
  timeToTemperatureMinutes: z.number().nullable(),
  holdMinutes: z.number().nullable(),
  stallCelsius: z.array(z.number()),
  crackedPieces: z.number(),
  pieces: z.number(),
  changes: z.array(z.enum(CHANGE_IDS)),
  followOn: followOnSchema.nullable(),
});
export type NoteRow = z.infer<typeof noteRowSchema>;
export const noteListSchema = z.object({
  notes: z.array(noteRowSchema),
  total: z.number(),
  page: z.number(),
  pages: z.number(),
});
export type NoteList = z.infer<typeof noteListSchema>;
