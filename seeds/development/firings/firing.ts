import type { NoteFieldsInput } from '#shared/note/note-fields.ts';
import type { Story } from '#shared/note/story.ts';
import type { Change } from '#shared/vocabulary/changes.ts';
import type { DrawnBecause } from '#shared/vocabulary/kiln.ts';
import type { NoteStatus } from '#shared/vocabulary/statuses.ts';
import type { Cause, Trouble } from '#shared/vocabulary/troubles.ts';
import type { CrackNoticed, Form, GlazeFamily, Route } from '#shared/vocabulary/ware.ts';
import type { CRACK_PLACES } from '#shared/vocabulary/ware.ts';
import type { Climb } from './climb.ts';

export type SetUpInput = NonNullable<NoteFieldsInput['setUp']>;
export type PieceInput = NonNullable<NoteFieldsInput['pieces']>[number];
export type RecipeInput = NonNullable<NoteFieldsInput['reduction']>;

/** A firing as its author would tell it; the fields and the record are made from this. */
export interface FiringTold {
  readonly key: string;
  readonly kiln: string;
  readonly author: string;
  readonly date: string;
  readonly time: string;
  /** Blank for notes that are not published. */
  readonly published?: string;
  readonly status?: NoteStatus;
  readonly title: string;
  readonly set: SetUpInput;
  readonly target: number;
  /** Aimed at by a cone; `target` is then its temperature as the pyrometer was watched. */
  readonly targetCone?: string;
  readonly because: DrawnBecause;
  readonly climb: Climb;
  readonly pieces: readonly Omit<PieceInput, 'key'>[];
  readonly smoke?: RecipeInput;
  readonly troubles?: readonly Trouble[];
  readonly causes?: readonly Cause[];
  readonly surprised?: string;
  readonly nextTime?: string;
  readonly changes?: readonly (readonly [Change, string])[];
  /** Key of the note whose change this firing tried. */
  readonly tried?: string;
  readonly unreported?: number;
  readonly typedIn?: 'C' | 'F';
  readonly story: Story;
  /** What the words say the record shows, for the test to hold them to it. */
  readonly says?: {
    readonly stallCelsius?: number;
    readonly sagFrom?: number;
    readonly sagTo?: number;
  };
  /** Declared peak, where the author read another instrument than the record's. */
  readonly peakDeclared?: number;
  readonly answers?: readonly { code: string; pointer: string; answer: string }[];
  readonly remarks?: readonly { pointer: string; text: string }[];
  readonly reason?: string;
}

type Glaze = readonly [name: string, family: GlazeFamily];
export const WHITE: Glaze = ['White crackle', 'crackle'];
export const CLEAR: Glaze = ['Clear frit', 'clear'];
export const TURQUOISE: Glaze = ['Turquoise gloss', 'coloured-gloss'];
export const COPPER: Glaze = ['Copper matt', 'copper-matt'];
export const LUSTRE: Glaze = ['Copper lustre', 'lustre'];
export const BARE: Glaze = ['', 'none'];

/** A row of pieces alike that came out well; `more` says what did not. */
export function piece(
  form: Form,
  count: number,
  spanMm: number,
  [glazeName, glazeFamily]: Glaze,
  more: Partial<PieceInput> = {},
): Omit<PieceInput, 'key'> {
  const isFlat = form === 'flat-plate' || form === 'platter' || form === 'tile';
  return {
    form,
    count,
    spanMm,
    wallMm: isFlat ? 9 : 6,
    clay: 'Groggy raku body',
    bisqueCelsius: 1000,
    glazeName,
    glazeFamily,
    dampness: 'dry',
    preheating: 'cold',
    lies: isFlat ? 'flat' : null,
    route: 'covered',
    melt: glazeFamily === 'none' ? null : 'matured',
    colour: 'as-hoped',
    bareClay: 'black',
    cracked: false,
    whole: true,
    ...more,
  };
}

/** Ware of a firing that never got there: nothing melted, nothing smoked. */
export const unmelted: Partial<PieceInput> = {
  melt: 'under-fired',
  colour: 'not',
  bareClay: 'not-applicable',
  route: 'air-only',
};

export function cracked(
  place: keyof typeof CRACK_PLACES,
  noticed: CrackNoticed,
): Partial<PieceInput> {
  return { cracked: true, cracks: [{ place, noticed }], whole: place === 'fine-dunting' };
}

export const route = (name: Route): Partial<PieceInput> => ({ route: name });

/** A covered reduction: container litres, what burned and how much, and how it was shut. */
export function smoked(
  containerLitres: number,
  kind: 'paper' | 'sawdust' | 'straw' | 'hay' | 'leaves' | 'pine-needles' | 'shavings',
  litres: number,
  more: Partial<RecipeInput> = {},
): RecipeInput {
  return {
    secondsInAir: 12,
    container: 'steel-bin',
    containerLitres,
    combustibles: [{ kind, litres, dampness: 'dry', placement: 'both' }],
    litByTheWare: true,
    seal: 'lid',
    burpedTimes: 0,
    minutesCovered: 25,
    then: 'cooled',
    ...more,
  };
}
