import { z } from 'zod';
import { ROLE_IDS } from '../vocabulary/statuses.ts';
import { optionalText, text } from '../note/field-types.ts';
import { memberSettingsSchema } from './settings.ts';
import { noteRowSchema } from './note-rows.ts';

/** Passwords are counted in code points (NIST SP 800-63B-4 section 3.1.1.2). */
export const MIN_PASSWORD = 15;
export const MAX_PASSWORD = 256;

export const emailSchema = z.email('This does not look like an e-mail address.').max(254);
/** Only the length is judged here; common passwords and personal words are refused by the server. */
export const newPasswordSchema = z
  .string()
  .max(MAX_PASSWORD * 2)
  .refine(
    (value) => [...value].length >= MIN_PASSWORD,
    `At least ${String(MIN_PASSWORD)} characters.`,
  )
  .refine(
    (value) => [...value].length <= MAX_PASSWORD,
    `At most ${String(MAX_PASSWORD)} characters.`,
  );
/** What is typed at sign-in: any string, only bounded before hashing. */
export const givenPasswordSchema = z.string().max(MAX_PASSWORD * 2);
export const memberNameSchema = text(60).refine(
  (name) => name.trim().length >= 2,
  'A name has at least two characters.',
);
export const mailTokenSchema = z.string().regex(/^[A-Za-z0-9_-]{43}$/);

export const joinBodySchema = z.strictObject({
  name: memberNameSchema,
  email: emailSchema,
  password: newPasswordSchema,
  /** The rules of the house and the licence of published notes. */
  agreed: z.literal(true),
});
export const signInBodySchema = z.strictObject({
  email: z.string().max(254),
  password: givenPasswordSchema,
});
export const verifyEmailBodySchema = z.strictObject({ token: mailTokenSchema });
export const forgotPasswordBodySchema = z.strictObject({ email: z.string().max(254) });
export const resetPasswordBodySchema = z.strictObject({
  token: mailTokenSchema,
  password: newPasswordSchema,
});
export const changePasswordBodySchema = z.strictObject({
  current: givenPasswordSchema,
  next: newPasswordSchema,
  endOtherSessions: z.boolean(),
});
export const changeEmailBodySchema = z.strictObject({
  current: givenPasswordSchema,
  email: emailSchema,
});
export const confirmPasswordBodySchema = z.strictObject({ password: givenPasswordSchema });
export const profileBodySchema = z.strictObject({
  name: memberNameSchema,
  place: optionalText(80),
  about: optionalText(1000),
});
export const settingsBodySchema = memberSettingsSchema;

export const meSchema = z.object({
  id: z.number(),
  name: z.string(),
  email: z.string(),
  emailVerified: z.boolean(),
  role: z.enum(ROLE_IDS),
  place: z.string(),
  about: z.string(),
  settings: memberSettingsSchema,
});
export type Me = z.infer<typeof meSchema>;

/** What the reader of a page may do on the site as a whole; screens show what this answers. */
export const siteAbilitiesSchema = z.object({
  write: z.boolean(),
  handIn: z.boolean(),
  moderate: z.boolean(),
  administer: z.boolean(),
});
export type SiteAbilities = z.infer<typeof siteAbilitiesSchema>;

export const sessionAnswerSchema = z.object({
  me: meSchema.nullable(),
  abilities: siteAbilitiesSchema,
  /** Sent back in `X-Spyhole-Token` with every change; null until a session exists. */
  token: z.string().nullable(),
});
export type SessionAnswer = z.infer<typeof sessionAnswerSchema>;
export const tokenAnswerSchema = z.object({ token: z.string() });

export const sessionRowSchema = z.object({
  /** A handle for ending it; not the identifier in the cookie. */
  id: z.string(),
  current: z.boolean(),
  startedAt: z.iso.datetime(),
  lastSeenAt: z.iso.datetime(),
  browser: z.string(),
});
export const sessionListSchema = z.object({ sessions: z.array(sessionRowSchema) });

export const memberPageSchema = z.object({
  id: z.number(),
  name: z.string(),
  place: z.string(),
  about: z.string(),
  joinedOn: z.iso.date(),
  role: z.enum(ROLE_IDS),
  kilns: z.array(
    z.object({ id: z.number(), name: z.string(), volumeLitres: z.number().nullable() }),
  ),
  notes: z.array(noteRowSchema),
});
export type MemberPage = z.infer<typeof memberPageSchema>;

/** An answer that only says that it was done, in words a person may read. */
export const doneSchema = z.object({ message: z.string() });
export type Done = z.infer<typeof doneSchema>;
