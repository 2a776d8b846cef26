import { z } from 'zod';
import { noteFieldsSchema } from '#shared/note/note-fields.ts';
import { OfflineError, ProblemError } from '../http/client.ts';

const staleSchema = z.object({
  version: z.number(),
  savedAt: z.string(),
  fields: noteFieldsSchema,
});

export type FailedSave =
  /** Something else is on the server than what this save started from. */
  | { readonly kind: 'stale'; readonly current: z.output<typeof staleSchema> }
  /** Sent again as it is, it may go through. */
  | { readonly kind: 'again'; readonly reason: string }
  | { readonly kind: 'refused'; readonly reason: string };

/** Too many tries, the server is away, or full: over sooner or later. */
const PASSING = [429, 503, 507];

/** What a save that failed means for what was typed. */
export function failedSave(error: unknown): FailedSave {
  if (error instanceof ProblemError && error.problem.status === 412) {
    const current = staleSchema.safeParse(error.problem.current);
    if (current.success) return { kind: 'stale', current: current.data };
  }
  const isPassing =
    error instanceof OfflineError ||
    (error instanceof ProblemError && PASSING.includes(error.problem.status));
  return {
    kind: isPassing ? 'again' : 'refused',
    reason: error instanceof Error ? error.message : 'The save did not work.',
  };
}
