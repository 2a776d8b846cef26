import type { Item } from './items.ts';
import type { Match } from './phrases.ts';
import { firstItem } from './phrases.ts';
import { NEGATION_CARRIES, NEGATIONS } from './word-classes.ts';

/** Two words that rule out what follows, as "not" does. */
const PAIRS: readonly (readonly [string, string])[] = [
  ['rather', 'than'],
  ['instead', 'of'],
  ['opposed', 'to'],
];

/** "Isn't it too hot?" asks; it rules nothing out. */
const ASKED: ReadonlySet<string> = new Set(['it', 'this', 'that', 'there', 'they', 'you', 'i']);

export interface Negated {
  /** Matches that are ruled out. */
  readonly matches: ReadonlySet<Match>;
  /** Items of the negations that ruled something out. */
  readonly items: ReadonlySet<number>;
}

function isKept(match: Match): boolean {
  const of = (kind: string): boolean => match.means.some((meaning) => meaning.startsWith(kind));
  return of('form:') || of('glaze:') || (of('place:') && !of('cause:'));
}

/** "The temperature did not drop": the negation stands in a gap of what the climb did. */
function isRuledOutInside(match: Match, negation: number): boolean {
  const own = [...match.taken, ...match.seen];
  return (
    !own.includes(negation) &&
    own.some((index) => index < negation) &&
    match.means.includes('trouble:sag')
  );
}

/**
 * What a negation rules out: the trouble, cause or change words after it, as long as only small
 * words and the names of ware stand between. It ends at a stop, at but, just, only, yet, and at any
 * word that says something of its own ("not sure why it cracked"). A negation that is itself part
 * of a phrase ("no colour", "won't climb") rules out nothing.
 */
export function findNegated(items: readonly Item[], matches: readonly Match[]): Negated {
  const takenBy = new Map<number, Match>();
  for (const match of matches) for (const index of match.taken) takenBy.set(index, match);
  const negated = new Set<Match>();
  const used = new Set<number>();
  let negation: number | null = null;
  for (let index = 0; index < items.length; index += 1) {
    const item = items[index];
    const match = takenBy.get(index);
    if (item === undefined || item.kind === 'stop') {
      negation = null;
    } else if (match !== undefined) {
      if (negation === null || (firstItem(match) < negation && !isRuledOutInside(match, negation)))
        continue;
      if (isKept(match)) continue;
      negated.add(match);
      used.add(negation);
      if (!match.means.some((meaning) => /^(?:trouble|crack):/.test(meaning))) negation = null;
    } else if (item.kind === 'word') {
      const next = items[index + 1];
      const nextText = next?.kind === 'word' ? next.text : '';
      if (NEGATIONS.has(item.text)) negation = ASKED.has(nextText) ? null : index;
      else if (PAIRS.some(([first, second]) => item.text === first && nextText === second)) {
        negation = index;
        index += 1;
      } else if (!NEGATION_CARRIES.has(item.text)) negation = null;
    } else negation = null;
  }
  return { matches: negated, items: used };
}
