import type { HeatPoint } from '#shared/heat/heat-stops.ts';
import { fromCelsius } from '#shared/units/temperature.ts';
import { estimateTextWidth, placeLabels } from './label-lanes.ts';
import type { LabelWish } from './label-lanes.ts';
import { LABEL_SIZE, LANE_HEIGHT } from './lane-size.ts';
import type { RecordChartProps } from './record-chart-props.ts';

/** Room for figures left of the plot and for half a figure right of it, px. */
export const CHART_MARGIN = { left: 58, right: 8, bottom: 26 } as const;
const NARROW_PX = 560;
const MOST_NAMED_ON_NARROW = 3;

export interface ChartFrame {
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

function minuteRange({ points, secondProbe, overlay }: RecordChartProps) {
  const ends = [points, secondProbe ?? [], overlay?.points ?? []].flatMap((line) => {
    const [first, last] = [line[0], line[line.length - 1]];
    return first && last ? [first[0], last[0]] : [];
  });
  return { start: Math.min(...ends), end: Math.max(...ends) };
}

function minuteToX(props: RecordChartProps, width: number) {
  const { start, end } = minuteRange(props);
  const span = end - start || 1;
  const room = width - CHART_MARGIN.left - CHART_MARGIN.right;
  return (minute: number) => CHART_MARGIN.left + ((minute - start) / span) * room;
}

/** Where everything of a chart lies, at a width, under so many lanes of labels. */
export function chartFrame(
  props: RecordChartProps,
  width: number,
  lanes: number,
  plotHeight = Math.round(Math.min(360, Math.max(220, width * 0.4))),
): ChartFrame {
  const { points, secondProbe, overlay, targetCelsius, unit = 'C' } = props;
  const { start, end } = minuteRange(props);
  let low = 0;
  let high = targetCelsius ?? 100;
  for (const line of [points, secondProbe ?? [], overlay?.points ?? []]) {
    for (const [, celsius] of line) {
      low = Math.min(low, celsius);
      high = Math.max(high, celsius);
    }
  }
  const round = unit === 'F' ? 200 : 100;
  const lowDegrees = Math.floor(fromCelsius(low, unit) / round) * round;
  const highDegrees = Math.ceil((fromCelsius(high, unit) + round * 0.3) / round) * round;
  const top = lanes * LANE_HEIGHT + 8;
  const bottom = top + plotHeight;
  return {
    height: bottom + CHART_MARGIN.bottom,
    plot: { left: CHART_MARGIN.left, right: width - CHART_MARGIN.right, top, bottom },
    startMinute: start,
    endMinute: end,
    lowDegrees,
    highDegrees,
    xOf: minuteToX(props, width),
    yOf: (celsius) =>
      bottom -
      ((fromCelsius(celsius, unit) - lowDegrees) / (highDegrees - lowDegrees)) * plotHeight,
  };
}

/** Marks, stretches and the hold as labels in lanes over the plot. */
export function chartLabels(props: RecordChartProps, width: number) {
  const { marks = [], stretches = [], hold } = props;
  const xOf = minuteToX(props, width);
  const numbered = width < NARROW_PX && marks.length > MOST_NAMED_ON_NARROW;
  const texts = new Map<string, string>();
  const wishes: LabelWish[] = [];
  const wish = (id: string, text: string, fromMinute: number, toMinute?: number) => {
    texts.set(id, text);
    wishes.push({
      id,
      x: xOf(fromMinute),
      textWidth: estimateTextWidth(text, LABEL_SIZE),
      ...(toMinute === undefined ? {} : { spanToX: xOf(toMinute) }),
    });
  };
  stretches.forEach(({ label, fromMinute, toMinute }, index) =>
    wish(`stretch-${index}`, label, fromMinute, toMinute),
  );
  if (hold) {
    const minutes = Math.round((hold.toMinute - hold.fromMinute) * 2) / 2;
    wish('hold', `hold ${minutes}\u00a0min`, hold.fromMinute, hold.toMinute);
  }
  marks.forEach(({ label, minute }, index) =>
    wish(`mark-${index}`, numbered ? String(index + 1) : label, minute),
  );
  return { ...placeLabels(wishes, width), texts, numbered };
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
