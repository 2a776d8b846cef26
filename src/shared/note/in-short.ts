import { roundTo } from '../units/number.ts';
import { formatDifference, formatTemperature } from '../units/temperature.ts';
import type { Units } from '../units/units.ts';
import { CHANGES } from '../vocabulary/changes.ts';
import type { Change } from '../vocabulary/changes.ts';
import type { Form } from '../vocabulary/ware.ts';
import { listed } from './compare-fields.ts';
import type { Piece } from './pieces.ts';

/** What the three sentences are made of. Plain data, stored with a published note. */
export interface NoteSummary {
  readonly peakCelsius: number | null;
  readonly targetCelsius: number | null;
  /** Null when it cannot be told whether the firing came to its aim. */
  readonly reached: boolean | null;
  /** Level the time to temperature and the hold are about: the aim. */
  readonly aimCelsius: number | null;
  readonly timeToTemperatureMinutes: number | null;
  /** 0: none was kept; null: not known. */
  readonly holdMinutes: number | null;
  /** Stalls, in order; `atMinute` counts from the start of the firing. */
  readonly levels: readonly {
    readonly levelCelsius: number;
    readonly atMinute: number | null;
    readonly minutes: number;
  }[];
  readonly sags: readonly { readonly topCelsius: number; readonly dropCelsius: number }[];
  readonly pieces: readonly {
    readonly form: Form | null;
    readonly count: number;
    readonly whole: boolean | null;
    readonly melt: Piece['melt'];
    readonly crackPlace: Piece['cracks'][number]['place'];
    readonly cracked: boolean;
  }[];
  /** Changes since the earlier firing; null when there is none to compare with, or it is not known. */
  readonly changes: readonly Change[] | null;
}

const SMALL_NUMBERS = [
  'no',
  'one',
  'two',
  'three',
  'four',
  'five',
  'six',
  'seven',
  'eight',
  'nine',
  'ten',
  'eleven',
  'twelve',
] as const;
const numberWord = (count: number): string => SMALL_NUMBERS[count] ?? String(count);

const FORM_WORDS: Readonly<Record<Form, readonly [one: string, many: string]>> = {
  'flat-plate': ['plate', 'plates'],
  platter: ['platter', 'platters'],
  bowl: ['bowl', 'bowls'],
  cup: ['cup', 'cups'],
  bottle: ['bottle', 'bottles'],
  pot: ['pot', 'pots'],
  tile: ['tile', 'tiles'],
  box: ['box', 'boxes'],
  sculpture: ['sculpture', 'sculptures'],
  'test-tile': ['test tile', 'test tiles'],
  bead: ['bead', 'beads'],
};

const CRACK_WORDS: Readonly<Record<NonNullable<Piece['cracks'][number]['place']>, string>> = {
  base: 'cracked through the base',
  rim: 'cracked at the rim',
  wall: 'cracked in the wall',
  foot: 'cracked at the foot',
  handle: 'cracked at the handle',
  lid: 'cracked in the lid',
  'right-through': 'cracked right through',
  'fine-dunting': 'with fine dunting cracks',
};

/** Changes whose label is too short to stand in a sentence. */
const CHANGE_WORDS: Readonly<Partial<Record<Change, string>>> = {
  burped: 'bin burped',
  'not-burped': 'bin not burped',
  quenched: 'ware quenched',
  'not-quenched': 'ware not quenched',
  'drawn-by-melt': 'drawn by the melt',
  'sealed-better': 'bin sealed better',
  'covered-sooner': 'ware covered sooner',
  'covered-later': 'ware covered later',
  'covered-longer': 'ware covered longer',
  'covered-shorter': 'ware covered for less time',
};

const lowerFirst = (text: string): string => text.charAt(0).toLowerCase() + text.slice(1);
const sentence = (text: string): string => `${text.charAt(0).toUpperCase()}${text.slice(1)}.`;

/** Whole minutes, at least one: "17", and "1 minute" where the word is asked for. */
const wholeMinutes = (minutes: number): number => Math.max(1, roundTo(minutes));
function inMinutes(minutes: number): string {
  const whole = wholeMinutes(minutes);
  if (whole < 120) return whole === 1 ? '1 minute' : `${String(whole)} minutes`;
  const rest = whole % 60;
  const hours = `${String(Math.floor(whole / 60))} hours`;
  if (rest === 0) return hours;
  return `${hours} and ${rest === 1 ? '1 minute' : `${String(rest)} minutes`}`;
}
/** "for 17" after a time in minutes has been said, else "for 17 minutes". */
const forMinutes = (minutes: number, afterMinutes: boolean): string =>
  afterMinutes && wholeMinutes(minutes) < 120
    ? `for ${String(wholeMinutes(minutes))}`
    : `for ${inMinutes(minutes)}`;

function holdWords(holdMinutes: number | null, afterMinutes: boolean): string {
  if (holdMinutes === null) return '';
  return holdMinutes < 0.5
    ? ' and was not held'
    : ` and held there ${forMinutes(holdMinutes, afterMinutes)}`;
}

/** How the climb went: a stall is told before anything else, for it is what others look for. */
function climbSentence(summary: NoteSummary, { temperature }: Units): string {
  const { peakCelsius, aimCelsius, reached, timeToTemperatureMinutes, holdMinutes } = summary;
  const at = (celsius: number): string => formatTemperature(celsius, temperature);
  const longest = [...summary.levels].sort((a, b) => b.minutes - a.minutes)[0];
  const deepest = [...summary.sags].sort((a, b) => b.dropCelsius - a.dropCelsius)[0];
  const fell = deepest
    ? `, after falling back ${formatDifference(deepest.dropCelsius, temperature)} from ${at(deepest.topCelsius)}`
    : '';
  if (longest) {
    const { atMinute, levelCelsius, minutes } = longest;
    const time = atMinute === null ? '' : ` in ${inMinutes(atMinute)}`;
    const climbed = `climbed to ${at(levelCelsius)}${time}`;
    const stayed = `stayed there ${forMinutes(minutes, atMinute !== null)}`;
    if (reached === true && aimCelsius !== null) {
      const total =
        timeToTemperatureMinutes === null ? '' : ` after ${inMinutes(timeToTemperatureMinutes)}`;
      return sentence(`${climbed}, ${stayed}, and came to ${at(aimCelsius)}${total}`);
    }
    return sentence(`${climbed} and ${stayed}`);
  }
  const time =
    timeToTemperatureMinutes === null ? '' : ` in ${inMinutes(timeToTemperatureMinutes)}`;
  if (reached === true) {
    const level = aimCelsius ?? peakCelsius;
    const to = level === null ? 'came to temperature' : `came to ${at(level)}`;
    return sentence(`${to}${time}${holdWords(holdMinutes, time !== '')}${fell}`);
  }
  if (peakCelsius !== null) {
    const aim = aimCelsius ?? summary.targetCelsius;
    const short =
      reached === false && aim !== null && aim - peakCelsius >= 1
        ? `, ${formatDifference(aim - peakCelsius, temperature)} short of the aim`
        : '';
    return sentence(`climbed to ${at(peakCelsius)}${short}${fell}`);
  }
  return sentence(
    time === '' && holdMinutes === null
      ? 'fired by eye'
      : `fired by eye${time}${holdWords(holdMinutes, time !== '')}`,
  );
}

/** At most three changes are spelt out. */
const SPELT_OUT = 3;

function changeSentence({ changes }: NoteSummary): string {
  if (changes === null) return 'No change named.';
  if (changes.length === 0) return 'No change named since the firing before.';
  const words = changes.map((change) => CHANGE_WORDS[change] ?? lowerFirst(CHANGES[change]));
  const more = words.length - SPELT_OUT;
  const said =
    more > 1 ? [...words.slice(0, SPELT_OUT), `${numberWord(more)} more changes`] : words;
  return sentence(`${listed(said)} since the firing before`);
}

type PieceSummary = NoteSummary['pieces'][number];

function outcomeOf(piece: PieceSummary): string {
  if (piece.cracked) return piece.crackPlace === null ? 'cracked' : CRACK_WORDS[piece.crackPlace];
  const melt = piece.melt === 'under-fired' || piece.melt === 'over-fired' ? piece.melt : null;
  if (piece.whole === false) return 'not whole';
  if (piece.whole === null) return melt ?? 'with no result given';
  return melt === null ? 'whole' : `whole but ${melt}`;
}

function pieceSentence({ pieces }: NoteSummary): string {
  const counts = new Map<string, { piece: PieceSummary; count: number }>();
  for (const piece of pieces) {
    const count = Math.max(1, roundTo(piece.count));
    const key = `${piece.form ?? ''}|${outcomeOf(piece)}`;
    counts.set(key, { piece, count: (counts.get(key)?.count ?? 0) + count });
  }
  if (counts.size === 0) return 'No pieces named.';
  const parts = [...counts.values()].map(({ piece, count }) => {
    const [one, many] = piece.form === null ? ['piece', 'pieces'] : FORM_WORDS[piece.form];
    return `${numberWord(count)} ${count === 1 ? one : many} ${outcomeOf(piece)}`;
  });
  return sentence(parts.join(', '));
}

/**
 * A note in three sentences: the climb, the change, the ware. Always three, whatever is missing;
 * each begins with a capital and ends with one full stop.
 */
export function inShort(summary: NoteSummary, units: Units): string[] {
  return [climbSentence(summary, units), changeSentence(summary), pieceSentence(summary)];
}
