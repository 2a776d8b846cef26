import { createHash } from 'node:crypto';
import { existsSync, readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { z } from 'zod';
import { allDrawings } from './all-drawings.ts';
import type { Drawing } from './sheet.ts';

/**
 * The drawings as files. Drawing all of them takes a minute or two of computing, so they lie drawn
 * in `drawn/`, beside a list of which drawing each was made from.
 */
export const DRAWN_FOLDER = fileURLToPath(new URL('./drawn/', import.meta.url));
export const DRAWN_LIST = `${DRAWN_FOLDER}made-from.json`;

export const fingerprint = (drawing: Drawing): string =>
  createHash('sha256').update(drawing.svg).digest('hex').slice(0, 16);

const listSchema = z.record(z.string(), z.string());

/** Key → fingerprint of the drawing that the file of that key was made from. */
export function madeFrom(): Record<string, string> {
  return existsSync(DRAWN_LIST)
    ? listSchema.parse(JSON.parse(readFileSync(DRAWN_LIST, 'utf8')))
    : {};
}

/** The JPEG file of a drawing. @throws when nobody has drawn it yet */
export function drawnPicture(key: string): Buffer {
  return readFileSync(`${DRAWN_FOLDER}${key}.jpg`);
}

/** Drawings whose file is missing or was made from an earlier state of them. */
export function notDrawnYet(): Drawing[] {
  const made = madeFrom();
  return allDrawings().filter(
    (drawing) =>
      made[drawing.key] !== fingerprint(drawing) ||
      !existsSync(`${DRAWN_FOLDER}${drawing.key}.jpg`),
  );
}
