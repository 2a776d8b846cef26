import { idsOf } from './terms.ts';

/** What went wrong, from one list. The order is the order of every menu and rail. */
export const TROUBLES = {
  stall: 'Levelled off below target',
  sag: 'Fell back',
  'slow-climb': 'Slow climb',
  overshoot: 'Overshot',
  'uneven-heat': 'Uneven heat',
  'flame-out': 'Flame went out',
  'burn-back': 'Flame burnt back in the tube',
  'tank-chill': 'Cylinder too cold',
  'wrong-reading': 'Pyrometer read wrongly',
  'crack-in-firing': 'Cracked or burst in the firing',
  'crack-after-draw': 'Cracked after the draw',
  'dull-glaze': 'Dull, under-fired glaze',
  'weak-reduction': 'Weak reduction',
  crawling: 'Glaze crawled',
  blistering: 'Blisters or pinholes',
  'stuck-to-shelf': 'Stuck to the shelf',
  'broken-in-handling': 'Broken in handling',
} as const;
export type Trouble = keyof typeof TROUBLES;
export const TROUBLE_IDS = idsOf(TROUBLES);

/** Short words for chips, strips and tables. */
export const TROUBLE_SHORT: Readonly<Record<Trouble, string>> = {
  stall: 'stall',
  sag: 'sag',
  'slow-climb': 'slow climb',
  overshoot: 'overshoot',
  'uneven-heat': 'uneven heat',
  'flame-out': 'flame out',
  'burn-back': 'burn-back',
  'tank-chill': 'cold cylinder',
  'wrong-reading': 'wrong reading',
  'crack-in-firing': 'crack in firing',
  'crack-after-draw': 'crack after draw',
  'dull-glaze': 'dull glaze',
  'weak-reduction': 'weak reduction',
  crawling: 'crawling',
  blistering: 'blistering',
  'stuck-to-shelf': 'stuck to shelf',
  'broken-in-handling': 'broken in handling',
};

/** Troubles the server can find in a temperature record by itself. */
export const MEASURED_TROUBLES = [
  'stall',
  'sag',
  'slow-climb',
  'overshoot',
  'uneven-heat',
] as const;
export type MeasuredTrouble = (typeof MEASURED_TROUBLES)[number];

/** Suspected causes an author may tick and a question may name. */
export const CAUSES = {
  wind: 'Wind',
  rain: 'Rain',
  'cold-weather': 'Cold weather',
  'damp-clay': 'Damp clay',
  'fast-heating': 'Heated too fast',
  'thick-base': 'Thick base',
  'low-gas': 'Too little gas',
  'cold-bottle': 'Cold cylinder',
  'small-jet': 'Jet too small',
  'blocked-jet': 'Blocked jet',
  'too-much-air': 'Too much air',
  'rich-flame': 'Flame too rich',
  damper: 'Flue or damper',
  'lid-gap': 'Gap at the lid',
  packing: 'How it was packed',
  'uneven-load': 'Uneven load',
  'cold-shelf': 'Cold shelf or floor',
  'damp-kiln': 'Damp kiln',
  'pot-in-the-flame': 'Pot in the flame',
  probe: 'Probe',
  'wrong-reading': 'Wrong reading',
  'early-draw': 'Drawn too early',
  'late-draw': 'Drawn too late',
  'smoke-material': 'Smoke material',
  'slow-to-bin': 'Slow to the bin',
  quench: 'Quench',
  'quick-cooling-in-wind': 'Quick cooling in wind',
  'thick-glaze': 'Glaze too thick',
  'dirty-pot': 'Dust or grease on the pot',
  tongs: 'Tongs',
} as const;
export type Cause = keyof typeof CAUSES;
export const CAUSE_IDS = idsOf(CAUSES);
