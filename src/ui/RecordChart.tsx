import { useId, useState } from 'react';
import { celsiusAt } from '#shared/heat/heat-stops.ts';
import { formatTemperature } from '#shared/units/temperature.ts';
import { ChartAxes } from './ChartAxes.tsx';
import { chartFrame, chartLabels, linePath } from './chart-frame.ts';
import { ChartKey } from './ChartKey.tsx';
import { ChartLines } from './ChartLines.tsx';
import { ChartStretches } from './ChartStretches.tsx';
import { LabelLanes } from './LabelLanes.tsx';
import { MarkList } from './MarkList.tsx';
import { ReadAlong } from './ReadAlong.tsx';
import { readOff } from './read-off.ts';
import type { RecordChartProps } from './record-chart-props.ts';
import { ReadOffFlag } from './ReadOffFlag.tsx';
import { ReadingsTable } from './ReadingsTable.tsx';
import { useWidth } from './useWidth.ts';

/** So low that sheet, strip and chart of a note share one page. */
const PAPER_PLOT_PX = 170;

/** A record as temperature over time: ink with its heat beneath, read off by pointer or arrows. */
export function RecordChart(props: RecordChartProps) {
  const { points, alt, unit = 'C', targetCelsius = null, secondProbe, overlay } = props;
  const id = useId();
  const [ref, width, onPaper] = useWidth<HTMLDivElement>();
  const [minute, setMinute] = useState<number | null>(null);
  if (points.length < 2) {
    return <p className="border-y border-line py-4 text-small text-soot-2">{alt}</p>;
  }
  const shownMarks = props.marks ?? [];
  const labels = chartLabels(props, width);
  const frame = chartFrame(props, width, labels.lanes, onPaper ? PAPER_PLOT_PX : undefined);
  const { xOf, yOf, plot } = frame;
  const spoken = (at: number) => {
    const second = secondProbe ? celsiusAt(secondProbe, at) : null;
    const other = overlay ? celsiusAt(overlay.points, at) : null;
    return [
      readOff(points, at, unit),
      second === null ? '' : `second ${formatTemperature(second, unit)}`,
      other === null ? '' : `other ${formatTemperature(other, unit)}`,
    ]
      .filter(Boolean)
      .join(' · ');
  };

  return (
    <figure className="whole-in-print">
      <div ref={ref} className="relative">
        <svg
          role="img"
          aria-label={alt}
          viewBox={`0 0 ${width} ${frame.height}`}
          className="ink-drawing block h-auto w-full overflow-visible"
        >
          <ChartAxes frame={frame} unit={unit} />
          <ChartStretches
            id={id}
            frame={frame}
            stretches={props.stretches ?? []}
            hold={props.hold ?? null}
          />
          <ChartLines id={id} frame={frame} props={props} />
          {shownMarks.map((mark, index) => {
            const celsius = celsiusAt(points, mark.minute);
            if (celsius === null) return null;
            const [x, y] = [xOf(mark.minute), yOf(celsius)];
            return (
              <g key={index} aria-hidden="true">
                <path
                  className="stroke-soot-2"
                  strokeDasharray="2 3"
                  d={`M${x} ${plot.top}V${y}`}
                />
                <path
                  className="fill-ash stroke-soot"
                  strokeWidth="1.5"
                  d={`M${x} ${y - 5}l5 5-5 5-5-5z`}
                />
              </g>
            );
          })}
          {targetCelsius !== null && (
            <g aria-hidden="true">
              <path
                className="stroke-soot"
                strokeDasharray="7 4"
                d={`M${plot.left} ${yOf(targetCelsius)}H${plot.right}`}
              />
              <text
                className="fill-soot stroke-ash font-sans"
                paintOrder="stroke"
                strokeWidth="4"
                fontSize="13"
                x={plot.left + 6}
                y={yOf(targetCelsius) - 6}
              >
                target {formatTemperature(targetCelsius, unit)}
              </text>
            </g>
          )}
          <LabelLanes placed={labels.placed} texts={labels.texts} baseY={plot.top} />
          {minute !== null && (
            <>
              <ReadOffFlag
                x={xOf(minute)}
                top={plot.top}
                height={plot.bottom - plot.top}
                width={width}
                text={spoken(minute)}
              />
              <path
                className="fill-verdigris stroke-ash"
                strokeWidth="2"
                d={
                  linePath([[minute, celsiusAt(points, minute) ?? 0]], xOf, yOf) +
                  'm-6 0l6-6 6 6-6 6z'
                }
              />
            </>
          )}
        </svg>
        <div className="pointer-events-none absolute inset-y-0 right-[8px] left-[58px] *:pointer-events-auto">
          <ReadAlong
            label="Read along the curve"
            fromMinute={frame.startMinute}
            toMinute={frame.endMinute}
            minute={minute}
            valueText={spoken(minute ?? frame.startMinute)}
            onMinute={setMinute}
          />
        </div>
      </div>
      {labels.numbered && <MarkList marks={shownMarks} />}
      {(secondProbe || overlay) && (
        <ChartKey
          second={secondProbe != null}
          {...(overlay ? { overlayLabel: overlay.label } : {})}
        />
      )}
      <ReadingsTable points={points} unit={unit} />
    </figure>
  );
}
