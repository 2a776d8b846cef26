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

/** Each open page keeps its own copy, so that two tabs never write over each other's. */
const keyOf = (memberId: number, noteId: number, writer: string): string =>
  `${PREFIX}${String(memberId)}:${String(noteId)}:${writer}`;

/** Keeps a copy. @returns false where this browser keeps nothing */
export function keepUnsent(
  memberId: number,
  noteId: number,
  work: UnsentWork,
  writer = '',
): boolean {
  try {
    localStorage.setItem(keyOf(memberId, noteId, writer), JSON.stringify(work));
    return true;
  } catch {
    return false;
  }
}

/** Drops the copy of one page: the server has it, or its author chose the other version. */
export function forgetUnsent(memberId: number, noteId: number, writer = ''): void {
  try {
    localStorage.removeItem(keyOf(memberId, noteId, writer));
  } catch {
    // Nothing was kept.
  }
}

export interface KeptWork {
  readonly noteId: number;
  /** The page that kept it. */
  readonly writer: string;
  readonly work: UnsentWork;
}

function readCopy(key: string): UnsentWork | null {
  try {
    const parsed = unsentSchema.safeParse(JSON.parse(localStorage.getItem(key) ?? ''));
    return parsed.success ? parsed.data : null;
  } catch {
    return null;
  }
}

/** All that a member's pages left unsent in this browser, the last written first. */
function copiesOf(memberId: number): KeptWork[] {
  const found: KeptWork[] = [];
  const prefix = `${PREFIX}${String(memberId)}:`;
  try {
    for (let index = 0; index < localStorage.length; index += 1) {
      const key = localStorage.key(index);
      if (!key?.startsWith(prefix)) continue;
      const [note = '', writer = ''] = key.slice(prefix.length).split(':');
      const work = readCopy(key);
      if (work) found.push({ noteId: Number(note), writer, work });
    }
  } catch {
    return [];
  }
  return found.sort((one, other) => (one.work.at < other.work.at ? 1 : -1));
}

/** The copies that pages left of one note, the last written first. */
export function unsentFor(memberId: number, noteId: number): KeptWork[] {
  return copiesOf(memberId).filter((copy) => copy.noteId === noteId);
}

/** A member's unsent notes in this browser, each in its last copy: asked about before signing out. */
export function allUnsent(memberId: number): { noteId: number; work: UnsentWork }[] {
  const last = new Map<number, UnsentWork>();
  for (const { noteId, work } of copiesOf(memberId)) {
    if (!last.has(noteId)) last.set(noteId, work);
  }
  return [...last].map(([noteId, work]) => ({ noteId, work }));
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
