import MiniSearch from 'minisearch';

type CandidateDocument = { id: string; words: readonly string[] };

/**
 * The inverted index: MiniSearch keeps which documents hold which word. Its own scores are not
 * asked for, since the order of hits follows the ranking rules; the lists are read directly.
 */
export class CandidateIndex extends MiniSearch<CandidateDocument> {
  constructor() {
    super({
      fields: ['words'],
      extractField: (document, field) => (field === 'id' ? document.id : document.words.join(' ')),
      tokenize: (text) => text.split(' '),
      processTerm: (term) => term,
    });
  }

  /** Adds a document and answers the number under which it is listed. */
  addWords(id: string, words: readonly string[]): number {
    this.add({ id, words });
    const number = this._idToShortId.get(id);
    if (number === undefined) throw new Error('A document just added has no number.');
    return number;
  }

  /** Takes a document out of every answer; its lists are cleaned later, in pauses. */
  removeWords(id: string): void {
    this.discard(id);
  }

  /** Visits the documents that hold a word; may include removed ones until they are cleaned. */
  forEachWith(word: string, visit: (number: number) => void): void {
    const byField = this._index.get(word);
    if (byField === undefined) return;
    for (const postings of byField.values()) {
      for (const number of postings.keys()) visit(number);
    }
  }

  /** How many documents hold a word. */
  frequency(word: string): number {
    let count = 0;
    for (const postings of this._index.get(word)?.values() ?? []) count += postings.size;
    return count;
  }
}
