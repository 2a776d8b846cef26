import {
  FIGURE_CUTS,
  type FigureDimension,
  type FigureQuantity,
} from '#shared/vocabulary/figures.ts';
import { FUELS } from '#shared/vocabulary/kiln.ts';
import {
  COMBUSTIBLES,
  FORMS,
  GLAZE_FAMILIES,
  LYING,
  PREHEATING,
  ROUTES,
} from '#shared/vocabulary/ware.ts';
import type { FigureNumbers, FigurePiece } from './figure-numbers.ts';

export interface GroupName {
  readonly id: string;
  readonly label: string;
  readonly range: { readonly from: number | null; readonly to: number | null } | null;
}

const SEVERAL = 'several';
/** Fibre blankets come in these thicknesses, mm (common practice, no source). */
const THICK_FIBRE_MM = 50;

const termed = (terms: Readonly<Record<string, string>>): GroupName[] =>
  Object.entries(terms).map(([id, label]) => ({ id, label, range: null }));

const LININGS = {
  'fibre-thin': 'Ceramic fibre, thinner',
  'fibre-thick': 'Ceramic fibre, thicker',
  brick: 'Brick',
};
const QUENCHES = { quenched: 'Quenched in water', 'not-quenched': 'Not quenched' };

const NAMED: Readonly<Partial<Record<FigureDimension, readonly GroupName[]>>> = {
  form: termed(FORMS),
  lies: termed(LYING),
  preheating: termed(PREHEATING),
  quench: termed(QUENCHES),
  route: termed(ROUTES),
  combustible: termed({ ...COMBUSTIBLES, [SEVERAL]: 'More than one kind' }),
  lining: [
    { id: 'fibre-thin', label: LININGS['fibre-thin'], range: { from: null, to: THICK_FIBRE_MM } },
    { id: 'fibre-thick', label: LININGS['fibre-thick'], range: { from: THICK_FIBRE_MM, to: null } },
    { id: 'brick', label: LININGS.brick, range: null },
  ],
  fuel: termed(FUELS),
  glaze: termed({ ...GLAZE_FAMILIES, [SEVERAL]: 'More than one family' }),
};

const PACE = ['Gentle', 'Middling', 'Fast'];
const HAS_PACE: readonly FigureDimension[] = ['crossing', 'rate'];

function cutGroups(by: FigureDimension, cuts: readonly number[]): GroupName[] {
  return [null, ...cuts].map((from, at) => ({
    id: HAS_PACE.includes(by) ? (PACE[at] ?? '').toLowerCase() : `from-${String(from ?? 0)}`,
    label: HAS_PACE.includes(by) ? (PACE[at] ?? '') : '',
    range: { from, to: cuts[at] ?? null },
  }));
}

/** The groups of a dimension in their order; null where they are what people wrote. */
export function groupNames(by: FigureDimension): readonly GroupName[] | null {
  const cut = FIGURE_CUTS[by];
  return cut ? cutGroups(by, cut.cuts) : (NAMED[by] ?? null);
}

export function groupQuantity(by: FigureDimension): FigureQuantity | null {
  return by === 'lining' ? 'length' : (FIGURE_CUTS[by]?.quantity ?? null);
}

/** The number a case is grouped by; null where it is none or not told. */
export function dimensionNumber(
  by: FigureDimension,
  firing: FigureNumbers,
  piece: FigurePiece | null,
): number | null {
  switch (by) {
    case 'span':
      return piece?.spanMm ?? null;
    case 'wall-thickness':
      return piece?.wallMm ?? null;
    case 'rate':
      return firing.rate400To700;
    case 'crossing':
      return firing.crossingRatePerMinute;
    case 'bisque':
      return piece?.bisqueCelsius ?? null;
    case 'litres-per-litre':
      return piece?.litresPerLitre ?? null;
    case 'seconds-in-air':
      return piece?.secondsInAir ?? null;
    case 'volume':
      return firing.volumeLitres;
    default:
      return null;
  }
}

const oneOrSeveral = (ids: readonly string[]): string | null =>
  ids.length > 1 ? SEVERAL : (ids[0] ?? null);

function liningOf({ wall, liningMm }: FigureNumbers): string | null {
  if (wall === 'brick') return 'brick';
  if (wall !== 'fibre' || liningMm === null) return null;
  return liningMm < THICK_FIBRE_MM ? 'fibre-thin' : 'fibre-thick';
}

/** Clays are written freely: spelled alike but for case and spaces, they are one. */
export const clayKey = (clay: string): string =>
  clay.normalize('NFC').trim().replace(/\s+/g, ' ').toLowerCase();

/** The group a piece or a firing belongs to, one only; null where that is not told. */
export function groupOf(
  by: FigureDimension,
  firing: FigureNumbers,
  piece: FigurePiece | null,
): string | null {
  if (FIGURE_CUTS[by]) {
    const number = dimensionNumber(by, firing, piece);
    if (number === null) return null;
    const group = groupNames(by)?.find(({ range }) => range?.to == null || number < range.to);
    return group?.id ?? null;
  }
  switch (by) {
    case 'form':
    case 'lies':
    case 'preheating':
    case 'route':
      return piece?.[by] ?? null;
    case 'quench':
      return piece?.quenched == null ? null : piece.quenched ? 'quenched' : 'not-quenched';
    case 'clay':
      return clayKey(piece?.clay ?? '') || null;
    case 'combustible':
      return oneOrSeveral(piece?.combustibles ?? []);
    case 'glaze':
      return oneOrSeveral(firing.glazeFamilies);
    case 'lining':
      return liningOf(firing);
    case 'fuel':
      return firing.fuel;
    default:
      return null;
  }
}
