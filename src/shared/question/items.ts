import type { MinutesOf, MinutesOp, TempUnit } from './reading-types.ts';

/** The question after its numbers are read: words, quantities, and stops between clauses. */
export type Item = WordItem | QuantityItem | StopItem;

interface Place {
  readonly from: number;
  readonly to: number;
}
export interface WordItem extends Place {
  readonly kind: 'word';
  /** As typed in lower case, spelling mended. */
  readonly text: string;
  /** Its base form: "cracked" is "crack". */
  readonly lemma: string;
}
export interface StopItem extends Place {
  readonly kind: 'stop';
  /** A comma only ends a negation; other stops also end a phrase. */
  readonly text: string;
}
export interface QuantityItem extends Place {
  readonly kind: 'quantity';
  readonly quantity: Quantity;
  /** The number as typed, so that "one side" can still be read as words. */
  readonly text: string;
}
export type Quantity =
  /** A number with nothing to say what it counts. */
  | { readonly type: 'bare'; readonly value: number }
  /**
   * A number that is a temperature; `unit` null when only "degrees" was said. `hundreds` is "the
   * 700s": from 700 to 799.
   */
  | {
      readonly type: 'heat';
      readonly value: number;
      readonly unit: 'C' | 'F' | 'K' | null;
      readonly hundreds?: true;
    }
  | { readonly type: 'cone'; readonly cone: string }
  | { readonly type: 'minutes'; readonly minutes: number; op?: MinutesOp; of?: MinutesOf }
  | { readonly type: 'rate'; readonly ratePerMin: number }
  /** Degrees between two places, °C. */
  | { readonly type: 'difference'; readonly diffC: number }
  /** Degrees gained, lost or out by: no temperature. */
  | { readonly type: 'step' }
  | { readonly type: 'size'; readonly cm: number }
  | { readonly type: 'other'; readonly unit: string }
  | ({ readonly type: 'temperature' } & Heat);

/** A temperature with what the words beside it make of it. */
export interface Heat {
  readonly celsius: number;
  readonly unit: TempUnit;
  /** Half window in °C by the roundness of the number as typed and by "about". */
  readonly toleranceC: number;
  readonly bound: Bound;
  /** Item index of the direction word ("past", "above"), which a phrase may take for itself. */
  readonly directionItem: number | null;
  /** The second end, °C, of "650 to 720". */
  readonly untilCelsius: number | null;
  /** The words led to it with "at", "around" or the like: something happened there. */
  readonly happenedThere: boolean;
  /** Range written "from A to B": a fall, when the question is of a fall. */
  readonly first: number;
}
export type Bound = 'point' | 'from' | 'up-to' | 'just-under' | 'just-over' | 'range';
