import type { KilnDimensions } from './kiln-dimensions.ts';

export interface Spot {
  readonly x: number;
  readonly y: number;
}

/** The burner seen from above, mm from the middle of the kiln; the port is on the left (x < 0). */
export interface BurnerPlan {
  /** Where the burner's axis meets the outside of the wall. */
  readonly port: Spot;
  /** Unit vector of the flame. */
  readonly aim: Spot;
  readonly tip: Spot;
  /** Along the axis, from the outside of the wall to where the chamber begins. */
  readonly throughWallMm: number;
  /** Where the straight flame meets the far inside of the wall. */
  readonly meets: Spot;
}

/** Half the outside width and depth. */
export function outsideHalves(kiln: KilnDimensions) {
  const depth =
    kiln.shape === 'round' ? kiln.insideWidthMm : (kiln.insideDepthMm ?? kiln.insideWidthMm);
  return {
    width: kiln.insideWidthMm / 2 + kiln.wallMm,
    depth: depth / 2 + kiln.wallMm,
    insideWidth: kiln.insideWidthMm / 2,
    insideDepth: depth / 2,
  };
}

/**
 * Lays the burner out: 90° points at the middle; each degree less turns it toward the wall on its
 * right hand. Under 10° nothing would pass the port, so it is drawn at 10°.
 */
export function burnerPlan(kiln: KilnDimensions): BurnerPlan | null {
  if (!kiln.burner) return null;
  const halves = outsideHalves(kiln);
  const turn = ((90 - Math.min(90, Math.max(10, kiln.burner.angleDegrees))) * Math.PI) / 180;
  const aim = { x: Math.cos(turn), y: -Math.sin(turn) };
  const port = { x: -halves.width, y: 0 };
  const tip = {
    x: port.x - aim.x * kiln.burner.setbackMm,
    y: port.y - aim.y * kiln.burner.setbackMm,
  };
  const throughWallMm =
    kiln.shape === 'round'
      ? roundEntry(port, aim, halves.insideWidth)
      : (halves.width - halves.insideWidth) / aim.x;
  const reach =
    kiln.shape === 'round'
      ? roundReach(port, aim, halves.insideWidth)
      : boxReach(port, aim, halves);
  return {
    port,
    aim,
    tip,
    throughWallMm,
    meets: { x: port.x + aim.x * reach, y: port.y + aim.y * reach },
  };
}

/** Distance along the aim to the near side of the circle; to its nearest point if it misses. */
function roundEntry(from: Spot, aim: Spot, radius: number): number {
  const along = from.x * aim.x + from.y * aim.y;
  const rest = along * along - (from.x * from.x + from.y * from.y - radius * radius);
  return -along - Math.sqrt(Math.max(0, rest));
}

/** Distance along the aim to the far side of a circle about the middle; to the port if it misses. */
function roundReach(from: Spot, aim: Spot, radius: number): number {
  const along = from.x * aim.x + from.y * aim.y;
  const rest = along * along - (from.x * from.x + from.y * from.y - radius * radius);
  return rest <= 0 ? -along : -along + Math.sqrt(rest);
}

function boxReach(
  from: Spot,
  aim: Spot,
  halves: { insideWidth: number; insideDepth: number },
): number {
  const across = (halves.insideWidth - from.x) / aim.x;
  const aside = aim.y === 0 ? Infinity : (-halves.insideDepth - from.y) / aim.y;
  return Math.min(across, aside);
}
