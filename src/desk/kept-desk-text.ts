import { z } from 'zod';

/**
 * What a moderator has typed and not sent, kept in this browser: a claim may lapse or another may
 * decide first, and the words are still there. Cleared when sent, and at sign-out by its prefix.
 */
const PREFIX = 'spyhole-desk:';

const keptSchema = z.object({
  pointer: z.string().max(120),
  remark: z.string().max(4000),
  reason: z.string().max(8000),
  crossed: z.array(z.string()).max(5),
});
export type KeptDeskText = z.infer<typeof keptSchema>;

export const NOTHING_TYPED: KeptDeskText = { pointer: '', remark: '', reason: '', crossed: [] };

const keyOf = (memberId: number, noteId: number): string =>
  `${PREFIX}${String(memberId)}:${String(noteId)}`;

export function keptDeskText(memberId: number, noteId: number): KeptDeskText {
  try {
    const text = localStorage.getItem(keyOf(memberId, noteId));
    const parsed = keptSchema.safeParse(text === null ? null : JSON.parse(text));
    return parsed.success ? parsed.data : NOTHING_TYPED;
  } catch {
    return NOTHING_TYPED;
  }
}

/** Keeps what is typed; blank text leaves nothing behind. */
export function keepDeskText(memberId: number, noteId: number, typed: KeptDeskText): void {
  const isBlank = typed.remark === '' && typed.reason === '' && typed.crossed.length === 0;
  try {
    if (isBlank) localStorage.removeItem(keyOf(memberId, noteId));
    else localStorage.setItem(keyOf(memberId, noteId), JSON.stringify(typed));
  } catch {
    // A browser that keeps nothing still has the words on the page.
  }
}
