import { z } from 'zod';
import {
  BURNER_KINDS,
  FLUE_PLACES,
  FUELS,
  OPENINGS,
  PROBES,
  SHAPES,
  WALLS,
} from '../vocabulary/kiln.ts';
import { choice, count, measure, optionalText, text } from './field-types.ts';

/** A kiln as described once; altered, it gets a new version and old notes keep the old one. */
export const kilnFieldsSchema = z.strictObject({
  name: text(60).refine((name) => name.trim() !== '', 'Give the kiln a name.'),
  opening: choice(OPENINGS),
  shape: choice(SHAPES),
  /** Round kilns. */
  insideDiameterMm: measure(100, 2000, 'mm'),
  /** Square kilns. */
  insideWidthMm: measure(100, 2000, 'mm'),
  insideDepthMm: measure(100, 2000, 'mm'),
  insideHeightMm: measure(100, 2000, 'mm'),
  wall: choice(WALLS),
  fibreThicknessMm: measure(6, 200, 'mm'),
  fibreDensityKgM3: measure(64, 240, 'kg/m³'),
  brickThicknessMm: measure(20, 400, 'mm'),
  lid: optionalText(120),
  flue: choice(FLUE_PLACES),
  flueOpeningMm: measure(10, 400, 'mm'),
  burnerPortMm: measure(10, 400, 'mm'),
  burnerKind: choice(BURNER_KINDS),
  jet: optionalText(40),
  nominalKw: measure(1, 200, 'kW'),
  burners: count(1, 12),
  fuel: z.enum(Object.keys(FUELS) as [keyof typeof FUELS, ...(keyof typeof FUELS)[]]),
  probe: choice(PROBES),
  timeZone: optionalText(60),
  about: optionalText(1000),
});
export type KilnFields = z.output<typeof kilnFieldsSchema>;
export type KilnFieldsInput = z.input<typeof kilnFieldsSchema>;

/**
 * Inside volume in litres from the inside measurements (mm): cylinder or box; null when a needed
 * one is blank.
 */
export function insideVolumeLitres(kiln: KilnFields): number | null {
  const { insideDiameterMm, insideWidthMm, insideDepthMm, insideHeightMm } = kiln;
  if (insideHeightMm == null || insideHeightMm <= 0) return null;
  if (kiln.shape === 'round' && insideDiameterMm != null) {
    return (Math.PI * (insideDiameterMm / 2) ** 2 * insideHeightMm) / 1e6;
  }
  if (kiln.shape === 'square' && insideWidthMm != null && insideDepthMm != null) {
    return (insideWidthMm * insideDepthMm * insideHeightMm) / 1e6;
  }
  return null;
}
