import { celsiusAt, type HeatPoint } from '#shared/heat/heat-stops.ts';
import { formatNumber } from '#shared/units/number.ts';
import { formatTemperature, type TemperatureUnit } from '#shared/units/temperature.ts';
import type { DrawnMark } from '../drawn-mark.ts';
import type { MinuteWindow } from './minute-window.ts';

/** A mark is near when it is within this share of what is shown, but always within half a minute. */
const NEAR_SHARE = 0.025;
const NEAR_MINUTES = 0.5;
/** Readings are told to the second when no more than this is shown, minutes. */
const SECONDS_BELOW_MINUTES = 15;

export interface ReadOffSources {
  readonly points: readonly HeatPoint[];
  readonly secondProbe: readonly HeatPoint[] | null;
  readonly overlay: { readonly points: readonly HeatPoint[]; readonly label: string } | null;
  readonly marks: readonly DrawnMark[];
  readonly unit: TemperatureUnit;
  readonly window: MinuteWindow;
}

/** The nearest mark to a minute, if one is near; of two as near the earlier. */
export function nearestMark(
  marks: readonly DrawnMark[],
  minute: number,
  within: number,
): DrawnMark | null {
  let nearest: DrawnMark | null = null;
  for (const mark of marks) {
    const away = Math.abs(mark.minute - minute);
    if (away <= within && (!nearest || away < Math.abs(nearest.minute - minute))) nearest = mark;
  }
  return nearest;
}

/**
 * What a chart shows at a minute, one part a line: the minute with its temperature, the second
 * probe, the record compared with, the nearest mark. What is not there is left out. Figures stand
 * first: where a line has no room for all of it, a name is cut and no figure.
 */
export function readOffParts(sources: ReadOffSources, minute: number): readonly string[] {
  const { points, secondProbe, overlay, marks, unit, window } = sources;
  const shown = window.to - window.from;
  const decimals = shown < SECONDS_BELOW_MINUTES ? 2 : 1;
  const at = (line: readonly HeatPoint[] | null): string | null => {
    const celsius = line && celsiusAt(line, minute);
    return celsius === null ? null : formatTemperature(celsius, unit);
  };
  const time = `${formatNumber(minute, decimals)}\u00a0min`;
  const [own, second, other] = [at(points), at(secondProbe), at(overlay?.points ?? null)];
  const mark = nearestMark(marks, minute, Math.max(NEAR_MINUTES, shown * NEAR_SHARE));
  return [
    own === null ? time : `${time}, ${own}`,
    second === null ? '' : `${second}, second probe`,
    other === null || !overlay ? '' : `${other}, ${overlay.label}`,
    mark ? `${formatNumber(mark.minute, decimals)}\u00a0min: ${mark.label}` : '',
  ].filter((part) => part !== '');
}
