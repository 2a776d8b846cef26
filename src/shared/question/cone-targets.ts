/**
 * What a cone roughly stands for as a target, °C. A cone records heat work, not temperature: raku
 * climbs far faster than the charts assume, so these only steer a search. 012, 010, 08: self-supporting
 * cones at 60 °C/h, maker's chart (Orton), to the nearest few degrees. 06, 04, 02: from memory of the
 * same chart. Other numbers have no target here.
 */
const CONE_TARGETS: Readonly<Record<string, number>> = {
  '012': 860,
  '010': 900,
  '08': 942,
  '06': 998,
  '04': 1062,
  '02': 1101,
};
/** Half window around a cone's rough target, °C. */
export const CONE_TOLERANCE = 15;

/** °C a cone is aimed at, or null where no rough target is known. */
export function coneTargetCelsius(cone: string): number | null {
  return Object.hasOwn(CONE_TARGETS, cone) ? (CONE_TARGETS[cone] ?? null) : null;
}
