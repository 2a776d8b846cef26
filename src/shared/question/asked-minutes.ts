import type { Item } from './items.ts';
import type { Match } from './phrases.ts';
import type { MinutesAsked, MinutesOf, MinutesOp } from './reading-types.ts';

export interface AskedMinutes extends MinutesAsked {
  readonly item: number;
}

const MORE: ReadonlySet<string> = new Set('over more longer least above past > beyond'.split(' '));
const LESS: ReadonlySet<string> = new Set(
  'under less within faster quicker below < sub'.split(' '),
);
const LEADS: ReadonlySet<string> = new Set(
  'than in of at a up to nearly about only well the for'.split(' '),
);
const NOT_CLIMB: ReadonlySet<string> = new Set(
  'cover covered covering bin air reduction smoke smoked sawdust newspaper drawn draw cool cooling cooled water ago later before burp'.split(
    ' ',
  ),
);

function wordAt(items: readonly Item[], index: number): string {
  const item = items[index];
  return item?.kind === 'word' ? item.text : '';
}

function opOf(items: readonly Item[], index: number): MinutesOp {
  for (let at = index - 1; at >= Math.max(0, index - 4); at -= 1) {
    const word = wordAt(items, at);
    if (MORE.has(word)) return '>';
    if (LESS.has(word) || (word === 'up' && wordAt(items, at + 1) === 'to')) return '<';
    if (!LEADS.has(word)) break;
  }
  const next = [wordAt(items, index + 1), wordAt(items, index + 2)];
  if (['plus', '+'].includes(next[0] ?? '') || (next[0] === 'or' && next[1] === 'more')) return '>';
  return next[0] === 'or' && next[1] === 'less' ? '<' : '=';
}

function ofWhat(items: readonly Item[], index: number, matches: readonly Match[]): MinutesOf {
  const held = matches.some((match) => match.means.includes('hold') && match.seen.includes(index));
  if (held) return 'hold';
  const near = [-2, -1, 1, 2, 3].map((offset) => wordAt(items, index + offset));
  return near.some((word) => NOT_CLIMB.has(word)) ? 'other' : 'climb';
}

/**
 * The length of time a question states. `slow` says that the question complains of slowness: then a
 * plain "took 2 hours" means two hours and more.
 */
export function readMinutes(
  items: readonly Item[],
  matches: readonly Match[],
  slow: boolean,
): AskedMinutes | null {
  const all = items.flatMap((item, index) =>
    item.kind === 'quantity' && item.quantity.type === 'minutes'
      ? [{ minutes: item.quantity.minutes, item: index, of: ofWhat(items, index, matches) }]
      : [],
  );
  const chosen = all.find(({ of }) => of === 'climb') ?? all[0];
  if (chosen === undefined) return null;
  const op = opOf(items, chosen.item);
  return { ...chosen, op: op === '=' && slow && chosen.of === 'climb' ? '>' : op };
}
