import { seededRandom } from '../simulation/seeded-random.ts';

/** Words of the trade and of everyday telling; the first are said most. */
const COMMON =
  'kiln burner flame glaze pot gas pressure lid flue fibre shelf brick bin sawdust reduction crackle copper stall stalled cold wind rain damp tongs glow pyrometer probe temperature bowl plate cup jar bottle tile cracked crack dunting rim foot clay grog bisque raku smoke lustre matt white turquoise clear black grey quench water blanket wall port hose regulator cylinder valve orange yellow cherry soak hold climb slow fast steady open shut turned watched waited lifted draw drew garden yard morning evening night summer winter spring autumn firing fired melted pinholes blister crawl thick thin coat brush dip pour sieve mix batch recipe newspaper straw hay leaves shavings lid seal burp minutes hour degrees'.split(
    ' ',
  );
const LINKING =
  'the a of and to in it was at on with for again then when after before by from all but so very still almost never only more than this that one two three first last next'.split(
    ' ',
  );
const ONSETS = 'b br c cl d dr f fl g gr h j k l m n p pl qu r s sh st t th tr v w'.split(' ');
const VOWELS = 'a e i o u ai ea oo ou'.split(' ');
const ENDINGS = 'b ck d g l ll m n nd ng nt p r rd rk s sk st t th'.split(' ');

/** Rarer words are made of syllables: names of places, people, glazes and things nobody else says. */
const RARE_WORDS = 20_000;
const MISSPELT_SHARE = 0.005;
const LINKING_SHARE = 0.35;
const COMMON_SHARE = 0.45;

function madeWords(): string[] {
  const random = seededRandom(7);
  const pick = (list: readonly string[]): string => list[Math.floor(random() * list.length)] ?? '';
  const words = new Set<string>();
  while (words.size < RARE_WORDS) {
    const syllables = 1 + Math.floor(random() * 3);
    let word = '';
    for (let at = 0; at < syllables; at += 1) word += pick(ONSETS) + pick(VOWELS);
    words.add(word + pick(ENDINGS));
  }
  return [...words];
}

let rare: string[] | null = null;

/** A share from 0 to 1 in which small values are far more frequent, as words are (Zipf). */
const zipf = (random: () => number, count: number): number =>
  Math.min(count - 1, Math.floor(count ** random()) - 1);

function misspelt(word: string, random: () => number): string {
  const at = 1 + Math.floor(random() * (word.length - 1));
  return word.slice(0, at) + word.slice(at + 1);
}

/** Tells stories that are the same for the same source of numbers. */
export interface TextMaker {
  readonly words: (count: number) => string;
  /** Sentences of about the given number of words in all. */
  readonly sentences: (count: number) => string;
  readonly word: () => string;
}

export function createTextMaker(random: () => number): TextMaker {
  rare ??= madeWords();
  const rareWords = rare;
  const word = (): string => {
    const kind = random();
    if (kind < LINKING_SHARE) return LINKING[zipf(random, LINKING.length)] ?? '';
    const said =
      kind < LINKING_SHARE + COMMON_SHARE
        ? (COMMON[zipf(random, COMMON.length)] ?? '')
        : (rareWords[zipf(random, rareWords.length)] ?? '');
    return said.length > 4 && random() < MISSPELT_SHARE ? misspelt(said, random) : said;
  };
  const words = (count: number): string => Array.from({ length: count }, word).join(' ');
  const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);
  const sentences = (count: number): string => {
    const told: string[] = [];
    for (let left = count; left > 0;) {
      const length = Math.min(left, 6 + Math.floor(random() * 14));
      told.push(`${capital(words(length))}.`);
      left -= length;
    }
    return told.join(' ');
  };
  return { word, words, sentences };
}
