import { z } from 'zod';
import { text } from '../note/field-types.ts';

/** Characters of a question, and of an answer to it. */
export const MIN_NOTE_QUESTION = 10;
export const MAX_NOTE_QUESTION = 500;
export const MAX_NOTE_ANSWER = 2000;

const personSchema = z.object({ id: z.number(), name: z.string() });

/** Plain text without blanks around it. */
const trimmed = (max: number) =>
  z
    .string()
    .transform((value) => value.trim())
    .pipe(text(max));

export const askBodySchema = z.strictObject({
  text: trimmed(MAX_NOTE_QUESTION).refine(
    (value) => [...value].length >= MIN_NOTE_QUESTION,
    `A question has at least ${String(MIN_NOTE_QUESTION)} characters.`,
  ),
});
export const answerBodySchema = z.strictObject({
  text: trimmed(MAX_NOTE_ANSWER).refine((value) => value !== '', 'Write the answer first.'),
});

export const noteAnswerSchema = z.object({
  id: z.number(),
  text: z.string(),
  /** Null when the account is gone. */
  by: personSchema.nullable(),
  /** Whether the note's author says it, or a moderator. */
  byAuthor: z.boolean(),
  at: z.iso.datetime(),
  changed: z.boolean(),
  mine: z.boolean(),
});
export type NoteAnswer = z.infer<typeof noteAnswerSchema>;

export const noteQuestionSchema = z.object({
  id: z.number(),
  text: z.string(),
  by: personSchema.nullable(),
  at: z.iso.datetime(),
  answers: z.array(noteAnswerSchema),
  abilities: z.object({ answer: z.boolean(), remove: z.boolean() }),
});
export type NoteQuestion = z.infer<typeof noteQuestionSchema>;

/** What was asked about a published note, oldest first; an unpublished one has none. */
export const noteQuestionsSchema = z.object({
  questions: z.array(noteQuestionSchema),
  abilities: z.object({ ask: z.boolean() }),
});
export type NoteQuestions = z.infer<typeof noteQuestionsSchema>;
