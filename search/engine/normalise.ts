const ASCII_LOWER_WORD = /^[a-z0-9]*$/;
const COMBINING_MARKS = /\p{M}+/gu;

/** Letters that Unicode decomposition leaves alone, with their plain spelling. */
const PLAIN_SPELLING: Record<string, string> = {
  ø: 'o',
  ł: 'l',
  đ: 'd',
  ð: 'd',
  þ: 'th',
  ß: 'ss',
  æ: 'ae',
  œ: 'oe',
  ı: 'i',
};
const SPECIAL_LETTERS = /[øłđðþßæœı]/g;

/** Lower case without accents: `Café` and `cafe` are the same word. */
export function normaliseWord(word: string): string {
  if (ASCII_LOWER_WORD.test(word)) return word;
  const stripped = word.toLowerCase().normalize('NFKD').replace(COMBINING_MARKS, '');
  return stripped.replace(SPECIAL_LETTERS, (letter) => PLAIN_SPELLING[letter] ?? letter);
}

/** Facet values and filter values are compared in lower case, accents kept. */
export function foldFacet(value: string): string {
  return value.toLowerCase();
}
