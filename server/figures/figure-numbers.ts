import type { CountedFacts } from '#shared/note/counted-facts.ts';
import type { FiringFacts, PieceFacts } from '#shared/note/facts.ts';
import type { NoteFields } from '#shared/note/note-fields.ts';
import type { GlazeFamily } from '#shared/vocabulary/ware.ts';

/** Raised when other numbers are kept, so that all published notes are read anew. */
export const FIGURE_NUMBERS_VERSION = 1;

/** A row of pieces as the plots see it; `count` pieces alike. */
export interface FigurePiece extends Pick<
  PieceFacts,
  | 'family'
  | 'form'
  | 'count'
  | 'spanMm'
  | 'wallMm'
  | 'clay'
  | 'glazeFamily'
  | 'lies'
  | 'preheating'
  | 'route'
  | 'colour'
  | 'bareClay'
  | 'quenched'
  | 'secondsInAir'
> {
  readonly bisqueCelsius: number | null;
  /** Null: not told. */
  readonly cracked: boolean | null;
  readonly combustibles: readonly string[];
  /** Combustible as poured ÷ container; null unless both are told. */
  readonly litresPerLitre: number | null;
}

/** What the plots read of one published firing: what its author disputes is not in it. */
export interface FigureNumbers extends Pick<
  FiringFacts,
  | 'startClass'
  | 'fuel'
  | 'volumeLitres'
  | 'wall'
  | 'liningMm'
  | 'peakCelsius'
  | 'timeToTemperatureMinutes'
  | 'holdMinutes'
  | 'crossingRatePerMinute'
  | 'rate400To700'
  | 'gasUsedKg'
> {
  readonly stallCelsius: readonly number[];
  /** Every stall of it is disputed. */
  readonly stallDisputed: boolean;
  readonly glazeFamilies: readonly GlazeFamily[];
  readonly pieces: readonly FigurePiece[];
}

function litresPerLitre({ combustibles, containerLitres }: PieceFacts): number | null {
  if (containerLitres === null || containerLitres <= 0 || combustibles.length === 0) return null;
  let litres = 0;
  for (const each of combustibles) {
    if (each.litres === null) return null;
    litres += each.litres;
  }
  return litres / containerLitres;
}

/** Reduces a published firing to what the plots read, from its counted facts. */
export function figureNumbers(
  fields: Pick<NoteFields, 'pieces'>,
  facts: CountedFacts,
): FigureNumbers {
  const families = facts.pieces.flatMap(({ glazeFamily }) => glazeFamily ?? []);
  return {
    startClass: facts.startClass,
    fuel: facts.fuel,
    volumeLitres: facts.volumeLitres,
    wall: facts.wall,
    liningMm: facts.liningMm,
    peakCelsius: facts.peakCelsius,
    timeToTemperatureMinutes: facts.timeToTemperatureMinutes,
    holdMinutes: facts.holdMinutes,
    crossingRatePerMinute: facts.crossingRatePerMinute,
    rate400To700: facts.rate400To700,
    gasUsedKg: facts.gasUsedKg,
    stallCelsius: facts.stalls.map(({ levelCelsius }) => levelCelsius),
    stallDisputed: facts.disputed.includes('stall'),
    glazeFamilies: [...new Set(families)],
    pieces: facts.pieces.map((piece, at) => ({
      family: piece.family,
      form: piece.form,
      count: piece.count,
      spanMm: piece.spanMm,
      wallMm: piece.wallMm,
      clay: piece.clay,
      glazeFamily: piece.glazeFamily,
      lies: piece.lies,
      preheating: piece.preheating,
      route: piece.route,
      colour: piece.colour,
      bareClay: piece.bareClay,
      quenched: piece.quenched,
      secondsInAir: piece.secondsInAir,
      bisqueCelsius: fields.pieces[at]?.bisqueCelsius ?? null,
      cracked: fields.pieces[at]?.cracked ?? null,
      combustibles: [...new Set(piece.combustibles.map(({ kind }) => kind))],
      litresPerLitre: litresPerLitre(piece),
    })),
  };
}
