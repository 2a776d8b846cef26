import { formatTemperature, type TemperatureUnit } from '#shared/units/temperature.ts';
import type { ChartFrame } from './chart-frame.ts';

interface Props {
  readonly frame: ChartFrame;
  readonly celsius: number;
  readonly unit: TemperatureUnit;
  /** Stands before the figure: "target". */
  readonly word?: string;
  readonly dash: string;
  /** Ends there instead of crossing the plot, px. */
  readonly toX?: number;
}

/** A ruled temperature with its figure; nothing where it lies outside the plot. */
export function ChartLevel({ frame, celsius, unit, word, dash, toX }: Props) {
  const { plot, yOf } = frame;
  const y = yOf(celsius);
  if (y < plot.top || y > plot.bottom) return null;
  // At the upper edge its figure goes beneath the rule.
  const textY = y - plot.top < 20 ? y + 16 : y - 6;
  return (
    <g aria-hidden="true">
      <path
        className="stroke-soot"
        strokeDasharray={dash}
        d={`M${plot.left} ${y}H${toX ?? plot.right}`}
      />
      <text
        className="fill-soot stroke-ash font-sans"
        paintOrder="stroke"
        strokeWidth="4"
        fontSize="13"
        x={plot.left + 6}
        y={textY}
      >
        {word ? `${word} ` : ''}
        {formatTemperature(celsius, unit)}
      </text>
    </g>
  );
}
