import type { Piece } from '#shared/note/pieces.ts';

export interface PieceProps {
  readonly piece: Piece;
  readonly index: number;
  readonly onPiece: (piece: Piece) => void;
}

/** Binds the members of a row of pieces to their fields. */
export function pieceField({ piece, index, onPiece }: PieceProps) {
  return <Name extends keyof Piece>(name: Name) => ({
    pointer: `/pieces/${String(index)}/${name}`,
    value: piece[name],
    onValue: (value: Piece[Name]) => onPiece({ ...piece, [name]: value }),
  });
}
