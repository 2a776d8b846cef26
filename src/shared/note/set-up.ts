import { z } from 'zod';
import {
  FLAMES,
  PRIMARY_AIR,
  SHELF_KINDS,
  STANDS_ON,
  WEATHERS,
  WINDS,
  WIND_SHELTERS,
} from '../vocabulary/kiln.ts';
import { choice, count, day, measure, optionalText, yesNo } from './field-types.ts';

/** How the kiln was set up for this firing. Everything may be left blank. */
export const setUpSchema = z
  .strictObject({
    /** Angle to the wall: 90 aims straight in, smaller sweeps round the wall. */
    burnerAngleDegrees: measure(0, 90, '°'),
    /** Distance from tip to port; negative means that the tip is inside. */
    burnerSetbackMm: measure(-50, 300, 'mm'),
    primaryAir: choice(PRIMARY_AIR),
    flameAtFlue: choice(FLAMES),
    flameAtSpyhole: choice(FLAMES),
    /** Largest cover of the flue during the climb. */
    flueCoverPercent: measure(0, 100, '%'),
    lidGapMm: measure(0, 200, 'mm'),
    standsOn: choice(STANDS_ON),
    fibreBeneath: yesNo,
    baseLayers: optionalText(200),
    shelfKind: choice(SHELF_KINDS),
    shelfThicknessMm: measure(0, 100, 'mm'),
    shelfHeightMm: measure(0, 600, 'mm'),
    shelfFloorSharePercent: measure(0, 100, '%'),
    inFlamePath: optionalText(200),
    loadPieces: count(0, 500),
    loadKg: measure(0, 200, 'kg'),
    windShelter: choice(WIND_SHELTERS),
    wind: choice(WINDS),
    weather: choice(WEATHERS),
    airCelsius: measure(-30, 45, '°C'),
    kilnDamp: yesNo,
    regulatorBar: measure(0, 4, 'bar'),
    cylinderKg: measure(0.4, 50, 'kg'),
    gasUsedKg: measure(0, 50, 'kg'),
    probeDepthMm: measure(0, 1000, 'mm'),
    probeFromFlameMm: measure(0, 2000, 'mm'),
    probeFromWareMm: measure(0, 2000, 'mm'),
    probeCheckedOn: day,
  })
  .prefault({});
export type SetUp = z.output<typeof setUpSchema>;
