import type { Change } from '../vocabulary/changes.ts';
import type { Fuel } from '../vocabulary/kiln.ts';
import type { Cause, Trouble } from '../vocabulary/troubles.ts';
import type { FormFamily, GlazeFamily, Route } from '../vocabulary/ware.ts';

/**
 * What may be asked for under "glaze": a glaze family, bare clay, or one of the three routes after
 * the draw that people speak of as if they were glazes.
 */
export type GlazeAsked =
  | Exclude<GlazeFamily, 'none'>
  | 'bare-clay'
  | Extract<Route, 'slip-resist' | 'horsehair' | 'dipped'>;

export const GLAZES_ASKED: Readonly<Record<GlazeAsked, string>> = {
  'copper-matt': 'copper matt',
  lustre: 'lustre',
  crackle: 'crackle',
  clear: 'clear glaze',
  'coloured-gloss': 'coloured gloss',
  'bare-clay': 'bare clay',
  'slip-resist': 'slip-resist',
  horsehair: 'horsehair',
  dipped: 'dipped',
};

/** Clay bodies people name; a note's own clay is free text, so these only help the words. */
export const CLAYS_ASKED = {
  stoneware: 'stoneware',
  porcelain: 'porcelain',
  earthenware: 'earthenware',
  terracotta: 'terracotta',
  crank: 'crank',
  grogged: 'grogged clay',
  'paper-clay': 'paper clay',
  'raku-body': 'raku body',
} as const;
export type ClayAsked = keyof typeof CLAYS_ASKED;

/** How the unit of a temperature was known. */
export type TempUnit = 'C' | 'F' | 'K' | 'guessed';
export type MinutesOp = '=' | '<' | '>';
/** What the stated minutes are minutes of: the climb, a hold, or something else. */
export type MinutesOf = 'climb' | 'hold' | 'other';

/** One thing read from the question: shown as a chip, and can be switched off by its key. */
interface PartBase {
  /** Stable within a question; travels in the address as `off=`. */
  readonly key: string;
  /** Ready to show, in °C and metric; `labelOf` says it in a member's units. */
  readonly label: string;
  /** Where it stands in the typed text: from (included) to (excluded). */
  readonly span: readonly [from: number, to: number];
}
export type PartMeaning =
  | { readonly kind: 'trouble'; readonly value: Trouble }
  | { readonly kind: 'not-trouble'; readonly value: Trouble }
  | { readonly kind: 'temperature'; readonly value: TemperatureWindow }
  | { readonly kind: 'cone'; readonly value: string }
  | { readonly kind: 'minutes'; readonly value: MinutesAsked }
  | { readonly kind: 'rate'; readonly value: number }
  | { readonly kind: 'difference'; readonly value: number }
  | { readonly kind: 'form'; readonly value: FormFamily }
  | { readonly kind: 'size'; readonly value: number }
  | { readonly kind: 'glaze'; readonly value: GlazeAsked }
  | { readonly kind: 'cause'; readonly value: Cause }
  | { readonly kind: 'change'; readonly value: Change }
  | { readonly kind: 'fuel'; readonly value: Fuel }
  | { readonly kind: 'clay'; readonly value: ClayAsked };
export type QuestionPart = PartBase & PartMeaning;

/** °C. A centre with half a window, a range with one or both ends, or (a fall) both. */
export interface TemperatureWindow {
  readonly tempC: number | null;
  readonly toleranceC: number | null;
  readonly tempMinC: number | null;
  readonly tempMaxC: number | null;
}
export interface MinutesAsked {
  readonly minutes: number;
  readonly op: MinutesOp;
  readonly of: MinutesOf;
}

/** What a typed question was understood to ask. Absent parts are null or empty. */
export interface QuestionReading extends TemperatureWindow {
  /** The text as typed. */
  readonly q: string;
  /** Kinds asked about, surest first. */
  readonly trouble: readonly Trouble[];
  /** Kinds the asker rules out. */
  readonly notTrouble: readonly Trouble[];
  readonly tempUnit: TempUnit | null;
  /** As typed ("06", "010", "1"); never a temperature. */
  readonly cone: string | null;
  readonly minutes: number | null;
  readonly minutesOp: MinutesOp | null;
  /** °C a minute. */
  readonly ratePerMin: number | null;
  /** °C between two places. */
  readonly diffC: number | null;
  readonly form: FormFamily | null;
  /** Largest stated size of the piece. */
  readonly sizeCm: number | null;
  readonly glaze: GlazeAsked | null;
  readonly causes: readonly Cause[];
  readonly changes: readonly Change[];
  readonly fuel: Fuel | null;
  readonly clay: ClayAsked | null;
  /** What is left to search as text. */
  readonly words: string;
  /** The whole question less units, numbers and words that carry nothing. */
  readonly allWords: string;
  readonly parts: readonly QuestionPart[];
}

export interface ReadOptions {
  /** The unit of a bare number from 300 to 1150. °C unless the asker's setting says °F. */
  readonly preferredUnit?: 'C' | 'F';
}
