/** A combustible as it lies loose: litres, as far as the author gave them. */
export interface LooseCombustible {
  readonly litres?: number | null;
}

/**
 * Litres of loose combustible per litre of reduction container; null when the container's size or
 * the litres of any combustible are unknown, because a part of the sum would mislead.
 */
export function combustiblePerLitre(
  combustibles: readonly LooseCombustible[],
  containerLitres: number | null | undefined,
): number | null {
  if (containerLitres == null || !(containerLitres > 0)) return null;
  let litres = 0;
  for (const combustible of combustibles) {
    if (combustible.litres == null || !(combustible.litres >= 0)) return null;
    litres += combustible.litres;
  }
  return combustibles.length === 0 ? null : litres / containerLitres;
}
