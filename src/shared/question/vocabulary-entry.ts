import type { Change } from '../vocabulary/changes.ts';
import type { Fuel } from '../vocabulary/kiln.ts';
import type { Cause, Trouble } from '../vocabulary/troubles.ts';
import type { FormFamily } from '../vocabulary/ware.ts';
import type { ClayAsked, GlazeAsked } from './reading-types.ts';

/** What a phrase of the trade means. */
export type Meaning =
  | `trouble:${Trouble}`
  | `cause:${Cause}`
  | `form:${FormFamily}`
  | `glaze:${GlazeAsked}`
  | `change:${Change}`
  | `fuel:${Fuel}`
  | `clay:${ClayAsked}`
  /** A crack, whose trouble depends on where it happened. */
  | 'crack:plain'
  | 'crack:burst'
  | 'crack:dunt'
  /** Where a crack happened. */
  | 'place:firing'
  | 'place:after'
  /** A fast climb: a suspected cause beside a trouble, and otherwise what is wished for. */
  | 'fast'
  /** "took N hours": slow when N is an hour or more. */
  | 'took'
  /** The minutes are minutes of a hold. */
  | 'hold'
  /** Looks like a trouble and is none: a market stall, a sagging shelf. */
  | 'nothing';

/**
 * One line of the vocabulary. `says` are phrases in base forms ("crack" also matches "cracked"):
 *
 *     word      that word, in any inflection of it      a|b   either
 *     @class    any word of a class (word-classes.ts)   a?    may be left out
 *     (a)       must stand there, but may also mean something else
 *     ..        up to four other words                  #     a temperature
 *     #min      a length of time                        #step so many degrees up, down or out
 *     #diff     so many degrees between two places           #cone a cone
 *
 * Articles and the like may stand between the words of a phrase. The longest phrase wins.
 */
export interface VocabularyEntry {
  readonly means: readonly Meaning[];
  readonly says: readonly string[];
  /** Counts only when the question names no other trouble. */
  readonly weak?: boolean;
}
