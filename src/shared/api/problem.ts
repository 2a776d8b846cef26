import { z } from 'zod';

/** RFC 9457 problem document. `type` ends in `code`; `instance` is the request id. */
export const problemSchema = z.object({
  type: z.string(),
  code: z.string(),
  title: z.string(),
  status: z.number().int(),
  detail: z.string(),
  instance: z.string().optional(),
  /** For bad input (422): where, as a JSON pointer into the body, and what is wrong. */
  errors: z.array(z.object({ pointer: z.string(), detail: z.string() })).optional(),
  /** Seconds to wait before another try (429, 503). */
  retryAfter: z.number().optional(),
  /** What the server holds now, for a stale save (412) or a lost race (409). */
  current: z.unknown().optional(),
});
export type Problem = z.infer<typeof problemSchema>;
