import type { Token } from './tokenise.ts';

/** A number as typed in digits or words, before anything is known of its unit. */
export interface TypedNumber {
  readonly value: number;
  /** As typed when in digits ("06" keeps its nought), else the digits of its value. */
  readonly text: string;
  /** Index of the first token after it. */
  readonly next: number;
  readonly inWords: boolean;
}

const SMALL: Readonly<Record<string, number>> = {
  zero: 0,
  one: 1,
  two: 2,
  three: 3,
  four: 4,
  five: 5,
  six: 6,
  seven: 7,
  eight: 8,
  nine: 9,
  ten: 10,
  eleven: 11,
  twelve: 12,
  thirteen: 13,
  fourteen: 14,
  fifteen: 15,
  sixteen: 16,
  seventeen: 17,
  eighteen: 18,
  nineteen: 19,
};
const TENS: Readonly<Record<string, number>> = {
  twenty: 20,
  thirty: 30,
  forty: 40,
  fourty: 40,
  fifty: 50,
  sixty: 60,
  seventy: 70,
  eighty: 80,
  ninety: 90,
};
const FRACTIONS: Readonly<Record<string, number>> = { '½': 0.5, '¼': 0.25, '¾': 0.75 };
/** Spoken in two parts, "ten fifty", the first is at most this: above it no kiln would follow. */
const MAX_FIRST_PART = 23;

export const NUMBER_WORDS: readonly string[] = [
  ...Object.keys(SMALL),
  ...Object.keys(TENS),
  'hundred',
  'thousand',
];

type Parsed = { value: number; next: number } | null;

function wordAt(tokens: readonly Token[], index: number): string {
  const token = tokens[index];
  return token?.kind === 'word' ? token.text : '';
}

/** Steps over a hyphen inside a spoken number, "eight-fifty". */
function overHyphen(tokens: readonly Token[], index: number): number {
  const mark = tokens[index];
  return mark?.text === '-' && mark.glued && tokens[index + 1]?.glued === true ? index + 1 : index;
}

/** One to ninety-nine. */
function underHundred(tokens: readonly Token[], index: number): Parsed {
  const word = wordAt(tokens, index);
  const small = Object.hasOwn(SMALL, word) ? SMALL[word] : undefined;
  if (small !== undefined) return { value: small, next: index + 1 };
  const tens = Object.hasOwn(TENS, word) ? TENS[word] : undefined;
  if (tens === undefined) return null;
  const at = overHyphen(tokens, index + 1);
  const unitWord = wordAt(tokens, at);
  const unit = Object.hasOwn(SMALL, unitWord) ? SMALL[unitWord] : undefined;
  return unit !== undefined && unit >= 1 && unit <= 9
    ? { value: tens + unit, next: at + 1 }
    : { value: tens, next: index + 1 };
}

function addUnderHundred(tokens: readonly Token[], base: number, index: number): Parsed {
  const at = wordAt(tokens, index) === 'and' ? index + 1 : overHyphen(tokens, index);
  const rest = underHundred(tokens, at);
  return rest === null
    ? { value: base, next: index }
    : { value: base + rest.value, next: rest.next };
}

function afterHundred(tokens: readonly Token[], count: number, index: number): Parsed {
  return addUnderHundred(tokens, count * 100, index + 1);
}

function spoken(tokens: readonly Token[], index: number): Parsed {
  const article = wordAt(tokens, index) === 'a';
  const at = article ? index + 1 : index;
  const first: Parsed = article ? { value: 1, next: at } : underHundred(tokens, at);
  if (first === null) return null;
  const joint = overHyphen(tokens, first.next);
  const scale = wordAt(tokens, joint);
  if (scale === 'hundred') return afterHundred(tokens, first.value, joint);
  if (scale === 'thousand') {
    const after = wordAt(tokens, joint + 1) === 'and' ? joint + 2 : joint + 1;
    const hundreds = underHundred(tokens, after);
    if (hundreds !== null && wordAt(tokens, hundreds.next) === 'hundred') {
      const rest = afterHundred(tokens, hundreds.value, hundreds.next);
      return rest && { value: first.value * 1000 + rest.value, next: rest.next };
    }
    return addUnderHundred(tokens, first.value * 1000, joint + 1);
  }
  if (article) return null;
  const second = underHundred(tokens, joint);
  const twoParts = second !== null && second.value >= 10 && first.value >= 1;
  return twoParts && first.value <= MAX_FIRST_PART
    ? { value: first.value * 100 + second.value, next: second.next }
    : first;
}

/** "and a half" after a number; the fraction and the tokens it takes. */
function trailingFraction(tokens: readonly Token[], index: number): { add: number; next: number } {
  const token = tokens[index];
  if (token?.kind === 'number' && FRACTIONS[token.text] !== undefined) {
    return { add: FRACTIONS[token.text] ?? 0, next: index + 1 };
  }
  if (wordAt(tokens, index) === 'and' && wordAt(tokens, index + 1) === 'a') {
    const word = wordAt(tokens, index + 2);
    if (word === 'half') return { add: 0.5, next: index + 3 };
    if (word === 'quarter') return { add: 0.25, next: index + 3 };
  }
  const slash = tokens[index + 1];
  const below = tokens[index + 2];
  if (token?.kind === 'number' && slash?.text === '/' && slash.glued && below?.glued === true) {
    const quotient = Number(token.text) / Number(below.text);
    if (quotient === 0.5 || quotient === 0.25 || quotient === 0.75) {
      return { add: quotient, next: index + 3 };
    }
  }
  return { add: 0, next: index };
}

/** Reads the number that starts at a token, in digits or words; null when none does. */
export function numberAt(tokens: readonly Token[], index: number): TypedNumber | null {
  const token = tokens[index];
  if (token === undefined) return null;
  if (token.kind === 'number') {
    const lone = trailingFraction(tokens, index);
    if (lone.next > index) {
      return { value: lone.add, text: token.text, next: lone.next, inWords: false };
    }
    const value = Number(token.text.replaceAll(',', ''));
    if (!Number.isFinite(value)) return null;
    const scale = wordAt(tokens, index + 1);
    if (scale === 'hundred' && value < 100) {
      const rest = afterHundred(tokens, value, index + 1);
      if (rest !== null) return { ...rest, text: String(rest.value), inWords: false };
    }
    const more = trailingFraction(tokens, index + 1);
    return { value: value + more.add, text: token.text, next: more.next, inWords: false };
  }
  const parsed = spoken(tokens, index);
  if (parsed === null) return null;
  const more = trailingFraction(tokens, parsed.next);
  const value = parsed.value + more.add;
  return { value, text: String(value), next: more.next, inWords: true };
}
