import type { Trouble } from '../vocabulary/troubles.ts';
import type { Heat, Item } from './items.ts';
import type { Match } from './phrases.ts';
import { lastItem } from './phrases.ts';
import type { TemperatureWindow, TempUnit } from './reading-types.ts';
import { JUST_BESIDE } from './temperatures.ts';
import { WORD_CLASSES } from './word-classes.ts';

export interface ChosenTemperature extends TemperatureWindow {
  readonly tempUnit: TempUnit;
  /** Items the window was read from. */
  readonly items: readonly number[];
  readonly happenedThere: boolean;
}

const DIRECTIONS: ReadonlySet<string> = new Set('past above over beyond up through'.split(' '));
/** "Fine until 850, then stalls": the trouble is there, and not below. */
const UNTIL: ReadonlySet<string> = new Set(['until', 'till', 'til']);
/** Troubles whose phrases take the direction for themselves. */
const DIRECTED: ReadonlySet<string> = new Set([
  'trouble:stall',
  'trouble:overshoot',
  'trouble:sag',
]);
const CANNOT: ReadonlySet<string> = new Set((WORD_CLASSES['cannot'] ?? '').split(' '));
/** Before a temperature: it is where the firing was to go, not where something happened. */
const AIMS: ReadonlySet<string> = new Set(
  'aim target aiming want wanted meant plan for goal need fire firing'.split(' '),
);
const AIM_PENALTY = 10;
const REACH_OF_CANNOT = 4;

interface Placed {
  readonly index: number;
  readonly heat: Heat;
}

function temperaturesOf(items: readonly Item[]): Placed[] {
  return items.flatMap((item, index) =>
    item.kind === 'quantity' && item.quantity.type === 'temperature'
      ? [{ index, heat: item.quantity }]
      : [],
  );
}

function textOf(items: readonly Item[], index: number): string {
  const item = items[index];
  return item?.kind === 'word' ? item.lemma : '';
}

/** How far a temperature stands from the trouble asked about. */
function farness(items: readonly Item[], { index }: Placed, troubles: readonly Match[]): number {
  const aimed = [1, 2, 3].some((back) => AIMS.has(textOf(items, index - back)));
  const gaps = troubles.flatMap(({ taken, seen }) =>
    [...taken, ...seen].map((at) => Math.abs(at - index)),
  );
  return Math.min(1000, ...gaps) + (aimed ? AIM_PENALTY : 0);
}

/** "won't get past 715", "shot past 1050": the number is where it happened, not a bound. */
function directedByPhrase(
  items: readonly Item[],
  index: number,
  troubles: readonly Match[],
): boolean {
  return troubles.some((match) => {
    if (!match.means.some((meaning) => DIRECTED.has(meaning))) return false;
    const near = index - lastItem(match);
    if (near < -1 || near > REACH_OF_CANNOT) return false;
    // Whatever ran past a temperature is sought there.
    if (match.means.includes('trouble:overshoot')) return true;
    return match.taken.some((at) => {
      const text = textOf(items, at);
      return (DIRECTIONS.has(text) && index - at <= 3) || CANNOT.has(text);
    });
  });
}

function windowOf(heat: Heat, point: boolean): TemperatureWindow {
  const { celsius, toleranceC, untilCelsius } = heat;
  const none = { tempC: null, toleranceC: null, tempMinC: null, tempMaxC: null };
  const bound = point && heat.bound !== 'range' ? 'point' : heat.bound;
  switch (bound) {
    case 'range': {
      const until = untilCelsius ?? celsius;
      return { ...none, tempMinC: Math.min(celsius, until), tempMaxC: Math.max(celsius, until) };
    }
    case 'from':
      return { ...none, tempMinC: celsius };
    case 'up-to':
      return { ...none, tempMaxC: celsius };
    case 'just-under':
      return { ...none, tempMinC: celsius - JUST_BESIDE, tempMaxC: celsius };
    case 'just-over':
      return { ...none, tempMinC: celsius, tempMaxC: celsius + JUST_BESIDE };
    case 'point':
      return { ...none, tempC: celsius, toleranceC };
  }
}

/**
 * The one temperature a question is about: of several, the one nearest the trouble. Of a fall, the
 * higher is the peak and both are the range.
 */
export function chooseTemperature(
  items: readonly Item[],
  troubles: readonly Trouble[],
  matches: readonly Match[],
): ChosenTemperature | null {
  const placed = temperaturesOf(items);
  const first = placed[0];
  if (first === undefined) return null;
  if (troubles.includes('sag')) {
    const second = placed[1];
    const ends = [first.heat.celsius, first.heat.untilCelsius ?? second?.heat.celsius ?? null];
    const known = ends.filter((end) => end !== null);
    const peak = Math.max(...known);
    const peakHeat =
      second !== undefined && second.heat.celsius === peak ? second.heat : first.heat;
    const fell = Math.min(...known) < peak;
    const items_ = fell && second !== undefined ? [first.index, second.index] : [first.index];
    const justBeside = peakHeat.bound.startsWith('just') && !fell;
    return {
      ...(justBeside
        ? windowOf(peakHeat, false)
        : {
            tempC: peak,
            toleranceC: peakHeat.toleranceC,
            tempMinC: fell ? Math.min(...known) : null,
            tempMaxC: fell ? peak : null,
          }),
      tempUnit: peakHeat.unit,
      items: items_,
      happenedThere: peakHeat.happenedThere,
    };
  }
  let chosen = first;
  let least = farness(items, first, matches);
  for (const other of placed.slice(1)) {
    const far = farness(items, other, matches);
    // Of two as near, a stall is at the lower: the higher is where it was to go.
    const isLevel =
      far === least && troubles.includes('stall') && other.heat.celsius < chosen.heat.celsius;
    if (far < least || isLevel) [chosen, least] = [other, far];
  }
  const { heat, index } = chosen;
  const until = heat.directionItem !== null && UNTIL.has(textOf(items, heat.directionItem));
  const point =
    !heat.bound.startsWith('just') &&
    (directedByPhrase(items, index, matches) || (until && troubles.length > 0));
  return {
    ...windowOf(heat, point),
    tempUnit: heat.unit,
    items: [index],
    happenedThere: heat.happenedThere || heat.bound !== 'point',
  };
}
