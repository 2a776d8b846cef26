import MiniSearch from 'minisearch';

type CandidateDocument = { id: string; words: readonly (readonly string[])[] };

/** Documents that hold a word, by the rank of the searchable attribute it stands in. */
type Lists = ReadonlyMap<number, ReadonlyMap<number, number>>;

/**
 * The inverted index: MiniSearch keeps which documents hold which word, one field for each rank of
 * the searchable attributes. Its own scores are not asked for, since the order of hits follows the
 * ranking rules; the lists are read directly.
 */
export class CandidateIndex extends MiniSearch<CandidateDocument> {
  /** MiniSearch finds a word letter by letter; those asked for lately are kept at hand. */
  readonly #recent = new Map<string, Lists | null>();

  constructor(rankCount: number) {
    super({
      // MiniSearch numbers its fields in this order, so a field's number is the rank.
      fields: Array.from({ length: rankCount }, (_, rank) => String(rank)),
      extractField: (document, field) =>
        field === 'id' ? document.id : (document.words[Number(field)]?.join(' ') ?? ''),
      tokenize: (text) => (text === '' ? [] : text.split(' ')),
      processTerm: (term) => term,
    });
  }

  /** Adds a document, its distinct words by rank, and answers the number it is listed under. */
  addWords(id: string, words: readonly (readonly string[])[]): number {
    this.#recent.clear();
    this.add({ id, words });
    const number = this._idToShortId.get(id);
    if (number === undefined) throw new Error('A document just added has no number.');
    return number;
  }

  /** Takes a document out of every answer; its lists are cleaned later, in pauses. */
  removeWords(id: string): void {
    this.#recent.clear();
    this.discard(id);
  }

  #listsOf(word: string): Lists | null {
    let lists = this.#recent.get(word);
    if (lists === undefined || lists?.size === 0) {
      lists = this._index.get(word) ?? null;
      this.#recent.set(word, lists);
    }
    return lists;
  }

  /** Visits the documents that hold a word; may include removed ones until they are cleaned. */
  forEachWith(
    word: string,
    visit: (number: number, rank: number) => void,
    isSearched: (rank: number) => boolean = () => true,
  ): void {
    for (const [rank, postings] of this.#listsOf(word) ?? []) {
      if (!isSearched(rank)) continue;
      for (const number of postings.keys()) visit(number, rank);
    }
  }

  /** How many documents hold a word, counted once for each rank of attribute. */
  frequency(word: string): number {
    let count = 0;
    for (const postings of this.#listsOf(word)?.values() ?? []) count += postings.size;
    return count;
  }
}
