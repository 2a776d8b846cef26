/** A kiln as it is drawn, millimetres and degrees. What is null is left out of the drawing. */
export interface KilnDimensions {
  readonly shape: 'round' | 'square';
  /** Inside diameter of a round kiln, inside width of a square one. */
  readonly insideWidthMm: number;
  /** Inside depth of a square kiln; the width where it is not given. */
  readonly insideDepthMm?: number | null;
  readonly insideHeightMm: number;
  readonly wall: 'fibre' | 'brick';
  readonly wallMm: number;
  readonly baseMm?: number | null;
  readonly lidMm?: number | null;
  readonly opening?: 'lid' | 'top-hat' | 'door' | null;
  readonly flue?: { readonly place: 'lid' | 'wall' | 'base'; readonly openingMm: number } | null;
  readonly port?: { readonly openingMm: number; readonly centreHeightMm?: number | null } | null;
  readonly burner?: {
    /** To the wall, seen from above: 90 is straight in, smaller sweeps round the wall. */
    readonly angleDegrees: number;
    /** From the outside of the wall to the tip; negative is inside the port. */
    readonly setbackMm: number;
    readonly count?: number | null;
  } | null;
  readonly shelf?: {
    readonly thicknessMm: number;
    readonly postsMm: number;
    /** Share of the floor it covers, 0–1. */
    readonly floorShare?: number | null;
  } | null;
  /** Height of what it stands on. */
  readonly standMm?: number | null;
}

/** Drawn where a thickness is not given: a base and a lid like the wall. */
export function drawnThicknesses(kiln: KilnDimensions) {
  return { baseMm: kiln.baseMm ?? kiln.wallMm, lidMm: kiln.lidMm ?? kiln.wallMm };
}

/** The text alternative of the drawing. */
export function kilnInWords(kiln: KilnDimensions): string {
  const depth = kiln.insideDepthMm ?? kiln.insideWidthMm;
  const inside =
    kiln.shape === 'round'
      ? `${kiln.insideWidthMm} mm across`
      : `${kiln.insideWidthMm} by ${depth} mm`;
  const parts = [
    `A ${kiln.shape} kiln, inside ${inside} and ${kiln.insideHeightMm} mm high`,
    `${kiln.wall === 'fibre' ? 'ceramic fibre' : 'brick'} wall of ${kiln.wallMm} mm`,
  ];
  if (kiln.flue) {
    const where = { lid: 'in the lid', wall: 'in the wall', base: 'at the base' }[kiln.flue.place];
    parts.push(`flue of ${kiln.flue.openingMm} mm ${where}`);
  }
  if (kiln.port) parts.push(`burner port of ${kiln.port.openingMm} mm`);
  if (kiln.burner) {
    const { angleDegrees, setbackMm, count } = kiln.burner;
    const many = count && count > 1 ? `${count} burners` : 'burner';
    const aim = angleDegrees >= 90 ? 'straight in' : `at ${angleDegrees}° to the wall`;
    const place =
      setbackMm < 0 ? `its tip ${-setbackMm} mm inside the port` : `set back ${setbackMm} mm`;
    parts.push(`${many} ${aim}, ${place}`);
  }
  if (kiln.shelf) {
    parts.push(`shelf of ${kiln.shelf.thicknessMm} mm on posts of ${kiln.shelf.postsMm} mm`);
  }
  if (kiln.standMm) parts.push(`on a stand of ${kiln.standMm} mm`);
  return `${parts.join('; ')}.`;
}
