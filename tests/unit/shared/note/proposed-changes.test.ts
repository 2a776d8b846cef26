import { describe, expect, it } from 'vitest';
import type { KilnFields } from '#shared/note/kiln-fields.ts';
import type { NoteFields } from '#shared/note/note-fields.ts';
import type { Recipe } from '#shared/note/pieces.ts';
import { NOT_PROPOSED, proposeChanges } from '#shared/note/proposed-changes.ts';
import { coneOrder } from '#shared/note/ware-changes.ts';
import { CHANGE_IDS } from '#shared/vocabulary/changes.ts';
import type { Change } from '#shared/vocabulary/changes.ts';
import { aKiln, aNote, aPiece } from './a-note.ts';

interface Side {
  readonly setUp?: Partial<NoteFields['setUp']>;
  readonly plan?: Partial<NoteFields['plan']>;
  readonly piece?: Parameters<typeof aPiece>[0];
  readonly reduction?: Partial<Recipe>;
  readonly kiln?: Partial<KilnFields>;
}
const sideOf = (side: Side) => ({
  fields: aNote((fields) => {
    Object.assign(fields.setUp, side.setUp);
    Object.assign(fields.plan, side.plan);
    Object.assign(fields.reduction, side.reduction);
    fields.pieces = [aPiece(side.piece)];
  }),
  kiln: aKiln(side.kiln),
});
const proposed = (before: Side, now: Side) => proposeChanges(sideOf(before), sideOf(now));

const sawdust = (over: Partial<Recipe['combustibles'][number]> = {}) => ({
  kind: 'sawdust' as const,
  other: '',
  litres: 4,
  dampness: 'dry' as const,
  placement: 'under' as const,
  ...over,
});

const CASES: [Change, Side, Side, string][] = [
  ['gas-more', { setUp: { regulatorBar: 0.5 } }, { setUp: { regulatorBar: 0.8 } }, '0.8 bar'],
  ['gas-less', { setUp: { regulatorBar: 0.8 } }, { setUp: { regulatorBar: 0.5 } }, '0.5 bar'],
  ['air-more', { setUp: { primaryAir: 'part' } }, { setUp: { primaryAir: 'open' } }, 'open'],
  ['air-less', { setUp: { primaryAir: 'open' } }, { setUp: { primaryAir: 'shut' } }, 'shut'],
  ['jet-cleaned-or-changed', { kiln: { jet: '0.8' } }, { kiln: { jet: '1.0' } }, 'jet “1.0”'],
  ['burner-bigger', { kiln: { nominalKw: 20 } }, { kiln: { nominalKw: 30 } }, '30 kW instead'],
  ['burner-added', { kiln: { burners: 1 } }, { kiln: { burners: 2 } }, '2 burners instead of 1'],
  [
    'burner-more-sweeping',
    { setUp: { burnerAngleDegrees: 90 } },
    { setUp: { burnerAngleDegrees: 45 } },
    'burner at 45° instead of 90°',
  ],
  [
    'burner-straighter',
    { setUp: { burnerAngleDegrees: 45 } },
    { setUp: { burnerAngleDegrees: 90 } },
    'burner at 90° instead of 45°',
  ],
  [
    'setback-longer',
    { setUp: { burnerSetbackMm: 0 } },
    { setUp: { burnerSetbackMm: 50 } },
    '50 mm instead of 0 mm',
  ],
  ['setback-shorter', { setUp: { burnerSetbackMm: 50 } }, { setUp: { burnerSetbackMm: 20 } }, '20'],
  ['fuel-changed', { kiln: { fuel: 'butane' } }, { kiln: { fuel: 'propane' } }, 'propane instead'],
  ['cylinder-bigger', { setUp: { cylinderKg: 13 } }, { setUp: { cylinderKg: 47 } }, '47 kg'],
  [
    'flue-more-open',
    { setUp: { flueCoverPercent: 50 } },
    { setUp: { flueCoverPercent: 20 } },
    '20',
  ],
  [
    'flue-more-covered',
    { setUp: { flueCoverPercent: 0 } },
    { setUp: { flueCoverPercent: 40 } },
    '40 %',
  ],
  ['leaks-sealed', { setUp: { lidGapMm: 10 } }, { setUp: { lidGapMm: 0 } }, '0 mm instead of 10'],
  [
    'floor-insulated',
    { setUp: { fibreBeneath: false } },
    { setUp: { fibreBeneath: true } },
    'fibre beneath',
  ],
  [
    'floor-insulated',
    { setUp: { standsOn: 'bare-ground' } },
    { setUp: { standsOn: 'hollow-block' } },
    'hollow block instead of bare ground',
  ],
  [
    'lining-thicker',
    { kiln: { fibreThicknessMm: 25 } },
    { kiln: { fibreThicknessMm: 50 } },
    '50 mm',
  ],
  ['kiln-dried', { setUp: { kilnDamp: true } }, { setUp: { kilnDamp: false } }, 'dry'],
  [
    'wind-shelter',
    { setUp: { windShelter: 'none' } },
    { setUp: { windShelter: 'both-sides' } },
    'both sides instead of none',
  ],
  [
    'flame-path-cleared',
    { setUp: { inFlamePath: 'a tall bottle' } },
    { setUp: { inFlamePath: 'nothing' } },
    '“a tall bottle”',
  ],
  [
    'shelf-lighter',
    { setUp: { shelfKind: 'cordierite' } },
    { setUp: { shelfKind: 'fibre' } },
    'a fibre shelf instead of cordierite',
  ],
  ['shelf-raised', { setUp: { shelfHeightMm: 50 } }, { setUp: { shelfHeightMm: 100 } }, '100 mm'],
  ['load-less', { setUp: { loadKg: 10 } }, { setUp: { loadKg: 6 } }, '6 kg instead of 10 kg'],
  ['load-more', { piece: { count: 2 } }, { piece: { count: 5 } }, '5 pieces instead of 2'],
  ['ware-dried', { piece: { dampness: 'damp' } }, { piece: { dampness: 'dry' } }, 'dry'],
  [
    'ware-preheated',
    { piece: { preheating: 'cold' } },
    { piece: { preheating: 'on-the-lid' } },
    'preheated',
  ],
  [
    'ware-off-the-shelf',
    { piece: { lies: 'flat' } },
    { piece: { lies: 'on-points' } },
    'on points instead of flat',
  ],
  ['target-up', { plan: { targetCelsius: 980 } }, { plan: { targetCelsius: 1000 } }, '1000'],
  ['target-down', { plan: { targetCelsius: 1000 } }, { plan: { targetCelsius: 980 } }, '980'],
  [
    'hold-longer',
    { plan: { noHold: true, holdKeptMinutes: null } },
    { plan: { holdKeptMinutes: 5 } },
    'a hold of 5 min instead of no hold',
  ],
  [
    'hold-shorter',
    { plan: { holdPlannedMinutes: 10 } },
    { plan: { holdPlannedMinutes: 0 } },
    'no hold instead of a hold of 10 min',
  ],
  [
    'drawn-by-melt',
    { plan: { drawnBecause: 'gave-up' } },
    { plan: { drawnBecause: 'melt' } },
    'by the melt instead of giving up',
  ],
  ['form', { piece: { form: 'platter' } }, { piece: { form: 'cup' } }, 'cup instead of platter'],
  ['wall-thickness', { piece: { wallMm: 5 } }, { piece: { wallMm: 8 } }, '8 instead of 5'],
  ['clay', { piece: { clay: 'smooth' } }, { piece: { clay: 'grogged' } }, 'grogged instead'],
  ['bisque-higher', { piece: { bisqueCone: '06' } }, { piece: { bisqueCone: '04' } }, 'cone 04'],
  ['bisque-lower', { piece: { bisqueCelsius: 1000 } }, { piece: { bisqueCelsius: 950 } }, '950'],
  [
    'glaze',
    { piece: { glazeFamily: 'crackle' } },
    { piece: { glazeFamily: 'copper-matt' } },
    'copper matt instead of crackle',
  ],
  [
    'combustible-kind',
    { reduction: { combustibles: [sawdust()] } },
    { reduction: { combustibles: [sawdust({ kind: 'straw' })] } },
    'straw instead of sawdust',
  ],
  [
    'combustible-more',
    { reduction: { combustibles: [sawdust()] } },
    { reduction: { combustibles: [sawdust({ litres: 8 })] } },
    '8 l instead of 4 l',
  ],
  [
    'combustible-less',
    { reduction: { combustibles: [sawdust()] } },
    { reduction: { combustibles: [sawdust({ litres: 2 })] } },
    '2 l',
  ],
  [
    'combustible-drier',
    { reduction: { combustibles: [sawdust({ dampness: 'damp' })] } },
    { reduction: { combustibles: [sawdust()] } },
    'dry combustible',
  ],
  [
    'container-smaller',
    { reduction: { containerLitres: 60 } },
    { reduction: { containerLitres: 20 } },
    '20',
  ],
  [
    'container-bigger',
    { reduction: { containerLitres: 20 } },
    { reduction: { containerLitres: 60 } },
    '60',
  ],
  [
    'sealed-better',
    { reduction: { seal: 'lid' } },
    { reduction: { seal: 'sand' } },
    'sand instead of lid',
  ],
  [
    'covered-sooner',
    { reduction: { secondsInAir: 60 } },
    { reduction: { secondsInAir: 15 } },
    '15',
  ],
  ['covered-later', { reduction: { secondsInAir: 15 } }, { reduction: { secondsInAir: 60 } }, '60'],
  [
    'covered-longer',
    { reduction: { minutesCovered: 20 } },
    { reduction: { minutesCovered: 60 } },
    '1 h',
  ],
  [
    'covered-shorter',
    { reduction: { minutesCovered: 60 } },
    { reduction: { minutesCovered: 20 } },
    '20',
  ],
  ['burped', { reduction: { burpedTimes: 0 } }, { reduction: { burpedTimes: 2 } }, 'burped'],
  [
    'not-burped',
    { reduction: { burpedTimes: 1 } },
    { reduction: { burpedTimes: 0 } },
    'not burped',
  ],
  ['quenched', { reduction: { then: 'cooled' } }, { reduction: { then: 'quenched' } }, 'quenched'],
  ['not-quenched', { reduction: { then: 'quenched' } }, { reduction: { then: 'cooled' } }, 'not'],
  [
    'probe-moved-or-replaced',
    { setUp: { probeDepthMm: 50 } },
    { setUp: { probeDepthMm: 100 } },
    '100 mm instead of 50 mm',
  ],
];

describe('proposing changes', () => {
  it.each(CASES)('proposes %s, and nothing else', (change, before, now, words) => {
    const found = proposed(before, now);
    expect(found.map((proposal) => proposal.change)).toEqual([change]);
    expect(found[0]?.text.replaceAll('\u00A0', ' ')).toContain(words);
  });

  it('can propose every change of the vocabulary but those it says it cannot', () => {
    const covered = new Set([...CASES.map(([change]) => change), ...NOT_PROPOSED]);
    expect(CHANGE_IDS.filter((change) => !covered.has(change))).toEqual([]);
    expect(CASES.filter(([change]) => NOT_PROPOSED.includes(change))).toEqual([]);
  });

  it('proposes nothing of two firings alike', () => {
    expect(proposed({}, {})).toEqual([]);
  });

  it.each<[string, Side, Side]>([
    ['a blank before', {}, { setUp: { burnerAngleDegrees: 45, regulatorBar: 0, lidGapMm: 0 } }],
    ['a blank now', { setUp: { flueCoverPercent: 30, loadKg: 5 } }, {}],
    [
      'less than a tape is out by',
      { setUp: { burnerSetbackMm: 50 } },
      { setUp: { burnerSetbackMm: 59 } },
    ],
    [
      'a shelf back from fibre',
      { setUp: { shelfKind: 'fibre' } },
      { setUp: { shelfKind: 'brick' } },
    ],
    [
      'a time to temperature, which is a result',
      { plan: { timeToTemperatureMinutes: 60 } },
      { plan: { timeToTemperatureMinutes: 30 } },
    ],
  ])('proposes nothing for %s', (_what, before, now) => {
    expect(proposed(before, now)).toEqual([]);
  });

  it('calls no form other while one is in both firings', () => {
    const before = {
      fields: aNote((f) => (f.pieces = [aPiece(), aPiece({ form: 'cup' })])),
      kiln: null,
    };
    const now = { fields: aNote(), kiln: null };
    expect(proposeChanges(before, now).map(({ change }) => change)).toEqual(['load-less']);
  });
});

describe('the order of cones', () => {
  it('runs from 022 up to 01 and on from 1', () => {
    const cones = ['022', '012', '010', '08', '06', '04', '02', '01', '1', '2', '10'];
    const places = cones.map(coneOrder);
    expect(places).toEqual([...places].sort((a, b) => (a ?? 0) - (b ?? 0)));
    expect(new Set(places).size).toBe(cones.length);
    expect(coneOrder('cone 06')).toBe(coneOrder('06'));
    expect(coneOrder('hot')).toBeNull();
  });
});
