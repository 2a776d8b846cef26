import { TROUBLE_IDS } from '../vocabulary/troubles.ts';
import type { Trouble } from '../vocabulary/troubles.ts';
import { CRACKED_IN_FIRING } from '../vocabulary/ware.ts';
import type { Route } from '../vocabulary/ware.ts';
import type { NoteFields } from './note-fields.ts';
import type { Piece } from './pieces.ts';

type Crack = Piece['cracks'][number];

export const isCrackInFiring = ({ noticed }: Crack): boolean =>
  noticed !== null && CRACKED_IN_FIRING.includes(noticed);
/** A crack whose time nobody noted is neither in the firing nor after the draw. */
export const isCrackAfterDraw = ({ noticed }: Crack): boolean =>
  noticed !== null && !CRACKED_IN_FIRING.includes(noticed);

/** Routes in which bare clay is meant to turn black and a lustre to keep its colour. */
const SMOKED_ROUTES: readonly Route[] = ['covered', 'crackle-then-smoked'];

/** What a row of pieces says of troubles by itself; only what is certain. */
export function pieceTroubles(piece: Piece): Trouble[] {
  const { cracks, cracked, melt, faults, route, bareClay, colour } = piece;
  const troubles: Trouble[] = [];
  if (cracked !== false && cracks.some(isCrackInFiring)) troubles.push('crack-in-firing');
  if (cracked !== false && cracks.some(isCrackAfterDraw)) troubles.push('crack-after-draw');
  if (melt === 'under-fired' || faults.includes('dull')) troubles.push('dull-glaze');
  const unsmoked = bareClay !== null && ['patchy', 'grey', 'pale'].includes(bareClay);
  // A colour not as hoped can come of the firing too; of matured ware, covered, it is the smoke's.
  const colourLost =
    faults.includes('colour-lost') ||
    (route === 'covered' && colour === 'not' && melt === 'matured');
  if (route !== null && SMOKED_ROUTES.includes(route) && (unsmoked || colourLost)) {
    troubles.push('weak-reduction');
  }
  if (faults.includes('crawling')) troubles.push('crawling');
  if (faults.includes('blisters') || faults.includes('pinholes')) troubles.push('blistering');
  return troubles;
}

/** The troubles an author named: those ticked, and those the rows of pieces say. List order. */
export function namedTroubles(fields: NoteFields): Trouble[] {
  const named = new Set<Trouble>([
    ...fields.result.troubles,
    ...fields.pieces.flatMap(pieceTroubles),
  ]);
  return TROUBLE_IDS.filter((trouble) => named.has(trouble));
}

export interface PieceCounts {
  readonly pieces: number;
  readonly whole: number;
  readonly cracked: number;
  readonly crackedInFiring: number;
  readonly crackedAfterDraw: number;
}

/** Pieces, not rows: a row of three cracked cups is three. A row without a number counts as one. */
export function countPieces(fields: NoteFields): PieceCounts {
  const sumOf = (matches: (piece: Piece) => boolean): number =>
    fields.pieces.reduce((sum, piece) => sum + (matches(piece) ? (piece.count ?? 1) : 0), 0);
  const cracked = (piece: Piece): boolean => piece.cracked === true;
  return {
    pieces: sumOf(() => true),
    whole: sumOf(({ whole }) => whole === true),
    cracked: sumOf(cracked),
    crackedInFiring: sumOf((piece) => cracked(piece) && piece.cracks.some(isCrackInFiring)),
    crackedAfterDraw: sumOf((piece) => cracked(piece) && piece.cracks.some(isCrackAfterDraw)),
  };
}
