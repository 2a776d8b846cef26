import { z } from 'zod';
import { MAX_QUESTION } from '#shared/api/search.ts';

/** Kept in this browser only; everything under this prefix is cleared at sign-out. */
const KEY = 'spyhole-recent-questions';
const MOST = 8;

const recentSchema = z.array(z.string().min(1).max(MAX_QUESTION)).max(MOST);

/** The last questions asked in this browser, newest first; none where it keeps nothing. */
export function recentQuestions(): string[] {
  try {
    const text = localStorage.getItem(KEY);
    const parsed = recentSchema.safeParse(text === null ? [] : JSON.parse(text));
    return parsed.success ? parsed.data : [];
  } catch {
    return [];
  }
}

/** Puts a question first; the same one in other capitals is kept once. */
export function rememberQuestion(q: string): void {
  const question = q.trim().slice(0, MAX_QUESTION);
  if (question === '') return;
  const others = recentQuestions().filter(
    (other) => other.toLowerCase() !== question.toLowerCase(),
  );
  try {
    localStorage.setItem(KEY, JSON.stringify([question, ...others].slice(0, MOST)));
  } catch {
    // A browser that keeps nothing asks again next time.
  }
}

/** Forgets them all: when asked to, and at sign-out. */
export function clearRecentQuestions(): void {
  try {
    localStorage.removeItem(KEY);
  } catch {
    // Nothing was kept.
  }
}
