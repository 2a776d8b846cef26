import type { KilnFields } from '#shared/note/kiln-fields.ts';
import { KILN_RANGES, outOfRange } from '#shared/note/ranges.ts';
import type { KilnDimensions } from '../ui/kiln-dimensions.ts';

/** How thick a wall is drawn where nobody has said, mm; the page says that it was assumed. */
export const ASSUMED_WALL_MM = { fibre: 25, brick: 115 } as const;

export interface KilnDrawing {
  readonly dimensions: KilnDimensions;
  /** What was drawn without being said. */
  readonly assumed: readonly string[];
}

/** A description without the measures that cannot be: they would break the drawing. */
function withinRanges(fields: KilnFields): KilnFields {
  const blanked = outOfRange(fields, KILN_RANGES).map(({ pointer }) => [pointer.slice(1), null]);
  return { ...fields, ...(Object.fromEntries(blanked) as Partial<KilnFields>) };
}

/**
 * A kiln's description as it is drawn; null until shape, width and height are there. The burner's
 * angle belongs to a firing's set-up, so only its port is drawn.
 */
export function kilnDrawing(described: KilnFields): KilnDrawing | null {
  const fields = withinRanges(described);
  const { shape } = fields;
  if (shape === null) return null;
  const width = shape === 'round' ? fields.insideDiameterMm : fields.insideWidthMm;
  const height = fields.insideHeightMm;
  if (width === null || height === null) return null;
  const wall = fields.wall ?? 'fibre';
  const said = wall === 'brick' ? fields.brickThicknessMm : fields.fibreThicknessMm;
  const depth = shape === 'square' ? fields.insideDepthMm : null;
  // An opening wider than what it is cut into is no opening that can be drawn.
  const smaller = (opening: number | null, than: number): number | null =>
    opening !== null && opening < than ? opening : null;
  const flueMm = smaller(fields.flueOpeningMm, fields.flue === 'lid' ? width : height / 1.3);
  const portMm = smaller(fields.burnerPortMm, height / 1.5);
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
