import type { z } from 'zod';
import type { passageSchema } from '#shared/api/search.ts';

/** Private-use characters mark hits, so that no text of a note can be taken for a tag. */
export const HIT_BEGINS = '\uE000';
export const HIT_ENDS = '\uE001';

/** A marked-up passage in pieces; null when nothing in it was hit. */
export function passageOf(marked: string | undefined): z.infer<typeof passageSchema> | null {
  if (marked === undefined || !marked.includes(HIT_BEGINS)) return null;
  const pieces: { text: string; hit: boolean }[] = [];
  for (const [index, part] of marked.split(HIT_BEGINS).entries()) {
    if (index === 0) {
      if (part) pieces.push({ text: part, hit: false });
      continue;
    }
    const end = part.indexOf(HIT_ENDS);
    const hit = end < 0 ? part : part.slice(0, end);
    const rest = end < 0 ? '' : part.slice(end + 1);
    if (hit) pieces.push({ text: hit, hit: true });
    if (rest) pieces.push({ text: rest, hit: false });
  }
  return pieces;
}

/** The words that were hit, each once, as they stand in the note. */
export function hitWords(passage: z.infer<typeof passageSchema> | null): string[] {
  return [...new Set((passage ?? []).filter((piece) => piece.hit).map((piece) => piece.text))];
}
