import { METRIC_UNITS } from '../units/units.ts';
import type { Cause, Trouble } from '../vocabulary/troubles.ts';
import { readMinutes } from './asked-minutes.ts';
import { tellBottles } from './bottles.ts';
import { crackTroubles, isCrack } from './cracks.ts';
import type { Item, Quantity } from './items.ts';
import { leftWords } from './left-words.ts';
import { meaningsIn, nearestOf } from './meanings.ts';
import { mendTokens } from './mend.ts';
import { findNegated } from './negation.ts';
import { labelOf } from './part-labels.ts';
import type { Match } from './phrases.ts';
import { findPhrases, firstItem } from './phrases.ts';
import { readItems } from './quantities.ts';
import type { PartMeaning, QuestionPart, QuestionReading, ReadOptions } from './reading-types.ts';
import { joinMeasures, readTemperatures } from './temperatures.ts';
import { tokenise } from './tokenise.ts';
import { chooseTemperature } from './windows.ts';

/** Words after which a low bare number is where it burst. */
const BURST_WORDS: ReadonlySet<string> = new Set(
  'bang burst blow explode explosion pop steam shatter spall'.split(' '),
);
/** A burst below this is steam from clay that was not dry. */
const STEAM_BURST_MAX_CELSIUS = 350;
/** A climb at this many °C a minute or fewer, said without another trouble, is called slow. */
const SLOW_RATE_MAX = 12;
/** "took N" is a complaint from this many minutes: a small kiln is expected inside the hour. */
const LONG_FIRING_MINUTES = 60;

function quantities<T extends Quantity['type']>(
  items: readonly Item[],
  type: T,
): { index: number; quantity: Extract<Quantity, { type: T }> }[] {
  return items.flatMap((item, index) =>
    item.kind === 'quantity' && item.quantity.type === type
      ? [{ index, quantity: item.quantity as Extract<Quantity, { type: T }> }]
      : [],
  );
}

function itemsOf(text: string, preferred: 'C' | 'F'): Item[] {
  const items = joinMeasures(readItems(mendTokens(tokenise(text))));
  const burst = items.some((item) => item.kind === 'word' && BURST_WORDS.has(item.lemma));
  return tellBottles(readTemperatures(items, preferred, burst));
}

function unique<T>(values: readonly T[]): T[] {
  return [...new Set(values)];
}

/** Troubles in order: those said outright as they stand, then those a weaker word suggests. */
function troublesIn(matches: readonly Match[]): Trouble[] {
  const strong = matches.filter(({ weak }) => !weak);
  return unique(meaningsIn(strong, 'trouble'));
}

/** Where a trouble is first said, so that cracks keep their place among the others. */
function placeOf(matches: readonly Match[], trouble: Trouble): number {
  const crack = trouble === 'crack-in-firing' || trouble === 'crack-after-draw';
  return matches.findIndex((match) =>
    crack ? isCrack(match) : meaningsIn([match], 'trouble').includes(trouble),
  );
}

/** Reads a typed question. Pure, never throws, linear in the text (of which 600 characters count). */
export function readQuestion(text: string, options: ReadOptions = {}): QuestionReading {
  const items = itemsOf(text, options.preferredUnit ?? 'C');
  const matches = findPhrases(items);
  const negated = findNegated(items, matches);
  const said = matches.filter((match) => !negated.matches.has(match));
  const used = new Set<number>(negated.items);
  const parts: QuestionPart[] = [];
  const add = (key: string, meaning: PartMeaning, at: readonly number[]): void => {
    const places = at.flatMap((index) => (items[index] === undefined ? [] : [items[index]]));
    const from = Math.min(text.length, ...places.map((place) => place.from));
    const to = Math.max(from, ...places.map((place) => place.to));
    at.forEach((index) => used.add(index));
    parts.push({ key, label: labelOf(meaning, METRIC_UNITS), span: [from, to], ...meaning });
  };

  // What kind of trouble, and where.
  const cracks = said.filter(isCrack);
  const about = said.filter((match) => isCrack(match) || meaningsIn([match], 'trouble').length > 0);
  const anchor = about[0] === undefined ? null : firstItem(about[0]);
  const form = nearestOf(said, 'form', anchor);
  const glaze = nearestOf(said, 'glaze', anchor);
  const trouble = troublesIn(said);
  const heat = chooseTemperature(items, trouble, about.length > 0 ? about : said);
  if (cracks.length > 0) {
    const place = { form: form?.value ?? null, atTemperature: heat?.happenedThere === true };
    trouble.push(...crackTroubles(cracks, said, place));
    trouble.sort((a, b) => placeOf(about, a) - placeOf(about, b));
  }
  const took = said.find(({ means }) => means.includes('took'));
  const durations = quantities(items, 'minutes');
  const tookLong =
    took !== undefined &&
    durations.some(
      ({ index, quantity }) => took.seen.includes(index) && quantity.minutes >= LONG_FIRING_MINUTES,
    );
  const rate = quantities(items, 'rate')[0];
  const slowRate = rate !== undefined && rate.quantity.ratePerMin <= SLOW_RATE_MAX;
  const others = trouble.filter((kind) => kind !== 'slow-climb');
  const asksFaster = said.some(({ means }) => means.includes('change:faster'));
  if (
    !trouble.includes('slow-climb') &&
    others.length === 0 &&
    (tookLong || slowRate) &&
    !asksFaster
  ) {
    trouble.push('slow-climb');
  }
  // So many degrees between two places, and nothing else said, is a kiln that heats unevenly.
  if (trouble.length === 0 && cracks.length === 0 && quantities(items, 'difference').length > 0) {
    trouble.push('uneven-heat');
  }
  const causes: Cause[] = unique(
    said.flatMap((match) =>
      match.means.includes('fast') && (trouble.length > 0 || cracks.length > 0)
        ? (['fast-heating'] as const)
        : meaningsIn([match], 'cause'),
    ),
  );
  if (trouble.length === 0) {
    trouble.push(
      ...unique(
        meaningsIn(
          said.filter(({ weak }) => weak),
          'trouble',
        ),
      ),
    );
    if (trouble.length === 0 && causes.includes('tongs')) trouble.push('broken-in-handling');
  }
  const burst = cracks.some(({ means }) => means.includes('crack:burst'));
  const steam =
    burst && heat !== null && (heat.tempC ?? heat.tempMaxC ?? Infinity) <= STEAM_BURST_MAX_CELSIUS;
  if (steam && trouble.includes('crack-in-firing') && !causes.includes('damp-clay')) {
    causes.push('damp-clay');
  }
  const ruledOut = matches.filter((match) => negated.matches.has(match));
  const ruledOutCracks = ruledOut.filter(isCrack);
  const notTrouble = unique([
    ...meaningsIn(ruledOut, 'trouble'),
    ...(ruledOutCracks.length === 0
      ? []
      : crackTroubles(ruledOutCracks, matches, {
          form: form?.value ?? null,
          atTemperature: false,
        })),
  ]).filter((kind) => !trouble.includes(kind));

  // One part for each thing read, with the words it was read from.
  const itemsSaying = (from: readonly Match[], meaning: string): number[] =>
    from.flatMap((match) => (match.means.some((own) => own === meaning) ? match.taken : []));
  const crackItems = cracks.flatMap(({ taken }) => taken);
  const placeItems = said.flatMap(({ means, taken }) =>
    cracks.length > 0 && means.every((meaning) => meaning.startsWith('place:')) ? taken : [],
  );
  placeItems.forEach((index) => used.add(index));
  // The cylinder a frost is on says nothing more to a search by text.
  for (const { means, seen } of said) {
    if (means.includes('trouble:tank-chill')) seen.forEach((index) => used.add(index));
  }
  for (const value of trouble) {
    const own = itemsSaying(said, `trouble:${value}`);
    const isCrackKind = value === 'crack-in-firing' || value === 'crack-after-draw';
    const elsewhere = tookLong ? durations.map(({ index }) => index) : rate ? [rate.index] : [];
    const at = own.length > 0 ? own : isCrackKind ? crackItems : elsewhere;
    add(`trouble:${value}`, { kind: 'trouble', value }, at);
  }
  for (const value of notTrouble) {
    const own = itemsSaying(ruledOut, `trouble:${value}`);
    const at = own.length > 0 ? own : ruledOutCracks.flatMap(({ taken }) => taken);
    add(`not:${value}`, { kind: 'not-trouble', value }, at);
  }
  if (heat !== null) {
    const { tempC, toleranceC, tempMinC, tempMaxC } = heat;
    const value = { tempC, toleranceC, tempMinC, tempMaxC };
    add('temperature', { kind: 'temperature', value }, heat.items);
  }
  const cone = quantities(items, 'cone')[0];
  if (cone) add('cone', { kind: 'cone', value: cone.quantity.cone }, [cone.index]);
  const minutes = readMinutes(items, said, trouble.includes('slow-climb'));
  if (minutes !== null) {
    const { minutes: length, op, of, item } = minutes;
    add('minutes', { kind: 'minutes', value: { minutes: length, op, of } }, [item]);
    for (const { means, taken } of said) {
      const ofTime = means.includes('took') || (of === 'hold' && means.includes('hold'));
      if (ofTime) taken.forEach((index) => used.add(index));
    }
  }
  if (rate) add('rate', { kind: 'rate', value: rate.quantity.ratePerMin }, [rate.index]);
  const difference = quantities(items, 'difference')[0];
  if (difference) {
    const value = difference.quantity.diffC;
    add('difference', { kind: 'difference', value }, [difference.index]);
  }
  if (form !== null) add('form', { kind: 'form', value: form.value }, form.taken);
  const sizes = quantities(items, 'size');
  const sizeCm = sizes.length === 0 ? null : Math.max(...sizes.map(({ quantity }) => quantity.cm));
  if (sizeCm !== null)
    add(
      'size',
      { kind: 'size', value: sizeCm },
      sizes.map(({ index }) => index),
    );
  if (glaze !== null) add('glaze', { kind: 'glaze', value: glaze.value }, glaze.taken);
  for (const value of causes) {
    const own = itemsSaying(said, `cause:${value}`);
    add(`cause:${value}`, { kind: 'cause', value }, own.length > 0 ? own : crackItems);
  }
  const changes = unique(meaningsIn(said, 'change'));
  for (const value of changes) {
    add(`change:${value}`, { kind: 'change', value }, itemsSaying(said, `change:${value}`));
  }
  const fuel = nearestOf(said, 'fuel', anchor);
  const clay = nearestOf(said, 'clay', anchor);
  // A fuel or a clay is no filter: its word stays among the words searched as text.
  const { words, allWords } = leftWords(items, used);
  if (fuel !== null) add('fuel', { kind: 'fuel', value: fuel.value }, fuel.taken);
  if (clay !== null) add('clay', { kind: 'clay', value: clay.value }, clay.taken);

  return {
    q: text,
    trouble,
    notTrouble,
    tempC: heat?.tempC ?? null,
    toleranceC: heat?.toleranceC ?? null,
    tempMinC: heat?.tempMinC ?? null,
    tempMaxC: heat?.tempMaxC ?? null,
    tempUnit: heat?.tempUnit ?? null,
    cone: cone?.quantity.cone ?? null,
    minutes: minutes?.minutes ?? null,
    minutesOp: minutes?.op ?? null,
    ratePerMin: rate?.quantity.ratePerMin ?? null,
    diffC: difference?.quantity.diffC ?? null,
    form: form?.value ?? null,
    sizeCm,
    glaze: glaze?.value ?? null,
    causes,
    changes,
    fuel: fuel?.value ?? null,
    clay: clay?.value ?? null,
    words,
    allWords,
    parts: parts.sort((a, b) => a.span[0] - b.span[0]),
  };
}
