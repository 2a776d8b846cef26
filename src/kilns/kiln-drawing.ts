import type { KilnFields } from '#shared/note/kiln-fields.ts';
import type { KilnDimensions } from '../ui/kiln-dimensions.ts';

/** How thick a wall is drawn where nobody has said, mm; the page says that it was assumed. */
export const ASSUMED_WALL_MM = { fibre: 25, brick: 115 } as const;

export interface KilnDrawing {
  readonly dimensions: KilnDimensions;
  /** What was drawn without being said. */
  readonly assumed: readonly string[];
}

const positive = (value: number | null): number | null =>
  value !== null && value > 0 ? value : null;

/**
 * A kiln's description as it is drawn; null until shape, width and height are there. The burner's
 * angle belongs to a firing's set-up, so only its port is drawn.
 */
export function kilnDrawing(fields: KilnFields): KilnDrawing | null {
  const { shape } = fields;
  if (shape === null) return null;
  const width = positive(shape === 'round' ? fields.insideDiameterMm : fields.insideWidthMm);
  const height = positive(fields.insideHeightMm);
  if (width === null || height === null) return null;
  const wall = fields.wall ?? 'fibre';
  const said = positive(wall === 'brick' ? fields.brickThicknessMm : fields.fibreThicknessMm);
  const depth = shape === 'square' ? positive(fields.insideDepthMm) : null;
  const flueMm = positive(fields.flueOpeningMm);
  const portMm = positive(fields.burnerPortMm);
  const wallMm = said ?? ASSUMED_WALL_MM[wall];
  const wallWords = wall === 'brick' ? 'a brick wall' : 'a fibre wall';
  return {
    dimensions: {
      shape,
      insideWidthMm: width,
      insideDepthMm: depth,
      insideHeightMm: height,
      wall,
      wallMm,
      opening: fields.opening,
      flue:
        fields.flue !== null && flueMm !== null ? { place: fields.flue, openingMm: flueMm } : null,
      port: portMm === null ? null : { openingMm: portMm },
    },
    assumed: [
      ...(said === null ? [`${wallWords} of ${String(wallMm)}\u00a0mm`] : []),
      ...(shape === 'square' && depth === null ? ['a depth like the width'] : []),
    ],
  };
}
