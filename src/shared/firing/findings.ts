import { z } from 'zod';
import { formatDuration } from '../units/duration.ts';
import { formatDifference, formatRate, formatTemperature } from '../units/temperature.ts';
import type { Units } from '../units/units.ts';
import { MEASURED_TROUBLES, TROUBLE_IDS } from '../vocabulary/troubles.ts';
import type { MeasuredTrouble, Trouble } from '../vocabulary/troubles.ts';
import { CONFIDENCES, type Confidence } from './confidence.ts';
import type { FiringReading, LevelStretch } from './types.ts';

export const FINDING_CODES = [
  'stall',
  'sag',
  'slow-climb',
  'overshoot',
  'uneven-heat',
  'just-short',
  'pause',
  'warm-up',
  'reached',
  'not-reached',
  'hold',
  'quartz-crossing',
  'climb',
  'levelling-off',
  'wavering',
  'cooling-to-draw',
] as const;
export type FindingCode = (typeof FINDING_CODES)[number];

/** Something read off a note, as plain data: stored as it is, put into words when shown. */
export const findingSchema = z.object({
  code: z.enum(FINDING_CODES),
  trouble: z.enum(TROUBLE_IDS).nullable(),
  fromMinute: z.number(),
  toMinute: z.number(),
  /** Temperatures °C, rates °C/min, times minutes, by name. */
  numbers: z.record(z.string(), z.number()),
  /** What came after a stall or a sag. */
  then: z.enum(['climbed', 'fell', 'shut-off', 'regained', 'held', 'drawn']).nullable(),
  /** How well the readings show it; told of stretches only, and not by notes read before it was. */
  confidence: z.enum(CONFIDENCES).optional(),
});
export type Finding = z.infer<typeof findingSchema>;

/** All findings of a reading, in order of time; the troubles among them carry their trouble. */
export function findingsOf(reading: FiringReading): Finding[] {
  const found: Finding[] = [];
  const add = (
    code: FindingCode,
    fromMinute: number,
    toMinute: number,
    numbers: Record<string, number>,
    trouble: Trouble | null = null,
    then: Finding['then'] = null,
    confidence?: Confidence,
  ) =>
    found.push({
      ...{ code, trouble, fromMinute, toMinute, numbers, then },
      ...(confidence === undefined ? {} : { confidence }),
    });

  for (const level of reading.levels) addLevel(level, reading, add);
  for (const sag of reading.sags) {
    const { topCelsius, bottomCelsius, dropCelsius } = sag;
    const minutes = sag.toMinute - sag.fromMinute;
    const numbers = { topCelsius, bottomCelsius, dropCelsius, minutes };
    add('sag', sag.fromMinute, sag.toMinute, numbers, 'sag', sag.then, sag.confidence);
  }
  for (const crossing of reading.quartzCrossings) {
    const { fromMinute, toMinute, minutes, ratePerMinute, confidence } = crossing;
    const numbers = { minutes, ratePerMinute };
    add('quartz-crossing', fromMinute, toMinute, numbers, null, null, confidence);
  }
  const { aimCelsius, reachedMinute, timeToTemperatureMinutes, peak, hold, start } = reading;
  if (aimCelsius !== null && reachedMinute !== null && timeToTemperatureMinutes !== null) {
    const numbers = { aimCelsius, minutes: timeToTemperatureMinutes };
    add('reached', reachedMinute, reachedMinute, numbers);
  } else if (aimCelsius !== null) {
    const numbers = {
      aimCelsius,
      peakCelsius: peak.celsius,
      shortCelsius: aimCelsius - peak.celsius,
    };
    add('not-reached', peak.minute, peak.minute, numbers);
  }
  if (hold !== null) {
    const numbers = {
      minutes: hold.minutes,
      levelCelsius: hold.levelCelsius,
      sdCelsius: hold.sdCelsius,
      ...(hold.offAimCelsius === null ? {} : { offAimCelsius: hold.offAimCelsius }),
    };
    add('hold', hold.fromMinute, hold.toMinute, numbers, null, null, hold.confidence);
  }
  if (reading.climb.averagePerMinute !== null && reading.climb.steepestPerMinute !== null) {
    const { averagePerMinute, steepestPerMinute } = reading.climb;
    const top = Math.min(reachedMinute ?? peak.minute, reading.shutOff.minute);
    add('climb', start.minute, top, { averagePerMinute, steepestPerMinute });
  }
  if (reading.overshootCelsius !== null) {
    const numbers = { overCelsius: reading.overshootCelsius, peakCelsius: peak.celsius };
    add('overshoot', peak.minute, peak.minute, numbers, 'overshoot');
  }
  if (reading.slowClimbMinutes !== null && reachedMinute !== null) {
    const numbers = { minutes: reading.slowClimbMinutes };
    add('slow-climb', start.minute, reachedMinute, numbers, 'slow-climb');
  }
  if (reading.unevenHeat !== null) {
    const { fromMinute, toMinute, largestCelsius } = reading.unevenHeat;
    const numbers = { largestCelsius, minutes: toMinute - fromMinute };
    add('uneven-heat', fromMinute, toMinute, numbers, 'uneven-heat');
  }
  if (reading.levellingOff !== null) {
    const { celsius, lowCelsius, highCelsius, reachesAim } = reading.levellingOff;
    const end = reading.shutOff.minute;
    const isForecast = reachesAim !== null && aimCelsius !== null;
    const reach = isForecast ? { aimCelsius, ...reachesAim } : {};
    add('levelling-off', end, end, { celsius, lowCelsius, highCelsius, ...reach });
  }
  if (reading.waveringCelsius !== null) {
    const numbers = { scatterCelsius: reading.waveringCelsius };
    add('wavering', start.minute, reading.shutOff.minute, numbers);
  }
  if (reading.coolingToDraw !== null) {
    const { minutes, dropCelsius } = reading.coolingToDraw;
    const from = reading.shutOff.minute;
    add('cooling-to-draw', from, from + minutes, { minutes, dropCelsius });
  }
  return found.sort((a, b) => a.fromMinute - b.fromMinute);
}

type Add = (
  code: FindingCode,
  fromMinute: number,
  toMinute: number,
  numbers: Record<string, number>,
  trouble?: Trouble | null,
  then?: Finding['then'],
  confidence?: Confidence,
) => void;

function addLevel(level: LevelStretch, reading: FiringReading, add: Add): void {
  if (level.kind === 'hold' || level.kind === 'approach') return;
  const { levelCelsius, minutes } = level;
  const numbers: Record<string, number> = { levelCelsius, minutes };
  if (level.kind === 'just-short') {
    if (reading.aimCelsius === null) return;
    numbers['shortCelsius'] = reading.aimCelsius - levelCelsius;
    if (reading.probeToleranceCelsius !== null) {
      numbers['toleranceCelsius'] = reading.probeToleranceCelsius;
    }
  }
  const trouble = level.kind === 'stall' ? 'stall' : null;
  const { kind, fromMinute, toMinute, then, confidence } = level;
  add(kind, fromMinute, toMinute, numbers, trouble, then, confidence);
}

/** The troubles that the record itself shows, each once, in the order of the list. */
export function measuredTroubles(reading: FiringReading): MeasuredTrouble[] {
  const shown = new Set(findingsOf(reading).map((finding) => finding.trouble));
  return MEASURED_TROUBLES.filter((trouble) => shown.has(trouble));
}

const THEN_WORDS = {
  climbed: 'then climbed on',
  fell: 'then fell back',
  'shut-off': 'then shut off',
  regained: 'then regained it',
  held: 'then stayed there',
  drawn: 'then drawn',
} as const;

/** The sentence of a finding, in the reader's units; a second one where the readings hardly show it. */
export function findingText(finding: Finding, units: Units): string {
  const sentence = sentenceOf(finding, units);
  return finding.confidence === 'low'
    ? `${sentence} The readings stand too far apart, or scatter too much, to be sure of it.`
    : sentence;
}

function sentenceOf(finding: Finding, units: Units): string {
  const n = (name: string) => finding.numbers[name] ?? Number.NaN;
  const has = (name: string) => finding.numbers[name] !== undefined;
  const degrees = (name: string) => formatTemperature(n(name), units.temperature);
  const difference = (name: string) => formatDifference(Math.abs(n(name)), units.temperature);
  const rate = (name: string) => formatRate(n(name), units.temperature);
  const minutes = formatDuration(n('minutes'));
  const from = formatDuration(finding.fromMinute);
  const then = finding.then === null ? '' : `, ${THEN_WORDS[finding.then]}`;
  switch (finding.code) {
    case 'stall':
      return `Levelled off at ${degrees('levelCelsius')} for ${minutes}, from ${from}${then}.`;
    case 'pause':
      return `Paused at ${degrees('levelCelsius')} for ${minutes}, from ${from}.`;
    case 'warm-up':
      return `Warmed up at ${degrees('levelCelsius')} for ${minutes}, from ${from}.`;
    case 'just-short': {
      const wire = has('toleranceCelsius')
        ? ` The probe’s wire alone may be off by ${difference('toleranceCelsius')}.`
        : '';
      return `Levelled off at ${degrees('levelCelsius')} for ${minutes}, ${difference('shortCelsius')} below the aim.${wire}`;
    }
    case 'sag':
      return `Fell back from ${degrees('topCelsius')} to ${degrees('bottomCelsius')} in ${minutes}, from ${from}${then}.`;
    case 'reached':
      return `Reached ${degrees('aimCelsius')} in ${minutes}.`;
    case 'not-reached':
      return `Did not reach ${degrees('aimCelsius')}: the peak was ${degrees('peakCelsius')}.`;
    case 'hold': {
      const off = n('offAimCelsius');
      const side = off < 0 ? 'below' : 'above';
      const aim =
        has('offAimCelsius') && Math.round(Math.abs(off)) >= 1
          ? `, ${difference('offAimCelsius')} ${side} the aim`
          : '';
      return `Held at ${degrees('levelCelsius')} for ${minutes}${aim}.`;
    }
    case 'quartz-crossing':
      return `Passed from ${formatTemperature(550, units.temperature)} to ${formatTemperature(600, units.temperature)}, across the quartz inversion, in ${minutes} (${rate('ratePerMinute')}) by the pyrometer.`;
    case 'climb':
      return `Climbed at ${rate('averagePerMinute')} on average, ${rate('steepestPerMinute')} at the steepest.`;
    case 'overshoot':
      return `Overshot the target by ${difference('overCelsius')}: the peak was ${degrees('peakCelsius')}.`;
    case 'slow-climb':
      return `Climbed slowly: ${minutes} to temperature, pauses left out.`;
    case 'uneven-heat':
      return `Heated unevenly: the two probes stood up to ${difference('largestCelsius')} apart for ${minutes}, from ${from}.`;
    case 'levelling-off':
      return has('lowMinutes')
        ? `Going on like this, it reaches ${degrees('aimCelsius')} in ${formatDuration(n('lowMinutes'))} to ${formatDuration(n('highMinutes'))}.`
        : `Going on like this, it levels off near ${degrees('celsius')} (${degrees('lowCelsius')} to ${degrees('highCelsius')}).`;
    case 'wavering':
      return `Wavered: readings scattered by about ${difference('scatterCelsius')} round the curve.`;
    case 'cooling-to-draw':
      return n('dropCelsius') >= 0.5
        ? `Cooled by ${difference('dropCelsius')} in ${minutes} between shut-off and the draw.`
        : `Drawn ${minutes} after shut-off, without cooling.`;
  }
}
