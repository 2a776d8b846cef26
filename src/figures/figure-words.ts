import type { FigureGroup, TopicFigures } from '#shared/api/figure-topics.ts';
import { formatDuration, formatSeconds } from '#shared/units/duration.ts';
import { formatLength } from '#shared/units/length.ts';
import { formatMass } from '#shared/units/mass.ts';
import { formatNumber } from '#shared/units/number.ts';
import { formatRate, formatTemperature } from '#shared/units/temperature.ts';
import { NO_BREAK_SPACE, type Units } from '#shared/units/units.ts';
import { formatChamber } from '#shared/units/volume.ts';
import type { FigureQuantity, FigureTopic } from '#shared/vocabulary/figures.ts';

/** A number of a plot in the reader's unit. */
export function quantityWords(value: number, quantity: FigureQuantity, units: Units): string {
  switch (quantity) {
    case 'temperature':
      return formatTemperature(value, units.temperature);
    case 'rate':
      return formatRate(value, units.temperature);
    case 'length':
      return formatLength(value, units);
    case 'chamber':
      return formatChamber(value, units);
    case 'duration':
      return formatDuration(value);
    case 'seconds':
      return formatSeconds(value);
    case 'mass':
      return formatMass(value, units);
    case 'ratio':
      return formatNumber(value, 2);
  }
}

type GroupName = TopicFigures['groups'][number];

/** "Gentle, under 20 °C/min", "100 mm to 20 cm", "Brick": a range ends before its upper end. */
export function groupWords(
  { label, range }: GroupName,
  quantity: FigureQuantity | null,
  units: Units,
): string {
  if (range === null || quantity === null)
    return label.replace(/^./, (first) => first.toUpperCase());
  const say = (value: number): string => quantityWords(value, quantity, units);
  const { from, to } = range;
  const words =
    from === null
      ? to === null
        ? ''
        : `under ${say(to)}`
      : to === null
        ? `${say(from)} and over`
        : `${say(from)} to under ${say(to)}`;
  if (label !== '') return `${label}, ${words}`;
  return words.replace(/^./, (first) => first.toUpperCase());
}

/** What the cases of a topic are. */
const CASE_WORDS: Readonly<Record<FigureTopic, readonly [string, string]>> = {
  cracks: ['piece', 'pieces'],
  colour: ['piece', 'pieces'],
  'bare-clay': ['piece', 'pieces'],
  time: ['firing', 'firings'],
  hold: ['firing', 'firings'],
  peak: ['firing', 'firings'],
  stalls: ['stall', 'stalls'],
  gas: ['firing', 'firings'],
};

/** How a share of pieces came out: "cracked". */
export const OUTCOME_WORDS: Readonly<Partial<Record<FigureTopic, readonly [string, string]>>> = {
  cracks: ['cracked', 'not cracked'],
  colour: ['as hoped', 'not or only partly as hoped'],
  'bare-clay': ['black', 'patchy, grey or pale'],
};

const counted = (n: number, [one, many]: readonly [string, string]): string =>
  `${String(n)}${NO_BREAK_SPACE}${n === 1 ? one : many}`;

/** "12 firings by 4 members", with pieces or stalls before where they are others. */
export function countWords(
  topic: FigureTopic,
  { cases, firings, members }: Pick<FigureGroup, 'cases' | 'firings' | 'members'>,
): string {
  const what = CASE_WORDS[topic];
  const by = `${counted(firings, ['firing', 'firings'])} by ${counted(members, ['member', 'members'])}`;
  return what[0] === 'firing' ? by : `${counted(cases, what)}, ${by}`;
}

export const percentWords = (share: number): string =>
  `${formatNumber(share * 100)}${NO_BREAK_SPACE}%`;

/** "12 fewer in a hundred (from 30 fewer to 5 more)". */
export function differenceWords(difference: { share: number; low: number; high: number }): string {
  const say = (share: number): string =>
    `${formatNumber(Math.abs(share) * 100)} ${share < 0 ? 'fewer' : 'more'}`;
  return `${say(difference.share)} in a hundred; anything from ${say(difference.low)} to ${say(difference.high)} fits the counts`;
}
