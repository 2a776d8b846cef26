import { idsOf } from './terms.ts';

export const FORMS = {
  'flat-plate': 'Flat plate',
  platter: 'Platter',
  bowl: 'Bowl',
  cup: 'Cup',
  bottle: 'Bottle',
  pot: 'Pot',
  tile: 'Tile',
  box: 'Box',
  sculpture: 'Sculpture',
  'test-tile': 'Test tile',
  bead: 'Bead',
} as const;
export type Form = keyof typeof FORMS;
export const FORM_IDS = idsOf(FORMS);

/** Form families: what a question asks for, and what evidence about cracks is compared within. */
export const FORM_FAMILIES = {
  plate: 'Plates',
  bowl: 'Bowls',
  cup: 'Cups',
  bottle: 'Bottles',
  pot: 'Pots',
  tile: 'Tiles',
  box: 'Boxes',
  sculpture: 'Sculpture',
  bead: 'Beads',
} as const;
export type FormFamily = keyof typeof FORM_FAMILIES;
export const FORM_FAMILY_IDS = idsOf(FORM_FAMILIES);

export const FAMILY_OF_FORM: Readonly<Record<Form, FormFamily>> = {
  'flat-plate': 'plate',
  platter: 'plate',
  bowl: 'bowl',
  cup: 'cup',
  bottle: 'bottle',
  pot: 'pot',
  tile: 'tile',
  box: 'box',
  sculpture: 'sculpture',
  'test-tile': 'tile',
  bead: 'bead',
};

export const GLAZE_FAMILIES = {
  'copper-matt': 'Copper matt',
  lustre: 'Lustre',
  crackle: 'Crackle',
  clear: 'Clear',
  'coloured-gloss': 'Coloured gloss',
  none: 'No glaze',
} as const;
export type GlazeFamily = keyof typeof GLAZE_FAMILIES;
export const GLAZE_FAMILY_IDS = idsOf(GLAZE_FAMILIES);

/** How the ware lay in the kiln. */
export const LYING = { flat: 'Flat', 'on-points': 'On points', 'on-edge': 'On edge' } as const;
export const PREHEATING = {
  cold: 'Cold',
  'on-the-lid': 'Preheated on the lid',
  'at-the-flue': 'Preheated at the flue',
} as const;
export const DAMPNESS = { dry: 'Dry', damp: 'Damp' } as const;

/** The routes after the draw. */
export const ROUTES = {
  covered: 'Covered',
  'crackle-then-smoked': 'Crackle: cooled in air, then smoked',
  'slip-resist': 'Slip-resist: smoked, shell removed',
  horsehair: 'Horsehair, feather, sugar',
  dipped: 'Dipped (fermented batter or other)',
  saggar: 'Saggar or foil in the kiln',
  'sprayed-or-fumed': 'Sprayed or fumed',
  'air-only': 'Air only',
} as const;
export type Route = keyof typeof ROUTES;
export const ROUTE_IDS = idsOf(ROUTES);

export const CONTAINERS = {
  'steel-bin': 'Steel bin',
  'inverted-bucket': 'Inverted bucket',
  'inverted-can': 'Inverted can',
  pit: 'Pit',
  foil: 'Foil',
  open: 'Open',
} as const;
export const COMBUSTIBLES = {
  paper: 'Paper',
  sawdust: 'Sawdust',
  straw: 'Straw',
  hay: 'Hay',
  leaves: 'Leaves',
  'pine-needles': 'Pine needles',
  shavings: 'Shavings',
  other: 'Other',
} as const;
export const SEALS = {
  sand: 'Sand',
  'wet-cloth': 'Wet cloth',
  lid: 'Lid',
  fibre: 'Fibre',
  none: 'None',
} as const;
export const PLACEMENTS = {
  under: 'Under the ware',
  over: 'Over the ware',
  both: 'Under and over',
} as const;
export const AFTER_COVER = {
  cooled: 'Cooled',
  sprayed: 'Sprayed',
  quenched: 'Quenched in water',
} as const;

export const MELTS = {
  'under-fired': 'Under-fired',
  matured: 'Matured',
  'over-fired': 'Over-fired',
} as const;
export const COLOURS = { 'as-hoped': 'As hoped', partly: 'Partly', not: 'Not' } as const;
export const BARE_CLAY = {
  black: 'Black',
  patchy: 'Patchy',
  grey: 'Grey',
  pale: 'Pale',
  'not-applicable': 'Not applicable',
} as const;
export const SURFACE_FAULTS = {
  crawling: 'Crawling',
  blisters: 'Blisters',
  pinholes: 'Pinholes',
  runs: 'Runs',
  dull: 'Dull',
  'colour-lost': 'Colour lost again',
  scars: 'Scars',
} as const;

export const CRACK_PLACES = {
  base: 'Base',
  rim: 'Rim',
  wall: 'Wall',
  foot: 'Foot',
  handle: 'Handle',
  lid: 'Lid',
  'right-through': 'Right through',
  'fine-dunting': 'Fine dunting',
} as const;
export const CRACK_NOTICED = {
  'put-into-hot-kiln': 'Put into the hot kiln',
  'in-the-firing': 'In the firing',
  'at-the-draw': 'At the draw',
  'in-reduction': 'In reduction',
  'in-the-water': 'In the water',
  'after-cooling': 'After cooling',
  'days-later': 'Days later',
} as const;
export type CrackNoticed = keyof typeof CRACK_NOTICED;
/** A crack noticed at one of these times is a crack in the firing; else it came after the draw. */
export const CRACKED_IN_FIRING: readonly CrackNoticed[] = ['put-into-hot-kiln', 'in-the-firing'];
