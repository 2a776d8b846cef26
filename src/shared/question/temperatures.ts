import { fToC, kToC } from '../units/temperature.ts';
import type { Bound, Heat, Item, Quantity, QuantityItem } from './items.ts';
import type { TempUnit } from './reading-types.ts';

/** No unit: from here to here °C (or the asker's own unit), above it °F up to the last. */
export const BARE_MIN = 300;
/** No pot in this trade is fired above 1150 °C: a larger bare number is °F. */
export const BARE_MAX_C = 1150;
export const BARE_MAX_F = 2300;
/** Bare numbers this low are temperatures only where something burst. */
const BURST_MIN = 60;

/** Half windows in °C: a multiple of 50 in the unit typed is a round figure, others are meant. */
export const ROUND_TOLERANCE = 20;
export const EXACT_TOLERANCE = 10;
export const ABOUT_TOLERANCE = 35;
/** "just under", "just over": this far to one side. */
export const JUST_BESIDE = 30;
/** With an outdoor word beside it, a reading up to this is of the weather. */
const MAX_WEATHER_CELSIUS = 45;

const ABOUT: ReadonlySet<string> = new Set(
  '~ about around roughly approximately approx circa somewhere near nearish ish'.split(' '),
);
const OVER: ReadonlySet<string> = new Set(
  '> above over past beyond after exceeding exceeds upwards higher hotter more'.split(' '),
);
const UNDER: ReadonlySet<string> = new Set(
  '< below under before until till lower less cooler short shy'.split(' '),
);
const SMALL: ReadonlySet<string> = new Set(
  'just bit little slightly fraction shade tad'.split(' '),
);
const NEARLY: ReadonlySet<string> = new Set('nearly almost shy short'.split(' '));
const HAPPENED: ReadonlySet<string> = new Set(
  'at about around near roughly by past through ~'.split(' '),
);
const OTHER_LEADS: ReadonlySet<string> = new Set(
  'from to up than of a the not quite only still between and between within say on in'.split(' '),
);
/** Before a bare number: it is the number of something. */
const NUMBERED: ReadonlySet<string> = new Set(
  'note number no batch recipe version model firing kiln glaze page cost costs paid'.split(' '),
);
/** After a bare number: what it counts. */
const COUNTED: ReadonlySet<string> = new Set(
  (
    'burners pots pieces plates firings bricks people members beads tiles bowls cups times litre ' +
    'litres mugs vases fibre blanket board brick grade wool mesh watt quid'
  ).split(' '),
);
const OUTDOORS: ReadonlySet<string> = new Set(
  'outside outdoors weather ambient day night morning air'.split(' '),
);
const JOINTS: ReadonlySet<string> = new Set(['-', 'to', '/', 'and', 'through', 'until', 'till']);

type Candidate = {
  readonly value: number;
  readonly unit: 'C' | 'F' | 'K' | null;
  readonly hundreds?: true;
};

function wordAt(items: readonly Item[], index: number): string {
  const item = items[index];
  return item?.kind === 'word' ? item.text : '';
}

/** The number at an item if it can be a temperature by itself. */
function candidateAt(items: readonly Item[], index: number, burst: boolean): Candidate | null {
  const item = items[index];
  if (item?.kind !== 'quantity') return null;
  const { quantity } = item;
  if (quantity.type === 'heat') {
    const near = [-2, -1, 1, 2].map((offset) => wordAt(items, index + offset));
    const weather =
      quantity.value <= MAX_WEATHER_CELSIUS && near.some((word) => OUTDOORS.has(word));
    if (weather) return null;
    const { value, unit, hundreds } = quantity;
    return { value, unit, ...(hundreds === undefined ? {} : { hundreds }) };
  }
  if (quantity.type !== 'bare') return null;
  const { value } = quantity;
  if (COUNTED.has(wordAt(items, index + 1)) || NUMBERED.has(wordAt(items, index - 1))) return null;
  if (value >= BARE_MIN && value <= BARE_MAX_F) return { value, unit: null };
  const low = burst && value >= BURST_MIN && HAPPENED.has(wordAt(items, index - 1));
  return low ? { value, unit: null } : null;
}

/** "Between 200 and 400", "from 150 to 600": a low bare number is a temperature if its other end is. */
function lowEndAt(items: readonly Item[], index: number): Candidate | null {
  const item = items[index];
  if (item?.kind !== 'quantity' || item.quantity.type !== 'bare') return null;
  const { value } = item.quantity;
  if (value < BURST_MIN || !['between', 'from'].includes(wordAt(items, index - 1))) return null;
  const other = candidateAt(items, index + 2, false);
  return JOINTS.has(wordAt(items, index + 1)) && other !== null
    ? { value, unit: other.unit }
    : null;
}

function unitOf({ value, unit }: Candidate, preferred: 'C' | 'F'): 'C' | 'F' | 'K' {
  if (unit !== null) return unit;
  return value > BARE_MAX_C ? 'F' : preferred;
}

function celsiusOf(value: number, unit: 'C' | 'F' | 'K'): number {
  if (unit === 'F') return Math.round(fToC(value));
  return Math.round(unit === 'K' ? kToC(value) : value);
}

interface Leads {
  readonly words: ReadonlySet<string>;
  readonly directionItem: number | null;
}

/** The words that lead up to a temperature: "only just under the". */
function leadsTo(items: readonly Item[], index: number): Leads {
  const words = new Set<string>();
  let directionItem: number | null = null;
  for (let at = index - 1; at >= Math.max(0, index - 5); at -= 1) {
    const word = wordAt(items, at);
    const known = [ABOUT, OVER, UNDER, SMALL, NEARLY, HAPPENED, OTHER_LEADS];
    if (word === '' || !known.some((set) => set.has(word))) break;
    words.add(word);
    if (directionItem === null && (OVER.has(word) || UNDER.has(word) || word === 'to')) {
      directionItem = at;
    }
  }
  return { words, directionItem };
}

function someIn(words: ReadonlySet<string>, set: ReadonlySet<string>): boolean {
  return [...words].some((word) => set.has(word));
}

function boundOf(leads: ReadonlySet<string>, after: readonly string[]): Bound {
  const [next = '', second = ''] = after;
  const small = someIn(leads, SMALL);
  if (leads.has('not') && leads.has('quite')) return 'just-under';
  if (someIn(leads, NEARLY)) return 'just-under';
  if (small && someIn(leads, OVER)) return 'just-over';
  if (small && someIn(leads, UNDER)) return 'just-under';
  if (leads.has('up') && leads.has('to')) return 'up-to';
  if (someIn(leads, OVER)) return 'from';
  if (someIn(leads, UNDER)) return 'up-to';
  if (next === '+' || next === 'plus' || next === 'upwards') return 'from';
  if (['and', 'or'].includes(next)) {
    if (['above', 'up', 'over', 'more', 'higher', 'upwards', 'beyond'].includes(second))
      return 'from';
    if (['below', 'under', 'less', 'lower'].includes(second)) return 'up-to';
  }
  return leads.has('from') ? 'from' : 'point';
}

function isAbout(leads: ReadonlySet<string>, after: readonly string[]): boolean {
  const [next = '', second = ''] = after;
  const orSo = next === 'or' && (second === 'so' || second === 'thereabouts');
  const ish = next === 'ish' || (next === '-' && second === 'ish') || next === 'odd';
  return someIn(leads, ABOUT) || orSo || ish;
}

/** The second end of a range, and its item index: "650-720", "from 650 to 720", "between .. and". */
function rangeEnd(
  items: readonly Item[],
  index: number,
  burst: boolean,
  leads: ReadonlySet<string>,
): { end: Candidate; at: number } | null {
  const joint = wordAt(items, index + 1);
  if (!JOINTS.has(joint)) return null;
  if (joint === 'and' && !leads.has('between')) return null;
  let at = index + 2;
  if (['about', 'around', 'the'].includes(wordAt(items, at))) at += 1;
  const end = candidateAt(items, at, burst);
  return end === null ? null : { end, at };
}

/**
 * Decides which numbers are temperatures and what the words beside them make of each: a point, a
 * bound or a range. `burst` says that something blew up, where low numbers count.
 */
export function readTemperatures(
  items: readonly Item[],
  preferred: 'C' | 'F',
  burst: boolean,
): Item[] {
  const result: Item[] = [];
  for (let index = 0; index < items.length; index += 1) {
    const item = items[index];
    if (item === undefined) break;
    const candidate = candidateAt(items, index, burst) ?? lowEndAt(items, index);
    if (candidate === null || item.kind !== 'quantity') {
      result.push(item);
      continue;
    }
    const { words, directionItem } = leadsTo(items, index);
    const range = candidate.hundreds
      ? { end: { value: candidate.value + 99, unit: candidate.unit }, at: index }
      : rangeEnd(items, index, burst, words);
    const unit = unitOf(
      candidate.unit === null && range !== null
        ? { ...candidate, unit: range.end.unit }
        : candidate,
      preferred,
    );
    const named = candidate.unit ?? range?.end.unit ?? null;
    const tempUnit: TempUnit = named ?? 'guessed';
    const last = range?.at ?? index;
    const after = [wordAt(items, last + 1), wordAt(items, last + 2)];
    const celsius = celsiusOf(candidate.value, unit);
    const about = isAbout(words, after);
    const round = candidate.value % 50 === 0;
    const heat: Heat = {
      celsius,
      unit: tempUnit,
      toleranceC: about ? ABOUT_TOLERANCE : round ? ROUND_TOLERANCE : EXACT_TOLERANCE,
      bound: range === null ? boundOf(words, after) : 'range',
      directionItem: directionItem === null ? null : result.length - (index - directionItem),
      untilCelsius:
        range === null
          ? null
          : celsiusOf(
              range.end.value,
              unitOf(range.end.unit === null ? { ...range.end, unit } : range.end, preferred),
            ),
      happenedThere: someIn(words, HAPPENED),
      first: celsius,
    };
    const quantity: Quantity = { type: 'temperature', ...heat };
    const to = items[last]?.to ?? item.to;
    const merged: QuantityItem = {
      kind: 'quantity',
      quantity,
      text: item.text,
      from: item.from,
      to,
    };
    result.push(merged);
    index = last;
  }
  return result;
}

/** Sizes and times given as "20 by 30 cm" or "30 to 40 minutes": the bare number belongs to it. */
export function joinMeasures(items: readonly Item[]): Item[] {
  return items.map((item, index) => {
    if (item.kind !== 'quantity' || item.quantity.type !== 'bare') return item;
    if (!['-', 'to', 'or', 'x', 'by', '/', 'and'].includes(wordAt(items, index + 1))) return item;
    const next = items[index + 2];
    if (next?.kind !== 'quantity') return item;
    const { quantity } = next;
    if (quantity.type === 'minutes' || quantity.type === 'rate' || quantity.type === 'other') {
      return { ...item, quantity: { type: 'other', unit: quantity.type } };
    }
    if (quantity.type !== 'size') return item;
    const unitRatio = quantity.cm / Number(next.text || '1');
    return { ...item, quantity: { type: 'size', cm: Math.round(item.quantity.value * unitRatio) } };
  });
}
