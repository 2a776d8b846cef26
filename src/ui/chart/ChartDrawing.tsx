import { memo } from 'react';
import type { TemperatureUnit } from '#shared/units/temperature.ts';
import type { DrawnMark } from '../drawn-mark.ts';
import { LabelLanes } from '../LabelLanes.tsx';
import { ChartAxes } from './ChartAxes.tsx';
import type { ChartFrame } from './chart-frame.ts';
import type { chartLabels } from './chart-labels.ts';
import { ChartLevel } from './ChartLevel.tsx';
import { ChartLines } from './ChartLines.tsx';
import { ChartMarks } from './ChartMarks.tsx';
import { ChartStretches } from './ChartStretches.tsx';
import type { DrawnLines } from './drawn-lines.ts';
import type { DrawnStretch, RecordChartProps } from './record-chart-props.ts';

interface Props {
  readonly id: string;
  readonly alt: string;
  readonly frame: ChartFrame;
  readonly lines: DrawnLines;
  readonly labels: ReturnType<typeof chartLabels>;
  readonly unit: TemperatureUnit;
  readonly stretches: readonly DrawnStretch[];
  readonly hold: NonNullable<RecordChartProps['hold']> | null;
  readonly marks: readonly DrawnMark[];
  readonly targetCelsius: number | null;
  readonly overlayLabel: string | null;
  readonly quartzMinute: number | null;
}

/** The chart as a picture, drawn anew only when what it shows has changed. */
export const ChartDrawing = memo(function ChartDrawing(props: Props) {
  const { id, frame, lines, labels, unit, targetCelsius } = props;
  return (
    <svg
      role="img"
      aria-label={props.alt}
      viewBox={`0 0 ${frame.width} ${frame.height}`}
      className="ink-drawing block h-auto w-full overflow-visible"
    >
      <ChartAxes frame={frame} unit={unit} />
      <ChartStretches id={id} frame={frame} stretches={props.stretches} hold={props.hold} />
      <ChartLines
        id={id}
        frame={frame}
        lines={lines}
        unit={unit}
        overlayLabel={props.overlayLabel}
        quartzMinute={props.quartzMinute}
        targetCelsius={targetCelsius}
      />
      <ChartMarks frame={frame} marks={props.marks} line={lines.smooth} />
      {targetCelsius !== null && (
        <ChartLevel frame={frame} celsius={targetCelsius} unit={unit} word="target" dash="7 4" />
      )}
      <LabelLanes placed={labels.placed} texts={labels.texts} baseY={frame.plot.top} />
    </svg>
  );
});
