import { idsOf } from './terms.ts';

/**
 * What was done differently from the earlier firing of the same kiln. A change has a direction;
 * opposites are never pooled.
 */
export const CHANGES = {
  'gas-more': 'More gas',
  'gas-less': 'Less gas',
  'air-more': 'More primary air',
  'air-less': 'Less primary air',
  'jet-cleaned-or-changed': 'Jet cleaned or changed',
  'burner-bigger': 'Bigger burner',
  'burner-added': 'Another burner added',
  'burner-more-sweeping': 'Burner swept round the wall',
  'burner-straighter': 'Burner aimed straighter in',
  'setback-longer': 'Burner set further back',
  'setback-shorter': 'Burner set closer',
  'fuel-changed': 'Other fuel',
  'cylinder-bigger': 'Bigger cylinder',
  'flue-more-open': 'Flue more open',
  'flue-more-covered': 'Flue more covered',
  'leaks-sealed': 'Leaks sealed',
  'floor-insulated': 'Floor insulated',
  'lining-thicker': 'Thicker lining',
  'kiln-dried': 'Kiln dried out first',
  'wind-shelter': 'Wind shelter put up',
  'flame-path-cleared': 'Flame path cleared',
  'shelf-lighter': 'Lighter shelf',
  'shelf-raised': 'Shelf raised',
  'load-less': 'Less in the kiln',
  'load-more': 'More in the kiln',
  'ware-dried': 'Ware dried first',
  'ware-preheated': 'Ware preheated',
  'ware-off-the-shelf': 'Ware lifted off the shelf',
  'slower-start': 'Slower start',
  faster: 'Faster climb',
  'target-up': 'Higher target',
  'target-down': 'Lower target',
  'hold-longer': 'Longer hold',
  'hold-shorter': 'Shorter hold',
  'drawn-by-melt': 'Drawn by the melt',
  form: 'Other form',
  'wall-thickness': 'Other wall thickness',
  clay: 'Other clay body',
  'bisque-higher': 'Higher bisque',
  'bisque-lower': 'Lower bisque',
  glaze: 'Other glaze',
  'glaze-thicker': 'Thicker glaze',
  'glaze-thinner': 'Thinner glaze',
  'combustible-kind': 'Other combustible',
  'combustible-more': 'More combustible',
  'combustible-less': 'Less combustible',
  'combustible-drier': 'Drier combustible',
  'container-smaller': 'Smaller container',
  'container-bigger': 'Bigger container',
  'sealed-better': 'Sealed better',
  'covered-sooner': 'Covered sooner',
  'covered-later': 'Covered later',
  'covered-longer': 'Covered longer',
  'covered-shorter': 'Covered for less time',
  burped: 'Burped',
  'not-burped': 'Not burped',
  quenched: 'Quenched',
  'not-quenched': 'Not quenched',
  'probe-moved-or-replaced': 'Probe moved or replaced',
} as const;
export type Change = keyof typeof CHANGES;
export const CHANGE_IDS = idsOf(CHANGES);

/**
 * Changes that can hurt somebody when overdone: never suggested first, and never shown as advice
 * without this sentence beside them (shared/reference: cautions.md).
 */
export const CAUTIOUS_CHANGES: Readonly<Partial<Record<Change, string>>> = {
  'gas-more':
    'More gas than the air can burn makes carbon monoxide and a flame outside the kiln. Keep to the burner maker’s pressure; have the set-up checked by a licensed gas engineer.',
  'air-less':
    'Less air makes a richer flame and more carbon monoxide, which has no smell. Outdoors only.',
  'flue-more-covered':
    'A covered flue keeps gas and carbon monoxide in the kiln and can put the flame out. Never close it fully.',
  'burner-bigger':
    'A bigger burner needs a bigger port, flue and regulator. Have it checked by a licensed gas engineer.',
  'covered-sooner':
    'Hot ware on fresh combustible flares at once. Face back, gauntlets on, lid ready, hair tied.',
  quenched:
    'Water on hot ware makes steam and can break the pot in your hands. Lower it slowly, at arm’s length.',
};
