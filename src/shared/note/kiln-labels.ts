import type { KilnFields } from './kiln-fields.ts';

/** The words beside each field of a kiln, on the form and the page. */
export const KILN_LABELS: Readonly<Record<keyof KilnFields, string>> = {
  name: 'Name',
  opening: 'Opening',
  shape: 'Shape',
  insideDiameterMm: 'Inside diameter',
  insideWidthMm: 'Inside width',
  insideDepthMm: 'Inside depth',
  insideHeightMm: 'Inside height',
  wall: 'Wall',
  fibreThicknessMm: 'Fibre thickness',
  fibreDensityKgM3: 'Fibre density',
  brickThicknessMm: 'Brick thickness',
  lid: 'Lid',
  flue: 'Flue',
  flueOpeningMm: 'Flue opening',
  burnerPortMm: 'Burner port',
  burnerKind: 'Burner',
  jet: 'Jet',
  nominalKw: 'Nominal power of a burner',
  burners: 'Burners',
  fuel: 'Fuel',
  probe: 'Probe',
  timeZone: 'Time zone',
  about: 'About it',
};
