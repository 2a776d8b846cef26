import type { HeatPoint } from '#shared/heat/heat-stops.ts';
import { thinToColumns } from '#shared/record/thin-to-columns.ts';
import { holds, type MinuteWindow } from './minute-window.ts';
import type { ComparedRecord, RecordPart } from './record-chart-props.ts';

type Line = readonly HeatPoint[];

/** All lines of a chart, whole. */
export interface ChartSources {
  readonly points: Line;
  readonly smooth: Line;
  readonly secondProbe: Line | null;
  readonly smoothSecond: Line | null;
  /** The course of the other record, on the minutes of the one shown. */
  readonly overlay: Line | null;
  readonly detail: RecordPart | null;
}

/** What is drawn of them in a window: at most four points a column of pixels. */
export interface DrawnLines {
  readonly readings: Line;
  readonly smooth: Line;
  readonly second: Line | null;
  readonly smoothSecond: Line | null;
  readonly overlay: Line | null;
}

/** The other record on the minutes of the one shown. */
export function shiftedPoints({ points, shiftMinutes = 0 }: ComparedRecord): Line {
  return shiftMinutes === 0
    ? points
    : points.map(([minute, celsius]): HeatPoint => [minute + shiftMinutes, celsius]);
}

/** From the first to the last minute of any line. */
export function wholeWindow(lines: readonly (Line | null)[]): MinuteWindow {
  let from = Infinity;
  let to = -Infinity;
  for (const line of lines) {
    const [first, last] = [line?.[0], line?.[line.length - 1]];
    if (!first || !last) continue;
    from = Math.min(from, first[0]);
    to = Math.max(to, last[0]);
  }
  return from <= to ? { from, to } : { from: 0, to: 0 };
}

/** Readings as finely as they are at hand: the fetched part where it holds what is shown. */
export function readingsIn(sources: ChartSources, window: MinuteWindow) {
  const { detail, points, secondProbe } = sources;
  const fine = detail && holds(detail.part, window) ? detail : null;
  return {
    points: fine ? fine.points : points,
    secondProbe: fine?.secondProbe ?? secondProbe,
  };
}

export function drawnLines(
  sources: ChartSources,
  window: MinuteWindow,
  columns: number,
): DrawnLines {
  const thin = (line: Line): Line => thinToColumns(line, window.from, window.to, columns);
  const readings = readingsIn(sources, window);
  return {
    readings: thin(readings.points),
    smooth: thin(sources.smooth),
    second: readings.secondProbe && thin(readings.secondProbe),
    smoothSecond: sources.smoothSecond && thin(sources.smoothSecond),
    overlay: sources.overlay && thin(sources.overlay),
  };
}
