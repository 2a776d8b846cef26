import { z } from 'zod';
import { noteFieldsSchema, type NoteFields } from '#shared/note/note-fields.ts';

/**
 * Work the server does not have yet, kept in this browser for this member until it has. Storage may
 * be shut or full; then the page says that closing it would lose what is unsent.
 */
const PREFIX = 'spyhole-unsent:';

const unsentSchema = z.object({
  fromVersion: z.number(),
  at: z.string(),
  fields: noteFieldsSchema,
});
export interface UnsentWork {
  /** The server's version this was written on top of. */
  readonly fromVersion: number;
  readonly at: string;
  readonly fields: NoteFields;
}

const keyOf = (memberId: number, noteId: number): string =>
  `${PREFIX}${String(memberId)}:${String(noteId)}`;

/** Keeps a copy. @returns false where this browser keeps nothing */
export function keepUnsent(memberId: number, noteId: number, work: UnsentWork): boolean {
  try {
    localStorage.setItem(keyOf(memberId, noteId), JSON.stringify(work));
    return true;
  } catch {
    return false;
  }
}

export function forgetUnsent(memberId: number, noteId: number): void {
  try {
    localStorage.removeItem(keyOf(memberId, noteId));
  } catch {
    // Nothing was kept.
  }
}

export function unsentFor(memberId: number, noteId: number): UnsentWork | null {
  try {
    const text = localStorage.getItem(keyOf(memberId, noteId));
    if (text === null) return null;
    const parsed = unsentSchema.safeParse(JSON.parse(text));
    return parsed.success ? parsed.data : null;
  } catch {
    return null;
  }
}

/** All of a member's unsent notes in this browser: asked about before signing out. */
export function allUnsent(memberId: number): { noteId: number; work: UnsentWork }[] {
  const found: { noteId: number; work: UnsentWork }[] = [];
  const prefix = `${PREFIX}${String(memberId)}:`;
  try {
    for (let index = 0; index < localStorage.length; index += 1) {
      const key = localStorage.key(index);
      if (!key?.startsWith(prefix)) continue;
      const noteId = Number(key.slice(prefix.length));
      const work = unsentFor(memberId, noteId);
      if (work) found.push({ noteId, work });
    }
  } catch {
    return [];
  }
  return found;
}

/** Everything kept in this browser for anybody: cleared at sign-out. */
export function clearUnsent(): void {
  try {
    for (const key of Object.keys(localStorage)) {
      if (key.startsWith(PREFIX)) localStorage.removeItem(key);
    }
  } catch {
    // Nothing was kept.
  }
}
