import { celsiusAt, type HeatPoint } from '#shared/heat/heat-stops.ts';
import { fromCelsius, type TemperatureUnit } from '#shared/units/temperature.ts';
import { LANE_HEIGHT } from '../lane-size.ts';
import type { MinuteWindow } from './minute-window.ts';

/** Room for figures left of the plot and for half a figure right of it, px. */
export const CHART_MARGIN = { left: 58, right: 8, bottom: 26 } as const;

/** Steps to which the ends of the degrees are rounded when a part is shown. */
const PART_STEPS: Readonly<Record<TemperatureUnit, readonly number[]>> = {
  C: [20, 50, 100],
  F: [50, 100, 200],
};
/** So few degrees never fill the plot: the unrest of a probe would look like an event. */
const LEAST_DEGREES: Readonly<Record<TemperatureUnit, number>> = { C: 80, F: 150 };
/** A target this far beyond the readings of a part is brought into sight, °C. */
const TARGET_NEAR_CELSIUS = 40;

export interface ChartFrame {
  readonly width: number;
  readonly height: number;
  readonly plot: { left: number; right: number; top: number; bottom: number };
  readonly startMinute: number;
  readonly endMinute: number;
  /** Bottom and top of the plot in the shown unit. */
  readonly lowDegrees: number;
  readonly highDegrees: number;
  readonly xOf: (minute: number) => number;
  readonly yOf: (celsius: number) => number;
}

export interface FrameWish {
  readonly window: MinuteWindow;
  readonly degrees: { readonly low: number; readonly high: number };
  readonly unit: TemperatureUnit;
  readonly width: number;
  /** Lanes of labels over the plot. */
  readonly lanes: number;
  readonly plotHeight?: number | undefined;
}

export const plotWidth = (width: number): number =>
  Math.max(1, width - CHART_MARGIN.left - CHART_MARGIN.right);

export function minuteToX(window: MinuteWindow, width: number) {
  const span = window.to - window.from || 1;
  const room = plotWidth(width);
  return (minute: number) => CHART_MARGIN.left + ((minute - window.from) / span) * room;
}

/**
 * The degrees from bottom to top of the plot, in the shown unit, both round figures: from nought
 * for the whole of a record, from what is in sight for a part of it.
 */
export function degreesFor(
  lines: readonly (readonly HeatPoint[] | null)[],
  targetCelsius: number | null,
  unit: TemperatureUnit,
  part: MinuteWindow | null,
): { readonly low: number; readonly high: number } {
  let low = Infinity;
  let high = -Infinity;
  for (const line of lines) {
    for (const [, celsius] of part ? cutLine(line ?? [], part) : (line ?? [])) {
      low = Math.min(low, celsius);
      high = Math.max(high, celsius);
    }
  }
  if (!part || low > high) {
    const round = unit === 'F' ? 200 : 100;
    const bottom = fromCelsius(Math.min(0, low), unit);
    const top = fromCelsius(Math.max(targetCelsius ?? 100, high), unit);
    return {
      low: Math.floor(bottom / round) * round,
      high: Math.ceil((top + round * 0.3) / round) * round,
    };
  }
  if (targetCelsius !== null && Math.abs(targetCelsius - high) < TARGET_NEAR_CELSIUS) {
    high = Math.max(high, targetCelsius);
  }
  const [bottom, top] = [fromCelsius(low, unit), fromCelsius(high, unit)];
  const spread = Math.max(LEAST_DEGREES[unit], top - bottom);
  const middle = (bottom + top) / 2;
  const steps = PART_STEPS[unit];
  const round = steps.findLast((step) => spread / step >= 4) ?? steps[0] ?? 1;
  return {
    low: Math.floor((middle - spread / 2) / round - 0.1) * round,
    high: Math.ceil((middle + spread / 2) / round + 0.3) * round,
  };
}

/** A line from edge to edge of a window: what lies beyond is not in sight. */
function cutLine(line: readonly HeatPoint[], { from, to }: MinuteWindow): readonly HeatPoint[] {
  const inside = line.filter(([minute]) => minute >= from && minute <= to);
  const edges = [from, to].flatMap((minute): HeatPoint[] => {
    const celsius = celsiusAt(line, minute);
    return celsius === null ? [] : [[minute, celsius]];
  });
  return [...inside, ...edges];
}

/** Where everything of a chart lies, at a width, under so many lanes of labels. */
export function chartFrame({
  window,
  degrees,
  unit,
  width,
  lanes,
  ...wish
}: FrameWish): ChartFrame {
  const plotHeight = wish.plotHeight ?? Math.round(Math.min(360, Math.max(220, width * 0.4)));
  const top = lanes * LANE_HEIGHT + 8;
  const bottom = top + plotHeight;
  const { low, high } = degrees;
  return {
    width,
    height: bottom + CHART_MARGIN.bottom,
    plot: { left: CHART_MARGIN.left, right: width - CHART_MARGIN.right, top, bottom },
    startMinute: window.from,
    endMinute: window.to,
    lowDegrees: low,
    highDegrees: high,
    xOf: minuteToX(window, width),
    yOf: (celsius) => bottom - ((fromCelsius(celsius, unit) - low) / (high - low)) * plotHeight,
  };
}

/** A polyline through points. */
export function linePath(
  points: readonly HeatPoint[],
  xOf: (minute: number) => number,
  yOf: (celsius: number) => number,
): string {
  return points
    .map(([minute, celsius], index) => {
      const command = index === 0 ? 'M' : 'L';
      return `${command}${xOf(minute).toFixed(1)} ${yOf(celsius).toFixed(1)}`;
    })
    .join('');
}
