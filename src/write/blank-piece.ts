import { pieceSchema, recipeSchema, type Piece, type Recipe } from '#shared/note/pieces.ts';
import type { Route } from '#shared/vocabulary/ware.ts';

const newKey = (): string => crypto.randomUUID();

/** A row of one piece of which nothing is said yet. */
export function blankPiece(): Piece {
  return pieceSchema.parse({ key: newKey(), count: 1 });
}

/** The same piece once more, as a row of its own. */
export function copyOfPiece(piece: Piece): Piece {
  return { ...piece, key: newKey(), cracks: [...piece.cracks], faults: [...piece.faults] };
}

export function blankRecipe(): Recipe {
  return recipeSchema.parse({});
}

/** Routes in which the ware goes into a container with something to burn. */
const COVERING: readonly Route[] = ['covered', 'crackle-then-smoked', 'slip-resist'];

export function isCovering(route: Route | null): boolean {
  return route !== null && COVERING.includes(route);
}
