import { z } from 'zod';

/** How a member likes to read: stored with the account, with these defaults for visitors. */
export const memberSettingsSchema = z.strictObject({
  temperature: z.enum(['C', 'F']).default('C'),
  system: z.enum(['metric', 'imperial']).default('metric'),
  theme: z.enum(['system', 'day', 'dusk']).default('system'),
  singleKeys: z.boolean().default(true),
  mails: z
    .strictObject({
      /** A decision about one of my notes. */
      decisions: z.boolean().default(true),
      /** Somebody tried a change from one of my notes. */
      triedIt: z.boolean().default(true),
      /** Somebody asked about one of my notes, or answered a question of mine. */
      questions: z.boolean().default(true),
      /** New notes that fit a search of mine. */
      savedSearches: z.boolean().default(true),
      /** For moderators: a note was handed in. */
      desk: z.boolean().default(false),
    })
    .prefault({}),
});
export type MemberSettings = z.output<typeof memberSettingsSchema>;

/** A visitor's settings. */
export function defaultSettings(): MemberSettings {
  return memberSettingsSchema.parse({});
}
