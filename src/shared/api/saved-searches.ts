import { z } from 'zod';
import { findQuerySchema } from './search.ts';

export const MAX_SAVED_NAME = 80;
/** As many as a member keeps. */
export const MOST_SAVED_SEARCHES = 30;

/** What is asked, whatever order and page of it one looks at: question, parts left out, filters. */
export const askedSchema = findQuerySchema.omit({ sort: true, page: true });
export type Asked = z.output<typeof askedSchema>;

const nameSchema = z
  .string()
  .transform((name) => name.replace(/[\s\p{Cc}\p{Cf}]+/gu, ' ').trim())
  .pipe(
    z
      .string()
      .min(1, 'Give it a name.')
      .max(MAX_SAVED_NAME, `A name has at most ${String(MAX_SAVED_NAME)} characters.`),
  );

/** Every part asks for something, and one of them for more than leaving a part out. */
const asksForSomething = ({ off: _off, ...asked }: Asked): boolean =>
  Object.values(asked).some((value) => (value ?? '').trim() !== '');

export const saveSearchBodySchema = z.strictObject({
  name: nameSchema,
  search: askedSchema.refine(asksForSomething, 'Ask something, or set a filter, first.'),
});
export const changeSavedSearchBodySchema = z.strictObject({
  name: nameSchema,
  /** Whether new notes that it finds are mailed. */
  mails: z.boolean(),
});

export const savedSearchSchema = z.object({
  id: z.number(),
  name: z.string(),
  search: askedSchema,
  mails: z.boolean(),
  savedAt: z.iso.datetime(),
  mailedAt: z.iso.datetime().nullable(),
});
export type SavedSearch = z.infer<typeof savedSearchSchema>;

/** A member's searches, oldest first. */
export const savedSearchesSchema = z.object({ searches: z.array(savedSearchSchema) });
export type SavedSearches = z.infer<typeof savedSearchesSchema>;
