import { readFile, readdir } from 'node:fs/promises';
import { join } from 'node:path';
import { parseMail, type ParsedMail } from './parse-mail.ts';

/** A mail that the catcher has kept. */
export interface CaughtMail extends ParsedMail {
  id: string;
}

/** The name the catcher gives: time and chance. Anything else is not looked for on disk. */
const ID = /^\d{8}T\d{9}Z-[0-9a-f]{8}$/;

/** The kept mails, newest first, at most `limit`. */
export async function listCaughtMails(folder: string, limit = 100): Promise<CaughtMail[]> {
  const names = await readdir(folder).catch(() => [] as string[]);
  const ids = names
    .filter((name) => name.endsWith('.eml'))
    .map((name) => name.slice(0, -'.eml'.length))
    .sort()
    .reverse()
    .slice(0, limit);
  const mails = await Promise.all(ids.map((id) => readCaughtMail(folder, id)));
  // One may have been cleared away between the list and the reading.
  return mails.filter((mail) => mail !== null);
}

/** One kept mail, or null when there is none of this id. */
export async function readCaughtMail(folder: string, id: string): Promise<CaughtMail | null> {
  if (!ID.test(id)) return null;
  try {
    return { id, ...parseMail(await readFile(join(folder, `${id}.eml`))) };
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === 'ENOENT') return null;
    throw error;
  }
}
