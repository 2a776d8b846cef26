import type { DeskQueue } from '#shared/api/desk.ts';

/** The note to take next: the longest waiting that is free, nobody's own and not the one just read. */
export function nextNoteId(waiting: DeskQueue['waiting'], after: number): number | null {
  const free = waiting.filter(
    ({ noteId, own, claim }) => noteId !== after && !own && (claim === null || claim.mine),
  );
  return free[0]?.noteId ?? null;
}
