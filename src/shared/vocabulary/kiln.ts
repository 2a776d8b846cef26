import { idsOf } from './terms.ts';

export const FUELS = {
  propane: 'Propane',
  butane: 'Butane',
  'mixed-lpg': 'Mixed LPG',
  'natural-gas': 'Natural gas',
  wood: 'Wood',
  electric: 'Electric',
} as const;
export type Fuel = keyof typeof FUELS;
export const FUEL_IDS = idsOf(FUELS);
/** Fuels burned as gas: the only ones for which a climb can be called slow. */
export const GAS_FUELS: readonly Fuel[] = ['propane', 'butane', 'mixed-lpg', 'natural-gas'];

export const OPENINGS = { lid: 'Lid', 'top-hat': 'Top hat', door: 'Door' } as const;
export const SHAPES = { round: 'Round', square: 'Square' } as const;
export const WALLS = { fibre: 'Ceramic fibre', brick: 'Brick' } as const;
export type Wall = keyof typeof WALLS;
export const FLUE_PLACES = { lid: 'In the lid', wall: 'In the wall', base: 'At the base' } as const;
export const BURNER_KINDS = {
  venturi: 'Venturi',
  torch: 'Hand torch',
  blown: 'Blown',
  none: 'None',
} as const;
export const PROBES = { K: 'K', N: 'N', S: 'S', R: 'R', none: 'None' } as const;
export type Probe = keyof typeof PROBES;

export const PRIMARY_AIR = { shut: 'Shut', part: 'Part open', open: 'Open' } as const;
export const FLAMES = {
  none: 'None',
  'short-clear': 'Short, clear',
  'short-yellow': 'Short, yellow',
  'short-smoky': 'Short, smoky',
  'long-clear': 'Long, clear',
  'long-yellow': 'Long, yellow',
  'long-smoky': 'Long, smoky',
} as const;
export const STANDS_ON = {
  'bare-ground': 'Bare ground',
  'hollow-block': 'Hollow block',
  'solid-block': 'Solid block',
  brick: 'Brick',
  'metal-stand': 'Metal stand',
} as const;
export const SHELF_KINDS = {
  cordierite: 'Cordierite',
  'silicon-carbide': 'Silicon carbide',
  fibre: 'Fibre board',
  brick: 'Brick',
  none: 'None',
} as const;
export const WIND_SHELTERS = {
  none: 'None',
  'one-side': 'One side',
  'both-sides': 'Both sides',
  'all-round': 'All round',
} as const;
export const WINDS = { calm: 'Calm', light: 'Light', gusty: 'Gusty', strong: 'Strong' } as const;
export const WEATHERS = { dry: 'Dry', damp: 'Damp', rain: 'Rain' } as const;
export const START_CLASSES = { cold: 'Cold (below 100 °C)', hot: 'Hot' } as const;
export type StartClass = keyof typeof START_CLASSES;
export const DRAWN_BECAUSE = {
  melt: 'Glaze seen melted',
  cone: 'Cone or draw ring',
  temperature: 'Temperature',
  time: 'Time',
  'gave-up': 'Gave up',
} as const;
export type DrawnBecause = keyof typeof DRAWN_BECAUSE;
