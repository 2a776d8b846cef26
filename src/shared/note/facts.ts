import { measuredTroubles } from '../firing/findings.ts';
import { curveOf, firstAtOrAbove, stepFor } from '../firing/curve.ts';
import type { FiringReading, LevelStretch, Reading } from '../firing/types.ts';
import type { Change } from '../vocabulary/changes.ts';
import type { DrawnBecause, Fuel, Probe, StartClass, Wall } from '../vocabulary/kiln.ts';
import type { MarkKind } from '../vocabulary/marks.ts';
import type { MeasuredTrouble, Trouble } from '../vocabulary/troubles.ts';
import { FAMILY_OF_FORM } from '../vocabulary/ware.ts';
import type { Form, FormFamily, GlazeFamily, Route } from '../vocabulary/ware.ts';
import { insideVolumeLitres } from './kiln-fields.ts';
import type { KilnFields } from './kiln-fields.ts';
import type { NoteFields } from './note-fields.ts';
import { countPieces, isCrackAfterDraw, isCrackInFiring, namedTroubles } from './note-troubles.ts';
import type { Piece } from './pieces.ts';

/** A row of pieces as pooled evidence sees it. Recipe values are those of the row's own or shared recipe. */
export interface PieceFacts {
  readonly form: Form | null;
  readonly family: FormFamily | null;
  readonly count: number;
  readonly spanMm: number | null;
  readonly wallMm: number | null;
  readonly clay: string;
  readonly glazeFamily: GlazeFamily | null;
  readonly lies: Piece['lies'];
  readonly preheating: Piece['preheating'];
  readonly route: Route | null;
  readonly melt: Piece['melt'];
  readonly colour: Piece['colour'];
  readonly bareClay: Piece['bareClay'];
  readonly faults: Piece['faults'];
  readonly crackedInFiring: boolean;
  readonly crackedAfterDraw: boolean;
  readonly whole: boolean | null;
  readonly secondsInAir: number | null;
  readonly containerLitres: number | null;
  readonly combustibles: readonly { readonly kind: string; readonly litres: number | null }[];
  readonly minutesCovered: number | null;
  /** In water; null when not said. */
  readonly quenched: boolean | null;
}

export interface StallFacts {
  readonly levelCelsius: number;
  readonly fromMinute: number;
  readonly toMinute: number;
  readonly minutes: number;
  /** Whether the curve stood 50 °C higher within 20 min of its end; null when that is not known. */
  readonly wentOn: boolean | null;
}

/** All that pooled evidence and search need of one published firing. Plain data. */
export interface FiringFacts {
  readonly firedOn: string | null;
  readonly startTime: string | null;
  readonly startClass: StartClass | null;
  readonly unreportedFirings: number | null;
  readonly fuel: Fuel | null;
  readonly volumeLitres: number | null;
  readonly wall: Wall | null;
  readonly liningMm: number | null;
  readonly probe: Probe | null;
  readonly hasRecord: boolean;
  readonly hasSecondProbe: boolean;
  readonly drawnBecause: DrawnBecause | null;
  readonly targetCelsius: number | null;
  readonly aimCelsius: number | null;
  /** The record's, else the declared one. */
  readonly peakCelsius: number | null;
  /** Start of the firing by the record's clock; null without a record. */
  readonly startMinute: number | null;
  readonly reachedMinute: number | null;
  readonly timeToTemperatureMinutes: number | null;
  readonly holdMinutes: number | null;
  /** Rate of the last crossing from 550 to 600 °C, by the pyrometer. */
  readonly crossingRatePerMinute: number | null;
  readonly rate400To700: number | null;
  /** Found in the record. */
  readonly measuredTroubles: readonly MeasuredTrouble[];
  readonly stalls: readonly StallFacts[];
  readonly sags: readonly { readonly topCelsius: number; readonly dropCelsius: number }[];
  /** Said by the author, ticked or in the rows of pieces. */
  readonly namedTroubles: readonly Trouble[];
  readonly changes: readonly Change[];
  readonly pieces: readonly PieceFacts[];
  /** Pieces, not rows. */
  readonly pieceCount: number;
  readonly crackedPieces: number;
  readonly airCelsius: number | null;
  readonly wind: NoteFields['setUp']['wind'];
  readonly gasUsedKg: number | null;
  readonly marks: readonly { readonly minute: number; readonly kind: MarkKind }[];
}

/** "Went on" after a stall: this much hotter, within this long of its end. */
export const WENT_ON = { celsius: 50, withinMinutes: 20 } as const;
/** Levels are read over about ±0.5 min. */
const LEVEL_HALF_MINUTES = 0.5;

function wentOn(
  stall: LevelStretch,
  reading: FiringReading,
  readings: readonly Reading[] | null,
): boolean | null {
  const wanted = stall.levelCelsius + WENT_ON.celsius;
  if (stall.then !== 'climbed' || reading.peak.celsius < wanted) return false;
  if (!readings) return null;
  const after = readings.filter(
    ({ minute }) =>
      minute >= stall.fromMinute && minute <= stall.toMinute + WENT_ON.withinMinutes + 1,
  );
  const first = after[0];
  const last = after.at(-1);
  if (!first || !last || after.length < 2) return null;
  const record = {
    minutes: Float64Array.from(after, ({ minute }) => minute),
    celsius: Float64Array.from(after, ({ celsius }) => celsius),
  };
  const curve = curveOf(record, LEVEL_HALF_MINUTES, stepFor(last.minute - first.minute));
  const at = firstAtOrAbove(curve, wanted, stall.toMinute);
  return at !== null && at <= stall.toMinute + WENT_ON.withinMinutes;
}

function pieceFacts(piece: Piece, shared: NoteFields['reduction']): PieceFacts {
  const recipe = piece.recipe ?? shared;
  return {
    form: piece.form,
    family: piece.form === null ? null : FAMILY_OF_FORM[piece.form],
    count: piece.count ?? 1,
    spanMm: piece.spanMm,
    wallMm: piece.wallMm,
    clay: piece.clay.trim(),
    glazeFamily: piece.glazeFamily,
    lies: piece.lies,
    preheating: piece.preheating,
    route: piece.route,
    melt: piece.melt,
    colour: piece.colour,
    bareClay: piece.bareClay,
    faults: piece.faults,
    crackedInFiring: piece.cracked === true && piece.cracks.some(isCrackInFiring),
    crackedAfterDraw: piece.cracked === true && piece.cracks.some(isCrackAfterDraw),
    whole: piece.whole,
    secondsInAir: recipe.secondsInAir,
    containerLitres: recipe.containerLitres,
    combustibles: recipe.combustibles.map(({ kind, litres }) => ({ kind, litres })),
    minutesCovered: recipe.minutesCovered,
    quenched: recipe.then === null ? null : recipe.then === 'quenched',
  };
}

/** Aim = target; if drawn because of melt or cone, the lower of target and peak. */
function aimOf({ plan }: NoteFields, target: number | null, peak: number | null): number | null {
  const bySight = plan.drawnBecause === 'melt' || plan.drawnBecause === 'cone';
  if (target === null || peak === null || !bySight) return target;
  return Math.min(target, peak);
}

export interface FiringToReduce {
  readonly fields: NoteFields;
  readonly kiln: KilnFields | null;
  readonly reading: FiringReading | null;
  /** The readings themselves: without them it is not known how a stall went on. */
  readonly readings?: readonly Reading[] | null;
  /** True when a second probe was recorded. */
  readonly hasSecondProbe?: boolean;
}

/** Reduces a note to what pooled evidence and search need: measured before declared. */
export function firingFacts(firing: FiringToReduce): FiringFacts {
  const { fields, kiln, reading, readings = null, hasSecondProbe = false } = firing;
  const { plan, when, setUp } = fields;
  const target = plan.targetBy === 'temperature' ? plan.targetCelsius : null;
  const declaredPeak = plan.peakBy === 'temperature' ? plan.peakCelsius : null;
  const peak = reading?.peak.celsius ?? declaredPeak;
  const declaredHold = plan.noHold ? 0 : plan.holdKeptMinutes;
  const counts = countPieces(fields);
  const stalls = (reading?.levels ?? []).filter(({ kind }) => kind === 'stall');
  return {
    firedOn: when.date,
    startTime: when.startTime,
    startClass: when.startClass,
    unreportedFirings: when.unreportedFirings,
    fuel: kiln?.fuel ?? null,
    volumeLitres: kiln ? insideVolumeLitres(kiln) : null,
    wall: kiln?.wall ?? null,
    liningMm: (kiln?.wall === 'brick' ? kiln.brickThicknessMm : kiln?.fibreThicknessMm) ?? null,
    probe: kiln?.probe ?? null,
    hasRecord: reading !== null,
    hasSecondProbe: hasSecondProbe || reading?.unevenHeat != null,
    drawnBecause: plan.drawnBecause,
    targetCelsius: target,
    aimCelsius: reading?.aimCelsius ?? aimOf(fields, target, peak),
    peakCelsius: peak,
    startMinute: reading?.start.minute ?? null,
    reachedMinute: reading?.reachedMinute ?? null,
    timeToTemperatureMinutes: reading?.timeToTemperatureMinutes ?? plan.timeToTemperatureMinutes,
    holdMinutes: reading?.hold?.minutes ?? declaredHold,
    crossingRatePerMinute: reading?.quartzCrossings.at(-1)?.ratePerMinute ?? null,
    rate400To700: reading?.rate400To700 ?? null,
    measuredTroubles: reading ? measuredTroubles(reading) : [],
    stalls: stalls.map((stall) => ({
      levelCelsius: stall.levelCelsius,
      fromMinute: stall.fromMinute,
      toMinute: stall.toMinute,
      minutes: stall.minutes,
      wentOn: reading ? wentOn(stall, reading, readings) : null,
    })),
    sags: (reading?.sags ?? []).map(({ topCelsius, dropCelsius }) => ({ topCelsius, dropCelsius })),
    namedTroubles: namedTroubles(fields),
    changes: [...new Set(fields.changes.map(({ change }) => change))],
    pieces: fields.pieces.map((piece) => pieceFacts(piece, fields.reduction)),
    pieceCount: counts.pieces,
    crackedPieces: counts.cracked,
    airCelsius: setUp.airCelsius,
    wind: setUp.wind,
    gasUsedKg: setUp.gasUsedKg,
    marks: fields.record.marks.map(({ minute, kind }) => ({ minute, kind })),
  };
}
