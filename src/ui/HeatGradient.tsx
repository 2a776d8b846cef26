import { heatStops } from '#shared/heat/heat-stops.ts';
import type { HeatPoint } from '#shared/heat/heat-stops.ts';

interface Props {
  readonly id: string;
  readonly points: readonly HeatPoint[];
  /** Where a minute lies in the drawing. */
  readonly xOf: (minute: number) => number;
  readonly toleranceCelsius?: number;
}

/** The gradient of a climb along its minutes, for strip and chart alike. Stands inside `<defs>`. */
export function HeatGradient({ id, points, xOf, toleranceCelsius = 4 }: Props) {
  const first = points[0];
  const last = points[points.length - 1];
  if (!first || !last) return null;
  const start = first[0];
  const span = last[0] - start;
  return (
    <linearGradient
      id={id}
      gradientUnits="userSpaceOnUse"
      x1={xOf(start)}
      x2={xOf(last[0])}
      y1="0"
      y2="0"
    >
      {heatStops(points, toleranceCelsius).map((stop, index) => (
        <stop
          key={index}
          offset={span === 0 ? 0 : Number(((stop.minute - start) / span).toFixed(5))}
          stopColor={stop.colour}
        />
      ))}
    </linearGradient>
  );
}
