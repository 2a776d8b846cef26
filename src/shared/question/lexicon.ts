import { MENDABLE_WORDS } from './mendable-words.ts';
import { ALIKE, IRREGULAR, SPELLINGS } from './spellings.ts';
import * as units from './unit-words.ts';
import { NUMBER_WORDS } from './number-words.ts';
import { VOCABULARY } from './vocabulary.ts';
import { EMPTY_WORDS, FILLERS, QUESTION_WORDS, WORD_CLASSES } from './word-classes.ts';

const VOWEL = /[aeiou]/;

/** The regular inflections of a base word, with and without a doubled last letter. */
export function inflectionsOf(base: string): string[] {
  if (base.length < 3) return [];
  const last = base.at(-1) ?? '';
  const stem = last === 'e' ? base.slice(0, -1) : base;
  const forms = [`${base}s`, `${stem}ed`, `${stem}ing`, `${base}ing`];
  if (/(?:s|x|z|ch|sh)$/.test(base)) forms.push(`${base}es`);
  if (last === 'y' && !VOWEL.test(base.at(-2) ?? 'a')) {
    forms.push(`${base.slice(0, -1)}ies`, `${base.slice(0, -1)}ied`);
  }
  if (!VOWEL.test(last) && !'wxy'.includes(last) && VOWEL.test(base.at(-2) ?? '')) {
    forms.push(`${base}${last}ed`, `${base}${last}ing`);
  }
  return forms;
}

/** The words of one phrase, marks of the notation taken off. */
export function wordsOfPhrase(phrase: string): string[] {
  return phrase
    .split(' ')
    .flatMap((element) => element.replace(/[()?]/g, '').split('|'))
    .filter((word) => /^[a-z]/.test(word));
}

const phraseWords = VOCABULARY.flatMap((entry) => entry.says.flatMap(wordsOfPhrase));
const classWords = Object.values(WORD_CLASSES).flatMap((words) => words.split(' '));

const BASES: ReadonlySet<string> = new Set([...phraseWords, ...classWords]);

const formToBase = new Map<string, string>();
for (const base of BASES) {
  for (const form of inflectionsOf(base)) {
    if (!formToBase.has(form)) formToBase.set(form, base);
  }
}
for (const [form, base] of Object.entries(IRREGULAR)) formToBase.set(form, base);
export const FORM_TO_BASE: ReadonlyMap<string, string> = formToBase;

/** Every word that is right as it stands and is never taken for a misspelling. */
export const KNOWN_WORDS: ReadonlySet<string> = new Set([
  ...MENDABLE_WORDS,
  ...BASES,
  ...formToBase.keys(),
  ...FILLERS,
  ...EMPTY_WORDS,
  ...QUESTION_WORDS,
  ...NUMBER_WORDS,
  ...Object.keys(SPELLINGS),
  ...Object.values(SPELLINGS).flat(),
  ...ALIKE.flat(),
  ...units.OTHER_UNITS,
  ...units.MINUTE_WORDS,
  ...units.HOUR_WORDS,
  ...units.DEGREE_WORDS,
  ...units.MONTHS,
  ...units.DIFFERENCE_WORDS,
  ...units.OFFSET_WORDS,
  ...units.STEP_VERBS,
  ...units.NOT_THE_PIECE,
  ...Object.keys(units.TEMPERATURE_UNITS),
  ...Object.keys(units.SIZE_UNITS),
]);
