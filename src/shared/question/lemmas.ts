import { FORM_TO_BASE } from './lexicon.ts';

/** The base form the vocabulary uses for a word: "cracked" is "crack"; a stranger is itself. */
export function lemmaOf(word: string): string {
  return FORM_TO_BASE.get(word) ?? word;
}
