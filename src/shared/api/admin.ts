import { z } from 'zod';
import { ROLE_IDS } from '../vocabulary/statuses.ts';
import { text } from '../note/field-types.ts';

export const adminMembersSchema = z.object({
  members: z.array(
    z.object({
      id: z.number(),
      name: z.string(),
      /** First letter and domain only: staff views hold no addresses. */
      emailHint: z.string(),
      emailVerified: z.boolean(),
      role: z.enum(ROLE_IDS),
      suspended: z.boolean(),
      joinedOn: z.iso.date(),
      publishedNotes: z.number(),
    }),
  ),
  total: z.number(),
});
export type AdminMembers = z.infer<typeof adminMembersSchema>;
export const roleBodySchema = z.strictObject({ role: z.enum(ROLE_IDS), reason: text(500) });
export const suspendBodySchema = z.strictObject({ suspended: z.boolean(), reason: text(500) });

export const outboxStateSchema = z.object({
  waiting: z.number(),
  oldestWaitingSeconds: z.number().nullable(),
  failed: z.array(
    z.object({
      id: z.number(),
      topic: z.string(),
      key: z.string(),
      attempts: z.number(),
      lastError: z.string(),
      nextTryAt: z.iso.datetime(),
    }),
  ),
  index: z.object({
    available: z.boolean(),
    inDatabase: z.number(),
    inIndex: z.number().nullable(),
    behind: z.number().nullable(),
  }),
});
export type OutboxState = z.infer<typeof outboxStateSchema>;

/** Making the index anew from the database, which goes on in the background. */
export const reindexStateSchema = z.object({
  running: z.boolean(),
  /** Notes put into the new index so far, of those that are to be. */
  done: z.number(),
  of: z.number(),
  /** How the last one since the server's start ended. */
  last: z
    .object({ outcome: z.enum(['finished', 'cancelled', 'failed']), at: z.iso.datetime() })
    .nullable(),
});
export type ReindexState = z.infer<typeof reindexStateSchema>;

export const caughtMailsSchema = z.object({
  /** False when a real SMTP server is configured: then nothing is caught here. */
  catching: z.boolean(),
  mails: z.array(
    z.object({
      id: z.string(),
      at: z.iso.datetime(),
      to: z.string(),
      subject: z.string(),
      text: z.string(),
    }),
  ),
});
export type CaughtMails = z.infer<typeof caughtMailsSchema>;

export const auditSchema = z.object({
  entries: z.array(
    z.object({
      id: z.number(),
      at: z.iso.datetime(),
      actor: z.object({ id: z.number(), name: z.string() }).nullable(),
      act: z.string(),
      target: z.object({ kind: z.string(), id: z.number(), label: z.string() }),
      reason: z.string(),
    }),
  ),
  total: z.number(),
});
export type Audit = z.infer<typeof auditSchema>;
