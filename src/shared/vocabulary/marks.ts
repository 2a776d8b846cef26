import { idsOf } from './terms.ts';

/** What was done at the kiln, and when. `detail` says what its optional number or text means. */
export const MARKS = {
  lit: 'Lit',
  relit: 'Relit',
  'gas-up': 'Gas up',
  'gas-down': 'Gas down',
  'air-more': 'Air more',
  'air-less': 'Air less',
  'burner-moved': 'Burner moved',
  'flue-opened': 'Flue opened',
  'flue-closed': 'Flue closed',
  'lid-lifted': 'Lid lifted',
  loaded: 'Loaded',
  'cylinder-changed': 'Cylinder changed',
  'shelter-put-up': 'Shelter put up',
  'floor-changed': 'Floor changed',
  gust: 'Gust',
  rain: 'Rain',
  'cone-down': 'Cone down',
  'melt-seen': 'Melt seen',
  'shut-off': 'Shut off',
  drawn: 'Drawn',
  covered: 'Covered',
  burped: 'Burped',
  uncovered: 'Uncovered',
  quenched: 'Quenched',
} as const;
export type MarkKind = keyof typeof MARKS;
export const MARK_IDS = idsOf(MARKS);

/** Marks after which the fire is another one: a forecast of the levelling-off starts afresh. */
export const FIRE_CHANGING_MARKS: readonly MarkKind[] = [
  'lit',
  'relit',
  'gas-up',
  'gas-down',
  'air-more',
  'air-less',
  'burner-moved',
  'flue-opened',
  'flue-closed',
  'lid-lifted',
  'loaded',
  'cylinder-changed',
  'shelter-put-up',
  'floor-changed',
];

/** Marks that explain a fall of temperature by themselves: a fall soon after one is no sag. */
export const COOLING_MARKS: readonly MarkKind[] = [
  'gas-down',
  'flue-opened',
  'lid-lifted',
  'loaded',
];
