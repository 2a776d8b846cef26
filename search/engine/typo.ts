export type TypoSettings = {
  enabled: boolean;
  minWordSizeForTypos: { oneTypo: number; twoTypos: number };
  disableOnWords: string[];
  disableOnAttributes: string[];
  disableOnNumbers: boolean;
};

const NUMBER = /^\p{Nd}+$/u;

/** Longer query words are matched as typed only; nobody types them by hand. */
const MAX_TYPO_LENGTH = 80;

/** Typos allowed for a query word (0, 1 or 2). Its own length counts, not that of the found word. */
export function typoBudget(word: string, settings: TypoSettings): 0 | 1 | 2 {
  if (!settings.enabled || word.length > MAX_TYPO_LENGTH) return 0;
  if (settings.disableOnNumbers && NUMBER.test(word)) return 0;
  if (settings.disableOnWords.includes(word)) return 0;
  const length = [...word].length;
  if (length >= settings.minWordSizeForTypos.twoTypos) return 2;
  if (length >= settings.minWordSizeForTypos.oneTypo) return 1;
  return 0;
}

/**
 * Edits between a query word and another word, counting insert, delete, substitute and the swap of
 * two neighbours as one each (restricted Damerau-Levenshtein distance). With `asPrefix`, the
 * smallest distance to any beginning of the other word. A different first letter costs one more.
 * Answers `undefined` above `budget`.
 */
export function typosBetween(
  query: string,
  word: string,
  budget: number,
  asPrefix: boolean,
): number | undefined {
  if (query === word) return 0;
  if (!asPrefix && Math.abs(query.length - word.length) > budget) return undefined;
  const surcharge = query.charCodeAt(0) === word.charCodeAt(0) ? 0 : 1;
  if (surcharge > 0 && budget < 2) return undefined;
  if (budget === 0 && !asPrefix) return undefined;
  const rows = new EditRows(query);
  let best = asPrefix ? Infinity : undefined;
  for (let depth = 1; depth <= word.length; depth += 1) {
    const smallest = rows.push(depth, word.charCodeAt(depth - 1));
    if (best !== undefined) best = Math.min(best, rows.distance(depth));
    if (smallest + surcharge > budget) break;
    if (depth === word.length && best === undefined) best = rows.distance(depth);
  }
  if (best === undefined) return undefined;
  return best + surcharge <= budget ? best + surcharge : undefined;
}

/** The rows of the edit-distance table, one per letter of the compared word, kept for re-use. */
export class EditRows {
  readonly #query: string;
  readonly #rows: number[][] = [];
  readonly #letters: number[] = [0];

  constructor(query: string) {
    this.#query = query;
    this.#rows.push(Array.from({ length: query.length + 1 }, (_, column) => column));
  }

  /** Fills row `depth` for the letter there; answers the smallest value of this row and the last. */
  push(depth: number, letter: number): number {
    const query = this.#query;
    const above = this.#rows[depth - 1] ?? [];
    const twoAbove = this.#rows[depth - 2];
    const row = (this.#rows[depth] ??= new Array<number>(query.length + 1).fill(0));
    const previousLetter = this.#letters[depth - 1] ?? 0;
    this.#letters[depth] = letter;
    row[0] = depth;
    let smallest = depth;
    for (let column = 1; column <= query.length; column += 1) {
      const queryLetter = query.charCodeAt(column - 1);
      const substitute = (above[column - 1] ?? 0) + (queryLetter === letter ? 0 : 1);
      let value = Math.min(substitute, (above[column] ?? 0) + 1, (row[column - 1] ?? 0) + 1);
      if (
        twoAbove !== undefined &&
        column > 1 &&
        queryLetter === previousLetter &&
        query.charCodeAt(column - 2) === letter
      ) {
        value = Math.min(value, (twoAbove[column - 2] ?? 0) + 1);
      }
      row[column] = value;
      if (value < smallest) smallest = value;
    }
    return smallest;
  }

  /** Distance of the whole query to the first `depth` letters. */
  distance(depth: number): number {
    return this.#rows[depth]?.[this.#query.length] ?? Infinity;
  }
}
