import { roundTo } from '../units/number.ts';
import { differenceFToC } from '../units/temperature.ts';
import { durationAt } from './durations.ts';
import type { Item, Quantity } from './items.ts';
import { lemmaOf } from './lemmas.ts';
import type { TypedNumber } from './number-words.ts';
import { numberAt } from './number-words.ts';
import type { Token } from './tokenise.ts';
import * as units from './unit-words.ts';

interface Found {
  readonly quantity: Quantity;
  readonly next: number;
}
type Tokens = readonly Token[];

/** Orton numbers run from 022 to 14: outside them a number after "cone" is something else. */
const MAX_CONE = 14;
const MAX_CONE_BELOW_ZERO = 22;
const CONE_MARKS: ReadonlySet<string> = new Set(['cone', 'cones', '^']);
/** Between a step verb and its number: "slid back 40 degrees". */
const STEP_LEADS: ReadonlySet<string> = new Set(
  'back down off away about around another nearly almost roughly some'.split(' '),
);
const HUNDREDS_LEADS: ReadonlySet<string> = new Set('the low mid middle high upper'.split(' '));
const STOPS: ReadonlySet<string> = new Set(['.', ',', ';', ':', '!', '?', '(', ')']);

function textAt(tokens: Tokens, index: number): string {
  return tokens[index]?.text ?? '';
}

function isCone(text: string): boolean {
  if (text.includes('.') || text.length > 3) return false;
  const value = Number(text);
  return text.startsWith('0') ? value >= 1 && value <= MAX_CONE_BELOW_ZERO : value <= MAX_CONE;
}

/** "cone 06", "^06", "c/06", "cone oh six", and a number that starts with a nought. */
function coneAt(tokens: Tokens, index: number): Found | null {
  let at = index;
  const word = textAt(tokens, at);
  if (CONE_MARKS.has(word)) at += 1;
  else if (word === 'c' && textAt(tokens, at + 1) === '/') at += 2;
  else if (word === 'c' && tokens[at + 1]?.glued === true && textAt(tokens, at + 1)[0] === '0') {
    at += 1;
  } else if (!(tokens[at]?.kind === 'number' && word.startsWith('0') && word.length > 1)) {
    return null;
  }
  const oh = ['o', 'oh', 'nought', 'zero'].includes(textAt(tokens, at));
  const number = numberAt(tokens, oh ? at + 1 : at);
  if (number === null) return null;
  const cone = oh ? `0${number.text}` : number.text;
  return isCone(cone) ? { quantity: { type: 'cone', cone }, next: number.next } : null;
}

/** Step over the hyphen of "12-inch" and "20-minute". */
function unitIndex(tokens: Tokens, index: number): number {
  const mark = tokens[index];
  const glued = mark?.text === '-' && mark.glued && tokens[index + 1]?.glued === true;
  return glued && tokens[index + 1]?.kind === 'word' ? index + 1 : index;
}

/** "a minute", "per min", "/h" after degrees: minutes in the unit, and what follows. */
function perTime(tokens: Tokens, index: number): { minutes: number; next: number } | null {
  const joint = textAt(tokens, index);
  if (!['a', 'an', 'per', '/', 'every', 'each'].includes(joint)) return null;
  const at = ['a', 'an'].includes(textAt(tokens, index + 1)) ? index + 2 : index + 1;
  const unit = textAt(tokens, at);
  if (units.MINUTE_WORDS.has(unit)) return { minutes: 1, next: at + 1 };
  if (units.HOUR_WORDS.has(unit)) return { minutes: 60, next: at + 1 };
  return joint === '/' && unit === 'm' ? { minutes: 1, next: at + 1 } : null;
}

/** Degrees in any dress: a temperature, a rate, a difference or a step. */
function heatAfter(tokens: Tokens, start: number, number: TypedNumber): Found | null {
  let at = unitIndex(tokens, number.next);
  const said = units.DEGREE_WORDS.has(textAt(tokens, at));
  while (units.DEGREE_WORDS.has(textAt(tokens, at))) at += 1;
  const unitWord = textAt(tokens, at);
  const named = Object.hasOwn(units.TEMPERATURE_UNITS, unitWord)
    ? units.TEMPERATURE_UNITS[unitWord]
    : undefined;
  if (named === undefined && !said) return null;
  if (named === 'K') {
    const inRange =
      number.value >= units.KELVIN_RANGE.min && number.value <= units.KELVIN_RANGE.max;
    if (!inRange || units.PROBE_NAME_WORDS.has(textAt(tokens, at + 1))) return null;
  }
  if (named !== undefined) at += 1;
  const per = perTime(tokens, at);
  const inC = named === 'F' ? differenceFToC(number.value) : number.value;
  if (per !== null) {
    const ratePerMin = roundTo(inC / per.minutes, 2);
    return { quantity: { type: 'rate', ratePerMin }, next: per.next };
  }
  if (number.value < units.MAX_STEP_DEGREES) {
    const near = [textAt(tokens, at), textAt(tokens, at + 1), textAt(tokens, at + 2)];
    const before = [textAt(tokens, start - 1), textAt(tokens, start - 2)];
    const differs =
      units.DIFFERENCE_WORDS.has(near[0] ?? '') ||
      (near[0] === 'of' && near[1] === 'difference') ||
      (before[0] === 'of' && units.DIFFERENCE_WORDS.has(before[1] ?? '')) ||
      (before[0] === 'by' && ['differ', 'differs', 'differed'].includes(before[1] ?? ''));
    if (differs) return { quantity: { type: 'difference', diffC: roundTo(inC) }, next: at };
    const verb = STEP_LEADS.has(before[0] ?? '') ? before[1] : before[0];
    if (units.OFFSET_WORDS.has(near[0] ?? '') || units.STEP_VERBS.has(verb ?? '')) {
      return { quantity: byPlaces(tokens, before, inC), next: at };
    }
  }
  return { quantity: { type: 'heat', value: number.value, unit: named ?? null }, next: at };
}

/** "The 700s", "the high 1200s"; "300s" by itself is seconds. */
function hundredsAfter(tokens: Tokens, start: number, number: TypedNumber): Found | null {
  const plural = tokens[number.next];
  const named = HUNDREDS_LEADS.has(textAt(tokens, start - 1));
  const round = number.value % 100 === 0 && number.value >= 300 && number.value <= 2300;
  if (plural?.text !== 's' || !plural.glued || !named || !round) return null;
  return {
    quantity: { type: 'heat', value: number.value, unit: null, hundreds: true },
    next: number.next + 1,
  };
}

/** "hotter than bottom BY 100 degrees" is a difference; "dropped BY 100 degrees" is a step. */
function byPlaces(tokens: Tokens, before: readonly string[], diffC: number): Quantity {
  const comparing = tokens.some((token) =>
    ['hotter', 'cooler', 'colder', 'warmer', 'lower', 'uneven', 'behind'].includes(token.text),
  );
  return before[0] === 'by' && comparing
    ? { type: 'difference', diffC: roundTo(diffC) }
    : { type: 'step' };
}

function sizeAfter(tokens: Tokens, number: TypedNumber): Found | null {
  const at = unitIndex(tokens, number.next);
  const unit = textAt(tokens, at);
  const factor = Object.hasOwn(units.SIZE_UNITS, unit) ? units.SIZE_UNITS[unit] : undefined;
  if (factor === undefined) return null;
  const glued = tokens[at]?.glued === true;
  if ((unit === '"' || unit === "'") && !glued) return null;
  // "12 in plate" is a size, "pot 12 in the kiln" is not.
  const next = textAt(tokens, at + 1);
  if (unit === 'in' && !glued && ['the', 'a', 'my', 'our', ''].includes(next)) return null;
  if (factor === 2.54 && number.value > units.MAX_INCHES) return null;
  if (factor === 30.48 && number.value > units.MAX_FEET) return null;
  const cm = number.value * factor;
  const notPiece = [next, textAt(tokens, at + 2)].some((word) => units.NOT_THE_PIECE.has(word));
  return notPiece
    ? { quantity: { type: 'other', unit }, next: at + 1 }
    : { quantity: { type: 'size', cm: roundTo(cm, cm < 10 ? 1 : 0) }, next: at + 1 };
}

/** Money, clock times, dates and the many units that say nothing here. */
function otherAfter(tokens: Tokens, start: number, number: TypedNumber): Found | null {
  const at = unitIndex(tokens, number.next);
  const unit = textAt(tokens, at);
  const other = (next: number): Found => ({ quantity: { type: 'other', unit }, next });
  if (units.CURRENCY.has(textAt(tokens, start - 1))) return other(number.next);
  if (unit === ':' && tokens[at + 1]?.kind === 'number') return other(at + 2);
  if (units.OTHER_UNITS.has(unit)) return other(at + 1);
  if (number.value <= 31 && units.MONTHS.has(unit)) return other(number.next);
  const isYear = number.value >= 1900 && number.value <= 2100;
  if (isYear && units.MONTHS.has(textAt(tokens, start - 1))) return other(number.next);
  if (isYear && ['in', 'since', 'last'].includes(textAt(tokens, start - 1))) {
    return other(number.next);
  }
  const slash = unit === '/' && tokens[at + 1]?.kind === 'number';
  if (slash && number.value <= 31) {
    const third = textAt(tokens, at + 2) === '/' && tokens[at + 3]?.kind === 'number';
    return other(third ? at + 4 : at + 2);
  }
  return null;
}

function quantityAt(tokens: Tokens, index: number): (Found & { text: string }) | null {
  const cone = coneAt(tokens, index);
  if (cone !== null) return { ...cone, text: '' };
  const duration = durationAt(tokens, index);
  if (duration !== null) {
    const { minutes, next } = duration;
    return { quantity: { type: 'minutes', minutes }, next, text: '' };
  }
  const number = numberAt(tokens, index);
  if (number === null) return null;
  const found =
    hundredsAfter(tokens, index, number) ??
    heatAfter(tokens, index, number) ??
    sizeAfter(tokens, number) ??
    otherAfter(tokens, index, number);
  if (found !== null) return { ...found, text: number.text };
  const text = number.inWords ? textAt(tokens, index) : number.text;
  return { quantity: { type: 'bare', value: number.value }, next: number.next, text };
}

/** Turns tokens into words, quantities and stops. Every token is looked at a fixed number of times. */
export function readItems(tokens: Tokens): Item[] {
  const items: Item[] = [];
  for (let index = 0; index < tokens.length;) {
    const token = tokens[index];
    if (token === undefined) break;
    const found = quantityAt(tokens, index);
    if (found !== null && found.next > index) {
      const to = tokens[found.next - 1]?.to ?? token.to;
      const { quantity, text } = found;
      items.push({ kind: 'quantity', quantity, text, from: token.from, to });
      index = found.next;
      continue;
    }
    const { text, from, to } = token;
    if (token.kind === 'word') items.push({ kind: 'word', text, lemma: lemmaOf(text), from, to });
    else if (STOPS.has(text)) items.push({ kind: 'stop', text, from, to });
    else if (
      text === '-' ||
      text === '/' ||
      text === '~' ||
      text === '+' ||
      text === '<' ||
      text === '>'
    ) {
      // Kept as words: they join ranges and say "about", and no phrase begins with one. The hyphen
      // inside a compound ("under-fired") joins nothing.
      const inside =
        text === '-' && tokens[index - 1]?.kind === 'word' && tokens[index + 1]?.kind === 'word';
      if (!inside) items.push({ kind: 'word', text, lemma: text, from, to });
    }
    index += 1;
  }
  return items;
}
