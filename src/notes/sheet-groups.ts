import type { NotePageData } from '#shared/api/notes.ts';
import { QUARTZ_FROM, QUARTZ_TO } from '#shared/firing/constants.ts';
import type { Finding } from '#shared/firing/findings.ts';
import { formatDuration, formatSeconds } from '#shared/units/duration.ts';
import { formatLength } from '#shared/units/length.ts';
import { formatMass } from '#shared/units/mass.ts';
import { formatPressure } from '#shared/units/pressure.ts';
import { formatRate, formatTemperature, fromCelsius } from '#shared/units/temperature.ts';
import type { Units } from '#shared/units/units.ts';
import { formatChamber, formatVolume } from '#shared/units/volume.ts';
import * as kilnWords from '#shared/vocabulary/kiln.ts';
import * as wareWords from '#shared/vocabulary/ware.ts';
import type { SheetGroup, SheetRow } from '../ui/FiringSheet.tsx';

type Fields = NotePageData['fields'];
type Kiln = NotePageData['kiln'];

const text = (label: string, value: string | null): SheetRow => ({ label, value });
const figure = (label: string, value: string | null): SheetRow => ({ label, value, reading: true });

/** A value shown only when it is there; blank stays blank, zero is a value. */
const shown = <Value>(value: Value | null, words: (value: Value) => string): string | null =>
  value === null ? null : words(value);
const term = <Id extends string>(terms: Readonly<Record<Id, string>>, id: Id | null) =>
  id === null ? null : terms[id];
const yesNo = (value: boolean | null): string | null =>
  value === null ? null : value ? 'Yes' : 'No';
const joined = (...parts: (string | null)[]): string | null =>
  parts.filter((part) => part !== null && part !== '').join(', ') || null;

function planned(plan: Fields['plan'], units: Units): string | null {
  if (plan.targetBy === 'cone') return plan.targetCone ? `cone ${plan.targetCone}` : null;
  if (plan.targetBy === 'eye') return 'by eye';
  return shown(plan.targetCelsius, (value) => formatTemperature(value, units.temperature));
}

function peak(plan: Fields['plan'], units: Units): string | null {
  if (plan.peakBy === 'cone') return plan.peakCone ? `cone ${plan.peakCone}` : null;
  if (plan.peakBy === 'eye') return 'by eye';
  return shown(plan.peakCelsius, (value) => formatTemperature(value, units.temperature));
}

/** The span across the quartz inversion, in the reader’s degrees. */
function crossedSpan({ temperature }: Units): string {
  const from = String(Math.round(fromCelsius(QUARTZ_FROM, temperature)));
  return `${from} to ${formatTemperature(QUARTZ_TO, temperature)}`;
}

function crossing(findings: readonly Finding[], units: Units): string | null {
  const found = findings.findLast((finding) => finding.code === 'quartz-crossing');
  const minutes = found?.numbers['minutes'];
  const rate = found?.numbers['ratePerMinute'];
  if (minutes === undefined || rate === undefined) return null;
  return `${formatDuration(minutes)}, ${formatRate(rate, units.temperature)}`;
}

function stalls(findings: readonly Finding[], units: Units): string | null {
  return joined(
    ...findings
      .filter((finding) => finding.code === 'stall')
      .map(
        ({ numbers }) =>
          `${formatTemperature(numbers['levelCelsius'] ?? 0, units.temperature)}, ${formatDuration(numbers['minutes'] ?? 0)}`,
      ),
  );
}

/** The climb: what was aimed at and what the record says. */
function climbGroup(
  { plan, when }: Fields,
  findings: readonly Finding[],
  units: Units,
): SheetGroup {
  return {
    heading: 'Climb',
    rows: [
      text('Start', term(kilnWords.START_CLASSES, when.startClass)),
      text('Drawn because', term(kilnWords.DRAWN_BECAUSE, plan.drawnBecause)),
      figure('Target', planned(plan, units)),
      figure('Peak', peak(plan, units)),
      figure('To temperature', shown(plan.timeToTemperatureMinutes, formatDuration)),
      figure('Hold', plan.noHold ? 'None' : shown(plan.holdKeptMinutes, formatDuration)),
      figure(crossedSpan(units), crossing(findings, units)),
      figure('Stall', stalls(findings, units)),
    ],
  };
}

function recipeGroup({ reduction, pieces }: Fields, units: Units): SheetGroup {
  const combustibles = reduction.combustibles.map(
    ({ kind, other, litres, dampness, placement }) =>
      joined(
        `${other || wareWords.COMBUSTIBLES[kind]}${litres === null ? '' : ` ${formatVolume(litres, units)}`}`,
        dampness === null ? null : wareWords.DAMPNESS[dampness].toLowerCase(),
        placement === null ? null : wareWords.PLACEMENTS[placement].toLowerCase(),
      ) ?? '',
  );
  const routes = [...new Set(pieces.map((piece) => piece.route))].filter((route) => route !== null);
  return {
    heading: 'After the draw',
    rows: [
      text('Route', joined(...routes.map((route) => wareWords.ROUTES[route]))),
      figure('In the air', shown(reduction.secondsInAir, formatSeconds)),
      text(
        'Container',
        joined(
          term(wareWords.CONTAINERS, reduction.container),
          shown(reduction.containerLitres, (litres) => formatVolume(litres, units)),
        ),
      ),
      text('Combustible', combustibles.join('; ') || null),
      text('Lit by the ware', yesNo(reduction.litByTheWare)),
      text('Sealed with', term(wareWords.SEALS, reduction.seal)),
      figure(
        'Burped',
        joined(
          shown(reduction.burpedTimes, (times) => (times === 0 ? 'No' : `${String(times)} ×`)),
          shown(
            reduction.burpedFirstAfterSeconds,
            (seconds) => `first after ${formatSeconds(seconds)}`,
          ),
        ),
      ),
      figure('Covered', shown(reduction.minutesCovered, formatDuration)),
      text(
        'Then',
        joined(
          term(wareWords.AFTER_COVER, reduction.then),
          shown(reduction.thenAfterMinutes, (minutes) => `after ${formatDuration(minutes)}`),
        ),
      ),
    ],
  };
}

function burnerGroup({ setUp }: Fields, units: Units): SheetGroup {
  return {
    heading: 'Burner and flue',
    rows: [
      figure(
        'Angle to the wall',
        shown(setUp.burnerAngleDegrees, (value) => `${String(value)}°`),
      ),
      figure(
        'Setback',
        shown(setUp.burnerSetbackMm, (value) => formatLength(value, units)),
      ),
      text('Primary air', term(kilnWords.PRIMARY_AIR, setUp.primaryAir)),
      text('Flame at the flue', term(kilnWords.FLAMES, setUp.flameAtFlue)),
      text('Flame at the spyhole', term(kilnWords.FLAMES, setUp.flameAtSpyhole)),
      figure(
        'Flue covered',
        shown(setUp.flueCoverPercent, (value) => `Up to ${String(value)}\u00a0%`),
      ),
      figure(
        'Lid gap',
        shown(setUp.lidGapMm, (value) => formatLength(value, units)),
      ),
      figure(
        'Pressure',
        shown(setUp.regulatorBar, (value) => formatPressure(value, units)),
      ),
      figure(
        'Cylinder',
        shown(setUp.cylinderKg, (value) => formatMass(value, units)),
      ),
      figure(
        'Gas used',
        shown(setUp.gasUsedKg, (value) => formatMass(value, units)),
      ),
      text('In the flame’s path', setUp.inFlamePath || null),
    ],
  };
}

function placeGroup({ setUp }: Fields, units: Units): SheetGroup {
  return {
    heading: 'Floor, shelf and weather',
    rows: [
      text(
        'Stands on',
        joined(
          term(kilnWords.STANDS_ON, setUp.standsOn),
          setUp.fibreBeneath === null ? null : setUp.fibreBeneath ? 'fibre between' : 'no fibre',
        ),
      ),
      text('Base', setUp.baseLayers || null),
      text(
        'Shelf',
        joined(
          term(kilnWords.SHELF_KINDS, setUp.shelfKind),
          shown(setUp.shelfThicknessMm, (value) => formatLength(value, units)),
          shown(setUp.shelfHeightMm, (value) => `on ${formatLength(value, units)} posts`),
        ),
      ),
      text(
        'Load',
        joined(
          shown(setUp.loadPieces, (value) => `${String(value)} pieces`),
          shown(setUp.loadKg, (value) => formatMass(value, units)),
        ),
      ),
      text('Wind', term(kilnWords.WINDS, setUp.wind)),
      text('Wind shelter', term(kilnWords.WIND_SHELTERS, setUp.windShelter)),
      text('Weather', term(kilnWords.WEATHERS, setUp.weather)),
      figure(
        'Air',
        shown(setUp.airCelsius, (value) => formatTemperature(value, units.temperature)),
      ),
      text('Kiln damp', yesNo(setUp.kilnDamp)),
      text(
        'Probe',
        joined(
          shown(setUp.probeDepthMm, (value) => `${formatLength(value, units)} deep`),
          shown(setUp.probeFromFlameMm, (value) => `${formatLength(value, units)} from the flame`),
          shown(setUp.probeFromWareMm, (value) => `${formatLength(value, units)} from the ware`),
        ),
      ),
    ],
  };
}

/** The kiln as it was in this firing. */
export function kilnGroup({ fields, volumeLitres }: Kiln, units: Units): SheetGroup {
  const inside =
    fields.shape === 'round'
      ? shown(fields.insideDiameterMm, (value) => `${formatLength(value, units)} across`)
      : joined(
          shown(fields.insideWidthMm, (value) => formatLength(value, units)),
          shown(fields.insideDepthMm, (value) => formatLength(value, units)),
        );
  return {
    heading: 'Kiln',
    rows: [
      figure(
        'Inside',
        shown(volumeLitres, (litres) => formatChamber(litres, units)),
      ),
      text(
        'Measures',
        joined(
          inside,
          shown(fields.insideHeightMm, (value) => `${formatLength(value, units)} high`),
        ),
      ),
      text('Opening', term(kilnWords.OPENINGS, fields.opening)),
      text(
        'Wall',
        joined(
          term(kilnWords.WALLS, fields.wall),
          shown(
            fields.wall === 'brick' ? fields.brickThicknessMm : fields.fibreThicknessMm,
            (value) => formatLength(value, units),
          ),
          fields.wall === 'fibre'
            ? shown(fields.fibreDensityKgM3, (value) => `${String(value)}\u00a0kg/m³`)
            : null,
        ),
      ),
      text(
        'Flue',
        joined(
          term(kilnWords.FLUE_PLACES, fields.flue),
          shown(fields.flueOpeningMm, (value) => formatLength(value, units)),
        ),
      ),
      text(
        'Burner',
        joined(
          fields.burners !== null && fields.burners > 1 ? `${String(fields.burners)} ×` : null,
          term(kilnWords.BURNER_KINDS, fields.burnerKind),
          fields.jet ? `jet ${fields.jet}` : null,
          shown(fields.nominalKw, (value) => `${String(value)}\u00a0kW`),
        ),
      ),
      text('Fuel', kilnWords.FUELS[fields.fuel]),
      text(
        'Probe',
        fields.probe === null || fields.probe === 'none'
          ? term(kilnWords.PROBES, fields.probe)
          : `Type ${fields.probe}`,
      ),
    ],
  };
}

/** The firing sheet: every structured field that was filled in, in groups. */
export function sheetGroups(page: NotePageData, units: Units): SheetGroup[] {
  return [
    climbGroup(page.fields, page.findings, units),
    recipeGroup(page.fields, units),
    burnerGroup(page.fields, units),
    placeGroup(page.fields, units),
    kilnGroup(page.kiln, units),
  ];
}
