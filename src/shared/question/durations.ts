import { numberAt } from './number-words.ts';
import type { Token } from './tokenise.ts';
import { HOUR_WORDS, MINUTE_WORDS } from './unit-words.ts';

type Tokens = readonly Token[];
type Duration = { readonly minutes: number; readonly next: number };

function textAt(tokens: Tokens, index: number): string {
  return tokens[index]?.text ?? '';
}

/** The same words at a place, one after the other. */
function says(tokens: Tokens, index: number, words: readonly string[]): boolean {
  return words.every((word, offset) => textAt(tokens, index + offset) === word);
}

/** Set expressions, with the minutes they stand for. Longer ones first. */
const EXPRESSIONS: readonly { readonly words: readonly string[]; readonly minutes: number }[] = [
  { words: ['three', 'quarters', 'of', 'an', 'hour'], minutes: 45 },
  { words: ['a', 'quarter', 'of', 'an', 'hour'], minutes: 15 },
  { words: ['quarter', 'of', 'an', 'hour'], minutes: 15 },
  { words: ['a', 'couple', 'of', 'hours'], minutes: 120 },
  { words: ['couple', 'of', 'hours'], minutes: 120 },
  { words: ['an', 'hour', 'and', 'a', 'half'], minutes: 90 },
  { words: ['an', 'hour', 'and', 'a', 'quarter'], minutes: 75 },
  { words: ['hour', 'and', 'a', 'half'], minutes: 90 },
  { words: ['half', 'an', 'hour'], minutes: 30 },
  { words: ['half', 'a', 'hour'], minutes: 30 },
  { words: ['half', 'hour'], minutes: 30 },
  { words: ['an', 'hour'], minutes: 60 },
];

/** "20", "20 min", "and twenty minutes" after hours. */
function extraMinutes(tokens: Tokens, index: number): Duration | null {
  const and = textAt(tokens, index) === 'and';
  const number = numberAt(tokens, and ? index + 1 : index);
  if (number === null || number.value >= 60) return null;
  const unit = textAt(tokens, number.next);
  if (MINUTE_WORDS.has(unit) || (unit === 'm' && tokens[number.next]?.glued === true)) {
    return { minutes: number.value, next: number.next + 1 };
  }
  const glued = tokens[index]?.glued === true;
  return !and && glued ? { minutes: number.value, next: number.next } : null;
}

function hoursAt(tokens: Tokens, hours: number, next: number): Duration {
  if (says(tokens, next, ['and', 'a', 'half'])) {
    return { minutes: (hours + 0.5) * 60, next: next + 3 };
  }
  const extra = extraMinutes(tokens, next);
  return { minutes: hours * 60 + (extra?.minutes ?? 0), next: extra?.next ?? next };
}

/**
 * A length of time that starts at a token, in minutes: "90 min", "2 hours", "1h20", "1:20 h",
 * "half an hour". A clock time without a unit is none.
 */
export function durationAt(tokens: Tokens, index: number): Duration | null {
  for (const { words, minutes } of EXPRESSIONS) {
    if (!says(tokens, index, words)) continue;
    const next = index + words.length;
    return minutes === 60 ? hoursAt(tokens, 1, next) : { minutes, next };
  }
  const number = numberAt(tokens, index);
  if (number === null) return null;
  let at = number.next;
  if (textAt(tokens, at) === ':' && tokens[at + 1]?.kind === 'number') {
    const unit = textAt(tokens, at + 2);
    if (!HOUR_WORDS.has(unit)) return null;
    const minutes = number.value * 60 + Number(textAt(tokens, at + 1));
    return { minutes, next: at + 3 };
  }
  if (textAt(tokens, at) === '-' && tokens[at]?.glued === true) at += 1;
  const unit = textAt(tokens, at);
  if (MINUTE_WORDS.has(unit)) return { minutes: number.value, next: at + 1 };
  return HOUR_WORDS.has(unit) ? hoursAt(tokens, number.value, at + 1) : null;
}
