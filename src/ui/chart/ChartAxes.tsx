import type { TemperatureUnit } from '#shared/units/temperature.ts';
import { degreeTicks, minuteTicks } from '../axis-ticks.ts';
import type { ChartFrame } from './chart-frame.ts';
import { MinuteRuler } from '../MinuteRuler.tsx';

interface Props {
  readonly frame: ChartFrame;
  readonly unit: TemperatureUnit;
}

/** Hairlines at round degrees, the two axes, figures with their units. */
export function ChartAxes({ frame, unit }: Props) {
  const { plot, lowDegrees, highDegrees } = frame;
  const height = plot.bottom - plot.top;
  const y = (degrees: number) =>
    plot.bottom - ((degrees - lowDegrees) / (highDegrees - lowDegrees)) * height;
  const ticks = degreeTicks(lowDegrees, highDegrees, height);
  return (
    <g aria-hidden="true">
      {ticks.map((degrees, index) => (
        <g key={degrees}>
          <path className="stroke-line" d={`M${plot.left} ${y(degrees)}H${plot.right}`} />
          <text
            className="fill-soot-2 font-reading"
            fontSize="12"
            letterSpacing="-0.3"
            textAnchor="end"
            x={plot.left - 7}
            y={y(degrees) + 4}
          >
            {degrees}
            {index === ticks.length - 1 ? `\u00a0°${unit}` : ''}
          </text>
        </g>
      ))}
      <path
        className="stroke-soot-2"
        fill="none"
        d={`M${plot.left} ${plot.top}V${plot.bottom}H${plot.right}`}
      />
      <MinuteRuler
        ticks={minuteTicks(frame.startMinute, frame.endMinute, plot.right - plot.left)}
        xOf={frame.xOf}
        y={plot.bottom}
        width={plot.right + 8}
      />
    </g>
  );
}
